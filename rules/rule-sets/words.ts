import { decimalsOf, formatDecimals } from '../numerics/round';
import type { Quantity } from '../quantities/quantity';
import { sieveLabel } from '../quantities/sieves';
import type { Conditions } from '../record';

export interface PhraseOptions {
  /** Capitalised, to open a sentence. */
  opening?: boolean;
}

/** A number as sentences write it: U+2212 for minus, commas from 1,000. */
export function numberWords(value: number | string, decimals?: number): string {
  const text = typeof value === 'string' ? value : written(value, decimals ?? decimalsOf(value));
  const [whole = '', fraction] = text.replace('-', '').split('.');
  const grouped = whole.length > 3 ? whole.replace(/\B(?=(\d{3})+$)/g, ',') : whole;
  return `${text.startsWith('-') ? '−' : ''}${grouped}${fraction === undefined ? '' : `.${fraction}`}`;
}

/** With so many decimals; zeros are put behind without arithmetic where nothing has to be rounded. */
function written(value: number, decimals: number): string {
  const text = String(value);
  const point = text.indexOf('.');
  const given = point < 0 ? 0 : text.length - point - 1;
  if (given > decimals || text.includes('e')) return formatDecimals(value, decimals);
  if (decimals === 0) return text;
  return `${text}${point < 0 ? '.' : ''}${'0'.repeat(decimals - given)}`;
}

/** A computed number with as many digits as a reader needs, and never one that hides on which side it lies. */
export function computedWords(value: number, decimals: number): string {
  for (let digits = decimals + 2; digits <= 12; digits += 1) {
    const text = formatDecimals(value, digits);
    const relative = Math.abs(Number(text) - value);
    if (relative === 0 || !isRound(text, decimals)) return numberWords(trimZeros(text, decimals));
  }
  return numberWords(value);
}

/** `>20,000` and `<0.1` in words: "more than 20,000", "less than 0.1". */
export function censoredWords(text: string): string {
  return text.replace(/^>/, 'more than ').replace(/^</, 'less than ');
}

/** " %", " kPa", or nothing for a number without a unit. */
export function unitSuffix(unit: string): string {
  return unit === '1' || unit === '' ? '' : ` ${unit}`;
}

export function withUnit(text: string, unit: string): string {
  return `${text}${unitSuffix(unit)}`;
}

export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

export function uncapitalised(text: string): string {
  // A symbol or an abbreviation, "RAP", "pH", keeps its letters.
  return /^[A-Z][a-z]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;
}

/** "voids in the mineral aggregate", "percent passing 12.5 mm", "relative density at initial gyrations". */
export function quantityPhrase(quantity: Quantity, at: Conditions, options: PhraseOptions = {}): string {
  const phrase = `${quantity.label}${conditionWords(at)}`;
  return options.opening ? capitalised(phrase) : phrase;
}

/** Conditions as they follow a label. The design trial goes without saying. */
export function conditionWords(at: Conditions): string {
  const parts: string[] = [];
  if (at.sieve !== undefined) parts.push(` ${sieveLabel(at.sieve)}`);
  if (at.variant !== undefined) parts.push(` (${at.variant})`);
  if (at.stockpile !== undefined) {
    parts.push(at.stockpile === 'each' ? ' of each stockpile' : ` of stockpile ${at.stockpile}`);
  }
  if (at.gyrations !== undefined) {
    parts.push(
      typeof at.gyrations === 'number'
        ? ` at ${at.gyrations} gyrations`
        : ` at the ${at.gyrations} gyrations`,
    );
  }
  if (at.temperature !== undefined) parts.push(` at ${numberWords(at.temperature)} °C`);
  if (at.time !== undefined) parts.push(` at ${numberWords(at.time)} s`);
  if (at.stress !== undefined) parts.push(` at ${numberWords(at.stress)} kPa`);
  if (at.frequency !== undefined) parts.push(` at ${numberWords(at.frequency)} Hz`);
  if (at.passes !== undefined) parts.push(` after ${numberWords(at.passes)} passes`);
  if (at.aging !== undefined) parts.push(` (aging ${at.aging})`);
  if (at.blend !== undefined) parts.push(` of blend ${at.blend}`);
  if (at.trial !== undefined && at.trial !== 'design') parts.push(` of trial ${at.trial}`);
  if (at.specimen !== undefined) parts.push(`, specimen ${at.specimen},`);
  if (at.laboratory === 'agency') parts.push(" by the agency's laboratory");
  return parts.join('').replace(/,$/, '');
}

/** "PG 64-22", "PG 64-22 or PG 70-22", "a, b or c". */
export function orList(entries: readonly string[]): string {
  return joined(entries, 'or');
}

export function andList(entries: readonly string[]): string {
  return joined(entries, 'and');
}

/** 2026-03-09 as "9 March 2026". */
export function dateWords(date: string): string {
  const [year, month, day] = date.split('-').map(Number);
  return `${day} ${MONTHS[(month ?? 1) - 1]} ${year}`;
}

export function plural(count: number, one: string, many = `${one}s`): string {
  return `${numberWords(count)} ${count === 1 ? one : many}`;
}

function joined(entries: readonly string[], word: string): string {
  if (entries.length <= 1) return entries[0] ?? '';
  return `${entries.slice(0, -1).join(', ')} ${word} ${entries.at(-1)}`;
}

function isRound(text: string, decimals: number): boolean {
  const fraction = text.split('.')[1] ?? '';
  return /^5?0*$/.test(fraction.slice(decimals));
}

function trimZeros(text: string, decimals: number): string {
  const [whole = '', fraction = ''] = text.split('.');
  const kept = fraction.slice(0, decimals) + fraction.slice(decimals).replace(/0+$/, '');
  return kept === '' ? whole : `${whole}.${kept}`;
}

const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];
