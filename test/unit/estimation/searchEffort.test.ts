import { describe, expect, it } from 'vitest';
import type { Order } from '../../../workers/contract/candidate.ts';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { createRandom } from '../../../workers/numeric/random.ts';

const ORDER: Order = { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 };

/** (1 − 0.8B)(1 − 0.4B^s) z = (1 + 0.4B)(1 − 0.3B^s) e, by its recursion after a run-in. */
function simulated(n: number, seed: number, s: number): Float64Array {
  const random = createRandom(seed);
  const e = Float64Array.from({ length: n + 600 }, () => random.normal());
  const u = e.map((value, t) => value + 0.4 * (e[t - 1] ?? 0));
  const w = s > 0 ? u.map((value, t) => value - 0.3 * (u[t - s] ?? 0)) : u;
  const z = new Float64Array(w.length);
  for (let t = 0; t < z.length; t++) {
    const seasonal = s > 0 ? 0.4 * ((z[t - s] ?? 0) - 0.8 * (z[t - s - 1] ?? 0)) : 0;
    z[t] = w[t]! + 0.8 * (z[t - 1] ?? 0) + seasonal;
  }
  return z.slice(600);
}

/**
 * A first answer is to cost at most 400 evaluations of the likelihood up to three coefficients and 1 500 up to eight
 * (n ≥ 1000). An evaluation with its gradient costs two to four plain ones and the covariance some sixty to three
 * hundred more, which leaves these numbers for the search itself.
 */
describe('the first answer', () => {
  it.each([
    [{ p: 1 }, 60],
    [{ p: 1, q: 1 }, 60],
    [{ p: 2, q: 1 }, 80],
    [{ p: 1, q: 1, P: 1, Q: 1, s: 12 }, 120],
    [{ q: 1, d: 1, Q: 1, D: 1, s: 7 }, 120],
  ])('of %o is found in few evaluations', (order, most) => {
    const full = { ...ORDER, ...order };
    for (const seed of [1, 2, 3]) {
      const result = fitCandidate({
        values: simulated(1000, seed, full.s),
        candidate: candidateOf({ order: full, level: full.d + full.D > 0 ? 'none' : 'mean' }),
        seed,
        effort: 'first',
      });
      if (!result.ok) throw new Error(JSON.stringify(result.failure));
      expect(result.value.outcome.evaluations).toBeLessThanOrEqual(most);
    }
  });

  it('is that of the wide search on well-behaved records', () => {
    for (const seed of [1, 2, 3]) {
      const request = {
        values: simulated(600, seed, 0),
        candidate: candidateOf({ order: { ...ORDER, p: 1, q: 1 }, level: 'mean' }),
        seed,
      };
      const [first, thorough] = [fitCandidate({ ...request, effort: 'first' }), fitCandidate(request)];
      if (!first.ok || !thorough.ok) throw new Error('A fit failed.');
      expect(thorough.value.logLikelihood).toBeGreaterThanOrEqual(first.value.logLikelihood - 1e-9);
      expect(first.value.logLikelihood).toBeCloseTo(thorough.value.logLikelihood, 6);
    }
  });
});
