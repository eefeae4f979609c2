import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { diagnoseFit } from '../../workers/diagnostics/diagnoseFit.ts';
import { autocorrelation } from '../../workers/identification/autocorrelation.ts';
import { partialAutocorrelation } from '../../workers/identification/partialAutocorrelation.ts';
import { predictReadings } from '../../workers/prediction/predictReadings.ts';
import { heldFit } from '../helpers/heldFit.ts';

/** Readings with some gaps, at least a few observed and not all equal. */
const records = fc
  .array(
    fc.oneof({ weight: 6, arbitrary: fc.integer({ min: -500, max: 500 }) }, { weight: 1, arbitrary: fc.constant(NaN) }),
    {
      minLength: 20,
      maxLength: 60,
    },
  )
  .map((values) => Float64Array.from(values))
  .filter((values) => new Set(values.filter((value) => !Number.isNaN(value))).size > 5);
/** Powers of two change no digit. */
const scales = fc.integer({ min: -20, max: 20 }).map((power) => 2 ** power);

const near = (found: ArrayLike<number>, wanted: ArrayLike<number>, tolerance: number) => {
  expect(found.length).toBe(wanted.length);
  for (let i = 0; i < wanted.length; i++) {
    if (Number.isNaN(wanted[i]!)) expect(found[i]).toBeNaN();
    else expect(Math.abs(found[i]! - wanted[i]!)).toBeLessThanOrEqual(tolerance * Math.max(1, Math.abs(wanted[i]!)));
  }
};

describe('invariances', () => {
  it('autocorrelations do not change with unit, origin or direction of time', () => {
    fc.assert(
      fc.property(records, scales, fc.integer({ min: -1000, max: 1000 }), (values, scale, origin) => {
        const { correlations } = autocorrelation(values, 10);
        near(
          autocorrelation(
            values.map((value) => scale * (value + origin)),
            10,
          ).correlations,
          correlations,
          1e-10,
        );
        near(autocorrelation(values.slice().reverse(), 10).correlations, correlations, 1e-10);
      }),
    );
  });

  it('autocorrelations of a record without gaps stay within ±1, and so do the partial ones', () => {
    fc.assert(
      fc.property(records, (values) => {
        const whole = values.map((value) => (Number.isNaN(value) ? 0 : value));
        const { correlations } = autocorrelation(whole, 10);
        const partial = partialAutocorrelation(correlations);
        for (const value of [...correlations, ...partial]) expect(Math.abs(value)).toBeLessThanOrEqual(1);
        expect(partial[0]).toBeCloseTo(correlations[0]!, 14);
      }),
    );
  });

  it('evidence does not change with the unit: standardised innovations, correlations, p-values', () => {
    fc.assert(
      fc.property(records, scales, (values, scale) => {
        const model = (unit: number) =>
          heldFit(values.length, { p: 1, q: 1 }, 'mean', {
            ar: [0.6],
            ma: [0.3],
            mean: 4 * unit,
            innovationVariance: 1e4 * unit ** 2,
          });
        const at = (unit: number) => {
          const made = diagnoseFit({ fit: model(unit), values: values.map((value) => unit * value), coverage: 0.9 });
          if (!made.ok) throw new Error(made.failure.code);
          return made.value;
        };
        const [one, other] = [at(1), at(scale)];
        near(other.innovations.standardised, one.innovations.standardised, 1e-10);
        near(other.correlogram.correlations, one.correlogram.correlations, 1e-10);
        near(other.portmanteau.pValues, one.portmanteau.pValues, 1e-9);
        near(other.correlogram.bands, one.correlogram.bands, 1e-12);
      }),
      { numRuns: 40 },
    );
  });

  it('a prediction one step ahead is what the next innovation is taken from', () => {
    fc.assert(
      fc.property(records, fc.integer({ min: 10, max: 19 }), (values, origin) => {
        const fit = heldFit(values.length, { p: 1, q: 1 }, 'mean', {
          ar: [0.7],
          ma: [-0.4],
          mean: 3,
          innovationVariance: 50,
        });
        const made = diagnoseFit({ fit, values, coverage: 0.9 });
        if (!made.ok) throw new Error(made.failure.code);
        const { expected, standardError } = predictReadings(fit, values, 1, { origin });
        const { values: errors, standardDeviations } = made.value.innovations;
        if (Number.isNaN(values[origin]!)) expect(errors[origin]).toBeNaN();
        else {
          near([errors[origin]!], [values[origin]! - expected[0]!], 1e-9);
          near([standardDeviations[origin]!], [standardError[0]!], 1e-12);
        }
      }),
      { numRuns: 60 },
    );
  });
});
