import { evaluate } from '#rules/engine/evaluate';
import type { CheckContext, MixRecord } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { bareRun } from './bare-run';
import { inTurn, told, WARM_UPS } from './measure';

const context: CheckContext = { submittedOn: '2026-03-09', lettingOn: '2026-01-14', facts: {} };
const RUNS = 40;
const RULES = 120;
const READINGS = 600;

/** A full check with evidence and seal against a bare run of the same conditions, 120 rules on 600 readings. */
export async function benchFullCheck(record: MixRecord, edition: ResolvedEdition): Promise<string> {
  const wide = withRules(edition, RULES);
  const long = withReadings(record, READINGS);
  const { first, second, ratio } = await inTurn(
    RUNS,
    freshCheck(long, wide, RUNS),
    bareRun(long, wide, context),
  );
  return `full check, ${wide.rules.length} rules on ${long.readings.length} readings: ${told(first)}; bare run of the same conditions: ${told(second)}; ratio ${ratio.toFixed(1)}, target at most 3`;
}

/** What a check costs with 10 and 100 times the readings, and with 10 and 100 times the rules. */
export async function benchGrowth(record: MixRecord, edition: ResolvedEdition): Promise<string> {
  const rows: string[] = [];
  for (const what of ['readings', 'rules'] as const) {
    const costs: number[] = [];
    for (const times of [1, 10, 100]) {
      const wide = withRules(edition, what === 'rules' ? RULES * times : RULES);
      const long = withReadings(record, what === 'readings' ? READINGS * times : READINGS);
      const runs = times === 100 ? 3 : 10;
      const { first } = await inTurn(runs, freshCheck(long, wide, runs), () => undefined);
      costs.push(first.medianMs);
    }
    const [one = 0, ten = 0, hundred = 0] = costs;
    rows.push(
      `full check with 1, 10, 100 times the ${what}: ${costs.map((cost) => `${cost.toFixed(1)} ms`).join(', ')}; ` +
        `from 10 to 100 times the cost grows ${(hundred / ten).toFixed(1)} times, from 1 to 10 times ${(ten / one).toFixed(1)} (10 is linear)`,
    );
  }
  return rows.join('\n');
}

/**
 * Every check is of a record that the engine has not met: nothing kept from the run before can help. The copies
 * are made before anything is measured.
 */
function freshCheck(record: MixRecord, edition: ResolvedEdition, runs: number): () => unknown {
  const records = Array.from({ length: runs + WARM_UPS }, () => structuredClone(record));
  return () => {
    const fresh = records.pop();
    if (fresh === undefined) throw new Error('More checks are run than records were made.');
    return evaluate(fresh, edition, context);
  };
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

/** Moduli at many temperatures and frequencies fill the record up: no rule of the edition reads them. */
function withReadings(record: MixRecord, count: number): MixRecord {
  const readings = [...record.readings];
  for (let place = 0; readings.length < count; place += 1) {
    const at = {
      trial: 'design',
      temperature: 4 + 16 * (place % 3),
      specimen: `${(Math.floor(place / 3) % 3) + 1}`,
      frequency: 1 + Math.floor(place / 9),
    };
    const value = 5000 + place;
    readings.push({ quantity: 'dynamic-modulus', value, unit: 'MPa', at, origin: 'measured', source: null });
  }
  return { ...record, readings };
}
