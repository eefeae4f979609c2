import { expose } from 'comlink';
import { MessageChannel } from 'node:worker_threads';
import { describe, expect, test } from 'vitest';
import { CallFailed, WorkerHandle, type WorkerLike } from '../../../src/workerClient/workerHandle.ts';
import { failureOf, WorkerPool } from '../../../src/workerClient/workerPool.ts';

interface Api {
  ready(): true;
  double(x: number): number;
  never(): Promise<number>;
  throws(): number;
}

/** A worker without a thread: Comlink over a message channel, with the events a browser worker has. */
class StandIn {
  static made = 0;
  ended = false;
  private readonly listeners = new Map<string, Set<(event: Event) => void>>();
  private readonly port: MessagePort;
  private readonly other: MessagePort;

  constructor(answersReady = true) {
    StandIn.made += 1;
    const channel = new MessageChannel();
    this.port = channel.port1 as unknown as MessagePort;
    this.other = channel.port2 as unknown as MessagePort;
    const api: Api = {
      ready: () => true,
      double: (x) => 2 * x,
      never: () => new Promise(() => undefined),
      throws: () => {
        throw new Error('a bug');
      },
    };
    if (answersReady) expose(api, this.other);
  }

  postMessage(message: unknown, transfer: Transferable[] = []): void {
    this.port.postMessage(message, transfer);
  }

  addEventListener(type: string, listener: (event: Event) => void): void {
    if (type === 'message') this.port.addEventListener('message', listener);
    else (this.listeners.get(type) ?? this.listeners.set(type, new Set()).get(type)!).add(listener);
    if (type === 'message') this.port.start();
  }

  removeEventListener(type: string, listener: (event: Event) => void): void {
    if (type === 'message') this.port.removeEventListener('message', listener);
    else this.listeners.get(type)?.delete(listener);
  }

  fail(message: string): void {
    const event = Object.assign(new Event('error'), { message });
    for (const listener of this.listeners.get('error') ?? []) listener(event);
  }

  terminate(): void {
    this.ended = true;
    this.port.close();
    this.other.close();
  }
}

const asWorker = (standIn: StandIn) => standIn as unknown as WorkerLike;
const failure = async (call: Promise<unknown>) => {
  try {
    await call;
  } catch (error) {
    return failureOf(error);
  }
  throw new Error('the call was answered');
};

describe('one worker', () => {
  test('answers after the handshake', async () => {
    const handle = new WorkerHandle<Api>(() => asWorker(new StandIn()));
    expect(await handle.call(async (remote) => await remote.double(21))).toBe(42);
    handle.terminate();
  });

  test('an error event rejects every call in flight, and those that come later', async () => {
    const standIn = new StandIn();
    const handle = new WorkerHandle<Api>(() => asWorker(standIn));
    await handle.call(async (remote) => await remote.double(1));
    const pending = failure(handle.call(async (remote) => await remote.never()));
    await new Promise((resolve) => setTimeout(resolve, 5));
    standIn.fail('out of memory');
    expect(await pending).toEqual({ code: 'workerDied', reason: 'out of memory' });
    expect(await failure(handle.call(async (remote) => await remote.double(1)))).toEqual({
      code: 'workerDied',
      reason: 'out of memory',
    });
    expect(standIn.ended).toBe(true);
  });

  test('a worker that never gets ready is a timeout', async () => {
    const handle = new WorkerHandle<Api>(() => asWorker(new StandIn(false)), 0.05);
    expect(await failure(handle.call(async (remote) => await remote.double(1)))).toEqual({
      code: 'timeout',
      seconds: 0.05,
    });
  });

  test('a bug in the worker is an internal failure', async () => {
    const handle = new WorkerHandle<Api>(() => asWorker(new StandIn()));
    expect(await failure(handle.call(async (remote) => await remote.throws()))).toEqual({
      code: 'internal',
      message: 'a bug',
    });
    handle.terminate();
  });
});

describe('the pool', () => {
  test('more jobs than workers are all answered, by no more workers than its size', async () => {
    StandIn.made = 0;
    const pool = new WorkerPool<Api>(() => asWorker(new StandIn()), 2);
    const answers = await Promise.all(
      Array.from({ length: 9 }, (_, i) => pool.run(`job${i}`, async (remote) => await remote.double(i))),
    );
    expect(answers).toEqual([0, 2, 4, 6, 8, 10, 12, 14, 16]);
    expect(StandIn.made).toBe(2);
    expect(pool.pending).toBe(0);
  });

  test('abort ends a running job, respawns its worker, and leaves the others alone', async () => {
    StandIn.made = 0;
    const pool = new WorkerPool<Api>(() => asWorker(new StandIn()), 1);
    const stuck = failure(pool.run('stuck', async (remote) => await remote.never()));
    const waiting = pool.run('waiting', async (remote) => await remote.double(4));
    await new Promise((resolve) => setTimeout(resolve, 5));
    pool.abort('stuck');
    expect(await stuck).toEqual({ code: 'cancelled' });
    expect(await waiting).toBe(8);
    expect(StandIn.made).toBe(2);
  });

  test('a second job of the same key takes the place of the first', async () => {
    const pool = new WorkerPool<Api>(() => asWorker(new StandIn()), 1);
    const first = failure(pool.run('row', async (remote) => await remote.never()));
    const second = pool.run('row', async (remote) => await remote.double(5));
    expect(await first).toEqual({ code: 'cancelled' });
    expect(await second).toBe(10);
  });

  test('cancelling everything leaves nothing pending', async () => {
    const pool = new WorkerPool<Api>(() => asWorker(new StandIn()), 2);
    const all = ['a', 'b', 'c'].map((key) => failure(pool.run(key, async (remote) => await remote.never())));
    pool.abortAll();
    expect(await Promise.all(all)).toEqual(Array.from({ length: 3 }, () => ({ code: 'cancelled' })));
    expect(pool.pending).toBe(0);
    expect(new CallFailed({ code: 'cancelled' }).message).toBe('cancelled');
  });
});
