import exceljs from 'exceljs';
import type { Cell } from '#rules/reading/cell-grid';
import type { Book } from './book';

/** A laid-out workbook as a file: the cells as they were put, with merges, hidden parts and remarks. */
export async function writeBook(book: Book): Promise<{ bytes: Buffer; extension: 'xlsx' | 'csv' }> {
  const [only] = book.contents();
  if (only?.name === '') return { bytes: Buffer.from(textOf(only)), extension: 'csv' };
  const workbook = new exceljs.Workbook();
  for (const laid of book.contents()) {
    const sheet = workbook.addWorksheet(laid.name, { state: laid.hidden ? 'hidden' : 'visible' });
    for (const cell of laid.cells.values()) {
      const written = sheet.getCell(cell.address);
      written.value = cellValue(cell);
      if (cell.format !== null) written.numFmt = cell.format;
      if (cell.comment !== null) written.note = cell.comment;
    }
    for (const merge of laid.merges) sheet.mergeCells(merge);
    for (const row of laid.hiddenRows) sheet.getRow(row).hidden = true;
    for (const column of laid.hiddenColumns) sheet.getColumn(column).hidden = true;
  }
  return { bytes: Buffer.from(await workbook.xlsx.writeBuffer()), extension: 'xlsx' };
}

/** Text files have one sheet without a name; a semicolon leaves the comma to the decimals. */
function textOf(sheet: ReturnType<Book['contents']>[number]): string {
  const { cells, rowCount, columnCount } = sheet.toGrid();
  const rows = Array.from({ length: rowCount }, () => Array.from({ length: columnCount }, () => ''));
  for (const { row, column, text } of cells) (rows[row - 1] as string[])[column - 1] = text;
  return rows.map((row) => row.join(';')).join('\n');
}

function cellValue(cell: Cell): exceljs.CellValue {
  if (cell.kind === 'formula-without-result') return { formula: cell.formula ?? '0' };
  const value = plainValue(cell);
  return cell.formula === null ? value : { formula: cell.formula, result: value };
}

function plainValue(cell: Cell): string | number | boolean | Date | exceljs.CellErrorValue {
  switch (cell.kind) {
    case 'number':
      return Number(cell.value);
    case 'boolean':
      return cell.value === 'true';
    case 'date':
      return new Date(`${cell.value.slice(0, 10)}T00:00:00Z`);
    case 'error':
      return { error: cell.value as exceljs.CellErrorValue['error'] };
    default:
      return cell.value;
  }
}
