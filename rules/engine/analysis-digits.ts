import { decimalsOf } from '../numerics/round';
import { tenTo } from '../numerics/transcendental';
import type { Reading } from '../record';

/** How a reading is displayed: the unit of its last digit, in the reading's own canonical unit. */
export function displayedUnit(reading: Reading): number {
  const known = units.get(reading);
  if (known !== undefined) return known;
  const unit = unitOf(reading);
  units.set(reading, unit);
  return unit;
}

/** Half a unit of the last displayed digit: how far the number behind the display may lie from it. */
export function halfDisplayedUnit(reading: Reading): number {
  return displayedUnit(reading) / 2;
}

/** True where a number, displayed like the reading, shows the same digits; an exact half may go either way. */
export function showsAs(value: number, reading: Reading): boolean {
  if (reading.value === null) return false;
  const unit = displayedUnit(reading);
  const shown = Math.round(reading.value / unit) * unit;
  return Math.abs(value - shown) <= (unit / 2) * (1 + 1e-9);
}

/** Asked for many times within one analysis, once for every value that rests on the reading. */
const units = new WeakMap<Reading, number>();

function unitOf(reading: Reading): number {
  const value = reading.value ?? 0;
  const written = reading.source ? writtenNumber(reading.source.text, value) : null;
  if (written === null) return tenTo(-decimalsOf(value));
  return written.unit * scaleOf(value, written);
}

interface Written {
  value: number;
  /** Unit of the last digit written. */
  unit: number;
}

/** The number within a cell's text. A comma may group thousands or mark decimals: the stored value tells which. */
function writtenNumber(text: string, value: number): Written | null {
  const match = /[-+−]?(?:\d[\d,\s]*(?:[.,]\d*)?|[.,]\d+)(?:[eE][-+]?\d+)?/.exec(text.normalize('NFKC'));
  if (!match) return null;
  const digits = match[0].replace(/\s/g, '').replace('−', '-');
  const readings = [digits.replaceAll(',', ''), digits.replace(',', '.')]
    .map((form) => ({ form, value: Number(form) }))
    .filter((form) => Number.isFinite(form.value));
  const best = readings.find((form) => Math.abs(form.value - value) <= 1e-6 * Math.abs(value)) ?? readings[0];
  return best ? { value: best.value, unit: lastDigit(best.form) } : null;
}

function lastDigit(form: string): number {
  const [mantissa = '', exponent = '0'] = form.toLowerCase().split('e');
  return tenTo(Number(exponent) - decimalsOf(mantissa));
}

/** A cell in psi displays digits of psi: its last digit is worth more or less in the canonical unit. */
function scaleOf(value: number, written: Written): number {
  const isRoundedOnly = Math.abs(value - written.value) <= (written.unit / 2) * (1 + 1e-9);
  if (isRoundedOnly || written.value === 0 || value === 0) return 1;
  return Math.abs(value / written.value);
}
