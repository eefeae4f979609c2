import type { Candidate } from '../../contract/candidate.ts';
import { SearchSpace } from '../search/searchSpace.ts';
import { hannanRissanen } from './hannanRissanen.ts';

/** Readings whose periodogram is looked at: its cost grows with their square. */
const MOST_READINGS = 1500;
/** Peaks, and troughs, taken. */
const TAKEN = 6;
/** Neighbouring frequencies averaged where a trough is looked for. */
const SMOOTHED = 2;
/** Moduli of the AR and MA pair: an AR pair nearer to the circle makes a peak, an MA pair a trough. */
interface Moduli {
  readonly ar: number;
  readonly ma: number;
}
/** Moduli of the nearer and the farther pair, and, for long records, how many nths from the circle they may be too. */
const WIDE = { near: 0.97, far: 0.88 };
const NARROW = { near: 20, far: 45 };
/** The same at the two ends of the spectrum, where a trough is that of a difference too many. */
const EDGE: Moduli = { ar: 0.93, ma: 0.995 };

/**
 * Starts with an AR and an MA pair of roots at one angle. The likelihood of a model with both has a maximum near each
 * frequency at which the rest of the model leaves a peak or a trough in the spectrum, and the maxima are only 1/n wide,
 * so that random starts miss them.
 *
 * Method: the rest, two orders lower on both sides, by Hannan–Rissanen; the periodogram of its innovations; a pair at
 * its highest peaks and its lowest smoothed troughs.
 *
 * @param centred the (differenced) record less its level; NaN is a gap, taken as 0 here
 * @returns coordinates in `space`; none where p or q is below 2 or lags are held at zero
 */
export function oscillationStarts(space: SearchSpace, candidate: Candidate, centred: Float64Array): Float64Array[] {
  const { order, zeroLags } = candidate;
  if (order.p < 2 || order.q < 2 || space.arPair() === null) return [];
  const lower = { ...order, p: order.p - 2, q: order.q - 2 };
  const rest = new SearchSpace(lower, zeroLags);
  const estimated = rest.dimension === 0 ? null : hannanRissanen(centred, lower, zeroLags);
  if (estimated !== null) rest.place(rest.locate(estimated));
  const { ar, ma, seasonalAr, seasonalMa } = rest.coefficients;
  const innovations = filtered(centred.subarray(0, MOST_READINGS), ar, ma);
  const power = periodogram(innovations);
  const angleOf = (index: number) => (2 * Math.PI * (index + 1)) / innovations.length;
  const withPair = (angle: number, { ar: arModulus, ma: maModulus }: Moduli) => {
    const cosine = Math.cos(angle);
    return space.locate({
      ar: timesPair(ar, cosine, arModulus, -1),
      ma: timesPair(ma, cosine, maModulus, 1),
      seasonalAr: [...seasonalAr],
      seasonalMa: [...seasonalMa],
    });
  };
  const n = centred.length;
  const narrow = { near: 1 - NARROW.near / n, far: 1 - NARROW.far / n };
  const widths = narrow.near > WIDE.near ? [WIDE, narrow] : [WIDE];
  const smoothed = power.map((_, j) => {
    const about = power.subarray(Math.max(0, j - SMOOTHED), j + SMOOTHED + 1);
    return -about.reduce((sum, value) => sum + value, 0) / about.length;
  });
  const [peaks, troughs] = [summits(power), summits(smoothed)];
  return [
    ...widths.flatMap(({ near, far }) => [
      ...peaks.map((index) => withPair(angleOf(index), { ar: near, ma: far })),
      ...troughs.map((index) => withPair(angleOf(index), { ar: far, ma: near })),
    ]),
    withPair(angleOf(0), EDGE),
    withPair(Math.PI - angleOf(0), EDGE),
  ];
}

/** Innovations of an ARMA model started from nothing. */
function filtered(values: Float64Array, ar: Float64Array, ma: Float64Array): Float64Array {
  const result = new Float64Array(values.length);
  for (let t = 0; t < values.length; t++) {
    let error = values[t]!;
    for (let i = 0; i < Math.min(t, ar.length); i++) error -= ar[i]! * values[t - 1 - i]!;
    for (let j = 0; j < Math.min(t, ma.length); j++) error -= ma[j]! * result[t - 1 - j]!;
    result[t] = Number.isNaN(error) ? 0 : error;
  }
  return result;
}

/** Squared modulus of the Fourier transform at 1/n, 2/n … below ½, by a rotating phase. */
function periodogram(values: Float64Array): Float64Array {
  const n = values.length;
  const result = new Float64Array(Math.max(0, Math.ceil(n / 2) - 1));
  for (let j = 0; j < result.length; j++) {
    const turn = (2 * Math.PI * (j + 1)) / n;
    // Goertzel 1958, Amer. Math. Monthly 65, 34–35.
    const twice = 2 * Math.cos(turn);
    let last = 0;
    let before = 0;
    for (let t = 0; t < n; t++) {
      const next = values[t]! + twice * last - before;
      before = last;
      last = next;
    }
    result[j] = last * last + before * before - twice * last * before;
  }
  return result;
}

/** Places of the highest local maxima. */
function summits(values: Float64Array): number[] {
  return Array.from({ length: values.length }, (_, i) => i)
    .filter((i) => values[i]! >= (values[i - 1] ?? -Infinity) && values[i]! >= (values[i + 1] ?? -Infinity))
    .sort((one, other) => values[other]! - values[one]!)
    .slice(0, TAKEN);
}

/** Coefficients of (1 + sign·Σ c_j Bʲ)(1 − 2·modulus·cosine·B + modulus²·B²), in the same convention. */
function timesPair(coefficients: Float64Array, cosine: number, modulus: number, sign: 1 | -1): number[] {
  const one = [1, ...Array.from(coefficients, (c) => sign * c), 0, 0];
  const product = one.map(
    (value, j) => value - 2 * modulus * cosine * (one[j - 1] ?? 0) + modulus * modulus * (one[j - 2] ?? 0),
  );
  return product.slice(1).map((value) => sign * value);
}
