import { inverseRoots } from './admissibility.ts';
import type { Coefficients } from './searchSpace.ts';

/** Without a covariance, roots this close are taken for a common factor. */
const CLOSE = 0.1;

/**
 * The AR and MA root of one kind (regular or seasonal) that lie closest in units of the uncertainty of their distance.
 *
 * Method: delta method. The inverse root a of x^p − Σ φ_i x^{p−i} moves by a^{p−i}/f′(a) for a unit change of φ_i.
 *
 * @param rows indices into `coefficients.all` of the rows of the covariance
 * @param covariance of the estimates, its first rows those of `rows`; null where there is none
 * @returns distance and its standard deviation (NaN without a covariance) where the roots are closer than two of them
 *   (0.1 without), else null. Seasonal roots are compared in Bˢ.
 */
export function rootPairSpread(
  coefficients: Coefficients,
  season: number,
  rows: readonly number[],
  covariance: { readonly values: Float64Array; readonly size: number } | null,
): { distance: number; standardDeviation: number; arModulus: number; seasonal: number } | null {
  const { ar, ma, seasonalAr, seasonalMa, all } = coefficients;
  const kinds = [
    { ar, ma, arAt: 0, maAt: ar.length, seasonal: 0 },
    {
      ar: seasonalAr,
      ma: seasonalMa,
      arAt: ar.length + ma.length,
      maAt: all.length - seasonalMa.length,
      seasonal: season,
    },
  ];
  let best: { distance: number; standardDeviation: number; arModulus: number; seasonal: number } | null = null;
  let bestRatio = Infinity;
  for (const kind of kinds) {
    for (const a of inverseRoots(kind.ar, 1)) {
      for (const m of inverseRoots(kind.ma, -1)) {
        const distance = Math.hypot(a.re - m.re, a.im - m.im);
        const motions = [
          ...motionOf(a, kind.ar, 1).map((motion, i) => ({ ...motion, row: rows.indexOf(kind.arAt + i) })),
          ...motionOf(m, kind.ma, -1).map(({ re, im }, i) => ({ re: -re, im: -im, row: rows.indexOf(kind.maAt + i) })),
        ].filter(({ row }) => row >= 0);
        const spread = covariance === null ? NaN : Math.sqrt(spreadOf(motions, covariance));
        const ratio = covariance === null ? distance / CLOSE : distance / (2 * spread);
        if (ratio < 1 && ratio < bestRatio) {
          bestRatio = ratio;
          best = { distance, standardDeviation: spread, arModulus: Math.hypot(a.re, a.im), seasonal: kind.seasonal };
        }
      }
    }
  }
  return best;
}

interface Complex {
  readonly re: number;
  readonly im: number;
}

/** ∂root/∂c_i for the inverse root of 1 − Σ sign·c_i Bⁱ. */
function motionOf(root: Complex, coefficients: Float64Array, sign: 1 | -1): Complex[] {
  const p = coefficients.length;
  const powers: Complex[] = [{ re: 1, im: 0 }];
  for (let i = 1; i <= p; i++) powers.push(times(powers[i - 1]!, root));
  let slope = scale(powers[p - 1]!, p);
  for (let i = 1; i < p; i++) {
    const part = scale(powers[p - i - 1]!, -sign * coefficients[i - 1]! * (p - i));
    slope = { re: slope.re + part.re, im: slope.im + part.im };
  }
  return Array.from({ length: p }, (_, i) => scale(over(powers[p - 1 - i]!, slope), sign));
}

/** E|Σ motion·error|² under the covariance. */
function spreadOf(
  motions: readonly (Complex & { row: number })[],
  { values, size }: { readonly values: Float64Array; readonly size: number },
): number {
  let sum = 0;
  for (const one of motions) {
    for (const other of motions) sum += (one.re * other.re + one.im * other.im) * values[one.row * size + other.row]!;
  }
  return Math.max(0, sum);
}

function times(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
}

function over(a: Complex, b: Complex): Complex {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
}

function scale(a: Complex, factor: number): Complex {
  return { re: a.re * factor, im: a.im * factor };
}
