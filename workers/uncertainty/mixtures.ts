import { chiSquareUpperTail } from '../distributions/chiSquareUpperTail.ts';
import { studentTCdf } from '../distributions/studentTCdf.ts';
import { tabulateFunction } from '../numeric/tabulateFunction.ts';
import { mixtureQuantile } from './mixtureQuantile.ts';

/** Student t laws with weights that sum to 1. */
export interface StudentMixture {
  readonly weights: ArrayLike<number>;
  readonly centres: ArrayLike<number>;
  readonly scales: ArrayLike<number>;
}

/** Cells of the tables: distribution functions to 1e−6, far below what the points leave open. */
const CELLS = 600;
/** asinh of the largest |t| tabulated: 10⁶, beyond which nothing is left that a quantile asks for. */
const FARTHEST = Math.asinh(1e6);
/** Quantiles are found to this part of a component's scale. */
const TOLERANCE = 1e-4;

/**
 * Quantiles of mixtures of Student t laws with the same degrees of freedom, and of √(sum of squares/χ²).
 *
 * Method: both distribution functions are tabulated once in a variable in which they are smooth (asinh t; the cube-root normal deviate of
 * Wilson & Hilferty 1931), then summed.
 *
 * @param degreesOfFreedom > 0
 */
export function mixturesOf(degreesOfFreedom: number) {
  let student: ((x: number) => number) | null = null;
  const cubeCentre = 1 - 2 / (9 * degreesOfFreedom);
  const cubeSpread = Math.sqrt(2 / (9 * degreesOfFreedom));
  return {
    /** @param probabilities in (0, 1); @returns one quantile each */
    student({ weights, centres, scales }: StudentMixture, probabilities: readonly number[]): number[] {
      student ??= tabulateFunction((v) => studentTCdf(Math.sinh(v), degreesOfFreedom), -FARTHEST, FARTHEST, CELLS);
      const law = student;
      const cdf = (x: number) => {
        let sum = 0;
        for (let i = 0; i < weights.length; i++) sum += weights[i]! * law(Math.asinh((x - centres[i]!) / scales[i]!));
        return sum;
      };
      const centre = meanOf(weights, centres);
      const scale = meanOf(weights, scales);
      return probabilities.map((p) => mixtureQuantile(cdf, p, guess(p, centre, scale), scale, TOLERANCE));
    },
    /** @param sums residual sums of squares; @returns quantiles of σ */
    sigma(weights: ArrayLike<number>, sums: ArrayLike<number>, probabilities: readonly number[]): number[] {
      const upper = tabulateFunction(
        (z) => chiSquareUpperTail(degreesOfFreedom * Math.max(0, cubeCentre + z * cubeSpread) ** 3, degreesOfFreedom),
        Math.max(-12, -cubeCentre / cubeSpread),
        12,
        CELLS,
      );
      const cdf = (sigma: number) => {
        let sum = 0;
        for (let i = 0; i < weights.length; i++) {
          const ratio = sums[i]! / (sigma * sigma * degreesOfFreedom);
          sum += weights[i]! * upper((Math.cbrt(ratio) - cubeCentre) / cubeSpread);
        }
        return sum;
      };
      const centre = Math.sqrt(meanOf(weights, sums) / degreesOfFreedom);
      const scale = centre / Math.sqrt(2 * degreesOfFreedom);
      return probabilities.map((p) =>
        mixtureQuantile(cdf, p, guess(p, centre, scale), scale, TOLERANCE, centre * 1e-6),
      );
    },
  };
}

function meanOf(weights: ArrayLike<number>, values: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < weights.length; i++) sum += weights[i]! * values[i]!;
  return sum;
}

function guess(p: number, centre: number, scale: number): number {
  return centre + (p < 0.5 ? -2 : p > 0.5 ? 2 : 0) * scale;
}
