import { evaluate } from '#rules/engine/evaluate';
import type { Finding, Outcome } from '#rules/engine/finding';
import { type MixRecord, mixRecordSchema } from '#rules/record';
import { resolveEdition } from '#rules/rule-sets/resolve';
import { type Layer, layerSchema, type RuleSet, ruleSetSchema } from '#rules/rule-sets/schema';
import type { GeneratedCase } from './generated/parts';
import { verdictsOf } from './own/verdicts';
import { type Verdict, worldOf } from './own/world';

export interface JudgedTwice {
  /** Empty where both agree. */
  disagreements: string[];
  /** Kind and outcome of each finding that was compared. */
  findings: { kind: string; outcome: Outcome; borderline: boolean }[];
}

/** A case as schemas leave it, which both evaluators are given. */
interface Parsed {
  base: RuleSet;
  layers: Layer[];
  record: MixRecord;
  context: GeneratedCase['context'];
}

function parsedCase({ base, layers, record, context }: GeneratedCase): Parsed {
  return {
    base: ruleSetSchema.parse(base),
    layers: layers.map((layer) => layerSchema.parse(layer)),
    record: mixRecordSchema.parse(record),
    context,
  };
}

/** One case judged by the engine and by the second evaluator, finding by finding. */
export function judgeTwice(drawn: GeneratedCase): JudgedTwice {
  const parsed = parsedCase(drawn);
  const findings = ofEngine(parsed);
  return {
    disagreements: compared(findings.map(asVerdict), ownVerdicts(parsed)),
    findings: findings.map(({ kind, outcome, borderline }) => ({ kind, outcome, borderline })),
  };
}

/** What the second evaluator says of a case. */
export function expectedOf(drawn: GeneratedCase): Verdict[] {
  return ownVerdicts(parsedCase(drawn));
}

/** Where the engine parts with what was expected of a case. */
export function disagreementsWith(drawn: GeneratedCase, expected: Verdict[]): string[] {
  return compared(engineFindings(drawn).map(asVerdict), expected);
}

/** The engine's findings on rules; what does not add up in the data is no part of the comparison. */
export function engineFindings(drawn: GeneratedCase): Finding[] {
  return ofEngine(parsedCase(drawn));
}

function ofEngine({ base, layers, record, context }: Parsed): Finding[] {
  const resolution = resolveEdition(base, layers);
  if (!resolution.ok) {
    throw new Error(`A drawn edition does not resolve: ${JSON.stringify(resolution.problems)}`);
  }
  return evaluate(record, resolution.edition, context).findings.filter(({ clause }) => clause !== null);
}

function ownVerdicts({ base, layers, record, context }: Parsed): Verdict[] {
  return verdictsOf(worldOf(record, base, layers, context));
}

function asVerdict(finding: Finding): Verdict {
  return {
    rule: finding.rule,
    subject: finding.subject,
    outcome: finding.outcome,
    rounded: finding.observed?.rounded ?? null,
    margin: finding.margin,
    borderline: finding.borderline,
    figuresAreLaidDown: true,
  };
}

function compared(engines: Verdict[], own: Verdict[]): string[] {
  const left = new Map(engines.map((verdict) => [`${verdict.rule}~${verdict.subject}`, verdict]));
  const disagreements: string[] = [];
  for (const verdict of own) {
    const key = `${verdict.rule}~${verdict.subject}`;
    const engine = left.get(key);
    left.delete(key);
    if (engine === undefined) disagreements.push(`${key}: the engine has no such finding; ${words(verdict)}`);
    else if (!isSame(engine, verdict)) {
      disagreements.push(`${key}: the engine says ${words(engine)}; the second evaluator ${words(verdict)}`);
    }
  }
  for (const [key, verdict] of left) {
    disagreements.push(`${key}: only the engine has it: ${words(verdict)}`);
  }
  return disagreements;
}

function isSame(engine: Verdict, own: Verdict): boolean {
  if (engine.outcome !== own.outcome) return false;
  if (own.outcome !== 'pass' && own.outcome !== 'fail') return engine.margin === null && !engine.borderline;
  if (!own.figuresAreLaidDown) return true;
  return (
    isNear(engine.rounded, own.rounded) &&
    isNear(engine.margin, own.margin, own.rounded ?? 0) &&
    engine.borderline === own.borderline
  );
}

/** Equal to nine digits of the judged value: what an unrounded quotient is written with is no part of the contract. */
function isNear(left: number | null, right: number | null, judged = 0): boolean {
  if (left === null || right === null) return left === right;
  return Math.abs(left - right) <= 1e-9 * Math.max(1, Math.abs(judged), Math.abs(left), Math.abs(right));
}

function words({ outcome, rounded, margin, borderline }: Verdict): string {
  return `${outcome}, ${rounded}, margin ${margin}${borderline ? ', borderline' : ''}`;
}
