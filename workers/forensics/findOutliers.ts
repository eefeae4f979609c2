import type { Finding } from '../contract/forensics.ts';
import { normalQuantile } from '../distributions/normalQuantile.ts';
import { gapRunsOf } from './gapRunsOf.ts';
import { runsWhere } from './runsWhere.ts';
import type { Whitened } from './whitenRecord.ts';

/** Chance of any false alarm among n readings, in normal records. */
const CHANCE = 1e-3;
/** No limit is below this: logged records have somewhat longer tails than the normal. */
const LEAST = 5.5;
/** An outlier of the reading alone must explain the innovations nearly as well as a jump of the process that lives on. */
const ALONE = 0.9;
/** More than this share are no single outliers. */
const MOST_SHARE = 0.05;

/**
 * Single wild readings.
 *
 * Method: additive outliers one by one (Chang, Tiao & Chen 1988, Technometrics 30, 193–204): the effect at t is
 * ω = (e_t − Σ a_i e_{t+i})/τ², τ² = 1 + Σ a_i², its statistic ωτ/σ with σ robust. The largest is taken, its effect removed from the
 * innovations, and so on. The limit is normal with Bonferroni's bound over n, at least 5.5. A jump that lives on in the process
 * (statistic e_t/σ clearly the larger) is not one.
 *
 * @param whitened of the record; @param scale robust scale of its innovations
 * @returns a finding or null; `numbers`: largest (size in the record's unit, signed), statistic (of the largest), limit, inDeviations
 */
export function findOutliers({ innovations, coefficients, scale }: Whitened): Finding | null {
  const n = innovations.length;
  const e = innovations.slice();
  const limit = Math.max(LEAST, -normalQuantile(CHANCE / (2 * n)));
  const statistics = new Float64Array(n);
  const sizes = new Float64Array(n);
  const judge = (t: number) => {
    let [sum, tau2] = [e[t]!, 1];
    for (let i = 0; i < coefficients.length; i++) {
      const later = e[t + 1 + i];
      if (later === undefined || Number.isNaN(later)) continue;
      sum -= coefficients[i]! * later;
      tau2 += coefficients[i]! ** 2;
    }
    const statistic = Math.abs(sum) / Math.sqrt(tau2) / scale;
    const alone = statistic >= (ALONE * Math.abs(e[t]!)) / scale;
    statistics[t] = alone ? statistic : 0;
    sizes[t] = sum / tau2;
  };
  for (let t = 0; t < n; t++) judge(t);
  const found = new Map<number, { size: number; statistic: number }>();
  while (found.size < Math.max(3, MOST_SHARE * n)) {
    let worst = -1;
    let most = limit;
    for (let t = 0; t < n; t++) if (statistics[t]! > most && !found.has(t)) [worst, most] = [t, statistics[t]!];
    if (worst < 0) break;
    const size = sizes[worst]!;
    found.set(worst, { size, statistic: most });
    e[worst]! -= size;
    for (let i = 0; i < coefficients.length && worst + 1 + i < n; i++) e[worst + 1 + i]! += coefficients[i]! * size;
    const last = Math.min(n - 1, worst + coefficients.length);
    for (let t = Math.max(0, worst - coefficients.length); t <= last; t++) judge(t);
  }
  if (found.size === 0) return null;
  const places = runsWhere(n, (t) => found.has(t));
  const [largest] = [...found.values()].sort((a, b) => b.statistic - a.statistic);
  return {
    code: 'outlier',
    count: found.size,
    places,
    numbers: {
      largest: largest!.size,
      statistic: largest!.statistic,
      limit,
      inDeviations: Math.abs(largest!.size) / scale,
    },
    effect: 'memoryHidden',
    offered: [{ kind: 'gaps', runs: gapRunsOf(places) }],
  };
}
