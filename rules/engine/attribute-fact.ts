import { convert } from '../quantities/units';
import type { AttributeValue } from '../record';
import type { Scalar } from '../rule-sets/attribute';
import { matchValue, sameValue } from '../rule-sets/match-value';
import { allowedLabel } from '../rule-sets/when-words';
import { numberWords, uncapitalised, withUnit } from '../rule-sets/words';
import type { Fact } from './decide';
import { answerWords } from './doubts';
import type { Evidence } from './finding';
import type { World } from './world';

/** An attribute of the mix: the record's, else what the project states; a doubt is never a value. */
export function attributeFact(world: World, name: string): Fact {
  const kept = world.facts.get(name);
  if (kept) return kept;
  const fact = resolveAttribute(world, name);
  world.facts.set(name, fact);
  return fact;
}

function resolveAttribute(world: World, name: string): Fact {
  const attribute = world.view.attribute(name);
  const label = uncapitalised(world.view.attributeLabel(name));
  if (attribute === undefined) return { kind: 'missing', reason: `${label} is not known to this edition` };
  const stated = statedValue(world, name);
  if (stated === null) {
    const doubt = world.record.doubts.find((each) => isAbout(each, name));
    if (!doubt) return { kind: 'missing', reason: `${label} is missing`, wouldDecide: `State the ${label}.` };
    return {
      kind: 'doubtful',
      reason: `${label} is in doubt${placeWords(doubt)}: ${doubt.reason.replace(/\.$/, '')}`,
      wouldDecide: answerWords(doubt),
    };
  }
  const inUnit = typeof stated.value === 'number' ? inAttributeUnit(stated, attribute.unit) : stated.value;
  const value = inUnit === null ? null : matchValue(attribute, inUnit);
  if (value === null) {
    return {
      kind: 'doubtful',
      reason: `${label} is stated as ${stated.value}, which is not one of the values that the edition knows`,
      wouldDecide: `State the ${label} as one of the values that the edition knows.`,
    };
  }
  return { kind: 'value', value };
}

/** How a value of an attribute is written in sentences. */
export function attributeText(world: World, name: string, value: Scalar): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return allowedLabel(name, value, world.view);
  return withUnit(numberWords(value), world.view.attribute(name)?.unit ?? '');
}

export function attributeEvidence(world: World, name: string): Evidence[] {
  const stated = statedValue(world, name);
  if (stated === null) return [];
  return [
    {
      quantity: name,
      value: typeof stated.value === 'number' ? stated.value : null,
      ...(typeof stated.value === 'number' ? {} : { text: String(stated.value) }),
      unit: stated.unit ?? world.view.attribute(name)?.unit ?? '',
      origin: stated.origin,
      source: stated.source,
    },
  ];
}

function statedValue(world: World, name: string): AttributeValue | null {
  const own = Object.hasOwn(world.record.attributes, name) ? world.record.attributes[name] : undefined;
  if (own) return own;
  const fact = Object.hasOwn(world.context.facts, name) ? world.context.facts[name] : undefined;
  return fact === undefined ? null : { value: fact, origin: 'reported', source: null };
}

function inAttributeUnit(stated: AttributeValue, unit: string | undefined): number | null {
  if (typeof stated.value !== 'number') return null;
  if (stated.unit === undefined || unit === undefined || sameValue(stated.unit, unit)) return stated.value;
  const converted = convert(stated.value, stated.unit, unit);
  return converted.ok ? converted.value : null;
}

function isAbout(doubt: World['record']['doubts'][number], name: string): boolean {
  return doubt.about.attribute === name || doubt.alternatives.some((each) => each.attribute?.name === name);
}

function placeWords({ sheet, cell }: { sheet: string; cell: string }): string {
  return ` (${sheet === '' ? '' : `${sheet} `}${cell})`;
}
