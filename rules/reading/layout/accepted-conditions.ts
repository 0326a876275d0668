import type { Quantity } from '../../quantities/quantity';
import type { Conditions } from '../../record';
import type { Domain } from '../words/context-words';
import type { Candidate } from './candidate';

const gradation = new Set(['percent-passing', 'percent-retained', 'cumulative-percent-retained']);

/** Tests whose result means little without the temperature that they were made at. */
const tested = new Set([
  'wheel-track-rut-depth',
  'loaded-wheel-rut-depth',
  'stripping-inflection-point',
  'passes-to-rut-depth',
  'cracking-tolerance-index',
  'flexibility-index',
  'fracture-energy',
  'post-peak-slope',
  'post-peak-displacement',
  'flow-number',
  'high-temperature-tensile-strength',
  'rutting-tolerance-index',
  'overlay-cycles',
  'fatigue-life',
  'ductility',
  'elastic-recovery',
  'mass-loss-abrasion-mix',
  'draindown',
  'wheel-track-slope',
  'proportional-rut-depth',
  'cyclic-fatigue-index',
  'creep-compliance',
  'creep-strain',
  'horizontal-deformation',
  'vertical-deformation',
]);

const stressed = new Set([
  'creep-compliance',
  'creep-strain',
  'horizontal-deformation',
  'vertical-deformation',
  'flow-number',
  'non-recoverable-compliance',
  'percent-recovery',
]);
const timed = new Set([
  'creep-compliance',
  'creep-strain',
  'horizontal-deformation',
  'vertical-deformation',
  'creep-stiffness',
  'creep-rate',
]);
const passed = new Set(['wheel-track-rut-depth', 'loaded-wheel-rut-depth']);
const subsets = new Set([
  'air-voids',
  'degree-of-saturation',
  'failure-load',
  'specimen-thickness',
  'specimen-height',
  'specimen-diameter',
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'bulk-specific-gravity-mix',
  'specimen-absorption',
  'marshall-stability',
]);
/** Tests whose specimens are compacted for them alone, by the kind of test that a title or a heading speaks of. */
const testsOfTheirOwn: Partial<Record<Domain, string>> = {
  hamburg: 'wheel tracking',
  'loaded-wheel': 'loaded wheel',
  disk: 'disk-shaped',
  cracking: 'cracking',
  modulus: 'modulus',
  creep: 'creep',
};
const ofSpecimensAlone = new Set([
  'air-voids',
  'voids-in-mineral-aggregate',
  'voids-filled-with-asphalt',
  'relative-density',
  'mass-in-air',
  'mass-in-water',
  'mass-saturated-surface-dry',
  'bulk-specific-gravity-mix',
  'bulk-density-mix',
  'specimen-absorption',
]);
/** Tests of the binder that are made before and after it is aged. */
const agedTests = new Set([
  'rutting-parameter',
  'fatigue-parameter',
  'creep-stiffness',
  'creep-rate',
  'non-recoverable-compliance',
  'percent-recovery',
]);
const strengths = new Set(['tensile-strength-dry', 'tensile-strength-conditioned']);

/** The conditions that a reading of this quantity is told apart by, out of all that the layout states around it. */
export function acceptedConditions(candidate: Candidate, quantity: Quantity): Conditions {
  const near = keep(candidate.at, (name) => accepts(quantity, name));
  const far = keep(candidate.far, (name) => accepts(quantity, name) && acceptsFromAfar(quantity, name));
  const at: Conditions = { ...far, ...near };
  // A blend of its own is not the trial that a title further off speaks of.
  if (near.blend !== undefined && near.trial === undefined) delete at.trial;
  if (near.stockpile !== undefined) {
    delete at.trial;
    if (near.blend === undefined) delete at.blend;
  }
  if (
    subsets.has(quantity.id) &&
    at.variant === undefined &&
    candidate.subset !== null &&
    isMoisture(candidate)
  )
    at.variant = candidate.subset;
  if (ofSpecimensAlone.has(quantity.id) && at.variant === undefined) {
    const test = testOf(candidate);
    if (test !== undefined) at.variant = test;
  }
  if (strengths.has(quantity.id)) delete at.variant;
  if (quantity.id === 'tensile-strength-ratio') {
    delete at.variant;
    delete at.specimen;
  }
  if (quantity.id === 'binder-content' && at.trial !== undefined && at.laboratory !== 'agency')
    delete at.specimen;
  return at;
}

/** For which test the specimens of a table were made, where what stands nearest speaks of one. */
function testOf({ domains }: Candidate): string | undefined {
  const nearest = domains.find((domain) => domain in testsOfTheirOwn || OF_THE_DESIGN.has(domain));
  return nearest === undefined ? undefined : testsOfTheirOwn[nearest];
}

const OF_THE_DESIGN = new Set<Domain>(['mix', 'marshall', 'moisture', 'field']);

export function isMoisture(candidate: Candidate): boolean {
  return (
    candidate.domains.includes('moisture') ||
    candidate.at.variant === 'dry' ||
    candidate.at.variant === 'conditioned'
  );
}

function keep(at: Conditions, isKept: (name: keyof Conditions) => boolean): Conditions {
  return Object.fromEntries(
    Object.entries(at).filter(([name, value]) => value !== undefined && isKept(name as keyof Conditions)),
  );
}

function accepts(quantity: Quantity, name: keyof Conditions): boolean {
  const { id, conditions, subject } = quantity;
  switch (name) {
    case 'aging':
      return subject !== 'binder' || agedTests.has(id);
    case 'sieve':
      return gradation.has(id);
    case 'stockpile':
      return subject === 'aggregate';
    case 'temperature':
      return conditions.includes('temperature') || tested.has(id);
    case 'time':
      return conditions.includes('time') || timed.has(id);
    case 'stress':
      return conditions.includes('stress') || stressed.has(id);
    case 'passes':
      return passed.has(id);
    case 'frequency':
      return conditions.includes('frequency');
    case 'gyrations':
      return !id.startsWith('gyrations-') && subject !== 'aggregate' && subject !== 'binder';
    case 'trial':
      return subject === 'mix' || subject === 'specimen' || gradation.has(id) || subject === 'aggregate';
    default:
      return true;
  }
}

/** What stands over a whole sheet speaks for mixes and specimens; an aggregate or a binder has no trial of its own. */
function acceptsFromAfar({ id, subject }: Quantity, name: keyof Conditions): boolean {
  if (name === 'trial') return subject === 'mix' || subject === 'specimen' || gradation.has(id);
  if (name === 'specimen') return subject === 'specimen' || subject === 'mix';
  if (name === 'blend' || name === 'stockpile')
    return subject === 'aggregate' || subject === 'mix' || subject === 'specimen';
  if (name === 'variant' || name === 'gyrations') return false;
  return true;
}
