import type { Order } from '../contract/candidate.ts';
import type { AdviceReason, Sureness } from '../contract/shape.ts';
import { autocorrelation } from './autocorrelation.ts';
import { partialAutocorrelation } from './partialAutocorrelation.ts';

/** Normal deviate that the largest of some ten values exceeds in one record of twenty. */
const DEVIATE = 2.8;
/** On a long record everything is significant: a correlation below this is left out of a first try. */
const NEGLIGIBLE = 0.03;
/** How far one stray correlation may lie outside, in bands, and from which lag (counted from 0) on there may be one. */
const FAR = 1.4;
const STRAYS_FROM = 3;
const MOST_LAGS = 12;
const MOST_AR = 4;
const MOST_MA = 3;

export type ArmaOrders = Pick<Order, 'p' | 'q' | 'P' | 'Q'>;

export interface OrderAdvice {
  /** The first is advised, the others stand against it. */
  readonly orders: readonly ArmaOrders[];
  readonly sureness: Sureness;
  readonly reasons: readonly AdviceReason[];
}

/**
 * Which orders to try first on a differenced record.
 *
 * Method: partial autocorrelations that end after lag p speak for an AR(p), autocorrelations that end after lag q for an MA(q), both decaying for a
 * mixture (Box & Jenkins, Time Series Analysis, §6.2.1–6.2.2). Ended means below 2.8 standard errors, 1/√n or Bartlett's, at all further lags up
 * to 12 (or short of the season) but one stray beyond the third; the shorter description is advised. The seasonal part has the sign of the autocorrelation at the season. First
 * guesses only: the fits decide.
 *
 * @param differenced gaps as NaN; @param s season, 0: none; @param D seasonal differences already taken
 */
export function adviseOrders(differenced: Float64Array, s: number, D: number): OrderAdvice {
  const short = Math.max(1, Math.min(s > 2 ? s - 2 : MOST_LAGS, MOST_LAGS, Math.floor(differenced.length / 4)));
  const all = autocorrelation(differenced, Math.max(short, s));
  const r = all.correlations;
  const n = all.observed;
  const partials = partialAutocorrelation(r.slice(0, short));
  const white = Math.max(NEGLIGIBLE, DEVIATE / Math.sqrt(n));
  const p = endOf(partials, () => white);
  let sum = 0;
  const bands = Array.from({ length: short }, (_, i) => {
    const band = Math.max(NEGLIGIBLE, DEVIATE * Math.sqrt((1 + 2 * sum) / n));
    sum += r[i]! ** 2;
    return band;
  });
  const q = endOf(r.subarray(0, short), (i) => bands[i]!);
  const seasonal = seasonalPart(s > 0 ? r[s - 1]! : NaN, white, s, D);
  const { reason, pairs, sureness } = shortPart(p, q, white, short);
  const reasons = [reason, ...seasonal.reasons];
  const orders = pairs.map(([ar, ma]) => ({ p: ar, q: ma, P: seasonal.P, Q: seasonal.Q }));
  return { orders, sureness, reasons };
}

/** Lag after which correlations have ended: at most one further one is outside its band, and that one not far. */
function endOf(correlations: Float64Array, band: (i: number) => number): number {
  let strays = 0;
  for (let i = correlations.length - 1; i >= 0; i--) {
    const size = Math.abs(correlations[i]!) / band(i);
    if (!(size > 1)) continue;
    if (size > FAR || strays > 0 || i < STRAYS_FROM) return i + 1;
    strays++;
  }
  return 0;
}

type Pair = readonly [ar: number, ma: number];

function shortPart(
  p: number,
  q: number,
  band: number,
  lags: number,
): { reason: AdviceReason; pairs: readonly Pair[]; sureness: Sureness } {
  if (p === 0 && q === 0)
    return {
      reason: { about: 'orders', code: 'white', numbers: { lags } },
      pairs: [
        [0, 0],
        [1, 0],
      ],
      sureness: 'clear',
    };
  const ar = Math.max(p, 1);
  const ma = Math.max(q, 1);
  if (q > 0 && q < p && q <= MOST_MA)
    return {
      reason: { about: 'orders', code: 'correlationsEnd', numbers: { lag: q, band } },
      pairs: [[0, q], [1, q], ...(p <= MOST_AR ? [[p, 0] as const] : [])],
      sureness: q <= 2 ? 'clear' : 'likely',
    };
  if (ar <= MOST_AR)
    return {
      reason: { about: 'orders', code: 'partialsEnd', numbers: { lag: ar, band } },
      pairs: [[ar, 0], [1, 1], ...(ma <= MOST_MA && ma <= ar ? [[0, ma] as const] : [])],
      sureness: ar <= 2 && q > p ? 'clear' : 'likely',
    };
  return {
    reason: { about: 'orders', code: 'bothDecay', numbers: { partialLag: p, correlationLag: q } },
    pairs: [
      [1, 1],
      [2, 1],
      [MOST_AR, 0],
    ],
    sureness: 'open',
  };
}

function seasonalPart(
  r: number,
  band: number,
  s: number,
  D: number,
): { P: number; Q: number; reasons: readonly AdviceReason[] } {
  // A difference that was not quite called for, and one that was, both leave a negative correlation at the season.
  if (Number.isNaN(r) || Math.abs(r) <= band) return { P: 0, Q: D, reasons: [] };
  const reasons: AdviceReason[] = [{ about: 'orders', code: 'seasonalMemory', numbers: { s, r } }];
  return r > 0 ? { P: 1, Q: D, reasons } : { P: 0, Q: 1, reasons };
}
