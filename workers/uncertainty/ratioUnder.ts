import type { Candidate } from '../contract/candidate.ts';
import { prepareLikelihood } from '../estimation/prepareLikelihood.ts';
import { simulateRecord } from '../model/simulateRecord.ts';
import type { Random } from '../numeric/random.ts';
import type { Covariates } from '../series/regressionColumns.ts';
import type { Span } from '../contract/series.ts';
import { heldMaximum, type Hypothesis } from './heldMaximum.ts';
import type { Coefficients } from './heldSpace.ts';

export interface RatioRequest {
  /** Without a transform: simulated records are on the scale of the model. */
  readonly candidate: Candidate;
  /** Where it is NaN the simulated record is too. */
  readonly values: Float64Array;
  readonly window: Span;
  readonly columns: Covariates | undefined;
  readonly hypothesis: Hypothesis;
  /** The model refitted under the hypothesis, to simulate from, and the free estimates, a further start. */
  readonly under: Coefficients;
  readonly free: Coefficients;
}

/**
 * The likelihood-ratio statistic of one record simulated under a hypothesis.
 *
 * The statistic does not depend on the size of level, regression and σ, which are estimated in both models: the record has level 0 and σ = 1,
 * and a held level or regression coefficient is held at 0, its true value here.
 *
 * @returns 2(ln L free − ln L held) ≥ 0; NaN where the simulated record cannot be fitted
 */
export function ratioUnder(request: RatioRequest, random: Random): number {
  const { candidate, values, window, columns, under, free } = request;
  const at = { ...under, mean: 0, regression: [], innovationVariance: 1 };
  const record = simulateRecord({ order: candidate.order, at, length: values.length, random });
  for (let t = 0; t < record.length; t++) if (Number.isNaN(values[t]!)) record[t] = NaN;
  const prepared = prepareLikelihood({ values: record, candidate, window, columns });
  if (!prepared.ok) return NaN;
  const held = request.hypothesis;
  const hypothesis = held.kind === 'column' ? { ...held, value: 0 } : held;
  const low = heldMaximum(prepared.value, candidate, hypothesis, [under]);
  if (low.coefficients === null) return NaN;
  const high = heldMaximum(prepared.value, candidate, { kind: 'free' }, [low.coefficients, free]);
  return Math.max(0, 2 * (high.logLikelihood - low.logLikelihood));
}
