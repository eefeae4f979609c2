import type * as Comlink from 'comlink';
import type { Failure } from '../../workers/contract/failures.ts';
import { CallFailed, WorkerHandle, type WorkerLike } from './workerHandle.ts';

interface Job<Api> {
  readonly key: string;
  readonly start: (remote: Comlink.Remote<Api>) => Promise<unknown>;
  readonly resolve: (value: unknown) => void;
  readonly reject: (failure: CallFailed) => void;
  worker: number | null;
}

/** Turns an unexpected rejection into a failure of the contract. */
export function failureOf(error: unknown): Failure {
  if (error instanceof CallFailed) return error.failure;
  return { code: 'internal', message: error instanceof Error ? error.message : String(error) };
}

/**
 * A queue over a few workers of one kind. Jobs have a key; a new job with the key of a waiting or running one takes its
 * place. Abort ends the worker that runs the job and starts another, since a computation cannot be asked to stop.
 */
export class WorkerPool<Api extends { ready(): true }> {
  private readonly workers: (WorkerHandle<Api> | null)[];
  private readonly running: (Job<Api> | null)[];
  private queue: Job<Api>[] = [];

  constructor(
    private readonly make: () => WorkerLike,
    size: number,
  ) {
    this.workers = new Array<WorkerHandle<Api> | null>(size).fill(null);
    this.running = new Array<Job<Api> | null>(size).fill(null);
  }

  /** Runs a job as soon as a worker is free. Rejects with `CallFailed`. */
  run<T>(key: string, start: (remote: Comlink.Remote<Api>) => Promise<T>): Promise<T> {
    this.abort(key);
    return new Promise<T>((resolve, reject) => {
      this.queue.push({ key, start, resolve: (value) => resolve(value as T), reject, worker: null });
      this.next();
    });
  }

  /** Stops the job with this key, waiting or running; others are untouched. */
  abort(key: string): void {
    const waiting = this.queue.filter((job) => job.key === key);
    this.queue = this.queue.filter((job) => job.key !== key);
    for (const job of waiting) job.reject(new CallFailed({ code: 'cancelled' }));
    this.running.forEach((job, index) => {
      if (job?.key !== key) return;
      this.workers[index]?.terminate();
    });
  }

  /** Stops everything. */
  abortAll(): void {
    for (const key of new Set([...this.queue, ...this.running].flatMap((job) => (job === null ? [] : [job.key]))))
      this.abort(key);
  }

  get pending(): number {
    return this.queue.length + this.running.filter((job) => job !== null).length;
  }

  private next(): void {
    for (let index = 0; index < this.running.length; index += 1) {
      if (this.running[index] !== null) continue;
      const job = this.queue.shift();
      if (job === undefined) return;
      this.begin(job, index);
    }
  }

  private begin(job: Job<Api>, index: number): void {
    this.running[index] = job;
    let worker = this.workers[index] ?? null;
    if (worker === null || !worker.alive) worker = this.workers[index] = new WorkerHandle<Api>(this.make);
    const done = () => {
      if (this.running[index] === job) this.running[index] = null;
      this.next();
    };
    worker.call(job.start).then(
      (value) => {
        done();
        job.resolve(value);
      },
      (error: unknown) => {
        done();
        job.reject(error instanceof CallFailed ? error : new CallFailed(failureOf(error)));
      },
    );
  }
}
