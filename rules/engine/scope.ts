import type { Conditions } from '../record';
import { normaliseText } from '../rule-sets/match-value';
import { orList } from '../rule-sets/words';
import { notShown, type Obstacle, undecided } from './obstacle';
import type { Candidate } from './select';
import type { World } from './world';

/** Laboratory, stockpile, trial and blend: to whom and to what a reading belongs, before its test conditions. */
export interface Scope<T> {
  world: World;
  quantity: string;
  label: string;
  wanted: Conditions;
  candidates: T[];
}

/** The candidates that belong to what the rule is about, or why there are none. */
export function inScope<T extends Candidate>(scope: Scope<T>): { ok: true; chosen: T[] } | Obstacle {
  const { label, wanted } = scope;
  if (scope.candidates.length === 0) return notShown(`There is no reading of ${label}.`);

  const laboratory = wanted.laboratory ?? 'contractor';
  const ofLaboratory = scope.candidates.filter(({ at }) => (at.laboratory ?? 'contractor') === laboratory);
  if (ofLaboratory.length === 0) {
    return notShown(`There is no reading of ${label} by the ${laboratory}'s laboratory.`);
  }
  const ofStockpile = ofLaboratory.filter(({ at }) => sameStockpile(at.stockpile, wanted.stockpile));
  if (ofStockpile.length === 0) return noStockpile(scope, ofLaboratory);
  const ofTrial = belongingToTrial(scope, ofStockpile);
  if (ofTrial.length === 0) {
    const trials = [...new Set(ofStockpile.map(({ at }) => at.trial ?? 'design'))];
    const wantedTrial = wanted.trial ?? 'design';
    const name = wantedTrial === 'design' ? 'the design' : `trial ${wantedTrial}`;
    return notShown(
      `There is no reading of ${label} for ${name}, only for ${orList(trials.map(trialWords))}.`,
    );
  }
  return ofBlend(scope, ofTrial);
}

function noStockpile<T extends Candidate>({ label, wanted }: Scope<T>, candidates: T[]): Obstacle {
  if (wanted.stockpile === undefined) {
    return notShown(`There are readings of ${label} for single stockpiles, but none for the blend.`);
  }
  if (candidates.some(({ at }) => at.stockpile === undefined)) {
    return undecided(
      `Readings of ${label} do not say which stockpile they belong to.`,
      'State the stockpile of each.',
    );
  }
  return notShown(`There is no reading of ${label}.`);
}

/** Whether a quantity belongs to a trial of the mix; a property of aggregate or binder belongs to every trial. */
export function isPerTrial(world: World, quantity: string): boolean {
  const subject = world.view.quantity(quantity)?.subject ?? 'mix';
  return subject === 'mix' || subject === 'specimen';
}

function belongingToTrial<T extends Candidate>({ world, quantity, wanted }: Scope<T>, candidates: T[]): T[] {
  const trial = wanted.trial ?? 'design';
  if (isPerTrial(world, quantity)) return candidates.filter(({ at }) => (at.trial ?? 'design') === trial);
  const own = candidates.filter(({ at }) => at.trial === trial);
  return own.length > 0 ? own : candidates.filter(({ at }) => at.trial === undefined);
}

function ofBlend<T extends Candidate>(
  { world, label, wanted }: Scope<T>,
  candidates: T[],
): { ok: true; chosen: T[] } | Obstacle {
  if (wanted.blend !== undefined) {
    const named = candidates.filter(({ at }) => at.blend === wanted.blend);
    return named.length > 0
      ? { ok: true, chosen: named }
      : notShown(`There is no reading of ${label} for blend ${wanted.blend}.`);
  }
  const blends = new Set(candidates.map(({ at }) => at.blend).filter((blend) => blend !== undefined));
  const withoutBlend = candidates.filter(({ at }) => at.blend === undefined);
  if (blends.size === 0) return { ok: true, chosen: candidates };
  if (withoutBlend.length > 0) return { ok: true, chosen: withoutBlend };
  if (blends.size === 1) return { ok: true, chosen: candidates };
  const ofDesign = candidates.filter(({ at }) => at.blend === world.designBlend);
  if (ofDesign.length > 0) return { ok: true, chosen: ofDesign };
  return undecided(
    `Readings of ${label} belong to blends ${orList([...blends])}, and the job mix does not name the one it uses.`,
    'Name the blend of the job mix.',
  );
}

function sameStockpile(stated: string | undefined, wanted: string | undefined): boolean {
  if (stated === undefined || wanted === undefined) return stated === wanted;
  return normaliseText(stated) === normaliseText(wanted);
}

function trialWords(trial: string): string {
  return trial === 'design' ? 'the design' : `trial ${trial}`;
}
