import type { Finding, FindingCode, EffectCode, ForensicReport, Untested } from '../../workers/contract/forensics.ts';
import type { Axis, RepairChange } from '../../workers/contract/series.ts';
import { formatDuration, formatInterval, timeAt } from './axisTime.ts';
import { counted, formatNumber, formatPValue } from './numbers.ts';
import { regridRule, spanText } from './repairText.ts';

/** What was found, where, what it does to a model, and what to do where no repair is offered. */
export interface FindingText {
  readonly says: string;
  readonly where: string;
  readonly effect: string;
  /** Empty where a repair is offered. */
  readonly advice: string;
}

const MOST_PLACES = 3;

const effects: Record<EffectCode, string> = {
  meaningless: 'Taken as numbers they swamp every estimate.',
  tailsCut: 'The spread comes out too small, and the innovations are not normal where the record is cut.',
  memoryInvented: 'It is taken for memory: φ moves towards 1, and the uncertainty of the mean grows with it.',
  roundingNoise: 'Rounding adds noise that looks like an MA term and pulls φ towards 0.',
  memoryHidden: 'It pulls φ towards 0 and inflates σ, and it makes whiteness tests pass that should fail.',
  intervalsWrong:
    'Coefficients hardly suffer, but every interval and limit is too wide on one side and too narrow on the other.',
  mixedIntervals: 'Lag one means two different times in one record.',
  patternShifted: 'A daily pattern sits an hour off on one side of the change.',
  filteredSignal:
    'A model describes the averaged signal: its MA roots lie on the unit circle, and short-term memory is that of the average.',
};

const names: Record<FindingCode, string> = {
  sentinel: 'codes for no reading',
  clipped: 'readings at the end of a range',
  frozen: 'readings that stood still',
  interpolated: 'straight lines',
  quantised: 'coarse rounding',
  outlier: 'single wild readings',
  levelStep: 'steps of the level',
  varianceChange: 'a change of the noise',
  intervalChange: 'a change of the interval',
  clockChange: 'a change of the clock',
  averaged: 'averages',
};

/** A short name of an item, as in a list of what was looked for. */
export const findingName = (code: FindingCode): string => names[code];

/** The words of one finding. */
export function findingText(finding: Finding, axis: Axis, unit: string): FindingText {
  return {
    says: saysOf(finding, axis, unit),
    where: whereOf(finding, axis),
    effect: effects[finding.effect],
    advice: finding.offered.length > 0 ? '' : adviceOf(finding.code),
  };
}

function saysOf({ code, count, numbers }: Finding, axis: Axis, unit: string): string {
  const n = (key: string, digits = 3) => formatNumber(numbers[key] ?? NaN, digits);
  const withUnit = (key: string, digits = 3) => (unit === '' ? n(key, digits) : `${n(key, digits)} ${unit}`);
  switch (code) {
    case 'sentinel':
      return `${counted(count, 'reading')} hold ${n('value', 8)}${numbers['kinds'] === 1 ? '' : ' or another such value'}: a code for “no reading”, not a measurement.`;
    case 'clipped':
      return `${counted(count, 'reading')} stand at ${numbers['ends'] === 2 ? 'the two ends of the range, most' : 'the end of the range,'} at ${withUnit('value', 6)}: the signal was cut off there.`;
    case 'frozen':
      return `The reading stood still in ${counted(count, 'stretch', 'stretches')}, up to ${counted(numbers['longest'] ?? 0, 'reading')} long; chance would not reach ${n('least')}.`;
    case 'interpolated':
      return `${counted(numbers['readings'] ?? 0, 'reading')} in ${counted(count, 'stretch', 'stretches')} lie on straight lines between their neighbours (${percent(numbers['share'])} in line, ${percent(numbers['expected'])} by chance): the logger kept about ${percent(numbers['kept'])} of the readings and drew the rest.`;
    case 'quantised':
      return `Readings move in steps of ${withUnit('step')}, ${n('inDeviations', 2)} standard deviations of the innovations.`;
    case 'outlier':
      return count === 1
        ? `One reading is ${withUnit('largest')} off what its neighbours say, ${n('inDeviations', 2)} standard deviations of the innovations.`
        : `${counted(count, 'reading')} are far off what their neighbours say, the worst by ${withUnit('largest')}, ${n('inDeviations', 2)} standard deviations of the innovations.`;
    case 'levelStep':
      return count === 1
        ? `The level steps by ${withUnit('size')}, ${n('inDeviations', 2)} standard deviations of the record, and stays there.`
        : `The level steps ${count} times, most by ${withUnit('size')} at ${timeAt(axis, numbers['at'] ?? 0)}.`;
    case 'varianceChange':
      return `From there on the innovations are ${n('ratio', 2)} times as large as before (p ${formatPValue(numbers['p'] ?? NaN)}).`;
    case 'intervalChange':
      return `Readings come ${intervalOf(axis, numbers['shorter'])} in part of the record and ${intervalOf(axis, numbers['longer'])} in ${counted(count, 'stretch', 'stretches')} of it.`;
    case 'clockChange':
      return (numbers['missing'] ?? 0) > 0
        ? `${counted(numbers['missing'] ?? 0, 'hour')} of a Sunday night without a reading: the clock was put forward.${(numbers['repeated'] ?? 0) > 0 ? ` ${counted(numbers['repeated'] ?? 0, 'row')} repeat an hour when it was put back.` : ''}`
        : `${counted(numbers['repeated'] ?? 0, 'row')} of the file repeat an hour: the clock was put back.`;
    case 'averaged':
      return `Each reading is the mean of about ${n('window')} measurements${axis.kind === 'seconds' ? ` (${formatDuration((numbers['window'] ?? 0) * axis.step)})` : ''}: the frequencies that such a mean takes away are missing.`;
  }
}

function intervalOf(axis: Axis, step: number | undefined): string {
  return axis.kind === 'index'
    ? `every ${formatNumber(step ?? NaN)} places`
    : formatInterval({ ...axis, step: step ?? axis.step });
}

function percent(share: number | undefined): string {
  if (share === undefined) return '–';
  return share > 0 && share < 0.005 ? 'under 1 %' : `${Math.round(100 * share)} %`;
}

function whereOf({ places, code }: Finding, axis: Axis): string {
  if (places.length === 0) return '';
  const point = code === 'levelStep' || code === 'varianceChange';
  const shown = places.slice(0, MOST_PLACES).map((place) => (point ? timeAt(axis, place.from) : spanText(axis, place)));
  const more = places.length > MOST_PLACES ? ` and ${places.length - MOST_PLACES} more` : '';
  return `${shown.join('; ')}${more}`;
}

function adviceOf(code: FindingCode): string {
  switch (code) {
    case 'levelStep':
      return 'Estimate it as a step event of the candidate; do not take it away by hand.';
    case 'varianceChange':
      return 'Choose a fit window on one side of it, or try a log transform if the level changed too.';
    case 'quantised':
      return 'Ask for the readings with more digits.';
    case 'averaged':
      return 'Ask for the readings before averaging, or keep in mind what the model describes.';
    case 'clockChange':
      return 'Read the file in its time zone.';
    default:
      return 'Ask for the readings as measured.';
  }
}

/** What the button for an offered repair says. */
export function offerText({ count, code }: Finding, change: RepairChange, axis: Axis): string {
  if (change.kind === 'regrid') return `Regrid ${intervalOf(axis, change.step)}, ${regridRule(change.rule)}`;
  const one =
    code === 'outlier' || code === 'sentinel' || code === 'clipped'
      ? counted(count, 'reading')
      : counted(count, 'stretch', 'stretches');
  return count === 1 ? `Make the ${one.slice(2)} a gap` : `Make the ${one} gaps`;
}

/** Why a repair was made, as it is first written into its record. */
export function offerReason({ code }: Finding): string {
  return `Report on arrival: ${names[code]}`;
}

/** One line on the whole report. */
export function reportSentence({ findings }: ForensicReport): string {
  if (findings.length === 0) return 'nothing found';
  return findings
    .map(({ code, count, places }) => (places.length > 1 ? `${names[code]} (${count})` : names[code]))
    .join(', ');
}

/** What could not be looked for, in one sentence; empty where everything could. */
export function untestedSentence(untested: readonly Untested[]): string {
  const reasons = {
    fewReadings: 'the record is too short',
    coarse: 'the readings are rounded too coarsely',
    gaps: 'too few readings stand side by side',
  };
  return (Object.keys(reasons) as Untested['reason'][])
    .map((reason) => ({ reason, codes: untested.filter((one) => one.reason === reason) }))
    .filter(({ codes }) => codes.length > 0)
    .map(
      ({ reason, codes }) =>
        `Not looked for, since ${reasons[reason]}: ${codes.map(({ code }) => names[code]).join(', ')}.`,
    )
    .join(' ');
}
