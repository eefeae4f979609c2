import type { Candidate, Level, Order } from '../../workers/contract/candidate.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import { fitCandidate } from '../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';

/** The fit of a candidate given by what differs from (0,0,0); an expected failure is thrown. */
export function fitted(
  values: Float64Array,
  order: Partial<Order>,
  level: Level,
  more: Partial<Candidate> & { columns?: Record<string, Float64Array> } = {},
): Fit {
  const { columns, ...part } = more;
  const candidate = candidateOf({ ...part, order: { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0, ...order }, level });
  const result = fitCandidate({ values, candidate, seed: 1, ...(columns ? { columns } : {}) });
  if (!result.ok) throw new Error(`The fit failed: ${JSON.stringify(result.failure)}`);
  return result.value;
}
