import { mixRecordSchema } from '#rules/record';
import { layerSchema, ruleSetSchema } from '#rules/rule-sets/schema';
import { disagreementsWith } from './agreement';
import type { GeneratedCase } from './generated/parts';
import { verdictsOf } from './own/verdicts';
import { type Verdict, type World, worldOf } from './own/world';

/** A case with what the second evaluator says of it; it is asked once, when the case is first looked at. */
export class Expected {
  private kept: Verdict[] | null = null;

  constructor(readonly drawn: GeneratedCase) {}

  get verdicts(): Verdict[] {
    this.kept ??= verdictsOf(drawnWorld(this.drawn));
    return this.kept;
  }

  get disagreements(): string[] {
    return disagreementsWith(this.drawn, this.verdicts);
  }
}

function drawnWorld({ base, layers, record, context }: GeneratedCase): World {
  const parsed = layers.map((layer) => layerSchema.parse(layer));
  return worldOf(mixRecordSchema.parse(record), ruleSetSchema.parse(base), parsed, context);
}
