import { incompleteGamma } from './incompleteGamma.ts';

/** P(X > x) of chi-square, accurate in the tail; arguments as `chiSquareCdf`. */
export function chiSquareUpperTail(x: number, df: number): number {
  return x < 0 && df > 0 ? 1 : incompleteGamma(df / 2, x / 2).upper;
}
