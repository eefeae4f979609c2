import type { Candidate, Level, Order, Parameters } from '../../workers/contract/candidate.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { coreVersion } from '../../workers/model/coreVersion.ts';

/** A model held at given parameters as if it had been fitted to `readings` readings: nothing is estimated. */
export function heldFit(
  readings: number,
  order: Partial<Order>,
  level: Level,
  parameters: Partial<Parameters>,
  more: Partial<Candidate> = {},
): Fit {
  return {
    candidate: candidateOf({ ...more, order: { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0, ...order }, level }),
    seriesHash: '',
    window: { from: 0, to: readings },
    seed: 1,
    coreVersion,
    parameters: {
      ar: [],
      ma: [],
      seasonalAr: [],
      seasonalMa: [],
      mean: 0,
      regression: [],
      innovationVariance: 1,
      ...parameters,
    },
    names: [],
    covariance: null,
    standardErrors: null,
    logLikelihood: 0,
    criteria: { aic: 0, aicc: 0, bic: 0, hq: 0 },
    readingsUsed: readings,
    parameterCount: 1,
    outcome: {
      status: 'converged',
      iterations: 0,
      evaluations: 0,
      gradientNorm: 0,
      objective: 0,
      starts: 1,
      maxima: [],
    },
    warnings: [],
  };
}
