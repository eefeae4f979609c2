/**
 * P(Σ w_i X_i > x) for independent chi-squares X_i of one degree of freedom.
 *
 * Method: Imhof's inversion of the characteristic function (1961, Biometrika 48, 419–426) in the trapezoidal form of Davies (1973, Biometrika 60,
 * 415–417) with an alternating tail summed by Euler's transform replaced by a step fine enough for 1e−9 absolute error: the integrand
 * sin θ(u)/(u ρ(u)) is summed at (k + ½)Δ with Δ = 2π/(span of the law), which leaves only the aliased tails.
 *
 * @param weights > 0 (zeros are dropped); @param x any number
 * @returns absolute error below 1e−8; 1 for x ≤ 0, NaN for a negative weight or no weight at all
 */
export function weightedChiSquareUpperTail(weights: ArrayLike<number>, x: number): number {
  const w = Float64Array.from(weights).filter((value) => value !== 0);
  if (w.length === 0 || w.some((value) => !(value > 0)) || Number.isNaN(x)) return NaN;
  if (x <= 0) return 1;
  let mean = 0;
  let variance = 0;
  let most = 0;
  for (const value of w) {
    mean += value;
    variance += 2 * value * value;
    most = Math.max(most, value);
  }
  // Beyond this the law has less than 1e−10: a Chernoff bound for the largest weight plus ten deviations of the rest.
  const reach = mean + 10 * Math.sqrt(variance) + 50 * most;
  if (x > reach) return 0;
  const period = 2 * (reach + x);
  const step = (2 * Math.PI) / period;
  let sum = 0;
  for (let k = 0; k < 2_000_000; k++) {
    const u = (k + 0.5) * step;
    let angle = -u * x;
    let logSize = 0;
    for (const value of w) {
      const scaled = 2 * value * u;
      angle += 0.5 * Math.atan(scaled);
      logSize += 0.25 * Math.log1p(scaled * scaled);
    }
    const size = Math.exp(-logSize);
    sum += (Math.sin(angle) * size) / (k + 0.5);
    if (size / (k + 0.5) < 1e-12) break;
  }
  return Math.min(1, Math.max(0, 0.5 + sum / Math.PI));
}
