import { documentRows, performanceRows } from './bw-125-s4';
import { type DemoDates, type DemoMix, dateBefore, specimen } from './demo-mix';

/** Kestrel Dale's 9.5 mm surface mix for light traffic, without reclaimed material: every required rule passes. */
export function kestrelSurface(dates: DemoDates): DemoMix {
  return {
    designation: 'KD-095-L1',
    laboratory: 'Kestrel Dale Laboratory',
    attributes: {
      'Mix type': 'dense-graded',
      'Nominal maximum aggregate size': 9.5,
      'Design traffic': 1,
      Course: 'Surface course',
      'Binder grade': 'PG 58-28',
      'Compaction method': 'Gyratory',
    },
    scalars: {
      'Job mix binder content by mass of mix': 5.9,
      'Specific gravity of the binder': 1.026,
      'Initial number of gyrations': 7,
      'Design number of gyrations': 75,
      'Maximum number of gyrations': 115,
      'Mixing temperature': 148,
      'Compaction temperature': 136,
      'Reclaimed asphalt pavement content by mass of mix': 0,
      'Reclaimed asphalt shingle content by mass of mix': 0,
      'Recycled binder ratio as reported': 0,
    },
    sievesMm: [12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075],
    stockpiles: [
      {
        name: '9.5 mm stone',
        share: 30,
        gsb: 2.652,
        gsa: 2.735,
        absorption: 1.14,
        passing: [100, 94, 38, 7, 4, 3, 2.5, 2, 1.6],
        deleterious: 0.2,
      },
      {
        name: 'Chip',
        share: 25,
        gsb: 2.645,
        gsa: 2.73,
        absorption: 1.18,
        passing: [100, 100, 80, 20, 10, 7, 5, 4, 3],
        deleterious: 0.3,
      },
      {
        name: 'Washed sand',
        share: 45,
        gsb: 2.628,
        gsa: 2.72,
        absorption: 1.29,
        passing: [100, 100, 98, 90, 62, 42, 24, 13, 7.6],
        deleterious: 0.5,
      },
    ],
    // 2.36 mm: 0.3·7 + 0.25·20 + 0.45·90 = 47.6; 0.075 mm: 0.48 + 0.75 + 3.42 = 4.65.
    jobMix: [100, 98.2, 75.5, 47.6, 31.6, 21.6, 12.8, 7.5, 4.7],
    trials: [
      {
        trial: 'A',
        binderContent: 5.4,
        gmm: [2.482, 2.481],
        specimens: [specimen(2.354, 4702.4), specimen(2.356, 4705.1)],
      },
      {
        trial: 'design',
        binderContent: 5.9,
        // Gse is 94.1/(100/2.463 − 5.9/1.026) = 2.700 in every trial.
        gmm: [2.464, 2.462],
        specimens: [specimen(2.363, 4706.3), specimen(2.366, 4709.8), specimen(2.364, 4704.9)],
        heights: [
          [125.6, 115.3],
          [125.4, 115.1],
          [125.7, 115.4],
        ],
        maximum: [specimen(2.397, 4707.7), specimen(2.399, 4710.2)],
        reported: {
          'Air voids': 4,
          'Voids in the mineral aggregate': 15.7,
          'Voids filled with asphalt': 74.5,
          'Dust proportion': 0.93,
        },
      },
      {
        trial: 'C',
        binderContent: 6.4,
        gmm: [2.445, 2.444],
        specimens: [specimen(2.373, 4711.5), specimen(2.375, 4714.3)],
      },
    ],
    aggregates: [
      {
        'Sand equivalent': 58,
        'Abrasion loss': 22,
        'Coarse aggregate with one or more fractured faces': 88,
        'Fine aggregate angularity': 43.5,
        'Flat and elongated particles 5:1': 4,
        'Soundness loss sodium': 3,
      },
    ],
    moisture: [
      { subset: 'dry', loads: [15.1, 15.3, 14.9], voids: [7, 7.1, 6.9], saturation: [] },
      { subset: 'conditioned', loads: [13.5, 13.9, 13.7], voids: [6.9, 7, 7.1], saturation: [75, 74, 76] },
    ],
    performance: performanceRows({
      rut: [7.2, 7.9],
      flexibility: [12.1, 11.4, 12.8, 11.9],
      cracking: [118, 109, 124, 113, 121],
    }),
    documents: documentRows(dates).filter(({ Document }) => Document !== 'Recycled material report'),
    testedOn: dateBefore(dates.submittedOn, 30),
  };
}
