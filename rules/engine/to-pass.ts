import type { ResolvedRule } from '../rule-sets/resolve';
import { capitalised } from '../rule-sets/words';
import type { ToPass } from './explanation';
import type { Finding } from './finding';
import { forAttribute } from './to-pass-attribute';
import { forCreep } from './to-pass-creep';
import { forDifference } from './to-pass-difference';
import { forDocument } from './to-pass-document';
import { forFormula } from './to-pass-formula';
import type { Asked } from './to-pass-judging';
import { forValue } from './to-pass-reading';

/**
 * What would have to be otherwise for a failing finding to pass, and by how much: each alone, with all else as it is,
 * in steps of the digits that the laboratory writes. Readings move only where the value follows them one way, and only
 * within what is plausible. A document is also named where none is shown.
 */
export function toPass(asked: Asked, rule: ResolvedRule, finding: Finding): ToPass[] {
  const { world } = asked;
  const { measure } = rule;
  if (measure.kind === 'document') {
    return finding.outcome === 'fail' || finding.outcome === 'not shown' ? forDocument(world, measure) : [];
  }
  if (finding.outcome !== 'fail') return [];
  switch (measure.kind) {
    case 'reading':
    case 'gradation':
      return forValue(asked, rule, measure, finding);
    case 'formula':
      return forFormula(asked, rule, measure, finding);
    case 'creep-compliance':
      return forCreep(world, rule, measure);
    case 'difference':
      return measure.where === undefined ? forDifference(world, rule, measure, finding) : [];
    case 'attribute':
      return forAttribute(world, rule, measure, finding);
  }
}

/** "Gmb of 2.431 or less instead of 2.442 (mean of 3); or P0.075 of 5.5 % or less instead of 5.6." */
export function toPassWords(ways: readonly ToPass[]): string {
  return ways.length === 0 ? '' : `${capitalised(ways.map(({ words }) => words).join('; or '))}.`;
}
