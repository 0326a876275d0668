import type { PoolOptions, PoolWorker, WorkerRequest } from 'vitest/node';
import { ThreadsPoolWorker } from 'vitest/node';

/** Every run leaves a listener in the thread, so it is renewed before they add up. */
const RUNS_OF_A_THREAD = 100;

let shared: { thread: ThreadsPoolWorker; runs: number } | undefined;

/**
 * A worker thread that outlives its task. Vitest forgets all modules of ours before each test file and so evaluates
 * them under the mutant; packages stay loaded, which is most of the time that a new thread takes.
 */
export class KeptThread implements PoolWorker {
  readonly name = KEPT_THREAD;
  readonly #options: PoolOptions;
  readonly #listeners: { event: string; callback: (argument: unknown) => void }[] = [];

  constructor(options: PoolOptions) {
    this.#options = options;
  }

  on(event: string, callback: (argument: unknown) => void): void {
    this.#listeners.push({ event, callback });
    running().thread.on(event, callback);
  }

  off(event: string, callback: (argument: unknown) => void): void {
    shared?.thread.off(event, callback);
  }

  send(message: WorkerRequest): void {
    if (message.type !== 'stop') running().thread.send(message);
    else this.#answer({ __vitest_worker_response__: true, type: 'stopped' });
  }

  deserialize(data: unknown): unknown {
    return data;
  }

  async start(): Promise<void> {
    if (shared) return;
    shared = { thread: new ThreadsPoolWorker(this.#options), runs: 0 };
    await shared.thread.start();
  }

  async stop(): Promise<void> {
    for (const { event, callback } of this.#listeners) shared?.thread.off(event, callback);
    if (shared && ++shared.runs >= RUNS_OF_A_THREAD) await endKeptThread();
  }

  /** A thread that is told to stop hears nothing afterwards, so the pool gets its answer from here. */
  #answer(response: unknown): void {
    queueMicrotask(() => {
      for (const { event, callback } of this.#listeners) if (event === 'message') callback(response);
    });
  }
}

export const KEPT_THREAD = 'kept-thread';

export async function endKeptThread(): Promise<void> {
  const ended = shared;
  shared = undefined;
  await ended?.thread.stop();
}

function running(): { thread: ThreadsPoolWorker } {
  if (!shared) throw new Error('The kept thread is not started.');
  return shared;
}
