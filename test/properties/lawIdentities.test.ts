import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { chiSquareCdf } from '../../workers/distributions/chiSquareCdf.ts';
import { chiSquareQuantile } from '../../workers/distributions/chiSquareQuantile.ts';
import { chiSquareUpperTail } from '../../workers/distributions/chiSquareUpperTail.ts';
import { fisherFCdf } from '../../workers/distributions/fisherFCdf.ts';
import { fisherFQuantile } from '../../workers/distributions/fisherFQuantile.ts';
import { fisherFUpperTail } from '../../workers/distributions/fisherFUpperTail.ts';
import { logGamma } from '../../workers/distributions/logGamma.ts';
import { normalQuantile } from '../../workers/distributions/normalQuantile.ts';
import { normalUpperTail } from '../../workers/distributions/normalUpperTail.ts';
import { studentTQuantile } from '../../workers/distributions/studentTQuantile.ts';
import { studentTUpperTail } from '../../workers/distributions/studentTUpperTail.ts';
import { weightedChiSquareUpperTail } from '../../workers/distributions/weightedChiSquareUpperTail.ts';

/** Identities between the laws, all textbook results; probabilities from 1e−30 to ½, degrees of freedom from ½ to 3 000. */
const small = fc.double({ min: -30, max: Math.log10(0.5), noNaN: true }).map((exponent) => 10 ** exponent);
const freedom = fc.double({ min: Math.log(0.5), max: Math.log(3000), noNaN: true }).map(Math.exp);
const close = (a: number, b: number, tolerance: number): void => {
  expect(Math.abs(a / b - 1), `${a} and ${b}`).toBeLessThan(tolerance);
};

/** A quantile off by ε moves the tail by ε times the slope of its logarithm, below 2 000 here. */
const AFTER_QUANTILE = 2e-12;

describe('the tail at a quantile is the probability asked for', () => {
  it('normal', () => {
    fc.assert(
      fc.property(small, (p) => {
        close(normalUpperTail(-normalQuantile(p)), p, AFTER_QUANTILE);
      }),
    );
  });
  it('chi-square, both tails', () => {
    fc.assert(
      fc.property(small, freedom, (p, df) => {
        close(chiSquareUpperTail(chiSquareQuantile(p, df, true), df), p, AFTER_QUANTILE);
        close(chiSquareCdf(chiSquareQuantile(p, df), df), p, AFTER_QUANTILE);
      }),
    );
  });
  it('t', () => {
    fc.assert(
      fc.property(small, freedom, (p, df) => {
        close(studentTUpperTail(-studentTQuantile(p, df), df), p, AFTER_QUANTILE);
      }),
    );
  });
  it('F, both tails', () => {
    fc.assert(
      fc.property(small, freedom, freedom, (p, d1, d2) => {
        close(fisherFUpperTail(fisherFQuantile(p, d1, d2, true), d1, d2), p, AFTER_QUANTILE);
        close(fisherFCdf(fisherFQuantile(p, d1, d2), d1, d2), p, AFTER_QUANTILE);
      }),
    );
  });
});

describe('identities between laws', () => {
  const ratio = fc.double({ min: 0.01, max: 30, noNaN: true });

  it('both tails make 1', () => {
    fc.assert(
      fc.property(ratio, freedom, freedom, (x, d1, d2) => {
        close(chiSquareCdf(x * d1, d1) + chiSquareUpperTail(x * d1, d1), 1, 1e-14);
        close(fisherFCdf(x, d1, d2) + fisherFUpperTail(x, d1, d2), 1, 1e-14);
        close(studentTUpperTail(x, d1) + studentTUpperTail(-x, d1), 1, 1e-14);
      }),
    );
  });
  it('chi-square with two degrees of freedom is exponential; with one, a squared normal', () => {
    fc.assert(
      fc.property(ratio, (x) => {
        close(chiSquareUpperTail(x, 2), Math.exp(-x / 2), 1e-13);
        close(chiSquareUpperTail(x * x, 1), 2 * normalUpperTail(x), 1e-12);
      }),
    );
  });
  it('t² is F with one degree of freedom above; 1/F exchanges the degrees of freedom', () => {
    fc.assert(
      fc.property(ratio, freedom, freedom, (x, d1, d2) => {
        const tail = fisherFUpperTail(x * x, 1, d2);
        if (tail > 1e-250) close(2 * studentTUpperTail(x, d2), tail, 1e-12);
        const lower = fisherFCdf(1 / x, d2, d1);
        // 1/x is rounded: that moves the tail by the slope of its logarithm.
        if (lower > 1e-250) close(fisherFUpperTail(x, d1, d2), lower, 2e-12);
      }),
    );
  });
  it('ln Γ(x + 1) = ln Γ(x) + ln x, and Legendre’s duplication (NIST DLMF 5.5.1, 5.5.5)', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-3, max: 500, noNaN: true }), (x) => {
        const size = 1 + Math.abs(logGamma(2 * x));
        expect(Math.abs(logGamma(x + 1) - logGamma(x) - Math.log(x))).toBeLessThan(3e-15 * size);
        const doubled = logGamma(x) + logGamma(x + 0.5) + (2 * x - 1) * Math.LN2 - 0.5 * Math.log(Math.PI);
        expect(Math.abs(logGamma(2 * x) - doubled)).toBeLessThan(5e-15 * size);
      }),
    );
  });
});

describe('sums of weighted chi-squares', () => {
  const weights = fc.array(fc.double({ min: 1e-3, max: 1, noNaN: true }), { minLength: 1, maxLength: 25 });
  const share = fc.double({ min: 0.05, max: 5, noNaN: true });
  const mean = (w: number[]) => w.reduce((sum, weight) => sum + weight, 0);

  it('equal ones are a chi-square, in the tail too', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), share, (n, at) => {
        const tail = chiSquareUpperTail(n * at, n);
        close(weightedChiSquareUpperTail(new Float64Array(n).fill(0.3), 0.3 * n * at), tail, 1e-11);
      }),
    );
  });
  it('do not depend on the unit or the order', () => {
    fc.assert(
      fc.property(weights, share, (w, at) => {
        const x = at * mean(w);
        const tail = weightedChiSquareUpperTail(w, x);
        const scaled = w.map((weight) => weight * 2 ** -40).reverse();
        close(weightedChiSquareUpperTail(scaled, x * 2 ** -40), tail, 1e-11);
      }),
    );
  });
  it('lie between the sums of the smallest and of the largest weight', () => {
    fc.assert(
      fc.property(weights, share, (w, at) => {
        const x = at * mean(w);
        const tail = weightedChiSquareUpperTail(w, x);
        expect(tail).toBeLessThan(chiSquareUpperTail(x / Math.max(...w), w.length) * (1 + 1e-11));
        expect(tail).toBeGreaterThan(chiSquareUpperTail(x / Math.min(...w), w.length) * (1 - 1e-11));
      }),
    );
  });
});
