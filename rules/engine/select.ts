import type { Conditions } from '../record';
import { conditionWords, orList } from '../rule-sets/words';
import { notShown, type Obstacle, undecided } from './obstacle';
import { statedGyrations } from './stated-gyrations';
import type { World } from './world';

/** Conditions that tell one test from another. `specimen` is a replicate and never splits. */
const SELECTORS = [
  'sieve',
  'variant',
  'gyrations',
  'temperature',
  'time',
  'stress',
  'passes',
  'frequency',
  'aging',
  'specimen',
] as const;
type Selector = (typeof SELECTORS)[number];

export interface Candidate {
  at: Conditions;
}

export interface Selection<T> {
  world: World;
  candidates: T[];
  wanted: Conditions;
  label: string;
  /**
   * Where a rule leaves a condition unnamed, whether candidates without it stand apart from those with it.
   * True for derived values, whose plain form is the one of the volumetric specimens.
   */
  preferPlain: boolean;
}

/**
 * The candidates obtained as the rule demands, or why none can be told to be. What a rule names is looked at first:
 * only among what is left could a condition that it leaves unnamed tell one test from another.
 */
export function select<T extends Candidate>(selection: Selection<T>): { ok: true; chosen: T[] } | Obstacle {
  const named = SELECTORS.filter((selector) => selection.wanted[selector] !== undefined);
  const possible = withoutOthers(selection, named);
  if (!possible.ok) return possible;
  let { chosen } = possible;
  for (const selector of named) {
    const step = selectNamed(selection, chosen, selector);
    if (!step.ok) return step;
    chosen = step.chosen;
  }
  for (const selector of SELECTORS) {
    if (named.includes(selector)) continue;
    const step = leaveUnnamed(selection, chosen, selector);
    if (!step.ok) return step;
    chosen = step.chosen;
  }
  return { ok: true, chosen };
}

/**
 * A reading that carries another value of one named condition is out, whatever it leaves unsaid of a second: to say
 * that would not make it count.
 */
function withoutOthers<T extends Candidate>(
  { world, candidates, wanted, label }: Selection<T>,
  named: readonly Selector[],
): { ok: true; chosen: T[] } | Obstacle {
  if (named.length < 2) return { ok: true, chosen: candidates };
  const isOther = ({ at }: T, selector: Selector) =>
    at[selector] !== undefined && sameCondition(world, selector, wanted[selector], at[selector]) === 'other';
  const chosen = candidates.filter((each) => !named.some((selector) => isOther(each, selector)));
  if (chosen.length > 0 || candidates.length === 0) return { ok: true, chosen };
  const wordsOf = (at: Conditions) =>
    conditionWords(Object.fromEntries(named.map((selector) => [selector, at[selector]]))).trim();
  const others = [...new Set(candidates.map(({ at }) => wordsOf(at)))];
  return notShown(`There is no reading of ${label} ${wordsOf(wanted)}, only ${orList(others)}.`);
}

function selectNamed<T extends Candidate>(
  { world, wanted, label }: Selection<T>,
  candidates: T[],
  selector: Selector,
): { ok: true; chosen: T[] } | Obstacle {
  const matches = candidates.map((each) =>
    sameCondition(world, selector, wanted[selector], each.at[selector]),
  );
  const chosen = candidates.filter((_, i) => matches[i] === 'same');
  const asked = conditionWords({ [selector]: wanted[selector] }).trim();
  if (matches.includes('unresolved')) {
    return undecided(
      `Readings of ${label} are at a number of gyrations, and which number the ${wanted[selector]} gyrations are is not stated.`,
      `State the ${wanted[selector]} number of gyrations.`,
    );
  }
  if (chosen.length > 0) return { ok: true, chosen };
  if (candidates.some((each) => each.at[selector] === undefined)) {
    return undecided(
      `Readings of ${label} do not say whether they were obtained ${asked}.`,
      `State ${CONDITION_WORDS[selector]} of each reading of ${label}.`,
    );
  }
  const others = [
    ...new Set(candidates.map((each) => conditionWords({ [selector]: each.at[selector] }).trim())),
  ];
  return notShown(`There is no reading of ${label} ${asked}, only ${orList(others)}.`);
}

function leaveUnnamed<T extends Candidate>(
  { world, label, preferPlain }: Selection<T>,
  candidates: T[],
  selector: Selector,
): { ok: true; chosen: T[] } | Obstacle {
  if (selector === 'specimen' || candidates.every((each) => each.at[selector] === undefined)) {
    return { ok: true, chosen: candidates };
  }
  const plain = candidates.filter((each) => each.at[selector] === undefined);
  if (plain.length > 0 && preferPlain) return { ok: true, chosen: plain };
  const first = candidates.find((each) => each.at[selector] !== undefined)?.at[selector];
  const areAlike =
    plain.length === 0 &&
    candidates.every((each) => sameCondition(world, selector, first, each.at[selector]) === 'same');
  if (areAlike) return { ok: true, chosen: candidates };
  return undecided(
    `Readings of ${label} differ in ${SELECTOR_WORDS[selector]}, and the rule does not say which one counts.`,
    `Leave only the readings of ${label} of the test that is meant, or have the rule name ${CONDITION_WORDS[selector]}.`,
  );
}

type Match = 'same' | 'other' | 'unresolved';

function sameCondition(
  world: World,
  selector: Selector,
  wanted: Conditions[Selector],
  stated: Conditions[Selector],
): Match {
  if (wanted === undefined || stated === undefined) return 'other';
  if (selector === 'gyrations') return sameGyrations(world, wanted, stated);
  if (typeof wanted === 'number' && typeof stated === 'number') {
    return Math.abs(wanted - stated) <= allowanceOf(selector, wanted) ? 'same' : 'other';
  }
  return String(wanted).trim().toLowerCase() === String(stated).trim().toLowerCase() ? 'same' : 'other';
}

/** Temperatures match within 0.5 °C, loading times within 1 %; a whisker more, for binary arithmetic. */
export function allowanceOf(selector: Selector, wanted: number): number {
  if (selector === 'temperature') return 0.5 + 1e-9;
  if (selector === 'time') return Math.abs(wanted) * (0.01 + 1e-12);
  return 0;
}

/** A name matches the same name as it stands; only a name against a number needs the stated number. */
function sameGyrations(world: World, wanted: unknown, stated: unknown): Match {
  if (typeof wanted === typeof stated) return wanted === stated ? 'same' : 'other';
  const name = typeof wanted === 'string' ? wanted : String(stated);
  const number = typeof wanted === 'number' ? wanted : stated;
  const resolved = statedGyrations(world, name);
  if (resolved === null) return 'unresolved';
  return resolved === number ? 'same' : 'other';
}

const CONDITION_WORDS: Record<Selector, string> = {
  sieve: 'the sieve',
  variant: 'the form of the test',
  gyrations: 'the number of gyrations',
  temperature: 'the temperature',
  time: 'the loading time',
  stress: 'the stress',
  passes: 'the number of passes',
  frequency: 'the frequency',
  aging: 'the aging',
  specimen: 'the specimen',
};

const SELECTOR_WORDS: Record<Selector, string> = {
  sieve: 'sieve',
  variant: 'the form of the test',
  gyrations: 'number of gyrations',
  temperature: 'temperature',
  time: 'loading time',
  stress: 'stress',
  passes: 'passes',
  frequency: 'frequency',
  aging: 'aging',
  specimen: 'specimen',
};
