import { Decimal } from 'decimal.js';
import type { Quantity } from '../quantities/quantity';
import { convert } from '../quantities/units';
import type { Doubt, Reading } from '../record';
import type { Cell } from './cell-grid';
import type { Said } from './correction';
import type { FindQuantity } from './layout/resolve-quantity';
import { leaveOut } from './settled';

/**
 * What an answer says of the layout: which quantity a heading means, in which unit a figure stands. Null where it only
 * says what one value is, which the next workbook's value has nothing of.
 */
export function saidByAnswer(doubt: Doubt, answer: string, cell: Cell, find: FindQuantity): Said | null {
  if (answer === leaveOut) return cell.kind === 'number' ? { kind: 'not a reading' } : null;
  const chosen = doubt.alternatives.find((each) => each.answer === answer)?.reading;
  const quantity = chosen && find(chosen.quantity);
  if (!chosen || !quantity) return null;
  const says = { kind: 'reading' as const, quantity: quantity.id, at: {}, without: [] };
  const others = doubt.alternatives.flatMap(({ reading }) => (reading ? [reading.quantity] : []));
  if (new Set(others).size > 1) return { ...says, unit: null };
  const unit = unitOfAnswer(cell, chosen, quantity);
  return unit === null ? null : { ...says, unit };
}

/** The one unit in which the cell's figure is the value that was chosen. */
function unitOfAnswer(cell: Cell, { value }: Reading, quantity: Quantity): string | null {
  if (cell.kind !== 'number' || value === null || Number(cell.value) === 0) return null;
  const units = [...new Set([quantity.unit, ...quantity.acceptedUnits])];
  const fitting = units.filter((unit) => {
    const converted = convert(Number(cell.value), unit, quantity.unit);
    return converted.ok && isClose(converted.value, value);
  });
  const isFraction = quantity.unit === '%' && isClose(new Decimal(cell.value).times(100).toNumber(), value);
  const all = isFraction ? [...fitting, '1'] : fitting;
  return all.length === 1 ? (all[0] ?? null) : null;
}

function isClose(one: number, other: number): boolean {
  return Math.abs(one - other) <= 1e-9 * Math.max(1, Math.abs(other));
}
