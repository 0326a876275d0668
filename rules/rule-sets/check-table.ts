import type { EditionView } from './edition-view';
import type { DocumentProblem } from './problem';
import { isKeyRange, type LimitTable } from './table';
import { rowsOverlap } from './table-keys';

export function checkTable(table: LimitTable, pointer: string, view: EditionView): DocumentProblem[] {
  const name = `Table ${table.id}`;
  const columnNames = table.columns.map((column) => column.name);
  const problems: DocumentProblem[] = [];
  const report = (at: string, detail: string, fix: string) =>
    problems.push({ pointer: `${pointer}${at}`, detail: `${name}: ${detail}`, fix });

  table.keys.forEach((key, i) => {
    if (key !== 'sieve' && !view.attribute(key)) {
      report(
        `/keys/${i}`,
        `the key ${key} is not a known attribute.`,
        'Declare the attribute, or use sieve.',
      );
    }
    if (columnNames.includes(key) || table.keys.indexOf(key) !== i) {
      report(`/keys/${i}`, `the name ${key} is used twice.`, 'Give keys and columns names of their own.');
    }
  });
  columnNames.forEach((column, i) => {
    if (columnNames.indexOf(column) !== i) {
      report(`/columns/${i}`, `the column ${column} is given more than once.`, 'Remove one.');
    }
  });
  checkRows(table, view, report);
  return problems;
}

type Report = (at: string, detail: string, fix: string) => void;

function checkRows(table: LimitTable, view: EditionView, report: Report): void {
  const known = new Set([...table.keys, ...table.columns.map((column) => column.name)]);
  table.rows.forEach((row, i) => {
    for (const field of Object.keys(row)) {
      if (!known.has(field)) {
        report(
          `/rows/${i}/${field}`,
          `row ${i + 1} has ${field}, which is no key and no column.`,
          'Remove it.',
        );
      }
    }
    for (const key of table.keys) checkKeyCell(table, i, key, view, report);
    for (const column of table.columns) {
      if (isKeyRange(row[column.name])) {
        report(
          `/rows/${i}/${column.name}`,
          `row ${i + 1} has a range in the column ${column.name}.`,
          'Ranges belong in key columns; give a number here.',
        );
      }
    }
    const other = table.rows.findIndex((earlier, j) => j < i && rowsOverlap(table, earlier, row));
    if (other >= 0) {
      report(
        `/rows/${i}`,
        `rows ${other + 1} and ${i + 1} overlap: a mix could match both.`,
        'Change one of the ranges; from is included, below is not.',
      );
    }
  });
}

function checkKeyCell(table: LimitTable, i: number, key: string, view: EditionView, report: Report): void {
  const cell = table.rows[i]?.[key];
  const at = `/rows/${i}/${key}`;
  if (cell === undefined || cell === null || Array.isArray(cell)) {
    report(
      at,
      `row ${i + 1} has no value of the key ${key}.`,
      'Give one value or a range with from and below.',
    );
    return;
  }
  const isNumeric = key === 'sieve' || view.attribute(key)?.type === 'number';
  if (isKeyRange(cell)) {
    if (!isNumeric)
      report(at, `row ${i + 1} has a range of ${key}, which is not a number.`, 'Give one value.');
    if (cell.from !== undefined && cell.below !== undefined && cell.from >= cell.below) {
      report(at, `row ${i + 1} has a range whose from is not below its end.`, 'Swap from and below.');
    }
  } else if (isNumeric && !Number.isFinite(Number(cell))) {
    report(
      at,
      `row ${i + 1} has ${JSON.stringify(cell)} where a number belongs.`,
      'Give a number or a range.',
    );
  }
}
