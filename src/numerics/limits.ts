/** Unit spacing of doubles at 1: 2^-52. Every limit in the package is a small multiple of this, a size and a scale. */
export const EPS: number = 2 ** -52;
