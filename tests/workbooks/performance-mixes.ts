import type { FilledValue, TemplateContent } from './fill-template';

type Row = Record<string, FilledValue>;

/** One row a specimen under the same conditions. */
function specimens(header: string, values: number[], conditions: Row = {}): Row[] {
  return values.map((value, place) => ({
    Trial: 'design',
    Specimen: `${place + 1}`,
    ...conditions,
    [header]: value,
  }));
}

const common = {
  'Design traffic': 12,
  'Climate zone': 'moderate',
  Course: 'surface',
  'Lift thickness': 45,
};

const documents = [
  ['Binder certificate', '2026-01-20'],
  ['Performance test report', '2026-02-16'],
  ['Laboratory accreditation', '2025-06-01'],
  ['Technician certificate', '2024-05-02'],
  ['Equipment calibration record', '2025-11-03'],
  ['Fibre certificate', '2025-12-15'],
  ['Aggregate source approval', '2025-09-01'],
].map(([document = '', date = '']): Row => ({ Document: document, Date: date }));

/** The mix of the edition's own case `a-whole-open-graded-mix`. */
export const openGradedMix: TemplateContent = {
  submittal: {
    ...common,
    'Mix type': 'OGFC',
    'Nominal maximum aggregate size': 12.5,
    'Binder grade': 'PG 76-22',
    'Job mix binder content by mass of mix': 6.2,
    'Target air voids': 20.5,
    'Reclaimed asphalt pavement content by mass of mix': 0,
  },
  tables: {
    Trials: [
      ...specimens('Bulk specific gravity of the compacted mix', [2.002, 2.006, 1.998]),
      ...specimens('Maximum specific gravity', [2.519, 2.521]).map((row) => ({
        ...row,
        Specimen: `M${String(row.Specimen)}`,
      })),
    ],
    Stockpiles: [{ Stockpile: 'Blend', 'Stockpile share': 100, 'Water absorption of the aggregate': 1.1 }],
    Aggregates: [
      {
        'Coarse aggregate with two or more fractured faces': 96,
        'Flat and elongated particles 5:1': 3,
        'Abrasion loss': 18,
        'Voids in the dry-rodded coarse aggregate': 41.5,
      },
    ],
    Moisture: [{ Trial: 'design', 'Tensile strength ratio': 86 }],
    Performance: [
      { Trial: 'design', 'Fibre content': 0.35, 'Voids in the coarse aggregate of the mix': 36.8 },
      ...specimens('Draindown', [0.08, 0.11]),
      ...specimens('Cantabro loss', [11.2, 12.4, 12.9], { Aging: 'unaged' }),
      ...specimens('Cantabro loss', [19.8, 21, 22.5], { Aging: 'long-term' }),
      ...specimens('Permeability', [18_200, 19_400, 20_100]),
    ],
    Documents: documents,
  },
  methods: {},
  gradation: {
    sievesMm: [19, 12.5, 9.5, 4.75, 2.36, 0.075],
    stockpiles: [],
    columns: { 'Job mix formula': [100, 92, 60, 18, 7, 3] },
  },
};
