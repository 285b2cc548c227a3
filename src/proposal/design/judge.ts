import { generalizedChebyshev } from '../../approximation/index.js';
import { decibels, evaluateMask, type LossyBand, sweepHz } from '../../bandpass/index.js';
import { edgesOfBand, type FilterPolynomials, hzFromOmega, type MaskLine, type MaskRow } from '../../forms/index.js';
import type { BestZeros } from './best-zeros.js';
import { endedFarOut } from './far-ends.js';
import { lineWords, missWords } from './line-words.js';
import type { MaskCost, ProposedDesign, SmallerDesign } from './proposal.js';
import type { CheckedRequest } from './request.js';

/** A design that meets every line, or what it misses in words. */
export type Verdict =
  | { readonly design: ProposedDesign; readonly misses?: undefined }
  | { readonly misses: readonly string[]; readonly design?: undefined };

/** Costs below this share are left out: a lobe that only touches. */
const SMALLEST_WEIGHT = 1e-3;

/** The real response, loss included, against every line of the mask. */
export function judge(request: CheckedRequest, zeros: BestZeros, smaller: () => readonly SmallerDesign[]): Verdict {
  const { band, unloadedQ, mask, returnLossDb } = request;
  const { order, transmissionZeros, symmetric, lossless } = zeros;
  const response = generalizedChebyshev({ order, returnLossDb, transmissionZeros });
  const lossy: LossyBand = unloadedQ === undefined ? band : { ...band, unloadedQ };
  const { lowerHz, upperHz } = edgesOfBand(band);
  const whole: MaskLine = { fromHz: lowerHz, toHz: upperHz, groupDelayVariationSeconds: 0 };
  // The lines of the passband first: they are cheap, and most that exclude a design are among them.
  const inBand = rowsOf(
    response,
    lossy,
    mask.map((line) => ('rejectionDb' in line ? undefined : line)),
  );
  const early = missesOf(request, inBand);
  if (early.length > 0) return { misses: early };
  const outside = rowsOf(
    response,
    lossy,
    mask.map((line) => ('rejectionDb' in line ? line : undefined)),
  );
  const late = missesOf(request, outside);
  if (late.length > 0) return { misses: late };
  const judged = mask.map((_, n) => (inBand[n] ?? outside[n]) as MaskRow);
  const { s21 } = sweepHz(response, lossy, [band.centerHz, lowerHz, upperHz]);
  const lossAt = (n: number): number => decibels(s21.re[n] as number, s21.im[n] as number);
  return {
    design: {
      order,
      transmissionZeros,
      symmetric,
      marginDb: Math.min(...judged.filter(({ line }) => 'rejectionDb' in line).map(({ margin }) => margin)),
      lossless: { lowestDb: lossless.lowestDb, highestDb: lossless.highestDb },
      ...(zeros.promisedDb === undefined ? {} : { promisedDb: zeros.promisedDb }),
      mask: judged,
      insertionLossDb: { center: lossAt(0), lowerEdge: lossAt(1), upperEdge: lossAt(2) },
      groupDelayVariationSeconds: (evaluateMask(response, lossy, [whole])[0] as MaskRow).predicted,
      costs: costsOf(request, zeros),
      smaller: smaller(),
      remarks: remarksOf(zeros),
    },
  };
}

/** Rows of the lines that are given, at their own indexes. */
function rowsOf(
  response: FilterPolynomials,
  band: LossyBand,
  lines: readonly (MaskLine | undefined)[],
): readonly (MaskRow | undefined)[] {
  const kept = lines.filter((line) => line !== undefined);
  const rows = evaluateMask(
    response,
    band,
    kept.map((line) => endedFarOut(line, band, response.order)),
  );
  return lines.map((line) => (line === undefined ? undefined : { ...(rows[kept.indexOf(line)] as MaskRow), line }));
}

/** Lines that miss the wanted margin by more than the rounding of a worst point. */
function missesOf({ margins }: CheckedRequest, rows: readonly (MaskRow | undefined)[]): readonly string[] {
  return rows.flatMap((row, index) => {
    if (row === undefined) return [];
    const { line, margin, limit } = row;
    const missing = wantedFor(line, margins) - margin;
    const room = 1e-9 * Math.max(Math.abs(limit), 'groupDelayVariationSeconds' in line ? 0 : 1);
    return missing > room ? [`${lineWords(line, index)}, is missed by ${missWords(line, missing)}`] : [];
  });
}

/** The margin wanted on a line. */
export function wantedFor(line: MaskLine, margins: CheckedRequest['margins']): number {
  if ('rejectionDb' in line) return margins.rejectionDb;
  if ('returnLossDb' in line) return margins.returnLossDb;
  if ('insertionLossDb' in line) return margins.insertionLossDb;
  if ('insertionLossVariationDb' in line) return margins.insertionLossVariationDb;
  return margins.groupDelayVariationSeconds;
}

/** How near to the smallest margin, dB, a place counts as holding it. */
const HELD_DB = 1e-3;

/** A promise of more than this, dB, is told. */
const UNSETTLED_DB = 1e-3;

/** With all zeros at work the margin is held at one place more than there are zeros; loss that fills a notch takes places away. */
function remarksOf({ promisedDb, transmissionZeros, marginDb, costs, symmetric }: BestZeros): readonly string[] {
  if (promisedDb === undefined) return [];
  const unknowns = transmissionZeros.length / (symmetric ? 2 : 1);
  const held = costs.filter((cost) => cost.marginDb - marginDb < HELD_DB).length;
  const settled =
    promisedDb < UNSETTLED_DB
      ? []
      : [`The search with loss did not settle: a small move of the zeros still promises ${promisedDb.toFixed(4)} dB.`];
  if (held > unknowns) return settled;
  return [
    ...settled,
    `Loss fills the notches: the margin is held at ${held} places only, where ${transmissionZeros.length} zeros could hold it at ${unknowns + 1}; a zero is partly wasted at this unloaded Q.`,
  ];
}

function costsOf({ band }: CheckedRequest, { costs }: BestZeros): readonly MaskCost[] {
  return costs
    .filter(({ weight }) => weight > SMALLEST_WEIGHT)
    .map(({ line, omega, weight }) => ({ line, hz: hzFromOmega(band, omega), weight }))
    .sort((a, b) => b.weight - a.weight);
}
