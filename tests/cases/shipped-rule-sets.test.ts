import { describe, expect, it } from 'vitest';
import { isTableReference } from '#rules/rule-sets/bounds-of';
import { layerSchema, type Rule, type RuleSet, ruleSetSchema } from '#rules/rule-sets/schema';
import type { LimitTable, RuleSource } from '#rules/rule-sets/table';
import { shippedRuleSets } from '#rules/sets/shipped-rule-sets';

const sections = [
  ...['2024', '2026', '2027'].map((edition) => ({ section: '412', edition, base: editionOf(edition) })),
  { section: '421', edition: '2026', base: ruleSetSchema.parse(documentOf('cvra-421-2026.json')) },
  { section: '431', edition: '2026', base: ruleSetSchema.parse(documentOf('cvra-431-2026.json')) },
];
const supplement = layerSchema.parse(documentOf('cvra-412-s07-2026.json'));

describe.each(sections)('Section $section, edition $edition', ({ section, base: edition }) => {
  it('has at least 45 rules, at most eight of them on documents and ten or more keyed by a table', () => {
    expect(edition.rules.length).toBeGreaterThanOrEqual(45);
    expect(edition.rules.filter((rule) => rule.measure.kind === 'document').length).toBeLessThanOrEqual(8);
    expect(edition.rules.filter((rule) => tablesOf(rule).length > 0).length).toBeGreaterThanOrEqual(10);
  });

  it('gives each clause to one rule', () => {
    const clauses = edition.rules.map((rule) => rule.clause);
    expect(clauses.filter((clause, i) => clauses.indexOf(clause) !== i)).toEqual([]);
    for (const clause of clauses) expect(clause).toMatch(/^\d{3}\.0[2-9]\([a-z]\)$/);
    expect(new Set(clauses.map((clause) => clause.slice(0, 3)))).toEqual(new Set([section]));
  });

  it('names the origin of every rule and every table', () => {
    const named = [...edition.rules, ...edition.tables];
    expect(named.filter(({ source }) => !source).map(({ id }) => id)).toEqual([]);
  });

  it('says so wherever a figure is from memory, and nowhere else', () => {
    expect(
      sourcesOf(edition).filter((source) => isFromMemory(source) !== (source.origin === 'memory')),
    ).toEqual([]);
    for (const { precision } of edition.rules) {
      const saysSo = precision?.source?.includes('from memory, verify') ?? false;
      expect(saysSo).toBe(precision?.origin === 'memory');
    }
  });

  it('cites title, number, edition and section for every published figure', () => {
    const published = sourcesOf(edition).filter(({ origin }) => origin === 'read' || origin === 'memory');
    expect(published.length).toBeGreaterThan(10);
    const incomplete = published.filter(
      ({ title, number, edition, section }) => !(title && number && edition && section),
    );
    expect(incomplete).toEqual([]);
  });

  it('takes a rule’s source from the table that its limit stands in', () => {
    const differing = edition.rules.filter((rule) =>
      tablesOf(rule).some((id) => tableOf(edition, id).source?.origin !== rule.source?.origin),
    );
    expect(differing.map(({ id }) => id)).toEqual([]);
  });

  it('uses every table', () => {
    const used = new Set(edition.rules.flatMap(tablesOf));
    expect(edition.tables.filter(({ id }) => !used.has(id)).map(({ id }) => id)).toEqual([]);
  });
});

describe('published figures in edition 2026', () => {
  const edition = editionOf('2026');

  it('keeps the control points as printed', () => {
    // Mamlouk and Zaniewski, Materials for Civil and Construction Engineers, Table 5.6, p. 199 of the online copy,
    // quoting AASHTO MP 2 (read). Per size: sieve, least and most passing.
    const printed = [
      [25, 37.5, 100, null],
      [25, 25, 90, 100],
      [25, 19, null, 90],
      [25, 2.36, 19, 45],
      [25, 0.075, 1, 7],
      [19, 25, 100, null],
      [19, 19, 90, 100],
      [19, 12.5, null, 90],
      [19, 2.36, 23, 49],
      [19, 0.075, 2, 8],
      [12.5, 19, 100, null],
      [12.5, 12.5, 90, 100],
      [12.5, 9.5, null, 90],
      [12.5, 2.36, 28, 58],
      [12.5, 0.075, 2, 10],
      [9.5, 12.5, 100, null],
      [9.5, 9.5, 90, 100],
      [9.5, 4.75, null, 90],
      [9.5, 2.36, 32, 67],
      [9.5, 0.075, 2, 10],
    ];
    const rows = tableOf(edition, 'control-points').rows.map((row) => [
      row.nominalMaximumSize,
      row.sieve,
      row.min === null ? null : Number(row.min),
      row.max === null ? null : Number(row.max),
    ]);
    expect(new Set(rows.map(String))).toEqual(new Set(printed.map(String)));
  });

  it('keeps the least voids in the mineral aggregate as printed', () => {
    // FE Reference Handbook (NCEES), version 9.2, Superpave compaction requirements, p. 170 (read).
    const printed = { 9.5: 15, 12.5: 14, 19: 13, 25: 12 };
    const rows = tableOf(edition, 'vma-min').rows.map((row) => [row.nominalMaximumSize, Number(row.min)]);
    expect(Object.fromEntries(rows)).toEqual(printed);
  });

  it('keeps the dust proportion over effective binder as printed', () => {
    // Nebraska Department of Roads, Section 1028, Tables 1028.08 and 1028.09, p. 668 (read): 0.6 to 1.2.
    for (const row of tableOf(edition, 'dust-proportion').rows)
      expect([row.min, row.max]).toEqual(['0.6', '1.2']);
  });
});

describe('published figures in Section 421', () => {
  const edition = ruleSetSchema.parse(documentOf('cvra-421-2026.json'));

  it('keeps the gradation bands as printed', () => {
    // UFGS 02749, Hot-Mix Asphalt (HMA) for Airfields, Table 2, p. 14 (read). Per sieve, coarse to fine from 1 in to
    // No. 200: least and most passing of gradations 1, 2 and 3.
    const printed: Record<number, ([number, number] | null)[]> = {
      25: [[100, 100], null, null],
      19: [[76, 96], [100, 100], null],
      12.5: [
        [68, 88],
        [76, 96],
        [100, 100],
      ],
      9.5: [
        [60, 82],
        [69, 89],
        [76, 96],
      ],
      4.75: [
        [45, 67],
        [53, 73],
        [58, 78],
      ],
      2.36: [
        [32, 54],
        [38, 60],
        [40, 60],
      ],
      1.18: [
        [22, 44],
        [26, 48],
        [28, 48],
      ],
      0.6: [
        [15, 35],
        [18, 38],
        [18, 38],
      ],
      0.3: [
        [9, 25],
        [11, 27],
        [11, 27],
      ],
      0.15: [
        [6, 18],
        [6, 18],
        [6, 18],
      ],
      0.075: [
        [3, 6],
        [3, 6],
        [3, 6],
      ],
    };
    const expected = Object.entries(printed).flatMap(([sieve, bands]) =>
      bands.flatMap((band, i) => (band ? [[i + 1, Number(sieve), ...band]] : [])),
    );
    const rows = tableOf(edition, 'gradation-bands').rows.map((row) => [
      row.gradationNumber,
      row.sieve,
      Number(row.min),
      Number(row.max),
    ]);
    expect(new Set(rows.map(String))).toEqual(new Set(expected.map(String)));
  });

  it('keeps the action limits of stability and flow as printed', () => {
    // UFGS 02749, Table 6, p. 29 (read): lb and hundredths of an inch, average of the last four and individual.
    const columns = [
      'stabilityMean',
      'stabilityEach',
      'flowMeanMin',
      'flowMeanMax',
      'flowEachMin',
      'flowEachMax',
    ];
    const rows = tableOf(edition, 'marshall').rows.map((row) => [
      row.compactionBlows,
      ...columns.map((column) => Number(row[column])),
    ]);
    expect(rows).toEqual([
      [50, 1350, 950, 9, 17, 8, 18],
      [75, 2150, 1760, 9, 15, 8, 16],
    ]);
  });

  it('keeps the blows by tire pressure as printed', () => {
    // UFC 3-250-03 (2001), Table 2-5 (read): below 100 psi 50 blows, from 100 to below 230 psi 75 blows.
    expect(tableOf(edition, 'blows').rows).toEqual([
      { tirePressure: { below: 100 }, blows: '50' },
      { tirePressure: { from: 100, below: 230 }, blows: '75' },
    ]);
  });

  it('keeps the voids of the worked example as printed', () => {
    // UFC 3-250-03 (2001), Table 2-9 (read): voids of the total mix 3 to 5 %, voids filled 70 to 80 %.
    expect(limitOf(edition, 'air-voids')).toEqual({ min: '3', max: '5' });
    expect(limitOf(edition, 'vfa')).toEqual({ min: '70', max: '80' });
  });

  it('keeps the rut depth as printed, the limit itself excluded', () => {
    // Virginia Asphalt, Fall/Winter 2019, p. 23, on AC 150/5370-10H (read): less than 10 mm at 4,000 passes.
    expect(limitOf(edition, 'rut-depth')).toEqual({ max: '10', exclusive: true });
    expect(edition.rules.find(({ id }) => id === 'rut-depth')?.measure).toMatchObject({
      at: { passes: 4000 },
    });
  });
});

describe('the editions side by side', () => {
  it('run on without a gap from 2024 to 2026', () => {
    expect(editionOf('2024').effective).toEqual({ from: '2024-01-01', to: '2025-12-31' });
    expect(editionOf('2026').effective).toEqual({ from: '2026-01-01', to: null });
    expect(editionOf('2027').effective.from).toBe('2027-01-01');
  });

  it('differ in at least eight rules between 2026 and the draft of 2027', () => {
    expect(differingRules(editionOf('2026'), editionOf('2027')).length).toBeGreaterThanOrEqual(8);
  });

  it('differ in at least six rules between 2024 and 2026', () => {
    expect(differingRules(editionOf('2024'), editionOf('2026')).length).toBeGreaterThanOrEqual(6);
  });
});

describe('Supplement S-07', () => {
  it('stands on edition 2026 and adds, replaces, removes and patches', () => {
    expect(supplement.layerOf).toEqual({ id: 'cvra-412', edition: '2026' });
    expect(supplement.add.rules.length).toBeGreaterThan(0);
    expect(supplement.add.tables.length).toBeGreaterThan(0);
    expect(supplement.add.attributes.length).toBeGreaterThan(0);
    expect(supplement.replace.rules.length).toBeGreaterThan(0);
    expect(supplement.replace.tables.length).toBeGreaterThan(0);
    expect(supplement.remove.rules.length).toBeGreaterThan(0);
    expect(supplement.patchRows.length).toBeGreaterThan(0);
  });

  it('names the supplement as the source of everything it brings', () => {
    const { add, replace } = supplement;
    for (const { source } of [...add.rules, ...add.tables, ...replace.rules, ...replace.tables]) {
      expect(source).toMatchObject({ number: 'CVRA S-07', origin: 'agency' });
    }
  });
});

function documentOf(file: string): unknown {
  return shippedRuleSets.find((each) => each.file === file)?.document;
}

function editionOf(edition: string): RuleSet {
  return ruleSetSchema.parse(
    documentOf(edition === '2027' ? 'cvra-412-2027-draft.json' : `cvra-412-${edition}.json`),
  );
}

function limitOf(edition: RuleSet, id: string): Rule['limit'] | undefined {
  return edition.rules.find((rule) => rule.id === id)?.limit;
}

function tableOf(edition: RuleSet, id: string): LimitTable {
  const table = edition.tables.find((each) => each.id === id);
  if (!table) throw new Error(`no table ${id}`);
  return table;
}

function tablesOf(rule: Rule): string[] {
  const { min, max, target } = rule.limit;
  return [...new Set([min, max, target].flatMap((bound) => (isTableReference(bound) ? [bound.table] : [])))];
}

function sourcesOf(edition: RuleSet): RuleSource[] {
  return [...edition.rules, ...edition.tables].flatMap(({ source }) => (source ? [source] : []));
}

function isFromMemory(source: RuleSource): boolean {
  return source.section?.includes('from memory, verify') ?? false;
}

/** Ids of rules that either edition lacks, or whose own text or limit table is another; sources do not count. */
function differingRules(left: RuleSet, right: RuleSet): string[] {
  const ids = new Set([...left.rules, ...right.rules].map((rule) => rule.id));
  return [...ids].filter((id) => substance(left, id) !== substance(right, id));
}

function substance(edition: RuleSet, id: string): string | null {
  const rule = edition.rules.find((each) => each.id === id);
  if (!rule) return null;
  const { source: _, ...rest } = rule;
  return JSON.stringify([rest, tablesOf(rule).map((table) => tableOf(edition, table).rows)]);
}
