import type { Order } from '../contract/candidate.ts';

/**
 * (1 − B)ᵈ(1 − Bˢ)ᴰ multiplied out.
 *
 * @returns coefficients c_0 = 1, c_1 … of length d + sD + 1, so that the differenced value is Σ c_i z_{t−i}
 * @example d = 1, D = 1, s = 4: 1, −1, 0, 0, −1, 1
 */
export function differencingPolynomial({ d, D, s }: Pick<Order, 'd' | 'D' | 's'>): Float64Array {
  let result = Float64Array.of(1);
  const once = (lag: number) => {
    const next = new Float64Array(result.length + lag);
    next.set(result);
    for (let i = 0; i < result.length; i++) next[i + lag]! -= result[i]!;
    result = next;
  };
  for (let i = 0; i < d; i++) once(1);
  for (let i = 0; i < D; i++) once(s);
  return result;
}
