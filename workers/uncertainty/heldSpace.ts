import type { Order, Parameters } from '../contract/candidate.ts';
import { inversePartialMap, partialMap } from '../estimation/search/partialMap.ts';

export type Coefficients = Pick<Parameters, 'ar' | 'ma' | 'seasonalAr' | 'seasonalMa'>;

/** One coefficient, by factor and lag (1 is the first), kept at a value. */
export interface Held {
  readonly factor: keyof Coefficients;
  readonly lag: number;
  readonly value: number;
}

/** ARMA coefficients by free coordinates, one of them perhaps held. */
export interface HeldSpace {
  readonly dimension: number;
  /** Null outside the stationary (invertible) region. */
  readonly place: (x: Float64Array) => Coefficients | null;
  /** Coordinates of coefficients drawn in until they, with the held one in its place, are inside; null where none are. */
  readonly locate: (at: Coefficients) => Float64Array | null;
}

const NAMES = ['ar', 'ma', 'seasonalAr', 'seasonalMa'] as const;
/** A start this near (in radians) to a face, where the sine has no slope, could not move. */
const OFF_FACE = 0.04;
/** AR roots nearer than this to the circle are outside. */
const MARGIN = 1e-7;

/**
 * Coordinates for a climb with at most one coefficient held. A factor without a held coefficient and without zero lags is searched over the
 * angles whose sines are its partial autocorrelations, smooth across MA roots on the circle; another over its free coefficients.
 *
 * @param order lengths of the factors; @param zeroLags lags held at zero; @param held the coefficient held, or null
 */
export function heldSpace(
  order: Pick<Order, 'p' | 'q' | 'P' | 'Q'>,
  zeroLags: { readonly [name in keyof Coefficients]: readonly number[] },
  held: Held | null,
): HeldSpace {
  const lengths = { ar: order.p, ma: order.q, seasonalAr: order.P, seasonalMa: order.Q };
  const factors = NAMES.map((name) => {
    const length = lengths[name];
    const isHeld = held?.factor === name;
    const free = Array.from({ length }, (_, i) => i + 1).filter(
      (lag) => !zeroLags[name].includes(lag) && !(isHeld && held.lag === lag),
    );
    const sign = name === 'ma' || name === 'seasonalMa' ? -1 : 1;
    return { name, length, free, sign, angular: free.length === length, isHeld };
  });
  const partials = factors.map(({ length }) => new Float64Array(length));
  const dimension = factors.reduce((sum, { free }) => sum + free.length, 0);

  const place = (x: Float64Array): Coefficients | null => {
    const out: Record<keyof Coefficients, number[]> = { ar: [], ma: [], seasonalAr: [], seasonalMa: [] };
    let at = 0;
    for (const [f, { name, length, free, sign, angular, isHeld }] of factors.entries()) {
      const r = partials[f]!;
      const signed = new Float64Array(length);
      if (angular) {
        for (let i = 0; i < length; i++) r[i] = Math.sin(x[at++]!);
        partialMap(r, signed, new Float64Array(length * length));
      } else {
        for (const lag of free) signed[lag - 1] = sign * x[at++]!;
        if (isHeld) signed[held!.lag - 1] = sign * held!.value;
        if (!inversePartialMap(signed, r)) return null;
      }
      if (sign === 1 && r.some((value) => Math.abs(value) > 1 - MARGIN)) return null;
      out[name] = Array.from(signed, (value) => sign * value);
    }
    return out;
  };
  const coordinates = (at: Coefficients, shrink: number): Float64Array | null => {
    const x: number[] = [];
    for (const { name, length, free, sign, angular } of factors) {
      const drawn = at[name].map((value, i) => value * shrink ** (i + 1));
      if (!angular) {
        x.push(...free.map((lag) => drawn[lag - 1] ?? 0));
        continue;
      }
      const r = new Float64Array(length);
      const signed = Array.from({ length }, (_, i) => sign * (drawn[i] ?? 0));
      if (!inversePartialMap(signed, r)) return null;
      const edge = Math.PI / 2 - OFF_FACE;
      x.push(...Array.from(r, (value) => Math.max(-edge, Math.min(edge, Math.asin(value)))));
    }
    const found = Float64Array.from(x);
    return place(found) === null ? null : found;
  };
  return {
    dimension,
    place,
    locate: (at) => {
      for (let shrink = 1; shrink > 1e-3; shrink *= shrink > 0.97 ? 0.999 : 0.9) {
        const found = coordinates(at, shrink);
        if (found !== null) return found;
      }
      return coordinates(at, 0);
    },
  };
}
