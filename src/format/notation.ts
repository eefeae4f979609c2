import type { Candidate, Estimator, Level, Order, Transform } from '../../workers/contract/candidate.ts';
import { formatNumber, subscript } from './numbers.ts';

/** Box and Jenkins' notation; the seasonal part only where there is one. */
export function orderNotation({ p, d, q, P, D, Q, s }: Order): string {
  const plain = `(${p},${d},${q})`;
  return P + D + Q === 0 ? plain : `${plain}×(${P},${D},${Q})${subscript(s)}`;
}

export function levelName(level: Level): string {
  return { none: 'no level', mean: 'mean', drift: 'drift' }[level];
}

export function estimatorName(estimator: Estimator): string {
  return {
    exact: 'exact likelihood',
    conditional: 'conditional sum of squares',
    yuleWalker: 'Yule–Walker',
    burg: 'Burg',
    leastSquares: 'least squares',
  }[estimator];
}

export function transformName(transform: Transform): string {
  if (transform.kind === 'none') return 'none';
  if (transform.kind === 'log') return 'logarithm';
  return transform.lambda === 'estimate' ? 'Box–Cox, λ estimated' : `Box–Cox, λ = ${formatNumber(transform.lambda, 3)}`;
}

/** A candidate in one line: notation, level, and what is not usual about it. */
export function candidateName({ order, level, transform, estimator, regressors }: Candidate): string {
  const parts = [orderNotation(order)];
  if (level !== 'none') parts.push(`with ${level}`);
  if (transform.kind !== 'none') parts.push(transformName(transform));
  if (estimator !== 'exact') parts.push(estimatorName(estimator));
  if (regressors.length > 0) parts.push(`${regressors.length} input${regressors.length === 1 ? '' : 's'}`);
  return parts.join(', ');
}

/** Names of coefficients as they are printed: φ₁ for φ1. */
export function coefficientName(name: string): string {
  return name.replace(/\d+/g, (digits) => subscript(Number(digits)));
}
