import { transfer } from 'comlink';
import type { Failure } from '../contract/failures.ts';
import type { Result } from '../contract/result.ts';
import type { ModellingApi } from '../contract/workerApis.ts';
import { fitCandidate } from '../estimation/fitCandidate.ts';
import { describeShape } from '../identification/describeShape.ts';
import { repairRecord } from '../forensics/applyRepairs.ts';
import { inspectRecord } from '../forensics/inspectRecord.ts';
import { predictRecord } from '../prediction/predictRecord.ts';
import { comparisonGroups } from '../selection/comparisonGroups.ts';
import { integratedIntervals } from '../uncertainty/integratedIntervals.ts';
import { testInversion } from '../uncertainty/testInversion.ts';
import { planSweep } from '../selection/planSweep.ts';
import { rankSweep } from '../selection/rankSweep.ts';
import { sweepInSteps } from './sweepInSteps.ts';
import { judgeFit } from '../verdict/judgeFit.ts';
import { infinityIn } from './infinityIn.ts';
import { ownBuffers } from './ownBuffers.ts';

/** What the modelling worker answers to: each request refused at the door where it holds an infinity, no call ever throws. */
export const modellingApi: ModellingApi = {
  ready: () => true,
  fit: (request) => guarded(request, fitCandidate),
  diagnose: (request) => guarded(request, judgeFit),
  predict: (request) => guarded(request, predictRecord),
  intervals: (request) => guarded(request, integratedIntervals),
  invert: (request, progress) => guarded(request, (checked) => testInversion(checked, inSteps(progress))),
  planSweep: (range, like, workers) => guarded({}, () => ({ ok: true, value: planSweep(range, like, workers) })),
  sweep: (request, report) =>
    guarded(request, (checked) => {
      sweepInSteps(checked, report);
      return { ok: true, value: null };
    }),
  rankSweep: (fits) => guarded({}, () => ({ ok: true, value: rankSweep(fits) })),
  shape: (request) => guarded(request, describeShape),
  inspect: (series, notes) => guarded({ values: series.values }, () => inspectRecord(series, notes)),
  repair: (raw, repairs, columns = {}) =>
    guarded({ values: raw.values, columns }, () => repairRecord(raw, repairs, columns)),
  compare: (fits) => guarded({}, () => ({ ok: true, value: comparisonGroups(fits) })),
};

/** Reports of a hundredth at a time: each one is a message to the page. */
function inSteps(progress: ((fraction: number) => void) | undefined): (fraction: number) => void {
  let said = -1;
  return (fraction) => {
    const now = Math.floor(fraction * 100);
    if (now === said) return;
    said = now;
    progress?.(fraction);
  };
}

interface Readings {
  readonly values?: Float64Array;
  readonly columns?: Readonly<Record<string, Float64Array>>;
}

function guarded<Request extends Readings, Answer>(
  request: Request,
  call: (request: Request) => Result<Answer>,
): Result<Answer> {
  try {
    const failure: Failure | null = infinityIn(request);
    const answer = failure === null ? call(request) : { ok: false as const, failure };
    return transfer(answer, ownBuffers(answer));
  } catch (cause) {
    const message = cause instanceof Error ? cause.message : String(cause);
    return { ok: false, failure: { code: 'internal', message } };
  }
}
