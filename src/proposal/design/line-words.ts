import type { Level, MaskLine } from '../../forms/index.js';

/** A mask line in words, with its index: `mask[2], rejection of 40 dB from 1958 MHz up`. */
export function lineWords(line: MaskLine, index: number): string {
  return `mask[${index}], ${levelWords(line)} ${spanWords(line)}`;
}

function levelWords(line: MaskLine): string {
  if ('rejectionDb' in line) return `rejection of ${decibelWords(line.rejectionDb)}`;
  if ('returnLossDb' in line) return `return loss of ${decibelWords(line.returnLossDb)}`;
  if ('insertionLossDb' in line) return `insertion loss to ${decibelWords(line.insertionLossDb)}`;
  if ('insertionLossVariationDb' in line) return `loss variation to ${line.insertionLossVariationDb} dB`;
  return `delay variation to ${Number((line.groupDelayVariationSeconds * 1e9).toPrecision(6))} ns`;
}

function decibelWords(level: Level): string {
  return typeof level === 'number' ? `${level} dB` : `${level[0]} to ${level[1]} dB`;
}

function spanWords({ fromHz, toHz }: MaskLine): string {
  if (fromHz === undefined) return `up to ${megahertz(toHz as number)} MHz`;
  if (toHz === undefined) return `from ${megahertz(fromHz)} MHz up`;
  if (fromHz === toHz) return `at ${megahertz(fromHz)} MHz`;
  return `from ${megahertz(fromHz)} to ${megahertz(toHz)} MHz`;
}

const megahertz = (hz: number): string => String(Number((hz / 1e6).toPrecision(9)));

/** A miss in the unit of the line. */
export function missWords(line: MaskLine, missing: number): string {
  if ('groupDelayVariationSeconds' in line) return `${Number((missing * 1e9).toPrecision(3))} ns`;
  return `${Number(missing.toPrecision(3))} dB`;
}
