import { Decimal } from 'decimal.js';
import type { Quantity } from '../../quantities/quantity';
import { convert } from '../../quantities/units';
import type { Cell } from '../cell-grid';
import { doubtOf, type Understood } from '../settled';
import { type NumberValue, understandNumber } from '../understand-number';
import type { Assigned } from './assigned';
import type { EmitOptions } from './emit-candidate';

export function understandAs(
  each: Assigned,
  quantity: Quantity,
  { decimalOf, suspected }: EmitOptions,
): Understood<NumberValue> {
  const cell: Cell = each.written === null ? each.cell : writtenCell(each.cell, each.written);
  const decimal = decimalOf(each.index.sheet.name);
  if (each.told?.unit === '1' && quantity.unit === '%' && cell.kind === 'number') {
    const percent = new Decimal(cell.value).times(100).toString();
    const asPercent: Cell = { ...cell, value: percent, format: null };
    return understandNumber(asPercent, { quantity, unit: '%', unknownUnit: null, decimal });
  }
  const fits = each.unit !== null && convert(1, each.unit, quantity.unit).ok;
  const unclear = unitUnclear(each, quantity, cell, decimal);
  if (unclear) return unclear;
  // A figure of percent stands for the whole table; it is no unit of a gravity in one of its rows.
  const unit = fits || (each.unit !== null && each.unit !== '%') ? each.unit : null;
  return understandNumber(cell, {
    quantity,
    unit: each.unit === '%' && quantity.unit === '1' ? '%' : unit,
    unknownUnit: each.unknownUnit,
    decimal,
    inFractions: suspected.get(each) === 'fraction',
  });
}

function writtenCell(cell: Cell, written: string): Cell {
  return { ...cell, kind: 'text', value: written, text: written, format: null, formula: null };
}

/** Without a unit a figure is taken only where no other unit of the quantity makes it plausible too. */
function unitUnclear(
  each: Assigned,
  quantity: Quantity,
  cell: Cell,
  decimal: '.' | ',',
): Understood<NumberValue> | null {
  if (
    each.unit !== null ||
    each.unknownUnit !== null ||
    quantity.acceptedUnits.length < 2 ||
    cell.kind !== 'number'
  )
    return null;
  if (cell.format !== null && /"[^"]+"/.test(cell.format)) return null;
  const plausible = quantity.acceptedUnits.filter((unit) => {
    const converted = convert(Number(cell.value), unit, quantity.unit);
    return (
      converted.ok && converted.value >= quantity.plausible.min && converted.value <= quantity.plausible.max
    );
  });
  const [only] = plausible;
  if (plausible.length === 0 || (plausible.length === 1 && only === quantity.unit)) return null;
  // Zero and near-zero fit every unit; so do scales that differ by little. The canonical one is then as stated.
  const alternatives = plausible.flatMap((unit) => {
    const understood = understandNumber(cell, { quantity, unit, unknownUnit: null, decimal });
    return understood.state === 'value'
      ? [{ answer: `${cell.value} ${unit}`, label: `${cell.value} ${unit}`, value: understood.value }]
      : [];
  });
  return doubtOf('has no unit, and its figure does not tell which', alternatives);
}

export function suspicious(
  each: Assigned,
  quantity: Quantity,
  understood: Understood<NumberValue>,
  options: EmitOptions,
): Understood<NumberValue> {
  if (understood.state !== 'value') return understood;
  const suspicion = options.suspected.get(each);
  if (suspicion && suspicion !== 'fraction') {
    return doubtOf<NumberValue>(suspicion.reason, [
      ...suspicion.alternatives.map((value) => ({
        answer: String(value),
        label: `${value} ${quantity.unit === '1' ? '' : quantity.unit}`.trim(),
        value: { value, converted: false },
      })),
      { answer: `as it stands`, label: 'As it stands', value: understood.value },
    ]);
  }
  if (each.told) return understood;
  if (each.misspelt !== null)
    return doubtOf<NumberValue>(`stands under "${each.misspelt}", which may be meant for ${quantity.label}`, [
      { answer: quantity.id, label: quantity.label, value: understood.value },
    ]);
  const needsBasis = quantity.id === 'rap-content' || quantity.id === 'ras-content';
  if (needsBasis && !each.onMix)
    return doubtOf('does not say of what mass it is a percentage', [
      { answer: 'of mix', label: 'By mass of mix', value: understood.value },
    ]);
  if (quantity.id === 'binder-content' && each.onAggregate && understood.value.value !== null) {
    const ofAggregate = understood.value.value;
    return {
      state: 'value',
      value: {
        ...understood.value,
        value: Math.round((ofAggregate / (100 + ofAggregate)) * 1e14) / 1e12,
        converted: true,
      },
    };
  }
  return understood;
}
