import { medianOf } from './medianOf.ts';

/** 1/Φ⁻¹(¾): the median absolute deviation of a normal variable times this is its standard deviation. */
const NORMAL = 1.482602218505602;

/**
 * Standard deviation by the median absolute deviation about the median (Hampel 1974, J. Am. Stat. Assoc. 69, 383–393), right
 * for normal values and hardly moved by up to half of them being anything else.
 *
 * @param values gaps as NaN
 * @returns 0 where more than half are equal, NaN for none
 */
export function robustScale(values: Float64Array): number {
  const centre = medianOf(values);
  return NORMAL * medianOf(values.map((value) => Math.abs(value - centre)));
}
