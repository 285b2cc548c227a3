import { denseSolve } from './dense-solve.js';

/**
 * Weights of the lobes, none negative, that add up to 1 and under which the gradients cancel: weight i is the decibels of
 * margin lost for each decibel that the mask rises at lobe i. Undefined where the gradients do not determine them.
 */
export function lobeWeights(gradients: readonly (readonly number[])[]): readonly number[] | undefined {
  const count = gradients.length;
  const rows = Array.from({ length: count }, (_, j) =>
    gradients.map((gradient) => (j < count - 1 ? (gradient[j] as number) : 1)),
  );
  const right = Array.from({ length: count }, (_, j) => (j < count - 1 ? 0 : 1));
  return denseSolve(rows, right);
}
