import type { Conditions } from '../record';
import { type Formula, readFormula } from '../rule-sets/formula';
import type { FormulaMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { computeFormula } from './compute-formula';
import { formulaSubjects } from './evaluate-formula';
import type { ToPass } from './explanation';
import type { Finding } from './finding';
import { type FormulaInput, formulaInputs } from './formula-inputs';
import { subjectOf } from './subject';
import { type Part, waysOfParts } from './to-pass-inputs';
import { type Asked, judgingOf } from './to-pass-judging';
import { ofBinderContent } from './to-pass-reading';

/** Each reading behind the symbols of a formula, moved alone in all of them; and another binder content. */
export function forFormula(
  asked: Asked,
  rule: ResolvedRule,
  measure: FormulaMeasure,
  finding: Finding,
): ToPass[] {
  const { world } = asked;
  const read = readFormula(measure.expression, world.view);
  if (!read.ok || measure.where !== undefined) return [];
  const { formula } = read;
  const at = formulaSubjects(world, measure, formula).find(
    (each) => subjectOf(world, measure, each) === finding.subject,
  );
  const inputs = at && formulaInputs(world, measure, formula, at);
  const judging = at && judgingOf(world, rule, at, measure.unit);
  if (!inputs?.ok || !judging) return [];
  const ofContent = ofBinderContent(asked, rule);
  if (inputs.inputs.some(({ sample }) => sample.interpolated)) return ofContent;
  const parts = inputs.inputs.map(partOf);
  const symbols = inputs.inputs.map(({ symbol }) => symbol);
  return [...waysOfParts(judging, parts, (values) => resultOf(formula, symbols, values)), ...ofContent];
}

function partOf({ symbol, value, sample, evidence }: FormulaInput): Part {
  const { recomputed, items } = sample;
  if (recomputed !== null) return { kind: 'computed', node: recomputed.node };
  const at: Conditions = items[0]?.at ?? evidence.at ?? {};
  return { kind: 'read', quantity: evidence.quantity, at, value, count: sample.count, symbol };
}

function resultOf(formula: Formula, symbols: readonly string[], values: readonly number[]): number | null {
  const result = computeFormula(
    formula.expression,
    new Map(symbols.map((symbol, place) => [symbol, values[place] ?? Number.NaN])),
  );
  return result.ok ? result.value : null;
}
