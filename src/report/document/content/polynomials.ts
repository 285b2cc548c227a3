import type { Complex } from '../../../forms/index.js';
import type { DesignReport } from '../../design-report.js';
import { type Column, type Row, type Table, textColumn } from './content.js';

const FIGURES = 12;
/** Below this share of the largest value a number is rounding, and two figures tell its size. */
const ROUNDING = 1e-16;
const ROUNDING_FIGURES = 2;

const PARTS: readonly Column[] = [
  { head: 'Real', kind: 'figures' },
  { head: 'Imaginary', kind: 'figures' },
];

/** A number with twelve figures; the power of ten stands behind it where it is far from 1. */
function figuresText(value: number, scale: number): string {
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size < ROUNDING * scale) return value.toExponential(ROUNDING_FIGURES - 1);
  return size < 1e-3 || size >= 1e6 ? value.toExponential(FIGURES - 1) : value.toPrecision(FIGURES);
}

function largest(values: readonly Complex[]): number {
  return Math.max(0, ...values.flatMap(({ re, im }) => [Math.abs(re), Math.abs(im)]));
}

function rowsOf(name: string, values: readonly Complex[], nameOf: (n: number) => string): readonly Row[] {
  const scale = largest(values);
  return values.map(({ re, im }, n) => ({
    cells: [`${name} ${nameOf(n)}`, figuresText(re, scale), figuresText(im, scale)],
  }));
}

/** Roots of E (poles), F (reflection zeros) and P (transmission zeros) in the normalized s-plane. */
export function rootTable({ polynomials }: DesignReport): Table {
  const number = (n: number): string => String(n + 1);
  return {
    id: 'roots',
    caption: 'Roots of E, F and P in the low-pass plane',
    columns: [textColumn('Root'), ...PARTS],
    rows: [
      ...rowsOf('E', polynomials.poles, number),
      ...rowsOf('F', polynomials.reflectionZeros, number),
      ...rowsOf('P', polynomials.transmissionZeros, number),
    ],
    note: 'E: poles. F: reflection zeros. P: finite transmission zeros. All other zeros of transmission lie at infinity.',
  };
}

/** Coefficients of E, F and P, and the two constants beside them. */
export function coefficientTable({ coefficients }: DesignReport): Table {
  const power = (n: number): string => `s^${n}`;
  const { e, f, p, epsilon, epsilonR } = coefficients;
  const constants = [
    ['epsilon', epsilon],
    ['epsilonR', epsilonR],
  ] as const;
  return {
    id: 'coefficients',
    caption: 'Coefficients of E, F and P, and epsilon',
    columns: [textColumn('Coefficient'), ...PARTS],
    rows: [
      ...rowsOf('E', e, power),
      ...rowsOf('F', f, power),
      ...rowsOf('P', p, power),
      ...constants.map(([name, value]): Row => ({ cells: [name, figuresText(value, value), ''] })),
    ],
    note: 'S21 = P/(epsilon*E), S11 = F/(epsilonR*E). Above about order 20 coefficients in twelve figures no longer fix the response: use the roots.',
  };
}
