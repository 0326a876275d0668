import type { Reading } from '#rules/record';
import type { Rule } from '#rules/rule-sets/schema';
import type { Verdict, World } from './world';

/** Made on specimens of their own, compacted for the test. */
const TESTS = [
  'wheel-track-rut-depth',
  'loaded-wheel-rut-depth',
  'proportional-rut-depth',
  'high-temperature-tensile-strength',
  'overlay-cycles',
  'dynamic-modulus',
  'creep-compliance',
  'creep-strain',
];
export const OF_COMPACTED = ['bulk-specific-gravity-mix', 'air-voids', 'relative-density'];

/**
 * Whether an outcome hangs on volumetric readings of which only a label says that they are not a test's: judged
 * without them, and without asking how many are left, the rule would be decided otherwise.
 */
export function specimensPart(
  world: World,
  verdict: Verdict,
  rule: Rule,
  judgedIn: (other: World, rule: Rule) => Verdict[],
): boolean {
  if (!isDecided(verdict)) return false;
  const readings = world.record.readings.filter((reading) => !isShared(world, reading));
  if (readings.length === world.record.readings.length) return false;
  const { measure } = rule;
  const uncounted = measure.kind === 'reading' ? { ...measure, minimumCount: undefined } : measure;
  const others = judgedIn(
    { ...world, record: { ...world.record, readings } },
    { ...rule, measure: uncounted },
  );
  const other = others.find(({ subject }) => subject === verdict.subject);
  return other !== undefined && isDecided(other) && other.outcome !== verdict.outcome;
}

function isDecided({ outcome }: Verdict): boolean {
  return outcome === 'pass' || outcome === 'fail' || outcome === 'not applicable';
}

function isShared({ record }: World, { quantity, at }: Reading): boolean {
  const { variant, temperature, time, stress, passes, frequency, aging } = at;
  const says = [variant, temperature, time, stress, passes, frequency, aging];
  if (!OF_COMPACTED.includes(quantity) || says.some((value) => value !== undefined)) return false;
  if (at.specimen === undefined) return false;
  return record.readings.some(
    (test) =>
      TESTS.includes(test.quantity) &&
      test.at.specimen === at.specimen &&
      (test.at.trial ?? 'design') === (at.trial ?? 'design') &&
      (test.at.laboratory ?? 'contractor') === (at.laboratory ?? 'contractor'),
  );
}
