import type { SpreadAgainstLevel } from '../contract/shape.ts';
import { leastSquares } from '../numeric/leastSquares.ts';

const MOST_BLOCKS = 400;
const SHORTEST = 8;

/**
 * How the spread of the readings goes with their level.
 *
 * Method: blocks of one season (or of √n readings, at least 8), mean and standard deviation (divisor count − 1) of each, and the least-squares slope b of log
 * deviation on log mean: a spread proportional to the b-th power of the level is made even by the power 1 − b of the readings (Bartlett 1947,
 * Biometrics 3, 39–52; Box & Jenkins, Time Series Analysis, §4.1.3 and §9.3.5). Blocks with less than half their readings, or without spread, are left out.
 *
 * @param values gaps as NaN; @param season readings in a season, 0: none
 * @returns `lambda` null (see `boxCoxLambda`); slope and level ratio NaN where a block mean is not positive, or for fewer than three blocks
 */
export function spreadAgainstLevel(values: Float64Array, season: number): SpreadAgainstLevel {
  const n = values.length;
  const own = season >= 4 && n >= 6 * season ? season : Math.max(SHORTEST, Math.floor(Math.sqrt(n)));
  const block = own * Math.max(1, Math.ceil(n / own / MOST_BLOCKS));
  const means: number[] = [];
  const deviations: number[] = [];
  for (let from = 0; from + block <= n; from += block) {
    let count = 0;
    let sum = 0;
    for (let t = from; t < from + block; t++) {
      if (Number.isNaN(values[t]!)) continue;
      count++;
      sum += values[t]!;
    }
    if (count < Math.max(3, block / 2)) continue;
    const mean = sum / count;
    let squares = 0;
    for (let t = from; t < from + block; t++) if (!Number.isNaN(values[t]!)) squares += (values[t]! - mean) ** 2;
    if (!(squares > 0)) continue;
    means.push(mean);
    deviations.push(Math.sqrt(squares / (count - 1)));
  }
  const positive = means.length >= 3 && means.every((mean) => mean > 0);
  const { slope, slopeError } = positive ? slopeOf(means, deviations) : { slope: NaN, slopeError: NaN };
  return {
    block,
    means: Float64Array.from(means),
    deviations: Float64Array.from(deviations),
    slope,
    slopeError,
    levelRatio: positive ? Math.max(...means) / Math.min(...means) : NaN,
    lambda: null,
  };
}

function slopeOf(means: readonly number[], deviations: readonly number[]): { slope: number; slopeError: number } {
  const x = means.map(Math.log);
  const y = deviations.map(Math.log);
  const { coefficients, residualSumOfSquares, rank, inverse } = leastSquares([x.map(() => 1), x], y);
  if (rank < 2) return { slope: NaN, slopeError: NaN };
  return {
    slope: coefficients[1]!,
    slopeError: Math.sqrt((residualSumOfSquares / (x.length - 2)) * inverse.values[3]!),
  };
}
