import type { Finding } from '../contract/forensics.ts';
import type { Whitened } from './whitenRecord.ts';

/** A step above this many standard deviations of the innovations changes the estimates (measured: φ .70 reads .69 at ½, .65 at 1). */
const COARSE = 0.5;

/**
 * Rounding against what a model must predict.
 *
 * Method: smallest step r against the standard deviation of the innovations, from which the variance that rounding brings has been
 * taken: r²/12 at each reading (Sheppard 1898, Proc. Lond. Math. Soc. 29, 353–380), times 1 + Σ a_i² through the autoregression.
 *
 * @param resolution r, 0 for none; @param whitened of the record
 * @returns a finding without places, or null; `numbers`: step, inDeviations, noise (r/√12). Only the source can give more digits
 */
export function findQuantisation(resolution: number, { coefficients, scale }: Whitened): Finding | null {
  if (!(resolution > 0)) return null;
  let gain = 1;
  for (const a of coefficients) gain += a * a;
  const own = Math.sqrt(Math.max(scale ** 2 - (gain * resolution ** 2) / 12, 0.2 * scale ** 2));
  const inDeviations = resolution / own;
  if (inDeviations <= COARSE) return null;
  return {
    code: 'quantised',
    count: 1,
    places: [],
    numbers: { step: resolution, inDeviations, noise: resolution / Math.sqrt(12) },
    effect: 'roundingNoise',
    offered: [],
  };
}
