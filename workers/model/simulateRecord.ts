import type { Order, Parameters } from '../contract/candidate.ts';
import type { Random } from '../numeric/random.ts';
import { coefficientsToPartial } from './coefficientsToPartial.ts';
import { differencingPolynomial } from './differencingPolynomial.ts';
import { expandPolynomials, sparsePolynomial, type SparsePolynomial } from './expandPolynomials.ts';

export interface SimulateRequest {
  readonly order: Order;
  /** Coefficients, mean (or drift) and innovation variance; `regression` is not used. */
  readonly at: Parameters;
  readonly length: number;
  readonly random: Random;
  /** Standardised innovations (mean 0, variance 1) in the order of time; normal when left out. */
  readonly shock?: (() => number) | undefined;
  /** The d + sD values before the record that differencing leaves free, in the order of time; zeros when left out. */
  readonly before?: ArrayLike<number> | undefined;
}

/** With another law than the normal the start is forgotten to this part of itself, at most over so many steps. */
const FORGOTTEN = 1e-6;
const MOST_STEPS = 200_000;

/**
 * A synthetic record of an ARMA model with differencing, on the scale of the model (no transform, no regression).
 *
 * Method: z = θ(B)Θ(Bˢ) x + mean, with x the AR part. Its first values are drawn from their exact stationary law, each given those
 * before it by the Durbin–Levinson recursion (Brockwell & Davis, Time Series: Theory and Methods, 2nd ed., §5.2), so that normal records
 * need no burn-in however near a unit root. Where innovations follow another law the record starts after as many more steps as
 * forget the normal start. Differenced models are then summed from `before`.
 *
 * @param request order, parameters, length ≥ 0, a stream of random numbers
 * @returns `length` values
 * @throws RangeError where the AR part is not stationary or `before` is not d + sD long
 */
export function simulateRecord(request: SimulateRequest): Float64Array {
  const { order, at, length, random } = request;
  const expanded = expandPolynomials(at, order.s);
  const ar = sparsePolynomial(expanded.ar);
  const ma = sparsePolynomial(expanded.ma);
  const shock = request.shock ?? (() => random.normal());
  const settling = request.shock === undefined ? 0 : stepsToForget(ar);
  const sigma = Math.sqrt(at.innovationVariance);
  const n = settling + ma.degree + length;
  const x = stationaryStart(expanded.ar, n, random);
  for (let t = ar.degree; t < n; t++) x[t] = shock() + weighted(ar, x, t);
  const record = new Float64Array(length);
  for (let t = 0; t < length; t++) {
    const own = settling + ma.degree + t;
    record[t] = at.mean + sigma * (x[own]! + weighted(ma, x, own));
  }
  return summed(record, order, request.before);
}

function weighted({ lags, values }: SparsePolynomial, x: Float64Array, t: number): number {
  let sum = 0;
  for (let k = 0; k < lags.length; k++) sum += values[k]! * x[t - lags[k]!]!;
  return sum;
}

/** Room for n values (at least the order), the first p of them from the stationary law of the AR part with unit innovations. */
function stationaryStart(ar: Float64Array, n: number, random: Random): Float64Array {
  const p = ar.length;
  const partial = new Float64Array(p);
  if (!coefficientsToPartial(ar, partial)) throw new RangeError('The AR part is not stationary.');
  let variance = 1;
  for (const r of partial) variance /= (1 - r) * (1 + r);
  const x = new Float64Array(Math.max(n, p));
  const phi = new Float64Array(p);
  for (let k = 0; k < p; k++) {
    let expected = 0;
    for (let i = 0; i < k; i++) expected += phi[i]! * x[k - 1 - i]!;
    x[k] = expected + Math.sqrt(variance) * random.normal();
    const r = partial[k]!;
    variance *= (1 - r) * (1 + r);
    for (let i = 0, j = k - 1; i <= j; i++, j--) {
      const a = phi[i]!;
      const b = phi[j]!;
      phi[i] = a - r * b;
      if (i !== j) phi[j] = b - r * a;
    }
    phi[k] = r;
  }
  return x;
}

/** Steps after which the impulse response of 1/φ(B) has stayed below FORGOTTEN for as long as its order. */
function stepsToForget(ar: SparsePolynomial): number {
  if (ar.degree === 0) return 0;
  const psi: number[] = [];
  let quiet = 0;
  for (let t = 0; t < MOST_STEPS; t++) {
    let now = t === 0 ? 1 : 0;
    for (let k = 0; k < ar.lags.length && ar.lags[k]! <= t; k++) now += ar.values[k]! * psi[t - ar.lags[k]!]!;
    psi.push(now);
    quiet = Math.abs(now) < FORGOTTEN ? quiet + 1 : 0;
    if (quiet > ar.degree) return t;
  }
  return MOST_STEPS;
}

function summed(differenced: Float64Array, order: Order, before: ArrayLike<number> | undefined): Float64Array {
  const c = differencingPolynomial(order);
  const m = c.length - 1;
  if (m === 0) return differenced;
  if (before !== undefined && before.length !== m)
    throw new RangeError(`The model has ${m} starting values but ${before.length} were given.`);
  const y = new Float64Array(m + differenced.length);
  if (before !== undefined) y.set(Array.from(before));
  for (let t = 0; t < differenced.length; t++) {
    let value = differenced[t]!;
    for (let i = 1; i <= m; i++) if (c[i] !== 0) value -= c[i]! * y[m + t - i]!;
    y[m + t] = value;
  }
  return y.slice(m);
}
