import { describe, expect, it } from 'vitest';
import type { ReadingEdition } from '#rules/reading/edition-contents';
import { readWorkbook } from '#rules/reading/interpret';
import { type MappingInput, mappingSchema } from '#rules/reading/mapping';
import type { Answer } from '#rules/reading/reading-result';
import { type GridSheet, gridOf } from '#tests/workbooks/grid-of';

type RuleInput = MappingInput['rules'][number];

const edition: ReadingEdition = {
  rules: [],
  tables: [],
  quantities: [],
  documents: [],
  attributes: [
    {
      name: 'nominalMaximumSize',
      label: 'Nominal maximum size',
      type: 'number',
      unit: 'mm',
      values: [9.5, 12.5, 19],
    },
    { name: 'designTraffic', label: 'Design traffic', type: 'number', unit: 'million ESAL' },
    {
      name: 'course',
      label: 'Course',
      type: 'text',
      values: [{ value: 'surface', aliases: ['wearing'] }, 'base'],
    },
  ],
};

function read(sheets: Record<string, GridSheet>, rules: RuleInput[], answers: Answer[] = []) {
  const mapping = mappingSchema.parse({ laboratory: 'Any', fingerprint: 'x', version: 1, rules });
  return readWorkbook({ grid: gridOf(sheets), mapping, edition, answers });
}

const column = (header: string, quantity: string, more: Partial<RuleInput> = {}): RuleInput => ({
  id: header,
  anchor: { sheet: 'Trials', header: [header] },
  axis: 'down',
  quantity,
  at: { trial: { header: ['Trial'], required: true }, specimen: { header: ['No.'] } },
  ...more,
});
const label = (header: string, quantity: string, more: Partial<RuleInput> = {}): RuleInput => ({
  id: header,
  anchor: { sheet: 'Cover', header: [header] },
  range: { skip: 0, most: 1 },
  axis: 'right',
  quantity,
  ...more,
});
const values = (result: ReturnType<typeof read>) =>
  result.record.readings.map(({ quantity, value, at, source }) => [quantity, value, at, source?.cell]);

describe('a table with a quantity in each column', () => {
  const cells = {
    B4: 'Trial',
    C4: 'No.',
    D4: 'Gmb',
    E4: 'Va, %',
    B5: 'A',
    C5: 1,
    D5: 2.367,
    E5: 5.5,
    B6: 'A',
    C6: 2,
    D6: 2.371,
    E6: 5.3,
    B7: 'Mean A',
    D7: 2.369,
    E7: 5.4,
    B8: 'Std. dev.',
    D8: 0.003,
  };
  const rules = [column('Gmb', 'bulk-specific-gravity-mix'), column('Va', 'air-voids', { unit: '%' })];

  it('is found by its header texts, wherever it stands', () => {
    const moved = Object.fromEntries(
      Object.entries(cells).map(([address, value]) => [
        address.replace(/\d+/, (row) => String(Number(row) + 7)),
        value,
      ]),
    );
    const [here, there] = [read({ Trials: { cells } }, rules), read({ Trials: { cells: moved } }, rules)];
    expect(values(here)[0]).toEqual([
      'bulk-specific-gravity-mix',
      2.367,
      { trial: 'A', specimen: '1' },
      'D5',
    ]);
    expect(values(there).map(([quantity, value, at]) => [quantity, value, at])).toEqual(
      values(here).map(([quantity, value, at]) => [quantity, value, at]),
    );
  });

  it('never takes an average or a spread for a specimen', () => {
    const { record, unread } = read({ Trials: { cells } }, rules);
    expect(record.readings.filter(({ quantity }) => quantity === 'bulk-specific-gravity-mix')).toHaveLength(
      2,
    );
    expect(unread.map(({ cell, reason }) => [cell, reason])).toEqual([
      ['D7', 'An average of specimens; it is recomputed from them.'],
      ['D8', 'A spread or count of specimens, not a reading.'],
    ]);
  });

  it('keeps a derived quantity of an average row as the trial’s own', () => {
    const atRow = { ...cells, B7: 'A', C7: 'mean' };
    const { record } = read({ Trials: { cells: atRow } }, rules);
    const reported = record.readings.filter(({ source }) => source?.cell === 'E7');
    expect(reported).toMatchObject([
      { quantity: 'air-voids', value: 5.4, at: { trial: 'A' }, origin: 'reported' },
    ]);
    expect(reported[0]?.at.specimen).toBeUndefined();
  });

  it('knows whose average a row is, by its words or by the rows above it', () => {
    for (const B7 of ['Mean A', 'Average of A', 'Mean']) {
      const { record } = read({ Trials: { cells: { ...cells, B7 } } }, rules);
      const average = record.readings.find(({ source }) => source?.cell === 'E7');
      expect(average?.at, B7).toEqual({ trial: 'A' });
    }
  });

  it('says in words what each cell was taken for', () => {
    const { uses } = read({ Trials: { cells } }, rules);
    expect(uses.find(({ cell }) => cell === 'D5')).toEqual({
      sheet: 'Trials',
      cell: 'D5',
      use: 'read',
      taken: 'Gmb, trial A, specimen 1 · measured',
    });
    expect(uses.find(({ cell }) => cell === 'D4')?.use).toBe('label');
  });

  it('accounts for every cell that holds a number', () => {
    const stray = { ...cells, H2: 17 };
    const { uses, unread } = read({ Trials: { cells: stray } }, rules);
    const numeric = Object.entries(stray).filter(([, value]) => typeof value === 'number');
    for (const [address] of numeric)
      expect(
        uses.map(({ cell }) => cell),
        address,
      ).toContain(address);
    expect(unread).toContainEqual({
      sheet: 'Trials',
      cell: 'H2',
      text: '17',
      reason: 'Nothing in the mapping reads this cell.',
    });
  });

  it('follows a unit that the laboratory changed in the header, and marks the value as converted', () => {
    const inFahrenheit = { A1: 'Trial', B1: 'No.', C1: 'Temp (°F)', A2: 'A', B2: 1, C2: 311 };
    const { record } = read({ Trials: { cells: inFahrenheit } }, [
      column('Temp', 'mixing-temperature', { unit: '°C' }),
    ]);
    // 311 °F = (311 − 32)·5/9 = 155 °C.
    expect(record.readings).toMatchObject([
      { value: 155, unit: '°C', origin: 'converted', source: { text: '311' } },
    ]);
  });

  it('doubts every value under a unit that is not known', () => {
    const inStone = { A1: 'Trial', B1: 'No.', C1: 'Dry, stone', A2: 'A', B2: 1, C2: 4700 };
    const { doubts, record } = read({ Trials: { cells: inStone } }, [
      column('Dry', 'mass-in-air', { unit: 'g' }),
    ]);
    expect(doubts).toMatchObject([{ cell: 'C2', about: { quantity: 'mass-in-air' } }]);
    expect(record.readings).toEqual([]);
  });

  it('finds a header under its merged group head', () => {
    const grouped = {
      A1: 'Trial',
      B1: 'No.',
      C1: 'Masses',
      E1: 'Gravity',
      C2: 'Dry',
      D2: 'Wet',
      E2: 'Dry',
      A3: 'A',
      B3: 1,
      C3: 4708,
      E3: 2.4,
    };
    const rule = column('Dry', 'mass-in-air', {
      anchor: { sheet: 'Trials', header: ['Masses', 'Dry'] },
      at: { trial: 'A' },
    });
    const { record } = read({ Trials: { cells: grouped, merges: ['C1:D1'] } }, [rule]);
    expect(record.readings.map(({ value }) => value)).toEqual([4708]);
  });

  it('takes a merged value for the trial, not for its first specimen', () => {
    const merged = { ...cells, F4: 'Gmm', F5: 2.505 };
    const { record } = read({ Trials: { cells: merged, merges: ['F5:F6'] } }, [
      column('Gmm', 'maximum-specific-gravity'),
    ]);
    expect(record.readings).toMatchObject([{ value: 2.505, at: { trial: 'A' } }]);
    expect(record.readings[0]?.at.specimen).toBeUndefined();
  });

  it('reads both of two tables with the same heading', () => {
    const twice = { ...cells, B12: 'Trial', C12: 'No.', D12: 'Gmb', B13: 'B', C13: 1, D13: 2.389 };
    const found = values(read({ Trials: { cells: twice } }, [column('Gmb', 'bulk-specific-gravity-mix')]));
    expect(found.map(([, value, at]) => [value, at])).toContainEqual([2.389, { trial: 'B', specimen: '1' }]);
    expect(found).toHaveLength(3);
  });

  it('asks for a key that is missing, and offers the one above', () => {
    const gap = { ...cells, B6: ' ' };
    const asked = read({ Trials: { cells: gap } }, rules);
    expect(asked.doubts).toMatchObject([
      { cell: 'B6', alternatives: [{ answer: 'as above: A' }, { answer: 'leave out' }] },
    ]);
    expect(asked.unread.find(({ cell }) => cell === 'D6')?.reason).toMatch(/answer that cell first/);
    const answer = { sheet: 'Trials', cell: 'B6', text: ' ', answer: 'as above: A' };
    const answered = read({ Trials: { cells: gap } }, rules, [answer]);
    expect(answered.doubts).toEqual([]);
    expect(answered.record.readings.map(({ at }) => at.trial)).toEqual(['A', 'A', 'A', 'A', 'A']);
  });

  it('reads hidden rows and sheets, and says that they are hidden', () => {
    const { uses } = read({ Trials: { cells, hiddenRows: [5] } }, rules);
    expect(uses.find(({ cell }) => cell === 'D5')?.taken).toMatch(/hidden in the workbook/);
    const apart = read({ Trials: { cells }, Calc: { cells: { A1: 3 }, hidden: true } }, rules);
    expect(apart.unread.find(({ sheet }) => sheet === 'Calc')?.reason).toBe(
      'Hidden, and nothing in the mapping reads it.',
    );
  });

  it('keeps the remark on a cell with what it was taken for, and lists notes under the table', () => {
    const remarked = { kind: 'number', value: '2.371', text: '2.371', comment: 'edge chip' } as const;
    const noted = { ...cells, D6: remarked, B14: '* caliper volume, specimen would not seal' };
    const { uses, unread } = read({ Trials: { cells: noted } }, rules.slice(0, 1));
    expect(uses.find(({ cell }) => cell === 'D6')?.taken).toMatch(/remark: edge chip/);
    expect(unread.find(({ cell }) => cell === 'B14')?.reason).toBe('Text beside the readings.');
  });

  it('says that a value comes from another workbook', () => {
    const linked = {
      kind: 'number',
      value: '2.371',
      text: '2.371',
      formula: '[2]Lab!B7',
      cached: true,
    } as const;
    const { uses } = read({ Trials: { cells: { ...cells, D6: linked } } }, rules);
    expect(uses.find(({ cell }) => cell === 'D6')?.taken).toMatch(/from another workbook/);
  });
});

describe('values that contradict each other', () => {
  const rules = [column('Gmb', 'bulk-specific-gravity-mix')];
  const cells = { A1: 'Trial', B1: 'No.', C1: 'Gmb', A2: 'A', B2: 1, C2: 2.367, A3: 'A', B3: 1, C3: 2.471 };

  it('are a doubt at the later cell, and neither is a reading', () => {
    const { doubts, record, uses } = read({ Trials: { cells } }, rules);
    expect(record.readings).toEqual([]);
    expect(doubts).toMatchObject([
      {
        cell: 'C3',
        about: { quantity: 'bulk-specific-gravity-mix', at: { trial: 'A', specimen: '1' } },
        alternatives: [{ reading: { value: 2.367 } }, { reading: { value: 2.471 } }, { answer: 'leave out' }],
      },
    ]);
    expect(uses.find(({ cell }) => cell === 'C2')?.use).toBe('doubt');
  });

  it('are settled by an answer', () => {
    const answer = { sheet: 'Trials', cell: 'C3', text: '2.471', answer: '2.367 1' };
    expect(read({ Trials: { cells } }, rules, [answer]).record.readings).toMatchObject([{ value: 2.367 }]);
  });

  it('that are equal are one reading', () => {
    const { record, doubts } = read({ Trials: { cells: { ...cells, C3: 2.367 } } }, rules);
    expect(record.readings).toHaveLength(1);
    expect(doubts).toEqual([]);
  });

  it('count a binder content once for its trial', () => {
    const sheet = { A1: 'Trial', B1: 'No.', C1: 'Pb', A2: 'A', B2: 1, C2: 4.8, A3: 'A', B3: 2, C3: 4.8 };
    const { record } = read({ Trials: { cells: sheet } }, [column('Pb', 'binder-content')]);
    expect(record.readings.map(({ value, at }) => [value, at])).toEqual([[4.8, { trial: 'A' }]]);
  });
});

describe('answers to doubts', () => {
  const rules = [column('Gmb', 'bulk-specific-gravity-mix')];
  const cells = { A1: 'Trial', B1: 'No.', C1: 'Gmb', A2: 'D', B2: 1, C2: '2.40*' };
  const answer = { sheet: 'Trials', cell: 'C2', text: '2.40*', answer: '2.4' };

  it('offer what each would give, and always to leave the cell out', () => {
    const { doubts, record } = read({ Trials: { cells } }, rules);
    expect(doubts).toMatchObject([
      {
        sheet: 'Trials',
        cell: 'C2',
        text: '2.40*',
        alternatives: [
          { answer: '2.4', reading: { quantity: 'bulk-specific-gravity-mix', value: 2.4 } },
          { answer: 'leave out', label: 'Leave out' },
        ],
      },
    ]);
    expect(record.doubts).toEqual(doubts);
  });

  it('hold while the text of the cell is unchanged', () => {
    const { record, answered, stale, doubts } = read({ Trials: { cells } }, rules, [answer]);
    expect(record.readings).toMatchObject([{ value: 2.4, source: { cell: 'C2', text: '2.40*' } }]);
    expect([answered, stale, doubts]).toEqual([[answer], [], []]);
  });

  it('are stale once the text has changed, and the doubt is back', () => {
    const { stale, answered, doubts } = read({ Trials: { cells: { ...cells, C2: '2.41*' } } }, rules, [
      answer,
    ]);
    expect([stale, answered]).toEqual([[answer], []]);
    expect(doubts).toHaveLength(1);
  });

  it('that leave a cell out make it no reading and no doubt', () => {
    const { record, doubts, unread } = read({ Trials: { cells } }, rules, [
      { ...answer, answer: 'leave out' },
    ]);
    expect([record.readings, doubts]).toEqual([[], []]);
    expect(unread).toMatchObject([{ cell: 'C2', reason: 'Left out by an answer.' }]);
  });
});

describe('a gradation with stockpiles in columns', () => {
  const cells = {
    A4: 'Sieve',
    B4: 'Percent passing',
    D4: 'JMF',
    B5: 'Stone',
    C5: 'Sand',
    A6: '3/4"',
    B6: 100,
    C6: 100,
    D6: 100,
    A7: 'No. 200',
    B7: 1.6,
    C7: 7.8,
    D7: 5.6,
    A8: '13 mm',
    B8: 90,
  };
  const sieve = { header: ['Sieve'], required: true };
  const rules: RuleInput[] = [
    {
      id: 'stockpiles',
      anchor: { sheet: null, header: ['Percent passing'] },
      axis: 'cross',
      quantity: 'percent-passing',
      unit: '%',
      at: { sieve, stockpile: { key: 'column' } },
    },
    {
      id: 'jmf',
      anchor: { sheet: null, header: ['JMF'] },
      axis: 'down',
      quantity: 'percent-passing',
      unit: '%',
      at: { sieve, trial: 'design' },
    },
  ];
  const sheet = { cells, merges: ['B4:C4', 'D4:D5', 'A4:A5'] };

  it('gives each value its sieve and its stockpile', () => {
    const { record } = read({ Gradation: sheet }, rules);
    expect(record.readings.map(({ value, at }) => [value, at])).toEqual([
      [100, { sieve: 19, stockpile: 'Stone' }],
      [100, { sieve: 19, stockpile: 'Sand' }],
      [1.6, { sieve: 0.075, stockpile: 'Stone' }],
      [7.8, { sieve: 0.075, stockpile: 'Sand' }],
      [100, { sieve: 19, trial: 'design' }],
      [5.6, { sieve: 0.075, trial: 'design' }],
    ]);
  });

  it('doubts a sieve outside the series once, for its whole row', () => {
    const { doubts, unread } = read({ Gradation: sheet }, rules);
    expect(doubts).toMatchObject([{ cell: 'A8', about: { quantity: 'percent-passing' } }]);
    expect(unread).toMatchObject([{ cell: 'B8' }]);
  });

  it('doubts a whole column that is written in fractions of one', () => {
    const fractions = { ...cells, C6: 1, C7: 0.078, A9: '0.3 mm', C9: 0.2 };
    const { doubts } = read({ Gradation: { ...sheet, cells: fractions } }, rules);
    expect(
      doubts.filter(({ cell }) => cell.startsWith('C')).map(({ alternatives }) => alternatives[0]?.answer),
    ).toEqual(['100 %', '7.8 %', '20 %']);
  });

  it('doubts a column that no stockpile is named over', () => {
    const { B5: _, ...unnamed } = cells;
    const { doubts } = read({ Gradation: { ...sheet, cells: unnamed } }, rules);
    expect(doubts.map(({ cell }) => cell)).toContain('B5');
  });
});

describe('a cover sheet of labels and values', () => {
  const unit = { header: ['Unit'] };
  const attribute = (name: string, header: string) => label(header, `attribute:${name}`, { unit });

  it.each([
    ['12.5', 12.5],
    ['1/2 in', 12.5],
    ['12.5 mm', 12.5],
  ])('brings the size %s to mm', (text, size) => {
    const { record } = read({ Cover: { cells: { A3: 'NMAS', B3: text } } }, [
      attribute('nominalMaximumSize', 'NMAS'),
    ]);
    expect(record.attributes.nominalMaximumSize).toMatchObject({
      value: size,
      unit: 'mm',
      origin: 'reported',
      source: { sheet: 'Cover', cell: 'B3', text },
    });
  });

  it.each([
    [12, undefined, 12],
    [12_000_000, undefined, 12],
    ['12,000,000', undefined, 12],
    [12_000_000, 'ESALs', 12],
  ])('brings the traffic %s %s to millions', (stated, statedUnit, millions) => {
    const cells = {
      A1: 'Item',
      C1: 'Unit',
      A3: 'Traffic',
      B3: stated,
      ...(statedUnit ? { C3: statedUnit } : {}),
    };
    const { record } = read({ Cover: { cells } }, [attribute('designTraffic', 'Traffic')]);
    expect(record.attributes.designTraffic?.value).toBe(millions);
  });

  it('takes a value by label or alias, without regard to case and the word course', () => {
    const { record } = read({ Cover: { cells: { A3: 'Course', B3: 'Wearing Course' } } }, [
      attribute('course', 'Course'),
    ]);
    expect(record.attributes.course?.value).toBe('surface');
  });

  it('doubts a value that matches none, and offers those that there are', () => {
    const { record, doubts } = read({ Cover: { cells: { A3: 'NMAS', B3: 13 } } }, [
      attribute('nominalMaximumSize', 'NMAS'),
    ]);
    expect(record.attributes).toEqual({});
    expect(doubts).toMatchObject([
      {
        cell: 'B3',
        about: { attribute: 'nominalMaximumSize' },
        alternatives: [{}, { attribute: { value: { value: 12.5 } } }, {}, {}],
      },
    ]);
  });

  it('doubts an attribute that two places state differently', () => {
    const cells = { A3: 'Course', B3: 'surface', A9: 'Layer type', B9: 'base' };
    const rules = [attribute('course', 'Course'), attribute('course', 'Layer type')];
    expect(read({ Cover: { cells } }, rules).doubts).toMatchObject([
      { cell: 'B9', about: { attribute: 'course' } },
    ]);
    const same = read({ Cover: { cells: { ...cells, B9: 'Surface' } } }, rules);
    expect([same.doubts, same.record.attributes.course?.value]).toEqual([[], 'surface']);
  });

  it('reads a quantity beside its label in the unit that stands there', () => {
    const cells = { A1: 'Item', C1: 'Unit', A3: 'Mixing temperature', B3: 311, C3: '°F' };
    const rule = label('Mixing temperature', 'mixing-temperature', { unit, at: { trial: 'design' } });
    expect(read({ Cover: { cells } }, [rule]).record.readings).toMatchObject([
      { value: 155, origin: 'converted' },
    ]);
  });
});

describe('a list of documents', () => {
  const rule: RuleInput = {
    id: 'documents',
    anchor: { sheet: 'Papers', header: ['Document'] },
    axis: 'down',
    quantity: 'document',
    at: { issuer: { header: ['Issuer'] }, date: { header: ['Date'] }, validTo: { header: ['Valid to'] } },
  };
  const head = { A1: 'Document', B1: 'Issuer', C1: 'Date', D1: 'Valid to' };

  it('gives each row its type, issuer and dates', () => {
    const cells = { ...head, A2: 'Binder Certificate', B2: 'Fernhill Binder Terminal', C2: '11 Feb 2026' };
    expect(read({ Papers: { cells } }, [rule]).record.documents).toEqual([
      {
        type: 'binder-certificate',
        issuer: 'Fernhill Binder Terminal',
        reference: null,
        date: '2026-02-11',
        validTo: null,
        enclosed: false,
        source: { sheet: 'Papers', cell: 'A2', text: 'Binder Certificate' },
      },
    ]);
  });

  it('keeps a document out while its date is in doubt, and takes it with the answer', () => {
    const cells = { ...head, A2: 'Binder certificate', C2: '03/04/2026' };
    const asked = read({ Papers: { cells } }, [rule]);
    expect(asked.record.documents).toEqual([]);
    expect(asked.doubts).toMatchObject([
      {
        cell: 'C2',
        about: { document: 'binder-certificate' },
        alternatives: [{ document: { date: '2026-04-03' } }, { document: { date: '2026-03-04' } }, {}],
      },
    ]);
    const answer = { sheet: 'Papers', cell: 'C2', text: '03/04/2026', answer: '2026-03-04' };
    const answered = read({ Papers: { cells } }, [rule], [answer]);
    expect(answered.record.documents).toMatchObject([{ date: '2026-03-04' }]);
  });

  it('doubts a document that nobody knows', () => {
    const { doubts } = read({ Papers: { cells: { ...head, A2: 'Weather report' } } }, [rule]);
    expect(doubts).toMatchObject([
      { cell: 'A2', reason: expect.stringMatching(/no document that the rules know/) },
    ]);
  });
});

describe('a sheet of free readings', () => {
  const rule: RuleInput = {
    id: 'free',
    anchor: { sheet: 'Readings', header: ['Value'] },
    axis: 'down',
    quantity: { header: ['Quantity'] },
    unit: { header: ['Unit'] },
    at: {
      variant: { header: ['Form'] },
      temperature: { header: ['Temperature'] },
      method: { header: ['Method'] },
      testedOn: { header: ['Tested on'] },
    },
  };
  const head = {
    A1: 'Quantity',
    B1: 'Value',
    C1: 'Unit',
    D1: 'Form',
    E1: 'Temperature, °C',
    F1: 'Method',
    G1: 'Tested on',
  };

  it('takes quantity, unit and conditions from the row', () => {
    const cells = {
      ...head,
      A2: 'Soundness loss',
      B2: 6,
      C2: '%',
      D2: 'sodium',
      F2: 'AASHTO T 104',
      G2: '2026-02-03',
    };
    expect(read({ Readings: { cells } }, [rule]).record.readings).toEqual([
      {
        quantity: 'soundness-loss',
        value: 6,
        unit: '%',
        at: { variant: 'sodium' },
        method: 'AASHTO T 104',
        origin: 'measured',
        testedOn: '2026-02-03',
        source: { sheet: 'Readings', cell: 'B2', text: '6' },
      },
    ]);
  });

  it('knows a quantity by symbol and alias, and doubts one that it does not know', () => {
    const cells = { ...head, A2: 'Gmm', B2: 2.486, A3: 'uncompacted voids', B3: 46, A4: 'Sparkle', B4: 7 };
    const { record, doubts } = read({ Readings: { cells } }, [rule]);
    expect(record.readings.map(({ quantity }) => quantity)).toEqual([
      'maximum-specific-gravity',
      'fine-aggregate-angularity',
    ]);
    expect(doubts).toMatchObject([{ cell: 'A4' }]);
  });

  it('loses a doubtful date of test, not the reading', () => {
    const cells = { ...head, A2: 'Sand equivalent', B2: 52, G2: '03/04/2026' };
    const { record, doubts } = read({ Readings: { cells } }, [rule]);
    expect(record.readings).toMatchObject([{ value: 52 }]);
    expect(record.readings[0]?.testedOn).toBeUndefined();
    expect(doubts).toMatchObject([{ cell: 'G2', about: {} }]);
  });
});

describe('a mapping', () => {
  it('is refused where it names a condition that is not known', () => {
    const rules = [{ ...column('Gmb', 'bulk-specific-gravity-mix'), at: { moon: 'full' } }];
    const parsed = mappingSchema.safeParse({ laboratory: 'Any', fingerprint: 'x', version: 1, rules });
    expect(parsed.success).toBe(false);
    expect(parsed.error?.issues[0]?.message).toMatch(/condition that is not known/);
  });

  it('reads nothing, and says so, where its anchors are not found', () => {
    const { record, unread } = read({ Trials: { cells: { A1: 'Bulk gravity', A2: 2.4 } } }, [
      column('Gmb', 'bulk-specific-gravity-mix'),
    ]);
    expect(record.readings).toEqual([]);
    expect(unread.map(({ cell }) => cell)).toEqual(['A1', 'A2']);
  });
});
