import { createHash } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { differencingPolynomial } from '../../../workers/model/differencingPolynomial.ts';
import { differenceRecord } from '../../../workers/series/differenceRecord.ts';
import { hashValues } from '../../../workers/series/hashValues.ts';
import { regressionColumns } from '../../../workers/series/regressionColumns.ts';
import { backTransform, transformRecord } from '../../../workers/series/transformRecord.ts';

describe('differencing', () => {
  test('squares: first differences are odd numbers, second ones 2', () => {
    const squares = Float64Array.from({ length: 6 }, (_, t) => t * t);
    expect([...differenceRecord(squares, Float64Array.of(1, -1))]).toEqual([1, 3, 5, 7, 9]);
    expect([...differenceRecord(squares, Float64Array.of(1, -2, 1))]).toEqual([2, 2, 2, 2]);
  });

  test('a gap spoils every difference it enters and no other', () => {
    const values = Float64Array.of(1, 2, NaN, 4, 5, 6, 7);
    const result = differenceRecord(values, differencingPolynomial({ d: 1, D: 1, s: 2 }));
    // z_t − z_{t−1} − z_{t−2} + z_{t−3}, t = 3…6; the gap is at 2.
    expect(Array.from(result, Number.isNaN)).toEqual([true, true, true, false]);
    expect(result[3]).toBe(7 - 6 - 5 + 4);
  });

  test('a record shorter than its lags has no difference', () => {
    expect(differenceRecord(Float64Array.of(1), Float64Array.of(1, -1))).toHaveLength(0);
    expect(differenceRecord(new Float64Array(0), Float64Array.of(1, -1))).toHaveLength(0);
  });
});

describe('transforms', () => {
  const values = Float64Array.of(0.5, NaN, 2, 8);

  test('λ = 0 is the logarithm, λ = 1 the reading less 1, λ = ½ is 2(√y − 1) (Box & Cox 1964)', () => {
    const power = (lambda: number) => transformRecord(values, { kind: 'boxCox', lambda });
    for (const [lambda, of] of [
      [0, Math.log],
      [1, (y: number) => y - 1],
      [0.5, (y: number) => 2 * (Math.sqrt(y) - 1)],
      [-1, (y: number) => 1 - 1 / y],
    ] as const) {
      const made = power(lambda);
      if (!made.ok) throw new Error(made.failure.code);
      [0, 2, 3].forEach((t) => expect(made.value.values[t]).toBeCloseTo(of(values[t]!), 13));
      expect(made.value.values[1]).toBeNaN();
      // d/dy (y^λ − 1)/λ = y^{λ−1}
      [0, 2, 3].forEach((t) => expect(made.value.logJacobian![t]).toBeCloseTo((lambda - 1) * Math.log(values[t]!), 13));
      [0, 2, 3].forEach((t) =>
        expect(backTransform(made.value.values[t]!, lambda, { kind: 'boxCox', lambda })).toBeCloseTo(values[t]!, 12),
      );
    }
  });

  test('a power near 0 does not lose the digits that (y^λ − 1)/λ loses', () => {
    const made = transformRecord(values, { kind: 'boxCox', lambda: 1e-12 });
    if (!made.ok) throw new Error(made.failure.code);
    expect(made.value.values[3]).toBeCloseTo(Math.log(8), 11);
  });

  test('zero and negative readings are refused with the first place and the count', () => {
    expect(transformRecord(Float64Array.of(1, 0, 3, -2), { kind: 'log' })).toEqual({
      ok: false,
      failure: { code: 'transformDomain', transform: 'log', index: 1, value: 0, count: 2 },
    });
  });
});

describe('columns of the regression', () => {
  const order = (d: number, D: number, s: number) => ({ p: 0, d, q: 0, P: 0, D, Q: 0, s });

  test.each([
    [1, 0, 0],
    [2, 0, 0],
    [0, 1, 4],
    [1, 1, 4],
    [1, 2, 3],
  ])('d %i, D %i, s %i: the differenced drift column is 1', (d, D, s) => {
    const made = regressionColumns(candidateOf({ order: order(d, D, s), level: 'drift' }), 40);
    if (!made.ok) throw new Error(made.failure.code);
    expect(made.value.names).toEqual(['drift']);
    const differenced = differenceRecord(made.value.columns[0]!, differencingPolynomial({ d, D, s }));
    differenced.forEach((value) => expect(value).toBeCloseTo(1, 9));
  });

  test('step, pulse, ramp, harmonic and a lagged covariate, by hand', () => {
    const made = regressionColumns(
      candidateOf({
        order: order(0, 0, 0),
        level: 'mean',
        regressors: [
          { kind: 'step', at: 2 },
          { kind: 'pulse', at: 2 },
          { kind: 'ramp', at: 2 },
          { kind: 'harmonic', period: 4, k: 1 },
          { kind: 'harmonic', period: 4, k: 2 },
          { kind: 'column', id: 'feed', lag: 1 },
        ],
      }),
      5,
      { feed: Float64Array.of(10, 20, 30, 40, 50) },
    );
    if (!made.ok) throw new Error(made.failure.code);
    expect(made.value.names).toEqual(['mean', 'β1', 'β2', 'β3', 'β4', 'β5', 'β6', 'β7']);
    const wanted = [
      [1, 1, 1, 1, 1],
      [0, 0, 1, 1, 1],
      [0, 0, 1, 0, 0],
      [0, 0, 0, 1, 2],
      [1, 0, -1, 0, 1],
      [0, 1, 0, -1, 0],
      [1, -1, 1, -1, 1],
      [NaN, 10, 20, 30, 40],
    ];
    wanted.forEach((column, i) =>
      column.forEach((value, t) =>
        Number.isNaN(value)
          ? expect(made.value.columns[i]![t]).toBeNaN()
          : expect(made.value.columns[i]![t]).toBeCloseTo(value, 14),
      ),
    );
  });

  test('covariates that are absent or too short are named', () => {
    const candidate = candidateOf({ order: order(0, 0, 0), regressors: [{ kind: 'column', id: 'feed', lag: 0 }] });
    expect(regressionColumns(candidate, 5)).toEqual({ ok: false, failure: { code: 'columnMissing', column: 'feed' } });
    expect(regressionColumns(candidate, 5, { feed: new Float64Array(4) })).toEqual({
      ok: false,
      failure: { code: 'columnLength', column: 'feed', length: 4, needed: 5 },
    });
  });
});

describe('fingerprint', () => {
  test('is SHA-256 of the little-endian doubles, cut to 32 digits (FIPS 180-4, by node:crypto)', () => {
    const values = Float64Array.of(1, -2.5, 1e-300);
    const bytes = Buffer.alloc(24);
    [...values].forEach((value, i) => bytes.writeDoubleLE(value, 8 * i));
    expect(hashValues(values)).toBe(createHash('sha256').update(bytes).digest('hex').slice(0, 32));
  });

  test('every gap is the same gap, −0 is 0, order and value matter', () => {
    const odd = new Float64Array(new BigUint64Array([0x7ff8000000000001n, 0x3ff0000000000000n]).buffer);
    expect(hashValues(odd)).toBe(hashValues(Float64Array.of(NaN, 1)));
    expect(hashValues(Float64Array.of(-0))).toBe(hashValues(Float64Array.of(0)));
    expect(hashValues(Float64Array.of(1, 2))).not.toBe(hashValues(Float64Array.of(2, 1)));
    expect(hashValues(Float64Array.of(1))).not.toBe(hashValues(Float64Array.of(1 + 2 ** -52)));
  });
});
