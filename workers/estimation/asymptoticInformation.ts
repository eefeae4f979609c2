import type { Coefficients } from './search/searchSpace.ts';

/** Coordinates of the information: which coefficient of `all` each row belongs to, in order. */
type Rows = readonly number[];

/**
 * Asymptotic Fisher information of the ARMA coefficients from one reading: E[∂e_t/∂a ∂e_t/∂b]/σ², where the
 * derivatives are the innovations filtered by 1/φ, 1/θ, 1/Φ or 1/Θ and delayed by the coefficient's lag.
 *
 * Method: Box & Jenkins 1970, section 7.2.6; Brockwell & Davis, Time Series: Theory and Methods, section 8.8. The
 * sums over impulse responses stop at `length`, which also keeps the value finite where a root lies on the circle.
 *
 * @param coefficients φ, θ, Φ, Θ
 * @param season lag of the seasonal factors, at least 1 where there are any
 * @param rows indices into `coefficients.all` of the coefficients wanted
 * @param length terms of the impulse responses kept, such as the number of readings
 * @returns rows.length squared values, row-major
 */
export function asymptoticInformation(
  coefficients: Coefficients,
  season: number,
  rows: Rows,
  length: number,
): Float64Array {
  const responses = rows.map((index) => derivative(coefficients, season, index, length));
  const k = rows.length;
  const information = new Float64Array(k * k);
  for (let a = 0; a < k; a++) {
    for (let b = 0; b <= a; b++) {
      const sum = innerProduct(responses[a]!, responses[b]!);
      information[a * k + b] = sum;
      information[b * k + a] = sum;
    }
  }
  return information;
}

/** Impulse response of ∂e_t/∂c for coefficient `index`: it is 0 up to `delay`, and nonzero every `stride` from there. */
interface Response {
  readonly delay: number;
  readonly stride: number;
  readonly values: Float64Array;
}

function derivative({ ar, ma, seasonalAr, seasonalMa }: Coefficients, season: number, index: number, length: number) {
  const parts = [
    { values: ar, sign: 1, stride: 1 },
    { values: ma, sign: -1, stride: 1 },
    { values: seasonalAr, sign: 1, stride: season },
    { values: seasonalMa, sign: -1, stride: season },
  ];
  let first = 0;
  for (const { values, sign, stride } of parts) {
    if (index < first + values.length) {
      const delay = (index - first + 1) * stride;
      const terms = Math.max(1, Math.ceil((length - delay) / stride));
      return { delay, stride, values: reciprocalSeries(values, sign, terms) };
    }
    first += values.length;
  }
  throw new RangeError(`There is no coefficient ${index}.`);
}

/** A term of a response below this, for as many steps as the order, is nothing beside the first, which is 1. */
const NOTHING = 1e-18;

/** Coefficients of 1/(1 − Σ sign·c_j Bʲ), as far as they are something. */
function reciprocalSeries(values: Float64Array, sign: number, terms: number): Float64Array {
  const series = new Float64Array(terms);
  series[0] = 1;
  let quiet = 0;
  for (let t = 1; t < terms; t++) {
    let sum = 0;
    for (let j = 0; j < Math.min(values.length, t); j++) sum += sign * values[j]! * series[t - 1 - j]!;
    series[t] = sum;
    quiet = Math.abs(sum) < NOTHING ? quiet + 1 : 0;
    if (quiet > values.length) return series.subarray(0, t + 1);
  }
  return series;
}

function innerProduct(one: Response, other: Response): number {
  // Walk the sparser response and pick the denser one's term at the same lag, if it has one.
  const [sparse, dense] = one.stride >= other.stride ? [one, other] : [other, one];
  let sum = 0;
  for (let t = 0; t < sparse.values.length; t++) {
    const offset = sparse.delay + t * sparse.stride - dense.delay;
    if (offset < 0 || offset % dense.stride !== 0) continue;
    const place = offset / dense.stride;
    if (place >= dense.values.length) break;
    sum += sparse.values[t]! * dense.values[place]!;
  }
  return sum;
}
