/** A complex number. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

const MOST_SWEEPS = 200;
/** An imaginary part this small beside the real one is what rounding leaves of a simple real root. */
const ROUNDING = 1e-13;

/**
 * All roots of a real polynomial.
 *
 * Method: Aberth–Ehrlich iteration from points on the circles of the Newton polygon of the coefficients (Bini 1996, Numer. Algorithms 13,
 * 179–200), the polynomial evaluated in its reversed form outside the unit circle. Roots whose imaginary part is rounding are returned
 * as real, the others in exactly conjugate pairs. Roots of multiplicity k are found to about the k-th root of rounding, as the problem
 * allows.
 *
 * @param coefficients c_0 + c_1 x + …; zeros at the top lower the degree, zeros at the bottom are roots at 0; roots of moduli 1e−150…1e150
 * @returns one entry a root, roots at 0 first; empty for a constant. NaN or infinite coefficients give NaN roots.
 * @example (6, −5, 1) gives 2 and 3
 */
export function polynomialRoots(coefficients: ArrayLike<number>): Complex[] {
  let top = coefficients.length - 1;
  while (top > 0 && coefficients[top] === 0) top--;
  let bottom = 0;
  while (bottom < top && coefficients[bottom] === 0) bottom++;
  const degree = top - bottom;
  const zeros = Array.from({ length: bottom }, () => ({ re: 0, im: 0 }));
  if (degree <= 0) return zeros;
  let most = 0;
  for (let i = bottom; i <= top; i++) most = Math.max(most, Math.abs(coefficients[i]!));
  if (!Number.isFinite(most)) return Array.from({ length: top }, () => ({ re: NaN, im: NaN }));
  // Divided by a power of two, which rounds nothing, so that no product of coefficients overflows.
  const unit = 2 ** Math.floor(Math.log2(most));
  const c = Float64Array.from({ length: degree + 1 }, (_, i) => coefficients[bottom + i]! / unit);
  if (degree === 1) return [...zeros, { re: -c[0]! / c[1]!, im: 0 }];
  if (degree === 2) return [...zeros, ...quadratic(c)];
  return [...zeros, ...aberth(c)];
}

function quadratic(c: Float64Array): Complex[] {
  const [c0, c1, c2] = [c[0]!, c[1]!, c[2]!];
  const discriminant = c1 * c1 - 4 * c2 * c0;
  if (discriminant < 0) {
    const re = -c1 / (2 * c2);
    const im = Math.sqrt(-discriminant) / (2 * Math.abs(c2));
    return [
      { re, im },
      { re, im: -im },
    ];
  }
  const q = -0.5 * (c1 + (c1 < 0 ? -1 : 1) * Math.sqrt(discriminant));
  if (q === 0)
    return [
      { re: 0, im: 0 },
      { re: 0, im: 0 },
    ];
  return [
    { re: q / c2, im: 0 },
    { re: c0 / q, im: 0 },
  ];
}

function aberth(c: Float64Array): Complex[] {
  const degree = c.length - 1;
  const re = new Float64Array(degree);
  const im = new Float64Array(degree);
  startingPoints(c, re, im);
  const done = new Uint8Array(degree);
  const reversed = c.slice().reverse();
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let moving = 0;
    for (let k = 0; k < degree; k++) {
      if (done[k] === 1) continue;
      const step = newtonStep(c, reversed, re[k]!, im[k]!);
      let sumRe = 0;
      let sumIm = 0;
      for (let j = 0; j < degree; j++) {
        if (j === k) continue;
        const dr = re[k]! - re[j]!;
        const di = im[k]! - im[j]!;
        const square = dr * dr + di * di;
        if (square === 0) continue;
        sumRe += dr / square;
        sumIm -= di / square;
      }
      // w = N / (1 − N Σ 1/(z_k − z_j))
      const bottomRe = 1 - (step.re * sumRe - step.im * sumIm);
      const bottomIm = -(step.re * sumIm + step.im * sumRe);
      const square = bottomRe * bottomRe + bottomIm * bottomIm;
      if (!(square > 0)) continue;
      const wRe = (step.re * bottomRe + step.im * bottomIm) / square;
      const wIm = (step.im * bottomRe - step.re * bottomIm) / square;
      re[k]! -= wRe;
      im[k]! -= wIm;
      if (Math.hypot(wRe, wIm) <= 4e-16 * Math.hypot(re[k]!, im[k]!)) done[k] = 1;
      else moving++;
    }
    if (moving === 0) break;
  }
  return paired(
    Array.from(re, (value, k) => ({ re: value, im: Math.abs(im[k]!) <= ROUNDING * Math.abs(value) ? 0 : im[k]! })),
  );
}

/**
 * Roots of a real polynomial are real or conjugate: each root above the axis is averaged with the nearest mirror image below it, those
 * farthest from the axis first. One left over belongs to a cluster on the axis and is put there.
 */
function paired(found: readonly Complex[]): Complex[] {
  const roots = found.filter(({ im }) => im === 0);
  const above = found.filter(({ im }) => im > 0).sort((a, b) => b.im - a.im);
  const below = found.filter(({ im }) => im < 0);
  for (const root of above) {
    let nearest = -1;
    let least = Infinity;
    below.forEach((other, i) => {
      const distance = Math.hypot(root.re - other.re, root.im + other.im);
      if (distance < least) [least, nearest] = [distance, i];
    });
    const other = below[nearest];
    if (other === undefined) {
      roots.push({ re: root.re, im: 0 });
      continue;
    }
    below.splice(nearest, 1);
    const re = 0.5 * (root.re + other.re);
    const im = 0.5 * (root.im - other.im);
    roots.push({ re, im }, { re, im: -im });
  }
  return [...roots, ...below.map(({ re }) => ({ re, im: 0 }))];
}

/** p(z)/p′(z); outside the unit circle through the reversed polynomial, so that no power overflows. */
function newtonStep(c: Float64Array, reversed: Float64Array, re: number, im: number): Complex {
  const square = re * re + im * im;
  if (square <= 1) {
    const { value, slope } = horner(c, re, im);
    return divide(value, slope);
  }
  const n = c.length - 1;
  const xRe = re / square;
  const xIm = -im / square;
  const { value, slope } = horner(reversed, xRe, xIm);
  // p(z) = zⁿ r(1/z): p/p′ = z / (n − x r′/r) with x = 1/z.
  const ratio = divide(slope, value);
  const bottom = { re: n - (xRe * ratio.re - xIm * ratio.im), im: -(xRe * ratio.im + xIm * ratio.re) };
  if (!Number.isFinite(bottom.re)) return { re: 0, im: 0 };
  return divide({ re, im }, bottom);
}

function horner(c: Float64Array, re: number, im: number): { value: Complex; slope: Complex } {
  let a = 0;
  let b = 0;
  let da = 0;
  let db = 0;
  for (let i = c.length - 1; i >= 0; i--) {
    const na = da * re - db * im + a;
    db = da * im + db * re + b;
    da = na;
    const va = a * re - b * im + c[i]!;
    b = a * im + b * re;
    a = va;
  }
  return { value: { re: a, im: b }, slope: { re: da, im: db } };
}

function divide(a: Complex, b: Complex): Complex {
  const square = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / square, im: (a.im * b.re - a.re * b.im) / square };
}

/** Points on circles whose radii come from the upper convex hull of (i, ln |c_i|). */
function startingPoints(c: Float64Array, re: Float64Array, im: Float64Array): void {
  const degree = c.length - 1;
  const hull: number[] = [];
  const height = (i: number) => Math.log(Math.abs(c[i]!));
  for (let i = 0; i <= degree; i++) {
    if (c[i] === 0) continue;
    while (hull.length >= 2) {
      const a = hull[hull.length - 2]!;
      const b = hull[hull.length - 1]!;
      if ((height(b) - height(a)) * (i - a) > (height(i) - height(a)) * (b - a)) break;
      hull.pop();
    }
    hull.push(i);
  }
  for (let h = 0; h + 1 < hull.length; h++) {
    const a = hull[h]!;
    const b = hull[h + 1]!;
    const count = b - a;
    const radius = Math.exp((height(a) - height(b)) / count);
    for (let k = 0; k < count; k++) {
      // The turn keeps the points off the real axis and off each other's circle.
      const angle = (2 * Math.PI * k) / count + (2 * Math.PI * (a + 1)) / (degree + 1) + 0.7;
      re[a + k] = radius * Math.cos(angle);
      im[a + k] = radius * Math.sin(angle);
    }
  }
}
