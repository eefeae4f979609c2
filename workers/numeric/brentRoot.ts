const MOST = 200;

/**
 * Zero of a function of one variable between two points where its signs differ.
 *
 * Method: Brent's, inverse quadratic and secant steps guarded by bisection (Brent 1973, Algorithms for Minimization without Derivatives, ch. 4).
 *
 * @param f continuous on the interval; @param from, to ends in either order
 * @param tolerance absolute accuracy wanted in x; 0 asks for the last place
 * @returns the zero, the value there and the evaluations used; null where f has one sign at both ends or is NaN there
 * @example f = x² − 2 on 0…2 gives √2
 */
export function brentRoot(
  f: (x: number) => number,
  from: number,
  to: number,
  tolerance = 0,
): { x: number; value: number; evaluations: number } | null {
  let a = from;
  let b = to;
  let fa = f(a);
  let fb = f(b);
  if (Number.isNaN(fa) || Number.isNaN(fb) || (fa > 0 && fb > 0) || (fa < 0 && fb < 0)) return null;
  // b is the best point, c the one on the other side of the zero, a the best before.
  let c = a;
  let fc = fa;
  let width = b - a;
  let before = width;
  let evaluations = 2;
  for (; evaluations < MOST; evaluations++) {
    if (Math.abs(fc) < Math.abs(fb)) {
      a = b;
      b = c;
      c = a;
      fa = fb;
      fb = fc;
      fc = fa;
    }
    const near = 2 * Number.EPSILON * Math.abs(b) + 0.5 * tolerance;
    const half = 0.5 * (c - b);
    if (Math.abs(half) <= near || fb === 0) break;
    const step = interpolate(a, b, c, fa, fb, fc);
    // An interpolated step must shrink the bracket and halve the step before last; otherwise bisect.
    const good =
      Math.abs(before) >= near &&
      Math.abs(fa) > Math.abs(fb) &&
      step * half > 0 &&
      Math.abs(step) < Math.min(1.5 * Math.abs(half) - 0.5 * near, 0.5 * Math.abs(before));
    before = good ? width : half;
    width = good ? step : half;
    a = b;
    fa = fb;
    b += Math.abs(width) > near ? width : Math.sign(half) * near;
    fb = f(b);
    if (Number.isNaN(fb)) return null;
    if (fb > 0 === fc > 0) {
      c = a;
      fc = fa;
      width = b - a;
      before = width;
    }
  }
  return { x: b, value: fb, evaluations };
}

/** Step from b: by the line through two points, or by inverse quadratic interpolation through three. */
function interpolate(a: number, b: number, c: number, fa: number, fb: number, fc: number): number {
  const s = fb / fa;
  if (a === c) return ((c - b) * s) / (s - 1) || 0;
  const q = fa / fc;
  const r = fb / fc;
  const top = s * ((c - b) * q * (q - r) - (b - a) * (r - 1));
  return -top / ((q - 1) * (r - 1) * (s - 1)) || 0;
}
