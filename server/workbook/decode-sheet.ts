import { addressOf, parseAddress } from '#rules/reading/cell-address';
import type { Cell, SheetGrid } from '#rules/reading/cell-grid';
import { refuse } from './refusal';
import { shiftFormula } from './shared-formula';
import { toCell } from './sheet-cells';
import { parsePart, type SheetPart } from './workbook-parts';
import { type CellStyle, unescapeText } from './workbook-styles';
import { isTrue, type XmlHandlers } from './xml-events';
import type { OpenZip } from './zip-reader';

export interface SheetContext {
  fileName: string;
  strings: string[];
  styles: CellStyle[];
  date1904: boolean;
  comments: Map<string, string>;
  /** Called for each cell that holds something; throws where there are too many. */
  onCell: () => void;
}

interface OpenCell {
  row: number;
  column: number;
  type: string;
  styleIndex: number | null;
  stored: string | null;
  formula: string | null;
  shared: string | null;
}

/** Streams one worksheet; only cells that hold something are kept, so formatted emptiness costs nothing. */
export async function decodeSheet(zip: OpenZip, part: SheetPart, context: SheetContext): Promise<SheetGrid> {
  const grid: SheetGrid = {
    name: part.name,
    hidden: part.hidden,
    rowCount: 0,
    columnCount: 0,
    cells: [],
    merges: [],
    columnWidths: {},
    hiddenRows: [],
    hiddenColumns: [],
  };
  const entry = zip.entries.get(part.path);
  if (!entry) {
    refuse(
      `Sheet ${part.name} of ${context.fileName} is listed but its part ${part.path} is missing.`,
      'Open the workbook in the spreadsheet program, save it again as .xlsx and upload that.',
    );
  }
  await parsePart(zip, entry, context.fileName, sheetHandlers(grid, context));
  grid.cells.sort((a, b) => a.row - b.row || a.column - b.column);
  return grid;
}

function sheetHandlers(grid: SheetGrid, context: SheetContext): XmlHandlers {
  const sharedFormulas = new Map<string, { formula: string; row: number; column: number }>();
  let row = 0;
  let column = 0;
  let cell: OpenCell | null = null;
  let reading: 'value' | 'formula' | 'inline' | null = null;
  let inReadingAid = false;

  function openCell(attributes: Record<string, string>): OpenCell {
    const at = parseAddress(attributes.r ?? '');
    // Files may leave addresses out; a cell then follows the one before it.
    column = at?.column ?? column + 1;
    const styleIndex = attributes.s === undefined ? null : Number(attributes.s);
    return {
      row: at?.row ?? row,
      column,
      type: attributes.t ?? 'n',
      styleIndex,
      stored: null,
      formula: null,
      shared: null,
    };
  }

  function closeCell(open: OpenCell): void {
    if (open.shared !== null) {
      const first = sharedFormulas.get(open.shared);
      if (open.formula !== null && open.formula !== '') {
        sharedFormulas.set(open.shared, { formula: open.formula, row: open.row, column: open.column });
      } else if (first) {
        open.formula = shiftFormula(first.formula, open.row - first.row, open.column - first.column);
      }
    }
    const kept = keep(open, context);
    if (!kept) return;
    context.onCell();
    grid.cells.push(kept);
    grid.rowCount = Math.max(grid.rowCount, kept.row);
    grid.columnCount = Math.max(grid.columnCount, kept.column);
  }

  return {
    open: (name, attributes) => {
      if (name === 'row') {
        row = attributes.r === undefined ? row + 1 : Number(attributes.r);
        column = 0;
        if (isTrue(attributes.hidden)) grid.hiddenRows.push(row);
      } else if (name === 'c') cell = openCell(attributes);
      else if (name === 'v') reading = 'value';
      else if (name === 'f' && cell) {
        reading = 'formula';
        cell.formula = '';
        if (attributes.t === 'shared') cell.shared = attributes.si ?? null;
      } else if (name === 't' && cell) reading = 'inline';
      else if (name === 'rPh') inReadingAid = true;
      else if (name === 'mergeCell' && attributes.ref) grid.merges.push(attributes.ref);
      else if (name === 'col') readColumn(grid, attributes);
    },
    text: (text) => {
      if (!cell || reading === null || inReadingAid) return;
      if (reading === 'formula') cell.formula = (cell.formula ?? '') + text;
      else cell.stored = (cell.stored ?? '') + text;
    },
    close: (name) => {
      if (name === 'v' || name === 'f' || name === 't') reading = null;
      else if (name === 'rPh') inReadingAid = false;
      else if (name === 'c' && cell) {
        closeCell(cell);
        cell = null;
      }
    },
  };
}

function keep(open: OpenCell, context: SheetContext): Cell | null {
  const address = addressOf(open.row, open.column);
  let stored = open.stored;
  if (open.type === 's' && stored !== null) stored = context.strings[Number(stored)] ?? '';
  else if (stored !== null && (open.type === 'str' || open.type === 'inlineStr'))
    stored = unescapeText(stored);
  const style = open.styleIndex === null ? context.styles[0] : context.styles[open.styleIndex];
  const kept = toCell({ ...open, address, stored, style }, context.date1904);
  const comment = context.comments.get(address) ?? null;
  return kept === null ? null : { ...kept, comment };
}

function readColumn(grid: SheetGrid, attributes: Record<string, string>): void {
  const first = Number(attributes.min);
  const last = Math.min(Number(attributes.max), first + 255);
  for (let column = first; column <= last; column += 1) {
    if (isTrue(attributes.hidden)) grid.hiddenColumns.push(column);
    if (attributes.width !== undefined) grid.columnWidths[String(column)] = Number(attributes.width);
  }
}
