import { scaleLinear } from 'd3-scale';
import { minus, textWidth } from '../../../svg/words.js';
import { signed } from '../../../words/numbers.js';

/** A value of a resonator or of a coupling, at its place along the ruler. */
export interface Sample {
  readonly x: number;
  /** What stands at the end of the stick. */
  readonly height: number;
  /** What is written, and what decides between square and lozenge. */
  readonly value: number;
}

/** A mark on its stick. */
export interface StickMark {
  readonly x: number;
  readonly y: number;
  readonly isNegative: boolean;
}

/** A number at the end of a stick. */
export interface StickLabel {
  readonly x: number;
  /** Middle of the letters. */
  readonly y: number;
  readonly text: string;
  /** Largest or smallest of its panel. */
  readonly isExtreme: boolean;
  readonly isNegative: boolean;
}

/** A panel of sticks on a zero line, as plain data. */
export interface Panel {
  readonly top: number;
  readonly bottom: number;
  readonly zero: number;
  readonly side: number;
  readonly marks: readonly StickMark[];
  readonly labels: readonly StickLabel[];
  readonly ticks: readonly { readonly value: number; readonly y: number }[];
  /** Numbers that found no room. */
  readonly unlabelled: number;
}

/** Where a panel stands and what it holds. */
export interface PanelRequest {
  readonly samples: readonly Sample[];
  readonly top: number;
  readonly height: number;
  /** Distance of neighbors, px. */
  readonly step: number;
  /** Decimals wanted; fewer are written where neighbors would touch. */
  readonly digits: number;
  /** Samples named in any case: the ones that stand out. */
  readonly extremes: readonly number[];
  /** Ends of the drawing, between which labels must stay. */
  readonly left: number;
  readonly right: number;
}

/** Size of the letters of a panel, px. */
export const LETTERS = 11;

/** Room for a number beyond the end of a stick, px. */
const NUMBER_ROOM = 18;

interface Writing {
  readonly indices: readonly number[];
  readonly digits: number;
}

const textOf = (value: number, digits: number): string => minus(signed(value, digits));

const widthOf = (text: string, isBold: boolean): number => textWidth(text, LETTERS, isBold);

/** All numbers with as many decimals as fit between neighbors, else those that stand out. */
function writingOf({ samples, step, digits, extremes }: PanelRequest): Writing {
  const all = samples.map((_, n) => n);
  for (let tried = digits; tried >= Math.min(digits, 1); tried--) {
    if (samples.every(({ value }) => widthOf(textOf(value, tried), false) + 3 <= step))
      return { indices: all, digits: tried };
  }
  return { indices: extremes, digits };
}

function labelsOf(request: PanelRequest, toY: (value: number) => number, side: number): StickLabel[] {
  const { samples, extremes, left, right } = request;
  const { indices, digits } = writingOf(request);
  const labels: (StickLabel & { readonly half: number })[] = [];
  for (const n of indices) {
    const sample = samples[n];
    if (sample === undefined) continue;
    const text = textOf(sample.value, digits);
    const half = widthOf(text, extremes.includes(n)) / 2;
    const x = Math.min(Math.max(sample.x, left + half), right - half);
    const y = toY(sample.height) + (sample.height < 0 ? 1 : -1) * (side * Math.SQRT1_2 + 9);
    const isFree = labels.every((other) => Math.abs(other.x - x) > other.half + half + 2 || Math.abs(other.y - y) > 14);
    if (!isFree) continue;
    labels.push({ x, y, text, isExtreme: extremes.includes(n), isNegative: sample.value < 0, half });
  }
  return labels.map(({ half: _, ...label }) => label);
}

/** Numbers over marks of neighbors: such a label is left out rather than hide a mark. */
function clearOfMarks(labels: readonly StickLabel[], marks: readonly StickMark[], side: number): StickLabel[] {
  return labels.filter(({ x, y, text, isExtreme }) => {
    const half = widthOf(text, isExtreme) / 2;
    return marks.every((mark) => {
      const isOther = Math.abs(mark.x - x) > 0.01;
      const overlapsX = Math.abs(mark.x - x) < half + side * Math.SQRT1_2;
      return !isOther || !overlapsX || Math.abs(mark.y - y) > 6 + side * Math.SQRT1_2;
    });
  });
}

/** Sticks with marks, their numbers and the ticks of the scale. */
export function panelOf(request: PanelRequest): Panel {
  const { samples, top, height, step } = request;
  const heights = samples.map((sample) => sample.height);
  const [low, high] = [Math.min(0, ...heights), Math.max(0, ...heights)];
  const bottom = top + height;
  const from = bottom - (low < 0 ? NUMBER_ROOM + 4 : 0);
  const to = top + (high > 0 ? NUMBER_ROOM + 4 : 0);
  const scale = scaleLinear([low, high === low ? low + 1 : high], [from, to]);
  const side = Math.min(9, Math.max(step * 0.6, 2));
  const marks = samples.map(({ x, height: end, value }) => ({ x, y: scale(end), isNegative: value < 0 }));
  const labels = clearOfMarks(labelsOf(request, scale, side), marks, side);
  return {
    top,
    bottom,
    zero: scale(0),
    side,
    marks,
    labels,
    ticks: scale.ticks(Math.max(2, Math.round(height / 45))).map((value) => ({ value, y: scale(value) })),
    unlabelled: samples.length - labels.length,
  };
}
