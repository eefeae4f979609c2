import { expect, test } from 'vitest';
import type { Parameters } from '../../../workers/contract/candidate.ts';
import { exactLogLikelihood } from '../../../workers/estimation/exactLikelihood.ts';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { lambdaError } from '../../../workers/estimation/lambdaError.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { solveLinear } from '../../../workers/numeric/matrix.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const ORDER = { p: 0, d: 1, q: 1, P: 0, D: 1, Q: 1, s: 12 };

test('the standard error of λ is that of the joint Hessian of ln L over θ, Θ, ln σ² and λ (airline passengers)', () => {
  const values = publishedSeries('airline');
  const candidate = candidateOf({ order: ORDER, transform: { kind: 'boxCox', lambda: 'estimate' } });
  const result = fitCandidate({ values, candidate, seed: 1, effort: 'first' });
  if (!result.ok) throw new Error(result.failure.code);
  const fit = result.value;
  const { ma, seasonalMa, innovationVariance, lambda } = fit.parameters;
  const centre = [ma[0]!, seasonalMa[0]!, Math.log(innovationVariance), lambda!];
  const height = (at: readonly number[]) => {
    const { ar, seasonalAr, mean, regression } = fit.parameters;
    const innovationVariance = Math.exp(at[2]!);
    const parameters: Parameters = {
      ar,
      ma: [at[0]!],
      seasonalAr,
      seasonalMa: [at[1]!],
      mean,
      regression,
      innovationVariance,
    };
    const held = candidateOf({ order: ORDER, transform: { kind: 'boxCox', lambda: at[3]! } });
    return exactLogLikelihood(values, held, parameters);
  };
  // Plain second differences: λ and σ² lean on each other so strongly that their steps must be small.
  const steps = [2e-3, 2e-3, 2e-3, 2e-4];
  const moved = (...moves: readonly [number, number][]) => {
    const at = centre.slice();
    for (const [i, sign] of moves) at[i]! += sign * steps[i]!;
    return height(at);
  };
  const information = new Float64Array(16);
  for (let i = 0; i < 4; i++) {
    for (let j = 0; j < 4; j++) {
      const mixed =
        moved([i, 1], [j, 1]) - moved([i, 1], [j, -1]) - moved([i, -1], [j, 1]) + moved([i, -1], [j, -1]); // prettier-ignore
      information[i * 4 + j] = -mixed / (4 * steps[i]! * steps[j]!);
    }
  }
  const column = solveLinear({ n: 4, values: information }, Float64Array.of(0, 0, 0, 1))!;
  expect(fit.lambdaStandardError! / Math.sqrt(column[3]!)).toBeCloseTo(1, 2);
});

test('a parabola gives its own curvature, and where ln L does not bend there is no standard error', () => {
  expect(lambdaError((x) => -((x - 0.3) ** 2) / (2 * 0.04), 0.3, 0)).toBeCloseTo(0.2, 12);
  expect(lambdaError(() => 5, 0.3, 5)).toBeNull();
  expect(lambdaError((x) => (x > 0.3 ? -Infinity : -x), 0.3, 0)).toBeNull();
});
