import type { Warning } from '../contract/fit.ts';
import type { Job } from './fitCandidate.ts';

/** Fewer readings than this for each parameter are few (common practice: 5 to 10). */
const READINGS_PER_PARAMETER = 7;
/** Digits are lost in the input itself where its level is this many times its spread. */
const OFFSET = 1e7;
/** Innovations this small a part of the record's variance: what is modelled is next to a deterministic curve. */
const NEARLY_NOTHING = 1e-6;
/** One reading in fifty carrying this share of the variance: the variance is theirs, not the record's. */
const FEW = 1 / 50;
const SHARE = 0.9;
/** A smallest step above this many standard deviations changes the estimates (common practice: one half). */
const COARSE = 0.5;

/**
 * Warnings about the record rather than the model: few readings, variance due to a few points, lost digits, coarse
 * steps.
 *
 * @param innovationVariance in the transformed record's units
 */
export function recordWarnings(job: Job, innovationVariance: number): Warning[] {
  const { likelihood, parameterCount } = job;
  const readings = likelihood.readingsUsed;
  const warnings: Warning[] = [];
  const wanted = READINGS_PER_PARAMETER * parameterCount;
  if (readings < wanted) {
    warnings.push({ code: 'fewReadings', numbers: { readings, parameters: parameterCount, wanted } });
  }
  const { record, centre } = likelihood.prepared;
  const sorted = record.filter((value) => !Number.isNaN(value)).sort();
  const spread = Math.sqrt(varianceOf(sorted));
  const part = innovationVariance / (spread * likelihood.scale) ** 2;
  const few = shareOfFew(sorted);
  if (part < NEARLY_NOTHING || few.share > SHARE) {
    warnings.push({ code: 'nearlyDeterministic', numbers: { variancePart: part, ...few } });
  }
  const ratio = Math.abs(centre) / (spread * likelihood.scale);
  if (ratio > OFFSET) warnings.push({ code: 'digitsLost', numbers: { ratio, digits: Math.floor(Math.log10(ratio)) } });
  const step = smallestStep(sorted) / spread;
  if (step > COARSE) {
    warnings.push({ code: 'quantised', numbers: { step: step * spread * likelihood.scale, inDeviations: step } });
  }
  return warnings;
}

function varianceOf(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value;
  const mean = sum / values.length;
  let squares = 0;
  for (const value of values) squares += (value - mean) ** 2;
  return squares / values.length;
}

/** How many readings are one in fifty (at least one), and the share of Σ(y − median)² that the farthest ones carry. */
function shareOfFew(sorted: Float64Array): { points: number; share: number } {
  const median = sorted[sorted.length >> 1]!;
  const points = Math.max(1, Math.floor(sorted.length * FEW));
  let total = 0;
  for (const value of sorted) total += (value - median) ** 2;
  // The farthest from the median stand at the two ends.
  let top = 0;
  let low = 0;
  let high = sorted.length - 1;
  for (let i = 0; i < points; i++) {
    const below = median - sorted[low]!;
    const above = sorted[high]! - median;
    if (below > above) low++;
    else high--;
    top += Math.max(below, above) ** 2;
  }
  return { points, share: total > 0 ? top / total : 0 };
}

/** The smallest distance between different values; 0 where all are equal. Steps lost in rounding do not count. */
function smallestStep(sorted: Float64Array): number {
  let smallest = Infinity;
  const rounding = 1e-9 * Math.max(Math.abs(sorted[0]!), Math.abs(sorted[sorted.length - 1]!));
  for (let i = 1; i < sorted.length; i++) {
    const step = sorted[i]! - sorted[i - 1]!;
    if (step > rounding && step < smallest) smallest = step;
  }
  return Number.isFinite(smallest) ? smallest : 0;
}
