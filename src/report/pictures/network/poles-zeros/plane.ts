import { scaleLinear } from 'd3-scale';
import type { Complex, FilterPolynomials } from '../../../../forms/index.js';
import { FORMAT_WIDTH, type Format } from '../../../svg/drawing.js';
import { extentOf, type Frame, frameOf, isAbove, lettersOf } from './frame.js';
import type { Labelled, RootKind } from './roots.js';
import { spread, thinned } from './spread.js';
import { type Told, told } from './told.js';

/** A mark at a root. */
export interface RootMark {
  readonly kind: RootKind;
  readonly x: number;
  readonly y: number;
}

/** A value beside the plane with the line that leads to its mark. */
export interface RootLabel {
  readonly text: string;
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'end';
  readonly markX: number;
  readonly markY: number;
}

/** Distance of a leader from the middle of its mark, px, and from its label. */
const FROM_MARK = 7;
const FROM_LABEL = 4;

type Place = readonly [number, number];

/** Both ends of the line from a mark to its label. */
export function leaderEnds({ x, y, anchor, markX, markY }: RootLabel): readonly [Place, Place] {
  const end: Place = [anchor === 'start' ? x - FROM_LABEL : x + FROM_LABEL, y];
  const [dx, dy] = [end[0] - markX, end[1] - markY];
  const share = Math.min(FROM_MARK / Math.hypot(dx, dy), 1);
  return [[markX + dx * share, markY + dy * share], end];
}

/** The pole plot as plain data. */
export interface Plane {
  readonly width: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly height: number;
  /** Position of the imaginary axis. */
  readonly axis: number;
  readonly pixelsPerUnit: number;
  readonly marks: readonly RootMark[];
  readonly labels: readonly RootLabel[];
  readonly realTicks: readonly { readonly value: number; readonly x: number }[];
  readonly omegaTicks: readonly { readonly value: number; readonly y: number; readonly isNamed: boolean }[];
  /** Zeros told in words: too far above the plane; too far elsewhere, or off the axis where the drawing is narrow. */
  readonly farAbove: readonly Labelled[];
  readonly below: readonly Labelled[];
  readonly belowWords: string;
  /** Values that found no room. */
  readonly unlabelled: number;
  readonly letters: number;
}

/** Labels keep this distance, px. */
const SPACING = 17;

interface Column {
  readonly x: number;
  readonly anchor: 'start' | 'end';
  readonly top: number;
  readonly bottom: number;
  readonly toX: (re: number) => number;
  readonly toY: (im: number) => number;
}

function columnLabels(groups: readonly Labelled[], { x, anchor, top, bottom, toX, toY }: Column): RootLabel[] {
  const sorted = [...groups].sort((a, b) => b.at.im - a.at.im);
  const heights = spread(
    sorted.map(({ at }) => toY(at.im)),
    SPACING,
    top + 6,
    bottom - 6,
  );
  return sorted.map(({ text, at }, n) => ({
    text,
    x,
    y: heights[n] as number,
    anchor,
    markX: toX(at.re),
    markY: toY(at.im),
  }));
}

/** The groups that get a label: transmission zeros first, the others thinned out to what fits. */
function chosen(zeros: readonly Labelled[], others: readonly Labelled[], room: number): Labelled[] {
  const first = thinned(zeros, room);
  return [...first, ...thinned(others, room - first.length)];
}

function labelsOf({ poles, zeros, rings }: Told, frame: Frame, column: Column): RootLabel[] {
  const room = Math.floor((frame.bottom - frame.top - 12) / SPACING) + 1;
  // Poles that all are labelled with their conjugates crowd in the upper half.
  const half = poles.every(({ text }) => text.includes('±')) ? Math.ceil(room / 2) : room;
  return [
    ...columnLabels(thinned(poles, half), { ...column, x: frame.poleX, anchor: 'end' }),
    ...columnLabels(chosen(zeros, rings, room), column),
  ];
}

/** Lays out poles and zeros of a response. */
export function planeOf(polynomials: FilterPolynomials, format: Format): Plane {
  const { poles, reflectionZeros } = polynomials;
  const roots = told(polynomials, format === 'wide');
  const frame = frameOf(extentOf([...poles, ...reflectionZeros, ...roots.shown]), roots, format);
  const { left, right, top, bottom, axis, pixelsPerUnit, middle, center } = frame;
  // One scale for both directions: equal axes.
  const toX = scaleLinear([0, 1], [axis, axis + pixelsPerUnit]);
  const toY = scaleLinear([center, center + 1], [middle, middle - pixelsPerUnit]);
  const labels = labelsOf(roots, frame, { top, bottom, toX, toY, x: right + 16, anchor: 'start' });
  const marks = (kind: RootKind, of: readonly Complex[]): RootMark[] =>
    of.map(({ re, im }) => ({ kind, x: toX(re), y: toY(im) }));
  const below = [...roots.far.filter((group) => !isAbove(group)), ...roots.aside];
  return {
    ...{ width: FORMAT_WIDTH[format], left, right, top, bottom, axis, pixelsPerUnit },
    height: bottom + 24 + 20 * Math.min(below.length, 1),
    marks: [...marks('pole', poles), ...marks('reflection', reflectionZeros), ...marks('transmission', roots.shown)],
    labels,
    realTicks: realTicks(left + 14, right, axis, pixelsPerUnit),
    // Where the plane is tiny the edges of the passband have no room beside 0.
    omegaTicks: [1, 0, -1].map((value) => ({ value, y: toY(value), isNamed: value === 0 || pixelsPerUnit > 14 })),
    farAbove: roots.far.filter(isAbove),
    below,
    belowWords: roots.aside.length === 0 ? 'far off the plane' : 'far or off the axis',
    unlabelled: roots.poles.length + roots.zeros.length + roots.rings.length - labels.length,
    letters: lettersOf(format),
  };
}

/** Round values along the foot of the plane, at least 40 px apart. */
function realTicks(left: number, right: number, axis: number, pixelsPerUnit: number): Plane['realTicks'] {
  const scale = scaleLinear([(left - axis) / pixelsPerUnit, (right - axis) / pixelsPerUnit], [left, right]);
  return scale.ticks(Math.max(2, Math.floor((right - left) / 60))).map((value) => ({ value, x: scale(value) }));
}
