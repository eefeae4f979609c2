import type { DerivedInterval, DerivedQuantity, IntegratedIntervals } from '../../workers/contract/uncertainty.ts';
import type { Axis } from '../../workers/contract/series.ts';
import { formatReadings } from './axisTime.ts';
import { formatFixed, formatNumber, formatWithUncertainty } from './numbers.ts';

/** An interval by its ends, rounded to a quarter of its length. */
export function intervalEnds(lower: number, upper: number): string {
  if (lower === -Infinity && upper === Infinity) return 'no limit';
  const spread = Number.isFinite(upper - lower) ? (upper - lower) / 4 : null;
  const show = (value: number) =>
    Number.isFinite(value) ? formatWithUncertainty(value, spread).value : formatNumber(value);
  return `${show(lower)} … ${show(upper)}`;
}

/** Something that follows from the coefficients, with its interval. */
export interface DerivedLine {
  readonly name: string;
  readonly value: string;
  readonly interval: string;
  readonly note: string;
}

const names: Record<Exclude<DerivedQuantity, 'constant'>, string> = {
  gain: 'gain θ(1)/φ(1)',
  timeConstant: 'time constant',
  arModulus: 'AR root, modulus',
  arPeriod: 'AR root, period',
  maModulus: 'MA root, modulus',
  maPeriod: 'MA root, period',
};

/** Lines for what follows from the coefficients; times in the record's own unit. The constant stands among the estimates. */
export function derivedLines({ derived }: IntegratedIntervals, axis: Axis): DerivedLine[] {
  return derived.flatMap((each): DerivedLine[] => {
    const { about, estimate, share } = each;
    if (about === 'constant') return [];
    const isTime = about === 'timeConstant' || about === 'arPeriod' || about === 'maPeriod';
    return [
      {
        name: names[about],
        value: Number.isNaN(estimate) ? 'none' : isTime ? formatReadings(axis, estimate) : formatNumber(estimate, 4),
        interval: isTime ? timeEnds(each, axis) : intervalEnds(each.lower, each.upper),
        note: share > 0.995 ? '' : `where the roots oscillate, ${formatFixed(100 * share, 0)} % of the weight`,
      },
    ];
  });
}

function timeEnds({ lower, upper }: DerivedInterval, axis: Axis): string {
  const show = (readings: number) => (readings === Infinity ? 'endless' : formatReadings(axis, readings));
  const [from, to] = [show(lower), show(upper)];
  const unit = / [a-z]+$/.exec(to)?.[0] ?? '';
  // One unit for both ends where it is the same.
  return unit !== '' && from.endsWith(unit) ? `${from.slice(0, -unit.length)} … ${to}` : `${from} … ${to}`;
}

/** What the intervals rest on, with the numbers of this fit. */
export function intervalAssumptions(intervals: IntegratedIntervals): string[] {
  const { coverage, largestArModulus, points, effectiveSize, nearLimit, seed } = intervals;
  const size = Number.isFinite(effectiveSize) ? formatNumber(Math.round(effectiveSize), 9) : 'all';
  return [
    `${formatFixed(100 * coverage, 0)} % intervals from parameter points weighed by the exact likelihood, level and σ integrated out. The computation is Bayesian: flat weight for the level, 1/σ for σ, ∏(1 − r²)^(−½) over the partial autocorrelations.`,
    `It assumes that no AR root is nearer to the unit circle than ${formatFixed(largestArModulus, 4)}, exp(−1/(3n)).${nearLimit > 0.025 ? ` Here ${formatFixed(100 * nearLimit, 0)} % of the weight lies so near to that limit that the interval of the level hangs on it: whether the record has a unit root is the question to settle first.` : ''}`,
    `${formatNumber(points, 9)} points, worth ${size} independent ones; seed ${seed}. The standard error is the plug-in one; the standard deviation of the level over the points need not exist and is not given.`,
  ];
}
