/** dB for each neper of amplitude. */
const DB_PER_NEPER = 20 / Math.LN10;

/** Where cosh would leave the range of doubles; `cosh G = exp(G)/2` to every digit long before. */
const LARGE = 300;

/** `kappa = sqrt(10^(RL/10) - 1)`, the inverse of the ripple constant of an equiripple response. */
export function kappaOf(returnLossDb: number): number {
  return Math.sqrt(Math.expm1((returnLossDb * Math.LN10) / 10));
}

/** Lossless rejection, dB, where the filtering function is `cosh G`: `10 log10(1 + cosh^2 G/kappa^2)`. */
export function rejectionDb(potential: number, kappa: number): number {
  if (potential > LARGE) return DB_PER_NEPER * (potential - Math.log(2 * kappa));
  const ratio = Math.cosh(potential) / kappa;
  return (DB_PER_NEPER / 2) * Math.log1p(ratio * ratio);
}

/** Its derivative with respect to G. */
export function rejectionSlope(potential: number, kappa: number): number {
  if (potential > LARGE) return DB_PER_NEPER;
  const cosh = Math.cosh(potential);
  return (DB_PER_NEPER * cosh * Math.sinh(potential)) / (kappa * kappa + cosh * cosh);
}

/** The G that a rejection needs; 0 where the level lies below the ripple of the band. */
export function potentialFor(levelDb: number, kappa: number): number {
  if (levelDb > DB_PER_NEPER * LARGE) return levelDb / DB_PER_NEPER + Math.log(2 * kappa);
  const cosh = kappa * Math.sqrt(Math.expm1((levelDb * Math.LN10) / 10));
  return cosh > 1 ? Math.acosh(cosh) : 0;
}
