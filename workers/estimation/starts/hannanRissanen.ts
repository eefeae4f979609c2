import type { Order, Parameters, ZeroLags } from '../../contract/candidate.ts';
import { cholesky } from '../../numeric/cholesky.ts';
import { choleskySolve } from '../../numeric/choleskySolve.ts';
import { levinson } from '../../numeric/levinson.ts';
import { pairwiseAutocovariances } from './pairwiseAutocovariances.ts';

type FactorValues = Pick<Parameters, 'ar' | 'ma' | 'seasonalAr' | 'seasonalMa'>;

/** Ridge on the normal equations, relative to their diagonal: keeps an over-specified regression solvable. */
const RIDGE = 1e-10;

/**
 * Starting values by two regressions: innovations from a long autoregression, then the record on its own lags and
 * those of the innovations.
 *
 * Method: Hannan & Rissanen 1982, Biometrika 69, 81–94 (doi:10.1093/biomet/69.1.81), steps 1 and 2; the long
 * autoregression by Levinson–Durbin on the observed pairs, rows touching a gap left out. Seasonal factors enter by
 * their own lags; the products with the regular factors are left out, which is good enough to start from.
 *
 * @param centred the (differenced) record less its level; NaN is a gap
 * @returns coefficients of all four factors, not necessarily stationary or invertible; null where the regression has
 *   too few rows
 */
export function hannanRissanen(centred: Float64Array, order: Order, zeroLags: ZeroLags): FactorValues | null {
  const { p, q, P, Q, s } = order;
  const n = centred.length;
  const terms = [
    ...lagsOf(p, 1, zeroLags.ar, 'ar'),
    ...lagsOf(q, 1, zeroLags.ma, 'ma'),
    ...lagsOf(P, s, zeroLags.seasonalAr, 'seasonalAr'),
    ...lagsOf(Q, s, zeroLags.seasonalMa, 'seasonalMa'),
  ] as const;
  const longest = Math.max(0, ...terms.map(({ lag }) => lag));
  const needsInnovations = q > 0 || Q > 0;
  const long = needsInnovations
    ? Math.max(1, Math.min(Math.floor(n / 4), Math.round(10 * Math.log10(n)) + (Q > 0 ? s * Q : 0), longest + 200))
    : 0;
  const innovations = needsInnovations ? longInnovations(centred, long) : centred;

  const k = terms.length;
  const normal = new Float64Array(k * k);
  const right = new Float64Array(k);
  const row = new Float64Array(k);
  const sources = terms.map(({ part }) => (part === 'ar' || part === 'seasonalAr' ? centred : innovations));
  const lags = Int32Array.from(terms, ({ lag }) => lag);
  let rows = 0;
  for (let t = longest; t < n; t++) {
    const target = centred[t]!;
    let sound = target;
    for (let i = 0; i < k; i++) {
      row[i] = sources[i]![t - lags[i]!]!;
      sound += row[i]!;
    }
    if (sound !== sound) continue;
    rows++;
    for (let i = 0; i < k; i++) {
      right[i]! += row[i]! * target;
      for (let j = 0; j <= i; j++) normal[i * k + j]! += row[i]! * row[j]!;
    }
  }
  if (rows <= k) return null;
  for (let i = 0; i < k; i++) {
    normal[i * k + i]! *= 1 + RIDGE;
    for (let j = 0; j < i; j++) normal[j * k + i] = normal[i * k + j]!;
  }
  if (!cholesky(normal, k)) return null;
  choleskySolve(normal, k, right);
  const values = { ar: zeros(p), ma: zeros(q), seasonalAr: zeros(P), seasonalMa: zeros(Q) };
  terms.forEach(({ part, place }, i) => {
    values[part][place] = right[i]!;
  });
  return values;
}

function lagsOf<Part extends keyof FactorValues>(count: number, stride: number, zero: readonly number[], part: Part) {
  return Array.from({ length: count }, (_, place) => ({ lag: (place + 1) * stride, part, place })).filter(
    ({ place }) => !zero.includes(place + 1),
  );
}

/** Errors of the long autoregression; NaN where a reading it needs is missing. */
function longInnovations(centred: Float64Array, order: number): Float64Array {
  const { coefficients } = levinson(pairwiseAutocovariances(centred, order));
  const m = coefficients.length;
  const result = new Float64Array(centred.length).fill(NaN);
  for (let t = m; t < centred.length; t++) {
    let error = centred[t]!;
    for (let i = 0; i < m; i++) error -= coefficients[i]! * centred[t - 1 - i]!;
    result[t] = error;
  }
  return result;
}

function zeros(length: number): number[] {
  return Array.from({ length }, () => 0);
}
