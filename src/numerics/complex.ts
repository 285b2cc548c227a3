import { Complex as ComplexNumber } from 'complex.js';
import type { Complex } from './complex-type.js';

export const complex = (re: number, im: number): Complex => ({ re, im });

export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });

export const subtract = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im });

export const multiply = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});

export const scale = (a: Complex, factor: number): Complex => ({ re: a.re * factor, im: a.im * factor });

export const conjugate = (a: Complex): Complex => ({ re: a.re, im: -a.im });

export const magnitude = (a: Complex): number => Math.hypot(a.re, a.im);

/** Quotient by Smith's scaling: no overflow of the squared denominator (R. L. Smith, Algorithm 116, Comm. ACM 5, 1962; from memory). */
export function divide(a: Complex, b: Complex): Complex {
  if (Math.abs(b.re) >= Math.abs(b.im)) {
    const ratio = b.im / b.re;
    const denominator = b.re + b.im * ratio;
    return { re: (a.re + a.im * ratio) / denominator, im: (a.im - a.re * ratio) / denominator };
  }
  const ratio = b.re / b.im;
  const denominator = b.re * ratio + b.im;
  return { re: (a.re * ratio + a.im) / denominator, im: (a.im * ratio - a.re) / denominator };
}

/** Principal square root, real part >= 0. */
export function squareRoot(a: Complex): Complex {
  const { re, im } = new ComplexNumber(a.re, a.im).sqrt();
  return { re, im };
}

/** `j^exponent` for any whole exponent, exact. */
export function powerOfJ(exponent: number): Complex {
  const turns = ((exponent % 4) + 4) % 4;
  const table = [complex(1, 0), complex(0, 1), complex(-1, 0), complex(0, -1)];
  return table[turns] ?? complex(1, 0);
}

/** Principal natural logarithm. */
export function logarithm(a: Complex): Complex {
  return { re: Math.log(Math.hypot(a.re, a.im)), im: Math.atan2(a.im, a.re) };
}
