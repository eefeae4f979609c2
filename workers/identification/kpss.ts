import type { UnitRootTest } from '../contract/shape.ts';
import { kpssUpperTail } from './kpssUpperTail.ts';

/**
 * Upper 1, 5 and 10 % points of the limit laws, from `kpssUpperTail`. The table of 1992 (.739 .463 .347; .216 .146 .119) agrees with
 * them to its simulation error.
 */
const CRITICAL = {
  constant: [0.7434593, 0.4613613, 0.3473049],
  trend: [0.2177467, 0.1478905, 0.1192202],
} as const;

const FEWEST = 10;

/**
 * KPSS test; null hypothesis: stationary about a constant or a straight line.
 *
 * Method: η = n⁻² Σ S_t² / s²(l), S_t partial sums of the least-squares residuals e_t, and
 * s²(l) = n⁻¹ [Σ e_t² + 2 Σ_{j≤l} (1 − j/(l + 1)) Σ e_t e_{t−j}] (Kwiatkowski, Phillips, Schmidt & Shin 1992, J. Econometrics 54,
 * 159–178, equations 8, 10 and 13). Where l is not given it is ⌊12 (n/100)^¼⌋, their l12, which holds its size best on records of
 * strong short memory. In a gap the residual enters as 0 and n counts every place: the record times its pattern of gaps is
 * stationary where the record is (Parzen 1963, Sankhyā A 25, 383–392), and the limit law holds for gaps spread evenly.
 *
 * @param values length n, gaps as NaN
 * @param trend `constant` or `trend`; @param lags l ≥ 0
 * @returns statistic, critical values at 1, 5 and 10 %, exact p-value of the limit law; null for fewer than 10 readings, no
 *   variation, or a long-run variance of 0
 */
export function kpss(values: Float64Array, trend: 'constant' | 'trend', lags?: number): UnitRootTest | null {
  const n = values.length;
  const { residuals, count } = residualsAbout(values, trend);
  if (count < FEWEST) return null;
  const l = Math.min(n - 1, lags ?? Math.floor(12 * (n / 100) ** 0.25));
  let variance = product(residuals, 0);
  const own = variance;
  for (let j = 1; j <= l; j++) variance += 2 * (1 - j / (l + 1)) * product(residuals, j);
  if (!(variance > 1e-12 * own)) return null;
  let sum = 0;
  let squares = 0;
  for (let t = 0; t < n; t++) {
    sum += residuals[t]!;
    squares += sum * sum;
  }
  const statistic = squares / n / variance;
  const critical = CRITICAL[trend];
  return {
    trend,
    statistic,
    critical,
    pValue: kpssUpperTail(statistic, trend),
    lags: l,
    readings: count,
    rejects: statistic > critical[1],
  };
}

function product(x: Float64Array, lag: number): number {
  let sum = 0;
  for (let t = lag; t < x.length; t++) sum += x[t]! * x[t - lag]!;
  return sum;
}

/** Least-squares residuals about a constant or a line; 0 in gaps. */
function residualsAbout(values: Float64Array, trend: 'constant' | 'trend'): { residuals: Float64Array; count: number } {
  const n = values.length;
  let count = 0;
  let total = 0;
  let place = 0;
  for (let t = 0; t < n; t++) {
    if (Number.isNaN(values[t]!)) continue;
    count++;
    total += values[t]!;
    place += t;
  }
  const level = total / count;
  const middle = place / count;
  let cross = 0;
  let spread = 0;
  let rest = 0;
  for (let t = 0; t < n; t++) {
    if (Number.isNaN(values[t]!)) continue;
    const deviation = values[t]! - level;
    rest += deviation;
    cross += (t - middle) * deviation;
    spread += (t - middle) ** 2;
  }
  const slope = trend === 'trend' && spread > 0 ? cross / spread : 0;
  const centre = level + rest / count;
  const residuals = values.map((value, t) => (Number.isNaN(value) ? 0 : value - centre - slope * (t - middle)));
  return { residuals, count };
}
