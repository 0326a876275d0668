import type { Cell } from '../cell-grid';
import { plainText } from '../plain-text';
import { placeOf } from '../reading-log';
import { unreadReasons } from '../unread-reason';
import type { LabelMeaning } from './label-meaning';
import { type Group, passOver, readValue, roleReasons, saysOutcome } from './read-value';
import type { TableRow } from './table';
import type { TableContext } from './table-context';
import type { RowFacts } from './table-rows';

export function readRow(row: TableRow, { facts, group, labelsAt }: RowReading, context: TableContext): void {
  const { columns, kinds, reading, index } = context;
  for (const cell of row.cells) {
    const column = columns.get(cell.column);
    const place = placeOf(index.sheet, cell);
    if (!column || reading.log.isUsed(place)) continue;
    const kind = kinds.of(cell);
    if (context.told.at(index.sheet.name, cell)?.says.kind === 'reading') {
      const labels = labelsAt(cell.column);
      readValue(cell, { column, facts, group, labels, unit: facts.unit }, context);
      continue;
    }
    if (kind === 'none' && !(column.kind === 'value' && saysOutcome(cell))) {
      reading.log.passOver(place, unreadReasons.noValue);
      continue;
    }
    if (kind === 'unit') {
      reading.log.use(place, 'label', 'A unit.');
      continue;
    }
    if (column.kind === 'aside' || column.kind === 'label') {
      passOver(
        cell,
        column.role
          ? roleReasons[column.role]
          : kind === 'text'
            ? unreadReasons.remark
            : unreadReasons.identifier,
        context,
      );
      continue;
    }
    if (column.kind !== 'value') continue;
    const labels = labelsAt(cell.column);
    readValue(
      cell,
      { column, facts, group, labels, unit: facts.unit ?? unitAfter(row, cell, context) },
      context,
    );
  }
}

interface RowReading {
  facts: RowFacts;
  group: Group;
  labelsAt: (column: number) => LabelMeaning[];
}

function unitAfter(row: TableRow, cell: Cell, { kinds, labels, columns }: TableContext): string | null {
  const next = row.cells.find(({ column }) => column === cell.column + 1);
  if (!next || kinds.of(next) !== 'unit' || (columns.get(next.column)?.heads.length ?? 0) > 0) return null;
  return labels.read(`x (${plainText(next.text).replace(/[()[\]]/g, '')})`).unit;
}
