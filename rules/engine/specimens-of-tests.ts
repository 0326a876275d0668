import type { Conditions, MixRecord, Reading } from '../record';
import type { EditionView } from '../rule-sets/edition-view';
import type { ResolvedRule } from '../rule-sets/resolve';
import { andList, orList } from '../rule-sets/words';
import { isSpecial } from './analysis-index';
import { type Finding, findingKey } from './finding';
import { type Obstacle, undecided } from './obstacle';

/**
 * Findings that turn on whose specimens are whose. Specimens for rutting, cracking, stiffness and creep are compacted
 * to voids of their own (7 %, common practice, no source). Where one has the label of a volumetric specimen of the
 * same trial, the two may be one that was made for the test, or two that were numbered alike. Every rule is judged
 * without them as well; a finding that would then be decided otherwise is not settled.
 */
export function unsettledByTests(input: {
  record: MixRecord;
  rules: readonly ResolvedRule[];
  view: EditionView;
  findings: readonly Finding[];
  evaluate: (record: MixRecord, rules: ResolvedRule[]) => readonly Finding[];
}): Map<string, Obstacle> {
  const unsettled = new Map<string, Obstacle>();
  const shared = sharedSpecimens(input.record);
  if (shared.readings.size === 0) return unsettled;
  const readings = input.record.readings.filter((reading) => !shared.readings.has(reading));
  // How many are left says nothing about what they would be judged as.
  const decided = new Set(input.findings.filter(isDecided).map(({ rule }) => rule));
  const rules = input.rules.filter(({ id }) => decided.has(id)).map(withoutLeastCount);
  const others = input.evaluate({ ...input.record, readings }, rules);
  const outcomes = new Map(others.map((finding) => [findingKey(finding), finding.outcome]));
  for (const finding of input.findings) {
    const outcome = outcomes.get(findingKey(finding));
    if (outcome === undefined || outcome === finding.outcome || !DECIDED.has(outcome)) continue;
    if (!isDecided(finding)) continue;
    unsettled.set(findingKey(finding), undecided(reasonOf(input.view, shared, outcome), REMEDY));
  }
  return unsettled;
}

function isDecided({ outcome }: Finding): boolean {
  return DECIDED.has(outcome);
}

/**
 * Where a rule names no form of a test and all that there is of a volumetric quantity was measured on specimens that
 * were made for one: what the design's own would be is not known.
 */
export function madeForTests(
  quantity: string,
  wanted: Conditions,
  chosen: readonly { at: Conditions }[],
  label: string,
): Obstacle | null {
  if (!VOLUMETRIC.has(quantity) || wanted.variant !== undefined || chosen.length === 0) return null;
  if (chosen.some(({ at }) => at.variant === undefined)) return null;
  const forms = [...new Set(chosen.map(({ at }) => at.variant ?? ''))];
  return undecided(
    `Readings of ${label} are only of specimens made for a test of their own (${orList(forms)}).`,
    `State ${label} of specimens of the design.`,
  );
}

const DECIDED = new Set<string>(['pass', 'fail', 'not applicable']);

const REMEDY =
  'State for which test those specimens were made (form of the test), or label the specimens of different tests differently.';

interface Shared {
  readings: Set<Reading>;
  specimens: string[];
  tests: string[];
}

/** Volumetric readings that nothing but a label ties to a test, and the tests that it ties them to. */
function sharedSpecimens({ readings }: MixRecord): Shared {
  const tests = new Map<string, Set<string>>();
  for (const { quantity, at } of readings) {
    const key = TESTS.has(quantity) ? keyOf(at) : null;
    if (key === null) continue;
    tests.set(key, (tests.get(key) ?? new Set()).add(quantity));
  }
  const isShared = (reading: Reading): boolean => {
    if (tests.size === 0 || !VOLUMETRIC.has(reading.quantity) || isSpecial(reading)) return false;
    const key = keyOf(reading.at);
    return key !== null && tests.has(key);
  };
  const found = readings.filter(isShared);
  return {
    readings: new Set(found),
    specimens: [...new Set(found.map(({ at }) => at.specimen ?? ''))].toSorted(),
    tests: [...new Set(found.flatMap(({ at }) => [...(tests.get(keyOf(at) ?? '') ?? [])]))].toSorted(),
  };
}

function keyOf({ trial = 'design', laboratory = 'contractor', specimen }: Conditions): string | null {
  return specimen === undefined ? null : JSON.stringify([laboratory, trial, specimen]);
}

function withoutLeastCount(rule: ResolvedRule): ResolvedRule {
  if (rule.measure.kind !== 'reading' || rule.measure.minimumCount === undefined) return rule;
  const kept = withoutCounts.get(rule);
  if (kept) return kept;
  const { minimumCount: _minimumCount, ...measure } = rule.measure;
  const without = { ...rule, measure };
  withoutCounts.set(rule, without);
  return without;
}

/** One and the same for every record, so that it is put into words once. */
const withoutCounts = new WeakMap<ResolvedRule, ResolvedRule>();

function reasonOf(view: EditionView, { specimens, tests }: Shared, outcome: string): string {
  const [only, ...others] = specimens;
  const names = others.length === 0 ? `Specimen ${only} has` : `Specimens ${andList(specimens)} have`;
  const labels = tests.map((id) => view.quantity(id)?.label ?? id);
  return `${names} results of ${andList(labels)} as well, and may have been compacted to other voids for it; without what was measured on ${others.length === 0 ? 'it' : 'them'}, this would be ${outcome}.`;
}

/** Made by hand or sawn for a test of their own. Stability, flow and abrasion are tested on volumetric specimens. */
const TESTS = new Set([
  'wheel-track-rut-depth',
  'wheel-track-slope',
  'proportional-rut-depth',
  'loaded-wheel-rut-depth',
  'stripping-inflection-point',
  'passes-to-rut-depth',
  'rutting-tolerance-index',
  'high-temperature-tensile-strength',
  'cracking-tolerance-index',
  'flexibility-index',
  'fracture-energy',
  'post-peak-slope',
  'post-peak-displacement',
  'disk-fracture-energy',
  'critical-strain-energy-rate',
  'overlay-cycles',
  'fatigue-life',
  'cyclic-fatigue-index',
  'low-temperature-tensile-strength',
  'dynamic-modulus',
  'mix-phase-angle',
  'indirect-tensile-stiffness',
  'flow-number',
  'rutting-strain-index',
  'creep-compliance',
  'creep-strain',
  'creep-load',
  'horizontal-deformation',
  'vertical-deformation',
]);

/** What is measured on a compacted specimen, and what follows from it alone. */
const VOLUMETRIC = new Set([
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'bulk-specific-gravity-mix',
  'bulk-density-mix',
  'specimen-absorption',
  'specimen-height',
  'relative-density',
  'air-voids',
  'voids-in-mineral-aggregate',
  'voids-filled-with-asphalt',
  'effective-binder-volume',
]);
