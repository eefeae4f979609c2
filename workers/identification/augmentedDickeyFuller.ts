import type { UnitRootTest } from '../contract/shape.ts';
import { cholesky } from '../numeric/cholesky.ts';
import { choleskySolve } from '../numeric/choleskySolve.ts';
import { mean } from '../numeric/mean.ts';
import { dickeyFullerCritical } from './dickeyFullerCritical.ts';

/** More lagged differences than this are never tried. */
const MOST_LAGS = 24;
/** Fewer rows than this beyond the coefficients say nothing. */
const SPARE_ROWS = 6;

/**
 * Augmented Dickey–Fuller test; null hypothesis: a unit root.
 *
 * Method: least squares of ∇y_t = α (+ βt) + γ y_{t−1} + Σ_{i≤k} δ_i ∇y_{t−i} + e_t, the statistic being the t-ratio of γ (Dickey & Fuller 1979,
 * J. Am. Stat. Assoc. 74, 427–431; Said & Dickey 1984, Biometrika 71, 599–607). With gaps the rows are those of which every term is
 * observed. Where k is not given it is the one of least AIC, over the rows of the longest regression, among 0…⌊12 (n/100)^¼⌋ (Schwert 1989,
 * J. Bus. Econ. Stat. 7, 147–159), at most 24; the statistic is then from all rows that k allows. Cross-products of the centred record,
 * solved by Cholesky.
 *
 * @param values length n, gaps as NaN
 * @param trend `constant`: about a constant; `trend`: about a straight line
 * @param lags k ≥ 0
 * @returns statistic, critical values at 1, 5 and 10 % (`dickeyFullerCritical`), lags and rows used; a small (very negative) statistic
 *   rejects; null where too few rows are complete or they are collinear (as for a constant record)
 */
export function augmentedDickeyFuller(
  values: Float64Array,
  trend: 'constant' | 'trend',
  lags?: number,
): UnitRootTest | null {
  const middle = mean(values);
  const y = values.map((value) => value - middle);
  const k = lags ?? bestLags(y, trend);
  if (k === null) return null;
  const rows = crossProducts(y, k);
  const fitted = regress(rows, trend, k);
  if (fitted === null) return null;
  const { gamma, gammaError } = fitted;
  const statistic = gamma / gammaError;
  if (!Number.isFinite(statistic)) return null;
  const critical = dickeyFullerCritical(trend, rows.count);
  return { trend, statistic, critical, pValue: NaN, lags: k, readings: rows.count, rejects: statistic < critical[1] };
}

/** Cross-products of the columns 1, t, y_{t−1}, ∇y_{t−1} … ∇y_{t−k}, ∇y_t in this order; row-major lower triangle. */
interface CrossProducts {
  readonly size: number;
  readonly products: Float64Array;
  readonly count: number;
}

function crossProducts(y: Float64Array, k: number): CrossProducts {
  const n = y.length;
  const size = k + 4;
  const products = new Float64Array(size * size);
  const row = new Float64Array(size);
  let count = 0;
  let run = 0;
  for (let t = 0; t < n; t++) {
    run = Number.isNaN(y[t]!) ? 0 : run + 1;
    if (run < k + 2) continue;
    row[0] = 1;
    // Time runs over −1…1, so that its column is of the size of the constant.
    row[1] = (2 * t) / n - 1;
    row[2] = y[t - 1]!;
    for (let i = 1; i <= k; i++) row[2 + i] = y[t - i]! - y[t - i - 1]!;
    row[size - 1] = y[t]! - y[t - 1]!;
    for (let i = 0; i < size; i++) {
      const left = row[i]!;
      const at = i * size;
      for (let j = 0; j <= i; j++) products[at + j]! += left * row[j]!;
    }
    count++;
  }
  return { size, products, count };
}

function regress(
  { size, products, count }: CrossProducts,
  trend: 'constant' | 'trend',
  k: number,
): { gamma: number; gammaError: number; residual: number; columns: number } | null {
  const used = [0, ...(trend === 'trend' ? [1] : []), 2, ...Array.from({ length: k }, (_, i) => 3 + i)];
  const columns = used.length;
  if (count < columns + SPARE_ROWS) return null;
  const product = (i: number, j: number) => products[Math.max(i, j) * size + Math.min(i, j)]!;
  const last = size - 1;
  const scale = used.map((column) => Math.sqrt(product(column, column)));
  if (scale.some((one) => !(one > 0))) return null;
  const matrix = new Float64Array(columns * columns);
  for (let i = 0; i < columns; i++)
    for (let j = 0; j <= i; j++) matrix[i * columns + j] = product(used[i]!, used[j]!) / scale[i]! / scale[j]!;
  if (!cholesky(matrix, columns)) return null;
  const right = Float64Array.from(used, (column, i) => product(column, last) / scale[i]!);
  const solved = right.slice();
  choleskySolve(matrix, columns, solved);
  let residual = product(last, last);
  for (let i = 0; i < columns; i++) residual -= right[i]! * solved[i]!;
  const place = used.indexOf(2);
  const unit = new Float64Array(columns);
  unit[place] = 1;
  choleskySolve(matrix, columns, unit);
  if (!(residual > 0)) return null;
  return {
    gamma: solved[place]! / scale[place]!,
    gammaError: Math.sqrt(((residual / (count - columns)) * unit[place]) / scale[place]! ** 2),
    residual,
    columns,
  };
}

function bestLags(y: Float64Array, trend: 'constant' | 'trend'): number | null {
  const observed = y.reduce((sum, value) => sum + (Number.isNaN(value) ? 0 : 1), 0);
  let most = Math.min(MOST_LAGS, Math.floor(12 * (observed / 100) ** 0.25));
  let rows = crossProducts(y, most);
  // Gaps close together leave few rows for a long regression: a shorter one may still have enough.
  while (most > 0 && rows.count < Math.max(observed / 2, most + 3 + SPARE_ROWS)) {
    most = Math.floor(most / 2);
    rows = crossProducts(y, most);
  }
  let best: number | null = null;
  let least = Infinity;
  for (let k = 0; k <= most; k++) {
    const fitted = regress(rows, trend, k);
    if (fitted === null) continue;
    const aic = rows.count * Math.log(fitted.residual / rows.count) + 2 * fitted.columns;
    if (aic < least) [best, least] = [k, aic];
  }
  return best;
}
