import { describe, expect, test } from 'vitest';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { createRandom } from '../../../workers/numeric/random.ts';

/** Share of records of a seasonal AR(1) whose right model is warned of; the limit on the modulus of Φ is 1 − 7 seasons⁻¹ (common practice: 5 to 10). */
function warnedShare(seasonalAr: number, s: number, n: number, records: number): number {
  let warned = 0;
  for (let seed = 1; seed <= records; seed++) {
    const random = createRandom(seed);
    const all: number[] = [];
    for (let t = 0; t < n + 40 * s; t++) all.push(random.normal() + (t < s ? 0 : seasonalAr * all[t - s]!));
    const order = { p: 0, d: 0, q: 0, P: 1, D: 0, Q: 0, s };
    const fit = fitCandidate({
      values: Float64Array.from(all.slice(-n)),
      candidate: candidateOf({ order }),
      seed: 1,
      effort: 'first',
    });
    if (fit.ok && fit.value.warnings.some(({ code }) => code === 'nearUnitAr')) warned++;
  }
  return warned / records;
}

describe('a seasonal AR root is judged by the number of seasons', () => {
  test('Φ = .5 over 25 seasons is seldom called near unit', () => {
    expect(warnedShare(0.5, 12, 300, 60)).toBeLessThan(0.1);
  });
  test('Φ = .99 over 25 seasons nearly always is', () => {
    expect(warnedShare(0.99, 12, 300, 60)).toBeGreaterThan(0.8);
  });
});
