import { element, fragment, type Markup } from './markup.js';

/** Half diagonal of a lozenge whose area equals that of a square of side 1. */
const EQUAL_AREA = Math.SQRT1_2;

type Point = readonly [number, number];

function polygon(points: readonly Point[], classes: string): Markup {
  const text = points.map(([x, y]) => `${Math.round(x * 10) / 10},${Math.round(y * 10) / 10}`).join(' ');
  return element('polygon', { points: text, class: classes });
}

/** Filled square: positive. */
export function square(x: number, y: number, side: number, classes = 'f-ink'): Markup {
  return element('rect', { x: x - side / 2, y: y - side / 2, width: side, height: side, class: classes });
}

/** Hollow lozenge with a bar: negative. Its area equals that of a square of the same `side`. */
export function lozenge(x: number, y: number, side: number): Markup {
  const half = side * EQUAL_AREA;
  const corners: readonly Point[] = [
    [x, y - half],
    [x + half, y],
    [x, y + half],
    [x - half, y],
  ];
  return fragment(
    polygon(corners, 'f-window s-negative medium'),
    element('line', { x1: x - half / 2, y1: y, x2: x + half / 2, y2: y, class: 's-negative medium' }),
  );
}

/** Filled dot with a rim of the ground: worst point of a met limit. */
export function dot(x: number, y: number, classes = 'f-ink'): Markup {
  return element('circle', { cx: x, cy: y, r: 3.6, class: `${classes} s-window edge` });
}

/** Filled octagon: worst point of a missed limit, always beside the word short. */
export function octagon(x: number, y: number): Markup {
  const corners = Array.from({ length: 8 }, (_, n): Point => {
    const angle = ((2 * n + 1) * Math.PI) / 8;
    return [x + 6 * Math.cos(angle), y + 6 * Math.sin(angle)];
  });
  return polygon(corners, 'f-short s-window edge');
}

/** Hollow triangle, point down: transmission zero. */
export function triangle(x: number, y: number): Markup {
  return polygon(
    [
      [x - 5, y - 4.5],
      [x + 5, y - 4.5],
      [x, y + 4.5],
    ],
    'f-window s-ink edge',
  );
}

/** Hollow circle: reflection zero. */
export function ring(x: number, y: number): Markup {
  return element('circle', { cx: x, cy: y, r: 4.2, class: 'f-window s-ink edge' });
}

/** Cross: pole. */
export function cross(x: number, y: number): Markup {
  const d = `M${Math.round((x - 4.5) * 10) / 10} ${Math.round((y - 4.5) * 10) / 10}l9 9m-9 0l9-9`;
  return element('path', { d, class: 'line s-ink medium' });
}
