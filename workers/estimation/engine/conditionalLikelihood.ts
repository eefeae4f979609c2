import { sparsePolynomial } from '../../model/expandPolynomials.ts';
import type { PreparedRecord } from '../prepareRecord.ts';
import { ProfileGls } from './profileGls.ts';
import { dot } from './fastEngine.ts';
import { steadyRecursion } from './steadyRecursion.ts';

/** What the conditional sum of squares implies, in the record's own units. */
export interface Conditional {
  readonly sumOfSquares: number;
  readonly beta: Float64Array;
  readonly innovationVariance: number;
  /** Values that enter: those of the differenced record less the AR degree. */
  readonly readings: number;
}

/**
 * The conditional sum of squares: Σ e_t² over t > p, given the first p values and with the innovations before them set to
 * nothing (Box & Jenkins, Time Series Analysis, ch. 7), level and regression by least squares on the filtered columns.
 *
 * @param prepared the record's centre and scales; @param differenced record and columns, differenced, no gaps
 * @param expanded multiplied-out polynomials
 * @returns NaN throughout where no value is left or the columns are collinear
 */
export function conditionalLikelihood(
  prepared: PreparedRecord,
  differenced: readonly Float64Array[],
  expanded: { ar: Float64Array; ma: Float64Array },
): Conditional {
  const p = expanded.ar.length;
  const pad = Math.max(p, expanded.ma.length);
  const n = differenced[0]!.length;
  const readings = n - p;
  const ar = sparsePolynomial(expanded.ar);
  const ma = sparsePolynomial(expanded.ma);
  const nothing = sparsePolynomial(new Float64Array(0));
  const filtered = differenced.map((values) => {
    const w = new Float64Array(n + pad);
    w.set(values, pad);
    const u = new Float64Array(n + pad);
    steadyRecursion(w, u, pad, n, ar, nothing);
    u.fill(0, 0, pad + p);
    const e = new Float64Array(n + pad);
    steadyRecursion(u, e, pad, n, nothing, ma);
    return e;
  });
  const count = filtered.length;
  const cross = new Float64Array(count * count);
  for (let i = 0; i < count; i++)
    for (let j = 0; j < count; j++) cross[i * count + j] = dot(filtered[i]!, filtered[j]!, pad, pad + n);
  const gls = new ProfileGls(count, 0);
  const { scale, columnScales, columnCentres, centre, columnNames } = prepared;
  if (readings <= 0 || !gls.solve(cross))
    return { sumOfSquares: NaN, beta: new Float64Array(count - 1).fill(NaN), innovationVariance: NaN, readings };
  const beta = gls.profile.beta.map((value, i) => (value * scale) / columnScales[i]!);
  if (columnNames[0] === 'mean') {
    beta[0]! += centre;
    for (let i = 1; i < beta.length; i++) beta[0]! -= beta[i]! * columnCentres[i]!;
  }
  const sumOfSquares = gls.profile.rss * scale * scale;
  return { sumOfSquares, beta, innovationVariance: sumOfSquares / readings, readings };
}
