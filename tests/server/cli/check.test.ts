import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import edition2026 from '#rules/sets/cvra-412-2026.json';
import { runCheck } from '#server/cli/run-check';
import { demoWorkbooks } from '#tests/workbooks/demo/write-demo-workbooks';

const root = new URL('../../..', import.meta.url).pathname;
const folder = mkdtempSync(join(tmpdir(), 'clauseway-check-'));
const rules = 'rules/sets/cvra-412-2026.json';
const dates = ['--submitted', '2026-03-09', '--letting', '2026-01-14'];

beforeAll(async () => {
  for (const { name, bytes } of await demoWorkbooks()) writeFileSync(join(folder, name), bytes);
}, 60_000);
afterAll(() => rmSync(folder, { recursive: true }));

interface Run {
  code: number | null;
  out: string;
  err: string;
}

/** The same as the command, without a process of its own. */
async function run(...args: string[]): Promise<Run> {
  const result: Run = { code: null, out: '', err: '' };
  result.code = await runCheck(args, {
    out: (text) => {
      result.out += text;
    },
    err: (text) => {
      result.err += text;
    },
  });
  return result;
}

function spawned(...args: string[]): Promise<Run> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/cli/check.ts', ...args], { cwd: root });
    const result: Run = { code: null, out: '', err: '' };
    child.stdout.on('data', (chunk: Buffer) => {
      result.out += chunk.toString();
    });
    child.stderr.on('data', (chunk: Buffer) => {
      result.err += chunk.toString();
    });
    child.on('error', reject);
    child.on('close', (code) => resolve({ ...result, code }));
  });
}

function file(name: string, content: string | Buffer | object): string {
  const path = join(folder, name);
  writeFileSync(
    path,
    typeof content === 'string' || Buffer.isBuffer(content) ? content : JSON.stringify(content),
  );
  return path;
}

const demo = (name: string) => join(folder, name);

describe('the check on the command line', () => {
  it('ends with 0 where nothing required is open, and prints one object and nothing else with --json', async () => {
    const { code, out, err } = await spawned('--rules', rules, ...dates, '--json', demo('KD-095-L1 r0.xlsx'));
    expect([code, err]).toEqual([0, '']);
    const result = JSON.parse(out);
    expect(Object.keys(result)).toEqual(['record', 'reading', 'analysis', 'summary', 'findings', 'seal']);
    expect(result.reading).toEqual({ unread: [], doubts: [] });
    expect(result.analysis).toMatchObject({
      // Air voids by hand: 5.10 at 5.4, 4.01 at 5.9 and 2.88 at 6.4; on the lines 4.55 is met at 5.651, 3.45 at 6.148.
      roomToMove: {
        room: { from: 5.66, to: 6.14, closedBelowBy: ['air-voids'], closedAboveBy: ['air-voids'] },
      },
      creep: [],
      designPoint: { declaredBinderContent: 5.9 },
    });
    expect(result.summary).toMatchObject({ fail: 0, notShown: 0, undecided: 0 });
    expect(result.record.readings[0].source.sheet).toBe('Submittal');
  }, 60_000);

  it('ends with 1 where something required fails, and prints a table that names the clauses', async () => {
    const { code, out, err } = await spawned('--rules', rules, ...dates, demo('TA-190-B2 r0.xlsx'));
    expect([code, err]).toEqual([1, '']);
    expect(out).toMatch(/412\.02\(e\)\s+fail\s+−2\s+Sand equivalent is 43/);
    expect(out).toMatch(/Recommended: revise and resubmit/);
    expect(out).toMatch(/Findings assist a qualified person/);
  }, 60_000);

  it('applies layers in their order', async () => {
    const layer = 'rules/sets/cvra-412-s07-2026.json';
    const { code, out } = await run(
      '--rules',
      rules,
      '--layer',
      layer,
      ...dates,
      '--json',
      demo('KD-095-L1 r0.xlsx'),
    );
    expect([0, 1]).toContain(code);
    const alone = await run('--rules', rules, ...dates, '--json', demo('KD-095-L1 r0.xlsx'));
    expect(JSON.parse(out).seal.resolvedEdition).not.toBe(JSON.parse(alone.out).seal.resolvedEdition);
  }, 60_000);

  it('lets given attributes win without a doubt, with origin typed', async () => {
    const attributes = file('attributes.json', { nominalMaximumSize: '1/2 in', course: 'Base course' });
    const { out } = await run(
      '--rules',
      rules,
      '--attributes',
      attributes,
      '--json',
      demo('KD-095-L1 r0.xlsx'),
    );
    const { record, reading } = JSON.parse(out);
    expect(record.attributes.nominalMaximumSize).toEqual({
      value: 12.5,
      unit: 'mm',
      origin: 'typed',
      source: null,
    });
    expect(record.attributes.course.value).toBe('base');
    expect(reading.doubts).toEqual([]);
  }, 60_000);

  it('lists each doubt with sheet, cell, text, reason and alternatives', async () => {
    const { out, code } = await run('--rules', rules, ...dates, '--json', demo('BW-125-S6 r0.xlsx'));
    expect(code).toBe(1);
    const { doubts } = JSON.parse(out).reading;
    expect(doubts).toHaveLength(4);
    expect(doubts[1]).toMatchObject({
      sheet: 'Trials',
      text: '4721,5',
      reason: expect.stringMatching(/decimal comma/),
    });
    expect(doubts[1].alternatives).toHaveLength(2);
  }, 60_000);

  it('reads a text table through a mapping; its sheet has no name', async () => {
    const workbook = file('sand.csv', 'Test;Result\nSand equivalent;52\nDraindown;<0,1\n');
    const rule = (id: string, header: string, quantity: string) => ({
      id,
      anchor: { sheet: '', header: [header] },
      range: { skip: 0, most: 1 },
      axis: 'right',
      quantity,
      unit: '%',
      decimal: ',',
    });
    const mapping = file('mapping.json', {
      format: 'clauseway/mapping@1',
      laboratory: 'Any',
      fingerprint: 'x',
      version: 1,
      rules: [rule('se', 'Sand equivalent', 'sand-equivalent'), rule('dd', 'Draindown', 'draindown')],
    });
    const { code, out } = await run('--rules', rules, '--mapping', mapping, '--json', workbook);
    expect(code).toBe(1);
    expect(JSON.parse(out).record.readings).toMatchObject([
      { quantity: 'sand-equivalent', value: 52, source: { sheet: '', cell: 'B2', text: '52' } },
      { quantity: 'draindown', value: 0.1, qualifier: '<', source: { sheet: '', cell: 'B3', text: '<0,1' } },
    ]);
  }, 60_000);

  it('reads what a learned mapping speaks of by it and the rest by its headings, and tells where they part', async () => {
    const anchor = { sheet: null, header: ['K1'], unit: null, between: ['Specimen', 'Va'], times: 1 };
    const learned = file('learned.json', {
      format: 'clauseway/mapping@1',
      laboratory: 'Any',
      fingerprint: 'x',
      version: 2,
      rest: 'headings',
      rules: [{ id: 'K1', anchor, axis: 'down', quantity: 'bulk-specific-gravity-mix' }],
    });
    const table = 'Trial,Specimen,K1,Va (%)\nA,1,2.412,4.0\nA,2,2.414,4.1\n';
    const known = await run('--rules', rules, '--mapping', learned, '--json', file('known.csv', table));
    const said = JSON.parse(known.out).record.readings.map(
      ({ quantity, value }: { quantity: string; value: number }) => `${quantity} ${value}`,
    );
    expect(said.toSorted()).toEqual([
      'air-voids 4',
      'air-voids 4.1',
      'bulk-specific-gravity-mix 2.412',
      'bulk-specific-gravity-mix 2.414',
    ]);
    expect(JSON.parse(known.out).reading).toEqual({ unread: [], doubts: [] });
    const other = file('other.csv', table.replace('K1', 'K9'));
    const parted = JSON.parse((await run('--rules', rules, '--mapping', learned, '--json', other)).out);
    expect(parted.reading.departures).toMatchObject([{ rule: 'K1', kind: 'gone', cell: 'C1' }]);
    expect(parted.reading.doubts).toMatchObject([{ cell: 'C1', text: 'K9' }]);
  }, 60_000);

  it.each<[string, () => Promise<string[]> | string[], RegExp]>([
    ['no workbook', () => ['--rules', rules], /No workbook is given\. Use: npm run check/],
    ['an option that is not known', () => ['--rule', rules, 'x.xlsx'], /Unknown option '--rule'/],
    [
      'a date that is none',
      () => ['--rules', rules, '--submitted', '9 March', 'x.xlsx'],
      /--submitted 9 March is not a date/,
    ],
    ['a rule set that is not there', () => ['--rules', 'none.json', 'x.xlsx'], /none\.json cannot be opened/],
    [
      'a rule set that is not JSON',
      () => ['--rules', file('bad.json', '{'), 'x.xlsx'],
      /bad\.json is not JSON/,
    ],
    [
      'a rule set with a fault',
      () => ['--rules', file('empty.json', {}), 'x.xlsx'],
      /empty\.json cannot be used/,
    ],
    [
      'a formula with a symbol that is not known',
      () => {
        const rule = {
          id: 'gse-over-gsb',
          clause: '412.03(x)',
          title: 'Effective over bulk gravity',
          severity: 'required',
          measure: { kind: 'formula', expression: 'Gse - Gxx' },
          limit: { min: 0 },
        };
        return [
          '--rules',
          file('formula.json', { ...edition2026, cases: [], rules: [rule], roomToMove: [] }),
          'x.xlsx',
        ];
      },
      /Rule gse-over-gsb: in the formula "Gse - Gxx", the symbol Gxx is not known/,
    ],
    [
      'a layer on its own',
      () => ['--rules', 'rules/sets/cvra-412-s07-2026.json', 'x.xlsx'],
      /is a layer of cvra-412, edition 2026, and cannot stand alone/,
    ],
    [
      'an attribute with a value that is none of its own',
      () => [
        '--rules',
        rules,
        '--attributes',
        file('odd.json', { nominalMaximumSize: 13 }),
        demo('KD-095-L1 r0.xlsx'),
      ],
      /odd\.json gives "13" for nominalMaximumSize/,
    ],
    ['a workbook that is not there', () => ['--rules', rules, 'gone.xlsx'], /gone\.xlsx cannot be opened/],
    [
      'a workbook in the old format',
      () => ['--rules', rules, file('old.xlsx', Buffer.from('d0cf11e0a1b11ae1', 'hex'))],
      /old \.xls format/,
    ],
    [
      'a mapping with a fault',
      () => ['--rules', rules, '--mapping', file('map.json', { rules: 3 }), demo('KD-095-L1 r0.xlsx')],
      /map\.json cannot be used/,
    ],
  ])(
    'ends with 2 and one clear line for %s',
    async (_, args, line) => {
      const { code, out, err } = await run(...(await args()));
      expect([code, out]).toEqual([2, '']);
      expect(err).toMatch(line);
      expect(err.trim().split('\n')).toHaveLength(1);
      expect(err).not.toMatch(/\bat .+:\d+:\d+/);
    },
    60_000,
  );

  it.each([
    [
      'semicolons and decimal commas',
      'a.csv',
      Buffer.from('Eigenschaft;Versuch A;Versuch B\nHohlraumgehalt, %;5,6;4,4\n'),
    ],
    ['tabs', 'b.tsv', Buffer.from('Property\tTrial A\tTrial B\nAir voids, %\t5.6\t4.4\n')],
    [
      'two bytes a character',
      'c.csv',
      Buffer.from('\ufeffProperty,Trial A,Trial B\n"Air voids, %",5.6,4.4\n', 'utf16le'),
    ],
    [
      'an old code page',
      'd.csv',
      Buffer.from('Propri\u00e9t\u00e9;Essai A;Essai B\nTeneur en vides (%);5,6;4,4\n', 'latin1'),
    ],
  ])('reads a text file with %s in a layout of its own', async (_, name, bytes) => {
    const { code, out } = await run('--rules', rules, '--json', file(name, bytes));
    expect(code).toBe(1);
    const { record } = JSON.parse(out);
    expect(record.readings).toMatchObject([
      { quantity: 'air-voids', value: 5.6, unit: '%', at: { trial: 'A' }, source: { sheet: '', cell: 'B2' } },
      { quantity: 'air-voids', value: 4.4, unit: '%', at: { trial: 'B' }, source: { sheet: '', cell: 'C2' } },
    ]);
  });

  it('ends its process with 2 and writes to standard error only', async () => {
    const { code, out, err } = await spawned('--rules', rules, 'gone.xlsx');
    expect([code, out]).toEqual([2, '']);
    expect(err).toBe('gone.xlsx cannot be opened. Check the path and that the file may be read.\n');
  }, 60_000);

  it('judges a rule on creep compliance, and says that a workbook without creep tests does not show it', async () => {
    const creep = {
      id: 'creep',
      clause: '412.06(x)',
      title: 'Creep compliance',
      severity: 'required',
      measure: { kind: 'creep-compliance', temperature: -10, time: 100 },
      limit: { max: 0.1 },
    };
    const withCreep = file('creep.json', { ...edition2026, cases: [], rules: [...edition2026.rules, creep] });
    const { code, out } = await run('--rules', withCreep, '--json', demo('KD-095-L1 r0.xlsx'));
    expect(code).toBe(1);
    const result = JSON.parse(out);
    expect(result.findings).toContainEqual(
      expect.objectContaining({
        rule: 'creep',
        outcome: 'not shown',
        sentence: 'Creep compliance at −10 °C at 100 s is not shown, at most 0.1 1/GPa.',
      }),
    );
  }, 60_000);
});
