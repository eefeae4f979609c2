import type { Finding, FindingCode, ForensicReport, Untested } from '../contract/forensics.ts';
import type { ReadingNote } from '../contract/reading.ts';
import type { Result } from '../contract/result.ts';
import type { Series, Span } from '../contract/series.ts';
import { findAveraging } from './findAveraging.ts';
import { findClipping } from './findClipping.ts';
import { findClockChange } from './findClockChange.ts';
import { findFrozen } from './findFrozen.ts';
import { findInterpolation } from './findInterpolation.ts';
import { findIntervalChange } from './findIntervalChange.ts';
import { findOutliers } from './findOutliers.ts';
import { findQuantisation } from './findQuantisation.ts';
import { findSentinels } from './findSentinels.ts';
import { findSteps } from './findSteps.ts';
import { findVarianceChange } from './findVarianceChange.ts';
import { resolutionOf } from './resolutionOf.ts';
import { whitenRecord } from './whitenRecord.ts';

/** Fewer readings than this are not inspected. */
const NEEDED = 30;
const ALL: readonly FindingCode[] = [
  'sentinel',
  'clipped',
  'frozen',
  'interpolated',
  'quantised',
  'outlier',
  'levelStep',
  'varianceChange',
  'averaged',
];
const BY_INNOVATIONS: readonly FindingCode[] = ['quantised', 'outlier', 'levelStep', 'varianceChange'];

/**
 * What the logger did to a record.
 *
 * Method: the detectors in the order in which one explains another. Codes for "no reading" are set aside first; then stretches
 * that stood still, then straight lines; what is left is whitened by an autoregression, on which rounding, outliers, steps and
 * changes of variance are judged, each without those before it. Every threshold is set by simulation of clean autoregressive and
 * mixed records, rounded ones among them (`npm run calibrate -- forensics`).
 *
 * @param series record as it stands, repairs included; @param notes from the reading of its file
 * @returns findings in that order, and what could not be looked for and why; `tooFewReadings` never: a short record has an empty
 *   report with everything untested
 */
export function inspectRecord(series: Series, notes: readonly ReadingNote[] = []): Result<ForensicReport> {
  const { values, axis, hash } = series;
  const index = values.findIndex((value) => Math.abs(value) === Infinity);
  if (index >= 0) return { ok: false, failure: { code: 'notFinite', what: 'values', index } };
  const findings: Finding[] = [];
  const untested: Untested[] = [];
  const rest = values.slice();
  const keep = (finding: Finding | null, setAside = false): void => {
    if (finding === null) return;
    findings.push(finding);
    if (setAside) blank(rest, finding.places);
  };
  const report = (resolution: number, innovationScale: number | null): Result<ForensicReport> => ({
    ok: true,
    value: { seriesHash: hash, findings, untested, resolution, innovationScale },
  });
  if (countOf(values) < NEEDED) {
    untested.push(...ALL.map((code) => ({ code, reason: 'fewReadings' as const })));
    return report(0, null);
  }
  keep(findClockChange(values, axis, notes));
  keep(findIntervalChange(values, axis));
  keep(findSentinels(values), true);
  const resolution = resolutionOf(rest);
  const frozen = findFrozen(rest, resolution);
  keep(findClipping(rest, resolution, frozen?.places ?? []));
  keep(frozen, true);
  const lines = findInterpolation(rest, resolution);
  if (lines.coarse) untested.push({ code: 'interpolated', reason: 'coarse' });
  keep(lines.finding, true);
  const whitened = whitenRecord(rest);
  if (whitened === null) {
    untested.push(...BY_INNOVATIONS.map((code) => ({ code, reason: 'gaps' as const })));
    return report(resolution, null);
  }
  keep(findQuantisation(resolution, whitened));
  const outliers = findOutliers(whitened);
  keep(outliers, true);
  const calm = outliers === null ? whitened : (whitenRecord(rest) ?? whitened);
  const steps = findSteps(rest, calm);
  keep(steps.finding);
  keep(findVarianceChange(steps.whitened));
  if (countOf(values) < values.length) untested.push({ code: 'averaged', reason: 'gaps' });
  else if (values.length < 100) untested.push({ code: 'averaged', reason: 'fewReadings' });
  else keep(findAveraging(values));
  return report(resolution, steps.whitened.scale);
}

function countOf(values: Float64Array): number {
  let count = 0;
  for (const value of values) if (!Number.isNaN(value)) count++;
  return count;
}

function blank(values: Float64Array, places: readonly Span[]): void {
  for (const { from, to } of places) values.fill(NaN, from, to);
}
