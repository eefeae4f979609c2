import type { Candidate } from '../contract/candidate.ts';
import type { Failure } from '../contract/failures.ts';
import type { Result } from '../contract/result.ts';
import type { Span } from '../contract/series.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { differenceRecord } from '../series/differenceRecord.ts';
import { regressionColumns, type Covariates } from '../series/regressionColumns.ts';
import { transformRecord } from '../series/transformRecord.ts';
import { startingValues } from './engine/startingValues.ts';

/** The readings and columns of one candidate, made ready for a likelihood engine. */
export interface PreparedRecord {
  /** Record on the model's scale, centred and divided by `scale`, from the first used reading to the last; gaps NaN. */
  readonly record: Float64Array;
  /** Columns on the level of the record, centred and divided by their own scale, over the same stretch. */
  readonly columns: readonly Float64Array[];
  readonly columnNames: readonly string[];
  readonly differencing: Float64Array;
  /** Index in the whole record of element 0 of `record`. */
  readonly from: number;
  readonly gaps: number;
  readonly centre: number;
  readonly scale: number;
  readonly columnCentres: readonly number[];
  readonly columnScales: readonly number[];
  /** Observed readings less the rank of the starting values. */
  readonly readingsUsed: number;
  readonly logJacobian: number;
  /** 1 where a reading of `record` is spent on starting values. */
  readonly spent: Uint8Array;
}

export interface PrepareRequest {
  readonly values: Float64Array;
  readonly candidate: Candidate;
  readonly window?: Span | undefined;
  readonly columns?: Covariates | undefined;
  /** Box–Cox λ where it is to be estimated. */
  readonly lambda?: number | undefined;
}

/** A column smaller than this beside what it was before differencing or projection is nothing. */
const NOTHING = 1e-9;

/**
 * Transforms, trims, centres and scales a record and the columns of its regression, and counts the readings used.
 *
 * Gaps at the ends are dropped (they say nothing), gaps inside stay NaN. Differencing annihilates the centre, and a mean
 * takes it up, so that offsets of 1e9 and units of 1e−12 cost no digits; a model without level is not centred.
 *
 * @returns failures for infinities, windows outside the record, transforms outside their domain, too few readings, records
 *   without variation, and columns that cannot be estimated, each with its place
 */
export function prepareRecord(request: PrepareRequest): Result<PreparedRecord> {
  const { values, candidate } = request;
  const window = request.window ?? { from: 0, to: values.length };
  if (!(window.from >= 0 && window.to <= values.length && window.from < window.to))
    return fail({ code: 'badCandidate', field: 'window', reason: 'window' });
  const infinite = values.findIndex((value) => value === Infinity || value === -Infinity);
  if (infinite >= 0) return fail({ code: 'notFinite', what: 'values', index: infinite });
  const regression = regressionColumns(candidate, values.length, request.columns);
  if (!regression.ok) return regression;
  const lag = Math.max(0, ...candidate.regressors.map((one) => (one.kind === 'column' ? one.lag : 0)));
  let from = Math.max(window.from, lag);
  let to = window.to;
  while (from < to && Number.isNaN(values[from]!)) from++;
  while (to > from && Number.isNaN(values[to - 1]!)) to--;
  const transformed = transformRecord(values.slice(from, to), candidate.transform, request.lambda);
  if (!transformed.ok) return shifted(transformed.failure, from);
  const record = transformed.value.values;
  const differencing = differencingPolynomial(candidate.order);
  const gaps = record.reduce((sum, value) => sum + (Number.isNaN(value) ? 1 : 0), 0);
  const { rank, spent } = gaps > 0 ? startingValues(record, differencing) : firstReadings(record.length, differencing);
  const readingsUsed = record.length - gaps - rank;
  const coefficients = coefficientCount(candidate) + regression.value.columns.length;
  if (readingsUsed < coefficients + 2)
    return fail({
      code: 'tooFewReadings',
      readings: Math.max(readingsUsed, 0),
      needed: coefficients + 2,
      coefficients,
    });
  const columns = regression.value.columns.map((column) => column.slice(from, to));
  const names = regression.value.names;
  for (let i = 0; i < columns.length; i++) {
    const index = columns[i]!.findIndex((value, t) => !Number.isFinite(value) && !Number.isNaN(record[t]!));
    if (index >= 0) return fail({ code: 'columnGap', column: names[i]!, index: from + index });
    // In a gap of the record the value of a covariate does not enter.
    columns[i] = columns[i]!.map((value) => (Number.isFinite(value) ? value : 0));
  }
  const takesCentre = differencing.length > 1 || candidate.level === 'mean';
  const centre = takesCentre ? observedMean(record) : 0;
  const centred = record.map((value) => value - centre);
  const spread = rootMeanSquare(differencing.length > 1 ? differenceRecord(centred, differencing) : centred);
  const scale = spread > 0 ? spread : 1;
  const columnCentres = columns.map((column, i) =>
    // Over the readings there are: what happens in a gap alone is nothing then, not a constant.
    takesCentre && !(i === 0 && candidate.level !== 'none') ? observedMean(seenBy(record, column)) : 0,
  );
  const columnScales: number[] = [];
  for (let i = 0; i < columns.length; i++) {
    const shiftedColumn = columns[i]!.map((value) => value - columnCentres[i]!);
    const whole = rootMeanSquare(columns[i]!);
    const left = rootMeanSquare(
      differencing.length > 1 ? differenceRecord(shiftedColumn, differencing) : shiftedColumn,
    );
    const reason = left > NOTHING * whole ? null : whole > 0 ? 'annihilated' : 'inGap';
    if (reason !== null) return fail({ code: 'columnNotEstimable', column: names[i]!, reason });
    columnScales.push(left);
    columns[i] = shiftedColumn.map((value) => value / left);
  }
  const dependent = firstDependent(columns, centred, differencing);
  if (dependent !== null)
    return fail({ code: 'columnNotEstimable', column: names[dependent.index]!, reason: dependent.reason });
  const logJacobian = transformed.value.logJacobian;
  return {
    ok: true,
    value: {
      record: centred.map((value) => value / scale),
      columns,
      columnNames: names,
      differencing,
      from,
      gaps,
      centre,
      scale,
      columnCentres,
      columnScales,
      readingsUsed,
      spent,
      logJacobian:
        logJacobian === null
          ? 0
          : logJacobian.reduce((sum, value, t) => (spent[t] === 1 || Number.isNaN(value) ? sum : sum + value), 0),
    },
  };
}

/** Estimated ARMA coefficients of a candidate. */
export function coefficientCount({ order, zeroLags }: Candidate): number {
  const held = zeroLags.ar.length + zeroLags.ma.length + zeroLags.seasonalAr.length + zeroLags.seasonalMa.length;
  return order.p + order.q + order.P + order.Q - held;
}

function fail(failure: Failure): { ok: false; failure: Failure } {
  return { ok: false, failure };
}

function shifted(failure: Failure, by: number): { ok: false; failure: Failure } {
  return fail(failure.code === 'transformDomain' ? { ...failure, index: failure.index + by } : failure);
}

function firstReadings(length: number, differencing: Float64Array): { rank: number; spent: Uint8Array } {
  const rank = differencing.length - 1;
  return { rank, spent: new Uint8Array(length).fill(1, 0, rank) };
}

function observedMean(values: Float64Array): number {
  let sum = 0;
  let count = 0;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    sum += value;
    count++;
  }
  const first = sum / count;
  let rest = 0;
  for (const value of values) if (!Number.isNaN(value)) rest += value - first;
  return first + rest / count;
}

/** A column where the record has readings, NaN elsewhere. */
function seenBy(record: Float64Array, column: Float64Array): Float64Array {
  return column.map((value, t) => (Number.isNaN(record[t]!) ? NaN : value));
}

function rootMeanSquare(values: Float64Array): number {
  let sum = 0;
  let count = 0;
  for (const value of values) {
    if (Number.isNaN(value)) continue;
    sum += value * value;
    count++;
  }
  return count === 0 ? 0 : Math.sqrt(sum / count);
}

/** The first column that the readings cannot tell from those before it (or from nothing), by Gram–Schmidt. */
function firstDependent(
  columns: readonly Float64Array[],
  record: Float64Array,
  differencing: Float64Array,
): { index: number; reason: 'collinear' | 'inGap' } | null {
  const basis: Float64Array[] = [];
  for (let index = 0; index < columns.length; index++) {
    const masked = seenBy(record, columns[index]!);
    const seen = differencing.length > 1 ? differenceRecord(masked, differencing) : masked;
    // With gaps a differenced column is judged where its differences are observed; the filter uses more.
    const rest = seen.map((value) => (Number.isNaN(value) ? 0 : value));
    const whole = rootMeanSquare(rest);
    if (!(whole > NOTHING)) {
      if (masked.every((value) => !(Math.abs(value) > 0))) return { index, reason: 'inGap' };
      continue;
    }
    for (let pass = 0; pass < 2; pass++) {
      for (const unit of basis) {
        let along = 0;
        for (let t = 0; t < rest.length; t++) along += rest[t]! * unit[t]!;
        for (let t = 0; t < rest.length; t++) rest[t]! -= along * unit[t]!;
      }
    }
    const left = rootMeanSquare(rest);
    if (!(left > 1e-8 * whole)) return { index, reason: 'collinear' };
    const norm = left * Math.sqrt(rest.length);
    basis.push(rest.map((value) => value / norm));
  }
  return null;
}
