/**
 * One way of evaluating the exact likelihood of a fixed set of series that share an ARMA covariance: the (differenced)
 * record first, then the columns of its regression.
 *
 * After `evaluate`, `cross` is the row-major symmetric matrix of a′V⁻¹b over all series, V the covariance for unit
 * innovation variance, and `logDeterminant` is ln |V|. The first `flat` columns behind the record are those with a flat prior that
 * is integrated out (starting values of differencing across gaps), not profiled.
 */
export interface Engine {
  readonly kind: 'fast' | 'filter' | 'diffuse';
  /** Number of series, the record among them. */
  readonly count: number;
  readonly flat: number;
  readonly cross: Float64Array;
  readonly logDeterminant: number;
  /** Values of the record that enter. */
  readonly observed: number;
  /** False where the AR part is not stationary or rounding has eaten the answer. */
  evaluate(ar: Float64Array, ma: Float64Array): boolean;
}
