import type { MessagePort } from 'node:worker_threads';
import { type DecodeResult, decodeWorkbook } from './decode';
import type { WorkbookLimits } from './limits';

export interface DecodeTask {
  bytes: Uint8Array;
  fileName: string;
  limits: WorkbookLimits;
  progress: MessagePort;
}

/** Entry of the worker: everything that touches an uploaded file's inside happens in here. */
export default async function runDecodeTask(task: DecodeTask): Promise<DecodeResult> {
  const onProgress = (done: number, total: number) => task.progress.postMessage({ done, total });
  try {
    const bytes = Buffer.from(task.bytes.buffer, task.bytes.byteOffset, task.bytes.byteLength);
    return await decodeWorkbook(bytes, task.fileName, { onProgress, limits: task.limits });
  } finally {
    task.progress.close();
  }
}
