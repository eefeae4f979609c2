import type { RepairFailure, RepairReason } from '../contract/failures.ts';
import type { RepairedRecord } from '../contract/forensics.ts';
import type { Result } from '../contract/result.ts';
import type { Repair, Series } from '../contract/series.ts';
import { hashValues } from '../series/hashValues.ts';
import { regridRecord } from './regridRecord.ts';

/** Fewer readings than this carry no information about dependence between them: the same as on reading a file. */
const NEEDED = 8;
type Columns = RepairedRecord['columns'];
type Attempt = Series | RepairReason;

/**
 * Replays repairs from the raw record, in their order.
 *
 * Method: `gap` and `gaps` make readings gaps; `scale` gives factor · reading + offset in a new unit; `regrid` lays readings on a
 * coarser grid (see `regridRecord`). Each speaks of the record as the repairs before it left it.
 *
 * @param raw record as read; never altered
 * @param repairs in the order they are replayed
 * @returns a new record with its own hash (with no repairs a copy of `raw`); `repairRefused`, with the id and place of the first
 *   repair that falls outside the record or would leave fewer than 8 readings
 */
export function applyRepairs(raw: Series, repairs: readonly Repair[]): Result<Series, RepairFailure> {
  const repaired = repairRecord(raw, repairs, {});
  return repaired.ok ? { ok: true, value: repaired.value.series } : repaired;
}

/**
 * The same, with the other columns of the file carried along: a regrid moves them too, other repairs leave them alone.
 *
 * @param columns each as long as `raw`; never altered
 */
export function repairRecord(
  raw: Series,
  repairs: readonly Repair[],
  columns: Columns,
): Result<RepairedRecord, RepairFailure> {
  let series: Series = { ...raw, values: raw.values.slice() };
  let others: Columns = { ...columns };
  for (const [index, repair] of repairs.entries()) {
    const next = attempt(series, repair);
    if (typeof next === 'string') {
      const readings = series.values.length;
      const { id, kind } = repair;
      return { ok: false, failure: { code: 'repairRefused', id, place: index + 1, kind, reason: next, readings } };
    }
    if (repair.kind === 'regrid') others = regridColumns(others, series, repair);
    series = next;
  }
  return { ok: true, value: { series: { ...series, hash: hashValues(series.values) }, columns: others } };
}

function attempt(series: Series, repair: Repair): Attempt {
  switch (repair.kind) {
    case 'gap':
      return withGaps(series, [repair.from, repair.to - repair.from]);
    case 'gaps':
      return withGaps(series, repair.runs);
    case 'scale':
      return scaled(series, repair);
    case 'regrid':
      return regridded(series, repair);
  }
}

function withGaps(series: Series, runs: readonly number[]): Attempt {
  if (runs.length === 0 || runs.length % 2 === 1) return 'number';
  const values = series.values.slice();
  let end = 0;
  for (const [index, length] of runs.entries()) {
    const made = index % 2 === 1;
    if (!Number.isInteger(length) || length < (made ? 1 : 0)) return 'number';
    if (end + length > values.length) return 'outside';
    if (made) values.fill(NaN, end, end + length);
    end += length;
  }
  return enough(values) ? { ...series, values } : 'tooFew';
}

function scaled(series: Series, { factor, offset, unit }: Extract<Repair, { kind: 'scale' }>): Attempt {
  if (!Number.isFinite(factor) || factor === 0 || !Number.isFinite(offset)) return 'number';
  const values = series.values.map((value) => factor * value + offset);
  return values.some((value) => Math.abs(value) === Infinity) ? 'overflow' : { ...series, values, unit };
}

function regridded(series: Series, { step, rule }: Extract<Repair, { kind: 'regrid' }>): Attempt {
  const { axis } = series;
  if (!Number.isFinite(step) || step <= 0 || (axis.kind === 'months' && !Number.isInteger(step))) return 'number';
  if (step < axis.step) return 'finer';
  const values = regridRecord(series.values, axis, step, rule);
  return enough(values) ? { ...series, values, axis: { ...axis, step } } : 'tooFew';
}

function regridColumns(
  columns: Columns,
  { axis }: Series,
  { step, rule }: { step: number; rule: 'nearest' | 'binMean' | 'last' },
): Columns {
  return Object.fromEntries(
    Object.entries(columns).map(([name, column]) => [name, regridRecord(column, axis, step, rule)]),
  );
}

function enough(values: Float64Array): boolean {
  let count = 0;
  for (const value of values) if (!Number.isNaN(value)) count++;
  return count >= NEEDED;
}
