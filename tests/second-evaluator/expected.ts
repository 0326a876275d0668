import { disagreementsWith, expectedOf } from './agreement';
import type { GeneratedCase } from './generated/parts';
import type { Verdict } from './own/world';

/** A case with what the second evaluator says of it; it is asked once, when the case is first looked at. */
export class Expected {
  private kept: Verdict[] | null = null;

  constructor(readonly drawn: GeneratedCase) {}

  get disagreements(): string[] {
    this.kept ??= expectedOf(this.drawn);
    return disagreementsWith(this.drawn, this.kept);
  }
}
