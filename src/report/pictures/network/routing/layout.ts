import type { Link } from './couplings.js';
import type { Box, Point } from './geometry.js';

/** A node: a disc, or a bar with round ends where several cross couplings land. */
export interface Disc {
  readonly node: number;
  readonly x: number;
  readonly y: number;
  readonly radius: number;
  /** How far the centers of the round ends lie from the middle, along x and along y. */
  readonly reach: Point;
}

/** A place where a label may stand: at a point of a line, pushed off it in a direction (unit vector) by at least `off`. */
export interface Spot {
  readonly at: Point;
  readonly toward: Point;
  readonly off: number;
}

/** A coupling with the way its line takes, where its lozenge may sit and where its label may stand, best first. */
export interface Route {
  readonly link: Link;
  readonly points: readonly Point[];
  readonly marks: readonly Point[];
  readonly spots: readonly Spot[];
}

/** A figure before its labels are placed. */
export interface Skeleton {
  readonly discs: readonly Disc[];
  readonly routes: readonly Route[];
  /** Where the offset of a detuned resonator may stand, by node. */
  readonly offsets: ReadonlyMap<number, readonly Spot[]>;
  /** Small letters, where columns are tight. */
  readonly isDense: boolean;
}

/** One line of a label. */
export interface Line {
  readonly text: string;
  readonly classes: string;
  readonly size: number;
}

/** A label that found its place. */
export interface Placed {
  readonly lines: readonly Line[];
  readonly box: Box;
  readonly anchor: 'start' | 'mid' | 'end';
}

/** A lozenge on the line of a negative coupling. */
export interface Lozenge {
  readonly at: Point;
  readonly half: number;
}

/** A finished figure: all that is drawn, as plain data. */
export interface Layout {
  readonly width: number;
  readonly height: number;
  readonly discs: readonly Disc[];
  readonly routes: readonly Route[];
  readonly lozenges: readonly Lozenge[];
  readonly labels: readonly Placed[];
  /** Labels that found no free place: their numbers stand in the table only. */
  readonly dropped: number;
  /** Labels that found room only without their second line. */
  readonly shortened: number;
}

/** What layouts need to know of labels before they are placed. */
export interface Sizing {
  readonly width: number;
  readonly isNarrow: boolean;
  /** Widest label of the main path at full size and in small letters; 0 where it has none. */
  readonly mainWidth: number;
  readonly smallWidth: number;
  /** Lines of a label of the main path. */
  readonly mainLines: number;
  /** Widest offset of a resonator; 0 where none is written. */
  readonly offsetWidth: number;
}

/** Ports are a little smaller than resonators, unless these are small already. */
export function portRadius(radius: number): number {
  return radius < 12 ? radius : radius * (13 / 15);
}

/** A disc without a reach. */
export function disc(node: number, x: number, y: number, radius: number): Disc {
  return { node, x, y, radius, reach: [0, 0] };
}

/** The box round a disc or bar. */
export function discBox({ x, y, radius, reach }: Disc): Box {
  return {
    left: x - reach[0] - radius,
    right: x + reach[0] + radius,
    top: y - reach[1] - radius,
    bottom: y + reach[1] + radius,
  };
}

/** The box round a lozenge. */
export function lozengeBox({ at: [x, y], half }: Lozenge): Box {
  return { left: x - half, right: x + half, top: y - half, bottom: y + half };
}
