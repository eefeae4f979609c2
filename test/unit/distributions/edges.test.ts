import { describe, expect, it } from 'vitest';
import { chiSquareCdf } from '../../../workers/distributions/chiSquareCdf.ts';
import { chiSquareQuantile } from '../../../workers/distributions/chiSquareQuantile.ts';
import { chiSquareUpperTail } from '../../../workers/distributions/chiSquareUpperTail.ts';
import { complementaryErrorFunction } from '../../../workers/distributions/complementaryErrorFunction.ts';
import { errorFunction } from '../../../workers/distributions/errorFunction.ts';
import { fisherFCdf } from '../../../workers/distributions/fisherFCdf.ts';
import { fisherFQuantile } from '../../../workers/distributions/fisherFQuantile.ts';
import { fisherFUpperTail } from '../../../workers/distributions/fisherFUpperTail.ts';
import { incompleteBeta } from '../../../workers/distributions/incompleteBeta.ts';
import { incompleteGamma } from '../../../workers/distributions/incompleteGamma.ts';
import { kolmogorovUpperTail } from '../../../workers/distributions/kolmogorovUpperTail.ts';
import { logGamma } from '../../../workers/distributions/logGamma.ts';
import { normalCdf } from '../../../workers/distributions/normalCdf.ts';
import { normalPdf } from '../../../workers/distributions/normalPdf.ts';
import { normalQuantile } from '../../../workers/distributions/normalQuantile.ts';
import { normalUpperTail } from '../../../workers/distributions/normalUpperTail.ts';
import { quantileByTails } from '../../../workers/distributions/quantileByTails.ts';
import { stirlingRemainder } from '../../../workers/distributions/stirlingRemainder.ts';
import { studentTCdf } from '../../../workers/distributions/studentTCdf.ts';
import { studentTPdf } from '../../../workers/distributions/studentTPdf.ts';
import { studentTQuantile } from '../../../workers/distributions/studentTQuantile.ts';
import { studentTUpperTail } from '../../../workers/distributions/studentTUpperTail.ts';
import { weightedChiSquareUpperTail } from '../../../workers/distributions/weightedChiSquareUpperTail.ts';

/** What each function says at the ends of its domain and beyond them. Limits are those of the definitions. */
const cases: [string, number, number][] = [
  ['ln Γ at 0', logGamma(0), NaN],
  ['ln Γ below 0', logGamma(-1.5), NaN],
  ['ln Γ of NaN', logGamma(NaN), NaN],
  ['ln Γ at Infinity', logGamma(Infinity), Infinity],
  ['ln Γ(1)', logGamma(1), 0],
  ['ln Γ(2)', logGamma(2), 0],
  ['Stirling remainder at 0', stirlingRemainder(0), NaN],
  ['Stirling remainder at Infinity', stirlingRemainder(Infinity), 0],
  ['erf at −Infinity', errorFunction(-Infinity), -1],
  ['erf at Infinity', errorFunction(Infinity), 1],
  ['erf of NaN', errorFunction(NaN), NaN],
  ['erf at 0', errorFunction(0), 0],
  ['erfc at −Infinity', complementaryErrorFunction(-Infinity), 2],
  ['erfc at Infinity', complementaryErrorFunction(Infinity), 0],
  ['erfc of NaN', complementaryErrorFunction(NaN), NaN],
  ['normal tail at −Infinity', normalUpperTail(-Infinity), 1],
  ['normal tail at Infinity', normalUpperTail(Infinity), 0],
  ['normal tail at 0', normalUpperTail(0), 0.5],
  ['normal tail of NaN', normalUpperTail(NaN), NaN],
  ['normal tail beyond the smallest number', normalUpperTail(40), 0],
  ['normal cdf at −Infinity', normalCdf(-Infinity), 0],
  ['normal density at Infinity', normalPdf(Infinity), 0],
  ['normal density of NaN', normalPdf(NaN), NaN],
  ['normal quantile at 0', normalQuantile(0), -Infinity],
  ['normal quantile at 1', normalQuantile(1), Infinity],
  ['normal quantile at ½', normalQuantile(0.5), 0],
  ['normal quantile beyond 1', normalQuantile(1.2), NaN],
  ['normal quantile of NaN', normalQuantile(NaN), NaN],
  ['chi-square tail at 0', chiSquareUpperTail(0, 3), 1],
  ['chi-square tail below 0', chiSquareUpperTail(-1, 2), 1],
  ['chi-square tail at Infinity', chiSquareUpperTail(Infinity, 2), 0],
  ['chi-square tail, no degrees of freedom', chiSquareUpperTail(3, 0), NaN],
  ['chi-square tail, negative degrees of freedom', chiSquareUpperTail(-3, -2), NaN],
  ['chi-square tail, infinite degrees of freedom', chiSquareUpperTail(-3, Infinity), NaN],
  ['chi-square tail of NaN', chiSquareUpperTail(NaN, 2), NaN],
  ['chi-square cdf below 0', chiSquareCdf(-1, 2), 0],
  ['chi-square cdf, no degrees of freedom', chiSquareCdf(1, 0), NaN],
  ['chi-square cdf, NaN degrees of freedom', chiSquareCdf(-1, NaN), NaN],
  ['chi-square quantile at 0', chiSquareQuantile(0, 2), 0],
  ['chi-square quantile at 1', chiSquareQuantile(1, 2), Infinity],
  ['chi-square quantile of an upper tail of 0', chiSquareQuantile(0, 2, true), Infinity],
  ['chi-square quantile, no degrees of freedom', chiSquareQuantile(0.5, 0), NaN],
  ['chi-square quantile beyond 1', chiSquareQuantile(2, 2), NaN],
  ['chi-square quantile of NaN', chiSquareQuantile(NaN, 2), NaN],
  ['t tail at Infinity', studentTUpperTail(Infinity, 3), 0],
  ['t tail at −Infinity', studentTUpperTail(-Infinity, 3), 1],
  ['t tail at 0', studentTUpperTail(0, 3), 0.5],
  ['t tail, no degrees of freedom', studentTUpperTail(1, 0), NaN],
  ['t tail of NaN', studentTUpperTail(NaN, 4), NaN],
  ['t cdf, NaN degrees of freedom', studentTCdf(1, NaN), NaN],
  ['t tail, infinite degrees of freedom', studentTUpperTail(1.5, Infinity), normalUpperTail(1.5)],
  ['t density, infinite degrees of freedom', studentTPdf(1.5, Infinity), normalPdf(1.5)],
  ['t density at Infinity', studentTPdf(Infinity, 2), 0],
  ['t density, negative degrees of freedom', studentTPdf(0, -1), NaN],
  ['t quantile at 0', studentTQuantile(0, 5), -Infinity],
  ['t quantile at 1', studentTQuantile(1, 5), Infinity],
  ['t quantile at ½', studentTQuantile(0.5, 5), 0],
  ['t quantile, no degrees of freedom', studentTQuantile(0.5, 0), NaN],
  ['t quantile below 0', studentTQuantile(-0.1, 5), NaN],
  ['t quantile, infinite degrees of freedom', studentTQuantile(0.9, Infinity), normalQuantile(0.9)],
  ['F tail below 0', fisherFUpperTail(-1, 2, 3), 1],
  ['F tail at Infinity', fisherFUpperTail(Infinity, 2, 3), 0],
  ['F tail, no degrees of freedom', fisherFUpperTail(1, 0, 3), NaN],
  ['F tail, no degrees of freedom below', fisherFUpperTail(1, 3, 0), NaN],
  ['F tail of NaN', fisherFUpperTail(NaN, 3, 3), NaN],
  ['F cdf at 0', fisherFCdf(0, 2, 3), 0],
  ['F cdf at Infinity', fisherFCdf(Infinity, 2, 3), 1],
  ['F cdf, infinite degrees of freedom', fisherFCdf(1, 2, Infinity), NaN],
  ['F quantile at 0', fisherFQuantile(0, 2, 3), 0],
  ['F quantile at 1', fisherFQuantile(1, 2, 3), Infinity],
  ['F quantile, negative degrees of freedom', fisherFQuantile(0.5, 2, -3), NaN],
  ['Kolmogorov tail at 0', kolmogorovUpperTail(0), 1],
  ['Kolmogorov tail below 0', kolmogorovUpperTail(-2), 1],
  ['Kolmogorov tail near 0', kolmogorovUpperTail(1e-3), 1],
  ['Kolmogorov tail at Infinity', kolmogorovUpperTail(Infinity), 0],
  ['Kolmogorov tail of NaN', kolmogorovUpperTail(NaN), NaN],
  ['weighted tail, no weight', weightedChiSquareUpperTail([], 1), NaN],
  ['weighted tail, zero weights', weightedChiSquareUpperTail([0, 0], 1), NaN],
  ['weighted tail, negative weight', weightedChiSquareUpperTail([1, -1], 1), NaN],
  ['weighted tail, infinite weight', weightedChiSquareUpperTail([1, Infinity], 1), NaN],
  ['weighted tail, NaN weight', weightedChiSquareUpperTail([1, NaN], 1), NaN],
  ['weighted tail of NaN', weightedChiSquareUpperTail([1], NaN), NaN],
  ['weighted tail below 0', weightedChiSquareUpperTail([1], -1), 1],
  ['weighted tail at Infinity', weightedChiSquareUpperTail([1], Infinity), 0],
  ['weighted tail beyond the smallest number', weightedChiSquareUpperTail([1, 0.5], 1e5), 0],
  ['weighted tail, zeros dropped', weightedChiSquareUpperTail([1, 0, 1], 2), weightedChiSquareUpperTail([1, 1], 2)],
  ['incomplete gamma, a = 0', incompleteGamma(0, 1).lower, NaN],
  ['incomplete gamma, infinite a', incompleteGamma(Infinity, 1).upper, NaN],
  ['incomplete gamma, x < 0', incompleteGamma(1, -1).upper, NaN],
  ['incomplete gamma at 0', incompleteGamma(1, 0).upper, 1],
  ['incomplete gamma at Infinity', incompleteGamma(1, Infinity).lower, 1],
  ['incomplete beta, b = 0', incompleteBeta(1, 0, 0.5).lower, NaN],
  ['incomplete beta, x > 1', incompleteBeta(1, 1, 1.5).lower, NaN],
  ['incomplete beta at 0', incompleteBeta(2, 3, 0).upper, 1],
  ['incomplete beta at 1', incompleteBeta(2, 3, 1).lower, 1],
];

describe('ends of the domain', () => {
  it.each(cases)('%s', (_name, ours, expected) => {
    // −0 counts as 0.
    expect(ours + 0).toBe(expected);
  });
});

describe('quantileByTails', () => {
  const exponential = { cdf: (x: number) => -Math.expm1(-x), upperTail: (x: number) => Math.exp(-x) };

  it.each([1e-300, 1e-12, 0.2, 0.5, 0.99])('of the exponential law at %d is −ln(1 − p)', (p) => {
    expect(Math.abs(quantileByTails(exponential, p, 0) / -Math.log1p(-p) - 1)).toBeLessThan(1e-15);
    expect(Math.abs(quantileByTails(exponential, p, 0, true) / -Math.log(p) - 1)).toBeLessThan(1e-15);
  });

  it('begins where the law begins', () => {
    const shifted = {
      cdf: (x: number) => exponential.cdf(x - 7),
      upperTail: (x: number) => exponential.upperTail(x - 7),
    };
    expect(Math.abs(quantileByTails(shifted, 0.5, 7) - (7 + Math.LN2))).toBeLessThan(1e-14);
    expect(quantileByTails(shifted, 0, 7)).toBe(7);
  });

  it('has no answer where the tails have none', () => {
    expect(quantileByTails({ cdf: () => NaN, upperTail: () => NaN }, 0.3, 0)).toBeNaN();
    expect(quantileByTails(exponential, -0.1, 0)).toBeNaN();
  });
});
