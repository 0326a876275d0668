import { brightwaterCreep } from './bw-125-s4-creep';
import { type DemoDates, type DemoMix, dateBefore, specimen } from './demo-mix';

/**
 * Brightwater's 12.5 mm surface mix. The dust proportion that it reports is passing 0.075 mm over total binder,
 * 5.6/5.3 = 1.06; over effective binder it is 1.26.
 */
export function brightwaterSurface(dates: DemoDates): DemoMix {
  return {
    designation: 'BW-125-S4',
    laboratory: 'Brightwater Central Laboratory',
    attributes: {
      'Mix type': 'dense-graded',
      'Nominal maximum aggregate size': 12.5,
      'Design traffic': 12,
      Course: 'Surface course',
      'Binder grade': 'PG 64-22',
      'Compaction method': 'Gyratory',
    },
    scalars: {
      'Job mix binder content by mass of mix': 5.3,
      'Specific gravity of the binder': 1.028,
      'Initial number of gyrations': 8,
      'Design number of gyrations': 100,
      'Maximum number of gyrations': 160,
      'Mixing temperature': 156,
      'Compaction temperature': 144,
      'Reclaimed asphalt pavement content by mass of mix': 20,
      'Reclaimed asphalt shingle content by mass of mix': 0,
    },
    sievesMm: [19, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075],
    stockpiles: [
      {
        name: '12.5 mm stone',
        share: 25,
        gsb: 2.65,
        gsa: 2.735,
        absorption: 1.17,
        passing: [100, 86, 58, 16, 6, 4, 3, 2.5, 2, 1.6],
        deleterious: 0.3,
      },
      {
        name: '9.5 mm chip',
        share: 20,
        gsb: 2.645,
        gsa: 2.732,
        absorption: 1.2,
        passing: [100, 100, 92, 34, 12, 8, 6, 4, 3, 2.4],
        deleterious: 0.2,
      },
      {
        name: 'Screenings',
        share: 35,
        gsb: 2.624,
        gsa: 2.72,
        absorption: 1.35,
        passing: [100, 100, 100, 97, 80, 54, 36, 20, 11, 7.8],
        deleterious: 0.4,
      },
      {
        name: 'RAP',
        share: 20,
        gsb: 2.635,
        gsa: 2.715,
        absorption: 1.12,
        passing: [100, 99, 93, 72, 52, 40, 30, 20, 13, 10],
        deleterious: 0.5,
      },
    ],
    // Σ share·passing: 0.075 mm is 0.25·1.6 + 0.2·2.4 + 0.35·7.8 + 0.2·10 = 5.61.
    jobMix: [100, 96.3, 86.5, 59.2, 42.3, 29.5, 20.6, 12.4, 7.6, 5.6],
    trials: [
      {
        trial: 'A',
        binderContent: 4.8,
        gmm: [2.506, 2.504],
        specimens: [
          { inAir: 4708.6, surfaceDry: 4718, inWater: 2728.7 },
          { inAir: 4711.9, surfaceDry: 4722, inWater: 2734.7 },
          { inAir: 4706.2, surfaceDry: 4717, inWater: 2730.4 },
        ],
      },
      {
        trial: 'B',
        binderContent: 5.3,
        gmm: [2.487, 2.485],
        // Gmb 2.385, 2.389, 2.387: mean 2.387; Va = 100·(2.486 − 2.387)/2.486 = 3.98.
        specimens: [
          { inAir: 4711.7, surfaceDry: 4719.5, inWater: 2743.9 },
          { inAir: 4715, surfaceDry: 4723.5, inWater: 2749.9 },
          { inAir: 4709.3, surfaceDry: 4718.5, inWater: 2745.6 },
        ],
        heights: [
          [126, 115.4],
          [125.8, 115.2],
          [126.1, 115.5],
        ],
        maximum: [specimen(2.42, 4713.2), specimen(2.418, 4710.8)],
      },
      {
        trial: 'C',
        binderContent: 5.8,
        gmm: [2.469, 2.467],
        specimens: [
          { inAir: 4714.8, surfaceDry: 4721, inWater: 2753.2 },
          { inAir: 4718.1, surfaceDry: 4725, inWater: 2759.1 },
          { inAir: 4712.4, surfaceDry: 4720, inWater: 2754.9 },
        ],
      },
      {
        trial: 'D',
        binderContent: 6.3,
        gmm: [2.45, 2.448],
        specimens: [
          { inAir: 4717.9, surfaceDry: 4722.5, inWater: 2756.7 },
          { inAir: 4721.2, surfaceDry: 4726.5, inWater: 2762.6 },
          { inAir: 4715.5, surfaceDry: 4721.5, inWater: 2758.3 },
        ],
      },
    ],
    // What the laboratory reports for the proposed job mix, trial B.
    reported: {
      'Air voids': 4,
      'Voids in the mineral aggregate': 14.3,
      'Voids filled with asphalt': 72.1,
      'Dust proportion': { formula: '5.6/5.3', result: 5.6 / 5.3 },
    },
    aggregates: [
      {
        'Sand equivalent': 54,
        'Abrasion loss': 24,
        'Coarse aggregate with one or more fractured faces': 98,
        'Coarse aggregate with two or more fractured faces': 95,
        'Fine aggregate angularity': 46.8,
        'Flat and elongated particles 5:1': 3,
        'Soundness loss sodium': 4,
      },
      ...[4.82, 4.95, 4.7].map((content, at) => ({
        Specimen: at + 1,
        'Binder content of the reclaimed asphalt pavement': content,
      })),
    ],
    moisture: [
      { subset: 'dry', loads: [15.6, 15.9, 15.4], voids: [7, 6.9, 7.1], saturation: [] },
      { subset: 'conditioned', loads: [13.6, 13.4, 13.9], voids: [7, 7.1, 6.9], saturation: [74, 76, 73] },
    ],
    performance: performanceRows({
      rut: [6.4, 7.1],
      flexibility: [10.2, 9.6, 11.1, 9.9],
      cracking: [92, 88, 101, 95, 90],
    }),
    documents: documentRows(dates),
    testedOn: dateBefore(dates.submittedOn, 34),
  };
}

export function performanceRows(results: {
  rut: number[];
  flexibility: number[];
  cracking: number[];
  inflection?: string | number;
}): DemoMix['performance'] {
  return [
    ...results.rut.map((depth, at) => ({
      Specimen: `H${at + 1}`,
      Temperature: 50,
      Passes: 20_000,
      'Wheel-track rut depth': depth,
      'Stripping inflection point': results.inflection ?? '>20000',
    })),
    ...results.flexibility.map((index, at) => ({
      Specimen: `F${at + 1}`,
      Temperature: 25,
      'Flexibility index': index,
    })),
    ...results.cracking.map((index, at) => ({
      Specimen: `C${at + 1}`,
      Temperature: 25,
      'Cracking tolerance index': index,
    })),
  ];
}

export function documentRows({ submittedOn, lettingOn }: DemoDates): DemoMix['documents'] {
  return [
    {
      Document: 'Binder certificate',
      Issuer: 'Fernhill Binder Terminal',
      Reference: 'FB-7714',
      Date: dateBefore(submittedOn, 26),
    },
    {
      Document: 'Mix design report',
      Issuer: 'Brightwater Central Laboratory',
      Reference: 'MD-0418',
      Date: dateBefore(submittedOn, 12),
    },
    {
      Document: 'Aggregate source approval',
      Issuer: 'Carrow Valley Roads Authority',
      Reference: 'SA-2210',
      Date: dateBefore(lettingOn, 100),
    },
    {
      Document: 'Laboratory accreditation',
      Issuer: 'Carrow Laboratory Council',
      Reference: 'LA-118',
      Date: dateBefore(submittedOn, 300),
    },
    {
      Document: 'Technician certificate',
      Issuer: 'Carrow Laboratory Council',
      Reference: 'TC-0552',
      Date: dateBefore(submittedOn, 420),
    },
    {
      Document: 'Recycled material report',
      Issuer: 'Brightwater Central Laboratory',
      Reference: 'RM-0091',
      Date: dateBefore(submittedOn, 40),
    },
    {
      Document: 'Safety data sheet of the binder',
      Issuer: 'Fernhill Binder Terminal',
      Reference: 'SDS-6422',
      Date: dateBefore(submittedOn, 200),
    },
  ];
}

/** Revision 1: less dust in the screenings and the ratio taken over effective binder. */
export function brightwaterSurfaceMended(dates: DemoDates): DemoMix {
  const mix = brightwaterSurface(dates);
  const passing = [
    [100, 86, 58, 16, 6, 4, 3, 2.5, 2, 1.2],
    [100, 100, 92, 34, 12, 8, 6, 4, 3, 1.8],
    [100, 100, 100, 97, 80, 54, 36, 20, 10, 5.5],
    [100, 99, 93, 72, 52, 40, 30, 20, 13, 9.2],
  ];
  return {
    ...mix,
    stockpiles: mix.stockpiles.map((pile, at) => ({ ...pile, passing: passing[at] ?? pile.passing })),
    // 0.075 mm: 0.25·1.2 + 0.2·1.8 + 0.35·5.5 + 0.2·9.2 = 4.43.
    jobMix: [100, 96.3, 86.5, 59.2, 42.3, 29.5, 20.6, 12.4, 7.2, 4.4],
    reported: { ...mix.reported, 'Dust proportion': 0.99 },
    creep: brightwaterCreep(),
  };
}
