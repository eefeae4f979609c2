import { describe, expect, test } from 'vitest';
import { exactLogLikelihood } from '../../workers/estimation/exactLikelihood.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import cases from './exactLikelihood34.json' with { type: 'json' };

/**
 * Models at the edges of the admissible region, where dense double arithmetic is itself too coarse, against 34-digit
 * arithmetic by the definition (generate/exactLikelihood34.py, mpmath). Tolerance: 1e-11·max(n, |ln L|), the rounding of a sum of n
 * terms with room.
 */
describe(`${cases.length} models at the edges against 34-digit arithmetic`, () => {
  test.each(cases.map((each) => [each.name, each] as const))('%s', (_name, each) => {
    const values = Float64Array.from(each.values, (value) => value ?? NaN);
    const ours = exactLogLikelihood(values, candidateOf({ order: each.order }), each.at);
    expect(Math.abs(ours - each.exact)).toBeLessThan(1e-11 * Math.max(values.length, Math.abs(each.exact)));
  });
});
