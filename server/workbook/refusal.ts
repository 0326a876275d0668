import type { ProblemSlug } from '#shared/contracts/problems';

export interface WorkbookProblem {
  slug: Extract<ProblemSlug, 'too-large' | 'file-refused'>;
  /** What is wrong and where, as one sentence. */
  detail: string;
  /** What to do about it, as one sentence. */
  fix: string;
}

/** Thrown inside the guard and the decoder, and caught at their edge: a file that cannot be used. */
export class WorkbookRefusal extends Error {
  constructor(readonly problem: WorkbookProblem) {
    super(problem.detail);
    this.name = 'WorkbookRefusal';
  }
}

export function refuse(detail: string, fix: string): never {
  throw new WorkbookRefusal({ slug: 'file-refused', detail, fix });
}

export function refuseTooLarge(detail: string, fix: string): never {
  throw new WorkbookRefusal({ slug: 'too-large', detail, fix });
}
