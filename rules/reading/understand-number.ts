import { Decimal } from 'decimal.js';
import type { Quantity } from '../quantities/quantity';
import { convert, normaliseUnit } from '../quantities/units';
import type { Cell } from './cell-grid';
import { type ParsedNumber, parseNumberText } from './parse-number';
import { plainText, saysNoValue } from './plain-text';
import { type Alternative, certain, doubtOf, type Understood } from './settled';

export interface NumberValue {
  /** Null only with the qualifiers `none` and `non-plastic`. */
  value: number | null;
  qualifier?: '<' | '>' | 'none' | 'non-plastic';
  /** True where the workbook states another unit than the canonical one. */
  converted: boolean;
}

export interface NumberExpectation {
  quantity: Pick<Quantity, 'id' | 'symbol' | 'label' | 'unit' | 'acceptedUnits' | 'plausible' | 'decimals'>;
  /** Unit from the header or the mapping; null where neither states one. */
  unit: string | null;
  /** A unit that the header states and that is not known. */
  unknownUnit: string | null;
  decimal: '.' | ',';
  /** The values beside it are fractions of one where percentages belong. */
  inFractions?: boolean;
}

/** A cell as a number in the quantity's canonical unit, or why it cannot be taken with certainty. */
export function understandNumber(cell: Cell | null, expected: NumberExpectation): Understood<NumberValue> {
  if (!cell) return { state: 'blank' };
  const { quantity } = expected;
  switch (cell.kind) {
    case 'error':
      return doubtOf(`shows ${cell.text}, an error, where ${quantity.label} belongs`);
    case 'formula-without-result':
      return doubtOf('holds a formula whose result was not saved; recalculate and save the workbook');
    case 'boolean':
      return doubtOf(`says ${cell.text} where ${quantity.label} belongs`);
    case 'date':
      return doubtOf(`shows a date, ${cell.text}, where ${quantity.label} belongs`);
    case 'number':
      return fromStoredNumber(cell, expected);
    case 'text':
      return fromText(cell.text, expected);
  }
}

function fromStoredNumber(cell: Cell, expected: NumberExpectation): Understood<NumberValue> {
  const { quantity } = expected;
  const formatUnit = unitOfFormat(cell.format);
  if (!isPercent(cell.format)) {
    const looksLikeFraction =
      formatUnit === null && (expected.inFractions === true || isOddFraction(cell, quantity));
    if (looksLikeFraction) return fractionDoubt(cell, expected);
    return inUnit(cell.value, undefined, formatUnit, expected);
  }
  if (quantity.unit === '1') return inUnit(cell.value, undefined, '1', expected);
  if (quantity.unit !== '%') {
    return doubtOf(
      `is shown as a percentage, ${cell.text}, where ${quantity.label} in ${quantity.unit} belongs`,
    );
  }
  const scaled = new Decimal(cell.value).times(100).toString();
  const understood = inUnit(scaled, undefined, '%', expected);
  if (understood.state !== 'doubt' || !isPlausible(Number(cell.value), quantity)) return understood;
  return doubtOf(`shows ${cell.text}; read as it stands it would be ${cell.value} %`, [
    alternative(Number(cell.value), undefined, expected),
    alternative(Number(scaled), undefined, expected),
  ]);
}

/** A percentage that is reported in whole numbers and stands as 0.97: as likely 97 % as a hundredth of that. */
function isOddFraction(cell: Cell, quantity: NumberExpectation['quantity']): boolean {
  const value = Number(cell.value);
  return quantity.unit === '%' && quantity.decimals === 0 && value > 0 && value < 1;
}

function fractionDoubt(cell: Cell, expected: NumberExpectation): Understood<NumberValue> {
  const times100 = new Decimal(cell.value).times(100).toNumber();
  return doubtOf(`says ${cell.value} where a percentage belongs; it may be a fraction of one`, [
    alternative(times100, undefined, expected),
    alternative(Number(cell.value), undefined, expected),
  ]);
}

function fromText(text: string, expected: NumberExpectation): Understood<NumberValue> {
  const plain = plainText(text);
  if (plain === '') return { state: 'blank' };
  const { quantity } = expected;
  if (/^(np|non-?plastic)$/i.test(plain)) {
    if (quantity.id === 'plasticity-index')
      return certain({ value: null, qualifier: 'non-plastic', converted: false });
    return doubtOf(`says "${text}" where ${quantity.label} belongs`);
  }
  if (/^(none|nil)$/i.test(plain) && quantity.id === 'stripping-inflection-point') {
    return certain({ value: null, qualifier: 'none', converted: false });
  }
  if (saysNoValue(plain)) return { state: 'none' };
  const parsed = parseNumberText(plain, expected.decimal);
  if (parsed.state === 'text') return doubtOf(`says "${text}" where ${quantity.label} belongs`);
  if (parsed.state === 'number') return fromParsed(parsed.number, text, expected);
  const plausible = parsed.numbers.filter((number) =>
    isPlausible(valueIn(number, expected) ?? Number.NaN, quantity),
  );
  // A comma that can only group thousands is no doubt: 20,000 passes are never 20.
  const [only] = plausible;
  const groups = parsed.reason !== 'range' && parsed.numbers.length > 1;
  if (groups && plausible.length === 1 && only && only !== parsed.numbers[0])
    return fromParsed(only, text, expected);
  const why = {
    comma: 'has a decimal comma',
    point: 'has a decimal point where commas are used',
    range: 'gives two values',
  }[parsed.reason];
  const offered = (plausible.length > 0 ? plausible : parsed.numbers).flatMap((number) => {
    const value = valueIn(number, expected);
    return value === null ? [] : [alternative(value, number.qualifier, expected)];
  });
  return doubtOf(`"${text}" ${why}`, offered);
}

function fromParsed(
  number: ParsedNumber,
  text: string,
  expected: NumberExpectation,
): Understood<NumberValue> {
  if (number.rest === '') return inUnit(number.digits, number.qualifier, null, expected);
  const unit = normaliseUnit(number.rest);
  if (unit !== null) return inUnit(number.digits, number.qualifier, unit, expected);
  const value = valueIn({ ...number, rest: '' }, expected);
  const offered = value === null ? [] : [alternative(value, number.qualifier, expected)];
  return doubtOf(`is text, "${text}", where a number belongs`, offered);
}

/** The value of a parsed number in the canonical unit, null where its unit cannot be. */
function valueIn(number: ParsedNumber, expected: NumberExpectation): number | null {
  const unit = number.rest === '' ? expected.unit : normaliseUnit(number.rest);
  const converted = convert(Number(number.digits), unit ?? expected.quantity.unit, expected.quantity.unit);
  return converted.ok ? converted.value : null;
}

function inUnit(
  digits: string,
  qualifier: '<' | '>' | undefined,
  cellUnit: string | null,
  expected: NumberExpectation,
): Understood<NumberValue> {
  const { quantity, unknownUnit } = expected;
  if (cellUnit === null && unknownUnit !== null) return unknownUnitDoubt(digits, qualifier, expected);
  const unit = cellUnit ?? expected.unit ?? quantity.unit;
  const result = convert(Number(digits), unit, quantity.unit);
  if (!result.ok) {
    const meant = [Number(digits), ratioOrPercent(digits, unit, quantity.unit)].filter(
      (value) => value !== null && isPlausible(value, quantity),
    );
    return doubtOf(
      `is stated in ${unit}, which is no unit of ${quantity.label}`,
      meant.flatMap((value) => (value === null ? [] : [alternative(value, qualifier, expected)])),
    );
  }
  const { value } = result;
  const converted = normaliseUnit(unit) !== normaliseUnit(quantity.unit);
  if (isPlausible(value, quantity) || qualifier !== undefined) {
    return certain({ value, converted, ...(qualifier ? { qualifier } : {}) });
  }
  return implausible(value, digits, unit, expected);
}

/** A ratio given as a percentage, or the reverse: what it would be on the quantity's own scale. */
function ratioOrPercent(digits: string, unit: string, canonical: string): number | null {
  const value = new Decimal(digits);
  if (unit === '%' && canonical === '1') return value.div(100).toNumber();
  return unit === '1' && canonical === '%' ? value.times(100).toNumber() : null;
}

function implausible(
  value: number,
  digits: string,
  unit: string,
  expected: NumberExpectation,
): Understood<NumberValue> {
  const { quantity } = expected;
  const offered: Alternative<NumberValue>[] = [];
  const times100 = new Decimal(digits).times(100).toNumber();
  if (quantity.unit === '%' && isPlausible(times100, quantity))
    offered.push(alternative(times100, undefined, expected));
  for (const other of quantity.acceptedUnits) {
    const result = convert(Number(digits), other, quantity.unit);
    if (other === unit || !result.ok || !isPlausible(result.value, quantity)) continue;
    offered.push({
      answer: `${digits} ${other}`,
      label: `${digits} ${other}, that is ${figure(result.value, quantity.unit)}`,
      value: { value: result.value, converted: true },
    });
  }
  offered.push(alternative(value, undefined, expected));
  const { min, max } = quantity.plausible;
  return doubtOf(
    `gives ${figure(value, quantity.unit)} for ${quantity.label}, outside the plausible ${min} to ${figure(max, quantity.unit)}`,
    offered,
  );
}

function unknownUnitDoubt(
  digits: string,
  qualifier: '<' | '>' | undefined,
  expected: NumberExpectation,
): Understood<NumberValue> {
  const { quantity } = expected;
  const units = quantity.acceptedUnits.length > 0 ? quantity.acceptedUnits : [quantity.unit];
  const offered = units.flatMap((unit) => {
    const result = convert(Number(digits), unit, quantity.unit);
    if (!result.ok) return [];
    const converted = unit !== quantity.unit;
    const value = { value: result.value, converted, ...(qualifier ? { qualifier } : {}) };
    return [{ answer: `${digits} ${unit}`, label: figure(Number(digits), unit), value }];
  });
  return doubtOf(`stands under the unit "${expected.unknownUnit}", which is not known`, offered);
}

function alternative(
  value: number,
  qualifier: '<' | '>' | undefined,
  expected: NumberExpectation,
): Alternative<NumberValue> {
  const text = `${qualifier ?? ''}${figure(value, expected.quantity.unit)}`;
  return {
    answer: text,
    label: text,
    value: { value, converted: false, ...(qualifier ? { qualifier } : {}) },
  };
}

function figure(value: number, unit: string): string {
  return unit === '1' ? String(value) : `${value} ${unit}`;
}

function isPlausible(value: number, quantity: NumberExpectation['quantity']): boolean {
  return value >= quantity.plausible.min && value <= quantity.plausible.max;
}

export function isPercent(format: string | null): boolean {
  return (format ?? '').replace(/"[^"]*"|\\.|\[[^\]]*\]/g, '').includes('%');
}

/** The unit that a number format writes behind the digits, `0.0" mm"`. */
function unitOfFormat(format: string | null): string | null {
  if (format === null) return null;
  const literals = [...format.matchAll(/"([^"]*)"/g)].map((match) => match[1]?.trim() ?? '');
  const units = literals.map((literal) => (literal === '' ? null : normaliseUnit(literal)));
  return units.find((unit) => unit !== null) ?? null;
}
