import { createRequire } from 'node:module';
import { pathToFileURL } from 'node:url';
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import type { DecodeResult } from './decode';
import type { DecodeTask } from './decode-worker';
import { type WorkbookLimits, workbookLimits } from './limits';

export interface WorkbookPool {
  /** Guards and decodes off the main thread. Rejects with an AbortError only when `signal` is aborted. */
  decode(task: PoolTask): Promise<DecodeResult>;
  close(): Promise<void>;
}

export interface PoolTask {
  bytes: Buffer;
  fileName: string;
  signal?: AbortSignal | undefined;
  onProgress?: ((done: number, total: number) => void) | undefined;
}

export interface WorkbookPoolOptions {
  threads?: number;
  timeLimitSeconds?: number;
  memoryLimitMegabytes?: number;
  limits?: WorkbookLimits;
}

/** Warm workers for uploaded files: a bad one costs its own worker, never the server or another person's file. */
export function createWorkbookPool(options: WorkbookPoolOptions = {}): WorkbookPool {
  const { threads = 2, timeLimitSeconds = 60, memoryLimitMegabytes = 400, limits = workbookLimits } = options;
  const pool = new Piscina({
    ...workerEntry(),
    minThreads: 1,
    maxThreads: threads,
    idleTimeout: 600_000,
    resourceLimits: { maxOldGenerationSizeMb: memoryLimitMegabytes },
  });
  return {
    close: () => pool.destroy(),
    async decode({ bytes, fileName, signal, onProgress }) {
      const { port1, port2 } = new MessageChannel();
      port1.on('message', (message: { done: number; total: number }) =>
        onProgress?.(message.done, message.total),
      );
      const timeout = AbortSignal.timeout(timeLimitSeconds * 1000);
      const copy = new Uint8Array(bytes);
      const task: DecodeTask = { bytes: copy, fileName, limits, progress: port2 };
      try {
        return await pool.run(task, {
          transferList: [port2, copy.buffer],
          signal: signal ? AbortSignal.any([signal, timeout]) : timeout,
        });
      } catch (error) {
        if (signal?.aborted) throw error;
        return failedDecode(error, fileName, {
          timedOut: timeout.aborted,
          timeLimitSeconds,
          memoryLimitMegabytes,
        });
      } finally {
        port1.close();
      }
    },
  };
}

/** The one place that knows how the worker is found: bundled beside the server, or as TypeScript in development. */
function workerEntry(): { filename: string; execArgv: string[] } {
  if (!import.meta.url.endsWith('.ts')) {
    return { filename: new URL('./decode-worker.js', import.meta.url).href, execArgv: [] };
  }
  const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
  return { filename: new URL('./decode-worker.ts', import.meta.url).href, execArgv: ['--import', loader] };
}

function failedDecode(
  error: unknown,
  fileName: string,
  {
    timedOut,
    timeLimitSeconds,
    memoryLimitMegabytes,
  }: {
    timedOut: boolean;
    timeLimitSeconds: number;
    memoryLimitMegabytes: number;
  },
): DecodeResult {
  const code = error instanceof Error && 'code' in error ? error.code : null;
  const fix = 'Remove the sheets and rows that the submittal does not need and upload it again.';
  if (timedOut) {
    const detail = `${fileName} could not be read within ${timeLimitSeconds} seconds.`;
    return { ok: false, problem: { slug: 'too-large', detail, fix } };
  }
  if (code === 'ERR_WORKER_OUT_OF_MEMORY') {
    const detail = `${fileName} needs more than the ${memoryLimitMegabytes} MB of memory that one workbook may take.`;
    return { ok: false, problem: { slug: 'too-large', detail, fix } };
  }
  throw error;
}
