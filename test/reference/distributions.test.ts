import { describe, expect, test } from 'vitest';
import { chiSquareCdf } from '../../workers/distributions/chiSquareCdf.ts';
import { chiSquareQuantile } from '../../workers/distributions/chiSquareQuantile.ts';
import { chiSquareUpperTail } from '../../workers/distributions/chiSquareUpperTail.ts';
import { complementaryErrorFunction } from '../../workers/distributions/complementaryErrorFunction.ts';
import { errorFunction } from '../../workers/distributions/errorFunction.ts';
import { fisherFCdf } from '../../workers/distributions/fisherFCdf.ts';
import { fisherFQuantile } from '../../workers/distributions/fisherFQuantile.ts';
import { fisherFUpperTail } from '../../workers/distributions/fisherFUpperTail.ts';
import { kolmogorovUpperTail } from '../../workers/distributions/kolmogorovUpperTail.ts';
import { logGamma } from '../../workers/distributions/logGamma.ts';
import { normalCdf } from '../../workers/distributions/normalCdf.ts';
import { normalPdf } from '../../workers/distributions/normalPdf.ts';
import { normalQuantile } from '../../workers/distributions/normalQuantile.ts';
import { normalUpperTail } from '../../workers/distributions/normalUpperTail.ts';
import { studentTCdf } from '../../workers/distributions/studentTCdf.ts';
import { studentTPdf } from '../../workers/distributions/studentTPdf.ts';
import { studentTQuantile } from '../../workers/distributions/studentTQuantile.ts';
import { studentTUpperTail } from '../../workers/distributions/studentTUpperTail.ts';
import { weightedChiSquareUpperTail } from '../../workers/distributions/weightedChiSquareUpperTail.ts';
import reference from './distributions.json' with { type: 'json' };

/*
 * 50-digit reference numbers by mpmath (generate/distributions.py, which names the series used).
 *
 * Tolerance 2e−13, relative, in both tails: an exponent of up to 670 (values down to 1e−290) carries a rounding of half a unit in its last place,
 * 7e−14 in the value, and a few such roundings add.
 */
const TOLERANCE = 2e-13;
/** ln Γ, erf, the normal quantile and the sum of weighted chi-squares in these cases keep their digits to a few units in the last places. */
const LAST_PLACES = 2e-14;

const close = (ours: number, exact: number, tolerance = TOLERANCE) => {
  const error = exact === 0 ? Math.abs(ours) : Math.abs(ours / exact - 1);
  expect(error, `${ours} against ${exact}`).toBeLessThanOrEqual(tolerance);
};
type Row<N extends string> = N extends 'two'
  ? [number, number]
  : N extends 'three'
    ? [number, number, number]
    : number[];

describe('against 50-digit arithmetic', () => {
  test.each(reference.logGamma as Row<'two'>[])('ln Γ(%d)', (x, value) => {
    close(logGamma(x), value, LAST_PLACES);
  });
  test.each(reference.errorFunction as [number, number, number, number][])('erf %d', (x, erf, erfc, mirrored) => {
    close(errorFunction(x), erf, LAST_PLACES);
    close(errorFunction(-x), -erf, LAST_PLACES);
    close(complementaryErrorFunction(x), erfc);
    close(complementaryErrorFunction(-x), mirrored, LAST_PLACES);
  });
  test.each(reference.normal as Row<'three'>[])('normal %d', (x, upper, density) => {
    close(normalUpperTail(x), upper);
    close(normalCdf(-x), upper);
    close(normalPdf(x), density);
  });
  test.each(reference.normalQuantile as Row<'two'>[])('normal quantile of %d', (p, x) => {
    close(normalQuantile(p), x, LAST_PLACES);
  });
  test.each(reference.chiSquare as [number, number, number, number][])('chi-square %d, %d', (x, df, lower, upper) => {
    close(chiSquareCdf(x, df), lower);
    close(chiSquareUpperTail(x, df), upper);
  });
  test.each(reference.chiSquareQuantile as Row<'three'>[])('chi-square quantile of %d, %d', (p, df, x) => {
    close(chiSquareQuantile(p, df), x);
  });
  test.each(reference.studentT as [number, number, number, number][])('t %d, %d', (t, df, upper, density) => {
    close(studentTUpperTail(t, df), upper);
    close(studentTCdf(-t, df), upper);
    close(studentTPdf(t, df), density);
    close(studentTPdf(-t, df), density);
  });
  test.each(reference.studentTQuantile as Row<'three'>[])('t quantile of %d, %d', (p, df, t) => {
    close(studentTQuantile(p, df), t);
  });
  test.each(reference.fisherF as [number, number, number, number, number][])(
    'F %d, %d, %d',
    (x, d1, d2, lower, upper) => {
      close(fisherFCdf(x, d1, d2), lower);
      close(fisherFUpperTail(x, d1, d2), upper);
    },
  );
  test.each(reference.fisherFQuantile as [number, number, number, number][])(
    'F quantile of %d, %d, %d',
    (p, d1, d2, x) => {
      close(fisherFQuantile(p, d1, d2), x);
    },
  );
  test.each(reference.kolmogorov as Row<'two'>[])('Kolmogorov %d', (x, upper) => {
    close(kolmogorovUpperTail(x), upper, LAST_PLACES);
  });
  test.each(reference.weighted as [number[], number, number][])('weighted chi-squares %j, %d', (weights, x, upper) => {
    close(weightedChiSquareUpperTail(weights, x), upper, LAST_PLACES);
  });
});
