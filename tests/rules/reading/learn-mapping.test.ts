import { describe, expect, it } from 'vitest';
import type { Correction, Said } from '#rules/reading/correction';
import { closestLayout, fingerprintOf, likeness } from '#rules/reading/fingerprint';
import { learnMapping } from '#rules/reading/learn-mapping';
import { type Mapping, mappingFormat } from '#rules/reading/mapping';
import { mergeMapping } from '#rules/reading/merge-mapping';
import { readAnyLayout } from '#rules/reading/read-any-layout';
import type { Answer } from '#rules/reading/reading-result';
import fc from '#tests/builders/seeded-fast-check';
import { demoEdition } from '#tests/workbooks/demo/write-demo-workbooks';
import { gridOf } from '#tests/workbooks/grid-of';
import { typedSheet } from '#tests/workbooks/typed-sheet';

const edition = demoEdition();

const grid = (sheets: Record<string, string>) =>
  gridOf(Object.fromEntries(Object.entries(sheets).map(([name, text]) => [name, typedSheet(text)])));

interface Taught {
  corrections?: Correction[];
  answers?: Answer[];
  mapping?: Mapping | null;
}

function read(
  sheets: Record<string, string>,
  { corrections = [], answers = [], mapping = null }: Taught = {},
) {
  const result = readAnyLayout({ grid: grid(sheets), edition, answers, corrections, mapping });
  return {
    ...result,
    /** "Data C3 bulk-specific-gravity-mix specimen=1 trial=A 2.371" */
    said: result.record.readings.map(({ quantity, value, at, source }) => {
      const conditions = Object.entries(at)
        .toSorted(([a], [b]) => (a < b ? -1 : 1))
        .map(([name, each]) => `${name}=${each}`);
      return [source?.sheet, source?.cell, quantity, ...conditions, value].join(' ');
    }),
    doubted: result.doubts.map(({ cell }) => cell),
    departed: result.departures.map(({ kind, cell }) => `${kind} ${cell}`),
  };
}

function teach(sheets: Record<string, string>, taught: Taught) {
  const unanswered = read(sheets, { ...taught, answers: [] });
  const result = read(sheets, taught);
  const learned = learnMapping({
    grid: grid(sheets),
    edition,
    corrections: taught.corrections ?? [],
    read: { ...result, doubts: unanswered.doubts },
    base: taught.mapping ?? null,
  });
  return { ...learned, mapping: mappingWith(learned.rules, learned.fingerprint) };
}

const mappingWith = (rules: Mapping['rules'], fingerprint = 'x'): Mapping => ({
  format: mappingFormat,
  laboratory: 'Plant',
  fingerprint,
  version: 1,
  rest: 'headings',
  rules,
});

const is = (quantity: string, more: Partial<Extract<Said, { kind: 'reading' }>> = {}): Said => ({
  kind: 'reading',
  quantity,
  unit: null,
  at: {},
  without: [],
  ...more,
});
const gmb = is('bulk-specific-gravity-mix');
const gmm = is('maximum-specific-gravity');
const of = (sheet: string, range: string, says: Said): Correction => ({ sheet, range, says });

const own = `
Trial | Specimen | K1 | K2 | Va (%)
A | 1 | 2.371 | 2.512 | 5.6
A | 2 | 2.374 | 2.511 | 5.5
B | 1 | 2.391 | 2.499 | 4.3
B | 2 | 2.394 | 2.498 | 4.2`;
const taught = teach({ Data: own }, { corrections: [of('Data', 'C2:C5', gmb), of('Data', 'D2:D5', gmm)] });
const known = taught.mapping;

describe('a learned mapping', () => {
  it('says what stands under each heading, with nothing of the values or of the sheet', () => {
    expect(taught.rules.map(({ anchor, axis, quantity, at }) => [anchor.header, axis, quantity, at])).toEqual(
      expect.arrayContaining([
        [['K1'], 'down', 'bulk-specific-gravity-mix', {}],
        [['K2'], 'down', 'maximum-specific-gravity', {}],
      ]),
    );
    expect(taught.notLearned).toEqual([]);
  });

  it('reads the same quantities at other values, further rows, another place and another sheet, without doubt', () => {
    const moved = `
Plant 4 |
 | |
 | Trial | Specimen | K1 | K2 | Va (%)
 | C | 1 | 2.401 | 2.502 | 4.0
 | C | 2 | 2.403 | 2.503 | 4.1
 | C | 3 | 2.402 | 2.501 | 4.2`;
    const { said, doubted, departed } = read({ Elsewhere: moved }, { mapping: known });
    expect([doubted, departed]).toEqual([[], []]);
    expect(said.filter((each) => /gravity/.test(each))).toEqual([
      'Elsewhere D4 bulk-specific-gravity-mix specimen=1 trial=C 2.401',
      'Elsewhere E4 maximum-specific-gravity specimen=1 trial=C 2.502',
      'Elsewhere D5 bulk-specific-gravity-mix specimen=2 trial=C 2.403',
      'Elsewhere E5 maximum-specific-gravity specimen=2 trial=C 2.503',
      'Elsewhere D6 bulk-specific-gravity-mix specimen=3 trial=C 2.402',
      'Elsewhere E6 maximum-specific-gravity specimen=3 trial=C 2.501',
    ]);
  });

  it('leaves averages, limits and deviations under the column what they are', () => {
    const { said } = read(
      { Data: `${own}\n | Average | 2.3825 | 2.505 |\n | Min | 2.300 | 2.4 |` },
      { mapping: known },
    );
    expect(said).toEqual(read({ Data: own }, { mapping: known }).said);
  });

  it('doubts a heading with another unit, and takes the values in the unit that is answered', () => {
    const lengths = 'Specimen | Track\n1 | 5.1\n2 | 5.4';
    const rut = is('wheel-track-rut-depth', { unit: 'mm' });
    const { mapping } = teach({ A: lengths }, { corrections: [of('A', 'B2:B3', rut)] });
    const inches = { A: lengths.replace('Track', 'Track (in)').replace('5.1', '0.2').replace('5.4', '0.21') };
    const asked = read(inches, { mapping });
    expect([asked.said, asked.doubted, asked.departed]).toEqual([[], ['B1'], ['unit B1']]);
    const answers = [{ sheet: 'A', cell: 'B1', text: 'Track (in)', answer: 'in in' }];
    // 1 in is 25.4 mm by definition.
    expect(read(inches, { mapping, answers }).record.readings.map(({ value }) => value)).toEqual([
      5.08, 5.334,
    ]);
  });

  it('says that a heading is gone, and doubts what stands in its place', () => {
    const renamed = { Data: own.replace('K1', 'Q9') };
    const { said, doubted, departed } = read(renamed, { mapping: known });
    expect([doubted, departed]).toEqual([['C1'], ['gone C1']]);
    expect(said.some((each) => each.includes('bulk'))).toBe(false);
    const answers = [{ sheet: 'Data', cell: 'C1', text: 'Q9', answer: 'as the mapping says' }];
    const settled = teach(renamed, { mapping: known, answers });
    const merged = mergeMapping({
      newest: known.rules,
      base: known.rules,
      before: [],
      now: settled.rules,
      dropped: settled.dropped,
    });
    const again = read(renamed, { mapping: mappingWith(merged) });
    expect([again.doubted, again.departed]).toEqual([[], []]);
    expect(again.said.filter((each) => each.includes('bulk'))).toHaveLength(4);
  });

  it('never takes headings at their word that changed places', () => {
    const swapped = read({ Data: own.replace('K1 | K2', 'K2 | K1') }, { mapping: known });
    expect(swapped.said.some((each) => /gravity/.test(each))).toBe(false);
    expect(swapped.doubted.toSorted()).toEqual(['C1', 'D1']);
  });

  it('knows whose a value is only as often as it was said', () => {
    const corrections = [of('One', 'B2:B3', is('bulk-specific-gravity-mix', { at: { trial: 'design' } }))];
    const table = 'Specimen | K1\n1 | 2.402\n2 | 2.404';
    const { mapping } = teach({ One: table }, { corrections });
    const twice = read({ One: table, Two: table.replace('2.402', '2.399') }, { mapping });
    expect(twice.departed).toEqual(['moved B1']);
    expect(twice.said.filter((each) => each.startsWith('Two'))).toEqual([]);
  });
});

describe('learning', () => {
  it('anchors a value beside a label to the label, and a line of a matrix to its label', () => {
    const sheet =
      'Cover figure | 5.2\nCourse | surface\n\nProperty | Trial A | Trial B\nK1 | 2.371 | 2.391\nVa (%) | 5.6 | 4.3';
    const corrections = [
      of('Data', 'B1', is('binder-content', { unit: '%', at: { trial: 'design' } })),
      of('Data', 'B5:C5', gmb),
    ];
    const { rules, notLearned } = teach({ Data: sheet }, { corrections });
    expect(notLearned).toEqual([]);
    expect(rules.map(({ anchor, axis }) => `${anchor.header.join('/')} ${axis}`).sort()).toEqual([
      'Cover figure right',
      'K1 right',
    ]);
  });

  it('tells what holds for this workbook only: one value of a column says nothing of the next workbook', () => {
    const { rules, notLearned } = teach({ Data: own }, { corrections: [of('Data', 'C3', gmb)] });
    expect(rules).toEqual([]);
    expect(notLearned).toEqual([expect.stringMatching(/^Data C3: .*holds for this workbook\.$/)]);
  });

  it('learns which quantity a heading means from the answers to its doubts, and not what one figure is', () => {
    const table = 'Specimen | Air voids (%)\n1 | 0.042\n2 | 0.045\n3 | 0.044';
    const doubts = read({ A: table }).doubts;
    expect(doubts.map(({ cell }) => cell)).toEqual(['B2', 'B3', 'B4']);
    const answers = doubts.map(({ sheet, cell, text, alternatives }) => {
      const times100 = alternatives.find(({ reading }) => (reading?.value ?? 0) > 1);
      return { sheet, cell, text, answer: times100?.answer ?? '' };
    });
    const { mapping } = teach({ A: table }, { answers });
    const next = read({ B: table.replace('0.042', '0.039') }, { mapping });
    expect(next.doubted).toEqual([]);
    expect(next.record.readings.map(({ value }) => value)).toEqual([3.9, 4.5, 4.4]);
    const percent = read({ B: 'Specimen | Air voids (%)\n1 | 4.2\n2 | 4.5\n3 | 4.4' }, { mapping });
    expect([percent.said, percent.doubted]).toEqual([[], ['B2', 'B3', 'B4']]);
  });

  it('takes back what a workbook taught and leaves what others taught meanwhile', () => {
    const [k1, k2] = [
      known.rules.find(({ id }) => id.startsWith('K1')),
      known.rules.find(({ id }) => id.startsWith('K2')),
    ];
    if (!k1 || !k2) throw new Error('not learned');
    const other = { ...k2, id: 'taught by another' };
    const merged = mergeMapping({ newest: [k1, other], base: [], before: [k1.id], now: [], dropped: [] });
    expect(merged).toEqual([other]);
    const again = mergeMapping({ newest: [k2], base: [k1], before: [k1.id], now: [k2], dropped: [] });
    expect(again.map(({ id }) => id).sort()).toEqual([k1.id, k2.id].sort());
  });
});

describe('the fingerprint of a layout', () => {
  const print = (sheets: Record<string, string>) => fingerprintOf(grid(sheets), edition);

  it('is the same for other values, further rows and renamed sheets', () => {
    const other = own.replaceAll('2.3', '2.4').replace('\nB | 1', '\nA | 3 | 2.37 | 2.5 | 5.5\nB | 1');
    expect(print({ Elsewhere: other })).toBe(print({ Data: own }));
  });

  it('stays near with a heading more, and far from another layout', () => {
    const plain = print({ Data: own });
    expect(likeness(plain, print({ Data: own.replace('K1', 'K0 | K1') }))).toBeGreaterThan(0.5);
    const foreign = print({ Data: 'Sieve (mm) | % Passing\n19 | 100\n12.5 | 92' });
    expect(likeness(plain, foreign)).toBeLessThan(0.2);
    expect(closestLayout(foreign, [{ fingerprint: plain }])).toBeNull();
  });
});

const gravity = (from: number) => fc.integer({ min: from, max: from + 60 }).map((each) => each / 1000);
const rowArbitrary = fc.record({
  bulk: gravity(2350),
  max: gravity(2480),
  voids: fc.integer({ min: 20, max: 90 }),
});

describe('any workbook of a learned layout', () => {
  it('is read at its shifted places without doubt, whatever its values, rows and sheet name are', () => {
    const layout = fc.record({
      name: fc.constantFrom('Data', 'Blatt 3', 'Results (2)', 'IDX'),
      lead: fc.integer({ min: 0, max: 4 }),
      shift: fc.integer({ min: 0, max: 3 }),
      rows: fc.array(rowArbitrary, { minLength: 2, maxLength: 9 }),
    });
    fc.assert(
      fc.property(layout, ({ name, lead, shift, rows }) => {
        const before = ' | '.repeat(shift);
        const lines = rows.map(
          ({ bulk, max, voids }, at) => `${before}A | ${at + 1} | ${bulk} | ${max} | ${voids / 10}`,
        );
        const sheet = ['', ...Array(lead).fill(''), `${before}Trial | Specimen | K1 | K2 | Va (%)`, ...lines];
        const result = read({ [name]: sheet.join('\n') }, { mapping: known });
        expect([result.doubted, result.departed]).toEqual([[], []]);
        const values = (quantity: string) =>
          result.record.readings.filter((each) => each.quantity === quantity).map(({ value }) => value);
        expect(values('bulk-specific-gravity-mix')).toEqual(rows.map(({ bulk }) => bulk));
        expect(values('maximum-specific-gravity')).toEqual(rows.map(({ max }) => max));
      }),
      { numRuns: 60 },
    );
  });

  it('whose headings are in any other order gives no gravity under another’s name', () => {
    const heads = ['Trial', 'Specimen', 'K1', 'K2', 'Va (%)'];
    const order = fc.shuffledSubarray([2, 3, 4], { minLength: 3, maxLength: 3 });
    fc.assert(
      fc.property(order, fc.array(rowArbitrary, { minLength: 2, maxLength: 5 }), (places, rows) => {
        // The headings change places and the figures stay: whatever is read has to be what the figures are.
        const top = ['Trial', 'Specimen', ...places.map((at) => heads[at])].join(' | ');
        const lines = rows.map(
          ({ bulk, max, voids }, at) => `A | ${at + 1} | ${bulk} | ${max} | ${voids / 10}`,
        );
        const { record } = read({ Data: [top, ...lines].join('\n') }, { mapping: known });
        const wrong = record.readings.filter(
          ({ quantity, source }) =>
            (quantity === 'bulk-specific-gravity-mix' && !source?.cell.startsWith('C')) ||
            (quantity === 'maximum-specific-gravity' && !source?.cell.startsWith('D')),
        );
        expect(wrong).toEqual([]);
      }),
      { numRuns: 60 },
    );
  });
});
