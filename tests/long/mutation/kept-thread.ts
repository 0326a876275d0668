import type { PoolOptions, PoolWorker, WorkerRequest } from 'vitest/node';
import { ThreadsPoolWorker } from 'vitest/node';

/** Every task leaves a listener in the thread, so it is renewed before they add up. */
const TASKS_OF_A_THREAD = 100;

let shared: { thread: ThreadsPoolWorker; tasks: number } | undefined;

/**
 * A worker thread that outlives its task. Vitest forgets all modules of ours before each test file and so evaluates
 * them under the mutant; packages stay loaded, which is most of the time that a new thread takes.
 */
export class KeptThread implements PoolWorker {
  readonly name = KEPT_THREAD;
  readonly #options: PoolOptions;
  readonly #listeners: { event: string; callback: (argument: unknown) => void }[] = [];
  #thread: ThreadsPoolWorker | undefined;

  constructor(options: PoolOptions) {
    this.#options = options;
  }

  /** The pool starts one worker at a time, the next one once the task of the last is over, if not yet its stop. */
  async start(): Promise<void> {
    if (shared && shared.tasks >= TASKS_OF_A_THREAD) await endKeptThread();
    shared ??= await newThread(this.#options);
    shared.tasks += 1;
    this.#thread = shared.thread;
  }

  async stop(): Promise<void> {
    for (const { event, callback } of this.#listeners) this.off(event, callback);
  }

  on(event: string, callback: (argument: unknown) => void): void {
    this.#listeners.push({ event, callback });
    this.#thread?.on(event, callback);
  }

  off(event: string, callback: (argument: unknown) => void): void {
    if (this.#thread === shared?.thread) this.#thread?.off(event, callback);
  }

  send(message: WorkerRequest): void {
    if (message.type !== 'stop') this.#thread?.send(message);
    else this.#answer({ __vitest_worker_response__: true, type: 'stopped' });
  }

  deserialize(data: unknown): unknown {
    return data;
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

async function newThread(options: PoolOptions): Promise<{ thread: ThreadsPoolWorker; tasks: number }> {
  const started = { thread: new ThreadsPoolWorker(options), tasks: 0 };
  await started.thread.start();
  // One that a mutant brought down must not be waited for by the next.
  started.thread.on('exit', () => {
    if (shared === started) shared = undefined;
  });
  return started;
}
