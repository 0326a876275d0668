import type { Conditions } from '../record';
import type { Measure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { applicabilityOf } from './applicability';
import { evaluateAttribute } from './evaluate-attribute';
import { evaluateCreep } from './evaluate-creep';
import { evaluateDifference } from './evaluate-difference';
import { evaluateDocument } from './evaluate-document';
import { evaluateFormula } from './evaluate-formula';
import { evaluateGradation, evaluateReading } from './evaluate-reading';
import type { Finding } from './finding';
import { makeFinding } from './make-finding';
import { subjectOf } from './subject';
import type { World } from './world';

/** The findings of one rule. An error of ours leaves the rule undecided and says so; it never passes. */
export function evaluateRule(world: World, rule: ResolvedRule): Finding[] {
  try {
    const applicability = applicabilityOf(world, rule);
    if (applicability.kind === 'applies') return measured(world, rule, rule.measure);
    const { kind, reason, wouldDecide, evidence } = applicability;
    return [
      makeFinding(world, rule, { ...wholeRule(world, rule), outcome: kind, reason, wouldDecide, evidence }),
    ];
  } catch (error) {
    const detail = error instanceof Error ? error.message : String(error);
    const reason = `An internal error occurred while this rule was evaluated, so nothing is decided: ${detail}`;
    return [makeFinding(world, rule, { ...wholeRule(world, rule), outcome: 'undecided', reason })];
  }
}

function measured(world: World, rule: ResolvedRule, measure: Measure): Finding[] {
  switch (measure.kind) {
    case 'reading':
      return evaluateReading(world, rule, measure);
    case 'gradation':
      return evaluateGradation(world, rule, measure);
    case 'difference':
      return evaluateDifference(world, rule, measure);
    case 'attribute':
      return evaluateAttribute(world, rule, measure);
    case 'document':
      return evaluateDocument(world, rule, measure);
    case 'formula':
      return evaluateFormula(world, rule, measure);
    case 'creep-compliance':
      return evaluateCreep(world, rule, measure);
  }
}

/** The rule as a whole, before its subjects are known. */
function wholeRule(world: World, rule: ResolvedRule): { subject: string; at: Conditions } {
  const at = 'at' in rule.measure ? rule.measure.at : {};
  return { subject: subjectOf(world, rule.measure, at), at };
}
