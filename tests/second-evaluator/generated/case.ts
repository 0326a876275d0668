import type { LayerInput, RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { DECLARED, drawAttributes, drawCompared, drawWhen } from './attributes';
import { blendGradationPart, blendPart } from './blend-part';
import { creepPart } from './creep-part';
import type { Draw } from './draw';
import { formulaPart } from './formula-part';
import { gradationPart } from './gradation-part';
import { attributePart, differencePart, documentPart, recomputedPart } from './other-parts';
import { emptyPart, type GeneratedCase, type Part, type TableInput } from './parts';
import { CANDIDATES, PASSING } from './quantities';
import { readingPart } from './reading-part';
import { trialsPart } from './trials-part';

const HEAD = {
  format: 'clauseway/rule-set@1' as const,
  agency: 'Carrow Valley Roads Authority',
  effective: { from: null, to: null },
};

/** A record and a rule set, with or without layers, in which each kind of measure comes up alike. */
export function drawCase(draw: Draw): GeneratedCase {
  const stated = drawAttributes(draw);
  const compared = drawCompared(draw);
  const parts = drawParts(draw);
  const rules = parts.flatMap((part) => part.rules);
  for (const rule of rules) if (draw.chance(45)) rule.when = drawWhen(draw, stated.meant);
  const tables = parts.flatMap((part) => part.tables);
  const { base, layers } = draw.chance(25) ? layered(draw, rules, tables) : plain(rules, tables);
  const designPoint = parts.find((part) => part.designPoint !== undefined)?.designPoint;
  return {
    base: designPoint === undefined ? base : { ...base, designPoint },
    layers,
    record: {
      attributes: stated.attributes,
      readings: [...compared.readings, ...parts.flatMap((part) => part.readings)],
      documents: parts.flatMap((part) => part.documents),
      doubts: [...stated.doubts, ...compared.doubts, ...parts.flatMap((part) => part.doubts)],
    },
    context: {
      submittedOn: draw.chance(8) ? null : '2026-03-09',
      lettingOn: draw.chance(12) ? null : '2026-02-28',
      facts: stated.facts,
    },
  };
}

/** Some rules of different quantities, so that no rule's readings are in another's way. */
function drawParts(draw: Draw): Part[] {
  const first = draw.whole(0, CANDIDATES.length - 1);
  const candidate = (i: number) => CANDIDATES[(first + i * 7) % CANDIDATES.length]!;
  const parts: Part[] = [];
  let usesGravity = false;
  const count = draw.whole(2, 5);
  for (let i = 0; i < count; i += 1) {
    const id = `rule-${i}`;
    const kind = draw.weighed([
      [34, 'reading'],
      [9, 'sieve'],
      [9, 'gradation'],
      [12, 'attribute'],
      [12, 'document'],
      [12, 'difference'],
      [5, 'recomputed'],
      [12, 'formula'],
      [7, 'creep'],
      [18, 'trials'],
      [6, 'blend'],
      [4, 'blend gradation'],
    ] as const);
    // Gradations, formulas and gravities are shared by several kinds: one of them a case is enough.
    const isAlone = [
      'sieve',
      'gradation',
      'formula',
      'recomputed',
      'creep',
      'trials',
      'blend gradation',
    ].includes(kind);
    if (isAlone && usesGravity) continue;
    usesGravity ||= isAlone;
    parts.push(partOf(draw, id, kind, candidate(i)));
  }
  return withoutClashes(parts);
}

function partOf(draw: Draw, id: string, kind: string, candidate: (typeof CANDIDATES)[number]): Part {
  switch (kind) {
    case 'reading':
      return readingPart(draw, id, candidate);
    case 'sieve':
      return sievePart(draw, id);
    case 'gradation':
      return gradationPart(draw, id);
    case 'attribute':
      return attributePart(draw, id);
    case 'document':
      return documentPart(draw, id, draw.oneOf(['binder-certificate', 'mix-design-report']));
    case 'difference':
      return differencePart(draw, id, candidate);
    case 'recomputed':
      return recomputedPart(draw, id);
    case 'formula':
      return formulaPart(draw, id);
    case 'trials':
      return trialsPart(draw, id);
    case 'blend':
      return blendPart(draw, id);
    case 'blend gradation':
      return blendGradationPart(draw, id);
    default:
      return creepPart(draw, id);
  }
}

/** A rule on percent passing that names one sieve, or none and so each that there is. */
function sievePart(draw: Draw, id: string): Part {
  const part = readingPart(draw, id, PASSING);
  const sieves = draw.oneOf([[4.75], [4.75, 0.6], [0.6]]);
  const readings = part.readings.flatMap((reading) =>
    reading.quantity === PASSING.id && reading.at?.sieve === undefined
      ? sieves.map((sieve) => ({ ...reading, at: { ...reading.at, sieve } }))
      : [reading],
  );
  const doubts = part.doubts.filter(({ about }) => about?.quantity !== PASSING.id);
  const rules = part.rules.map((rule) => {
    if (rule.measure.kind !== 'reading' || !draw.chance(50)) return rule;
    return { ...rule, measure: { ...rule.measure, at: { ...rule.measure.at, sieve: 4.75 } } };
  });
  return { ...part, rules, readings, doubts };
}

/** The later of two parts that read the same quantity gives way. */
function withoutClashes(parts: Part[]): Part[] {
  const taken = new Set<string>();
  const kept: Part[] = [];
  for (const part of parts) {
    const own = new Set(part.readings.map(({ quantity }) => quantity));
    if ([...own].some((quantity) => taken.has(quantity))) continue;
    for (const quantity of own) taken.add(quantity);
    for (const { about } of part.doubts) if (about?.quantity !== undefined) taken.add(about.quantity);
    kept.push(part);
  }
  return kept.length > 0 ? kept : [emptyPart()];
}

function plain(rules: RuleInput[], tables: TableInput[]): { base: RuleSetInput; layers: LayerInput[] } {
  return {
    base: {
      ...HEAD,
      id: 'drawn',
      title: 'Drawn',
      edition: '1',
      layerOf: null,
      attributes: DECLARED,
      tables,
      rules,
    },
    layers: [],
  };
}

/** The same by way of layers: rules added, replaced, removed, and rows patched to what they should be. */
function layered(
  draw: Draw,
  rules: RuleInput[],
  tables: TableInput[],
): { base: RuleSetInput; layers: LayerInput[] } {
  const first = emptyLayer('first');
  const second = emptyLayer('second');
  const ofBase: RuleInput[] = [];
  for (const rule of rules) {
    const how = draw.oneOf(['kept', 'added', 'replaced', 'replaced twice', 'removed', 'put back'] as const);
    const other: RuleInput = { ...rule, severity: 'advisory', limit: otherLimit(rule) };
    if (how === 'kept') ofBase.push(rule);
    if (how === 'added') first.add.rules.push(rule);
    if (how.startsWith('replaced')) ofBase.push(other);
    if (how === 'replaced') draw.oneOf([first, second]).replace.rules.push(rule);
    if (how === 'replaced twice') {
      first.replace.rules.push(other);
      second.replace.rules.push(rule);
    }
    if (how === 'removed' || how === 'put back') {
      ofBase.push(other);
      first.remove.rules.push(rule.id);
    }
    if (how === 'put back') second.add.rules.push(rule);
  }
  const patched = tables.map((table) => patchedLater(draw, table, draw.oneOf([first, second])));
  const base = plain(ofBase, patched).base;
  return { base, layers: [first, second] };
}

function otherLimit(rule: RuleInput): RuleInput['limit'] {
  if (rule.limit.present || rule.limit.oneOf !== undefined) return rule.limit;
  return { min: '0', max: '9999' };
}

type FullLayer = LayerInput & {
  add: { rules: RuleInput[] };
  replace: { rules: RuleInput[] };
  remove: { rules: string[] };
  patchRows: NonNullable<LayerInput['patchRows']>;
};

function emptyLayer(id: string): FullLayer {
  return {
    ...HEAD,
    id,
    title: id,
    edition: '1',
    layerOf: { id: 'drawn', edition: '1' },
    add: { rules: [] },
    replace: { rules: [] },
    remove: { rules: [] },
    patchRows: [],
  };
}

/** One row that the base has otherwise, and a layer patches. */
function patchedLater(draw: Draw, table: TableInput, layer: FullLayer): TableInput {
  const place = draw.whole(0, Math.max(0, table.rows.length - 1));
  const row = table.rows[place];
  const column = table.columns.at(-1)!.name;
  if (row === undefined || !draw.chance(50)) return table;
  const key = Object.fromEntries(table.keys.map((name) => [name, row[name]!]));
  layer.patchRows.push({ table: table.id, key, set: { [column]: row[column]! } });
  const before = { ...row, [column]: column === 'allowed' ? 'nothing' : '9999' };
  return { ...table, rows: table.rows.map((each, i) => (i === place ? before : each)) };
}
