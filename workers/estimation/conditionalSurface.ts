import { numericGradient } from './engine/numericGradient.ts';
import type { Job } from './fitCandidate.ts';
import type { Surface } from './fitSearched.ts';

/**
 * The conditional likelihood as a surface to search: −(m/2)(ln 2πσ̂² + 1) with σ̂² = S/m, S the conditional sum of
 * squares of the m readings that have a full past (Box & Jenkins 1970, section 7.1.2).
 *
 * Its gradient is differenced. The information on level and regression is that of the exact likelihood at the same
 * coefficients, from which it differs by the first few readings only.
 */
export function conditionalSurface({ likelihood }: Job): Surface {
  const heightOf = ({ sumOfSquares, readings }: { sumOfSquares: number; readings: number }) => {
    const height = -0.5 * readings * (Math.log((2 * Math.PI * sumOfSquares) / readings) + 1);
    return Number.isNaN(height) ? -Infinity : height;
  };
  return {
    gradientAt: (coefficients, gradient) => {
      const found = likelihood.conditional(coefficients);
      const { readings } = found;
      const here = heightOf(found);
      numericGradient(coefficients, (near) => heightOf(likelihood.conditional(near)), here, readings, gradient);
      return here;
    },
    betaAt: (coefficients) => likelihood.conditional(coefficients).beta,
    implied: (coefficients) => {
      const found = likelihood.conditional(coefficients);
      const exact = likelihood.concentrated(coefficients);
      const ratio = exact.innovationVariance / found.innovationVariance;
      return {
        height: heightOf(found),
        objective: found.sumOfSquares,
        beta: found.beta,
        innovationVariance: found.innovationVariance,
        betaInformation: exact.betaInformation.map((value) => value * ratio),
      };
    },
  };
}
