import { expect, test } from 'vitest';
import { createRandom } from '../../../workers/numeric/random.ts';

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
