import { Decimal } from 'decimal.js';
import { sieveFromName } from '../quantities/sieves';
import { convert, normaliseUnit } from '../quantities/units';
import type { AttributeDefinition, Scalar } from '../rule-sets/attribute';
import { attributeLabel } from '../rule-sets/attribute';
import { matchValue } from '../rule-sets/match-value';
import type { Cell } from './cell-grid';
import { understandDate } from './parse-date';
import { parseNumberText } from './parse-number';
import { plainText, saysNoValue } from './plain-text';
import { certain, doubtOf, type Understood } from './settled';

/** A cell as a value of an attribute: in its unit, and one of the edition's own values where it has a list. */
export function understandAttribute(
  attribute: AttributeDefinition,
  cell: Cell | null,
  statedUnit: string | null,
  date1904: boolean,
): Understood<Scalar> {
  if (!cell || plainText(cell.text) === '') return { state: 'blank' };
  const label = attributeLabel(attribute).toLowerCase();
  if (cell.kind === 'error') return doubtOf(`shows ${cell.text}, an error, where ${label} belongs`);
  if (cell.kind === 'formula-without-result') {
    return doubtOf('holds a formula whose result was not saved; recalculate and save the workbook');
  }
  if (attribute.type === 'date') return understandDate(cell, date1904);
  if (saysNoValue(cell.text)) return { state: 'none' };
  const stated: Scalar = cell.kind === 'number' ? Number(cell.value) : plainText(cell.text);
  const value = attributeFromScalar(
    attribute,
    cell.kind === 'boolean' ? cell.value === 'true' : stated,
    statedUnit,
  );
  if (value !== null) return certain(value);
  return doubtOf(`says "${cell.text}", which is no ${label} that the rules know`, allowedValues(attribute));
}

/** A stated value in the attribute's unit and words, or null where it is none of its values. */
export function attributeFromScalar(
  attribute: AttributeDefinition,
  stated: Scalar,
  statedUnit: string | null,
): Scalar | null {
  if (attribute.type !== 'number')
    return matchValue(attribute, typeof stated === 'string' ? plainText(stated) : stated);
  const named = matchValue(attribute, stated);
  const needsUnit = statedUnit !== null && normaliseUnit(statedUnit) !== normaliseUnit(attribute.unit ?? '1');
  if (named !== null && !needsUnit && !isCount(attribute, named)) return named;
  const number = numberOf(attribute, stated, statedUnit);
  return number === null ? null : matchValue(attribute, number);
}

function numberOf(attribute: AttributeDefinition, stated: Scalar, statedUnit: string | null): number | null {
  if (attribute.unit === 'mm' && typeof stated === 'string') {
    const opening = sieveFromName(stated);
    if (opening !== null) return opening;
  }
  const parsed = typeof stated === 'number' ? null : parseNumberText(String(stated), '.');
  if (parsed !== null && (parsed.state !== 'number' || parsed.number.qualifier)) {
    return groupedCount(attribute, parsed);
  }
  const value = parsed === null ? Number(stated) : Number(parsed.number.digits);
  const rest = parsed === null || parsed.number.rest === '' ? statedUnit : parsed.number.rest;
  if (
    isCount(attribute, value) &&
    (rest === null || normaliseUnit(rest) === normaliseUnit(attribute.unit ?? ''))
  ) {
    return new Decimal(value).div(1_000_000).toNumber();
  }
  if (rest === null || attribute.unit === undefined) return rest === null ? value : null;
  const converted = convert(value, rest, attribute.unit);
  return converted.ok ? converted.value : null;
}

/** `12,000,000`: a comma that can only group thousands. */
function groupedCount(
  attribute: AttributeDefinition,
  parsed: ReturnType<typeof parseNumberText>,
): number | null {
  if (parsed.state !== 'ambiguous' || parsed.reason === 'range') return null;
  const large = parsed.numbers
    .map((number) => Number(number.digits))
    .find((value) => isCount(attribute, value));
  return large === undefined ? null : new Decimal(large).div(1_000_000).toNumber();
}

/** Nobody designs for ten thousand million axle loads: so large a figure counts axle loads singly. */
function isCount(attribute: AttributeDefinition, value: Scalar): boolean {
  return normaliseUnit(attribute.unit ?? '') === 'million' && typeof value === 'number' && value >= 10_000;
}

function allowedValues(attribute: AttributeDefinition) {
  return (attribute.values ?? []).slice(0, 12).map((entry) => {
    const value = typeof entry === 'object' ? entry.value : entry;
    const label = typeof entry === 'object' ? (entry.label ?? String(entry.value)) : String(entry);
    return { answer: String(value), label: attribute.unit ? `${label} ${attribute.unit}` : label, value };
  });
}
