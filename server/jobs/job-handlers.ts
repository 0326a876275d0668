import type { Database } from '../db/client';
import type { Deps } from '../deps';
import type { JobRow } from './job-leases';
import { readWorkbookJob } from './read-workbook';

export interface JobContext {
  deps: Deps;
  job: JobRow;
  /** Aborted when the job is cancelled, its lease is lost or the server stops. */
  signal: AbortSignal;
  /** Tells the watchers how far it is, and where a resumed run goes on. Throws once interrupted. */
  report(progress: { text?: string; done?: number; total?: number; resumeFrom?: unknown }): Promise<void>;
  /**
   * Ends the job in the transaction of its result, so that both stand or neither. Throws, and so rolls the
   * result back, where the job is no longer ours.
   */
  complete(tx: Database, progress?: string): Promise<void>;
}

export type JobHandler = (context: JobContext) => Promise<void>;

/** By kind of job. A handler may run again after a crash: it finds its own traces or overwrites them. */
export const jobHandlers: Record<string, JobHandler> = { read: readWorkbookJob };
