import type { Candidate, Parameters } from './candidate.ts';
import type { Square } from './result.ts';
import type { Span } from './series.ts';

/**
 * Criteria from one ln L. The count k includes every estimated coefficient, the level, regression coefficients, an
 * estimated λ and σ². `aicc` is null where readings − k − 1 ≤ 0. Estimators without a likelihood have none at all.
 */
export interface Criteria {
  readonly aic: number;
  readonly aicc: number | null;
  readonly bic: number;
  readonly hq: number;
}

/** One local maximum of the likelihood that the search met. */
export interface Maximum {
  readonly parameters: Parameters;
  readonly logLikelihood: number;
  /** How many searches ended here. */
  readonly reached: number;
  /** An MA root lies on the unit circle. */
  readonly boundary: boolean;
  /** False: outside the admissible set (a spurious AR–MA pair near the circle, or an AR root on it). */
  readonly admissible: boolean;
}

/** How a search ended. `objective` is −ln L (or the sum of squares of the conditional estimator) at the answer. */
export interface Outcome {
  readonly status: 'converged' | 'boundary' | 'stalled' | 'closedForm';
  readonly iterations: number;
  readonly evaluations: number;
  readonly gradientNorm: number;
  readonly objective: number;
  readonly starts: number;
  /** Distinct maxima within 2 of the best in ln L, best first, and any better inadmissible one. */
  readonly maxima: readonly Maximum[];
}

export type WarningCode =
  | 'nearUnitAr'
  | 'maOnCircle'
  | 'overDifferenced'
  | 'commonFactor'
  | 'spuriousPair'
  | 'flatLikelihood'
  | 'severalMaxima'
  | 'fewReadings'
  | 'nearlyDeterministic'
  | 'digitsLost'
  | 'covarianceUnavailable'
  | 'informationDisagrees'
  | 'notConverged'
  | 'quantised';

/** A statistician's warning as data: the code and the numbers needed to say it. Words are the page's. */
export interface Warning {
  readonly code: WarningCode;
  readonly numbers: Readonly<Record<string, number>>;
  /** Coefficient names or other plain identifiers the warning is about. */
  readonly about?: readonly string[];
}

/**
 * A fitted candidate with the inputs that made it. `names` lists the estimated coefficients in the order of
 * `covariance` and `standardErrors`: φ1… θ1… Φ1… Θ1… then `mean` or `drift`, then β1… (lags held at zero are absent; σ²
 * is not in it). `covariance` is null where it may not be used, and a warning says why.
 */
export interface Fit {
  readonly candidate: Candidate;
  readonly seriesHash: string;
  readonly window: Span;
  readonly seed: number;
  readonly coreVersion: string;
  readonly parameters: Parameters;
  readonly names: readonly string[];
  readonly covariance: Square | null;
  readonly standardErrors: readonly number[] | null;
  /**
   * Standard error of an estimated Box–Cox λ, from the joint Hessian; null where ln L is not curved there. The other standard errors are
   * those for known λ.
   */
  readonly lambdaStandardError?: number | null;
  /** The exact Gaussian ln L at the estimates, all constants kept, whatever the estimator. */
  readonly logLikelihood: number;
  readonly criteria: Criteria;
  readonly readingsUsed: number;
  readonly parameterCount: number;
  readonly outcome: Outcome;
  readonly warnings: readonly Warning[];
}
