import type { Conditions } from '../record';
import type { ResolvedRule } from '../rule-sets/resolve';
import { requirementSentence, resultSentence, ruleSentence } from '../rule-sets/sentences';
import type { RuleSource } from '../rule-sets/table';
import {
  type Evidence,
  type Finding,
  findingKey,
  type Observed,
  type Outcome,
  type ResolvedLimit,
} from './finding';
import { RULE_WORDS } from './obstacle';
import type { UsedPrecision } from './precision';
import type { World } from './world';

export interface FindingParts {
  subject: string;
  /** Conditions of the subject, for the sentences. */
  at: Conditions;
  outcome: Outcome;
  reason: string;
  /** What would decide it, where it is undecided. */
  wouldDecide?: string | undefined;
  observed?: Observed | null;
  limit?: ResolvedLimit | null;
  margin?: number | null;
  borderline?: boolean;
  roundingSentence?: string | null;
  precision?: UsedPrecision | null;
  evidence?: Evidence[];
  /** Quantity whose gauge is drawn. */
  quantity?: string;
  /** The date that a document's age is counted to. */
  date?: string | null;
}

/** A finding of one rule on one subject, with its sentences. */
export function makeFinding(world: World, rule: ResolvedRule, parts: FindingParts): Finding {
  const { view } = world;
  const { subject, at } = parts;
  const doubt = world.unsettled.get(findingKey({ rule: rule.id, subject }));
  const outcome = doubt === undefined ? parts.outcome : 'undecided';
  const reason = doubt?.reason ?? parts.reason;
  const wouldDecide = doubt === undefined ? parts.wouldDecide : doubt.wouldDecide;
  const observed = parts.observed ?? null;
  const limit = parts.limit ?? null;
  const date = parts.date ?? null;
  const fixed = fixedWords(world, rule);
  const isJudged = outcome === 'pass' || outcome === 'fail';
  return {
    rule: rule.id,
    clause: rule.clause,
    title: rule.title,
    subject,
    severity: rule.severity,
    outcome,
    borderline: isJudged && (parts.borderline ?? false),
    kind: rule.measure.kind,
    observed,
    limit,
    margin: isJudged ? (parts.margin ?? null) : null,
    ruleSentence: fixed.sentence,
    requirement: requirementSentence({ rule, view, at, limit, date }),
    sentence: resultSentence({ rule, view, at, limit, outcome, observed, date }),
    reason,
    wouldDecide: outcome === 'undecided' ? (wouldDecide ?? RULE_WORDS) : null,
    roundingSentence: parts.roundingSentence ?? null,
    precision: parts.precision ? { value: parts.precision.value, origin: parts.precision.origin } : null,
    advice: rule.advice ?? null,
    source: fixed.source,
    gauge: gaugeOf(world, parts.quantity, limit),
    evidence: [...new Set(parts.evidence ?? [])],
  };
}

/** What a rule says whatever the mix is: put into words once a rule. */
function fixedWords(world: World, rule: ResolvedRule): { sentence: string; source: string | null } {
  const kept = wordsOfRules.get(rule);
  if (kept) return kept;
  const words = { sentence: ruleSentence(rule, world.view), source: sourceWords(rule.source ?? null) };
  wordsOfRules.set(rule, words);
  return words;
}

const wordsOfRules = new WeakMap<ResolvedRule, { sentence: string; source: string | null }>();

/** "AASHTO M 323, Superpave Volumetric Mix Design, 2022, section 7; from memory, verify" */
export function sourceWords(source: RuleSource | null): string | null {
  if (source === null) return null;
  const section = source.section ? `section ${source.section}` : null;
  const parts = [source.number, source.title, source.edition, section].filter((part) => part);
  const text = parts.join(', ');
  if (source.origin !== 'memory' || text.includes('from memory')) return text === '' ? null : text;
  return text === '' ? 'From memory, verify' : `${text}; from memory, verify`;
}

function gaugeOf(world: World, id: string | undefined, limit: ResolvedLimit | null): Finding['gauge'] {
  const quantity = id === undefined ? undefined : world.view.quantity(id);
  if (!quantity || limit === null || (limit.min === null && limit.max === null)) return null;
  return { span: quantity.gaugeSpan, scale: quantity.gaugeScale };
}
