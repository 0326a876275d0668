import { expect, it } from 'vitest';
import { cellSchema } from '#rules/reading/cell-grid';
import { blocksOf } from '#server/db/queries/cell-grids';

const cells = (rows: number[], columns: number) =>
  rows.flatMap((row) =>
    Array.from({ length: columns }, (_, at) =>
      cellSchema.parse({
        address: `C${row}.${at}`,
        row,
        column: at + 1,
        kind: 'number',
        value: '1',
        text: '1',
      }),
    ),
  );
const range = (from: number, to: number) => Array.from({ length: to - from + 1 }, (_, at) => from + at);
const shape = (given: ReturnType<typeof cells>) =>
  [...blocksOf(given)].map(({ fromRow, toRow, cells: { length } }) => [fromRow, toRow, length]);

it('cuts a sheet into blocks of 200 rows, and keeps every cell', () => {
  expect(shape(cells(range(1, 450), 2))).toEqual([
    [1, 200, 400],
    [201, 400, 400],
    [401, 450, 100],
  ]);
});

it('begins a block at the first row that holds something, however far down', () => {
  expect(shape(cells([5, 10, 900_000], 1))).toEqual([
    [5, 10, 2],
    [900_000, 900_000, 1],
  ]);
});

it('cuts a wide sheet between rows, never within one', () => {
  expect(shape(cells(range(1, 3), 15_000))).toEqual([
    [1, 2, 30_000],
    [3, 3, 15_000],
  ]);
});

it('makes no block of a sheet without cells', () => {
  expect(shape([])).toEqual([]);
});
