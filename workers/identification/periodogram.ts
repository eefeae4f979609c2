import { fourierTransform } from '../numeric/fourierTransform.ts';
import { centredRecord } from './centredRecord.ts';

/** Ordinates at the frequencies k/n, k = 1…⌊n/2⌋, in cycles per reading. */
export interface Periodogram {
  readonly frequencies: Float64Array;
  readonly ordinates: Float64Array;
}

/**
 * Periodogram of a record about its mean.
 *
 * Method: I(f) = (2/N) |Σ (x_t − x̄) exp(−2πift)|², half of it at f = ½, with N the readings observed, so that without gaps Σ I is
 * Σ (x_t − x̄)² (Box & Jenkins, Time Series Analysis, §2.2.1; Parseval). A gap enters as the mean (Parzen 1963, Sankhyā A 25, 383–392): it adds
 * nothing, but spreads some of a line to other frequencies. Any length, by Bluestein's transform.
 *
 * @param values length n, gaps as NaN; sum and ordinates in the square of the record's unit
 * @returns arrays of length ⌊n/2⌋; ordinates are NaN where nothing is observed
 * @example x_t = a cos(2πkt/n): I(k/n) = n a²/2, 0 elsewhere
 */
export function periodogram(values: Float64Array): Periodogram {
  const n = values.length;
  const { centred, count } = centredRecord(values);
  const { re, im } = fourierTransform(centred.map((value) => (Number.isNaN(value) ? 0 : value)));
  const most = Math.floor(n / 2);
  const frequencies = Float64Array.from({ length: most }, (_, i) => (i + 1) / n);
  const ordinates = Float64Array.from({ length: most }, (_, i) => {
    const k = i + 1;
    const sides = 2 * k === n ? 1 : 2;
    return count === 0 ? NaN : (sides * (re[k]! ** 2 + im[k]! ** 2)) / count;
  });
  return { frequencies, ordinates };
}
