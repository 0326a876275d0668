import type { Quantity } from '../../quantities/quantity';
import type { Conditions, Reading } from '../../record';
import { type Place, placeOf } from '../reading-log';
import { type Alternative, doubtOf, type Understood } from '../settled';
import { readingInWords } from '../take-words';
import type { NumberValue } from '../understand-number';
import { unreadReasons } from '../unread-reason';
import { acceptedConditions } from './accepted-conditions';
import type { Assigned, SettleOptions } from './assigned';
import { suspicious, understandAs } from './understand-candidate';

export interface EmitOptions extends SettleOptions {
  suspected: Map<Assigned, { reason: string; alternatives: number[] } | 'fraction'>;
  formulas: Set<string>;
}

export function emit(each: Assigned, options: EmitOptions): void {
  const { log } = options;
  const { cell, choices, conditions } = each;
  const place = placeOf(each.index.sheet, cell);
  const [quantity] = choices;
  if (!quantity) {
    log.passOver(place, unreadReasons.notRecognised);
    return;
  }
  const lacking = lackingKey(quantity.id, conditions);
  if (lacking === 'stockpile' || lacking === 'sieve') {
    log.passOver(place, lacking === 'stockpile' ? unreadReasons.total : unreadReasons.notRecognised);
    return;
  }
  if (choices.length > 1) {
    emitAmbiguous(each, place, options);
    return;
  }
  const plain = suspicious(each, quantity, understandAs(each, quantity, options), options);
  const understood = lacking === 'time' && plain.state === 'value' ? timeUnknown(plain.value) : plain;
  if (understood.state === 'blank' || understood.state === 'none') {
    log.passOver(place, unreadReasons.noValue);
    return;
  }
  if (cell.kind === 'formula-without-result') {
    const block = `${each.table}|${quantity.id}`;
    if (options.formulas.has(block)) {
      log.use(place, 'doubt', 'A formula whose result was not saved, as in the cells before it.');
      return;
    }
    options.formulas.add(block);
  }
  const build = (value: NumberValue) => readingOf(each, quantity, value, place);
  const settled = log.settle(place, understood, { quantity: quantity.id, at: conditions }, (value) => ({
    reading: build(value),
  }));
  if (settled.state === 'left out') log.passOver(place, unreadReasons.leftOut);
  if (settled.state !== 'value') return;
  const reading = build(settled.value);
  log.readings.push({ reading, place, taken: takenWords(each, reading, quantity) });
}

/** A share of no stockpile, a percentage on no sieve and a creep value at no time say nothing. */
function lackingKey(id: string, at: Conditions): 'stockpile' | 'sieve' | 'time' | null {
  if (id === 'stockpile-share') return at.stockpile === undefined ? 'stockpile' : null;
  if (id === 'percent-passing' || id.endsWith('percent-retained'))
    return at.sieve === undefined ? 'sieve' : null;
  const isTimed = id === 'creep-compliance' || id === 'creep-strain' || id.endsWith('-deformation');
  return isTimed && at.time === undefined ? 'time' : null;
}

function timeUnknown(value: NumberValue): Understood<NumberValue> {
  return doubtOf('does not say at which loading time it was taken', [
    { answer: 'as it stands', label: 'As it stands', value },
  ]);
}

function takenWords(each: Assigned, reading: Reading, quantity: Quantity): string {
  const { index, cell } = each;
  const hidden = index.isHidden(cell) ? ' · hidden in the workbook' : '';
  const elsewhere =
    cell.formula !== null && /\[\d+\]|\[[^\]]+\.xls/i.test(cell.formula) ? ' · from another workbook' : '';
  const remark = cell.comment === null ? '' : ` · remark: ${cell.comment}`;
  const why = each.heading === '' ? '' : ` · by ${each.heading.slice(0, 80)}`;
  return `${readingInWords(reading, quantity)}${hidden}${elsewhere}${remark}${why}`;
}

/** Where two quantities fit, neither is taken. */
function emitAmbiguous(each: Assigned, place: Place, options: EmitOptions): void {
  const alternatives = each.choices.flatMap((quantity) => {
    const understood = understandAs(each, quantity, options);
    const values: Alternative<NumberValue>[] =
      understood.state === 'value'
        ? [{ answer: String(understood.value.value), label: '', value: understood.value }]
        : [];
    return values.map(({ value }) => ({
      answer: quantity.id,
      label: quantity.label,
      value: { quantity, value },
    }));
  });
  const [only, ...more] = alternatives;
  // A range that leaves one of them only is as good as a word.
  if (only && more.length === 0 && each.choices.length > 1) {
    const narrowed = {
      ...each,
      choices: [only.value.quantity],
      conditions: acceptedConditions(each, only.value.quantity),
    };
    emit(narrowed, options);
    return;
  }
  const names = each.choices.map(({ label }) => label).join(' or ');
  const doubt = doubtOf(`may be ${names}; the heading does not say which`, alternatives);
  const settled = options.log.settle(place, doubt, {}, ({ quantity, value }) => ({
    reading: readingOf({ ...each, conditions: acceptedConditions(each, quantity) }, quantity, value, place),
  }));
  if (settled.state === 'left out') options.log.passOver(place, unreadReasons.leftOut);
  if (settled.state !== 'value') return;
  const { quantity, value } = settled.value;
  const chosen = { ...each, choices: [quantity], conditions: acceptedConditions(each, quantity) };
  const reading = readingOf(chosen, quantity, value, place);
  options.log.readings.push({ reading, place, taken: takenWords(chosen, reading, quantity) });
}

function readingOf(each: Assigned, quantity: Quantity, value: NumberValue, place: Place): Reading {
  const stated = quantity.kind === 'derived' ? 'reported' : 'measured';
  return {
    quantity: quantity.id,
    value: value.value,
    ...(value.qualifier ? { qualifier: value.qualifier } : {}),
    unit: quantity.unit,
    at: each.conditions,
    ...(each.method ? { method: each.method } : {}),
    origin: value.converted ? 'converted' : stated,
    ...(each.testedOn ? { testedOn: each.testedOn } : {}),
    source: place,
  };
}
