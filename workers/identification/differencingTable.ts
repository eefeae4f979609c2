import type { DifferencingLine } from '../contract/shape.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { differenceRecord } from '../series/differenceRecord.ts';
import { centredRecord } from './centredRecord.ts';

const MOST_D = 2;
const MOST_SEASONAL = 1;

/**
 * Variance and autocorrelation at lag one (and at the season) of the record for every d ≤ 2 and D ≤ 1.
 *
 * Method: a difference too many raises the variance and pulls the lag-one autocorrelation towards −½ or below it (Box & Jenkins, Time Series
 * Analysis, §6.2.1; Brockwell & Davis, Introduction to Time Series and Forecasting, §6.2). Variance with divisor n, autocorrelations with gaps
 * as in `autocorrelation`.
 *
 * @param values gaps as NaN; @param season readings in a season; 0: none, and D = 0 alone is tried
 * @returns one line for each pair, d running fastest; lines that leave no reading are left out
 */
export function differencingTable(values: Float64Array, season: number): DifferencingLine[] {
  const lines: DifferencingLine[] = [];
  for (let D = 0; D <= (season > 1 ? MOST_SEASONAL : 0); D++) {
    for (let d = 0; d <= MOST_D; d++) {
      const differenced = differenceRecord(values, differencingPolynomial({ d, D, s: season }));
      const { centred, count, sumOfSquares } = centredRecord(differenced);
      if (count === 0) continue;
      const variance = sumOfSquares / count;
      lines.push({
        d,
        D,
        variance,
        lagOne: correlation(centred, 1, variance),
        lagSeason: season > 1 ? correlation(centred, season, variance) : NaN,
        readings: count,
      });
    }
  }
  return lines;
}

function correlation(centred: Float64Array, lag: number, variance: number): number {
  const n = centred.length;
  let sum = 0;
  let pairs = 0;
  for (let t = lag; t < n; t++) {
    const product = centred[t]! * centred[t - lag]!;
    if (Number.isNaN(product)) continue;
    sum += product;
    pairs++;
  }
  return pairs > 0 && variance > 0 ? ((sum / pairs) * (1 - lag / n)) / variance : NaN;
}
