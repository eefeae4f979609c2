import { expect, test } from 'vitest';
import type { Parameters } from '../../../workers/contract/candidate.ts';
import { exactLogLikelihood } from '../../../workers/estimation/exactLikelihood.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';

/** Exact algebra on y = (1.0, 0.5, −0.3, 0.8, 1.2), σ² = 0.5, mean 0 known, in 34-digit arithmetic. */
const tiny = [1.0, 0.5, -0.3, 0.8, 1.2];
const at = (ar: number[], ma: number[]): Parameters => ({
  ar,
  ma,
  seasonalAr: [],
  seasonalMa: [],
  mean: 0,
  regression: [],
  innovationVariance: 0.5,
});
const logLikelihood = (values: number[], ar: number[], ma: number[]) =>
  exactLogLikelihood(
    Float64Array.from(values),
    candidateOf({ order: { p: ar.length, d: 0, q: ma.length, P: 0, D: 0, Q: 0, s: 0 } }),
    at(ar, ma),
  );

test.each([
  ['AR(1)', [0.6], [], -5.57376826593771],
  ['AR(2)', [0.5, 0.3], [], -5.95511862797608],
  ['MA(1)', [], [0.6], -5.27652503794316],
  ['MA(1) with its root on the circle', [], [-1], -9.48603778257086],
  ['ARMA(1,1)', [0.5], [0.4], -5.43121481913725],
] as const)('%s', (_name, ar, ma, expected) => {
  expect(logLikelihood(tiny, [...ar], [...ma])).toBeCloseTo(expected, 12);
});

test('AR(1) with the third reading missing', () => {
  expect(logLikelihood([1.0, 0.5, NaN, 0.8, 1.2], [0.6], [])).toBeCloseTo(-4.11739273171052, 12);
});
