import { weightedChiSquareUpperTail } from '../distributions/weightedChiSquareUpperTail.ts';

/** Terms kept of the infinite sum; the rest enters by its mean, with an error below 1e−7 in the tail. */
const TERMS = 400;

/**
 * P(η > x) of the limit law of the KPSS statistic.
 *
 * Method: the integral of a squared Brownian bridge (of first or second level) is Σ λ_j X_j, X_j chi-squares of one degree of freedom. Level:
 * λ_j = 1/(jπ)², the Cramér–von Mises law (Anderson & Darling 1952, Ann. Math. Stat. 23, 193–212). Trend: λ_j = 1/(2jπ)² and 1/(2x_j)² with
 * tan x_j = x_j > 0, the law of residuals from a line (MacNeill 1978, Ann. Stat. 6, 422–433). The terms left out are replaced by their mean.
 *
 * @param x any number; @param trend deterministic part removed
 * @returns 1 for x ≤ 0, NaN for NaN
 * @example constant, x = 0.461361: 0.05
 */
export function kpssUpperTail(x: number, trend: 'constant' | 'trend'): number {
  if (Number.isNaN(x)) return NaN;
  const { weights, rest } = (laws[trend] ??= lawOf(trend));
  return weightedChiSquareUpperTail(weights, x - rest);
}

interface Law {
  readonly weights: Float64Array;
  readonly rest: number;
}

const laws: { constant?: Law; trend?: Law } = {};

function lawOf(trend: 'constant' | 'trend'): Law {
  const weights: number[] = [];
  for (let j = 1; weights.length < TERMS; j++) {
    if (trend === 'constant') weights.push(1 / (j * Math.PI) ** 2);
    else weights.push(1 / (2 * j * Math.PI) ** 2, 1 / (2 * tangentRoot(j)) ** 2);
  }
  // The weights sum to the mean of the law: 1/6 and 1/15.
  const kept = weights.reduceRight((sum, weight) => sum + weight, 0);
  return { weights: Float64Array.from(weights), rest: (trend === 'constant' ? 1 / 6 : 1 / 15) - kept };
}

/** The j-th positive root of tan x = x, by iterating x = (j + ½)π − atan(1/x), a contraction. */
function tangentRoot(j: number): number {
  const asymptote = (j + 0.5) * Math.PI;
  let x = asymptote;
  for (let i = 0; i < 12; i++) x = asymptote - Math.atan(1 / x);
  return x;
}
