import fc from 'fast-check';
import { expect, test } from 'vitest';
import { GapFilter } from '../../../workers/estimation/engine/gapFilter.ts';
import { startingValues } from '../../../workers/estimation/engine/startingValues.ts';
import { differencingPolynomial } from '../../../workers/model/differencingPolynomial.ts';

/** Readings the filter spends on starting values, by index. */
function spentByFilter(record: Float64Array, differencing: Float64Array): number[] {
  const spent: number[] = [];
  const ma = Float64Array.of(-0.4);
  const filter = new GapFilter([record], 0, 1, differencing, (t, _errors, variance, seen) => {
    if (seen && variance === Infinity) spent.push(t);
  });
  expect(filter.evaluate(new Float64Array(0), ma)).toBe(true);
  return spent;
}

test('the filter spends the readings that fix the starting values, whatever is missing', () => {
  const differences = fc.constantFrom(
    { d: 1, D: 0, s: 0 },
    { d: 2, D: 0, s: 0 },
    { d: 3, D: 0, s: 0 },
    { d: 0, D: 1, s: 7 },
    { d: 1, D: 1, s: 4 },
    { d: 2, D: 1, s: 3 },
    { d: 0, D: 2, s: 5 },
  );
  fc.assert(
    fc.property(differences, fc.array(fc.boolean(), { minLength: 1, maxLength: 60 }), (kind, seen) => {
      const record = Float64Array.from(seen, (one, t) => (one ? Math.sin(t * t) : NaN));
      const differencing = differencingPolynomial(kind);
      const { rank, spent } = startingValues(record, differencing);
      const found = spentByFilter(record, differencing);
      expect(found).toHaveLength(rank);
      expect(found).toEqual([...spent.keys()].filter((t) => spent[t] === 1));
    }),
    { numRuns: 300 },
  );
});

test('a phase of the season that is never observed has no starting value', () => {
  const record = Float64Array.from({ length: 70 }, (_, t) => (t % 7 === 6 ? NaN : t));
  expect(startingValues(record, differencingPolynomial({ d: 0, D: 1, s: 7 })).rank).toBe(6);
  // With a difference of the first order as well six phases still leave one combination of the eight free.
  expect(startingValues(record, differencingPolynomial({ d: 1, D: 1, s: 7 })).rank).toBe(7);
});
