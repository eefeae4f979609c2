import { studentTQuantile } from '../distributions/studentTQuantile.ts';
import { studentTUpperTail } from '../distributions/studentTUpperTail.ts';

/** Standardised innovations beyond what n independent normals would give. */
export interface ExtremeInnovations {
  /** The largest by size, signed, and its index in the record. */
  readonly largest: number;
  readonly index: number;
  /** Size that the largest of n normals exceeds with the stated probability. */
  readonly limit: number;
  /** Innovations beyond the limit. */
  readonly count: number;
  /** Of a largest one at least this large. */
  readonly p: number;
}

/**
 * The largest standardised innovation against the largest of n independent normals.
 *
 * Method: the standard deviation is estimated from the same n innovations, so that each one referred to it has Thompson's law (1935, Ann.
 * Math. Stat. 6, 214–219): with τ the ratio, τ√((n − 1)/(n − τ²)) is a t with n − 1 degrees of freedom; the largest by 1 − (1 − p)ⁿ
 * (Šidák 1967, J. Am. Stat. Assoc. 62, 626–633).
 *
 * @param standardised innovations over their own standard deviations, NaN where there is none
 * @param probability in (0, 1), of the limit being exceeded by the largest of n
 * @returns null with fewer than 3 innovations
 */
export function extremeInnovations(standardised: Float64Array, probability: number): ExtremeInnovations | null {
  let n = 0;
  let squares = 0;
  let index = -1;
  for (let t = 0; t < standardised.length; t++) {
    const value = standardised[t]!;
    if (Number.isNaN(value)) continue;
    n++;
    squares += value * value;
    if (index < 0 || Math.abs(value) > Math.abs(standardised[index]!)) index = t;
  }
  if (n < 3 || !(squares > 0)) return null;
  const spread = Math.sqrt(squares / n);
  const tail = -Math.expm1(Math.log1p(-probability) / n);
  const t = studentTQuantile(1 - tail / 2, n - 1);
  const limit = spread * t * Math.sqrt(n / (n - 1 + t * t));
  const largest = standardised[index]!;
  const ratio = Math.abs(largest) / spread;
  const room = n - ratio * ratio;
  const single = room > 0 ? 2 * studentTUpperTail(ratio * Math.sqrt((n - 1) / room), n - 1) : 0;
  const count = standardised.reduce((sum, value) => sum + (Math.abs(value) > limit ? 1 : 0), 0);
  return { largest, index, limit, count, p: -Math.expm1(n * Math.log1p(-single)) };
}
