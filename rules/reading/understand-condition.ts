import { sieveFromName } from '../quantities/sieves';
import { convert, normaliseUnit } from '../quantities/units';
import type { Conditions } from '../record';
import type { Cell } from './cell-grid';
import type { ConditionName } from './mapping';
import { parseNumberText } from './parse-number';
import { plainText, saysNoValue } from './plain-text';
import { certain, doubtOf, type Understood } from './settled';

/** Canonical units of the conditions that are numbers. */
const conditionUnits: Partial<Record<ConditionName, string>> = {
  temperature: '°C',
  time: 's',
  stress: 'kPa',
  passes: 'passes',
  frequency: 'Hz',
};

/** What the cell of a key says about a reading: its trial, sieve, temperature … */
export function understandCondition(
  name: ConditionName,
  cell: Cell | null,
  unit: string | null,
  decimal: '.' | ',',
): Understood<NonNullable<Conditions[ConditionName]>> {
  if (!cell || plainText(cell.text) === '' || saysNoValue(cell.text)) return { state: 'blank' };
  if (cell.kind === 'error') return doubtOf(`shows ${cell.text}, an error, where ${keyWords[name]} belongs`);
  if (cell.kind === 'formula-without-result') {
    return doubtOf('holds a formula whose result was not saved; recalculate and save the workbook');
  }
  if (name === 'sieve') return sieve(cell);
  if (name === 'gyrations') return gyrations(cell.text);
  if (name === 'laboratory') return laboratory(cell.text);
  const canonical = conditionUnits[name];
  if (canonical !== undefined) return measured(name, cell, unit ?? canonical, canonical, decimal);
  const text = plainText(cell.text);
  if (name === 'trial' && /^(design|jmf|job[- ]?mix(?: formula)?|proposed|final)$/i.test(text))
    return certain('design');
  return certain(text);
}

export const keyWords: Record<ConditionName, string> = {
  trial: 'a trial',
  blend: 'a blend',
  variant: 'a form of the test',
  specimen: 'a specimen',
  stockpile: 'a stockpile',
  sieve: 'a sieve',
  gyrations: 'a number of gyrations',
  temperature: 'a temperature',
  time: 'a loading time',
  stress: 'a stress',
  passes: 'a number of passes',
  frequency: 'a frequency',
  aging: 'an aging',
  laboratory: 'a laboratory',
};

function sieve(cell: Cell): Understood<number> {
  if (cell.kind === 'date') return sieveTurnedDate(cell);
  const opening = sieveFromName(cell.text) ?? (cell.kind === 'number' ? sieveFromName(cell.value) : null);
  if (opening !== null) return certain(opening);
  const numbered = sieveFromName(`No. ${plainText(cell.text)}`);
  const offered = numbered === null ? [] : [sieveAlternative(numbered)];
  return doubtOf(`says "${cell.text}", which is not in the sieve series`, offered);
}

/** The spreadsheet program takes 3/8 for the eighth of March. */
function sieveTurnedDate(cell: Cell): Understood<number> {
  const [, month, day] = cell.value.slice(0, 10).split('-').map(Number);
  const openings = [`${month}/${day} in`, `${day}/${month} in`].map(sieveFromName);
  const offered = [...new Set(openings.filter((opening) => opening !== null))].map(sieveAlternative);
  return doubtOf(`shows a date, ${cell.text}, where a sieve belongs`, offered);
}

function sieveAlternative(openingMm: number) {
  return { answer: `${openingMm} mm`, label: `${openingMm} mm`, value: openingMm };
}

function gyrations(text: string): Understood<number | 'initial' | 'design' | 'maximum'> {
  const plain = plainText(text).toLowerCase();
  const level = /^n?\s*[_-]?(ini|des|max)[a-z]*(?: gyrations)?$/.exec(plain)?.[1];
  if (level === 'ini') return certain('initial');
  if (level === 'des') return certain('design');
  if (level === 'max') return certain('maximum');
  const number = /^(\d{1,4})(?: gyrations)?$/.exec(plain);
  return number ? certain(Number(number[1])) : doubtOf(`says "${text}" where a number of gyrations belongs`);
}

function laboratory(text: string): Understood<'contractor' | 'agency'> {
  const plain = plainText(text).toLowerCase();
  if (plain === 'agency' || plain === 'contractor') return certain(plain);
  return doubtOf(`says "${text}" where contractor or agency belongs`, [
    { answer: 'contractor', label: 'The contractor', value: 'contractor' },
    { answer: 'agency', label: 'The agency', value: 'agency' },
  ]);
}

function measured(
  name: ConditionName,
  cell: Cell,
  headerUnit: string,
  canonical: string,
  decimal: '.' | ',',
): Understood<number> {
  const parsed = cell.kind === 'number' ? null : parseNumberText(cell.text, decimal);
  const digits = parsed === null ? cell.value : parsed.state === 'number' ? parsed.number.digits : null;
  const rest = parsed?.state === 'number' ? parsed.number.rest : '';
  const unit = rest === '' ? headerUnit : normaliseUnit(rest);
  const offered =
    parsed?.state === 'ambiguous'
      ? parsed.numbers.map(({ digits: each }) => ({
          answer: each,
          label: `${each} ${headerUnit}`,
          value: Number(each),
        }))
      : [];
  if (cell.kind === 'date' || digits === null || unit === null) {
    return doubtOf(`says "${cell.text}" where ${keyWords[name]} belongs`, offered);
  }
  const result = convert(Number(digits), unit, canonical);
  return result.ok
    ? certain(result.value)
    : doubtOf(`is stated in ${unit}, which is no unit of ${keyWords[name]}`);
}
