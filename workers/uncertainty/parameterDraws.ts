import type { Parameters } from '../contract/candidate.ts';
import type { Fit } from '../contract/fit.ts';
import { chiSquareQuantile } from '../distributions/chiSquareQuantile.ts';
import { createRandom } from '../numeric/random.ts';
import { factorsOf, type WeighedParameters } from './weighParameters.ts';

/**
 * Equally likely whole parameter sets from weighed points.
 *
 * Method: systematic resampling of the points (Carpenter, Clifford & Fearnhead 1999, IEE Proc. F 146, 2–7); σ² of each from its inverse
 * chi-square, level and regression from the normal law that σ² gives.
 *
 * @param count sets wanted, ≥ 1; @param seed of the draws
 */
export function parameterDraws(fit: Fit, weighed: WeighedParameters, count: number, seed: number): Parameters[] {
  const random = createRandom(seed).fork(1);
  const { points, degreesOfFreedom: df } = weighed;
  const level = fit.candidate.level === 'none' ? 0 : 1;
  const total = points.reduce((sum, { weight }) => sum + weight, 0);
  const offset = random.uniform();
  let at = 0;
  let above = points[0]!.weight / total;
  return Array.from({ length: count }, (_, i) => {
    while ((i + offset) / count > above && at < points.length - 1) above += points[++at]!.weight / total;
    const { beta, betaFactor, sumOfSquares } = points[at]!;
    const innovationVariance = sumOfSquares / chiSquareQuantile(random.uniform(), df);
    const stretch = Math.sqrt(innovationVariance / (sumOfSquares / df));
    const k = beta.length;
    const normals = beta.map(() => random.normal());
    const own = beta.map((centre, r) => {
      let sum = centre;
      for (let j = 0; j <= r; j++) sum += stretch * betaFactor[r * k + j]! * normals[j]!;
      return sum;
    });
    const { lambda } = fit.parameters;
    return {
      ...factorsOf(points[at]!, fit.candidate.order),
      mean: level === 1 ? own[0]! : 0,
      regression: [...own].slice(level),
      innovationVariance,
      ...(lambda === undefined ? {} : { lambda }),
    };
  });
}
