import type { Rule } from '#rules/rule-sets/schema';
import { alternativesPart } from './alternatives';
import { type AttributeRule, attributeVerdicts } from './attribute-rule';
import { type CreepRule, creepVerdicts } from './creep-rule';
import { type DifferenceRule, differenceVerdicts } from './difference-rule';
import { type DocumentRule, documentVerdicts } from './document-rule';
import { type FormulaRule, formulaSubject, formulaVerdicts } from './formula-rule';
import { type GradationRule, gradationVerdicts, wholeGradation } from './gradation-rule';
import { type ReadingRule, readingVerdicts } from './reading-rule';
import { specimensPart } from './shared-specimens';
import { subjectOf } from './subject';
import { truthOf } from './truth';
import { type Verdict, type World, without } from './world';

/** What every rule of the edition comes to on this record. */
export function verdictsOf(world: World): Verdict[] {
  const all: Verdict[] = [];
  for (const rule of world.edition.rules) {
    for (const verdict of ruleVerdicts(world, rule)) {
      const isOpen =
        alternativesPart(world, verdict, (other) => ruleVerdicts(other, rule)) ||
        specimensPart(world, verdict, rule, ruleVerdicts);
      all.push(isOpen ? { ...verdict, ...without('undecided') } : verdict);
    }
  }
  return all;
}

function ruleVerdicts(world: World, rule: Rule): Verdict[] {
  const truth = truthOf(world, rule.when);
  if (truth === 'true') return measured(world, rule);
  const outcome = truth === 'false' ? 'not applicable' : 'undecided';
  return [{ rule: rule.id, subject: wholeSubject(rule), ...without(outcome) }];
}

function measured(world: World, rule: Rule): Verdict[] {
  switch (rule.measure.kind) {
    case 'reading':
      return readingVerdicts(world, rule as ReadingRule);
    case 'gradation':
      return gradationVerdicts(world, rule as GradationRule);
    case 'difference':
      return differenceVerdicts(world, rule as DifferenceRule);
    case 'attribute':
      return attributeVerdicts(world, rule as AttributeRule);
    case 'document':
      return documentVerdicts(world, rule as DocumentRule);
    case 'formula':
      return formulaVerdicts(world, rule as FormulaRule);
    case 'creep-compliance':
      return creepVerdicts(world, rule as CreepRule);
  }
}

function wholeSubject({ measure }: Rule): string {
  if (measure.kind === 'reading') return subjectOf(measure.quantity, measure.at);
  if (measure.kind === 'gradation') return wholeGradation(measure);
  if (measure.kind === 'formula') return formulaSubject(measure);
  return measure.kind === 'difference' ? subjectOf(measure.quantity, {}) : 'mix';
}
