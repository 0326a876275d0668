import Decimal from 'decimal.js';
import { decimalDifference } from '../numerics/decimal-sum';
import { decimalsOf, formatDecimals, type RoundingMethod, roundTo } from '../numerics/round';
import type { Conditions } from '../record';
import type { ResolvedRule } from '../rule-sets/resolve';
import { roundingSentence } from '../rule-sets/sentences';
import { numberWords } from '../rule-sets/words';
import { type LimitCondition, satisfies } from './decide';
import type { ResolvedLimit } from './finding';
import { findRow, numberOfCell } from './look-up';
import { type Obstacle, undecided } from './obstacle';
import type { AllowedInterval, Judgeable } from './statistic';
import type { World } from './world';

export interface Rounder {
  method: RoundingMethod;
  to: number;
  decimals: number;
  /** False where the rule names no rounding and the absolute method applies by default. */
  stated: boolean;
}

export interface Judgement {
  outcome: 'pass' | 'fail' | 'undecided';
  rounded: number;
  text: string;
  /** Signed distance to the nearest limit; null where the value is censored. */
  margin: number | null;
  /** Null where there is no number to round. */
  roundingSentence: string | null;
}

/** How a rule rounds: its method and step for this mix. */
export function rounderOf(
  world: World,
  rule: ResolvedRule,
  limit: ResolvedLimit,
  at: Conditions,
): { ok: true; rounder: Rounder } | Obstacle {
  const { rounding } = rule;
  const method = rounding?.method ?? 'absolute';
  if (rounding === undefined || method === 'absolute') {
    return {
      ok: true,
      rounder: { method: 'absolute', to: 1, decimals: limit.decimals, stated: rounding !== undefined },
    };
  }
  const { to } = rounding;
  if (to === 'limit') {
    const step = Number(`1e-${limit.decimals}`);
    return { ok: true, rounder: { method, to: step, decimals: limit.decimals, stated: true } };
  }
  if (typeof to !== 'object') {
    return { ok: true, rounder: { method, to: Number(to), decimals: decimalsOf(to), stated: true } };
  }
  const row = findRow(world, to.table, at);
  if (!row.ok) return row;
  const cell = numberOfCell(row.found.row[to.column]);
  if (cell === null || cell === 'unusable' || cell.value <= 0) {
    return undecided(`${world.view.tableTitle(to.table)} gives no step to round to.`);
  }
  return { ok: true, rounder: { method, to: cell.value, decimals: decimalsOf(cell.written), stated: true } };
}

/** The value after the rule's own rounding, held against the limit. */
export function judge(judgeable: Judgeable, limit: ResolvedLimit, rounder: Rounder): Judgement {
  const { value, text, allowed, isWord = false } = judgeable;
  const rounded = roundTo({ value, ...rounder });
  const written = writeRounded(rounded, rounder);
  const sentence = isWord ? null : roundingSentence({ value, rounded, ...rounder });
  if (allowed !== null) {
    const outcome = outcomeOfInterval(allowed, limit, rounder);
    return { outcome, rounded, text: text ?? written, margin: null, roundingSentence: sentence };
  }
  const outcome = satisfies(conditionOf(limit), rounded) ? 'pass' : 'fail';
  const margin = isWord ? null : marginOf(rounded, limit);
  return { outcome, rounded, text: text ?? written, margin, roundingSentence: sentence };
}

/** Signed distance to the nearest limit, positive inside, in decimal arithmetic. */
export function marginOf(value: number, limit: Pick<ResolvedLimit, 'min' | 'max'>): number | null {
  const above = limit.min === null ? null : decimalDifference(value, limit.min);
  const below = limit.max === null ? null : decimalDifference(limit.max, value);
  if (above === null) return below;
  if (below === null) return above;
  return Math.min(above, below);
}

type Ends = Pick<ResolvedLimit, 'min' | 'max' | 'minExclusive' | 'maxExclusive'>;

/** The limit as a condition that the rules engine decides. */
function conditionOf(limit: Ends): LimitCondition {
  const key = `${limit.min} ${limit.minExclusive} ${limit.max} ${limit.maxExclusive}`;
  const kept = conditions.get(key);
  if (kept) return kept;
  const condition = newCondition(limit);
  if (conditions.size >= KEPT_CONDITIONS) conditions.clear();
  conditions.set(key, condition);
  return condition;
}

/** The rules engine reads a condition once; limits come again with every mix. */
const KEPT_CONDITIONS = 2000;
const conditions = new Map<string, LimitCondition>();

function newCondition(limit: Ends): LimitCondition {
  const all: LimitCondition['all'] = [];
  if (limit.min !== null) {
    all.push({ fact: 'judged', operator: limit.minExclusive ? 'moreThan' : 'atLeast', value: limit.min });
  }
  if (limit.max !== null) {
    all.push({ fact: 'judged', operator: limit.maxExclusive ? 'lessThan' : 'atMost', value: limit.max });
  }
  // Without any end nothing could fail: that is for the caller to have ruled out.
  if (all.length === 0) throw new Error('A limit without an end cannot be judged.');
  return { all };
}

/**
 * The outcome of every value in an interval, where it is the same for all. Limits allow one unbroken
 * stretch of values, so the two ends tell: both inside, or both outside on the same side.
 */
function outcomeOfInterval(
  allowed: AllowedInterval,
  limit: Ends,
  rounder: Rounder,
): 'pass' | 'fail' | 'undecided' {
  const low = sideOf(allowed.low, allowed.lowIncluded ? 0 : 1, limit, rounder);
  const high = sideOf(allowed.high, allowed.highIncluded ? 0 : -1, limit, rounder);
  if (low !== high) return 'undecided';
  return low === 'inside' ? 'pass' : 'fail';
}

function sideOf(
  end: number,
  inward: 1 | 0 | -1,
  limit: Ends,
  rounder: Rounder,
): 'below' | 'inside' | 'above' {
  if (end === -Infinity) return limit.min === null ? 'inside' : 'below';
  if (end === Infinity) return limit.max === null ? 'inside' : 'above';
  // Where the end itself is not among the values, the nearest one is a hair inside.
  const nearest = new Decimal(end)
    .plus(new Decimal(Math.max(1, Math.abs(end))).times(1e-12 * inward))
    .toNumber();
  const value = roundTo({ value: nearest, ...rounder });
  if (satisfies(conditionOf(limit), value)) return 'inside';
  const isLow = limit.min !== null && (limit.minExclusive ? value <= limit.min : value < limit.min);
  return isLow ? 'below' : 'above';
}

function writeRounded(rounded: number, rounder: Rounder): string {
  if (rounder.method !== 'absolute') return numberWords(formatDecimals(rounded, rounder.decimals));
  return numberWords(rounded, Math.max(rounder.decimals, Math.min(decimalsOf(rounded), 6)));
}
