import { describe, expect, it } from 'vitest';
import { levelGain, pointQuantities } from '../../../workers/uncertainty/pointQuantities.ts';
import { weightedQuantiles } from '../../../workers/uncertainty/weightedQuantiles.ts';
import { mixturesOf } from '../../../workers/uncertainty/mixtures.ts';
import { bumpLogDensity, bumpOf } from '../../../workers/uncertainty/bump.ts';
import { pilotBump } from '../../../workers/uncertainty/pilotBump.ts';
import { importanceSample } from '../../../workers/uncertainty/importanceSample.ts';
import { createRandom } from '../../../workers/numeric/random.ts';

const none = { seasonalAr: [], seasonalMa: [] };

describe('quantities of a parameter point', () => {
  it('are those of the polynomials', () => {
    // φ = (1.2, −.72): a pair of modulus √.72, angle 45°, period 8 readings.
    const found = pointQuantities({ ar: [1.2, -0.72], ma: [0.5], ...none }, 0);
    expect(found.arModulus).toBeCloseTo(Math.sqrt(0.72), 12);
    expect(found.arPeriod).toBeCloseTo(8, 12);
    expect(found.timeConstant).toBeCloseTo(-1 / Math.log(Math.sqrt(0.72)), 12);
    expect(found.gain).toBeCloseTo(1.5 / 0.52, 12);
    expect(found.maPeriod).toBeNaN();
  });

  it('take the slowest of three roots, and the seasonal one by its season', () => {
    // (1 − .5B)(1 − .9B)(1 + .2B) multiplied out.
    const found = pointQuantities({ ar: [1.2, -0.17, -0.09], ma: [], ...none }, 0);
    expect(found.arModulus).toBeCloseTo(0.9, 10);
    const seasonal = pointQuantities({ ar: [0.5], ma: [], seasonalAr: [0.8], seasonalMa: [] }, 4);
    expect(seasonal.timeConstant).toBeCloseTo(-4 / Math.log(0.8), 10);
    expect(levelGain({ ar: [0.5], seasonalAr: [0.8] })).toBeCloseTo(0.1, 12);
  });
});

describe('weighted quantiles', () => {
  it('rise from middle to middle', () => {
    expect(weightedQuantiles([3, 1, 2], [1, 1, 1], [0.5]).quantiles).toEqual([2]);
    expect(weightedQuantiles([10, 20], [3, 1], [0.625]).quantiles[0]).toBeCloseTo(15, 12);
  });

  it('leave out what does not exist, and say how much does', () => {
    const { quantiles, share } = weightedQuantiles([NaN, 5], [1, 3], [0.1, 0.9]);
    expect(quantiles).toEqual([5, 5]);
    expect(share).toBeCloseTo(0.75, 12);
    expect(weightedQuantiles([NaN], [1], [0.5])).toEqual({ quantiles: [NaN], share: 0 });
  });
});

describe('mixtures', () => {
  it('of one component are its own law', () => {
    // t(0.975; 5) = 2.570582, χ²(0.975; 5) = 12.832502 and χ²(0.025; 5) = 0.831212: tables.
    const mixtures = mixturesOf(5);
    const [upper] = mixtures.student({ weights: [1], centres: [10], scales: [2] }, [0.975]);
    expect(upper).toBeCloseTo(10 + 2 * 2.570582, 3);
    const [low, high] = mixtures.sigma([1], [8], [0.025, 0.975]);
    expect(low).toBeCloseTo(Math.sqrt(8 / 12.832502), 3);
    expect(high).toBeCloseTo(Math.sqrt(8 / 0.831212), 3);
  });

  it('of two far apart have their halves', () => {
    const [low, high] = mixturesOf(1e6).student(
      { weights: [0.5, 0.5], centres: [0, 100], scales: [1, 1] },
      [0.05, 0.95],
    );
    // Normal quantile at 0.1: −1.281552, tables.
    expect(low).toBeCloseTo(-1.281552, 3);
    expect(high).toBeCloseTo(101.281552, 3);
  });
});

describe('importance sampling', () => {
  it('weighs a bump to one', () => {
    const bump = bumpOf(Float64Array.of(1, 2), Float64Array.of(2, 0.5, 0.5, 1))!;
    let sum = 0;
    for (let x = -60; x < 60; x += 0.1)
      for (let y = -60; y < 60; y += 0.1) sum += Math.exp(bumpLogDensity(bump, Float64Array.of(x, y))) * 0.01;
    // What is beyond 60 is a few thousandths of nothing: 4 degrees of freedom fall with the fourth power.
    expect(sum).toBeCloseTo(1, 3);
  });

  it('finds mean and spread of a skewed two-dimensional law from one pilot', () => {
    // x normal(1, .5²), y | x normal(x², .3²): E y = 1.25, E x = 1.
    const logDensity = (at: Float64Array) => -(((at[0]! - 1) / 0.5) ** 2) / 2 - ((at[1]! - at[0]! ** 2) / 0.3) ** 2 / 2;
    const sample = importanceSample(
      (at) => ({ logDensity: logDensity(at), value: null }),
      [pilotBump(logDensity, Float64Array.of(1, 1))],
      createRandom(4),
      { wanted: 2000, most: 20_000 },
    );
    expect(sample.effectiveSize).toBeGreaterThan(2000);
    const mean = (i: number) => sample.points.reduce((sum, { at, weight }) => sum + weight * at[i]!, 0);
    // Standard errors from 2000 independent points: 0.011 and 0.024.
    expect(Math.abs(mean(0) - 1)).toBeLessThan(0.04);
    expect(Math.abs(mean(1) - 1.25)).toBeLessThan(0.08);
  });
});
