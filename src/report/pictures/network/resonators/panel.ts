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
  /** Decimals, or figures, that numbers keep at least; 1 where nothing is said. */
  readonly leastDigits?: number;
  /** How numbers are written; signed where nothing is said. */
  readonly write?: (value: number, digits: number) => string;
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

/** A number keeps this distance from the sticks of its neighbors, px: it must not be read as theirs. */
const FROM_STICKS = 8;

interface Box {
  readonly x: number;
  readonly y: number;
  readonly half: number;
}

const widthOf = (text: string, isBold: boolean): number => textWidth(text, LETTERS, isBold);

const written = ({ write = signed }: PanelRequest, value: number, digits: number): string =>
  minus(write(value, digits));

/** Numbers of digits tried, most first. */
function triedDigits({ digits, leastDigits = 1 }: PanelRequest): number[] {
  const least = Math.min(digits, leastDigits);
  return Array.from({ length: digits - least + 1 }, (_, n) => digits - n);
}

/** With how many digits all numbers fit between neighbors; undefined where they do not: then those that stand out are written. */
function commonDigits(request: PanelRequest): number | undefined {
  const { samples, step } = request;
  return triedDigits(request).find((digits) =>
    samples.every(({ value }) => widthOf(written(request, value, digits), false) + 3 <= step),
  );
}

/** Does a number keep clear of the other sticks and their marks? */
function isClear({ x, y, half }: Box, own: number, marks: readonly StickMark[], zero: number, side: number): boolean {
  const reach = side * Math.SQRT1_2;
  return marks.every((mark, n) => {
    if (n === own) return true;
    const [low, high] = [Math.min(mark.y - reach, zero), Math.max(mark.y + reach, zero)];
    const passes = y + 6 > low && y - 6 < high;
    const isNear = Math.abs(mark.x - x) < half + FROM_STICKS;
    const isOver = Math.abs(mark.x - x) < half + reach && Math.abs(mark.y - y) <= 6 + reach;
    return !(passes && isNear && mark.y !== zero) && !isOver;
  });
}

/** Numbers over their own sticks; what would stand nearer to a neighbor's is left out. */
function labelsOf(request: PanelRequest, marks: readonly StickMark[], zero: number, side: number): StickLabel[] {
  const { samples, extremes, left, right } = request;
  const common = commonDigits(request);
  const indices = common === undefined ? extremes : samples.map((_, n) => n);
  const tried = common === undefined ? triedDigits(request) : [common];
  const labels: (StickLabel & { readonly half: number })[] = [];
  for (const n of indices) {
    const [sample, mark] = [samples[n], marks[n]];
    if (sample === undefined || mark === undefined) continue;
    const y = mark.y + (sample.height < 0 ? 1 : -1) * (side * Math.SQRT1_2 + 9);
    const isExtreme = extremes.includes(n);
    const found = tried
      .map((digits) => {
        const text = written(request, sample.value, digits);
        const half = widthOf(text, isExtreme) / 2;
        return { x: Math.min(Math.max(mark.x, left + half), right - half), y, text, half };
      })
      .find((each) => {
        const isOwn = Math.abs(each.x - mark.x) <= each.half / 2;
        const isFree = labels.every(
          (other) => Math.abs(other.x - each.x) > other.half + each.half + 2 || Math.abs(other.y - y) > 14,
        );
        return isOwn && isFree && isClear(each, n, marks, zero, side);
      });
    if (found !== undefined) labels.push({ ...found, isExtreme, isNegative: sample.value < 0 });
  }
  return labels.map(({ half: _, ...label }) => label);
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
  const labels = labelsOf(request, marks, scale(0), side);
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
