/**
 * An (N+2) x (N+2) coupling matrix: real, symmetric, row and column 0 = source, 1..N resonators, N+1 = load.
 *
 * With `A = M + omega*U - j*R` (U = 1 on the resonators' diagonal, R = 1 on the ports' diagonal):
 * `S21 = -2j*[A^-1](N+1,0)`, `S11 = -1 - 2j*[A^-1](0,0)`, `S22 = -1 - 2j*[A^-1](N+1,N+1)`.
 */
export interface CouplingMatrix {
  readonly order: number;
  readonly values: readonly (readonly number[])[];
  /** How many finite transmission zeros the response has, where that is known; decides which couplings are structurally 0. */
  readonly finiteZeros?: number;
}

/**
 * One plane rotation `M' = R M R^T`: `R_ii = R_jj = cos(angle)`, `R_ij = -sin(angle)`, `R_ji = sin(angle)`
 * for `pivot` = [i, j]; then the resonators in `flip` get the opposite reference direction (their row and column change sign).
 */
export interface Rotation {
  readonly pivot: readonly [number, number];
  readonly angle: number;
  readonly flip?: readonly number[];
}
