import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import { type Formula, readFormula } from '../rule-sets/formula';
import type { FormulaMeasure } from '../rule-sets/measure';
import type { ResolvedRule } from '../rule-sets/resolve';
import { capitalised, withUnit } from '../rule-sets/words';
import { computeFormula } from './compute-formula';
import { distanceWords } from './distance-words';
import { conditionsOfSubjects } from './evaluate-reading';
import type { Evidence, Finding, Observed, ResolvedLimit } from './finding';
import { conditionsOfSymbol, type FormulaInput, formulaInputs } from './formula-inputs';
import { type Judgement, judge, type Rounder, rounderOf } from './judge';
import { makeFinding } from './make-finding';
import { AGREE_WORDS, type Obstacle, undecided } from './obstacle';
import { isBorderline, precisionOf } from './precision';
import { resolveLimit } from './resolve-limit';
import { subjectOf } from './subject';
import type { World } from './world';

/** A `formula` rule: one finding, or one a stockpile where the rule asks for each. */
export function evaluateFormula(world: World, rule: ResolvedRule, measure: FormulaMeasure): Finding[] {
  const result = readFormula(measure.expression, world.view);
  // An edition with such a rule is refused when it is read; here it can only be a defect of ours.
  if (!result.ok) throw new Error(`The formula of rule ${rule.id} cannot be used: ${result.detail}`);
  const { formula } = result;
  return formulaSubjects(world, measure, formula).map((at) =>
    ofSubject({ world, rule, measure, formula, at }),
  );
}

/** Every stockpile that any of the symbols has a reading of. */
export function formulaSubjects(world: World, { at }: FormulaMeasure, { symbols }: Formula): Conditions[] {
  if (at.stockpile !== 'each') return [at];
  const ofSymbols = symbols.flatMap((symbol) =>
    conditionsOfSubjects(world, { quantity: symbol.quantity, at: conditionsOfSymbol(symbol, at) }),
  );
  const names = [...new Set(ofSymbols.map(({ stockpile }) => stockpile ?? 'each'))].toSorted();
  const named = names.filter((name) => name !== 'each');
  return named.length === 0 ? [at] : named.map((stockpile) => ({ ...at, stockpile }));
}

interface Subject {
  world: World;
  rule: ResolvedRule;
  measure: FormulaMeasure;
  formula: Formula;
  at: Conditions;
}

function ofSubject(subject: Subject): Finding {
  const { world, rule, measure, formula, at } = subject;
  const base = { subject: subjectOf(world, measure, at), at };
  const taken = formulaInputs(world, measure, formula, at);
  const limit = resolveLimit(world, rule, at);
  const shown = limit.ok ? limit.limit : null;
  if (!taken.ok) {
    const { outcome, reason, wouldDecide } = taken;
    const evidence = taken.inputs.map((input) => input.evidence);
    return makeFinding(world, rule, { ...base, outcome, reason, wouldDecide, limit: shown, evidence });
  }
  const value = computed(formula, taken.inputs);
  const evidence = [evidenceOf(subject, taken.inputs, value.ok ? value.value : null)];
  const rounding = limit.ok ? rounderOf(world, rule, limit.limit, at) : limit;
  if (!value.ok || !limit.ok || !rounding.ok) {
    const obstacle = [value, limit, rounding].find((each): each is Obstacle => !each.ok);
    return makeFinding(world, rule, { ...base, ...(obstacle ?? undecided('')), limit: shown, evidence });
  }
  const inUnit = convert(value.value, measure.unit ?? limit.limit.unit, limit.limit.unit);
  if (!inUnit.ok) {
    const reason = `The value is in ${measure.unit} and the limit in ${limit.limit.unit}: ${inUnit.reason}.`;
    return makeFinding(world, rule, { ...base, outcome: 'undecided', reason, limit: shown, evidence });
  }
  return judged(subject, taken.inputs, inUnit.value, limit.limit, rounding.rounder, evidence);
}

function judged(
  subject: Subject,
  inputs: FormulaInput[],
  value: number,
  limit: ResolvedLimit,
  rounder: Rounder,
  evidence: Evidence[],
): Finding {
  const { world, rule, measure, at } = subject;
  const judgement = judge({ value, text: null, allowed: null }, limit, rounder);
  const count = Math.min(...inputs.map(({ sample }) => sample.count));
  const precision = precisionOf({ rule, quantity: undefined, statistic: 'mean', count, unit: limit.unit });
  const observed: Observed = {
    value,
    rounded: judgement.rounded,
    text: judgement.text,
    unit: limit.unit,
    statistic: 'formula',
    count,
  };
  const reported = againstReported(subject, inputs, judgement, limit, rounder);
  const parts = {
    subject: subjectOf(world, measure, at),
    at,
    limit,
    observed,
    precision,
    evidence,
    roundingSentence: judgement.roundingSentence,
  };
  if (reported.contradicts) {
    const { reason } = reported;
    return makeFinding(world, rule, { ...parts, outcome: 'undecided', reason, wouldDecide: AGREE_WORDS });
  }
  const note = inputs.some(({ sample }) => sample.interpolated)
    ? 'A value in it is interpolated between trials at the declared binder content.'
    : '';
  return makeFinding(world, rule, {
    ...parts,
    outcome: judgement.outcome,
    reason: [distanceWords(judgement, limit), reported.reason, note].filter(Boolean).join(' '),
    margin: judgement.margin,
    borderline: isBorderline(judgement.margin, precision),
  });
}

function computed(
  formula: Formula,
  inputs: readonly { symbol: string; value: number }[],
): { ok: true; value: number } | Obstacle {
  const result = computeFormula(
    formula.expression,
    new Map(inputs.map(({ symbol, value }) => [symbol, value])),
  );
  return result.ok
    ? result
    : undecided(`${capitalised(result.reason)}.`, 'Correct the readings that the formula uses.');
}

/**
 * Where the workbook reports another value than the recomputed one of a symbol, and the formula with what is
 * reported has another outcome, neither stands, unless a named cause explains what is reported.
 */
function againstReported(
  { world, measure, formula }: Subject,
  inputs: FormulaInput[],
  { outcome }: Judgement,
  limit: ResolvedLimit,
  rounder: Rounder,
): { contradicts: boolean; reason: string } {
  const differing = inputs.flatMap((input) => {
    const { recomputed } = input.sample;
    const reported = recomputed?.reported ?? null;
    if (recomputed?.agrees !== false || reported === null || reported.value === null) return [];
    const unit = world.view.quantity(recomputed.quantity)?.unit ?? reported.unit;
    const own = convert(reported.value, reported.unit, unit);
    return own.ok ? [{ symbol: input.symbol, value: own.value, recomputed, unit }] : [];
  });
  const outcomeWith = (replaced: typeof differing): Judgement['outcome'] => {
    const values = inputs.map((input) => replaced.find(({ symbol }) => symbol === input.symbol) ?? input);
    const value = computed(formula, values);
    const inUnit = value.ok ? convert(value.value, measure.unit ?? limit.unit, limit.unit) : value;
    return inUnit.ok
      ? judge({ value: inUnit.value, text: null, allowed: null }, limit, rounder).outcome
      : 'undecided';
  };
  const decisive = differing.filter((each) => outcomeWith([each]) !== outcome);
  const together = decisive.length === 0 && differing.length > 1 && outcomeWith(differing) !== outcome;
  const named = together ? differing : decisive;
  if (named.length === 0) return { contradicts: false, reason: '' };
  for (const { recomputed } of named) world.contradicted.add(recomputed);
  const values = named
    .map(({ symbol, value, unit }) => `${symbol} is reported as ${withUnit(String(value), unit)}`)
    .join('; ');
  const unexplained = named.filter(({ recomputed }) => recomputed.cause === null);
  return unexplained.length === 0
    ? {
        contradicts: false,
        reason: `${values}; that ${named.map(({ recomputed }) => recomputed.cause?.text).join('; ')}, so the recomputed value is used.`,
      }
    : {
        contradicts: true,
        reason: `${values}, which differs from the recomputed value and gives another outcome; correct the raw readings or the reported value.`,
      };
}

/** The whole formula with its inputs, as one step of the thread; the registry has no id for what it gives. */
function evidenceOf(
  { measure, formula, at }: Subject,
  inputs: FormulaInput[],
  value: number | null,
): Evidence {
  const stated = Object.keys(at).length === 0 ? {} : { at };
  return {
    quantity: 'formula',
    value,
    unit: measure.unit ?? '1',
    ...stated,
    origin: inputs.some(({ sample }) => sample.interpolated) ? 'interpolated' : 'recomputed',
    formula: formula.text,
    inputs: inputs.map((input) => input.evidence),
    source: null,
  };
}
