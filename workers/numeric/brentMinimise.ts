const GOLDEN = 0.3819660112501051;

/**
 * Minimum of a function of one variable in an interval.
 *
 * Method: Brent's, parabolic steps guarded by golden sections (Brent 1973, Algorithms for Minimization without Derivatives, ch. 5).
 *
 * @param f unimodal for a global answer; @param from, to ends, from < to
 * @param tolerance absolute accuracy wanted in x
 * @returns where and how low; an end is approached but not evaluated
 */
export function brentMinimise(
  f: (x: number) => number,
  from: number,
  to: number,
  tolerance: number,
): { x: number; value: number; evaluations: number } {
  let a = from;
  let b = to;
  let x = a + GOLDEN * (b - a);
  let w = x;
  let v = x;
  let fx = f(x);
  let fw = fx;
  let fv = fx;
  let step = 0;
  let before = 0;
  let evaluations = 1;
  for (; evaluations < 200; evaluations++) {
    const middle = 0.5 * (a + b);
    const near = 1e-12 * Math.abs(x) + tolerance / 3;
    if (Math.abs(x - middle) <= 2 * near - 0.5 * (b - a)) break;
    let p = 0;
    let q = 0;
    if (Math.abs(before) > near) {
      const r = (x - w) * (fx - fv);
      q = (x - v) * (fx - fw);
      p = (x - v) * q - (x - w) * r;
      q = 2 * (q - r);
      if (q > 0) p = -p;
      else q = -q;
    }
    const last = before;
    before = step;
    if (q !== 0 && Math.abs(p) < Math.abs(0.5 * q * last) && p > q * (a - x) && p < q * (b - x)) {
      step = p / q;
      const u = x + step;
      if (u - a < 2 * near || b - u < 2 * near) step = x < middle ? near : -near;
    } else {
      before = x < middle ? b - x : a - x;
      step = GOLDEN * before;
    }
    const u = x + (Math.abs(step) >= near ? step : step > 0 ? near : -near);
    const fu = f(u);
    if (fu <= fx) {
      if (u < x) b = x;
      else a = x;
      [v, w, x] = [w, x, u];
      [fv, fw, fx] = [fw, fx, fu];
    } else {
      if (u < x) a = u;
      else b = u;
      if (fu <= fw || w === x) {
        [v, w] = [w, u];
        [fv, fw] = [fw, fu];
      } else if (fu <= fv || v === x || v === w) {
        v = u;
        fv = fu;
      }
    }
  }
  return { x, value: fx, evaluations };
}
