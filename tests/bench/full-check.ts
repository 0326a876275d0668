import { Engine } from 'json-rules-engine';
import { evaluate } from '#rules/engine/evaluate';
import type { MixRecord } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { inTurn, told } from './measure';

const context = { submittedOn: '2026-03-09', lettingOn: '2026-01-14', facts: {} };

/** A full check with evidence and seal against a bare run of as many conditions, 120 of them on 600 readings. */
export async function benchFullCheck(record: MixRecord, edition: ResolvedEdition): Promise<string> {
  const wide = withRules(edition, 120);
  const long = withReadings(record, 600);
  const engine = new Engine([], { allowUndefinedFacts: true });
  const values = new Map<string, number>();
  for (const [index, rule] of wide.rules.entries()) {
    const fact = `value-${index}`;
    values.set(fact, 10 + index);
    engine.addFact(fact, () => values.get(fact) ?? 0, { cache: false });
    engine.addRule({
      name: rule.id,
      conditions: {
        all: [
          { fact, operator: 'greaterThanInclusive', value: 5 },
          { fact, operator: 'lessThanInclusive', value: 500 },
        ],
      },
      event: { type: 'pass' },
    });
  }
  const { first, second, ratio } = await inTurn(
    40,
    () => evaluate(long, wide, context),
    () => engine.run(),
  );
  return `full check, ${wide.rules.length} rules on ${long.readings.length} readings: ${told(first)}; bare run of the conditions: ${told(second)}; ratio ${ratio.toFixed(1)}, target at most 3`;
}

function withRules(edition: ResolvedEdition, count: number): ResolvedEdition {
  const rules = [...edition.rules];
  for (let copy = 0; rules.length < count; copy += 1) {
    const rule = edition.rules[copy % edition.rules.length];
    if (rule === undefined) break;
    rules.push({ ...rule, id: `${rule.id}-${copy}` });
  }
  return { ...edition, rules };
}

/** Creep strains fill the record up: no rule of the edition reads them. */
function withReadings(record: MixRecord, count: number): MixRecord {
  const readings = [...record.readings];
  for (let time = 1; readings.length < count; time += 1) {
    readings.push({
      quantity: 'creep-strain',
      value: 20 + time / 10,
      unit: 'µε',
      at: { temperature: -10, time, stress: 400, specimen: '1' },
      origin: 'measured',
      source: null,
    });
  }
  return { ...record, readings };
}
