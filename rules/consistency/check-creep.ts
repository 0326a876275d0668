import type { CreepAnalysis, CreepAnalysisPoint } from '../engine/creep-analysis';
import { fallsOf, LINEAR_WITHIN_PERCENT, percentWords, worstNonLinearity } from '../engine/creep-remarks';
import type { Evidence } from '../engine/finding';
import { numberWords } from '../rule-sets/words';
import type { ConsistencyObservation } from './consistency-observation';

/** Creep compliances that no linear material can have: falling with time, or different under different stresses. */
export function checkCreep(creep: CreepAnalysis): ConsistencyObservation[] {
  return creep.flatMap((entry) => {
    if (entry.kind !== 'curve' || entry.temperature === null) return [];
    // Entries of single levels of stress repeat the points of the one of all levels.
    const isWhole = entry.stress === null || entry.stresses.length === 1;
    return isWhole
      ? [...falling(entry.points, entry.temperature), ...notLinear(entry.points, entry.temperature)]
      : [];
  });
}

function falling(points: readonly CreepAnalysisPoint[], temperature: number): ConsistencyObservation[] {
  return fallsOf(points).map(({ specimen, earlier, later }) => {
    const stress = later.stress === null ? '' : ` under ${numberWords(later.stress)} kPa`;
    const of = specimen === null ? '' : `, specimen ${specimen}`;
    const place = ` at ${numberWords(temperature)} °C${stress}${of}`;
    return {
      name: 'creep-compliance-falls',
      subject: `creep compliance${place}`,
      severity: 'advisory',
      outcome: 'fail',
      observed: later.value,
      limit: { min: earlier.value, max: null },
      unit: '1/GPa',
      sentence: `Creep compliance${place} falls from ${three(earlier.value)} at ${numberWords(earlier.time)} s to ${three(later.value)} at ${numberWords(later.time)} s.`,
      reason: 'Under a constant load a strain only grows: a reading, its time or its stress may be wrong.',
      evidence: [evidenceOf(earlier), evidenceOf(later)],
      quantity: 'creep-compliance',
      at: { temperature, time: later.time },
    };
  });
}

function notLinear(points: readonly CreepAnalysisPoint[], temperature: number): ConsistencyObservation[] {
  const worst = worstNonLinearity(points);
  if (worst === null || worst.percent <= LINEAR_WITHIN_PERCENT) return [];
  const { low, high, time, percent } = worst;
  const place = ` at ${numberWords(temperature)} °C`;
  return [
    {
      name: 'creep-not-linear',
      subject: `creep compliance${place}`,
      severity: 'advisory',
      outcome: 'fail',
      observed: percent,
      limit: { min: null, max: LINEAR_WITHIN_PERCENT },
      unit: '%',
      sentence: `Creep compliance${place} and ${numberWords(time)} s differs by ${percentWords(percent)} % between ${numberWords(low)} and ${numberWords(high)} kPa, at most ${LINEAR_WITHIN_PERCENT} %.`,
      reason:
        'In a linear material the compliance does not depend on the stress; a load is too high, or a reading is wrong.',
      evidence: worst.points.map(evidenceOf),
      quantity: 'creep-non-linearity',
      at: { temperature, time },
    },
  ];
}

function evidenceOf({
  specimen,
  temperature,
  time,
  stress,
  value,
  origin,
  source,
}: CreepAnalysisPoint): Evidence {
  return {
    quantity: 'creep-compliance',
    value,
    unit: '1/GPa',
    at: {
      ...(specimen === null ? {} : { specimen }),
      ...(temperature === null ? {} : { temperature }),
      time,
      ...(stress === null ? {} : { stress }),
    },
    origin,
    source,
  };
}

function three(value: number): string {
  return numberWords(Number(value.toPrecision(3)));
}
