import { mixRecordSchema } from '#rules/record';
import { layerSchema, ruleSetSchema } from '#rules/rule-sets/schema';
import { disagreementsWith } from './agreement';
import type { GeneratedCase } from './generated/parts';
import { verdictsOf } from './own/verdicts';
import { type Verdict, worldOf } from './own/world';

/** A case with what the second evaluator says of it, so that it is asked once. */
export interface Expected {
  drawn: GeneratedCase;
  verdicts: Verdict[];
}

export function expectedOf(drawn: GeneratedCase): Expected {
  const layers = drawn.layers.map((layer) => layerSchema.parse(layer));
  const record = mixRecordSchema.parse(drawn.record);
  const world = worldOf(record, ruleSetSchema.parse(drawn.base), layers, drawn.context);
  return { drawn, verdicts: verdictsOf(world) };
}

export function isFoundOut({ drawn, verdicts }: Expected): boolean {
  return disagreementsWith(drawn, verdicts).length > 0;
}
