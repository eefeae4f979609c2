import type { RepairFailure } from '../../workers/contract/failures.ts';
import type { Axis, Repair, RepairChange, Span } from '../../workers/contract/series.ts';
import { formatInterval, timeAt } from './axisTime.ts';
import { counted, formatReading } from './numbers.ts';

const rules = {
  nearest: 'the reading nearest to each place',
  binMean: 'the mean of the readings in each interval',
  last: 'the last reading of each interval',
};

/** How a regrid chooses its readings. */
export const regridRule = (rule: keyof typeof rules): string => rules[rule];

/** The stretches that a repair makes gaps, by index. */
export function gapSpans(change: RepairChange): Span[] {
  if (change.kind === 'gap') return [{ from: change.from, to: change.to }];
  if (change.kind !== 'gaps') return [];
  const spans: Span[] = [];
  let end = 0;
  change.runs.forEach((length, index) => {
    if (index % 2 === 1) spans.push({ from: end, to: end + length });
    end += length;
  });
  return spans;
}

/** A stretch by its times; one time where it is a single reading. */
export function spanText(axis: Axis, { from, to }: Span): string {
  return to - from === 1 ? timeAt(axis, from) : `${timeAt(axis, from)} to ${timeAt(axis, to - 1)}`;
}

/** What a change does, in words. `axis` is that of the record the change speaks of. */
export function changeText(change: RepairChange, axis: Axis): string {
  switch (change.kind) {
    case 'gap':
    case 'gaps': {
      const spans = gapSpans(change);
      const readings = spans.reduce((sum, { from, to }) => sum + to - from, 0);
      const first = spans[0] === undefined ? '' : spanText(axis, spans[0]);
      return spans.length === 1
        ? `${counted(readings, 'reading')} made a gap: ${first}`
        : `${counted(readings, 'reading')} in ${counted(spans.length, 'stretch', 'stretches')} made gaps, the first ${first}`;
    }
    case 'scale': {
      const { factor, offset, unit } = change;
      const times = factor === 1 ? 'reading' : `${formatReading(factor)} · reading`;
      const plus = offset === 0 ? '' : ` ${offset < 0 ? '−' : '+'} ${formatReading(Math.abs(offset))}`;
      if (factor === 1 && offset === 0) return unit === '' ? 'unit taken away' : `unit set to ${unit}`;
      return `readings rescaled: ${times}${plus}${unit === '' ? '' : `, in ${unit}`}`;
    }
    case 'regrid':
      return `laid on a grid ${formatInterval({ ...axis, step: change.step })}: ${rules[change.rule]}`;
  }
}

/** The axes that repairs speak of, one for each: a regrid changes it for those behind it. */
export function axesOf(raw: Axis, repairs: readonly Repair[]): Axis[] {
  let axis = raw;
  return repairs.map((repair) => {
    const own = axis;
    if (repair.kind === 'regrid') axis = { ...axis, step: repair.step };
    return own;
  });
}

/** Why a repair was refused. */
export function repairReasonText({ reason, kind, readings }: RepairFailure): string {
  switch (reason) {
    case 'outside':
      return `it names readings beyond the ${counted(readings, 'place')} of the record`;
    case 'number':
      if (kind === 'scale') return 'its factor must be a number other than 0 and its offset a number';
      return kind === 'regrid'
        ? 'its interval must be above 0, and whole months for a monthly record'
        : 'its stretch is empty or not in whole readings';
    case 'finer':
      return 'its interval is shorter than the present one, and readings cannot be invented';
    case 'tooFew':
      return 'fewer than 8 readings would be left';
    case 'overflow':
      return 'the readings would be too large to be numbers';
  }
}
