import { expect, test } from 'vitest';
import { createRandom } from '../../../workers/numeric/random.ts';
import { xoshiro128 } from '../../../workers/numeric/xoshiro128.ts';

test('a seed determines the stream; a fork does not depend on what was drawn', () => {
  const a = createRandom(7);
  const b = createRandom(7);
  expect(Array.from({ length: 5 }, () => a.uniform())).toEqual(Array.from({ length: 5 }, () => b.uniform()));
  const early = createRandom(7).fork(3).uniform();
  a.normal();
  expect(a.fork(3).uniform()).toBe(early);
  expect(createRandom(8).uniform()).not.toBe(createRandom(7).uniform());
});

/** Moments of the laws (textbook values); 200 000 draws, five standard errors of room. */
test.each([
  ['uniform', 0.5, 1 / 12, 0.0144, (r: ReturnType<typeof createRandom>) => r.uniform()],
  ['normal', 0, 1, 2, (r: ReturnType<typeof createRandom>) => r.normal()],
  ['laplace', 0, 1, 5, (r: ReturnType<typeof createRandom>) => r.laplace()],
  ['t with 12', 0, 1.2, 2.75, (r: ReturnType<typeof createRandom>) => r.studentT(12)],
] as const)('%s has its mean and variance', (_name, mean, variance, spread, draw) => {
  const random = createRandom(20240501);
  const n = 200_000;
  let sum = 0;
  let squares = 0;
  for (let i = 0; i < n; i++) {
    const x = draw(random);
    sum += x;
    squares += (x - mean) ** 2;
  }
  expect(Math.abs(sum / n - mean)).toBeLessThan(5 * Math.sqrt(variance / n));
  expect(Math.abs(squares / n - variance)).toBeLessThan(5 * Math.sqrt(Math.max(spread, 0.01) / n));
});

test('xoshiro128** from the state (1, 2, 3, 4): its published recurrence worked in whole numbers of any length', () => {
  const next = xoshiro128(Uint32Array.of(1, 2, 3, 4));
  expect(Array.from({ length: 10 }, next)).toEqual([
    11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804,
  ]);
});

test('forks of forks depend on the order of their labels, and thirty thousand of them all differ', () => {
  const root = createRandom(5);
  const bits = (random: ReturnType<typeof createRandom>) => `${random.uniform()} ${random.uniform()}`;
  expect(bits(root.fork(1).fork(2))).not.toBe(bits(root.fork(2).fork(1)));
  expect(bits(root.fork(0))).not.toBe(bits(createRandom(5)));
  expect(bits(root.fork(1))).not.toBe(bits(root.fork(1 + 2 ** 32)));
  const seen = new Set<string>();
  for (let label = 0; label < 30_000; label++) seen.add(bits(root.fork(label)));
  expect(seen.size).toBe(30_000);
});

test('neighbouring forks are uncorrelated: |r| below five standard errors', () => {
  const root = createRandom(20240501);
  const n = 30_000;
  let sum = 0;
  let last = root.fork(0).normal();
  for (let label = 1; label <= n; label++) {
    const value = root.fork(label).normal();
    sum += value * last;
    last = value;
  }
  expect(Math.abs(sum / n)).toBeLessThan(5 / Math.sqrt(n));
});

test('whole numbers are equally likely: Pearson’s statistic of 60 000 throws below its .999 point with 5 degrees of freedom', () => {
  const random = createRandom(6);
  const counts = new Float64Array(6);
  for (let i = 0; i < 60_000; i++) counts[random.integer(6)]!++;
  // 20.515: Abramowitz & Stegun, table 26.8.
  expect(counts.reduce((sum, count) => sum + (count - 10_000) ** 2 / 10_000, 0)).toBeLessThan(20.515);
  expect(random.integer(1)).toBe(0);
});

test('the ends: no uniform is 0 or 1, whatever the seed', () => {
  for (const seed of [0, -1, 2 ** 31, 2 ** 53, NaN]) {
    const random = createRandom(seed);
    for (let i = 0; i < 1000; i++) {
      const u = random.uniform();
      expect(u > 0 && u < 1).toBe(true);
      expect(Number.isFinite(random.laplace())).toBe(true);
    }
  }
});
