import { describe, expect, it } from 'vitest';
import {
  isAdmissible,
  largestArModulus,
  largestMaModulus,
  nearestPair,
} from '../../../../workers/estimation/search/admissibility.ts';
import { rootPairSpread } from '../../../../workers/estimation/search/rootPairSpread.ts';

const model = (ar: number[], ma: number[], seasonalAr: number[] = [], seasonalMa: number[] = []) => ({
  all: Float64Array.from([...ar, ...ma, ...seasonalAr, ...seasonalMa]),
  ar: Float64Array.from(ar),
  ma: Float64Array.from(ma),
  seasonalAr: Float64Array.from(seasonalAr),
  seasonalMa: Float64Array.from(seasonalMa),
});

describe('admissible models', () => {
  it('have MA roots on the circle, but no AR root there', () => {
    expect(isAdmissible(model([0.5], [-1]), 0)).toBe(true);
    expect(isAdmissible(model([1], [0.3]), 0)).toBe(false);
    expect(isAdmissible(model([1.6, -1], []), 0)).toBe(false);
  });

  it('have no AR–MA pair within 0.01 of each other and of the circle', () => {
    expect(isAdmissible(model([0.995], [-0.999]), 0)).toBe(false);
    expect(isAdmissible(model([0.995], [-0.98]), 0)).toBe(true);
    expect(isAdmissible(model([0.5], [-0.5]), 0)).toBe(true);
    // The colour record's spurious maximum: φ (1.855, −1), θ (−1.852, 1), just inside.
    expect(isAdmissible(model([1.855, -0.9999], [-1.852, 0.9999]), 0)).toBe(false);
  });

  it('compare seasonal roots with regular ones through their s-th roots', () => {
    // φ = 0.999 against Θ(B¹²) = 1 − 0.999¹² B¹²: they share the root.
    expect(isAdmissible(model([0.999], [], [], [-(0.999 ** 12)]), 12)).toBe(false);
    expect(isAdmissible(model([-0.999], [], [], [-(0.999 ** 12)]), 12)).toBe(false);
    expect(isAdmissible(model([0.999], [], [], [0.999 ** 12]), 12)).toBe(true);
    expect(isAdmissible(model([], [], [0.99], [-0.99]), 12)).toBe(false);
    expect(largestArModulus(model([0.5], [], [0.5 ** 4]), 4)).toBeCloseTo(0.5, 12);
    expect(largestMaModulus(model([], [-0.3], [], [-(0.9 ** 4)]), 4)).toBeCloseTo(0.9, 12);
  });

  it('without one of the polynomials have no pair', () => {
    expect(nearestPair(model([0.9], []), 0, 0)).toBeNull();
    expect(largestArModulus(model([], [0.4]), 0)).toBe(0);
  });
});

describe('rootPairSpread', () => {
  it('is the delta method: for ARMA(1,1) the standard error of φ + θ', () => {
    const covariance = { values: Float64Array.of(0.04, -0.035, -0.035, 0.05), size: 2 };
    const near = rootPairSpread(model([0.5], [-0.3]), 0, [0, 1], covariance)!;
    expect(near.distance).toBeCloseTo(0.2, 12);
    // The MA root is −θ: var(φ − (−θ)) = 0.04 + 0.05 − 2·0.035.
    expect(near.standardDeviation).toBeCloseTo(Math.sqrt(0.02), 12);
    expect(rootPairSpread(model([0.5], [0.3]), 0, [0, 1], covariance)).toBeNull();
  });

  it('moves a pair of complex roots as the implicit function theorem has it', () => {
    // Inverse roots of 1 − φ1B − φ2B²: m·e^{±iω}, m² = −φ2; with φ1 fixed, dm/dφ2 = −1/(2m).
    const [one, two] = [1.2, -0.81];
    const step = 1e-6;
    const root = (phi2: number) => ({ re: one / 2, im: Math.sqrt(-phi2 - (one / 2) ** 2) });
    const moved = (root(two + step).im - root(two - step).im) / (2 * step);
    const covariance = { values: new Float64Array(9), size: 3 };
    covariance.values[4] = 1;
    const near = rootPairSpread(model([one, two], [-0.9]), 0, [0, 1, 2], covariance)!;
    expect(near.standardDeviation).toBeCloseTo(Math.abs(moved), 6);
  });
});
