import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { brentRoot } from '../../workers/numeric/brentRoot.ts';
import { compensatedSum } from '../../workers/numeric/compensatedSum.ts';
import { fourierTransform } from '../../workers/numeric/fourierTransform.ts';
import { gaussLegendre } from '../../workers/numeric/gaussLegendre.ts';
import { leastSquares } from '../../workers/numeric/leastSquares.ts';
import { mean } from '../../workers/numeric/mean.ts';
import { multiplyPolynomials } from '../../workers/numeric/multiplyPolynomials.ts';
import { polynomialRoots, type Complex } from '../../workers/numeric/polynomialRoots.ts';
import { sortedQuantile } from '../../workers/numeric/sortedQuantile.ts';

const coefficient = fc.integer({ min: -1000, max: 1000 }).map((value) => value / 100);
const coefficients = fc.array(coefficient, { minLength: 1, maxLength: 40 });

/** |c(z)| beside Σ |c_i||z|ⁱ: how far the coefficients must move, relatively, for z to be an exact root. */
function backwardError(c: ArrayLike<number>, { re, im }: Complex): number {
  const size = Math.hypot(re, im);
  // Outside the unit circle through the reversed polynomial, so that no power overflows.
  const inside = size <= 1;
  const [x, y] = inside ? [re, im] : [re / size / size, -im / size / size];
  let [a, b, whole] = [0, 0, 0];
  for (let k = 0; k < c.length; k++) {
    const value = c[inside ? c.length - 1 - k : k]!;
    [a, b] = [a * x - b * y + value, a * y + b * x];
    whole = whole * (inside ? size : 1 / size) + Math.abs(value);
  }
  return whole === 0 ? 0 : Math.hypot(a, b) / whole;
}

describe('polynomials', () => {
  it('have as many roots as their degree, each exact for coefficients moved by rounding, in conjugate pairs', () => {
    fc.assert(
      fc.property(coefficients, fc.double({ min: 0.1, max: 10, noNaN: true }), (lower, top) => {
        const c = [...lower, top];
        const roots = polynomialRoots(c);
        expect(roots).toHaveLength(c.length - 1);
        for (const root of roots) {
          expect(backwardError(c, root)).toBeLessThan(1e-12);
          expect(roots.some(({ re, im }) => re === root.re && im === -root.im)).toBe(true);
        }
      }),
    );
  });

  it('a product has the roots of its factors', () => {
    const root = fc.integer({ min: 1, max: 20 });
    fc.assert(
      fc.property(fc.uniqueArray(root, { minLength: 2, maxLength: 5 }), (roots) => {
        let product: Float64Array = Float64Array.of(1);
        for (const at of roots) product = multiplyPolynomials(product, [-at, 1]);
        const found = polynomialRoots(product).map(({ re }) => re);
        const sorted = [...roots].sort((a, b) => a - b);
        found.sort((a, b) => a - b).forEach((value, i) => expect(Math.abs(value - sorted[i]!)).toBeLessThan(1e-7));
      }),
    );
  });

  it('multiply by the convolution theorem: the transform of a product is the product of the transforms', () => {
    fc.assert(
      fc.property(coefficients, coefficients, (a, b) => {
        const product = multiplyPolynomials(a, b);
        const n = product.length;
        const padded = (c: number[]) => fourierTransform(Float64Array.from({ length: n }, (_, i) => c[i] ?? 0));
        const [x, y, z] = [padded(a), padded(b), fourierTransform(product)];
        for (let k = 0; k < n; k++) {
          expect(Math.abs(x.re[k]! * y.re[k]! - x.im[k]! * y.im[k]! - z.re[k]!)).toBeLessThan(1e-8);
          expect(Math.abs(x.re[k]! * y.im[k]! + x.im[k]! * y.re[k]! - z.im[k]!)).toBeLessThan(1e-8);
        }
      }),
    );
  });
});

describe('sums and order', () => {
  it('a compensated sum of halves of whole numbers is exact, whatever large terms cancel in it', () => {
    const terms = fc.array(fc.integer({ min: -1e6, max: 1e6 }).map((value) => value / 2));
    fc.assert(
      fc.property(terms, fc.integer({ min: 0, max: 80 }), (values, power) => {
        const exact = values.reduce((sum, value) => sum + value, 0);
        expect(compensatedSum([2 ** power, ...values, -(2 ** power)]) + 0).toBe(exact + 0);
      }),
    );
  });

  it('a mean follows its offset to the last places', () => {
    const values = fc.array(fc.integer({ min: -1000, max: 1000 }), { minLength: 1 });
    fc.assert(
      fc.property(values, (given) => {
        const shifted = mean(given.map((value) => value + 1e12));
        expect(Math.abs(shifted - 1e12 - mean(given))).toBeLessThanOrEqual(2.5e-4);
      }),
    );
  });

  it('a quantile rises with p and stays among the values', () => {
    const p = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.array(coefficient, { minLength: 1 }), p, p, (values, one, other) => {
        const sorted = [...values].sort((a, b) => a - b);
        const [low, high] = [Math.min(one, other), Math.max(one, other)].map((at) => sortedQuantile(sorted, at));
        expect(low).toBeLessThanOrEqual(high! + 1e-12);
        expect(low).toBeGreaterThanOrEqual(sorted[0]!);
        expect(high).toBeLessThanOrEqual(sorted[sorted.length - 1]! + 1e-12);
      }),
    );
  });
});

describe('linear problems and quadrature', () => {
  it('least-squares residuals are orthogonal to every column, dependent ones included', () => {
    const row = fc.tuple(coefficient, coefficient, coefficient);
    fc.assert(
      fc.property(fc.array(row, { minLength: 1, maxLength: 30 }), (rows) => {
        const a = rows.map(([x]) => x);
        const b = rows.map(([, x]) => x);
        const y = rows.map(([, , x]) => x);
        const columns = [a, b, a.map((value, i) => 2 * value - b[i]!)];
        const found = leastSquares(columns, y);
        const residual = y.map((value, i) =>
          columns.reduce((sum, column, j) => sum - column[i]! * found.coefficients[j]!, value),
        );
        const length = (x: number[]) => Math.sqrt(x.reduce((sum, value) => sum + value * value, 0));
        const fitted = length(y) + columns.reduce((sum, c, j) => sum + length(c) * Math.abs(found.coefficients[j]!), 0);
        for (const column of columns) {
          const dot = column.reduce((sum, value, i) => sum + value * residual[i]!, 0);
          expect(Math.abs(dot)).toBeLessThanOrEqual(1e-12 * length(column) * fitted);
        }
        expect(Math.abs(length(residual) ** 2 - found.residualSumOfSquares)).toBeLessThanOrEqual(1e-12 * fitted ** 2);
        expect(found.rank + found.dependent.length).toBe(3);
      }),
    );
  });

  it('a Gauss rule integrates every polynomial up to degree 2n − 1', () => {
    fc.assert(
      fc.property(coefficients, (c) => {
        const { nodes, weights } = gaussLegendre((c.length + 1) >> 1, 0, 1);
        const exact = c.reduce((sum, value, k) => sum + value / (k + 1), 0);
        let sum = 0;
        nodes.forEach((x, i) => (sum += weights[i]! * c.reduceRight((value, next) => value * x + next, 0)));
        expect(Math.abs(sum - exact)).toBeLessThan(1e-12);
      }),
    );
  });

  it('a bracketed zero of a cubic is one', () => {
    fc.assert(
      fc.property(coefficient, coefficient, coefficient, (a, b, c) => {
        const f = (x: number) => (x - a) * (x - b) * (x - c);
        const { x } = brentRoot(f, -11, 11)!;
        // A triple zero is found to the cube root of the smallest number only.
        expect(Math.min(Math.abs(x - a), Math.abs(x - b), Math.abs(x - c))).toBeLessThan(1e-14 * 11);
      }),
    );
  });
});
