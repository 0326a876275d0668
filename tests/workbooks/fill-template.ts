import type ExcelJS from 'exceljs';
import { labelKey } from '#rules/reading/plain-text';
import { matchHeader } from '#rules/reading/sheet-index';
import { headerRow } from '#rules/reading/template-layout';

export type FilledValue =
  | string
  | number
  | Date
  | { formula: string; result: number }
  /** A number under a number format of its own. */
  | { value: number; format: string }
  | null;

export interface TemplateContent {
  /** Sheet of labels: label to value. */
  submittal: Record<string, FilledValue>;
  /** Sheet name to its rows; each row is header (without unit) to value. */
  tables: Record<string, Record<string, FilledValue>[]>;
  /** Sheet name to header to test method. */
  methods: Record<string, Record<string, string>>;
  gradation: {
    sievesMm: number[];
    stockpiles: { name: string; passing: FilledValue[] }[];
    /** Header of a column behind the stockpiles to its values. */
    columns: Record<string, FilledValue[]>;
  };
}

/** Fills a template as a laboratory would: by its labels and headers, never by addresses. */
export function fillTemplate(workbook: ExcelJS.Workbook, content: TemplateContent): void {
  const submittal = sheetOf(workbook, 'Submittal');
  for (const [label, value] of Object.entries(content.submittal)) {
    setValue(submittal.getCell(rowOf(submittal, label), 2), value);
  }
  for (const [name, rows] of Object.entries(content.tables)) {
    const sheet = sheetOf(workbook, name);
    const hasMethods = sheet.getCell(headerRow + 1, 1).value === 'Method';
    for (const [header, method] of Object.entries(content.methods[name] ?? {})) {
      sheet.getCell(headerRow + 1, columnOf(sheet, header)).value = method;
    }
    rows.forEach((row, at) => {
      for (const [header, value] of Object.entries(row)) {
        const cell = sheet.getCell(headerRow + (hasMethods ? 2 : 1) + at, columnOf(sheet, header));
        setValue(cell, value);
      }
    });
  }
  fillGradation(sheetOf(workbook, 'Gradation'), content.gradation);
}

function setValue(cell: ExcelJS.Cell, value: FilledValue): void {
  if (value !== null && typeof value === 'object' && 'format' in value) {
    cell.value = value.value;
    cell.numFmt = value.format;
  } else cell.value = value;
}

export function sheetOf(workbook: ExcelJS.Workbook, name: string): ExcelJS.Worksheet {
  const sheet = workbook.getWorksheet(name);
  if (!sheet) throw new Error(`the template has no sheet ${name}`);
  return sheet;
}

export function columnOf(sheet: ExcelJS.Worksheet, header: string): number {
  for (let column = 1; column <= sheet.columnCount; column += 1) {
    const text = sheet.getCell(headerRow, column).text;
    if (text !== '' && matchHeader(text, header)) return column;
  }
  throw new Error(`${sheet.name} has no column ${header}`);
}

function rowOf(sheet: ExcelJS.Worksheet, label: string): number {
  for (let row = headerRow + 1; row <= sheet.rowCount; row += 1) {
    if (labelKey(sheet.getCell(row, 1).text) === labelKey(label)) return row;
  }
  throw new Error(`${sheet.name} has no line ${label}`);
}

function fillGradation(sheet: ExcelJS.Worksheet, gradation: TemplateContent['gradation']): void {
  const rows = gradation.sievesMm.map((opening) => {
    for (let row = headerRow + 2; row <= sheet.rowCount; row += 1) {
      if (sheet.getCell(row, 1).value === opening) return row;
    }
    throw new Error(`the template has no sieve ${opening}`);
  });
  gradation.stockpiles.forEach(({ name, passing }, at) => {
    sheet.getCell(headerRow + 1, at + 2).value = name;
    passing.forEach((value, index) => {
      setValue(sheet.getCell(rows[index] as number, at + 2), value);
    });
  });
  for (const [header, values] of Object.entries(gradation.columns)) {
    const column = columnOf(sheet, header);
    values.forEach((value, index) => {
      setValue(sheet.getCell(rows[index] as number, column), value);
    });
  }
}
