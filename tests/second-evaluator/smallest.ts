import type { GeneratedCase } from './generated/parts';

/** The least of a case that still shows what it shows: without any rule, reading, doubt or row that does not matter. */
export function smallest(found: GeneratedCase, shows: (smaller: GeneratedCase) => boolean): GeneratedCase {
  let current = found;
  for (let hasShrunk = true; hasShrunk; ) {
    hasShrunk = false;
    for (const smaller of smallerThan(current)) {
      if (!stillShows(smaller, shows)) continue;
      current = smaller;
      hasShrunk = true;
      break;
    }
  }
  return current;
}

/** A case that no longer fits together shows nothing. */
function stillShows(smaller: GeneratedCase, shows: (smaller: GeneratedCase) => boolean): boolean {
  try {
    return shows(smaller);
  } catch {
    return false;
  }
}

function* smallerThan(found: GeneratedCase): Generator<GeneratedCase> {
  const { base, layers, record } = found;
  if (layers.length > 0) yield { ...found, layers: layers.slice(0, -1) };
  for (const rules of without(base.rules)) yield { ...found, base: { ...base, rules } };
  for (const tables of without(base.tables ?? [])) yield { ...found, base: { ...base, tables } };
  for (const readings of without(record.readings ?? [])) yield { ...found, record: { ...record, readings } };
  for (const doubts of without(record.doubts ?? [])) yield { ...found, record: { ...record, doubts } };
  for (const documents of without(record.documents ?? []))
    yield { ...found, record: { ...record, documents } };
  for (const name of Object.keys(record.attributes ?? {})) {
    const { [name]: _left, ...attributes } = record.attributes ?? {};
    yield { ...found, record: { ...record, attributes } };
  }
  for (const [i, rule] of base.rules.entries()) {
    for (const field of ['when', 'precision', 'rounding'] as const) {
      if (rule[field] === undefined) continue;
      const rules = base.rules.map((each, place) => (place === i ? { ...rule, [field]: undefined } : each));
      yield { ...found, base: { ...base, rules } };
    }
  }
}

function* without<T>(list: readonly T[]): Generator<T[]> {
  for (const i of list.keys()) yield list.filter((_, place) => place !== i);
}
