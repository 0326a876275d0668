import type { MixRecord } from '../record';
import type { Analysis, AnalysisOptions, RecomputedValue } from './analysis';
import { type AggregateNodes, aggregates, blendChoice } from './analysis-aggregate';
import { type CreepFailure, creepOf } from './analysis-creep';
import { designFromTrials, designPointOf, type TrialValues, testedContents } from './analysis-design';
import { fieldVoidsOf } from './analysis-field';
import { designTrial, indexRecord, type RecordIndex } from './analysis-index';
import type { AnalysisNode } from './analysis-node';
import { attachReported, recomputedValues } from './analysis-reported';
import { crackingOf, moistureOf } from './analysis-strength';
import { type TrialNodes, volumetricsOf } from './analysis-volumetrics';

/**
 * Recomputes, trial by trial, every derived quantity that the trial's own raw readings give, completes the design
 * from the trials where it has none of its own, and sets each value beside what the workbook reports.
 */
export function analyse(record: MixRecord, options: AnalysisOptions): Analysis {
  const index = indexRecord(record, 'contractor');
  const aggregateOf = aggregates(index, blendChoice(record, index));
  const trials = index.trials.map((trial) => trialValues(index, trial, aggregateOf(trial)));
  const design = trialValues(index, designTrial, aggregateOf(designTrial));
  const { point, computed } = designPointOf(trials, design.pb, options);
  const fromTrials = designFromTrials(trials, design.pb, design.nodes, options);
  const designNodes = [...design.nodes, ...fromTrials, ...(computed ? [computed] : [])];
  const recomputed = [
    ...retainedGradations(index, [design, ...trials]),
    ...blendValues(index, [design, ...trials]),
    ...trials.flatMap((trial) => publish(trial.nodes, trial.context, index)),
    ...publish(designNodes, [...design.context, ...fromTrials], index),
    ...agencyValues(record),
  ];
  return {
    recomputed,
    designPoint: point,
    testedContents: testedContents(trials, design),
    creepFailures: design.creepFailures,
  };
}

interface Trial extends TrialValues {
  aggregate: AggregateNodes;
  /** Every node of the trial, inputs included, for naming causes. */
  context: AnalysisNode[];
  creepFailures: CreepFailure[];
}

function trialValues(index: RecordIndex, trial: string, aggregate: AggregateNodes): Trial {
  const volumetric = volumetricsOf(index, trial, aggregate);
  const { dry, conditioned, ratio } = moistureOf(index, trial);
  const creep = creepOf(index, trial);
  const nodes = [
    ...derivedOf(volumetric),
    ...volumetric.relativeDensities,
    ...volumetric.others,
    ...[dry, conditioned, ratio].filter((node) => node !== null),
    ...crackingOf(index, trial),
    ...creep.nodes,
    ...fieldVoidsOf(index, trial, volumetric.va),
  ];
  const inputs = [
    volumetric.pb,
    volumetric.gb,
    volumetric.gmm,
    aggregate.gsb,
    aggregate.gsa,
    aggregate.surfaceArea,
    aggregate.passing(0.075),
  ].filter((node) => node !== null);
  return {
    trial,
    pb: volumetric.pb,
    nodes,
    aggregate,
    context: [...inputs, ...derivedOf(volumetric)],
    creepFailures: creep.failures,
  };
}

function derivedOf(volumetric: TrialNodes): AnalysisNode[] {
  const { gmb, gse, pba, pbe, va, vma, vfa, vbe, dust, film, recycled } = volumetric;
  return [gmb, gse, pba, pbe, va, vma, vfa, vbe, dust, film, recycled].filter((node) => node !== null);
}

/** Reported values first: a cause may rest on how the workbook shows another value of the same trial. */
function publish(nodes: AnalysisNode[], context: AnalysisNode[], index: RecordIndex): RecomputedValue[] {
  for (const node of nodes) attachReported(node, index);
  return nodes.flatMap((node) => recomputedValues(node, context, index));
}

/** Gradations stated as retained, as percent passing; one that names no trial serves all of them and comes once. */
function retainedGradations(index: RecordIndex, trials: { aggregate: AggregateNodes }[]): RecomputedValue[] {
  const nodes = new Map(
    trials.flatMap(({ aggregate }) =>
      aggregate.passingFromRetained.map((node) => [JSON.stringify(node.at), node] as const),
    ),
  );
  return publish([...nodes.values()], [], index);
}

/** What the stockpiles give for each blend, once a blend: it belongs to every trial made of it. */
function blendValues(index: RecordIndex, trials: Trial[]): RecomputedValue[] {
  const done = new Set<string>();
  return trials.flatMap(({ trial, aggregate, context }) => {
    const ownShares = aggregate.shares.some(({ at }) => at.trial !== undefined);
    const key = `${ownShares ? trial : ''}|${aggregate.blend ?? ''}`;
    if (done.has(key)) return [];
    done.add(key);
    const { gsb, gsa, absorption, surfaceArea, combinedPassing, finenessModuli } = aggregate;
    const combined = [gsb, gsa, absorption, surfaceArea].filter((node) => node !== null);
    const nodes = [...combined, ...combinedPassing.values(), ...finenessModuli];
    const own = ownShares ? nodes.map((node) => ({ ...node, at: { ...node.at, trial } })) : nodes;
    return publish(own, context, index);
  });
}

/** The agency's own specimens, never mixed with the contractor's. */
function agencyValues(record: MixRecord): RecomputedValue[] {
  if (!record.readings.some(({ at }) => at.laboratory === 'agency')) return [];
  const index = indexRecord(record, 'agency');
  const aggregateOf = aggregates(index, blendChoice(record, index));
  const trials = [designTrial, ...index.trials].map((trial) => trialValues(index, trial, aggregateOf(trial)));
  return [
    ...retainedGradations(index, trials),
    ...trials.flatMap(({ nodes, context }) => publish(nodes, context, index)),
  ];
}
