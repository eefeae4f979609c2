import type { Finding } from '../contract/forensics.ts';
import { incompleteGamma } from '../distributions/incompleteGamma.ts';
import { fourierTransform } from '../numeric/fourierTransform.ts';
import { centredRecord } from '../identification/centredRecord.ts';

const LEAST = 3;
const MOST = 12;
/** Ordinates around each frequency that are looked at on either side, for each hundred readings; at least two. */
const REACH_PER_100 = 0.8;
/** ln of the power at the notches against the power between them: less depth is no average. */
const DEPTH = -1.8;
/** Chance of so deep a notch in a smooth spectrum. */
const CHANCE = 1e-6;
const NEEDED = 100;

/**
 * Averages over k readings, logged at every reading.
 *
 * Method: a mean over k readings takes away the frequencies j/k altogether: the periodogram (of the record tapered by a cosine bell,
 * Bloomfield, Fourier Analysis of Time Series, 2nd ed. 2000, §6.2, so that slow movements do not leak into it) is compared at and
 * between these frequencies for k = 3…12. Its moving-average part then has roots on the unit circle. A mean over two readings cannot
 * be told from an MA coefficient near 1, nor a first-order filter from an AR coefficient: both are left to the fit.
 *
 * @param values no gaps, at least 100
 * @returns a finding without places, or null; `numbers`: window (k), depth (power at the notches over that between them)
 */
export function findAveraging(values: Float64Array): Finding | null {
  const n = values.length;
  if (n < NEEDED) return null;
  const { centred } = centredRecord(values);
  const tapered = centred.map((value, t) => value * (1 - Math.cos((2 * Math.PI * (t + 0.5)) / n)));
  const { re, im } = fourierTransform(tapered);
  const half = Math.floor(n / 2);
  const power = Float64Array.from({ length: half + 1 }, (_, k) => re[k]! ** 2 + im[k]! ** 2);
  const reach = Math.max(1, Math.floor((REACH_PER_100 * n) / 100));
  const meanAbout = (frequency: number, wide: number): { sum: number; count: number } => {
    const centre = Math.round(frequency * n);
    let [sum, count] = [0, 0];
    for (let k = Math.max(2, centre - wide); k <= Math.min(half, centre + wide); k++)
      [sum, count] = [sum + power[k]!, count + 1];
    return { sum, count };
  };
  let best: { window: number; depth: number } | null = null;
  for (let window = LEAST; window <= MOST; window++) {
    const wide = Math.max(1, Math.min(reach, Math.floor((0.12 * n) / window)));
    if (wide < 1 || n < 12 * window) continue;
    let depth = 0;
    let ordinates = 0;
    let notches = 0;
    let shallowest = -Infinity;
    for (let j = 1; 2 * j <= window; j++) {
      const at = meanAbout(j / window, wide);
      const sides = [meanAbout((j - 0.5) / window, wide), meanAbout((j + 0.5) / window, wide)].filter(
        ({ count }) => count > 0,
      );
      const beside = Math.min(...sides.map(({ sum, count }) => sum / count));
      const own = Math.log(at.sum / at.count / beside);
      depth += own;
      if (own > shallowest) shallowest = own;
      ordinates += at.count;
      notches++;
    }
    depth /= notches;
    // The bell ties neighbouring ordinates together: about half of them are independent, and their mean is a gamma variable.
    const free = ordinates / 2;
    if (depth > DEPTH || shallowest > 0.6 * DEPTH || incompleteGamma(free, free * Math.exp(depth)).lower > CHANCE)
      continue;
    if (best === null || depth < best.depth) best = { window, depth };
  }
  if (best === null) return null;
  return {
    code: 'averaged',
    count: 1,
    places: [],
    numbers: { window: best.window, depth: Math.exp(best.depth) },
    effect: 'filteredSignal',
    offered: [],
  };
}
