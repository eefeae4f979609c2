import { normalQuantile } from '../distributions/normalQuantile.ts';
import { haltonDimensions, haltonPoint } from '../numeric/haltonPoint.ts';
import type { Random } from '../numeric/random.ts';
import { bumpDraw, bumpLogDensity, bumpOf, type Bump } from './bump.ts';

/** A point with its share of the whole weight. */
export interface Weighted<Value> {
  readonly at: Float64Array;
  readonly value: Value;
  readonly weight: number;
}

export interface ImportanceSample<Value> {
  /** Points that carry weight, in the order drawn. */
  readonly points: readonly Weighted<Value>[];
  /** 1/Σ weight²: how many independent points they are worth. */
  readonly effectiveSize: number;
  readonly drawn: number;
}

export interface SampleOptions {
  /** Effective size at which to stop, and points after which to stop anyway. */
  readonly wanted: number;
  readonly most: number;
}

interface Draw<Value> {
  readonly at: Float64Array;
  readonly value: Value;
  readonly logDensity: number;
  /** Σ over the stages of (points drawn × proposal density). */
  proposal: number;
  weight: number;
}

/** Share of the draws of a later stage from the bumps of the first, which keep every mode in view. */
const PILOT_SHARE = 0.2;
/** The adapted bump is this much wider than the points seen so far: a proposal too wide costs less than one too narrow. */
const WIDER = 1.15;
/** Effective points, for each dimension, without which a covariance is not to be believed. */
const FEW = 12;

/**
 * Points with weights that stand for a law known up to a constant.
 *
 * Method: adaptive multiple importance sampling (Cornuet, Marin, Mira & Robert 2012, Scand. J. Statist. 39, 798–812): each stage draws from
 * heavy-tailed bumps, the next from a bump fitted to all points so far; in the end every point is weighed against the mixture of all
 * proposals (Owen & Zhou 2000, JASA 95, 135–143). Draws are quasi-random as far as coordinates go round.
 *
 * @param weigh ln density and what comes with it; null outside
 * @param pilots first bumps, at least one
 * @param random seeds shifts and choices; @param options when to stop
 */
export function importanceSample<Value>(
  weigh: (at: Float64Array) => { readonly logDensity: number; readonly value: Value } | null,
  pilots: readonly Bump[],
  random: Random,
  options: SampleOptions,
): ImportanceSample<Value> {
  const k = pilots[0]!.at.length;
  const source = drawSource(k, random);
  const draws: Draw<Value>[] = [];
  const stages: { readonly bumps: readonly Bump[]; readonly shares: readonly number[]; readonly count: number }[] = [];
  const size = Math.max(200, Math.ceil(options.wanted / 2));
  const mixture = (at: Float64Array, stage: (typeof stages)[number]) =>
    stage.bumps.reduce((sum, bump, i) => sum + stage.shares[i]! * Math.exp(bumpLogDensity(bump, at)), 0);
  let drawn = 0;
  let effectiveSize = 0;
  while (effectiveSize < options.wanted && drawn < options.most) {
    const adapted = stages.length === 0 ? null : adaptedBump(draws, effectiveSize, k);
    const first = pilots.map(() => (adapted === null ? 1 : PILOT_SHARE) / pilots.length);
    const stage = {
      bumps: adapted === null ? pilots : [...pilots, adapted],
      shares: adapted === null ? first : [...first, 1 - PILOT_SHARE],
      count: Math.min(size, options.most - drawn),
    };
    for (const draw of draws) draw.proposal += stage.count * mixture(draw.at, stage);
    stages.push(stage);
    for (let i = 0; i < stage.count; i++) {
      const at = source(stage.bumps, stage.shares);
      const weighed = weigh(at);
      if (weighed === null) continue;
      const proposal = stages.reduce((sum, each) => sum + each.count * mixture(at, each), 0);
      draws.push({ at, ...weighed, proposal, weight: 0 });
    }
    drawn += stage.count;
    effectiveSize = normaliseWeights(draws);
  }
  const points = draws.filter(({ weight }) => weight > 1e-12).map(({ at, value, weight }) => ({ at, value, weight }));
  return { points, effectiveSize, drawn };
}

/** Sets the weights to a sum of 1 and returns the effective size. */
function normaliseWeights<Value>(draws: readonly Draw<Value>[]): number {
  let most = -Infinity;
  for (const draw of draws) most = Math.max(most, draw.logDensity - Math.log(draw.proposal));
  let sum = 0;
  for (const draw of draws) sum += draw.weight = Math.exp(draw.logDensity - Math.log(draw.proposal) - most);
  let squares = 0;
  for (const draw of draws) squares += (draw.weight /= sum) ** 2;
  return draws.length === 0 ? 0 : 1 / squares;
}

/** A bump over all points so far; with few effective ones the weights are flattened until there are enough. */
function adaptedBump<Value>(draws: readonly Draw<Value>[], effectiveSize: number, k: number): Bump | null {
  let weights = draws.map(({ weight }) => weight);
  for (let power = 1, size = effectiveSize; size < FEW * k && power > 0.05;) {
    power /= 1.5;
    const flat = draws.map(({ weight }) => weight ** power);
    const sum = flat.reduce((a, b) => a + b, 0);
    weights = flat.map((weight) => weight / sum);
    size = 1 / weights.reduce((a, b) => a + b * b, 0);
  }
  const mean = new Float64Array(k);
  draws.forEach(({ at }, n) => at.forEach((value, i) => (mean[i]! += weights[n]! * value)));
  const covariance = new Float64Array(k * k);
  draws.forEach(({ at }, n) => {
    for (let i = 0; i < k; i++)
      for (let j = 0; j < k; j++)
        covariance[i * k + j]! += weights[n]! * WIDER ** 2 * (at[i]! - mean[i]!) * (at[j]! - mean[j]!);
  });
  // The covariance of a t law with 4 degrees of freedom is twice its scale matrix.
  return bumpOf(
    mean,
    covariance.map((value) => value / 2),
  );
}

/** Draws from mixtures of bumps: quasi-random coordinates for the normals and the stretch, a plain random choice of the bump. */
function drawSource(k: number, random: Random) {
  const smooth = Math.min(k + 2, haltonDimensions);
  const shift = Float64Array.from({ length: smooth }, () => random.uniform());
  const point = new Float64Array(smooth);
  let index = 0;
  return (bumps: readonly Bump[], shares: readonly number[]): Float64Array => {
    index++;
    haltonPoint(index, shift, point);
    const at = (j: number) => (j < smooth ? Math.min(1 - 1e-16, Math.max(1e-16, point[j]!)) : random.uniform());
    let choice = random.uniform();
    let which = 0;
    while (which < bumps.length - 1 && (choice -= shares[which]!) > 0) which++;
    const normals = Float64Array.from({ length: k }, (_, j) => normalQuantile(at(j + 2)));
    return bumpDraw(bumps[which]!, normals, at(0), at(1));
  };
}
