import type { Candidate } from '../../../workers/contract/candidate.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { partialToCoefficients } from '../../../workers/model/partialToCoefficients.ts';
import { createRandom, type Random } from '../../../workers/numeric/random.ts';

export const FROZEN_RECORDS = 1000;
const RUN_IN = 400;

/**
 * One of the frozen records: simulated by the recursion from its index as seed, with a candidate that is often larger
 * than the model that made it. n from 25 to 2000, p and q up to 3; every fourth record is seasonal or has gaps.
 */
export function frozenRecord(index: number): { values: Float64Array; candidate: Candidate } {
  const random = createRandom(1_000_003 + index);
  const special = index % 4 === 3;
  const seasonal = special && index % 8 === 3;
  const most = seasonal ? 2 : 3;
  let [p, q] = [random.integer(most + 1), random.integer(most + 1)];
  if (p + q === 0) [p, q] = [1, 1];
  const s = seasonal ? [4, 7, 12][random.integer(3)]! : 0;
  const [P, Q] = seasonal ? [[1, 0] as const, [0, 1] as const, [1, 1] as const][random.integer(3)]! : [0, 0];
  const least = seasonal ? 6 * s + 20 : 25;
  const n = Math.round(least * (2000 / least) ** random.uniform());

  const ar = factor(random, random.integer(p + 1), 0.98, 1);
  const ma = factor(random, random.integer(q + 1), 0.98, -1);
  const seasonalAr = factor(random, P, 0.9, 1);
  const seasonalMa = factor(random, Q, 0.9, -1);
  const shocks = Float64Array.from({ length: n + RUN_IN }, () => random.normal());
  const moved = recursion(recursion(shocks, [], ma, 1), [], seasonalMa, Math.max(1, s));
  const values = recursion(recursion(moved, ar, [], 1), seasonalAr, [], Math.max(1, s)).slice(RUN_IN);
  if (special && !seasonal) {
    for (let gap = 0; gap < n / 12; gap++) values[random.integer(n)] = NaN;
  }
  const order = { p, d: 0, q, P, D: 0, Q, s };
  return { values, candidate: candidateOf({ order, level: 'mean' }) };
}

function factor(random: Random, length: number, most: number, sign: 1 | -1): number[] {
  const partials = Float64Array.from({ length }, () => most * (2 * random.uniform() - 1));
  const coefficients = new Float64Array(length);
  partialToCoefficients(partials, coefficients);
  return Array.from(coefficients, (value) => sign * value);
}

/** x_t = u_t + Σ θ_j u_{t−js} + Σ φ_i x_{t−is}, from nothing. */
function recursion(u: Float64Array, ar: readonly number[], ma: readonly number[], stride: number): Float64Array {
  const x = new Float64Array(u.length);
  for (let t = 0; t < u.length; t++) {
    let value = u[t]!;
    ma.forEach((theta, j) => (value += theta * (u[t - (j + 1) * stride] ?? 0)));
    ar.forEach((phi, i) => (value += phi * (x[t - (i + 1) * stride] ?? 0)));
    x[t] = value;
  }
  return x;
}
