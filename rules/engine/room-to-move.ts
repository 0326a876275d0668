import type { Source } from '../record';
import type { ResolvedRule } from '../rule-sets/resolve';
import { andList, capitalised, uncapitalised } from '../rule-sets/words';
import type { AnalysisNode } from './analysis-node';
import type { RoomOfRule, RoomStretch, RoomToMove } from './room';
import { roomOfRule } from './room-of-rule';
import { common } from './room-stretches';
import type { World } from './world';

/**
 * The range of binder content in which the rules that the edition chose hold, each with its own rounding: unbroken
 * and around the declared content, else the widest; never beyond the trials. Null where the edition chose none.
 */
export function roomToMove(world: World): RoomToMove | null {
  const chosen = world.edition.roomToMove.flatMap(
    (id) => world.edition.rules.find((rule) => rule.id === id) ?? [],
  );
  if (chosen.length === 0) return null;
  const declared = world.analysis.designPoint.declaredBinderContent;
  const rules = chosen.map((rule) => guarded(world, rule));
  const base = {
    declaredBinderContent: declared,
    trials: world.analysis.testedContents.map(({ trial, binderContent }) => ({
      trial,
      binderContent: binderContent.value,
      source: sourceOf(binderContent),
    })),
    rules,
  };
  const computed = rules.filter(({ state }) => state === 'computed');
  const none = { ...base, room: null, excluding: [] };
  const [first, ...others] = computed;
  if (first === undefined) return { ...none, reason: whyUnknown(rules) };
  const shared = others.reduce((sofar, { holds }) => common(sofar, holds), first.holds);
  const chosenStretch = choose(shared, declared);
  if (chosenStretch === null) return { ...none, excluding: excludingOf(computed), reason: null };
  if (rules.some(({ state }) => state === 'not computed')) return { ...none, reason: whyUnknown(rules) };
  const { from, to } = chosenStretch;
  return {
    ...base,
    room: {
      from,
      to,
      closedBelowBy: closersOf(computed, (each) => each.from === from && each.below === 'limit'),
      closedAboveBy: closersOf(computed, (each) => each.to === to && each.above === 'limit'),
      containsDeclared: declared !== null && from <= declared && declared <= to,
    },
    excluding: [],
    reason: null,
  };
}

/** The cell of the reading, or of the first where it is a mean. */
function sourceOf({ reading, inputs }: AnalysisNode): Source | null {
  return reading?.source ?? inputs[0]?.reading?.source ?? null;
}

/** An error of ours leaves the rule without an answer and says so. */
function guarded(world: World, rule: ResolvedRule): RoomOfRule {
  try {
    return roomOfRule(world, rule);
  } catch (error) {
    const detail = error instanceof Error ? error.message : String(error);
    return {
      rule: rule.id,
      clause: rule.clause,
      title: rule.title,
      state: 'not computed',
      reason: `An internal error occurred while this rule was followed along the binder content: ${detail}`,
      limitWords: '',
      fit: null,
      trials: null,
      holds: [],
    };
  }
}

/** Every rule without an answer, once for each reason. */
function whyUnknown(rules: readonly RoomOfRule[]): string {
  const open = rules.filter(({ state }) => state === 'not computed');
  if (open.length === 0) return 'None of the chosen rules can be followed along the binder content.';
  const reasons = new Map<string, string[]>();
  for (const { title, reason } of open)
    reasons.set(reason ?? '', [...(reasons.get(reason ?? '') ?? []), uncapitalised(title)]);
  return [...reasons].map(([reason, titles]) => `${capitalised(andList(titles))}: ${reason}`).join(' ');
}

function choose(stretches: readonly RoomStretch[], declared: number | null): RoomStretch | null {
  const around = stretches.find(({ from, to }) => declared !== null && from <= declared && declared <= to);
  if (around) return around;
  const [widest] = stretches.toSorted((a, b) => b.to - b.from - (a.to - a.from));
  return widest ?? null;
}

function closersOf(rules: readonly RoomOfRule[], closes: (stretch: RoomStretch) => boolean): string[] {
  return rules.filter(({ holds }) => holds.some(closes)).map(({ rule }) => rule);
}

/** What keeps a mix without room from any: one rule that holds nowhere, else the pair that lies farthest apart. */
function excludingOf(rules: readonly RoomOfRule[]): string[] {
  const nowhere = rules.find(({ holds }) => holds.length === 0);
  if (nowhere) return [nowhere.rule];
  let widest = 0;
  let pair: string[] = [];
  rules.forEach((one, place) => {
    for (const other of rules.slice(place + 1)) {
      const gap = gapBetween(one.holds, other.holds);
      if (gap <= widest) continue;
      widest = gap;
      pair = [one.rule, other.rule];
    }
  });
  return pair;
}

/** Zero where two rules hold somewhere together, else how far apart they come closest. */
function gapBetween(left: readonly RoomStretch[], right: readonly RoomStretch[]): number {
  const gaps = left.flatMap((one) =>
    right.map((other) => Math.max(one.from, other.from) - Math.min(one.to, other.to)),
  );
  return Math.max(0, Math.min(...gaps));
}
