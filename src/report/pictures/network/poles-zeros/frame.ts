import type { Complex } from '../../../../forms/index.js';
import { FORMAT_WIDTH, type Format } from '../../../svg/drawing.js';
import { textWidth } from '../../../svg/words.js';
import type { Labelled } from './roots.js';
import type { Told } from './told.js';

/** How far the roots reach, in units of the plane. */
export interface Extent {
  readonly left: number;
  readonly right: number;
  readonly low: number;
  readonly high: number;
}

/** The part of the plane that holds the roots and the band edges. */
export function extentOf(roots: readonly Complex[]): Extent {
  return {
    left: Math.max(0.25, ...roots.map(({ re }) => -re)),
    right: Math.max(0, ...roots.map(({ re }) => re)),
    low: Math.min(-1.1, ...roots.map(({ im }) => im)),
    high: Math.max(1.1, ...roots.map(({ im }) => im)),
  };
}

/** Is a root told above the plane? */
export const isAbove = ({ at }: Labelled): boolean => at.im > 0;

/** Size of the letters, px. */
export const lettersOf = (format: Format): number => (format === 'wide' ? 12.5 : 11);

/** Where the plane stands in its drawing, and its scale. */
export interface Frame {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly axis: number;
  readonly pixelsPerUnit: number;
  readonly middle: number;
  readonly center: number;
  /** Right end of the column of pole labels. */
  readonly poleX: number;
}

/** Fits the plane between its columns of labels. */
export function frameOf(extent: Extent, { poles, zeros, rings, far }: Told, format: Format): Frame {
  const isWide = format === 'wide';
  const letters = lettersOf(format);
  const widest = (groups: readonly Labelled[]): number =>
    Math.max(0, ...groups.map(({ text }) => textWidth(text, letters)));
  const [leftRoom, rightRoom] = [widest(poles) + 26, widest([...zeros, ...rings]) + 34];
  const [left, edge] = [isWide ? 34 : 24, 22];
  const free = FORMAT_WIDTH[format] - left - leftRoom - rightRoom - edge - 12;
  const [spanX, spanY] = [extent.left + extent.right, extent.high - extent.low];
  const pixelsPerUnit = Math.min((isWide ? 400 : 330) / spanY, free / spanX);
  const axis = left + leftRoom + 12 + extent.left * pixelsPerUnit;
  // At least so high that a few values find room, however much the width compresses the plane.
  const inner = Math.max(spanY * pixelsPerUnit, 120);
  const top = 12 + (far.some(isAbove) ? 20 : 0);
  const middle = top + 14 + inner / 2;
  return {
    left,
    right: axis + extent.right * pixelsPerUnit + edge,
    top,
    bottom: middle + inner / 2 + 14,
    axis,
    pixelsPerUnit,
    middle,
    center: (extent.high + extent.low) / 2,
    poleX: axis - extent.left * pixelsPerUnit - 14,
  };
}
