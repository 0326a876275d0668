import { documentRows, performanceRows } from './bw-125-s4';
import { type DemoDates, type DemoMix, dateBefore, specimen } from './demo-mix';

const sievesMm = [25, 19, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075];

/** Tollhouse's 19 mm binder mix as first submitted: too dry and dusty, weak in water, with papers missing. */
export function tollhouseBinder(dates: DemoDates): DemoMix {
  return {
    designation: 'TA-190-B2',
    laboratory: 'Tollhouse Site Laboratory',
    attributes: {
      'Mix type': 'dense-graded',
      'Nominal maximum aggregate size': 19,
      'Design traffic': 4,
      Course: 'Binder course',
      'Binder grade': 'PG 64-22',
      'Compaction method': 'Gyratory',
    },
    scalars: {
      'Job mix binder content by mass of mix': 4.6,
      'Specific gravity of the binder': 1.03,
      'Initial number of gyrations': 8,
      'Design number of gyrations': 100,
      'Maximum number of gyrations': 160,
      'Mixing temperature': 157,
      'Compaction temperature': 146,
      'Reclaimed asphalt pavement content by mass of mix': 15,
      'Reclaimed asphalt shingle content by mass of mix': 0,
    },
    sievesMm,
    stockpiles: [
      {
        name: '19 mm stone',
        share: 28,
        gsb: 2.665,
        gsa: 2.745,
        absorption: 1.09,
        passing: [100, 88, 48, 20, 7, 4, 3, 2.5, 2.2, 2, 1.8],
        deleterious: 0.4,
      },
      {
        name: '12.5 mm stone',
        share: 22,
        gsb: 2.66,
        gsa: 2.742,
        absorption: 1.12,
        passing: [100, 100, 90, 55, 16, 7, 5, 4, 3.5, 3, 2.4],
        deleterious: 1.4,
      },
      {
        name: 'Crusher sand',
        share: 35,
        gsb: 2.64,
        gsa: 2.735,
        absorption: 1.32,
        passing: [100, 100, 100, 100, 94, 72, 50, 34, 20, 13, 9.6],
        deleterious: 0.6,
      },
      {
        name: 'RAP',
        share: 15,
        gsb: 2.645,
        gsa: 2.72,
        absorption: 1.04,
        passing: [100, 100, 98, 90, 66, 48, 36, 27, 18, 12, 9.4],
        deleterious: 0.5,
      },
    ],
    // 0.075 mm: 0.28·1.8 + 0.22·2.4 + 0.35·9.6 + 0.15·9.4 = 5.80.
    jobMix: [100, 96.6, 82.9, 66.2, 48.3, 35.1, 24.8, 17.5, 11.1, 7.6, 5.8],
    trials: [
      {
        trial: 'A',
        binderContent: 4.1,
        gmm: [2.543, 2.541],
        specimens: [specimen(2.388, 4735.2), specimen(2.391, 4731.7)],
      },
      {
        trial: 'design',
        binderContent: 4.6,
        // Va = 100·(2.5225 − 2.4013)/2.5225 = 4.80.
        gmm: [2.523, 2.522],
        specimens: [specimen(2.4, 4738.4), specimen(2.402, 4740.9), specimen(2.402, 4736)],
        heights: [
          [126.4, 115.8],
          [126.2, 115.7],
          [126.5, 116],
        ],
        maximum: [specimen(2.438, 4737.1), specimen(2.44, 4739.3)],
        reported: {
          'Air voids': 4.8,
          'Voids in the mineral aggregate': 13.6,
          'Voids filled with asphalt': 64.8,
          'Dust proportion': 1.53,
        },
      },
      {
        trial: 'C',
        binderContent: 5.1,
        gmm: [2.504, 2.503],
        specimens: [specimen(2.415, 4742.6), specimen(2.417, 4744.1)],
      },
    ],
    aggregates: [
      {
        'Sand equivalent': 43,
        'Abrasion loss': 31,
        'Coarse aggregate with one or more fractured faces': 90,
        'Coarse aggregate with two or more fractured faces': 86,
        'Fine aggregate angularity': 46.1,
        'Flat and elongated particles 5:1': 6,
        'Soundness loss sodium': 5,
      },
      ...[4.61, 4.72, 4.55].map((content, at) => ({
        Specimen: at + 1,
        'Binder content of the reclaimed asphalt pavement': content,
      })),
    ],
    moisture: [
      { subset: 'dry', loads: [16.2, 15.9], voids: [7, 7.1], saturation: [] },
      { subset: 'conditioned', loads: [11.4, 11.9, 11.6], voids: [7.1, 6.9, 7], saturation: [74, 82, 73] },
    ],
    performance: performanceRows({ rut: [8.8, 9.4], flexibility: [], cracking: [], inflection: 8600 }),
    documents: documentRows(dates).filter(
      ({ Document }) => Document !== 'Binder certificate' && Document !== 'Technician certificate',
    ),
    testedOn: dateBefore(dates.submittedOn, 41),
  };
}

/** Revision 1: two tenths more binder, less dust, an anti-strip additive, and the papers. */
export function tollhouseBinderMended(dates: DemoDates): DemoMix {
  const mix = tollhouseBinder(dates);
  const dust: Record<string, number[]> = {
    '19 mm stone': [2, 1.5],
    '12.5 mm stone': [3, 1.9],
    'Crusher sand': [11, 7],
    RAP: [12, 8.6],
  };
  return {
    ...mix,
    scalars: { ...mix.scalars, 'Job mix binder content by mass of mix': 4.8 },
    stockpiles: mix.stockpiles.map((pile) => ({
      ...pile,
      passing: [...pile.passing.slice(0, -2), ...(dust[pile.name] ?? [])],
      deleterious: Math.min(pile.deleterious, 0.7),
    })),
    // 0.075 mm: 0.28·1.5 + 0.22·1.9 + 0.35·7 + 0.15·8.6 = 4.58.
    jobMix: [100, 96.6, 82.9, 66.2, 48.3, 35.1, 24.8, 17.5, 11.1, 6.9, 4.6],
    trials: [
      {
        trial: 'A',
        binderContent: 4.3,
        gmm: [2.535, 2.533],
        specimens: [specimen(2.406, 4736.8), specimen(2.409, 4733.5)],
      },
      {
        trial: 'design',
        binderContent: 4.8,
        // Va = 100·(2.515 − 2.4143)/2.515 = 4.00.
        gmm: [2.516, 2.514],
        specimens: [specimen(2.413, 4739.6), specimen(2.416, 4742.2), specimen(2.414, 4737.4)],
        heights: [
          [126.6, 115.7],
          [126.4, 115.5],
          [126.7, 115.8],
        ],
        maximum: [specimen(2.447, 4738.3), specimen(2.449, 4741.5)],
        reported: {
          'Air voids': 4,
          'Voids in the mineral aggregate': 13.3,
          'Voids filled with asphalt': 70,
          'Dust proportion': 1.15,
        },
      },
      {
        trial: 'C',
        binderContent: 5.3,
        gmm: [2.497, 2.495],
        specimens: [specimen(2.423, 4744.2), specimen(2.425, 4745.8)],
      },
    ],
    aggregates: mix.aggregates.map((row) =>
      'Sand equivalent' in row ? { ...row, 'Sand equivalent': 52 } : row,
    ),
    moisture: [
      { subset: 'dry', loads: [16.2, 15.9, 16.4], voids: [7, 7.1, 6.9], saturation: [] },
      { subset: 'conditioned', loads: [14.1, 14.4, 13.9], voids: [7.1, 6.9, 7], saturation: [74, 76, 73] },
    ],
    performance: performanceRows({ rut: [6.9, 7.3], flexibility: [10.4, 9.8, 10.9, 10.1], cracking: [] }),
    documents: documentRows(dates),
    testedOn: dateBefore(dates.submittedOn, 19),
  };
}
