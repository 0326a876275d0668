import { type PropertyCurve, propertyCurve, type TrialPoint } from '../calculations/design-point';
import { known } from '../numerics/numeric-result';
import type { Conditions } from '../record';
import { capitalised, plural } from '../rule-sets/words';
import type { TestedContent } from './analysis';
import { fittedQuantities } from './analysis-design';
import { type AnalysisNode, evidenceOf } from './analysis-node';
import { doubtWords, subjectsOf } from './doubts';
import type { Evidence } from './finding';
import type { RoomOfRule } from './room';
import { isPerTrial } from './scope';
import type { World } from './world';

export interface Refusal {
  ok: false;
  state: Exclude<RoomOfRule['state'], 'computed'>;
  reason: string;
}

/** The curve that a quantity's mean runs along over the binder content, of recomputed values only. */
export function curveOf(
  world: World,
  { quantity, at, minimumCount }: { quantity: string; at: Conditions; minimumCount?: number | undefined },
): { ok: true; curve: PropertyCurve } | Refusal {
  const label = labelOf(world, quantity);
  const { trial = 'design', laboratory = 'contractor', ...conditions } = at;
  if (trial !== 'design' || laboratory !== 'contractor' || Object.keys(conditions).length > 0)
    return leftOut(`${label} at these conditions is never taken from other trials.`);
  const contents = world.analysis.testedContents;
  if (quantity === 'binder-content') return ofContentItself(world, contents);
  if (!fittedQuantities.has(quantity)) return leftOut(`${label} is never taken from other trials.`);
  const points = pointsOf(contents, quantity);
  const curve = propertyCurve(
    points.map(({ content, value }): TrialPoint => ({ Pb: content.value, value: value.value })),
    world.edition.designPoint.fit,
  );
  if (!curve.ok) return tooFewTrials(points.length, label);
  const count = Math.min(...points.map(({ value }) => value.count ?? 1));
  if (minimumCount !== undefined && count < minimumCount) {
    return notComputed(
      `One of the trials has ${plural(count, 'result')} of ${label}, and the rule asks for at least ${minimumCount}.`,
    );
  }
  const doubt = doubtAmong(
    world,
    points.flatMap(({ content, value }) => [content, value]),
  );
  return doubt === null ? { ok: true, curve } : notComputed(doubt);
}

function ofContentItself(
  world: World,
  contents: readonly TestedContent[],
): { ok: true; curve: PropertyCurve } | Refusal {
  const numbers = contents.map(({ binderContent }) => binderContent.value);
  const [from, to] = [Math.min(...numbers), Math.max(...numbers)];
  if (numbers.length < 2 || from === to) return tooFewTrials(numbers.length, 'binder content');
  const doubt = doubtAmong(
    world,
    contents.map(({ binderContent }) => binderContent),
  );
  if (doubt !== null) return notComputed(doubt);
  return { ok: true, curve: { ok: true, method: 'linear', from, to, turns: [], at: known } };
}

function pointsOf(contents: readonly TestedContent[], quantity: string) {
  return contents.flatMap(({ binderContent, values }) => {
    const value = values.find((node) => node.quantity === quantity);
    return value ? [{ content: binderContent, value }] : [];
  });
}

function tooFewTrials(count: number, label: string): Refusal {
  return notComputed(
    count === 0
      ? `No trial has a recomputed value of ${label}.`
      : `Only one trial binder content has a recomputed value of ${label}; two or more show how it changes.`,
  );
}

/** Any open doubt about what the trials rest on: one of its meanings could move the room. */
function doubtAmong(world: World, nodes: readonly AnalysisNode[]): string | null {
  if (world.record.doubts.length === 0) return null;
  const used: Evidence[] = [];
  const visit = (evidence: Evidence) => {
    used.push(evidence);
    evidence.inputs?.forEach(visit);
  };
  nodes.map(evidenceOf).forEach(visit);
  for (const doubt of world.record.doubts) {
    const concerned = subjectsOf(doubt).find((subject) => used.some((each) => isAbout(world, subject, each)));
    if (concerned) return doubtWords(world, doubt, concerned.quantity);
  }
  return null;
}

/** A property of aggregate or binder without a trial belongs to every trial. */
function isAbout(
  world: World,
  doubted: { quantity: string; at: Conditions },
  { quantity, at = {} }: Evidence,
) {
  if (doubted.quantity !== quantity || (doubted.at.laboratory ?? 'contractor') !== 'contractor') return false;
  if (doubted.at.sieve !== undefined && doubted.at.sieve !== at.sieve) return false;
  const trial = isPerTrial(world, quantity) ? (doubted.at.trial ?? 'design') : doubted.at.trial;
  return trial === undefined || at.trial === undefined || trial === at.trial;
}

export function labelOf(world: World, quantity: string): string {
  return world.view.quantity(quantity)?.label ?? quantity;
}

export function notComputed(reason: string): Refusal {
  return { ok: false, state: 'not computed', reason: capitalised(reason) };
}

export function leftOut(reason: string): Refusal {
  return { ok: false, state: 'left out', reason: capitalised(reason) };
}
