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

const times = [1, 2, 5, 10, 20, 50, 100];

/** The sigmoid D∞ + (D0 − D∞)/(1 + (t/τ)^n) in 1/GPa, as two specimens report it. */
function compliances(temperature: number, D0: number, Dinf: number, tau: number, n: number): Row[] {
  return ['1', '2'].flatMap((specimen) =>
    times.map((time) => ({
      Temperature: temperature,
      Specimen: specimen,
      'Loading time': time,
      'Creep compliance': Number((Dinf + (D0 - Dinf) / (1 + (time / tau) ** n)).toPrecision(5)),
    })),
  );
}

/**
 * 0.045 + 0.0135·t^0.42 in 1/GPa as the deformations of six equal faces: µm per 1/GPa is
 * P·GL/(D·b·C)·1000 = 10·38/(150·50·1.17685)·1000 = 43.05, with C of X/Y 0.4211.
 */
function deformations(): Row[] {
  const faces = ['1', '2', '3'].flatMap((specimen) => ['front', 'rear'].map((face) => ({ specimen, face })));
  return faces.flatMap(({ specimen, face }) =>
    times.map((time, place) => {
      const horizontal = 43.05 * (0.045 + 0.0135 * time ** 0.42);
      return {
        Temperature: -10,
        Specimen: specimen,
        Face: face,
        'Loading time': time,
        'Horizontal deformation': Number(horizontal.toFixed(3)),
        'Vertical deformation': Number((horizontal / 0.4211).toFixed(3)),
        ...(place === 0 && face === 'front'
          ? { 'Specimen thickness': 50, 'Specimen diameter': 150, 'Creep load': 10 }
          : {}),
      };
    }),
  );
}

function statedAt(temperature: number, time: number, values: number[]): Row[] {
  return values.map((value, place) => ({
    Temperature: temperature,
    Specimen: `${place + 1}`,
    'Loading time': time,
    'Creep compliance': value,
  }));
}

/** The mix of the edition's own case `a-whole-dense-mix`, as a laboratory fills it in. */
export const denseMix: TemplateContent = {
  submittal: {
    ...common,
    'Mix type': 'dense-graded',
    'Nominal maximum aggregate size': 12.5,
    'Binder grade': 'PG 70-22',
    'Job mix binder content by mass of mix': 5.6,
    'Specific gravity of the binder': 1.03,
    'Reclaimed asphalt pavement content by mass of mix': 20,
  },
  tables: {
    Trials: [
      ...specimens('Bulk specific gravity of the compacted mix', [2.384, 2.388]),
      ...specimens('Maximum specific gravity', [2.484, 2.486]).map((row) => ({
        ...row,
        Specimen: `M${String(row.Specimen)}`,
      })),
    ],
    Stockpiles: [
      { Stockpile: 'Blend', 'Stockpile share': 100, 'Bulk specific gravity of the aggregate': 2.655 },
    ],
    Aggregates: [{ 'Coarse aggregate with two or more fractured faces': 90, 'Sand equivalent': 58 }],
    Moisture: [
      ...[7, 6.9, 7.2].map((voids, place) => ({
        Trial: 'design',
        Specimen: `D${place + 1}`,
        Subset: 'dry',
        'Air voids': voids,
        'Dry tensile strength': 900 + 10 * place,
      })),
      ...[1, 2, 3].map((place) => ({
        Trial: 'design',
        Specimen: `W${place}`,
        Subset: 'conditioned',
        'Degree of saturation': 74 + place,
        'Conditioned tensile strength': 780 + 10 * place,
      })),
    ],
    Performance: [
      { Trial: 'design', 'Fibre content': 0 },
      ...specimens('Wheel-track rut depth', [4.6, 5.1], { Temperature: 50, Passes: 20_000 }),
      ...specimens('Passes to the rut depth', [21_400, 22_800], { Temperature: 50 }),
      ...specimens('Stripping inflection point', [17_500, 18_200], { Temperature: 50 }),
      ...specimens('Flow number', [320, 335, 350]),
      ...specimens('Rutting tolerance index', [88, 91, 94]),
      ...specimens('High-temperature indirect tensile strength', [175, 181, 186], { Temperature: 50 }),
      ...specimens('Cracking tolerance index', [88, 92, 97], { Aging: 'short-term' }),
      ...specimens('Cracking tolerance index', [52, 55, 57], { Aging: 'long-term' }),
      ...specimens('Flexibility index', [10.2, 10.8, 11.1, 11.6], { Aging: 'short-term' }),
      ...specimens('Flexibility index', [5.4, 5.8, 6.1, 6.3], { Aging: 'long-term' }),
      ...specimens('Disk-shaped compact tension fracture energy', [520, 540, 555], { Temperature: -12 }),
      ...specimens('Low-temperature tensile strength', [3.1, 3.2, 3.3], { Temperature: -10 }),
      ...specimens('Cyclic fatigue index', [26, 27.5, 29]),
      ...specimens("Poisson's ratio", [0.28, 0.3], { Temperature: -10 }),
      ...specimens('Cantabro loss', [4.1, 4.4, 4.6]),
    ],
    Creep: [
      ...statedAt(-20, 100, [0.052, 0.054]),
      ...deformations(),
      ...compliances(0, 0.06, 1.8, 900, 0.6),
      ...compliances(20, 0.2, 12, 300, 0.6),
      ...statedAt(40, 10, [14.5, 15.5]),
    ],
    Documents: documents,
  },
  methods: {},
  gradation: { sievesMm: [0.075], stockpiles: [], columns: { 'Job mix formula': [5] } },
};

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
