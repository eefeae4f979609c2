import type { Order } from '../contract/candidate.ts';

/** Coefficients of the four factors, indices from lag 1. */
export type Factors = {
  readonly [Name in 'ar' | 'ma' | 'seasonalAr' | 'seasonalMa']: ArrayLike<number>;
};

/**
 * φ(B)Φ(Bˢ) and θ(B)Θ(Bˢ) multiplied out.
 *
 * Signs: z_t = Σ ar_i z_{t−i} + e_t + Σ ma_j e_{t−j}, so that the product of 1 − Σ φ_i Bⁱ and 1 − Σ Φ_i Bˢⁱ is 1 − Σ ar_i Bⁱ.
 *
 * @param factors coefficients of the factors; s the season in readings (unused where there are no seasonal ones)
 * @returns `ar` of length p + sP and `ma` of length q + sQ, index 0 is lag 1
 * @example φ = .5, Φ = .4, s = 4: ar = [.5, 0, 0, .4, −.2]
 */
export function expandPolynomials(factors: Factors, s: Order['s']): { ar: Float64Array; ma: Float64Array } {
  return {
    ar: multiplyOut(factors.ar, factors.seasonalAr, s, -1),
    ma: multiplyOut(factors.ma, factors.seasonalMa, s, 1),
  };
}

/** Lags and values of the non-zero coefficients of an expanded polynomial. */
export interface SparsePolynomial {
  readonly lags: Int32Array;
  readonly values: Float64Array;
  readonly degree: number;
}

/** The same without its zeros, for recursions over long seasonal lags. `degree` is the length of the expansion. */
export function sparsePolynomial(expanded: Float64Array): SparsePolynomial {
  const lags: number[] = [];
  const values: number[] = [];
  expanded.forEach((value, index) => {
    if (value === 0) return;
    lags.push(index + 1);
    values.push(value);
  });
  return { lags: Int32Array.from(lags), values: Float64Array.from(values), degree: expanded.length };
}

function multiplyOut(plain: ArrayLike<number>, seasonal: ArrayLike<number>, s: number, sign: 1 | -1): Float64Array {
  const product = new Float64Array(plain.length + s * seasonal.length);
  for (let i = 0; i < plain.length; i++) product[i] = plain[i]!;
  for (let j = 0; j < seasonal.length; j++) {
    const lag = (j + 1) * s;
    product[lag - 1]! += seasonal[j]!;
    for (let i = 0; i < plain.length; i++) product[lag + i]! += sign * seasonal[j]! * plain[i]!;
  }
  return product;
}
