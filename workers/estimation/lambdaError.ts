/** First half-width tried, and the one used, in standard errors: wide enough to stand clear of where searches end, narrow enough to be local. */
const FIRST = 0.05;
const WIDTH = 0.4;
/** Widths tried until the curvature stands clear of rounding. */
const ATTEMPTS = 4;
/** A drop of ln L below this is where searches end, not curvature. */
const CLEAR = 1e-4;

/**
 * Standard error of the Box–Cox λ of highest ln L.
 *
 * Method: with every other parameter profiled out, −1/ℓ″(λ) is the λ element of the inverse of the joint Hessian (block inversion), so
 * that no Hessian over transformed records is needed. ℓ″ is a central second difference, extrapolated once from half the width
 * (Richardson). Source of the likelihood: Box & Cox 1964, J. R. Stat. Soc. B 26, 211–252.
 *
 * @param profile highest ln L at a given λ, −Infinity where there is none
 * @param lambda its maximum; @param height ln L there
 * @returns the standard error, or null where ln L does not bend down on both sides
 */
export function lambdaError(profile: (lambda: number) => number, lambda: number, height: number): number | null {
  const curvature = (width: number) => (2 * height - profile(lambda + width) - profile(lambda - width)) / width ** 2;
  let width = FIRST;
  let rough = NaN;
  for (let attempt = 0; attempt < ATTEMPTS; attempt++) {
    rough = curvature(width);
    if (rough * width * width > CLEAR) break;
    width *= 4;
  }
  if (!(rough * width * width > CLEAR && Number.isFinite(rough))) return null;
  const used = WIDTH / Math.sqrt(rough);
  const value = (4 * curvature(used / 2) - curvature(used)) / 3;
  return value > 0 && Number.isFinite(value) ? 1 / Math.sqrt(value) : null;
}
