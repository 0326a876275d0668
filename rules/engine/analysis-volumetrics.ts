import {
  absorbedBinder,
  airVoids,
  dustProportion,
  effectiveBinderContent,
  effectiveBinderVolume,
  effectiveGravity,
  filmThickness,
  voidsFilledWithAsphalt,
  voidsInMineralAggregate,
} from '../calculations/volumetrics';
import type { Conditions } from '../record';
import type { AggregateNodes } from './analysis-aggregate';
import { type CompactedSet, compactedSets } from './analysis-compaction';
import { comparable, type RecordIndex } from './analysis-index';
import { type AnalysisNode, derivedPerSpecimen, meanNode, readingNode } from './analysis-node';
import { recycledOf } from './analysis-recycled';
import { densitiesOf } from './analysis-relative-density';

/** Everything that one trial's own raw readings give. What they do not give is null. */
export interface TrialNodes {
  trial: string;
  aggregate: AggregateNodes;
  pb: AnalysisNode | null;
  gb: AnalysisNode | null;
  gmm: AnalysisNode | null;
  gmb: AnalysisNode | null;
  gse: AnalysisNode | null;
  pba: AnalysisNode | null;
  pbe: AnalysisNode | null;
  va: AnalysisNode | null;
  vma: AnalysisNode | null;
  vfa: AnalysisNode | null;
  vbe: AnalysisNode | null;
  dust: AnalysisNode | null;
  film: AnalysisNode | null;
  recycled: AnalysisNode | null;
  relativeDensities: AnalysisNode[];
  /** Water taken up by all specimens; gravity and air voids of those outside the volumetric set. */
  others: AnalysisNode[];
}

export function volumetricsOf(index: RecordIndex, trial: string, aggregate: AggregateNodes): TrialNodes {
  const at: Conditions = { trial };
  const pb = averageOf(index, 'binder-content', trial, false);
  const gb = averageOf(index, 'binder-specific-gravity', trial, false);
  const gmm = averageOf(index, 'maximum-specific-gravity', trial, true);
  const sets = compactedSets(index, trial);
  const gmb = sets.find((set) => set.volumetric)?.gmb ?? null;
  const { gsb, surfaceArea } = aggregate;

  const gse = derive(at, 'effective-specific-gravity-aggregate', 'Ps/(100/Gmm − Pb/Gb)', [pb, gb, gmm], (x) =>
    effectiveGravity({ Pb: x[0]!, Gb: x[1]!, Gmm: x[2]! }),
  );
  const pba = derive(at, 'absorbed-binder', '100·Gb·(Gse − Gsb)/(Gse·Gsb)', [gb, gse, gsb], (x) =>
    absorbedBinder({ Gb: x[0]!, Gse: x[1]!, Gsb: x[2]! }),
  );
  const pbe = derive(at, 'effective-binder-content', 'Pb − Pba·Ps/100', [pb, pba], (x) =>
    effectiveBinderContent({ Pb: x[0]!, Pba: x[1]! }),
  );
  const va = voidsOf(at, gmb, gmm);
  const vma = derive(at, 'voids-in-mineral-aggregate', '100 − Gmb·Ps/Gsb', [gmb, pb, gsb], (x) =>
    voidsInMineralAggregate({ Gmb: x[0]!, Pb: x[1]!, Gsb: x[2]! }),
  );
  const vfa = derive(at, 'voids-filled-with-asphalt', '100·(VMA − Va)/VMA', [vma, va], (x) =>
    voidsFilledWithAsphalt({ VMA: x[0]!, Va: x[1]! }),
  );
  const vbe = derive(at, 'effective-binder-volume', 'Pbe·Gmb/Gb', [pbe, gmb, gb], (x) =>
    effectiveBinderVolume({ Pbe: x[0]!, Gmb: x[1]!, Gb: x[2]! }),
  );
  const fines = aggregate.passing(0.075);
  const dust = derive(
    at,
    'dust-proportion',
    'P0.075/Pbe',
    [fines && { ...fines, symbol: 'P0.075' }, pbe],
    (x) => dustProportion({ P0075: x[0]!, Pbe: x[1]! }),
  );
  const film = derive(at, 'film-thickness', '1000·Pbe/(Gb·SA·Ps)', [pbe, pb, gb, surfaceArea], (x) =>
    filmThickness({ Pbe: x[0]!, Pb: x[1]!, Gb: x[2]!, SA: x[3]! }),
  );
  return {
    trial,
    aggregate,
    pb,
    gb,
    gmm,
    gmb,
    gse,
    pba,
    pbe,
    va,
    vma,
    vfa,
    vbe,
    dust,
    film,
    recycled: recycledOf(index, trial, pb),
    relativeDensities: gmm === null ? [] : densitiesOf(index, trial, sets, gmm),
    others: sets.flatMap((set) => otherValues(set, gmm)),
  };
}

/** A measured quantity of a trial: its readings' mean, where they are comparable. */
export function averageOf(
  index: RecordIndex,
  quantity: string,
  trial: string,
  counted: boolean,
): AnalysisNode | null {
  const readings = comparable(index.ofTrial(quantity, trial).filter(({ at }) => at.stockpile === undefined));
  const labelled = readings.filter(({ at }) => at.specimen !== undefined);
  const used = labelled.length > 0 ? labelled : readings;
  return meanNode(
    used.map((reading) => readingNode(reading)),
    { trial },
    { keepSpecimens: false, counted },
  );
}

function derive(
  at: Conditions,
  quantity: string,
  formula: string,
  inputs: (AnalysisNode | null)[],
  compute: Parameters<typeof derivedPerSpecimen>[0]['compute'],
): AnalysisNode | null {
  const complete = inputs.filter((input) => input !== null);
  if (complete.length < inputs.length) return null;
  return derivedPerSpecimen({ quantity, at, formula, inputs: complete, compute });
}

function voidsOf(at: Conditions, gmb: AnalysisNode | null, gmm: AnalysisNode | null): AnalysisNode | null {
  return derive(at, 'air-voids', '100·(Gmm − Gmb)/Gmm', [gmm, gmb], (x) =>
    airVoids({ Gmm: x[0]!, Gmb: x[1]! }),
  );
}

function otherValues(
  { at, gmb, volumetric, absorption }: CompactedSet,
  gmm: AnalysisNode | null,
): AnalysisNode[] {
  const apart = volumetric ? [] : [gmb, voidsOf(at, gmb, gmm)];
  return [absorption, ...apart].filter((node) => node !== null);
}
