/** An invented mix with figures that belong together, the same for the same seed. */
export interface InventedMix {
  nominalMm: number;
  trafficMillions: number;
  course: 'surface' | 'intermediate' | 'base';
  grade: string;
  binderGravity: number;
  gyrations: [initial: number, design: number, maximum: number];
  mixingC: number;
  compactionC: number;
  sievesMm: number[];
  stockpiles: InventedStockpile[];
  blend: number[];
  jobMix: number[];
  gsb: number;
  trials: InventedTrial[];
  design: InventedTrial;
  aggregate: {
    faces1: number;
    faces2: number;
    fineAngularity: number;
    flat: number;
    sand: number;
    abrasion: number;
    soundness: number;
  };
  dry: MoistureSpecimen[];
  wet: MoistureSpecimen[];
  strengthRatio: number;
  ruts: number[];
  inflection: number;
  cracking: number[];
  flexibility: number[];
  flowNumbers: number[];
  creep: { temperatureC: number; timesS: number[]; compliance: number[][] }[];
}

export interface InventedStockpile {
  name: string;
  share: number;
  gsb: number;
  gsa: number;
  absorption: number;
  passing: number[];
}

export interface InventedTrial {
  name: string;
  binder: number;
  gmm: number[];
  gmmMean: number;
  specimens: { air: number; ssd: number; water: number; gmb: number; height: number; voids: number }[];
  gmbMean: number;
  voids: number;
  vma: number;
  vfa: number;
  dust: number;
  effective: number;
  gse: number;
  initial: number;
  maximum: number;
}

export interface MoistureSpecimen {
  thickness: number;
  diameter: number;
  loadKn: number;
  voids: number;
  saturation: number;
  strengthKpa: number;
}

export function random(seed: number): () => number {
  let state = (seed * 2654435761 + 12345) % 4294967296;
  return () => {
    state = (state * 1664525 + 1013904223) % 4294967296;
    return state / 4294967296;
  };
}

export function round(value: number, decimals: number): number {
  return Number(value.toFixed(decimals));
}

const curves = [
  [100, 100, 100, 98, 88, 76, 48, 32, 22, 15, 9.5, 6.8, 5.1],
  [100, 100, 100, 100, 97, 86, 56, 38, 26, 18, 11.4, 7.6, 5.6],
];
const grades = ['PG 64-22', 'PG 70-22', 'PG 58-28', 'PG 76-22'];

export function inventedMix(
  seed: number,
  options: { trialNames?: string[]; sieves?: number[] } = {},
): InventedMix {
  const next = random(seed);
  const between = (low: number, high: number, decimals: number) =>
    round(low + (high - low) * next(), decimals);
  const pick = <T>(from: T[]): T => from[Math.floor(next() * from.length)] as T;
  const sievesMm = options.sieves ?? [25, 19, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075];
  const full = [50, 37.5, 25, 19, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075];
  const curve = pick(curves);
  const at = (mm: number) => curve[full.findIndex((sieve) => sieve <= mm)] ?? 5;
  const names = pick([
    ['#67 Stone', 'No. 8 Chip', 'Screenings', 'Natural Sand'],
    ['19 mm Stone', '9.5 mm Stone', 'Washed Sand', 'RAP'],
    ['Coarse A', 'Medium B', 'Fine C', 'Mineral Dust'],
  ]);
  const shares = pick([
    [32, 24, 29, 15],
    [28, 27.5, 24.5, 20],
  ]);
  const stockpiles = names.map((name, index) => {
    const gsb = between(2.6, 2.72, 3);
    return {
      name,
      share: shares[index] as number,
      gsb,
      gsa: round(gsb + between(0.05, 0.1, 3), 3),
      absorption: between(0.6, 1.7, 2),
      passing: fall(sievesMm, [0.35, 0.6, 1, 1.1][index] as number, at, next),
    };
  });
  const blend = sievesMm.map((mm, index) => {
    const sum = stockpiles.reduce(
      (total, pile) => total + (pile.share * (pile.passing[index] as number)) / 100,
      0,
    );
    return round(sum, mm <= 0.15 ? 1 : 1);
  });
  const gsb = between(2.62, 2.68, 3);
  const gse = round(gsb + between(0.035, 0.06, 3), 3);
  const binderGravity = between(1.02, 1.035, 3);
  const centre = between(4.8, 5.6, 1);
  const trialNames = options.trialNames ?? ['A', 'B', 'C', 'D'];
  const dustAt = blend.at(-1) ?? 5;
  const trial = (name: string, binder: number, target: number): InventedTrial => {
    const theory = (100 / ((100 - binder) / gse + binder / binderGravity)) as number;
    const gmm = [round(theory + between(-0.003, 0.003, 3), 3), round(theory + between(-0.003, 0.003, 3), 3)];
    const gmmMean = round((gmm[0]! + gmm[1]!) / 2, 3);
    const specimens = [0, 1, 2].map(() => {
      const wanted = gmmMean * (1 - (target + between(-0.3, 0.3, 2)) / 100);
      const air = between(4690, 4790, 1);
      const ssd = round(air + between(4, 16, 1), 1);
      const water = round(ssd - air / wanted, 1);
      const gmb = round(air / (ssd - water), 3);
      return {
        air,
        ssd,
        water,
        gmb,
        height: between(113.8, 116.9, 1),
        voids: round(100 * (1 - gmb / gmmMean), 1),
      };
    });
    const gmbMean = round(specimens.reduce((total, { gmb }) => total + gmb, 0) / 3, 3);
    const voids = round(100 * (1 - gmbMean / gmmMean), 1);
    const vma = round(100 - (gmbMean * (100 - binder)) / gsb, 1);
    const absorbed = (100 * binderGravity * (gse - gsb)) / (gse * gsb);
    const effective = round(binder - (absorbed * (100 - binder)) / 100, 2);
    return {
      name,
      binder,
      gmm,
      gmmMean,
      specimens,
      gmbMean,
      voids,
      vma,
      vfa: round((100 * (vma - voids)) / vma, 1),
      dust: round(dustAt / effective, 2),
      effective,
      gse: round((100 - binder) / (100 / gmmMean - binder / binderGravity), 3),
      initial: between(84.2, 88.6, 1),
      maximum: between(96.4, 97.9, 1),
    };
  };
  const trials = trialNames.map((name, index) =>
    trial(name, round(centre - 0.5 + index * 0.5, 1), 5.6 - index * 1.1),
  );
  const moisture = (factor: number) =>
    [0, 1, 2].map(() => {
      const thickness = between(94.1, 96.2, 1);
      const loadKn = round(between(14.6, 17.9, 2) * factor, 2);
      return {
        thickness,
        diameter: 150,
        loadKn,
        voids: between(6.6, 7.4, 1),
        saturation: between(71, 79, 0),
        strengthKpa: round((2 * loadKn * 1e6) / (Math.PI * thickness * 150), 0),
      };
    });
  const dry = moisture(1);
  const wet = moisture(0.88);
  const mean = (specimens: MoistureSpecimen[]) =>
    specimens.reduce((total, { strengthKpa }) => total + strengthKpa, 0) / specimens.length;
  const faces1 = between(92, 99, 0);
  const timesS = [1, 2, 5, 10, 20, 50, 100];
  return {
    nominalMm: pick([9.5, 12.5, 19]),
    trafficMillions: pick([0.8, 3, 10, 22]),
    course: pick(['surface', 'intermediate', 'base']),
    grade: pick(grades),
    binderGravity,
    gyrations: pick([
      [7, 75, 115],
      [8, 100, 160],
      [6, 50, 75],
    ]),
    mixingC: between(148, 165, 0),
    compactionC: between(136, 147, 0),
    sievesMm,
    stockpiles,
    blend,
    jobMix: blend.map((value, index) =>
      (sievesMm[index] as number) <= 0.075 ? round(value + 0.3, 1) : Math.round(value),
    ),
    gsb,
    trials,
    design: trial('design', round(centre + 0.3, 1), 4),
    aggregate: {
      faces1,
      faces2: faces1 - 4,
      fineAngularity: between(43, 47, 1),
      flat: between(2, 8, 0),
      sand: between(48, 76, 0),
      abrasion: between(17, 32, 0),
      soundness: between(2, 9, 0),
    },
    dry,
    wet,
    strengthRatio: round((100 * mean(wet)) / mean(dry), 1),
    ruts: [between(3.1, 7.8, 1), between(3.1, 7.8, 1)],
    inflection: between(13000, 19000, 0),
    cracking: [0, 1, 2, 3, 4].map(() => between(72, 145, 0)),
    flexibility: [0, 1, 2, 3].map(() => between(7.2, 14.1, 1)),
    flowNumbers: [between(180, 900, 0), between(180, 900, 0), between(180, 900, 0)],
    creep: [-20, -10, 0].map((temperatureC, step) => ({
      temperatureC,
      timesS,
      compliance: [0, 1, 2].map(() => {
        const scale = between(0.9, 1.15, 3) * [0.042, 0.068, 0.115][step]!;
        return timesS.map((time) => round(scale * time ** [0.1, 0.16, 0.24][step]!, 4));
      }),
    })),
  };
}

function fall(
  sievesMm: number[],
  fineness: number,
  at: (mm: number) => number,
  next: () => number,
): number[] {
  let last = 100;
  return sievesMm.map((mm) => {
    const value = round(
      Math.min(last, 100 * (at(mm) / 100) ** (1 / fineness) * (0.97 + 0.05 * next())),
      mm <= 0.15 ? 1 : 0,
    );
    last = value;
    return value;
  });
}
