import type { FilledValue, TemplateContent } from '#tests/workbooks/fill-template';

export interface DemoDates {
  /** Day on which the revision is meant to be submitted; documents are dated before it. */
  submittedOn: string;
  lettingOn: string;
}

export interface DemoStockpile {
  name: string;
  share: number;
  gsb: number;
  gsa: number;
  absorption: number;
  passing: number[];
  deleterious: number;
}

export interface DemoSpecimen {
  /** g */
  inAir: number;
  surfaceDry: number;
  inWater: number;
}

export interface DemoTrial {
  trial: string;
  binderContent: number;
  gmm: FilledValue[];
  specimens: DemoSpecimen[];
  /** Heights of the first specimens at initial and design gyrations, mm. */
  heights?: [initial: number, design: number][];
  maximum?: DemoSpecimen[];
  reported?: Record<string, FilledValue>;
}

export interface DemoMix {
  designation: string;
  laboratory: string;
  attributes: Record<string, FilledValue>;
  scalars: Record<string, FilledValue>;
  sievesMm: number[];
  stockpiles: DemoStockpile[];
  jobMix: FilledValue[];
  trials: DemoTrial[];
  /** Reported for the proposed job mix where no trial of that name was made. */
  reported?: Record<string, FilledValue>;
  aggregates: Record<string, FilledValue>[];
  moisture: { subset: 'dry' | 'conditioned'; loads: number[]; voids: number[]; saturation: number[] }[];
  performance: Record<string, FilledValue>[];
  /** Creep strains, where the laboratory has measured them. */
  creep?: Record<string, FilledValue>[];
  documents: Record<string, FilledValue>[];
  testedOn: FilledValue;
}

/** A mix as what a laboratory writes into the template. */
export function contentOf(mix: DemoMix): TemplateContent {
  return {
    submittal: {
      'Mix designation': mix.designation,
      Laboratory: mix.laboratory,
      ...mix.attributes,
      ...mix.scalars,
    },
    methods: {
      Trials: {
        'Saturated surface-dry mass': 'AASHTO T 166',
        'Maximum specific gravity': 'AASHTO T 209',
      },
      Aggregates: { 'Sand equivalent': 'AASHTO T 176', 'Abrasion loss': 'AASHTO T 96' },
      Moisture: { 'Failure load': 'AASHTO T 283' },
      Performance: { 'Wheel-track rut depth': 'AASHTO T 324' },
    },
    tables: {
      Stockpiles: mix.stockpiles.map((pile) => ({
        Stockpile: pile.name,
        'Stockpile share': pile.share,
        'Bulk specific gravity of the aggregate': pile.gsb,
        'Apparent specific gravity of the aggregate': pile.gsa,
        'Water absorption of the aggregate': pile.absorption,
      })),
      Trials: [
        ...mix.trials.flatMap((trial) => trialRows(trial, mix.testedOn)),
        ...(mix.reported ? [{ Trial: 'design', Specimen: 'mean', ...mix.reported }] : []),
      ],
      Aggregates: [
        ...mix.aggregates,
        ...mix.stockpiles.map((pile) => ({
          Stockpile: pile.name,
          'Deleterious materials': pile.deleterious,
        })),
      ],
      Moisture: mix.moisture.flatMap(moistureRows),
      Performance: mix.performance,
      ...(mix.creep ? { Creep: mix.creep } : {}),
      Documents: mix.documents,
    },
    gradation: {
      sievesMm: mix.sievesMm,
      stockpiles: mix.stockpiles.map(({ name, passing }) => ({ name, passing })),
      columns: { 'Job mix formula': mix.jobMix },
    },
  };
}

/** Masses that give a wanted Gmb = A/(B − C), to the tenth of a gram that a balance shows. */
export function specimen(gmb: number, inAir: number): DemoSpecimen {
  const surfaceDry = tenth(inAir * 1.0018);
  return { inAir, surfaceDry, inWater: tenth(surfaceDry - inAir / gmb) };
}

export function dateBefore(iso: string, days: number): Date {
  const [year = 0, month = 1, day = 1] = iso.split('-').map(Number);
  return new Date(Date.UTC(year, month - 1, day - days));
}

function trialRows(trial: DemoTrial, testedOn: FilledValue): Record<string, FilledValue>[] {
  const rows = trial.specimens.map((masses, at) => ({
    Trial: trial.trial,
    Specimen: at + 1,
    'Tested on': testedOn,
    'Binder content by mass of mix': trial.binderContent,
    ...massCells(masses),
    'Height at initial gyrations': trial.heights?.[at]?.[0] ?? null,
    'Height at design gyrations': trial.heights?.[at]?.[1] ?? null,
    'Maximum specific gravity': trial.gmm[at] ?? null,
  }));
  const maximum = (trial.maximum ?? []).map((masses, at) => ({
    Trial: trial.trial,
    Specimen: trial.specimens.length + at + 1,
    'Compacted to': 'maximum',
    ...massCells(masses),
  }));
  const reported = trial.reported ? [{ Trial: trial.trial, Specimen: 'mean', ...trial.reported }] : [];
  return [...rows, ...maximum, ...reported];
}

function massCells({ inAir, surfaceDry, inWater }: DemoSpecimen): Record<string, FilledValue> {
  return { 'Dry mass in air': inAir, 'Saturated surface-dry mass': surfaceDry, 'Mass in water': inWater };
}

function moistureRows({
  subset,
  loads,
  voids,
  saturation,
}: DemoMix['moisture'][number]): Record<string, FilledValue>[] {
  return loads.map((load, at) => ({
    Specimen: `${subset === 'dry' ? 'D' : 'W'}${at + 1}`,
    Subset: subset,
    'Specimen thickness': 95,
    'Specimen diameter': 150,
    'Air voids': voids[at] ?? null,
    'Degree of saturation': saturation[at] ?? null,
    'Failure load': load,
  }));
}

function tenth(value: number): number {
  return Math.round(value * 10) / 10;
}
