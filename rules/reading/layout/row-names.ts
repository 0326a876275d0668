import { quantityById } from '../../quantities/registry';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { isPercent } from '../understand-number';
import type { Surroundings } from './table';
import { isConditionKey, type TableColumn } from './table-column';

/** A column of words that name no quantity names the rows: specimens, trials or stockpiles, as the columns' heads say. */
export function nameRows(
  columns: Map<number, TableColumn>,
  below: Map<number, Cell[]>,
  { kinds, labels }: Surroundings,
): void {
  const all = [...columns.values()];
  const label = all.find(({ kind }) => kind === 'label');
  if (!label || all.some(({ key }) => key === 'specimen')) return;
  const texts = (below.get(label.column) ?? []).slice(0, 80).filter((cell) => kinds.of(cell) === 'text');
  const names = texts.filter(({ text }) => {
    const meaning = labels.read(text);
    return (
      meaning.quantities.length === 0 &&
      meaning.attribute === null &&
      !meaning.furniture &&
      !meaning.raw &&
      meaning.keys.length === 0
    );
  });
  const quantities = all.flatMap((column) => column.quantities);
  if (names.length === 0 || names.length * 2 <= texts.length || quantities.length === 0) return;
  const heads = label.heads
    .filter((cell) => kinds.of(cell) === 'text')
    .flatMap(({ text }) => labels.read(text).keys);
  const stated = heads.find(isConditionKey);
  label.kind = 'key';
  label.key =
    stated ??
    rowKeyOf(
      quantities,
      all.some(({ key }) => key === 'trial'),
    );
}

function rowKeyOf(quantities: string[], hasTrial: boolean): ConditionName {
  const subjects = quantities.map((id) => quantityById(id)?.subject);
  if (subjects.filter((subject) => subject === 'aggregate').length * 2 > subjects.length) return 'stockpile';
  const ofTrials = [
    'binder-content',
    'voids-in-mineral-aggregate',
    'voids-filled-with-asphalt',
    'effective-binder-content',
  ];
  return !hasTrial && quantities.some((id) => ofTrials.includes(id)) ? 'trial' : 'specimen';
}

/** A bare "Percent" beside stockpiles is their share where it sums to 100, and nothing where it does not. */
export function nameShares(columns: Map<number, TableColumn>, below: Map<number, Cell[]>): void {
  const all = [...columns.values()];
  if (!all.some(({ key }) => key === 'stockpile') || all.some(({ key }) => key === 'sieve')) return;
  for (const column of all) {
    const cells = (below.get(column.column) ?? []).filter(({ kind }) => kind === 'number');
    const isPercentage = cells.length > 1 && cells.every(({ format }) => isPercent(format));
    const isBare =
      column.kind === 'value' &&
      column.quantities.length === 0 &&
      ((column.unit === '%' && column.name === null) || isPercentage);
    if (!isBare || column.heads.length === 0) continue;
    const values = cells.map(({ value }) => Number(value) * (isPercentage ? 100 : 1));
    const sum = values.reduce((total, value) => total + value, 0);
    const last = values.at(-1) ?? 0;
    const isTotal = Math.abs(last - 100) < 0.05 && Math.abs(sum - 200) < 0.6;
    if (values.length > 1 && (Math.abs(sum - 100) < 0.6 || isTotal)) column.quantities = ['stockpile-share'];
  }
}

/**
 * Of two columns of the same kind of key, "Lot" beside "Sublot" or "Source" beside "Aggregate", the one that tells
 * more rows apart is the key; the other tells more of the same rows.
 */
export function keepTellingKeys(columns: Map<number, TableColumn>, below: Map<number, Cell[]>): void {
  const all = [...columns.values()];
  const hasBinder = all.some(
    ({ kind, quantities }) => kind === 'value' && quantities.includes('binder-content'),
  );
  const kept = new Map<ConditionName, TableColumn>();
  const distinct = ({ column }: TableColumn) =>
    new Set((below.get(column) ?? []).map(({ text }) => text)).size;
  for (const column of columns.values()) {
    if (column.kind !== 'key' || column.key === null || column.key === 'sieve') continue;
    // One mix in every row tells no trials apart; its binder contents do.
    const rows = below.get(column.column)?.length ?? 0;
    if (column.key === 'trial' && hasBinder && rows > 3 && distinct(column) === 1) {
      column.kind = 'aside';
      continue;
    }
    const before = kept.get(column.key);
    if (before && distinct(column) <= distinct(before)) column.kind = 'aside';
    else {
      if (before) before.kind = 'aside';
      kept.set(column.key, column);
    }
  }
}
