const STEP = 0.1;
const MOST = 100_000;

/**
 * P(Σ w_i X_i > x) for independent chi-squares X_i of one degree of freedom: the tail of a quadratic form in normals.
 *
 * Method: inversion of the moment generating function M(s) = ∏ (1 − 2 w_i s)^{−1/2} along a path through its saddle point by the trapezoidal rule,
 * which converges geometrically and keeps the relative accuracy of the tail (Rice 1980, SIAM J. Sci. Stat. Comput. 1, 438–448). The path
 * is a parabola that opens around the singularities, so that the integrand falls as a Gaussian. Left of the mean the saddle is negative
 * and the integral is the lower tail. It replaces Imhof's real integral (1961, Biometrika 48, 419–426), which leaves an absolute error and
 * converges slowly for few weights.
 *
 * @param weights > 0, finite (zeros are dropped), any scale; @param x any number
 * @returns relative error below 1e−11; 1 for x ≤ 0, 0 for Infinity; NaN for a negative or infinite weight, NaN x, or no weight at all
 * @example weights (1, 1), x = 2: 1/e
 */
export function weightedChiSquareUpperTail(weights: ArrayLike<number>, x: number): number {
  const given = Array.from(weights).filter((weight) => weight !== 0);
  if (given.length === 0 || given.some((weight) => !(weight > 0 && weight < Infinity)) || Number.isNaN(x)) return NaN;
  if (x <= 0) return 1;
  if (x === Infinity) return 0;
  const largest = Math.max(...given);
  const groups = grouped(given, largest);
  const limit = x / largest;
  const mean = groups.reduce((sum, { weight, count }) => sum + count * weight, 0);
  const spread = Math.sqrt(groups.reduce((sum, { weight, count }) => sum + 2 * count * weight * weight, 0));
  const saddle = saddlePoint(groups, limit, given.length);
  // The path keeps a deviation's distance from the pole at 0, on its own side of it.
  if (limit >= mean) return alongPath(groups, limit, Math.max(saddle, Math.min(1 / spread, 0.25)));
  return 1 - alongPath(groups, limit, Math.min(saddle, -1 / spread));
}

/** A weight, the largest being 1, and how often it occurs. */
interface Group {
  readonly weight: number;
  readonly count: number;
}

function grouped(given: readonly number[], largest: number): Group[] {
  const counts = new Map<number, number>();
  for (const value of given) counts.set(value / largest, (counts.get(value / largest) ?? 0) + 1);
  return Array.from(counts, ([weight, count]) => ({ weight, count }));
}

/** s < ½ with K′(s) = Σ w/(1 − 2ws) = x, K = ln M, by bisection on z = ½ − s: K′ falls in z. */
function saddlePoint(groups: readonly Group[], x: number, total: number): number {
  let low = 0;
  let high = (0.5 * total) / x + 0.5;
  for (let i = 0; i < 60; i++) {
    const z = 0.5 * (low + high);
    let slope = 0;
    for (const { weight, count } of groups) slope += (count * weight) / (1 - weight + 2 * weight * z);
    if (slope > x) low = z;
    else high = z;
  }
  return 0.5 - 0.5 * (low + high);
}

/** |1/2πi ∫ M(s) e^{−sx}/s ds| on s = ½ − z₀(1 + iνu)², which crosses the real axis at c, z₀ = ½ − c. */
function alongPath(groups: readonly Group[], x: number, c: number): number {
  const start = 0.5 - c;
  let curvature = 0;
  let height = -c * x;
  for (const { weight, count } of groups) {
    const rest = 1 - 2 * weight * c;
    curvature += 2 * count * (weight / rest) ** 2;
    height -= 0.5 * count * Math.log(rest);
  }
  // Scaled so that the integrand is near exp(−u²/2) at the saddle.
  const turn = 1 / (2 * start * Math.sqrt(curvature));
  let sum = 0;
  for (let k = 0; k < MOST; k++) {
    const v = turn * STEP * k;
    const re = 0.5 - start * (1 - v * v);
    const im = -2 * start * v;
    let size = -re * x - height;
    let angle = -im * x;
    for (const { weight, count } of groups) {
      const restRe = 1 - 2 * weight * re;
      const restIm = -2 * weight * im;
      size -= 0.25 * count * Math.log(restRe * restRe + restIm * restIm);
      angle -= 0.5 * count * Math.atan2(restIm, restRe);
    }
    // ds/du / (2πi s) = −z₀ν(1 + iνu)/(π s), and its mirror image below the axis.
    const square = re * re + im * im;
    const real = (re + v * im) / square;
    const imaginary = (v * re - im) / square;
    const amount = Math.exp(size);
    sum += (k === 0 ? 0.5 : 1) * amount * (real * Math.cos(angle) - imaginary * Math.sin(angle));
    if (amount < 1e-18) break;
  }
  return Math.abs((2 * STEP * start * turn * sum) / Math.PI) * Math.exp(height);
}
