import { sieveLabel } from '../quantities/sieves';
import type { Conditions } from '../record';
import { readFormula } from '../rule-sets/formula';
import type { Measure } from '../rule-sets/measure';
import { isPerTrial } from './scope';
import type { World } from './world';

/** `design point`, `12.5 mm` for a sieve, `stockpile <name>`, else `mix`. */
export function subjectOf(world: World, measure: Measure, at: Conditions): string {
  const stockpile =
    at.stockpile !== undefined && at.stockpile !== 'each' ? `stockpile ${at.stockpile}` : null;
  const sieve = at.sieve === undefined ? null : sieveLabel(at.sieve);
  if (stockpile !== null) return sieve === null ? stockpile : `${stockpile}, ${sieve}`;
  if (sieve !== null) return sieve;
  return isOfDesign(world, measure, at) ? 'design point' : 'mix';
}

function isOfDesign(world: World, measure: Measure, at: Conditions): boolean {
  if (at.stockpile !== undefined) return false;
  if (measure.kind === 'gradation') return (at.trial ?? 'design') === 'design';
  if (measure.kind !== 'reading' && measure.kind !== 'difference' && measure.kind !== 'formula') return false;
  if (at.trial !== undefined) return at.trial === 'design';
  if (measure.kind === 'formula') {
    const formula = readFormula(measure.expression, world.view);
    return formula.ok && formula.formula.symbols.some(({ quantity }) => isPerTrial(world, quantity));
  }
  return isPerTrial(world, measure.quantity);
}
