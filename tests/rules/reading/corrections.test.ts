import { describe, expect, it } from 'vitest';
import type { Correction, Said } from '#rules/reading/correction';
import { readWorkbook } from '#rules/reading/interpret';
import { mappingSchema } from '#rules/reading/mapping';
import { readAnyLayout } from '#rules/reading/read-any-layout';
import { unreadReasons } from '#rules/reading/unread-reason';
import { demoEdition } from '#tests/workbooks/demo/write-demo-workbooks';
import { gridOf } from '#tests/workbooks/grid-of';
import { typedSheet } from '#tests/workbooks/typed-sheet';

const edition = demoEdition();
const table = `
Trial | Specimen | Gmb | Gmm
A | 1 | 2.371 | 2.512
A | 2 | 2.374 | 2.511
 | Average | 2.3725 | 2.5115`;
const grid = gridOf({ Data: typedSheet(table) });

const is = (quantity: string, more: Partial<Extract<Said, { kind: 'reading' }>> = {}): Said => ({
  kind: 'reading',
  quantity,
  unit: null,
  at: {},
  without: [],
  ...more,
});
const of = (range: string, says: Said): Correction => ({ sheet: 'Data', range, says });

/** What a cell holds now: "bulk-specific-gravity-mix specimen=1 trial=A 2.371", or null. */
function at(address: string, corrections: Correction[], read = byHeadings) {
  const found = read(corrections).record.readings.find(({ source }) => source?.cell === address);
  if (!found) return null;
  const conditions = Object.entries(found.at)
    .toSorted(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, each]) => `${name}=${each}`);
  return [found.quantity, ...conditions, found.value].join(' ');
}

const byHeadings = (corrections: Correction[]) => readAnyLayout({ grid, edition, answers: [], corrections });

const mapping = mappingSchema.parse({
  laboratory: 'Plant',
  fingerprint: 'x',
  version: 1,
  rules: ['Gmb', 'Gmm'].map((header) => ({
    id: header,
    anchor: { sheet: 'Data', header: [header] },
    axis: 'down',
    quantity: header === 'Gmb' ? 'bulk-specific-gravity-mix' : 'maximum-specific-gravity',
    at: { trial: { header: ['Trial'] }, specimen: { header: ['Specimen'] } },
  })),
});
const byMapping = (corrections: Correction[]) =>
  readWorkbook({ grid, mapping, edition, answers: [], corrections });

describe.each([
  ['a layout that is read by its headings', byHeadings],
  ['a layout that is read by its own mapping', byMapping],
])('a correction in %s', (_name, read) => {
  it('says what a cell is and leaves whose it is to its row', () => {
    const said = [of('C2', is('bulk-specific-gravity-mix', { at: { gyrations: 'maximum' } }))];
    expect(at('C2', said, read)).toBe('bulk-specific-gravity-mix gyrations=maximum specimen=1 trial=A 2.371');
    expect(at('C3', said, read)).toBe('bulk-specific-gravity-mix specimen=2 trial=A 2.374');
  });

  it('takes conditions away that do not hold, and gives others', () => {
    const said = [of('C3', is('bulk-specific-gravity-mix', { at: { trial: 'B' }, without: ['specimen'] }))];
    expect(at('C3', said, read)).toBe('bulk-specific-gravity-mix trial=B 2.374');
  });

  it('holds for a block, and the last one said of a cell wins', () => {
    const said = [of('C2:D3', { kind: 'not a reading' }), of('D2', is('maximum-specific-gravity'))];
    expect([at('C2', said, read), at('D3', said, read)]).toEqual([null, null]);
    expect(at('D2', said, read)).toBe('maximum-specific-gravity specimen=1 trial=A 2.512');
    const unused = read(said).unread.filter(({ reason }) => reason === unreadReasons.saidToBeNone);
    expect(unused.map(({ cell }) => cell).toSorted()).toEqual(['C2', 'C3', 'D3']);
  });

  it('is no word for what cannot be: a value out of all reason stays a doubt', () => {
    const said = [of('C2', is('air-voids', { unit: 'kPa' }))];
    const { doubts, record } = read(said);
    expect(doubts.map(({ cell }) => cell)).toContain('C2');
    expect(record.readings.some(({ source }) => source?.cell === 'C2')).toBe(false);
  });

  it('to a sheet that is not there changes nothing', () => {
    const elsewhere = { ...of('C2', { kind: 'not a reading' }), sheet: 'Other' };
    expect(read([elsewhere]).record).toEqual(read([]).record);
  });
});

describe('a correction of a column', () => {
  it('makes results of what was taken for keys', () => {
    const keyed = gridOf({ Data: typedSheet('Trial | Specimen | Sample\nA | 1 | 2.371\nA | 2 | 2.374') });
    const corrections = [of('C2:C3', is('bulk-specific-gravity-mix'))];
    const { record } = readAnyLayout({ grid: keyed, edition, answers: [], corrections });
    expect(record.readings.map(({ at: conditions, value }) => [conditions, value])).toEqual([
      [{ trial: 'A', specimen: '1' }, 2.371],
      [{ trial: 'A', specimen: '2' }, 2.374],
    ]);
  });
});
