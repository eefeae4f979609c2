import type { Candidate, FitRequest } from '../contract/candidate.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { differenceRecord } from '../series/differenceRecord.ts';
import { transformRecord } from '../series/transformRecord.ts';
import { pairwiseAutocovariances } from './starts/pairwiseAutocovariances.ts';

/**
 * What the last difference did to a record: over-differencing shows as a variance that rose and a lag-one
 * autocorrelation near −½ (Plosser & Schwert 1977, J. Econometrics 6, 199–224).
 *
 * @returns variances before and after the last difference (a seasonal one where there is no other), and the lag-one
 *   (lag-s) autocorrelation after it; null without differencing
 */
export function differencingFacts(
  request: Pick<FitRequest, 'values' | 'window'>,
  { order, transform }: Candidate,
  lambda?: number,
): { before: number; after: number; lagOne: number } | null {
  if (order.d + order.D === 0) return null;
  const values = request.values.slice(request.window?.from ?? 0, request.window?.to ?? request.values.length);
  const transformed = transformRecord(values, transform, lambda);
  if (!transformed.ok) return null;
  const lower = order.d > 0 ? { ...order, d: order.d - 1 } : { ...order, D: order.D - 1 };
  const lag = order.d > 0 ? 1 : order.s;
  const before = centredOf(differenceRecord(transformed.value.values, differencingPolynomial(lower)));
  const after = centredOf(differenceRecord(transformed.value.values, differencingPolynomial(order)));
  if (after.length <= lag) return null;
  const covariances = pairwiseAutocovariances(after, lag);
  return {
    before: pairwiseAutocovariances(before, 0)[0]!,
    after: covariances[0]!,
    lagOne: covariances[lag]! / covariances[0]!,
  };
}

function centredOf(values: Float64Array): Float64Array {
  let sum = 0;
  let count = 0;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    sum += value;
    count++;
  }
  return values.map((value) => value - sum / count);
}
