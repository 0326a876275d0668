import { addressOf } from '#rules/reading/cell-address';
import type { Cell, CellGrid } from '#rules/reading/cell-grid';
import { type DecodeOptions, decoderVersion } from './decode-xlsx';
import { refuse, refuseTooLarge } from './refusal';

/** A text table as a grid with one sheet without a name. Numbers keep the digits that the file shows. */
export function decodeCsv(bytes: Buffer, options: DecodeOptions): CellGrid {
  const text = decodeText(bytes);
  const rows = splitRows(text, delimiterOf(text), options.fileName);
  const cells: Cell[] = [];
  let columnCount = 0;
  rows.forEach((fields, rowIndex) => {
    fields.forEach((field, columnIndex) => {
      if (field.trim() === '') return;
      cells.push(csvCell(field.trim(), rowIndex + 1, columnIndex + 1));
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

function csvCell(text: string, row: number, column: number): Cell {
  const isNumber = /^[+-]?(?:\d+(?:\.\d+)?|\.\d+)(?:e[+-]?\d+)?$/i.test(text);
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
