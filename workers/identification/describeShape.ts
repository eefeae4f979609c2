import type { Failure } from '../contract/failures.ts';
import type { Result } from '../contract/result.ts';
import type { Axis } from '../contract/series.ts';
import type { SeasonalView, Shape, ShapeRequest, ShapeSpectrum } from '../contract/shape.ts';
import { candidateOf } from '../model/candidateOf.ts';
import { checkCandidate } from '../model/checkCandidate.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { differenceRecord } from '../series/differenceRecord.ts';
import { transformRecord } from '../series/transformRecord.ts';
import { averagedRecord } from './averagedRecord.ts';
import { differencingTable } from './differencingTable.ts';
import { seasonalProfile } from './seasonalProfile.ts';
import { shapeAdvice } from './shapeAdvice.ts';
import { shapeLags } from './shapeLags.ts';
import { spreadAgainstLevel } from './spreadAgainstLevel.ts';
import { strongestPeriods } from './strongestPeriods.ts';
import { unitRootPair } from './unitRootPair.ts';

const FEWEST = 16;
/** Longer records are averaged before their periodogram is taken. */
const MOST_SPECTRUM = 2 ** 16;

/**
 * The shape of a record before any model: correlations, periods, seasonal means, spread against level, differencing, unit-root tests and advice.
 *
 * Method: the kernels of this folder on the transformed, differenced readings of the window; seasonal means, spread and advice on the readings
 * themselves. A record of more than 65 536 readings is averaged over blocks before its periodogram is taken.
 *
 * @param request values with gaps as NaN, axis, window, differencing to show, transform, coverage
 * @returns failures: `badCandidate` for orders or a window out of range, `notFinite` for a coverage outside (0, 1), `transformDomain`, `tooFewReadings` for fewer than
 *   16 differenced readings, `noVariation`
 */
export function describeShape(request: ShapeRequest): Result<Shape> {
  const { order, transform = { kind: 'none' }, coverage = 0.95 } = request;
  const window = request.window ?? { from: 0, to: request.values.length };
  const refusal = refused(request);
  if (refusal !== null) return { ok: false, failure: refusal };
  const values = request.values.subarray(window.from, window.to);
  const axis = { ...request.axis, start: request.axis.start + window.from * request.axis.step };
  const transformed = transformRecord(values, transform);
  if (!transformed.ok) {
    const { failure } = transformed;
    return {
      ok: false,
      failure: failure.code === 'transformDomain' ? { ...failure, index: failure.index + window.from } : failure,
    };
  }
  const { d, D, s } = order;
  const scaled = transformed.value.values;
  const differenced = differenceRecord(scaled, differencingPolynomial(order));
  const failure = emptyOf(differenced, d + D > 0);
  if (failure !== null) return { ok: false, failure };

  const plain = spectrumOf(values, axis);
  const shown = d + D === 0 && transform.kind === 'none' ? plain : spectrumOf(differenced, axis);
  const { advice, lambda } = shapeAdvice(values, axis, plain, (season) => spreadAgainstLevel(values, season));
  const season = s > 1 ? s : advice.order.s;
  const constant = unitRootPair(differenced, 'constant');
  const trend = unitRootPair(differenced, 'trend');
  let readings = 0;
  for (const value of values) if (!Number.isNaN(value)) readings++;
  return {
    ok: true,
    value: {
      order: { d, D, s },
      transform,
      window,
      readings,
      gaps: values.length - readings,
      lags: shapeLags(differenced, season, coverage),
      spectrum: shown,
      seasonal: seasonalViews(scaled, axis, season),
      spread: { ...spreadAgainstLevel(values, season), lambda },
      differencing: differencingTable(scaled, season),
      unitRoots: constant === null || trend === null ? null : { constant, trend, averaged: constant.averaged },
      advice,
    },
  };
}

function refused({ values, order, transform, coverage = 0.95, window }: ShapeRequest): Failure | null {
  if (!(coverage > 0 && coverage < 1)) return { code: 'notFinite', what: 'coverage', index: 0 };
  const checked = checkCandidate(
    candidateOf({ order: { p: 0, q: 0, P: 0, Q: 0, ...order }, ...(transform === undefined ? {} : { transform }) }),
  );
  if (!checked.ok) return checked.failure;
  if (window === undefined) return null;
  const { from, to } = window;
  const inside = Number.isInteger(from) && Number.isInteger(to) && from >= 0 && to <= values.length && from < to;
  return inside ? null : { code: 'badCandidate', field: 'window', reason: 'window' };
}

function emptyOf(differenced: Float64Array, afterDifferencing: boolean): Failure | null {
  let observed = 0;
  let low = Infinity;
  let high = -Infinity;
  for (const value of differenced) {
    if (Number.isNaN(value)) continue;
    observed++;
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  if (observed < FEWEST) return { code: 'tooFewReadings', readings: observed, needed: FEWEST, coefficients: 0 };
  return low === high ? { code: 'noVariation', value: low, afterDifferencing } : null;
}

function spectrumOf(values: Float64Array, axis: Axis): ShapeSpectrum {
  const step = Math.max(1, Math.ceil(values.length / MOST_SPECTRUM));
  return strongestPeriods(averagedRecord(values, step), axis, step);
}

/** By hour, weekday and month where the interval and length allow it, and by place in the season where that is none of these. */
function seasonalViews(values: Float64Array, axis: Axis, season: number): SeasonalView[] {
  const views = (['hour', 'weekday', 'month'] as const)
    .map((by) => seasonalProfile(values, axis, by))
    .filter((view) => view !== null);
  if (views.some(({ period }) => Math.abs(period - season) < 1e-6)) return views;
  const phase = seasonalProfile(values, axis, 'phase', season);
  return phase === null ? views : [...views, phase];
}
