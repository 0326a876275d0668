import type { Cell } from './cell-grid';
import { plainText, saysNoValue } from './plain-text';
import { certain, doubtOf, type Understood } from './settled';

const monthNames = [
  'january',
  'february',
  'march',
  'april',
  'may',
  'june',
  'july',
  'august',
  'september',
  'october',
  'november',
  'december',
];

/** A calendar date, `2026-03-04`. What can be read as two days is a doubt that offers both. */
export function understandDate(cell: Cell | null, date1904: boolean): Understood<string> {
  if (!cell || (cell.kind === 'text' && plainText(cell.text) === '')) return { state: 'blank' };
  if (cell.kind === 'date') return certain(cell.value.slice(0, 10));
  if (cell.kind === 'number') return serialDoubt(cell, date1904);
  if (cell.kind === 'error') return doubtOf(`shows ${cell.text}, an error, where a date belongs`);
  if (cell.kind === 'formula-without-result') return doubtOf('holds a formula whose result was not saved');
  if (saysNoValue(cell.text)) return { state: 'none' };
  return dateFromText(cell.text);
}

export function dateFromText(text: string): Understood<string> {
  const plain = plainText(text).toLowerCase();
  const iso = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})(?:[t ].*)?$/.exec(plain);
  if (iso) return sure(isoDate(Number(iso[1]), Number(iso[2]), Number(iso[3])), text);
  const named = namedMonth(plain);
  if (named) {
    const { year, month, day } = named;
    if (year >= 1000) return sure(isoDate(year, month, day), text);
    return choice(text, 'gives the year with two digits', [isoDate(2000 + year, month, day)]);
  }
  const numeric = /^(\d{1,2})[-/. ](\d{1,2})[-/. ](\d{2}|\d{4})$/.exec(plain);
  if (!numeric) return doubtOf(`says "${text}", which is not a date`);
  const [first, second, written] = [Number(numeric[1]), Number(numeric[2]), Number(numeric[3])];
  const year = written < 100 ? 2000 + written : written;
  const dayFirst = isoDate(year, second, first);
  const monthFirst = isoDate(year, first, second);
  if (written < 100) return choice(text, 'gives the year with two digits', [dayFirst, monthFirst]);
  if (dayFirst === monthFirst || monthFirst === null) return sure(dayFirst, text);
  if (dayFirst === null) return sure(monthFirst, text);
  return choice(text, 'can be read as two days', [dayFirst, monthFirst]);
}

/** "4 March 2026" */
export function dateInWords(iso: string): string {
  const [year = '', month = '', day = ''] = iso.split('-');
  const name = monthNames[Number(month) - 1] ?? '';
  return `${Number(day)} ${name.charAt(0).toUpperCase()}${name.slice(1)} ${year}`;
}

function namedMonth(plain: string): { year: number; month: number; day: number } | null {
  const dayFirst = /^(\d{1,2})(?:st|nd|rd|th)?[-\s.,]*([a-z]{3,9})\.?[-\s.,]*(\d{2}|\d{4})$/.exec(plain);
  const monthFirst = /^([a-z]{3,9})\.?[-\s.,]*(\d{1,2})(?:st|nd|rd|th)?[-\s.,]+(\d{2}|\d{4})$/.exec(plain);
  const name = dayFirst?.[2] ?? monthFirst?.[1];
  if (name === undefined) return null;
  const month =
    monthNames.findIndex((full) => full === name || (name.length >= 3 && full.startsWith(name))) + 1;
  if (month === 0) return null;
  return {
    year: Number(dayFirst?.[3] ?? monthFirst?.[3]),
    month,
    day: Number(dayFirst?.[1] ?? monthFirst?.[2]),
  };
}

/** Null where the calendar has no such day. */
function isoDate(year: number, month: number, day: number): string | null {
  if (month < 1 || month > 12 || day < 1 || day > daysIn(year, month)) return null;
  return `${String(year).padStart(4, '0')}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
}

function daysIn(year: number, month: number): number {
  if (month === 2) return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0 ? 29 : 28;
  return [4, 6, 9, 11].includes(month) ? 30 : 31;
}

function sure(iso: string | null, text: string): Understood<string> {
  return iso === null ? doubtOf(`says "${text}", which is no day of the calendar`) : certain(iso);
}

function choice(text: string, why: string, days: (string | null)[]): Understood<string> {
  const distinct = [...new Set(days.filter((day) => day !== null))];
  return doubtOf(
    `says "${text}", which ${why}`,
    distinct.map((iso) => ({ answer: iso, label: dateInWords(iso), value: iso })),
  );
}

/** A day typed into a cell that shows plain numbers, or a number that is no day at all. */
function serialDoubt(cell: Cell, date1904: boolean): Understood<string> {
  const serial = Number(cell.value);
  if (serial < 30_000 || serial > 60_000) return doubtOf(`says ${cell.text}, a number, where a date belongs`);
  const iso = dateFromDayNumber(Math.floor(serial) + (date1904 ? 1462 : 0));
  return choice(cell.text, 'is a number that can stand for a day', [iso]);
}

/** Day 25569 of the spreadsheet's count is 1 January 1970; the civil calendar from there by whole days. */
function dateFromDayNumber(day: number): string | null {
  let year = 1970;
  let rest = day - 25_569;
  const yearDays = () => (daysIn(year, 2) === 29 ? 366 : 365);
  while (rest >= yearDays()) {
    rest -= yearDays();
    year += 1;
  }
  let month = 1;
  while (rest >= daysIn(year, month)) {
    rest -= daysIn(year, month);
    month += 1;
  }
  return isoDate(year, month, rest + 1);
}
