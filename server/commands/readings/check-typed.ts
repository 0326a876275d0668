import { Decimal } from 'decimal.js';
import type { Quantity } from '#rules/quantities/quantity';
import { convert } from '#rules/quantities/units';
import { conditionsKey } from '#rules/reading/reading-log';
import { readingInWords } from '#rules/reading/take-words';
import type { MixRecord, Reading } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { TypedReadingInput } from '#shared/contracts/corrections';
import type { ProblemError } from '#shared/contracts/problems';
import { overrulingReading } from '../../presenters/overruling-reading';
import { quantitiesFor } from '../../presenters/words-for';
import { unitFaults, unknownQuantity } from './check-corrections';

interface Around {
  edition: ResolvedEdition;
  /** As read; what it states is corrected at its cell, not typed beside it. */
  workbook: Pick<MixRecord, 'readings'>;
  /** Typed before and not taken back. */
  present: readonly Reading[];
  typed: NonNullable<Reading['typed']>;
}

/** Readings as they were typed, in the record's units; or every fault at once. */
export function checkTyped(
  inputs: readonly TypedReadingInput[],
  around: Around,
): { readings: Reading[]; errors: ProblemError[] } {
  const readings: Reading[] = [];
  const errors: ProblemError[] = [];
  for (const [index, input] of inputs.entries()) {
    const pointer = `/typed/${index}`;
    const quantity = quantitiesFor(around.edition).get(input.quantity);
    if (quantity === undefined) {
      errors.push(unknownQuantity(input.quantity, `${pointer}/quantity`));
      continue;
    }
    const found = [
      ...unitFaults(input.unit, quantity, `${pointer}/unit`),
      ...valueFaults(input, quantity, pointer),
    ];
    const reading = found.length === 0 ? readingOf(input, quantity, around) : null;
    if (reading !== null) found.push(...sameFaults(reading, quantity, { ...around, readings, pointer }));
    errors.push(...found);
    if (reading !== null && found.length === 0) readings.push(reading);
  }
  return { readings, errors };
}

function readingOf(input: TypedReadingInput, quantity: Quantity, { typed }: Around): Reading {
  return {
    quantity: quantity.id,
    value: input.value === null ? null : inCanonicalUnit(input.value, input.unit, quantity),
    ...(input.qualifier ? { qualifier: input.qualifier } : {}),
    unit: quantity.unit,
    at: input.at,
    ...(input.method ? { method: input.method } : {}),
    origin: 'typed',
    ...(input.testedOn ? { testedOn: input.testedOn } : {}),
    typed,
    source: null,
  };
}

function valueFaults(input: TypedReadingInput, quantity: Quantity, pointer: string): ProblemError[] {
  const at = `${pointer}/value`;
  const isWord = input.qualifier === 'none' || input.qualifier === 'non-plastic';
  if (input.value === null) {
    return isWord ? [] : [{ pointer: at, detail: `${quantity.symbol} has no value.`, fix: 'Enter one.' }];
  }
  if (isWord) {
    const detail = `${quantity.symbol} is said to be ${input.qualifier} and has a value too.`;
    return [{ pointer: at, detail, fix: 'Leave out the one or the other.' }];
  }
  const value = inCanonicalUnit(input.value, input.unit, quantity);
  const { min, max } = quantity.plausible;
  if (value === null || (value >= min && value <= max)) return [];
  const unit = quantity.unit === '1' ? '' : ` ${quantity.unit}`;
  const detail = `${quantity.symbol} of ${value}${unit} is beyond what can be, ${min} to ${max}${unit}.`;
  return [{ pointer: at, detail, fix: 'Check the value and its unit.' }];
}

function inCanonicalUnit(value: number, unit: string, quantity: Quantity): number | null {
  if (unit === '1' && quantity.unit === '%') return new Decimal(value).times(100).toNumber();
  const converted = convert(value, unit, quantity.unit);
  return converted.ok ? converted.value : null;
}

function sameFaults(
  reading: Reading,
  quantity: Quantity,
  { workbook, present, readings, pointer }: Around & { readings: readonly Reading[]; pointer: string },
): ProblemError[] {
  const name = readingInWords(reading, quantity).split(' · ')[0];
  const stated = overrulingReading(reading, workbook);
  if (stated !== null) {
    const { sheet = '', cell = '' } = stated.source ?? {};
    const place = sheet === '' ? cell : `${sheet} ${cell}`;
    const detail = `${name} stands in the workbook, in ${place}.`;
    return [{ pointer, detail, fix: 'Say there that it is not a reading, or correct the workbook.' }];
  }
  const key = conditionsKey(reading.at);
  const isTyped = [...present, ...readings].some(
    (each) => each.quantity === reading.quantity && conditionsKey(each.at) === key,
  );
  if (!isTyped) return [];
  return [{ pointer, detail: `${name} is typed already.`, fix: 'Take that one back first.' }];
}
