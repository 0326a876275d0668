import { expect, it, vi } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import { readWorkbook } from '#rules/reading/interpret';
import { templateMapping } from '#rules/reading/template-mapping';
import { resolveEdition } from '#rules/rule-sets/resolve';
import { parseRuleSet } from '#rules/rule-sets/schema';
import airfield from '#rules/sets/cvra-421-2026.json';
import { decodeWorkbook } from '#server/workbook/decode';
import { buildTemplate, finishTemplate } from '#server/workbook/write-template';
import { type FilledValue, fillTemplate, type TemplateContent } from './fill-template';

vi.setConfig({ testTimeout: 60_000 });

const sublots = ['S1', 'S2', 'S3', 'S4'];
const each = <Row extends Record<string, FilledValue>>(
  count: number,
  row: (place: number, specimen: string) => Row,
) => Array.from({ length: count }, (_, place) => row(place, `${place + 1}`));

/** The mix of the edition's own case `a-whole-mix`, as a laboratory fills it in. */
const content: TemplateContent = {
  submittal: {
    'Pavement area': 'runway',
    'Aircraft tire pressure': 200,
    'Gradation number': 2,
    Course: 'surface',
    'Binder grade': 'PG 70-22',
    'Compaction method': 'marshall',
    'Compaction blows': 75,
    'Job mix binder content by mass of mix': 5.5,
    'Specific gravity of the binder': 1.03,
    'Mixing temperature': 162,
    'Compaction temperature': 150,
    'Reclaimed asphalt pavement content by mass of mix': 0,
    'Lift thickness': 55,
    'Anti-strip additive content': 0.4,
  },
  tables: {
    Trials: [
      ...[2.388, 2.392, 2.385, 2.39].map((gravity, place) => ({
        Trial: 'design',
        Specimen: sublots[place] ?? '',
        'Bulk specific gravity of the compacted mix': gravity,
      })),
      ...[2.48, 2.482].map((gravity, place) => ({
        Trial: 'design',
        Specimen: `M${place + 1}`,
        'Maximum specific gravity': gravity,
      })),
      {
        Trial: 'design',
        Laboratory: 'agency',
        'Binder content by mass of mix': 5.42,
        'Maximum specific gravity': 2.474,
        'Bulk specific gravity of the compacted mix': 2.381,
      },
    ],
    Aggregates: [
      {
        'Sand equivalent': 62,
        'Abrasion loss': 22,
        'Coarse aggregate with two or more fractured faces': 88,
        'Coarse aggregate with one or more fractured faces': 96,
        'Flat and elongated particles 5:1': 3,
        'Soundness loss magnesium': 6,
        'Natural sand content': 8,
      },
      { Stockpile: 'Coarse', 'Deleterious materials': 0.1 },
      { Stockpile: 'Sand', 'Deleterious materials': 0.3 },
    ],
    Stockpiles: [
      {
        Stockpile: 'Coarse',
        'Stockpile share': 60,
        'Bulk specific gravity of the aggregate': 2.66,
        'Water absorption of the aggregate': 1.2,
      },
      {
        Stockpile: 'Sand',
        'Stockpile share': 40,
        'Bulk specific gravity of the aggregate': 2.66,
        'Water absorption of the aggregate': 1.2,
      },
    ],
    Moisture: [
      ...each(3, (place, specimen) => ({
        Trial: 'design',
        Specimen: `D${specimen}`,
        Subset: 'dry',
        'Air voids': [6.8, 7, 7.1][place] ?? 0,
        'Dry tensile strength': [900, 910, 920][place] ?? 0,
      })),
      ...each(3, (place, specimen) => ({
        Trial: 'design',
        Specimen: `W${specimen}`,
        Subset: 'conditioned',
        'Degree of saturation': [72, 75, 77][place] ?? 0,
        'Conditioned tensile strength': [790, 800, 810][place] ?? 0,
      })),
    ],
    Performance: [
      ...each(4, (place) => ({
        Trial: 'design',
        Specimen: sublots[place] ?? '',
        'Marshall stability': [11.2, 11.8, 10.9, 11.5][place] ?? 0,
        'Marshall flow': [2.9, 3.1, 3, 3.2][place] ?? 0,
      })),
      ...each(2, (place, specimen) => ({
        Trial: 'design',
        Specimen: `R${specimen}`,
        Passes: 4000,
        'Loaded-wheel rut depth': [4.1, 4.6][place] ?? 0,
      })),
      ...each(4, (place, specimen) => ({
        Trial: 'design',
        Specimen: `C${specimen}`,
        'Form of the test': 'maximum',
        'Field density': [94.2, 94.8, 93.9, 95][place] ?? 0,
      })),
      ...each(4, (place, specimen) => ({
        Trial: 'design',
        Specimen: `J${specimen}`,
        'Joint density': [92.1, 92.8, 91.9, 92.6][place] ?? 0,
      })),
      { Trial: 'design', 'Retained Marshall stability': 86 },
    ],
    Documents: [
      ['Binder certificate', '2026-01-20'],
      ['Mix design report', '2026-02-20'],
      ['Laboratory accreditation', '2025-06-01'],
      ['Aggregate source approval', '2025-09-01'],
      ['Equipment calibration record', '2025-11-03'],
      ['Mixing and compaction temperature chart', '2026-02-20'],
      ['Additive certificate', '2025-12-15'],
    ].map(([document = '', date = '']) => ({ Document: document, Date: date })),
  },
  methods: {},
  gradation: {
    sievesMm: [19, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075],
    stockpiles: [],
    columns: { 'Job mix formula': [100, 86, 78, 62, 48, 36, 27, 18, 11, 4.6] },
  },
};

async function readBack() {
  const parsed = parseRuleSet(airfield);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems));
  const resolution = resolveEdition(parsed.ruleSet);
  if (!resolution.ok) throw new Error(JSON.stringify(resolution.problems));
  const { edition } = resolution;
  const workbook = buildTemplate(edition, { editionHash: '0f3a' });
  fillTemplate(workbook, content);
  const decoded = await decodeWorkbook(await finishTemplate(workbook, '0f3a'), 'airfield.xlsx');
  if (!decoded.ok) throw new Error(decoded.problem.detail);
  const mapping = templateMapping(edition);
  return { edition, reading: readWorkbook({ grid: decoded.grid, mapping, edition, answers: [] }) };
}

it('reads an airfield mix from its template without a doubt, and finds that every rule holds but one', async () => {
  const { edition, reading } = await readBack();
  expect([reading.doubts, reading.unread]).toEqual([[], []]);
  const { findings } = evaluate(reading.record, edition, {
    submittedOn: '2026-03-09',
    lettingOn: '2026-01-14',
    facts: {},
  });
  const open = findings.filter(({ kind, outcome }) => kind !== 'consistency' && outcome !== 'pass');
  // The calibration has to be enclosed, and files are attached after the upload.
  expect(open.map(({ rule, outcome }) => [rule, outcome])).toEqual([['equipment-calibration', 'not shown']]);
  const impossible = findings.filter(
    ({ kind, severity }) => kind === 'consistency' && severity === 'required',
  );
  expect(impossible).toEqual([]);
});
