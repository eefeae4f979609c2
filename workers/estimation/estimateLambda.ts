import type { Failure } from '../contract/failures.ts';
import type { Result } from '../contract/result.ts';
import { brentMinimise } from '../numeric/brentMinimise.ts';

/** Powers searched: beyond these a Box–Cox transform is no description of a measurement. */
const LOWEST = -2;
const HIGHEST = 3;
const GRID = 0.5;
/** ln L is flat near its maximum: finer than this nothing changes. */
const FINE = 1e-6;

/**
 * The Box–Cox λ of highest ln L.
 *
 * Method: the profile over λ, Jacobian included (Box & Cox 1964, J. R. Stat. Soc. B 26, 211–252), on a grid of
 * [−2, 3], then refined about its best point.
 *
 * @param profile ln L of the best fit at a given λ
 * @returns λ, or the failure of the profile where it fails at every λ
 */
export function estimateLambda(profile: (lambda: number) => Result<number>): Result<number> {
  let failure: Failure | null = null;
  let best = { lambda: NaN, height: -Infinity };
  const height = (lambda: number) => {
    const result = profile(lambda);
    if (!result.ok) failure = result.failure;
    const value = result.ok ? result.value : -Infinity;
    if (value > best.height) best = { lambda, height: value };
    return value;
  };
  for (let lambda = LOWEST; lambda <= HIGHEST; lambda += GRID) height(lambda);
  if (Number.isNaN(best.lambda)) return { ok: false, failure: failure ?? { code: 'searchFailed', starts: 0 } };
  const from = Math.max(LOWEST, best.lambda - GRID);
  const to = Math.min(HIGHEST, best.lambda + GRID);
  brentMinimise((lambda) => -height(lambda), from, to, FINE);
  return { ok: true, value: best.lambda };
}
