import type { Fit } from '../contract/fit.ts';
import type { Result } from '../contract/result.ts';
import type { InversionRequest, InvertedInterval, TriedValue } from '../contract/uncertainty.ts';
import { chiSquareQuantile } from '../distributions/chiSquareQuantile.ts';
import { prepareLikelihood } from '../estimation/prepareLikelihood.ts';
import { brentRoot } from '../numeric/brentRoot.ts';
import { createRandom } from '../numeric/random.ts';
import { transformRecord } from '../series/transformRecord.ts';
import { heldMaximum, type HeldMaximum, type Hypothesis } from './heldMaximum.ts';
import { hypothesisAbout, rangeOf } from './hypothesisAbout.ts';
import { ratioUnder } from './ratioUnder.ts';

const REPLICATES = 199;
/** Values tried on each side: the critical ratio changes so slowly with the value that it settles in three or four. */
const TRIES = 5;
/** A side is done when the critical ratio moved its end by less than this part of the distance from the estimate. */
const SETTLED = 0.02;
/** Ratios above this are taken for it: far outside any critical one. */
const MOST = 1e4;

/**
 * The interval of all values of one parameter that a simulated likelihood-ratio test does not reject.
 *
 * Method: at a value v the model is refitted with the parameter held there; records simulated from it are fitted freely and with the
 * parameter held, and the (1 − α) quantile of their ratios is the critical ratio c(v). An end of the interval solves LR(v) = c(v); since c hardly
 * varies it is found by turns: the v where LR(v) = c, then c there. The same random numbers serve every value. (Inverting a test whose
 * distribution is simulated at the hypothesis: e.g. Davison & Hinkley, Bootstrap Methods and Their Application, 1997, §5.5–5.6.)
 *
 * @param request fit by the exact likelihood, its record, the name of a parameter, coverage, seed, replicates
 * @param progress called with 0…1
 * @returns the interval and every value tried with its p-value; ends at the edge of the region, or ∓Infinity, where nothing was rejected
 */
export function testInversion(request: InversionRequest, progress?: (done: number) => void): Result<InvertedInterval> {
  const { fit, coverage, seed, about } = request;
  if (fit.candidate.estimator !== 'exact')
    return { ok: false, failure: { code: 'intervalsNotExact', estimator: fit.candidate.estimator } };
  const made = testOf(request);
  if (!made.ok) return made;
  const { ratioAt, ratiosUnder, estimate, range } = made.value;
  const replicates = request.replicates ?? REPLICATES;
  const tried: TriedValue[] = [];
  let done = 0;
  const step = () => progress?.(Math.min(1, ++done / (2 * TRIES * replicates)));

  const endOn = (side: -1 | 1): number => {
    const edge = side < 0 ? range.lower : range.upper;
    let critical = chiSquareQuantile(coverage, 1);
    let end = estimate;
    for (let attempt = 0; attempt < TRIES; attempt++) {
      const next = crossing(
        (v) => Math.min(MOST, ratioAt(v).ratio) - critical,
        estimate,
        side,
        made.value.spread,
        edge,
      );
      const settled = Math.abs(next - end) < SETTLED * Math.abs(next - estimate);
      end = next;
      if (!Number.isFinite(end) || (attempt > 0 && settled)) break;
      // At the edge itself there is no model to simulate from.
      const inside = end === edge ? estimate + (end - estimate) * 0.999 : end;
      const { ratio, hypothesis, maximum } = ratioAt(inside);
      if (maximum.coefficients === null) break;
      const simulated = ratiosUnder(hypothesis, maximum.coefficients, replicates, step).sort((a, b) => a - b);
      if (simulated.length === 0) break;
      const larger = simulated.filter((other) => other >= ratio).length;
      tried.push({ value: inside, ratio, p: (1 + larger) / (1 + simulated.length) });
      critical = simulated[Math.ceil(coverage * (simulated.length + 1)) - 1] ?? Infinity;
    }
    done = side < 0 ? TRIES * replicates : 2 * TRIES * replicates;
    progress?.(side < 0 ? 0.5 : 1);
    return end;
  };
  const lower = endOn(-1);
  const upper = endOn(1);
  return { ok: true, value: { about, coverage, seed, replicates, lower, upper, tried } };
}

/**
 * How extreme one value of a parameter is: its p-value by simulation under the model refitted with the parameter held there.
 *
 * @param value put to the test; @param request as for `testInversion`, whose coverage is not used
 */
export function testValue(request: Omit<InversionRequest, 'coverage'>, value: number): Result<TriedValue> {
  const made = testOf(request);
  if (!made.ok) return made;
  const { ratio, hypothesis, maximum } = made.value.ratioAt(value);
  if (maximum.coefficients === null) return { ok: true, value: { value, ratio: Infinity, p: 0 } };
  const simulated = made.value.ratiosUnder(hypothesis, maximum.coefficients, request.replicates ?? REPLICATES);
  const larger = simulated.filter((other) => other >= ratio).length;
  return { ok: true, value: { value, ratio, p: (1 + larger) / (1 + simulated.length) } };
}

/** Everything a test of one parameter needs of the record. */
function testOf({ fit, values, columns, about, seed }: Omit<InversionRequest, 'coverage'>) {
  const { parameters, window } = fit;
  const target = hypothesisAbout(fit, about);
  if (target === null) return { ok: false as const, failure: { code: 'noSuchParameter' as const, name: about } };
  const candidate = { ...fit.candidate, transform: { kind: 'none' as const } };
  const scaled = onModelScale(values, fit);
  if (!scaled.ok) return scaled;
  const prepared = prepareLikelihood({ values: scaled.value, candidate, window, columns });
  if (!prepared.ok) return prepared;
  const likelihood = prepared.value;
  const highest = heldMaximum(likelihood, candidate, { kind: 'free' }, [parameters]);
  // The fit's own ln L may be higher (a maximum found elsewhere); the Jacobian of its transform is not in this likelihood.
  const top = Math.max(highest.logLikelihood, fit.logLikelihood - jacobianOf(values, fit));
  const known = new Map<number, { ratio: number; hypothesis: Hypothesis; maximum: HeldMaximum }>();
  const ratioAt = (value: number) => {
    const before = known.get(value);
    if (before !== undefined) return before;
    const hypothesis = target.at(value);
    const near = [...known.values()].flatMap(({ maximum }) => maximum.coefficients ?? []).slice(-2);
    const maximum = heldMaximum(likelihood, candidate, hypothesis, [parameters, ...near]);
    const answer = { ratio: Math.max(0, 2 * (top - maximum.logLikelihood)), hypothesis, maximum };
    known.set(value, answer);
    return answer;
  };
  const ratiosUnder = (
    hypothesis: Hypothesis,
    under: NonNullable<HeldMaximum['coefficients']>,
    replicates: number,
    step?: () => void,
  ): number[] =>
    Array.from({ length: replicates }, (_, i) => {
      step?.();
      const shared = { candidate, values: scaled.value, window, columns, hypothesis, under, free: parameters };
      return ratioUnder(shared, createRandom(seed).fork(i));
    }).filter((ratio) => !Number.isNaN(ratio));
  const { estimate } = target;
  const spread = target.spread ?? Math.max(0.02, Math.abs(estimate) * 0.02);
  return { ok: true as const, value: { ratioAt, ratiosUnder, estimate, spread, range: rangeOf(fit, about) } };
}

function onModelScale(values: Float64Array, fit: Fit): Result<Float64Array> {
  const { from, to } = fit.window;
  const part = transformRecord(values.slice(from, to), fit.candidate.transform, fit.parameters.lambda);
  if (!part.ok) return part;
  const whole = values.slice();
  whole.fill(NaN);
  whole.set(part.value.values, from);
  return { ok: true, value: whole };
}

function jacobianOf(values: Float64Array, fit: Fit): number {
  const { candidate, parameters, window } = fit;
  if (candidate.transform.kind === 'none') return 0;
  const prepared = prepareLikelihood({ values, candidate, window, lambda: parameters.lambda });
  return prepared.ok ? prepared.value.logJacobian : Infinity;
}

/** Where f rises through 0 going outward from the estimate; the edge where it does not. */
function crossing(f: (v: number) => number, estimate: number, side: -1 | 1, spread: number, edge: number): number {
  let low = estimate;
  let step = spread;
  for (let attempt = 0; attempt < 60; attempt++) {
    const next = Number.isFinite(edge) ? side * Math.min(side * edge, side * (low + side * step)) : low + side * step;
    if (next === edge) {
      // The edge itself belongs to no stationary model: the last place before it decides.
      const last = low + (edge - low) * 0.9999;
      if (f(last) < 0) return edge;
      return brentRoot(f, low, last, 1e-3 * spread)?.x ?? last;
    }
    if (f(next) >= 0) return brentRoot(f, low, next, 1e-3 * spread)?.x ?? next;
    low = next;
    step *= 1.6;
  }
  return side * Infinity;
}
