import type { Order } from '../contract/candidate.ts';
import type { SpreadAgainstLevel } from '../contract/shape.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { brentMinimise } from '../numeric/brentMinimise.ts';
import { differenceRecord } from '../series/differenceRecord.ts';

const LOWEST = -2;
const HIGHEST = 3;
/** Readings used at most, the last ones: λ is then known to a few hundredths, and each trial costs a pass. */
const MOST_READINGS = 20_000;
const FEWEST_READINGS = 20;
/** Seasonal moving averages tried where the season was differenced: the likelihood is badly off without one. */
const SEASONAL = [0.3, 0.6, 0.85];
/** Half the 95 % point of chi-square with one degree of freedom. */
const DROP = 1.920729410347062;

/**
 * Box–Cox λ of highest ln L under a first-order autoregression of the differenced record, with its 95 % interval.
 *
 * Method: ln L(λ) = −(N/2) ln [c_0(λ) (1 − r_1(λ)²)] of the differenced (y^λ − 1)/λ, after a seasonal difference also of its values with a seasonal
 * moving average of −0.3, −0.6 or −0.85 taken out, whichever is highest; readings divided by their geometric mean so that the Jacobian is
 * 1 (Box & Cox 1964, J. R. Stat. Soc. B 26, 211–252, §3); the interval is where ln L is within 1.92 of its maximum. A first look: the fit of a
 * candidate estimates λ along with its own coefficients.
 *
 * @param values gaps as NaN; @param order differencing of the record
 * @returns λ and interval within [−2, 3]; null where a reading is not positive or fewer than 20 differenced readings are left
 */
export function boxCoxLambda(values: Float64Array, order: Pick<Order, 'd' | 'D' | 's'>): SpreadAgainstLevel['lambda'] {
  const used = values.length > MOST_READINGS ? values.subarray(values.length - MOST_READINGS) : values;
  const polynomial = differencingPolynomial(order);
  let sum = 0;
  let count = 0;
  for (let t = 0; t < used.length; t++) {
    if (used[t]! <= 0) return null;
    // Readings that only start the differences have no Jacobian of their own.
    if (Number.isNaN(used[t]!) || t < polynomial.length - 1) continue;
    sum += Math.log(used[t]!);
    count++;
  }
  if (count < FEWEST_READINGS) return null;
  const logs = used.map((value) => Math.log(value) - sum / count);
  const height = (lambda: number): number => {
    const z = differenceRecord(
      logs.map((u) => (Math.abs(lambda) < 1e-9 ? u : Math.expm1(lambda * u) / lambda)),
      polynomial,
    );
    const whitened = order.D > 0 ? SEASONAL.map((weight) => innovationVariance(smoothed(z, weight, order.s))) : [];
    return -0.5 * count * Math.log(Math.min(innovationVariance(z), ...whitened));
  };
  const { x, value } = brentMinimise((lambda) => -height(lambda), LOWEST, HIGHEST, 1e-4);
  if (!Number.isFinite(value)) return null;
  const target = -value - DROP;
  return { value: x, from: crossing(height, target, x, LOWEST), to: crossing(height, target, x, HIGHEST) };
}

/** a_t = z_t + Θ a_{t−s}, started from 0. */
function smoothed(z: Float64Array, weight: number, s: number): Float64Array {
  const a = new Float64Array(z.length);
  for (let t = 0; t < z.length; t++) {
    const before = t >= s ? a[t - s]! : 0;
    a[t] = z[t]! + (Number.isNaN(before) ? 0 : weight * before);
  }
  return a;
}

/** c_0 (1 − r_1²) of the readings observed. */
function innovationVariance(z: Float64Array): number {
  let sum = 0;
  let count = 0;
  for (const value of z) {
    if (Number.isNaN(value)) continue;
    sum += value;
    count++;
  }
  const mean = sum / count;
  let own = 0;
  let next = 0;
  let pairs = 0;
  for (let t = 0; t < z.length; t++) {
    const here = z[t]! - mean;
    if (Number.isNaN(here)) continue;
    own += here * here;
    const before = t > 0 ? z[t - 1]! - mean : NaN;
    if (Number.isNaN(before)) continue;
    next += here * before;
    pairs++;
  }
  const variance = own / count;
  const r = pairs > 0 ? next / pairs / variance : 0;
  return variance * Math.max(1e-6, 1 - r * r);
}

/** Where ln L falls to the target on the way from its maximum to a limit, by halving; the limit where it does not. */
function crossing(height: (lambda: number) => number, target: number, top: number, limit: number): number {
  if (height(limit) >= target) return limit;
  let inside = top;
  let outside = limit;
  for (let i = 0; i < 14; i++) {
    const middle = 0.5 * (inside + outside);
    if (height(middle) >= target) inside = middle;
    else outside = middle;
  }
  return 0.5 * (inside + outside);
}
