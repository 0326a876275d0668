import type { World } from './world';

export type Scalar = number | string | boolean;
export type Fact = { is: 'value'; value: Scalar } | { is: 'missing' } | { is: 'doubtful' };

interface Definition {
  type: 'number' | 'text' | 'boolean' | 'date';
  values?: { value: Scalar; names: string[] }[];
}

const STANDARD: Record<string, Definition> = {
  mixType: { type: 'text' },
  nominalMaximumSize: { type: 'number' },
  designTraffic: { type: 'number' },
  course: {
    type: 'text',
    values: [
      { value: 'surface', names: ['wearing'] },
      { value: 'intermediate', names: ['leveling', 'levelling'] },
      { value: 'binder', names: [] },
      { value: 'base', names: [] },
    ],
  },
  binderGrade: { type: 'text' },
  compactionMethod: { type: 'text' },
  compactionBlows: { type: 'number' },
};

/** What the record says of an attribute, else what the project states; what matches no value is a doubt. */
export function attributeFact(world: World, name: string): Fact {
  const stated = world.record.attributes[name];
  const value = stated === undefined ? world.context.facts[name] : stated.value;
  if (value !== undefined) {
    const matched = matching(definitionOf(world, name), value);
    return matched === null ? { is: 'doubtful' } : { is: 'value', value: matched };
  }
  for (const doubt of world.record.doubts) {
    if (doubt.about.attribute === name) return { is: 'doubtful' };
  }
  return { is: 'missing' };
}

export function sameScalar(left: Scalar, right: Scalar): boolean {
  if (typeof left === 'string' && typeof right === 'string') return plain(left) === plain(right);
  return left === right;
}

export function definitionOf(world: World, name: string): Definition {
  const declared = world.edition.attributes.find((attribute) => attribute.name === name);
  if (declared === undefined) return STANDARD[name] ?? { type: 'text' };
  const values = declared.values?.map((entry) =>
    typeof entry === 'object'
      ? { value: entry.value, names: [entry.label ?? [], entry.aliases ?? []].flat() }
      : { value: entry, names: [] },
  );
  return values === undefined ? { type: declared.type } : { type: declared.type, values };
}

/** The attribute's own value that a written one means, or null. */
export function matching({ type, values }: Definition, stated: Scalar): Scalar | null {
  const value = asType(type, stated);
  if (values === undefined) return value;
  for (const allowed of values) {
    if (value !== null && sameScalar(allowed.value, value)) return allowed.value;
    if (allowed.names.some((name) => plain(name) === plain(String(stated)))) return allowed.value;
  }
  return null;
}

function asType(type: Definition['type'], stated: Scalar): Scalar | null {
  if (type === 'text') return String(stated);
  if (type === 'boolean') return { true: true, false: false }[String(stated)] ?? null;
  if (type === 'date') return /^\d{4}-\d{2}-\d{2}$/.test(String(stated)) ? String(stated) : null;
  if (typeof stated === 'number') return stated;
  return /^-?\d+(\.\d+)?$/.test(String(stated)) ? Number(stated) : null;
}

/** Without case, spaces, hyphens and the words course, layer and mix. */
function plain(text: string): string {
  const kept: string[] = [];
  for (const word of text.toLowerCase().split(/[\s-]+/)) {
    if (!['course', 'layer', 'mix', ''].includes(word)) kept.push(word);
  }
  return kept.length > 0 ? kept.join('') : text.toLowerCase();
}
