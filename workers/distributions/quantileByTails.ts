/** A law by both tails, each accurate where it is small. */
export interface Tails {
  readonly cdf: (x: number) => number;
  readonly upperTail: (x: number) => number;
}

/**
 * The quantile of a continuous law on (low, ∞), low finite or −∞.
 *
 * Method: brackets by doubling, then bisection on the logarithm of the smaller tail with secant steps kept inside the bracket (Illinois rule),
 * to the last places of x.
 *
 * @param tails of the law; @param p in [0, 1]; @param low where the law begins
 * @param upper p is the upper tail
 * @returns low or Infinity at the ends; NaN outside [0, 1]
 */
export function quantileByTails(tails: Tails, p: number, low: number, upper = false): number {
  if (!(p >= 0 && p <= 1)) return NaN;
  if (p === 0) return upper ? Infinity : low;
  if (p === 1) return upper ? low : Infinity;
  const useUpper = upper ? p <= 0.5 : p > 0.5;
  const target = Math.log(upper === useUpper ? p : 1 - p);
  const height = (x: number) => {
    const gap = Math.log(useUpper ? tails.upperTail(x) : tails.cdf(x)) - target;
    return useUpper ? -gap : gap;
  };
  let a = Number.isFinite(low) ? low : -1;
  let b = Number.isFinite(low) ? low + 1 : 1;
  for (let width = 1; height(b) < 0 && width < 1e300; width *= 2) {
    a = b;
    b += width;
  }
  if (Number.isFinite(low)) {
    for (let width = b - low; height(low + width / 2) > 0 && width > 1e-300; width /= 2) b = low + width / 2;
    a = low + (b - low) / 2;
    if (height(a) > 0) a = low;
  } else for (let width = 1; height(a) > 0 && width < 1e300; width *= 2) a -= width;
  let fa = height(a);
  let fb = height(b);
  for (let i = 0; i < 400 && b - a > 2e-16 * Math.max(Math.abs(a), Math.abs(b)); i++) {
    let x = Number.isFinite(fa) && i % 3 !== 2 ? (a * fb - b * fa) / (fb - fa) : 0.5 * (a + b);
    if (!(x > a && x < b)) x = 0.5 * (a + b);
    if (x === a || x === b) break;
    const fx = height(x);
    if (fx === 0) return x;
    if (fx < 0) {
      a = x;
      fa = fx;
      fb *= 0.5;
    } else {
      b = x;
      fb = fx;
      fa *= 0.5;
    }
  }
  return Math.abs(height(a)) < Math.abs(height(b)) ? a : b;
}
