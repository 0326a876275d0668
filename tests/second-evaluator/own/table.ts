import { attributeFact, type Scalar, sameScalar } from './attribute';
import type { Cell, Row, Table } from './edition';
import type { World } from './world';

export type Found = { is: 'row'; row: Row } | { is: 'no row' };

export function tableOf(world: World, id: string): Table {
  const table = world.edition.tables.find((each) => each.id === id);
  if (table === undefined) throw new Error(`The edition has no table ${id}.`);
  return table;
}

/** The row for this mix; a key that is missing, doubtful or in no row leads to none. */
export function rowFor(world: World, table: Table, sieve: number | undefined): Found {
  for (const row of table.rows) {
    let matches = true;
    for (const key of table.keys) {
      const value = keyValue(world, key, sieve);
      if (value === null || !covers(row[key], value)) matches = false;
    }
    if (matches) return { is: 'row', row };
  }
  return { is: 'no row' };
}

export function keyValue(world: World, key: string, sieve: number | undefined): Scalar | null {
  if (key === 'sieve') return sieve ?? null;
  const fact = attributeFact(world, key);
  return fact.is === 'value' ? fact.value : null;
}

/** Equal, or in the range: `from` is in it, `below` is not. */
export function covers(cell: Cell | undefined, value: Scalar): boolean {
  if (cell === undefined || cell === null || Array.isArray(cell)) return false;
  if (typeof cell !== 'object') {
    const plainCell = typeof value === 'number' && typeof cell === 'string' ? Number(cell) : cell;
    return sameScalar(plainCell, value);
  }
  if (typeof value !== 'number') return false;
  if (cell.from !== undefined && value < cell.from) return false;
  return cell.below === undefined || value < cell.below;
}
