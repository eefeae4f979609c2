import { describe, expect, it } from 'vitest';
import { spectralBackground } from '../../../workers/identification/spectralBackground.ts';
import { strongestPeriods } from '../../../workers/identification/strongestPeriods.ts';
import { createRandom } from '../../../workers/numeric/random.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const hourly = { kind: 'seconds', start: 0, step: 3600, zone: null } as const;
const numbered = { kind: 'index', start: 1, step: 1, zone: null } as const;

/** An AR(1) of unit innovations, started in its own law. */
function autoregression(phi: number, n: number, seed: number): Float64Array {
  const random = createRandom(seed);
  const x = new Float64Array(n);
  let z = random.normal() / Math.sqrt(1 - phi * phi);
  for (let t = 0; t < n; t++) {
    x[t] = z;
    z = phi * z + random.normal();
  }
  return x;
}

describe('strongest periods', () => {
  it('finds a day under coloured noise between two Fourier frequencies, by its name and to a hundredth of an hour', () => {
    const x = autoregression(0.8, 1001, 3).map((value, t) => value + 1.8 * Math.cos((2 * Math.PI * t) / 24 + 1));
    const [first] = strongestPeriods(x, hourly).periods;
    expect(first!.calendar).toMatchObject({ name: 'day', readings: 24, harmonic: 1 });
    expect(Math.abs(first!.period - 24)).toBeLessThan(0.06);
    expect(first!.pValue).toBeLessThan(1e-3);
  });

  it('names half a day as the second harmonic of the day', () => {
    const x = autoregression(0.3, 600, 5).map((value, t) => value + 2 * Math.cos((2 * Math.PI * t) / 12));
    expect(strongestPeriods(x, hourly).periods[0]!.calendar).toMatchObject({ name: 'day', harmonic: 2 });
  });

  // The cycle of LEW: the handbook starts its sinusoidal fit at 0.3025 cycles a reading (NIST/SEMATECH e-Handbook 1.4.2.5.2); the maximum of
  // |Σ (x − x̄) exp(−2πift)| over a grid of 5e−6 is at 0.301805 (numpy 2.4.6).
  it('finds the cycle of the beam deflections of the handbook', () => {
    const { periods } = strongestPeriods(publishedSeries('lew'), numbered);
    expect(Math.abs(periods[0]!.frequency - 0.3025)).toBeLessThan(0.5 / 200);
    expect(periods[0]!.frequency).toBeCloseTo(0.301805, 5);
    expect(periods[0]!.calendar).toBeNull();
  });

  it.each([0, 0.5, 0.9, 0.97])('names a period in a few of a hundred AR(1) records without one: φ = %s', (phi) => {
    let named = 0;
    for (let seed = 1; seed <= 100; seed++)
      if (strongestPeriods(autoregression(phi, 300, seed), numbered).periods.length > 0) named++;
    // Stated probability 1 %: a binomial of 100 exceeds 5 once in 2 000.
    expect(named).toBeLessThanOrEqual(5);
  });

  it('the background of an exponential sample is its mean (median over ln 2)', () => {
    const random = createRandom(11);
    const ordinates = Float64Array.from({ length: 2000 }, () => -3 * Math.log(random.uniform()));
    const { expected: background } = spectralBackground(ordinates);
    const middle = background.slice(800, 1900);
    const mean = middle.reduce((sum, value) => sum + value, 0) / middle.length;
    expect(Math.abs(mean / 3 - 1)).toBeLessThan(0.12);
  });

  it('gives nothing for a short or constant record', () => {
    expect(strongestPeriods(new Float64Array(10).fill(1), numbered).periods).toEqual([]);
    expect(strongestPeriods(new Float64Array(100).fill(7), numbered).ordinates).toHaveLength(0);
  });
});
