import type { Candidate, Parameters } from '../contract/candidate.ts';
import type { Equation } from '../contract/diagnostics.ts';
import { expandPolynomials } from './expandPolynomials.ts';

/**
 * The difference equation of a model in numbers: polynomials multiplied out, mean and constant both.
 *
 * The constant is mean·φ(1)Φ(1), what stands alone on the right of φ(B)Φ(Bˢ)w_t = constant + θ(B)Θ(Bˢ)e_t, with w the
 * (differenced, transformed) record less its regression (Box & Jenkins, Time Series Analysis, ch. 4).
 *
 * @example AR(1), φ = .5, mean 10: constant 5
 */
export function equationOf(candidate: Candidate, parameters: Parameters): Equation {
  const { ar, ma } = expandPolynomials(parameters, candidate.order.s);
  const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
  const gain = (1 - sum(parameters.ar)) * (1 - sum(parameters.seasonalAr));
  return { ar, ma, mean: parameters.mean, constant: parameters.mean * gain };
}
