import type { Candidate } from '../contract/candidate.ts';
import type { Warning } from '../contract/fit.ts';
import type { CovarianceEnd } from './covarianceFromHessian.ts';
import { largestArModulus, largestMaModulus, nearestPair } from './search/admissibility.ts';
import { rootPairSpread } from './search/rootPairSpread.ts';
import type { Exploration, Summit } from './search/survey.ts';
import type { Coefficients } from './search/searchSpace.ts';

export interface WarningGrounds {
  readonly candidate: Candidate;
  readonly coefficients: Coefficients;
  readonly readings: number;
  readonly found: Exploration;
  readonly best: Summit;
  readonly covariance: CovarianceEnd | null;
  /** Indices into `coefficients.all` of the estimated ones, the order of the covariance. */
  readonly rows: readonly number[];
  /** Variance of the record before its last difference and after it, and the lag-one autocorrelation after it. */
  readonly differencing: { readonly before: number; readonly after: number; readonly lagOne: number } | null;
}

/** An AR modulus above 1 − 7/n leaves the mean and every interval to the unit-root question (common practice: 5 to 10). */
const NEAR_UNIT = 7;
/** From this MA modulus on, a differenced record is called over-differenced (common practice). */
const OVER_DIFFERENCED = 0.97;
/** Observed and asymptotic standard errors further apart than this factor disagree. */
const DISAGREEMENT = 2;
/** Maxima this close in ln L cannot be told apart by the data. */
const WITHIN = 2;
/** A pair this near the circle and to each other is suspect in a short record, though admissible. */
const SUSPECT = 0.05;
const SHORT = 200;

/**
 * What a statistician would say about a fit, as data.
 *
 * @returns warnings, most serious first; each with the numbers needed to say it
 */
export function fitWarnings(grounds: WarningGrounds): Warning[] {
  return [...searchWarnings(grounds), ...rootWarnings(grounds), ...curvatureWarnings(grounds)];
}

function searchWarnings({ found, best }: WarningGrounds): Warning[] {
  const warnings: Warning[] = [];
  const top = best.landing.logLikelihood;
  const spurious = found.summits.find(({ admissible, landing }) => !admissible && landing.logLikelihood > top);
  if (best.landing.status !== 'converged') {
    warnings.push({ code: 'notConverged', numbers: { gradientNorm: best.landing.gradientNorm } });
  }
  if (spurious !== undefined) {
    warnings.push({ code: 'spuriousPair', numbers: { gain: spurious.landing.logLikelihood - top, excluded: 1 } });
  }
  const rivals = found.summits.filter(({ admissible, landing }) => admissible && top - landing.logLikelihood <= WITHIN);
  if (rivals.length > 1) {
    const gap = top - rivals[1]!.landing.logLikelihood;
    warnings.push({ code: 'severalMaxima', numbers: { count: rivals.length, gap } });
  }
  return warnings;
}

function rootWarnings({ candidate, coefficients, readings, best, covariance, rows, differencing }: WarningGrounds) {
  const warnings: Warning[] = [];
  const { order } = candidate;
  warnings.push(...nearUnit(coefficients, order.s, readings));
  if (best.landing.held.some((value) => value !== 0)) {
    warnings.push({ code: 'maOnCircle', numbers: { modulus: 1, d: order.d, D: order.D } });
  }
  const seasonal = largestMaModulus({ ma: new Float64Array(0), seasonalMa: coefficients.seasonalMa }, 1);
  const regular = largestMaModulus({ ma: coefficients.ma, seasonalMa: new Float64Array(0) }, 1);
  const over = (order.d > 0 && regular >= OVER_DIFFERENCED) || (order.D > 0 && seasonal >= OVER_DIFFERENCED);
  if (over && differencing !== null) {
    warnings.push({
      code: 'overDifferenced',
      numbers: { modulus: Math.max(order.d > 0 ? regular : 0, order.D > 0 ? seasonal : 0), ...differencing },
    });
  }
  const known = covariance?.ok === true ? covariance : null;
  const pair = rootPairSpread(coefficients, order.s, rows, known);
  if (pair !== null) warnings.push({ code: 'commonFactor', numbers: { ...pair } });
  const close = nearestPair(coefficients, order.s, 1 - SUSPECT);
  if (close !== null && close.distance <= SUSPECT && readings < SHORT) {
    warnings.push({ code: 'spuriousPair', numbers: { ...close, excluded: 0 } });
  }
  return warnings;
}

/** An AR root near the circle; one of a seasonal factor is judged in Bˢ, by the number of seasons. */
function nearUnit({ ar, seasonalAr }: Coefficients, season: number, readings: number): Warning[] {
  const none = new Float64Array(0);
  const regular = { modulus: largestArModulus({ ar, seasonalAr: none }, 1), limit: 1 - NEAR_UNIT / readings, readings };
  const seasons = readings / Math.max(season, 1);
  const seasonal = {
    modulus: largestArModulus({ ar: none, seasonalAr }, 1),
    limit: Math.max(0.5, 1 - NEAR_UNIT / seasons),
    readings,
  };
  const near = [regular, seasonal].find(({ modulus, limit }) => modulus > limit);
  return near === undefined ? [] : [{ code: 'nearUnitAr', numbers: near }];
}

function curvatureWarnings({ covariance, best }: WarningGrounds): Warning[] {
  if (covariance === null) {
    const onCircle = best.landing.held.some((value) => value !== 0);
    return onCircle ? [{ code: 'covarianceUnavailable', numbers: { onCircle: 1 } }] : [];
  }
  if (!covariance.ok) {
    const numbers = { smallest: covariance.smallest, error: covariance.error };
    const flat: Warning[] = covariance.reason === 'flat' ? [{ code: 'flatLikelihood', numbers }] : [];
    return [
      ...flat,
      { code: 'covarianceUnavailable', numbers: { ...numbers, onCircle: 0 }, about: [covariance.reason] },
    ];
  }
  if (covariance.ratio > DISAGREEMENT) {
    return [{ code: 'informationDisagrees', numbers: { ratio: covariance.ratio } }];
  }
  return [];
}
