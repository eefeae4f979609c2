import { describe, expect, it } from 'vitest';
import { integratedIntervals } from '../../../workers/uncertainty/integratedIntervals.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { fitted } from '../../helpers/fitted.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

function intervalsOf(values: Float64Array, fit: ReturnType<typeof fitted>, seed = 1) {
  const found = integratedIntervals({ fit, values, coverage: 0.95, seed });
  if (!found.ok) throw new Error(JSON.stringify(found.failure));
  return found.value;
}

/** Quantiles of a density on a grid by plain summation. */
function gridQuantiles(points: readonly number[], logDensity: (x: number) => number, probabilities: readonly number[]) {
  const logs = points.map(logDensity);
  const top = Math.max(...logs);
  const weights = logs.map((value) => Math.exp(value - top));
  const total = weights.reduce((a, b) => a + b, 0);
  return probabilities.map((p) => {
    let sum = 0;
    for (let i = 0; i < points.length; i++) {
      sum += weights[i]!;
      if (sum >= p * total) return points[i]!;
    }
    return NaN;
  });
}

const PROBABILITIES = [0.025, 0.5, 0.975];
/** Ends of an interval from about a thousand effective points, in standard deviations of the parameter. */
const POINTS = 0.12;

describe('white noise, where everything is known in closed form', () => {
  // Textbook: x̄ ± t s/√n and √(Σ(x − x̄)²/χ²) (e.g. NIST/SEMATECH e-Handbook, 7.2.2.1 and 7.2.3.1).
  const values = Float64Array.of(3.1, 2.7, 3.6, 2.9, 3.3, 3.8, 2.5, 3.0, 3.4, 2.8);
  const found = intervalsOf(values, fitted(values, {}, 'mean'));

  it('gives Student’s interval for the mean', () => {
    const mean = values.reduce((a, b) => a + b, 0) / 10;
    const squares = values.reduce((sum, x) => sum + (x - mean) ** 2, 0);
    // t(0.975; 9) = 2.262157, tables.
    const half = (2.262157 * Math.sqrt(squares / 9)) / Math.sqrt(10);
    expect(found.coefficients[0]!.lower).toBeCloseTo(mean - half, 4);
    expect(found.coefficients[0]!.upper).toBeCloseTo(mean + half, 4);
    // χ²(0.025; 9) = 2.700389 and χ²(0.975; 9) = 19.022768, tables.
    expect(found.sigma.lower).toBeCloseTo(Math.sqrt(squares / 19.022768), 4);
    expect(found.sigma.upper).toBeCloseTo(Math.sqrt(squares / 2.700389), 4);
  });

  it('needs no points', () => expect(found.effectiveSize).toBe(Infinity));
});

describe('AR(1) with mean against summation over a grid', () => {
  // Lake Huron levels; the density written out from the AR(1) likelihood, no code shared.
  const values = publishedSeries('lakeHuron');
  const n = values.length;
  const parts = (r: number) => {
    // x′V⁻¹y of an AR(1): (1 − r²) x₁y₁ + Σ (x_t − r x_{t−1})(y_t − r y_{t−1}).
    const product = (x: (t: number) => number, y: (t: number) => number) => {
      let sum = (1 - r * r) * x(0) * y(0);
      for (let t = 1; t < n; t++) sum += (x(t) - r * x(t - 1)) * (y(t) - r * y(t - 1));
      return sum;
    };
    const z = (t: number) => values[t]! - 579;
    const one = () => 1;
    const ones = product(one, one);
    const mean = product(one, z) / ones;
    const squares = product(z, z) - mean * mean * ones;
    return { ones, mean: mean + 579, squares };
  };
  const logDensity = (r: number) => {
    const { ones, squares } = parts(r);
    return 0.5 * Math.log(1 - r * r) - 0.5 * Math.log(ones) - ((n - 1) / 2) * Math.log(squares);
  };
  const limit = Math.exp(-1 / (3 * n));
  // Even in the angle asin r, in which the weight (1 − r²)^(−1/2) dr is flat.
  const evenly = (cells: number) =>
    Array.from({ length: cells }, (_, i) => Math.sin(Math.asin(limit) * ((2 * (i + 0.5)) / cells - 1)));
  const grid = evenly(20_000);
  const found = intervalsOf(values, fitted(values, { p: 1 }, 'mean'));

  it('has the quantiles of φ', () => {
    const [lower, median, upper] = gridQuantiles(grid, logDensity, PROBABILITIES);
    const sd = (upper! - lower!) / 3.92;
    expect(Math.abs(found.coefficients[0]!.lower - lower!)).toBeLessThan(POINTS * sd);
    expect(Math.abs(found.coefficients[0]!.median - median!)).toBeLessThan(POINTS * sd);
    expect(Math.abs(found.coefficients[0]!.upper - upper!)).toBeLessThan(POINTS * sd);
  });

  it('has the quantiles of the mean, a mixture with long tails', () => {
    const coarse = evenly(1000).filter((r) => r > 0.3);
    const logs = coarse.map(logDensity);
    const top = Math.max(...logs);
    const laws = coarse.map((r, i) => ({ ...parts(r), weight: Math.exp(logs[i]! - top) }));
    // Student t with n − 1 degrees of freedom written out: density of μ given φ.
    const logMu = (mu: number) => {
      let sum = 0;
      for (const { ones, mean, squares, weight } of laws) {
        const scale = Math.sqrt(squares / (n - 1) / ones);
        sum += (weight / scale) * (1 + ((mu - mean) / scale) ** 2 / (n - 1)) ** (-n / 2);
      }
      return Math.log(sum);
    };
    // Places spread as sinh v, since the tails reach far: the density then takes a factor cosh v.
    const spread = Array.from({ length: 2001 }, (_, i) => (i - 1000) * 0.006);
    const [lower, , upper] = gridQuantiles(
      spread,
      (v) => logMu(579 + Math.sinh(v)) + Math.log(Math.cosh(v)),
      PROBABILITIES,
    ).map((v) => 579 + Math.sinh(v));
    const sd = (upper! - lower!) / 3.92;
    expect(Math.abs(found.coefficients[1]!.lower - lower!)).toBeLessThan(1.5 * POINTS * sd);
    expect(Math.abs(found.coefficients[1]!.upper - upper!)).toBeLessThan(1.5 * POINTS * sd);
  });

  it('says what it assumed', () => {
    expect(found.largestArModulus).toBeCloseTo(limit, 12);
    expect(found.effectiveSize).toBeGreaterThan(900);
    expect(found.derived.map(({ about }) => about)).toEqual(['constant', 'gain', 'timeConstant']);
  });
});

describe('MA(1) with mean beside the circle against summation over a grid', () => {
  // Overshorts: the likelihood is highest at θ = −.847 and reaches −1 with little loss (Brockwell & Davis, example 3.2.8).
  const values = publishedSeries('overshorts');
  const n = values.length;
  const logDensity = (theta: number) => {
    // Innovations recursion of an MA(1) from its exact start: v_1 = 1 + θ², v_t = 1 + θ² − θ²/v_{t−1}.
    let v = 1 + theta * theta;
    let [z, one] = [values[0]!, 1];
    let logs = Math.log(v);
    const sums = { zz: (z * z) / v, z1: (z * one) / v, oneOne: (one * one) / v };
    for (let t = 1; t < n; t++) {
      const gain = theta / v;
      v = 1 + theta * theta - (theta * theta) / v;
      [z, one] = [values[t]! - gain * z, 1 - gain * one];
      logs += Math.log(v);
      sums.zz += (z * z) / v;
      sums.z1 += (z * one) / v;
      sums.oneOne += (one * one) / v;
    }
    const squares = sums.zz - sums.z1 ** 2 / sums.oneOne;
    return -0.5 * logs - 0.5 * Math.log(sums.oneOne) - ((n - 1) / 2) * Math.log(squares);
  };

  it('has the quantiles of θ, which pile up at −1', () => {
    const angles = Array.from({ length: 20_000 }, (_, i) => -Math.PI / 2 + (Math.PI * (i + 0.5)) / 20_000);
    const quantiles = gridQuantiles(angles, (u) => logDensity(Math.sin(u)), PROBABILITIES).map(Math.sin);
    const found = intervalsOf(values, fitted(values, { q: 1 }, 'mean')).coefficients[0]!;
    const sd = (quantiles[2]! - quantiles[0]!) / 3.92;
    expect(Math.abs(found.lower - quantiles[0]!)).toBeLessThan(POINTS * sd);
    expect(Math.abs(found.median - quantiles[1]!)).toBeLessThan(POINTS * sd);
    expect(Math.abs(found.upper - quantiles[2]!)).toBeLessThan(POINTS * sd);
    expect(found.lower).toBeGreaterThanOrEqual(-1);
  });
});

describe('invariances and refusals', () => {
  const values = publishedSeries('luteinisingHormone');
  const fit = fitted(values, { p: 1, q: 1 }, 'mean');

  it('does not depend on the units', () => {
    const scaled = values.map((value) => 1000 * value - 5);
    const one = intervalsOf(values, fit);
    const other = intervalsOf(scaled, fitted(scaled, { p: 1, q: 1 }, 'mean'));
    expect(other.coefficients[0]!.upper).toBeCloseTo(one.coefficients[0]!.upper, 6);
    expect(other.coefficients[2]!.lower).toBeCloseTo(1000 * one.coefficients[2]!.lower - 5, 1);
    expect(other.sigma.upper / one.sigma.upper).toBeCloseTo(1000, 3);
  });

  it('changes little with the seed and not at all without', () => {
    const [one, again, other] = [intervalsOf(values, fit), intervalsOf(values, fit), intervalsOf(values, fit, 7)];
    expect(again).toEqual(one);
    const width = one.coefficients[2]!.upper - one.coefficients[2]!.lower;
    expect(Math.abs(other.coefficients[2]!.upper - one.coefficients[2]!.upper)).toBeLessThan(0.06 * width);
  });

  it('draws parameter sets whose mean and spread are those of the points', () => {
    const found = integratedIntervals({ fit, values, coverage: 0.5, seed: 1, draws: 2000 });
    if (!found.ok) throw new Error(found.failure.code);
    const { draws, coefficients, sigma } = found.value;
    const inside = (get: (at: (typeof draws)[number]) => number, { lower, upper }: { lower: number; upper: number }) =>
      draws.filter((at) => get(at) >= lower && get(at) <= upper).length / 2000;
    // 2000 draws of an event of probability one half: standard error 0.011.
    expect(inside((at) => at.ar[0]!, coefficients[0]!)).toBeCloseTo(0.5, 1);
    expect(inside((at) => at.mean, coefficients[2]!)).toBeCloseTo(0.5, 1);
    expect(inside((at) => Math.sqrt(at.innovationVariance), sigma)).toBeCloseTo(0.5, 1);
  });

  it('refuses other estimators', () => {
    const burg = fitted(values, { p: 1 }, 'mean', { estimator: 'burg' });
    expect(integratedIntervals({ fit: burg, values, coverage: 0.95, seed: 1 })).toMatchObject({
      ok: false,
      failure: { code: 'intervalsNotExact', estimator: 'burg' },
    });
  });

  it('handles seasons, gaps, differencing and events together', () => {
    const random = createRandom(3);
    const record = Float64Array.from({ length: 150 }, () => random.normal());
    for (let t = 1; t < 150; t++) record[t] = record[t - 1]! + record[t]! + (t >= 80 ? 0.1 : 0);
    record.fill(NaN, 40, 46);
    const model = fitted(record, { d: 1, q: 1, P: 1, s: 4 }, 'drift', { regressors: [{ kind: 'step', at: 80 }] });
    const found = intervalsOf(record, model);
    expect(found.coefficients.map(({ about }) => about)).toEqual(model.names);
    found.coefficients.forEach(({ lower, upper, median }) => {
      expect(lower).toBeLessThan(median);
      expect(median).toBeLessThan(upper);
    });
  });
});
