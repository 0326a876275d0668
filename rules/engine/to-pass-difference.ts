import type { Conditions } from '../record';
import type { DifferenceMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { conditionsOfSubjects } from './evaluate-reading';
import type { ToPass } from './explanation';
import type { Finding } from './finding';
import { takeSample } from './sample';
import { subjectOf } from './subject';
import { judgingOf, sideIn } from './to-pass-judging';
import { plausibleOf, said, search, stepOf } from './to-pass-search';
import type { World } from './world';

/** The contractor's own value, or the reported one, against what it is compared with. */
export function forDifference(
  world: World,
  rule: ResolvedRule,
  measure: DifferenceMeasure,
  finding: Finding,
): ToPass[] {
  const { quantity } = measure;
  const at = conditionsOfSubjects(world, { quantity, at: {} }).find(
    (each) => subjectOf(world, measure, each) === finding.subject,
  );
  const judging = at && judgingOf(world, rule, at, world.view.quantity(quantity)?.unit);
  if (!at || !judging || measure.statistic !== 'mean') return [];
  const pair =
    measure.between[0] === 'contractor'
      ? laboratoryMeans(world, quantity, at)
      : reportedAndComputed(world, quantity, at);
  if (pair === null) return [];
  const { present, other, name, count } = pair;
  const step = stepOf(world, quantity, []);
  const way = search({
    present,
    step,
    plausible: { min: Math.min(present, other), max: Math.max(present, other) },
    beyond: plausibleOf(world, quantity),
    valueAt: (value) => Math.abs(value - other),
    sideOf: (value) => sideIn(judging, value),
  });
  return way === null ? [] : [said({ quantity, unit: judging.own, present, step, count, name, ...way })];
}

interface Pair {
  present: number;
  other: number;
  name: string;
  count: number;
}

function laboratoryMeans(world: World, quantity: string, at: Conditions): Pair | null {
  const label = world.view.quantity(quantity)?.label ?? quantity;
  const [own, agency] = (['contractor', 'agency'] as const).map((laboratory) => {
    const taken = takeSample(world, { quantity, at: { ...at, laboratory } });
    if (!taken.ok) return null;
    const { recomputed, items, count } = taken.sample;
    const values = items.map(({ value }) => value ?? Number.NaN);
    return {
      value: recomputed?.value ?? values.reduce((sum, value) => sum + value, 0) / values.length,
      count,
    };
  });
  if (!own || !agency || !Number.isFinite(own.value) || !Number.isFinite(agency.value)) return null;
  return { present: own.value, other: agency.value, name: `the contractor's ${label}`, count: own.count };
}

function reportedAndComputed(world: World, quantity: string, at: Conditions): Pair | null {
  const taken = takeSample(world, { quantity, at, toCompare: true });
  const recomputed = taken.ok ? taken.sample.recomputed : null;
  const present = recomputed?.reported?.value ?? null;
  if (recomputed === null || present === null) return null;
  const label = world.view.quantity(quantity)?.label ?? quantity;
  return { present, other: recomputed.value, name: `the reported ${label}`, count: 1 };
}
