import type { Candidate } from '../contract/candidate.ts';

/**
 * Names of the estimated coefficients in the order of a fit's covariance: φ1… θ1… Φ1… Θ1… without the lags held at
 * zero, then `mean` or `drift`, then β1…
 *
 * @param regressionCount number of regression columns, two for a harmonic
 */
export function coefficientNames(candidate: Candidate, regressionCount: number): string[] {
  const { order, zeroLags, level } = candidate;
  const factor = (letter: string, count: number, zero: readonly number[]) =>
    Array.from({ length: count }, (_, i) => i + 1)
      .filter((lag) => !zero.includes(lag))
      .map((lag) => `${letter}${lag}`);
  return [
    ...factor('φ', order.p, zeroLags.ar),
    ...factor('θ', order.q, zeroLags.ma),
    ...factor('Φ', order.P, zeroLags.seasonalAr),
    ...factor('Θ', order.Q, zeroLags.seasonalMa),
    ...(level === 'none' ? [] : [level]),
    ...Array.from({ length: regressionCount }, (_, i) => `β${i + 1}`),
  ];
}
