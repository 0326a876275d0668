import { addressOf } from '#rules/reading/cell-address';
import type { Cell, CellGrid } from '#rules/reading/cell-grid';
import { type DecodeOptions, decoderVersion } from './decode-xlsx';
import { refuse, refuseTooLarge } from './refusal';

/** A text table as a grid with one sheet without a name. Numbers keep the digits that the file shows. */
export function decodeCsv(bytes: Buffer, options: DecodeOptions): CellGrid {
  const text = decodeText(bytes);
  const { body, delimiter } = delimited(text);
  const rows = splitRows(body, delimiter, options.fileName);
  const hasCommas =
    delimiter !== ',' && rows.some((fields) => fields.some((field) => decimalComma.test(field)));
  const cells: Cell[] = [];
  let columnCount = 0;
  rows.forEach((fields, rowIndex) => {
    fields.forEach((field, columnIndex) => {
      if (field.trim() === '') return;
      cells.push(csvCell(field.trim(), { row: rowIndex + 1, column: columnIndex + 1, hasCommas }));
      columnCount = Math.max(columnCount, columnIndex + 1);
    });
  });
  if (cells.length > options.limits.cells) {
    refuseTooLarge(
      `${options.fileName} holds more than ${options.limits.cells} filled cells.`,
      'Remove the rows that the submittal does not need and upload it again.',
    );
  }
  options.onProgress(1, 1);
  const sheet = {
    name: '',
    hidden: false,
    rowCount: rows.length,
    columnCount,
    cells,
    merges: [],
    columnWidths: {},
    hiddenRows: [],
    hiddenColumns: [],
  };
  return { decoder: decoderVersion, date1904: false, properties: {}, sheets: [sheet] };
}

/** `4,2` and `2,412`, which in a file parted by semicolons or tabs are no lists. */
const decimalComma = /^\s*[<>]?\s*[+-]?\d+,\d+\s*%?\s*$/;

/** Beside decimal commas a point groups thousands, so what `1.250` means is for the reading to tell. */
function csvCell(
  text: string,
  { row, column, hasCommas }: { row: number; column: number; hasCommas: boolean },
): Cell {
  const isNumber =
    /^[+-]?(?:\d+(?:\.\d+)?|\.\d+)(?:e[+-]?\d+)?$/i.test(text) && !(hasCommas && text.includes('.'));
  return {
    address: addressOf(row, column),
    row,
    column,
    kind: isNumber ? 'number' : 'text',
    value: isNumber ? String(Number(text)) : text,
    text,
    format: null,
    formula: null,
    cached: false,
    comment: null,
    bold: false,
  };
}

function decodeText(bytes: Buffer): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le').decode(bytes.subarray(2));
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be').decode(bytes.subarray(2));
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder('windows-1252').decode(bytes);
  }
}

/** A first line `sep=;` is a spreadsheet program's own note of the separator and no row. */
function delimited(text: string): { body: string; delimiter: string } {
  const noted = /^sep=(.)(?:\r\n|\r|\n)/i.exec(text);
  if (noted?.[1]) return { body: text.slice(noted[0].length), delimiter: noted[1] };
  return { body: text, delimiter: delimiterOf(text) };
}

/** The separator that most lines agree on, counted outside quotes. */
function delimiterOf(text: string): string {
  const lines = text
    .slice(0, 20_000)
    .split(/\r\n|\r|\n/)
    .slice(0, 50)
    .filter((line) => line.trim() !== '');
  const bare = lines.map((line) => line.replace(/"[^"]*"/g, ''));
  const score = (delimiter: string) => bare.filter((line) => line.includes(delimiter)).length;
  const most = Math.max(...['\t', ';', ','].map(score), 1);
  return ['\t', ';', ','].find((delimiter) => score(delimiter) >= most * 0.8) ?? ',';
}

function splitRows(text: string, delimiter: string, fileName: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let field = '';
  let quoted = false;
  for (let index = 0; index < text.length; index += 1) {
    const character = text[index] as string;
    if (quoted) {
      if (character !== '"') field += character;
      else if (text[index + 1] === '"') {
        field += '"';
        index += 1;
      } else quoted = false;
    } else if (character === '"' && field === '') quoted = true;
    else if (character === delimiter) {
      row.push(field);
      field = '';
    } else if (character === '\n' || character === '\r') {
      if (character === '\r' && text[index + 1] === '\n') index += 1;
      rows.push([...row, field]);
      row = [];
      field = '';
    } else field += character;
  }
  if (quoted) {
    refuse(
      `${fileName} opens a quotation mark in row ${rows.length + 1} that is never closed.`,
      'Close it, or save the table again as .csv from the spreadsheet program.',
    );
  }
  if (field !== '' || row.length > 0) rows.push([...row, field]);
  return rows;
}
