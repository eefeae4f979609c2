import * as Comlink from 'comlink';
import type { Candidate, FitRequest } from '../../workers/contract/candidate.ts';
import type { DiagnoseRequest, Judgement } from '../../workers/contract/diagnostics.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import type { ForensicReport, RepairedRecord } from '../../workers/contract/forensics.ts';
import type { Prediction, PredictRequest } from '../../workers/contract/prediction.ts';
import type {
  JoinedFiles,
  JoinRequest,
  ReadAnswer,
  ReadingNote,
  ReadRequest,
  WorkbookRequest,
  WorkbookText,
} from '../../workers/contract/reading.ts';
import type { Result } from '../../workers/contract/result.ts';
import type {
  ComparisonGroup,
  SweepPlan,
  SweepRange,
  SweepRanking,
  SweepReport,
  SweepRequest,
} from '../../workers/contract/selection.ts';
import type { Repair, Series } from '../../workers/contract/series.ts';
import type {
  IntegratedIntervals,
  IntervalsRequest,
  InversionRequest,
  InvertedInterval,
} from '../../workers/contract/uncertainty.ts';
import type { ModellingApi, ReadingApi, WorkbookApi } from '../../workers/contract/workerApis.ts';
import { WorkerHandle } from './workerHandle.ts';
import type { Shape, ShapeRequest } from '../../workers/contract/shape.ts';
import { failureOf, WorkerPool } from './workerPool.ts';

const MOST_WORKERS = 4;

/** The calls the store makes to the core; every answer is a value, expected failures and dead workers alike. */
export interface CoreClient {
  fit(key: string, request: FitRequest): Promise<Result<Fit>>;
  diagnose(key: string, request: DiagnoseRequest): Promise<Result<Judgement>>;
  predict(key: string, request: PredictRequest): Promise<Result<Prediction>>;
  shape(key: string, request: ShapeRequest): Promise<Result<Shape>>;
  compare(key: string, fits: readonly Fit[]): Promise<Result<readonly ComparisonGroup[]>>;
  /** Workers that a sweep can be shared out to. */
  readonly workers: number;
  planSweep(key: string, range: SweepRange, like: Candidate, workers: number): Promise<Result<SweepPlan>>;
  sweep(key: string, request: SweepRequest, report: (news: SweepReport) => void): Promise<Result<null>>;
  rankSweep(key: string, fits: readonly Fit[]): Promise<Result<SweepRanking>>;
  intervals(key: string, request: IntervalsRequest): Promise<Result<IntegratedIntervals>>;
  invert(
    key: string,
    request: InversionRequest,
    progress: (fraction: number) => void,
  ): Promise<Result<InvertedInterval>>;
  inspect(series: Series, notes: readonly ReadingNote[]): Promise<Result<ForensicReport>>;
  repair(
    raw: Series,
    repairs: readonly Repair[],
    columns: Readonly<Record<string, Float64Array>>,
  ): Promise<Result<RepairedRecord>>;
  read(request: ReadRequest, progress: (fraction: number) => void): Promise<ReadAnswer>;
  join(request: JoinRequest): Promise<Result<JoinedFiles>>;
  /** Takes the bytes with it. */
  workbook(request: WorkbookRequest): Promise<Result<WorkbookText>>;
  abort(key: string): void;
  /** Ends whatever is being read, joined or unpacked. */
  abortReading(): void;
  abortAll(): void;
  pending(): number;
}

/** Starts nothing until the first call; workers are made one by one as jobs need them. */
export function createCoreClient(): CoreClient {
  const size = Math.max(1, Math.min(MOST_WORKERS, (navigator.hardwareConcurrency || 2) - 1));
  const modelling = new WorkerPool<ModellingApi>(
    () => new Worker(new URL('../../workers/entry/modelling.worker.ts', import.meta.url), { type: 'module' }),
    size,
  );
  const reading = new WorkerPool<ReadingApi>(
    () => new Worker(new URL('../../workers/entry/reading.worker.ts', import.meta.url), { type: 'module' }),
    1,
  );
  // A worker for each workbook: what unpacking took is given back when it ends.
  let workbook: WorkerHandle<WorkbookApi> | null = null;
  const readWorkbook = async (request: WorkbookRequest): Promise<Result<WorkbookText>> => {
    workbook?.terminate();
    const own = (workbook = new WorkerHandle<WorkbookApi>(
      () => new Worker(new URL('../../workers/entry/workbook.worker.ts', import.meta.url), { type: 'module' }),
    ));
    try {
      return await own.call(async (remote) => await remote.read(Comlink.transfer(request, [request.bytes])));
    } finally {
      own.terminate();
    }
  };
  const abortReading = () => {
    workbook?.terminate();
    reading.abortAll();
  };
  const safe = <T>(work: Promise<Result<T>>): Promise<Result<T>> =>
    work.catch((error: unknown) => ({ ok: false, failure: failureOf(error) }));
  return {
    fit: (key, request) => safe(modelling.run<Result<Fit>>(key, async (remote) => await remote.fit(request))),
    diagnose: (key, request) =>
      safe(modelling.run<Result<Judgement>>(key, async (remote) => await remote.diagnose(request))),
    predict: (key, request) =>
      safe(modelling.run<Result<Prediction>>(key, async (remote) => await remote.predict(request))),
    shape: (key, request) => safe(modelling.run<Result<Shape>>(key, async (remote) => await remote.shape(request))),
    compare: (key, fits) =>
      safe(modelling.run<Result<readonly ComparisonGroup[]>>(key, async (remote) => await remote.compare(fits))),
    workers: size,
    planSweep: (key, range, like, workers) =>
      safe(modelling.run<Result<SweepPlan>>(key, async (remote) => await remote.planSweep(range, like, workers))),
    sweep: (key, request, report) =>
      safe(modelling.run<Result<null>>(key, async (remote) => await remote.sweep(request, Comlink.proxy(report)))),
    rankSweep: (key, fits) =>
      safe(modelling.run<Result<SweepRanking>>(key, async (remote) => await remote.rankSweep(fits))),
    intervals: (key, request) =>
      safe(modelling.run<Result<IntegratedIntervals>>(key, async (remote) => await remote.intervals(request))),
    invert: (key, request, progress) =>
      safe(
        modelling.run<Result<InvertedInterval>>(
          key,
          async (remote) => await remote.invert(request, Comlink.proxy(progress)),
        ),
      ),
    inspect: (series, notes) =>
      safe(modelling.run<Result<ForensicReport>>('inspect', async (remote) => await remote.inspect(series, notes))),
    repair: (raw, repairs, columns) =>
      safe(
        modelling.run<Result<RepairedRecord>>('repair', async (remote) => await remote.repair(raw, repairs, columns)),
      ),
    read: (request, progress) =>
      reading
        .run<ReadAnswer>('read', async (remote) => await remote.read(request, Comlink.proxy(progress)))
        .catch((error: unknown) => ({ sniffed: null, record: null, failure: failureOf(error) })),
    join: (request) => safe(reading.run<Result<JoinedFiles>>('read', async (remote) => await remote.join(request))),
    workbook: (request) => safe(readWorkbook(request)),
    abort: (key) => modelling.abort(key),
    abortReading,
    abortAll: () => {
      modelling.abortAll();
      abortReading();
    },
    pending: () => modelling.pending + reading.pending,
  };
}
