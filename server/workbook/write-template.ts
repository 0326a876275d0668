import ExcelJS from 'exceljs';
import { columnLetters } from '#rules/reading/cell-address';
import { templateCells } from '#rules/reading/template-cells';
import type { TemplateColumn } from '#rules/reading/template-columns';
import {
  firstDataRow,
  headerRow,
  listsSheet,
  type TemplateGradation,
  type TemplateLabels,
  type TemplateLayout,
  type TemplateTable,
  templateLayout,
  templateVersion,
} from '#rules/reading/template-layout';
import { stampLine, stampProperty, stampText } from '#rules/reading/template-stamp';
import type { MixRecord } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import { writeWithProperties } from './stamp-workbook';

export interface TemplateOptions {
  /** Hash of the resolved edition, which the workbook carries as its stamp. */
  editionHash: string;
  /** Attributes that the project states, filled in beforehand: `{ name: value }`. */
  projectFacts?: Record<string, string | number | boolean>;
  /** An invented mix to fill it in with; the workbook says so. */
  example?: MixRecord;
}

/** The workbook that a laboratory fills in for an edition: no macros, a named place for all that is measured. */
export async function writeTemplate(edition: ResolvedEdition, options: TemplateOptions): Promise<Buffer> {
  return finishTemplate(buildTemplate(edition, options), options.editionHash);
}

/** The template before it is stamped and written, so that data can be filled in. */
export function buildTemplate(edition: ResolvedEdition, options: TemplateOptions): ExcelJS.Workbook {
  const layout = templateLayout(edition);
  const workbook = new ExcelJS.Workbook();
  workbook.title = `${edition.title}, edition ${edition.edition}`;
  // A fixed instant: the same edition gives the same template.
  workbook.created = new Date(Date.UTC(2026, 0, 1));
  workbook.modified = workbook.created;
  for (const part of layout.sheets) {
    const sheet = workbook.addWorksheet(part.name);
    sheet.getCell('A1').value = `${edition.title}, edition ${edition.edition}: ${part.name}`;
    sheet.getCell('A1').font = { bold: true, size: 13 };
    sheet.getCell('A2').value = part.instruction;
    sheet.getCell('A2').font = { italic: true };
    if (part.kind === 'labels') {
      sheet.getCell('A3').value = stampLine({ version: templateVersion, editionHash: options.editionHash });
      writeLabels(sheet, part, options.projectFacts ?? {});
    } else if (part.kind === 'gradation') writeGradation(sheet, part);
    else writeTable(sheet, part, layout);
  }
  writeLists(workbook, layout);
  if (options.example) writeExample(workbook, edition, options.example);
  return workbook;
}

function writeExample(workbook: ExcelJS.Workbook, edition: ResolvedEdition, example: MixRecord): void {
  for (const { sheet, row, column, value } of templateCells(edition, example).cells) {
    const cell = workbook.getWorksheet(sheet)?.getCell(row, column);
    if (cell) cell.value = typeof value === 'object' ? new Date(`${value.date}T00:00:00Z`) : value;
  }
  const instruction = workbook.getWorksheet('Submittal')?.getCell('A2');
  if (instruction) instruction.value = `${exampleMark} ${instruction.text}`;
}

/** Stands before the first sheet's instruction. */
const exampleMark = 'An invented example: no mix, laboratory or result in this workbook is real.';

export function finishTemplate(workbook: ExcelJS.Workbook, editionHash: string): Promise<Buffer> {
  return writeWithProperties(workbook, {
    [stampProperty]: stampText({ version: templateVersion, editionHash }),
  });
}

function writeLabels(
  sheet: ExcelJS.Worksheet,
  part: TemplateLabels,
  facts: NonNullable<TemplateOptions['projectFacts']>,
): void {
  writeHeader(sheet, ['Item', 'Value', 'Unit']);
  part.entries.forEach((entry, at) => {
    const row = headerRow + 1 + at;
    sheet.getCell(row, 1).value = entry.label;
    sheet.getCell(row, 3).value = entry.unit;
    const value = sheet.getCell(row, 2);
    value.alignment = { horizontal: 'right' };
    const fact = facts[entry.quantity.replace(/^attribute:/, '')];
    if (fact !== undefined) value.value = typeof fact === 'boolean' ? (fact ? 'yes' : 'no') : fact;
    if (entry.list.length > 0) value.dataValidation = inlineList(entry.list);
  });
  sheet.getColumn(1).width = 52;
  sheet.getColumn(2).width = 26;
  sheet.getColumn(3).width = 16;
}

function writeTable(sheet: ExcelJS.Worksheet, part: TemplateTable, layout: TemplateLayout): void {
  writeHeader(sheet, part.columns.map(headerText));
  const firstRow = firstDataRow(part);
  if (part.hasMethods) {
    sheet.getCell(headerRow + 1, 1).value = 'Method';
    sheet.getRow(headerRow + 1).font = { italic: true };
  }
  part.columns.forEach((column, at) => {
    const number = at + 1;
    sheet.getColumn(number).width = Math.max(11, Math.min(26, headerText(column).length * 0.6));
    if (part.hasMethods && column.role === 'value' && column.list.length > 0) {
      sheet.getCell(headerRow + 1, number).dataValidation = inlineList(column.list);
    }
    for (let row = firstRow; row < firstRow + part.rows; row += 1) {
      const cell = sheet.getCell(row, number);
      if (column.role === 'value' && column.decimals !== null) cell.numFmt = decimalFormat(column.decimals);
      if (['testedOn', 'date', 'validTo'].includes(column.names ?? '')) cell.numFmt = 'yyyy-mm-dd';
      if (column.role !== 'value' && column.list.length > 0)
        cell.dataValidation = validation(column.list, layout);
    }
  });
}

function writeGradation(sheet: ExcelJS.Worksheet, part: TemplateGradation): void {
  const afterStockpiles = part.stockpiles + 2;
  writeHeader(sheet, ['Sieve, mm', 'Stockpiles']);
  sheet.mergeCells(headerRow, 1, headerRow + 1, 1);
  sheet.mergeCells(headerRow, 2, headerRow, part.stockpiles + 1);
  part.columns.forEach((column, at) => {
    const cell = sheet.getCell(headerRow, afterStockpiles + at);
    cell.value = headerText(column);
    cell.font = { bold: true };
    sheet.mergeCells(headerRow, afterStockpiles + at, headerRow + 1, afterStockpiles + at);
  });
  part.sievesMm.forEach((openingMm, at) => {
    const row = headerRow + 2 + at;
    sheet.getCell(row, 1).value = openingMm;
    sheet.getCell(row, 1).dataValidation = inlineList(part.sievesMm.map(String));
    for (let column = 2; column < afterStockpiles + part.columns.length; column += 1) {
      sheet.getCell(row, column).numFmt = decimalFormat(1);
    }
  });
  for (let column = 1; column < afterStockpiles + part.columns.length; column += 1)
    sheet.getColumn(column).width = 12;
}

function writeLists(workbook: ExcelJS.Workbook, layout: TemplateLayout): void {
  const sheet = workbook.addWorksheet(listsSheet, { state: 'hidden' });
  layout.lists.forEach(({ name, values }, at) => {
    [name, ...values].forEach((value, row) => {
      sheet.getCell(row + 1, at + 1).value = value;
    });
  });
}

function writeHeader(sheet: ExcelJS.Worksheet, texts: string[]): void {
  texts.forEach((text, at) => {
    const cell = sheet.getCell(headerRow, at + 1);
    cell.value = text;
    cell.font = { bold: true };
    cell.alignment = { wrapText: true, vertical: 'top' };
    cell.border = { bottom: { style: 'thin' } };
  });
  sheet.views = [{ state: 'frozen', ySplit: headerRow }];
}

export function headerText(column: TemplateColumn): string {
  return column.unit === null ? column.header : `${column.header}, ${column.unit}`;
}

function decimalFormat(decimals: number): string {
  return decimals === 0 ? '0' : `0.${'0'.repeat(decimals)}`;
}

function validation(list: string[], layout: TemplateLayout): ExcelJS.DataValidation {
  const [first = ''] = list;
  if (!first.startsWith('list:')) return inlineList(list);
  const at = layout.lists.findIndex(({ name }) => `list:${name}` === first);
  const count = layout.lists[at]?.values.length ?? 0;
  const column = columnLetters(at + 1);
  return listOf(`${listsSheet}!$${column}$2:$${column}$${count + 1}`);
}

/** A list inside the cell may take 255 characters; a longer one is left to the reader. */
function inlineList(values: string[]): ExcelJS.DataValidation {
  let text = values.join(',');
  for (let kept = values.length; text.length > 250 && kept > 0; kept -= 1)
    text = values.slice(0, kept).join(',');
  return listOf(`"${text}"`);
}

/** Other values are allowed: the list helps, the reader decides. */
function listOf(formula: string): ExcelJS.DataValidation {
  return { type: 'list', allowBlank: true, formulae: [formula], showErrorMessage: false };
}
