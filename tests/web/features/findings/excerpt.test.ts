import { describe, expect, it } from 'vitest';
import type { Evidence } from '#rules/engine/finding';
import { type SheetGrid, sheetGridSchema } from '#rules/reading/cell-grid';
import { aFinding } from '#tests/builders/a-finding';
import {
  columnName,
  columnOf,
  excerptOf,
  rowsAround,
  rowsToAsk,
} from '../../../../web/features/findings/lib/excerpt';
import { mainTie, type Tie, tiesOf } from '../../../../web/features/findings/lib/ties';

const tie = (letter: string, cell: string, sheet = 'Summary'): Tie => ({ letter, sheet, cell, text: '' });
const cellAt = (address: string, text: string, kind: 'number' | 'text' = 'number') => ({
  address,
  row: Number(/\d+/.exec(address)?.[0]),
  column: columnOf(address),
  kind,
  value: text,
  text,
});
const grid = (cells: ReturnType<typeof cellAt>[]): SheetGrid =>
  sheetGridSchema.parse({
    name: 'Summary',
    hidden: false,
    rowCount: 40,
    columnCount: 8,
    cells,
    merges: [],
    columnWidths: {},
    hiddenRows: [],
    hiddenColumns: [],
  });

describe('the sheet in place', () => {
  it('shows six rows that hold the cell and the inputs above it', () => {
    const ties = [tie('a', 'H23'), tie('b', 'H19'), tie('c', 'H24')];
    expect(rowsAround(grid([]), tie('c', 'H24'), ties)).toEqual([19, 20, 21, 22, 23, 24]);
  });

  it('never starts above the first row', () => {
    expect(rowsAround(grid([]), tie('a', 'B1'), [tie('a', 'B1')])[0]).toBe(1);
    expect(rowsToAsk(tie('a', 'B1'))).toEqual({ from: 1, to: 7 });
  });

  it('keeps the head of the column over the rows of a long table', () => {
    const sheet = grid([
      cellAt('V3', 'Elsewhere', 'text'),
      cellAt('V6', 'Dust proportion', 'text'),
      cellAt('V7', 'ratio', 'text'),
    ]);
    expect(rowsAround(sheet, tie('a', 'V20'), [tie('a', 'V20')])).toEqual([6, 19, 20, 21, 22, 23]);
  });

  it('never puts a head in place of the cell or of a tied one', () => {
    const sheet = grid([cellAt('H1', 'Value', 'text')]);
    const ties = [tie('a', 'H15'), tie('b', 'H20')];
    expect(rowsAround(sheet, tie('b', 'H20'), ties)).toEqual([15, 16, 17, 18, 19, 20]);
  });

  it('keeps the label of the row in sight with the cell, under its own column letters', () => {
    const sheet = grid([cellAt('A24', 'Dust ratio', 'text'), cellAt('G24', '0.9'), cellAt('H24', '1.1')]);
    const chosen = tie('c', 'H24');
    const excerpt = excerptOf({
      sheet,
      uses: [{ sheet: 'Summary', cell: 'H24', use: 'read', taken: 'Dust proportion' }],
      tie: chosen,
      ties: [chosen],
      rows: [23, 24],
    });
    expect(excerpt.columns.map((column) => column.name)).toEqual(['A', 'G', 'H']);
    const hit = excerpt.rows[1]?.cells.find((cell) => cell.address === 'H24');
    expect(hit).toMatchObject({ text: '1.1', isHit: true, use: 'read', letters: ['c'] });
    expect(excerpt.rows[0]?.cells.every((cell) => cell.text === '')).toBe(true);
  });

  it('counts columns past Z as the sheet does', () => {
    expect(columnName(27)).toBe('AA');
    expect(columnOf('AA7')).toBe(27);
    expect(columnOf(`${columnName(702)}1`)).toBe(702);
  });
});

describe('the lettered ties', () => {
  const source = (cell: string) => ({ sheet: 'Summary', cell, text: '1' });
  const evidence: Evidence = {
    quantity: 'dust-proportion',
    value: 1.263,
    unit: '1',
    origin: 'recomputed',
    source: null,
    reported: { value: 1.1, text: '1.1', source: source('H24') },
    inputs: [
      { quantity: 'percent-passing', value: 5.6, unit: '%', origin: 'measured', source: source('H23') },
      { quantity: 'binder-content', value: 5.3, unit: '%', origin: 'reported', source: source('H19') },
      { quantity: 'percent-passing', value: 5.6, unit: '%', origin: 'measured', source: source('H23') },
    ],
  };

  it('run through the inputs first and give one cell one letter', () => {
    const ties = tiesOf(aFinding({ evidence: [evidence] }));
    expect(ties.map(({ letter, cell }) => `${letter} ${cell}`)).toEqual(['a H23', 'b H19', 'c H24']);
  });

  it('open the sheet at what the workbook reports', () => {
    const finding = aFinding({ evidence: [evidence] });
    expect(mainTie(finding, tiesOf(finding))?.cell).toBe('H24');
    expect(mainTie(aFinding({ evidence: [] }), [])).toBeNull();
  });
});
