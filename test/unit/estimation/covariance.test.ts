import { describe, expect, it } from 'vitest';
import type { Candidate, Parameters } from '../../../workers/contract/candidate.ts';
import { exactLogLikelihood } from '../../../workers/estimation/exactLikelihood.ts';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { solveLinear } from '../../../workers/numeric/matrix.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

/** All parameters in a row, σ² last, and back. */
const flat = (at: Parameters, level: boolean) => [
  ...at.ar,
  ...at.ma,
  ...at.seasonalAr,
  ...at.seasonalMa,
  ...(level ? [at.mean] : []),
  ...at.regression,
  at.innovationVariance,
];
function unflat(values: readonly number[], like: Parameters, level: boolean): Parameters {
  let at = 0;
  const take = (count: number) => values.slice(at, (at += count));
  return {
    ar: take(like.ar.length),
    ma: take(like.ma.length),
    seasonalAr: take(like.seasonalAr.length),
    seasonalMa: take(like.seasonalMa.length),
    mean: level ? take(1)[0]! : 0,
    regression: take(like.regression.length),
    innovationVariance: take(1)[0]!,
  };
}

/** The joint information by plain second differences of ln L in every parameter, σ² among them, and its inverse. */
function jointCovariance(values: Float64Array, candidate: Candidate, at: Parameters, errors: readonly number[]) {
  const level = candidate.level !== 'none';
  const centre = flat(at, level);
  const size = centre.length;
  const steps = centre.map((value, i) => (i < size - 1 ? 0.02 * errors[i]! : 0.002 * value));
  const height = (moves: readonly [number, number][]) => {
    const moved = centre.slice();
    for (const [i, sign] of moves) moved[i]! += sign * steps[i]!;
    return exactLogLikelihood(values, candidate, unflat(moved, at, level));
  };
  const information = new Float64Array(size * size);
  const here = height([]);
  for (let i = 0; i < size; i++) {
    information[i * size + i] = -(height([[i, 1]]) + height([[i, -1]]) - 2 * here) / steps[i]! ** 2;
    for (let j = 0; j < i; j++) {
      const mixed =
        height([[i, 1], [j, 1]]) - height([[i, 1], [j, -1]]) - height([[i, -1], [j, 1]]) + height([[i, -1], [j, -1]]); // prettier-ignore
      information[i * size + j] = -mixed / (4 * steps[i]! * steps[j]!);
      information[j * size + i] = information[i * size + j]!;
    }
  }
  return Array.from({ length: size }, (_, i) => {
    const unit = new Float64Array(size);
    unit[i] = 1;
    return [...solveLinear({ n: size, values: information }, unit)!];
  });
}

describe('the covariance of a fit', () => {
  const ORDER = { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 };
  const nile = publishedSeries('nile');
  const logs = publishedSeries('airline').map(Math.log);
  const cases: [string, Float64Array, Candidate][] = [
    [
      'ARMA(1,1), mean and ramp',
      publishedSeries('lakeHuron'),
      candidateOf({ order: { ...ORDER, p: 1, q: 1 }, level: 'mean', regressors: [{ kind: 'ramp', at: 40 }] }),
    ],
    [
      'AR(2) with gaps and mean',
      nile.map((value, t) => (t % 9 === 4 ? NaN : value)),
      candidateOf({ order: { ...ORDER, p: 2 }, level: 'mean' }),
    ],
    ['seasonal with drift', logs, candidateOf({ order: { ...ORDER, q: 1, d: 1, Q: 1, s: 12, P: 1 }, level: 'drift' })],
  ];

  it.each(cases)('is that of the joint Hessian: %s', (_, values, candidate) => {
    const result = fitCandidate({ values, candidate, seed: 3 });
    if (!result.ok) throw new Error(JSON.stringify(result.failure));
    const { covariance, standardErrors, parameters } = result.value;
    const joint = jointCovariance(values, candidate, parameters, standardErrors!);
    const n = covariance!.n;
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) {
        // Plain differences of ln L are good to four digits here.
        const difference = covariance!.values[i * n + j]! - joint[i]![j]!;
        expect(Math.abs(difference) / (standardErrors![i]! * standardErrors![j]!)).toBeLessThan(2e-3);
      }
    }
  });
});
