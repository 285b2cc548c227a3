import { type Band, edgesOfBand, type Level, type MaskLine } from '../../forms/index.js';
import { FilterFailure, refusal } from '../../numerics/index.js';
import { lineWords } from './line-words.js';

/**
 * Refuses what no filter can do, before any is searched, and names both sides of the contradiction. Rejection within the
 * passband, or against an insertion loss that counts from the same level, has been refused by the check of the mask.
 *
 * @throws FilterFailure E_MASK
 */
export function refuseContradictions(mask: readonly MaskLine[], band: Band, returnLossDb: number): void {
  const wanted = mask.filter((line) => 'rejectionDb' in line && highest(line.rejectionDb) > 0);
  if (wanted.length === 0)
    throw refusal(
      'E_MASK',
      'mask',
      'no line with a rejection above 0 dB',
      'at least one',
      'without it one resonator is enough: say where the filter has to reject',
    );
  mask.forEach((line, index) => {
    if ('rejectionDb' in line) {
      refuseTouching(line, index, band);
      mask.forEach((other, k) => {
        refuseAgainst(line, index, other, k);
      });
    }
    if ('returnLossDb' in line && highest(line.returnLossDb) > returnLossDb)
      throw contradiction(
        lineWords(line, index),
        `a design for returnLossDb ${returnLossDb} dB`,
        'raise returnLossDb, or lower the line',
      );
  });
}

function refuseTouching(line: MaskLine & { readonly rejectionDb: Level }, index: number, band: Band): void {
  const { lowerHz, upperHz } = edgesOfBand(band);
  const apart = (line.fromHz ?? 0) > upperHz || (line.toHz ?? Number.POSITIVE_INFINITY) < lowerHz;
  if (highest(line.rejectionDb) === 0 || apart) return;
  const passband = `the passband from ${lowerHz / 1e6} to ${upperHz / 1e6} MHz`;
  throw contradiction(lineWords(line, index), passband, 'end the line outside the passband and its drift');
}

/** Power that must not pass, and power that must not come back or be lost, at one frequency. */
function refuseAgainst(
  line: MaskLine & { readonly rejectionDb: Level },
  index: number,
  other: MaskLine,
  k: number,
): void {
  if (!overlap(line, other)) return;
  const rejection = lowest(line.rejectionDb);
  const words = [lineWords(line, index), lineWords(other, k)] as const;
  const advice = `change mask[${index}] or mask[${k}]`;
  if ('returnLossDb' in other) {
    const power = 10 ** (-rejection / 10) + 10 ** (-lowest(other.returnLossDb) / 10);
    if (power < 1) throw contradiction(...words, advice);
  }
  if ('insertionLossDb' in other && other.relativeTo === undefined && rejection > highest(other.insertionLossDb))
    throw contradiction(...words, advice);
}

function contradiction(one: string, other: string, advice: string): Error {
  const message = `E_MASK mask: found ${one}, against ${other}; allowed lines that one filter can meet; ${advice}`;
  return new FilterFailure('E_MASK', message, { argument: 'mask', value: [one, other], hint: advice });
}

function overlap(a: MaskLine, b: MaskLine): boolean {
  const from = Math.max(a.fromHz ?? 0, b.fromHz ?? 0);
  const to = Math.min(a.toHz ?? Number.POSITIVE_INFINITY, b.toHz ?? Number.POSITIVE_INFINITY);
  return from < to || (from === to && (a.fromHz === a.toHz || b.fromHz === b.toHz));
}

const lowest = (level: Level): number => (typeof level === 'number' ? level : Math.min(...level));
const highest = (level: Level): number => (typeof level === 'number' ? level : Math.max(...level));
