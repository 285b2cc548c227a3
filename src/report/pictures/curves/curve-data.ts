import { decibels, type SweepHz, sweepHz } from '../../../bandpass/index.js';
import { type Band, edgesOfBand, hzFromOmega, type MaskLine } from '../../../forms/index.js';
import type { DesignReport } from '../../design-report.js';
import { responseGrid } from '../../files/response-text.js';

/** Positive decibels and seconds over the grid of the pictures. */
export interface Curve {
  readonly attenuationDb: Float64Array;
  readonly returnLossDb: Float64Array;
  readonly delaySeconds: Float64Array;
}

/** What every picture with a frequency axis is drawn from. */
export interface CurveData {
  readonly hz: Float64Array;
  /** Ends of the wide picture. */
  readonly spanHz: readonly [number, number];
  /** Ends of the pictures of the passband. */
  readonly closeHz: readonly [number, number];
  /** With the loss of the design; equal to `lossless` where the design states none. */
  readonly lossy: Curve;
  readonly lossless: Curve;
  readonly hasLoss: boolean;
  readonly centerLossDb: number;
}

/** Extra points over each of the two spans: the response file may reach less far, and is coarse in the passband. */
const EVEN_POINTS = 601;
/** Extra points beside each pole, in its distances from the axis. */
const BENDS: readonly number[] = [-3, -1.5, -0.75, 0, 0.75, 1.5, 3];
/** Room in bandwidths that the wide picture leaves beside the band, beside the end of a mask line, and where one runs on. */
const BESIDE = { band: 0.75, end: 0.15, open: 0.8 } as const;
/** Farthest place that the wide picture reaches to, in omega. */
const FAR = 20;
/** Transmission zeros up to this |omega| are kept in the wide picture. */
const ZEROS_SHOWN = 6;
/** Lowest frequency of the wide picture as a share of the lower band edge: 0 Hz and less have no place in a band-pass. */
const LEAST_SHARE = 0.05;
/** Ends of the close pictures in omega: a quarter of the band on each side, up to twice that for a mask that reaches out. */
const CLOSE = 1.25;
const CLOSE_AT_MOST = 2;

/** A mask line that is about the passband and not about what is kept out. */
export function isInBand(line: MaskLine): boolean {
  return !('rejectionDb' in line);
}

function closeSpan(band: Band, mask: readonly MaskLine[]): readonly [number, number] {
  const ends = mask.filter(isInBand).flatMap(({ fromHz, toHz }) => [fromHz, toHz]);
  const reach = [hzFromOmega(band, -CLOSE_AT_MOST), hzFromOmega(band, CLOSE_AT_MOST)] as const;
  const room = 0.05 * band.bandwidthHz;
  const near = ends.filter((hz) => hz !== undefined).filter((hz) => hz - room > reach[0] && hz + room < reach[1]);
  return [
    Math.min(hzFromOmega(band, -CLOSE), ...near.map((hz) => hz - room)),
    Math.max(hzFromOmega(band, CLOSE), ...near.map((hz) => hz + room)),
  ];
}

/** What the wide picture shows: the sweep that was asked for, or else the band and everything that the mask asks around it. */
function wideSpan({ specification, mask }: DesignReport): readonly [number, number] {
  const { band, sweep } = specification;
  if (sweep !== undefined) return [sweep.fromHz, sweep.toHz];
  const { lowerHz, upperHz } = edgesOfBand(band);
  const [lowest, highest] = [hzFromOmega(band, -FAR), hzFromOmega(band, FAR)];
  const room = (share: number): number => share * band.bandwidthHz;
  const ends = mask.flatMap(({ line: { fromHz, toHz }, worstHz }) => {
    const open =
      fromHz === undefined
        ? [(toHz as number) - room(BESIDE.open)]
        : toHz === undefined
          ? [fromHz + room(BESIDE.open)]
          : [];
    const shut = [fromHz, toHz, worstHz].filter((hz) => typeof hz === 'number');
    return [...open, ...shut.flatMap((hz) => [hz - room(BESIDE.end), hz + room(BESIDE.end)])];
  });
  const zeros = specification.transmissionZeros
    .filter(({ re, im }) => re === 0 && Math.abs(im) < ZEROS_SHOWN)
    .flatMap(({ im }) => [hzFromOmega(band, im) - room(BESIDE.end), hzFromOmega(band, im) + room(BESIDE.end)]);
  const within = [...ends, ...zeros].filter((hz) => hz > lowest && hz < highest);
  const from = Math.min(lowerHz - room(BESIDE.band), ...within);
  return [Math.max(from, LEAST_SHARE * lowerHz), Math.max(upperHz + room(BESIDE.band), ...within)];
}

/** The points of the response file, more of them in the passband, and every notch and edge exactly. */
function gridOf(
  design: DesignReport,
  wideHz: readonly [number, number],
  closeHz: readonly [number, number],
): Float64Array {
  const { band } = design.specification;
  const { poles, reflectionZeros, transmissionZeros } = design.polynomials;
  const { lowerHz, upperHz } = edgesOfBand(band);
  const notches = [...reflectionZeros, ...transmissionZeros].map(({ im }) => im);
  // Near a pole a curve bends within the pole's distance from the axis.
  const bends = poles.flatMap(({ re, im }) => BENDS.map((share) => im + share * re));
  const marks = [...notches, ...bends].map((omega) => hzFromOmega(band, omega));
  const asked = design.mask.flatMap(({ line: { fromHz, toHz }, worstHz }) => [fromHz, toHz, worstHz]);
  const limits = asked.filter((hz) => typeof hz === 'number' && hz > 0);
  const even = [wideHz, closeHz].flatMap(([from, to]) =>
    Array.from({ length: EVEN_POINTS }, (_, n) => from + ((to - from) * n) / (EVEN_POINTS - 1)),
  );
  const all = [...responseGrid(design.specification), ...even, ...marks, ...limits, lowerHz, upperHz, band.centerHz];
  return Float64Array.from(new Set(all as number[])).sort();
}

function curveOf({ s11, s21, groupDelaySeconds }: SweepHz): Curve {
  return {
    attenuationDb: s21.re.map((re, n) => decibels(re, s21.im[n] as number)),
    returnLossDb: s11.re.map((re, n) => decibels(re, s11.im[n] as number)),
    delaySeconds: groupDelaySeconds,
  };
}

/** Sweeps a design once for all its pictures. */
export function curveData(design: DesignReport): CurveData {
  const { specification, polynomials, matrix } = design;
  const { band, unloadedQ, mask } = specification;
  const closeHz = closeSpan(band, mask);
  const spanHz = wideSpan(design);
  const hz = gridOf(design, spanHz, closeHz);
  const lossless = curveOf(sweepHz(polynomials, band, hz));
  // The transfer function keeps its digits in the deep stop band; only a list of Q needs the matrix.
  const model = typeof unloadedQ === 'object' ? matrix : polynomials;
  const lossy = unloadedQ === undefined ? lossless : curveOf(sweepHz(model, { ...band, unloadedQ }, hz));
  return {
    hz,
    spanHz,
    closeHz,
    lossy,
    lossless,
    hasLoss: unloadedQ !== undefined,
    centerLossDb: lossy.attenuationDb[hz.indexOf(band.centerHz)] as number,
  };
}

/** Largest of many numbers: a spread of a hundred thousand arguments would exceed what engines allow. */
export function greatest(values: Float64Array): number {
  return values.reduce((most, value) => Math.max(most, value), Number.NEGATIVE_INFINITY);
}
