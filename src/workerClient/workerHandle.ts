import * as Comlink from 'comlink';
import type { Failure } from '../../workers/contract/failures.ts';

/** What a worker must look like to be owned; a browser Worker does, and so does a stand-in in tests. */
export type WorkerLike = Pick<Worker, 'postMessage' | 'terminate' | 'addEventListener' | 'removeEventListener'> &
  Comlink.Endpoint;

/** A call that ended without an answer: the reason as a value of the contract. */
export class CallFailed extends Error {
  constructor(readonly failure: Failure) {
    super(failure.code);
  }
}

const READY_SECONDS = 20;

/**
 * Owns one worker. Waits for `ready()` with a time limit and rejects every call in flight on error, termination or
 * timeout: a Comlink call to a dead worker would stay pending for ever.
 */
export class WorkerHandle<Api extends { ready(): true }> {
  private readonly worker: WorkerLike;
  private readonly remote: Comlink.Remote<Api>;
  private readonly inFlight = new Set<(failure: Failure) => void>();
  private readonly readiness: Promise<void>;
  private dead: Failure | null = null;

  constructor(make: () => WorkerLike, readySeconds = READY_SECONDS) {
    this.worker = make();
    this.worker.addEventListener('error', this.onError);
    this.worker.addEventListener('messageerror', this.onError);
    this.remote = Comlink.wrap<Api>(this.worker);
    this.readiness = this.guarded(async () => {
      await (this.remote.ready as () => Promise<true>)();
    }, readySeconds);
    // Callers see the failure through `call`; nobody may be listening yet.
    this.readiness.catch(() => undefined);
  }

  get alive(): boolean {
    return this.dead === null;
  }

  /** Calls the worker once it is ready; rejects with `CallFailed` when the worker dies first. */
  async call<T>(use: (remote: Comlink.Remote<Api>) => Promise<T>): Promise<T> {
    await this.readiness;
    return this.guarded(() => use(this.remote));
  }

  /** Ends the worker; every call in flight is rejected with the given reason. */
  terminate(failure: Failure = { code: 'cancelled' }): void {
    this.die(failure);
  }

  private readonly onError = (event: Event): void => {
    const message = 'message' in event && typeof event.message === 'string' ? event.message : event.type;
    this.die({ code: 'workerDied', reason: message });
  };

  private die(failure: Failure): void {
    if (this.dead !== null) return;
    this.dead = failure;
    this.worker.removeEventListener('error', this.onError);
    this.worker.removeEventListener('messageerror', this.onError);
    this.worker.terminate();
    for (const reject of [...this.inFlight]) reject(failure);
    this.inFlight.clear();
  }

  private guarded<T>(run: () => Promise<T>, seconds?: number): Promise<T> {
    return new Promise<T>((resolve, reject) => {
      if (this.dead !== null) {
        reject(new CallFailed(this.dead));
        return;
      }
      const fail = (failure: Failure) => {
        clearTimeout(timer);
        reject(new CallFailed(failure));
      };
      const timer =
        seconds === undefined ? undefined : setTimeout(() => this.die({ code: 'timeout', seconds }), 1000 * seconds);
      this.inFlight.add(fail);
      const settle = (then: () => void) => {
        clearTimeout(timer);
        if (this.inFlight.delete(fail)) then();
      };
      run().then(
        (value) => settle(() => resolve(value)),
        (error: unknown) => settle(() => reject(error instanceof Error ? error : new Error(String(error)))),
      );
    });
  }
}
