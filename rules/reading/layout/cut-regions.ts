import type { Cell } from '../cell-grid';
import { type Surroundings, saysWhat, type TableRow } from './table';

export type Region = TableRow[];

/** Rows without a blank row between them; cells come by row, then column. */
export function cutRows(cells: readonly Cell[]): Region[] {
  const regions: Region[] = [];
  let region: Region = [];
  for (const cell of cells) {
    const last = region.at(-1);
    if (last?.row === cell.row) last.cells.push(cell);
    else {
      if (last && cell.row > last.row + 1) {
        regions.push(region);
        region = [];
      }
      region.push({ row: cell.row, cells: [cell] });
    }
  }
  if (region.length > 0) regions.push(region);
  return regions;
}

/** Splits a band where a blank column parts two tables that each have their own keys or labels. */
export function cutColumns(band: Region, around: Surroundings): Region[] {
  const occupied = new Set<number>();
  for (const { cells } of band) {
    if (cells.length > 1 || band.length === 1) for (const cell of cells) occupied.add(cell.column);
  }
  const columns = [...occupied].sort((a, b) => a - b);
  const groups: { from: number; to: number }[] = [];
  for (const column of columns) {
    const last = groups.at(-1);
    if (last && column === last.to + 1) last.to = column;
    else groups.push({ from: column, to: column });
  }
  const parts: { from: number; to: number }[] = [];
  for (const group of groups) {
    const last = parts.at(-1);
    if (last && !standsAlone(band, group, around)) last.to = group.to;
    else parts.push({ ...group });
  }
  if (parts.length <= 1) return [band];
  const shared = leadingTitles(band);
  return parts.flatMap(({ from }, at) => {
    const lowest = at === 0 ? 0 : from;
    const highest = (parts[at + 1]?.from ?? Number.POSITIVE_INFINITY) - 1;
    const [first, ...rest] = cutRows(
      band.flatMap((row) => row.cells.filter(({ column }) => column >= lowest && column <= highest)),
    );
    if (!first) return [];
    const over = at === 0 ? [] : shared.filter(({ row }) => row < (first[0]?.row ?? 0));
    return [[...over, ...first], ...rest];
  });
}

/** Titles over a whole band speak for every table in it. */
function leadingTitles(band: Region): Region {
  const end = band.findIndex(({ cells }) => cells.length > 1);
  return band.slice(0, Math.max(0, end));
}

const keysOfTables = new Set([
  'sieve',
  'specimen',
  'trial',
  'stockpile',
  'temperature',
  'time',
  'frequency',
  'quantity',
  'blend',
  'passes',
  'document',
]);

function standsAlone(
  band: Region,
  group: { from: number; to: number },
  { kinds, labels }: Surroundings,
): boolean {
  if (group.to === group.from) return false;
  const first: Cell[] = [];
  let beside = 0;
  for (const { cells } of band) {
    const at = cells.findIndex(({ column }) => column >= group.from);
    const cell = cells[at];
    if (!cell || cell.column !== group.from) continue;
    first.push(cell);
    if ((cells[at + 1]?.column ?? Number.POSITIVE_INFINITY) <= group.to) beside += 1;
    if (first.length > 60) break;
  }
  const texts = first.filter((cell) => kinds.of(cell) === 'text');
  const head = texts[0];
  if (!head) return false;
  const own = texts.slice(0, 3).map(({ text }) => labels.read(text));
  if (
    own.some(
      (meaning) =>
        meaning.quantities.length === 0 &&
        meaning.keys.some((key) => keysOfTables.has(key)) &&
        meaning.unknown.length === 0,
    )
  )
    return true;
  const labelled = texts.filter(({ text }) => saysWhat(labels.read(text)));
  return (
    texts.length >= first.length - 1 &&
    labelled.length * 2 >= texts.length &&
    beside * 2 >= texts.length &&
    beside > 1
  );
}
