import type { Conditions, Doubt, Reading } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aReading, replicates } from '#tests/builders/a-reading';
import { aRule } from '#tests/builders/a-rule-set';

/** A rule of its own clause, not rounded unless it says so. */
export function rule(id: string, parts: Partial<RuleInput>): RuleInput {
  const { rounding: _rounding, ...plain } = aRule({ id, title: id.replaceAll('-', ' '), ...parts });
  return parts.rounding ? { ...plain, rounding: parts.rounding } : plain;
}

export function reading(quantity: string, value: number, at: Conditions = {}): Reading {
  return aReading({ quantity, value, at: { trial: 'design', ...at } });
}

export function specimens(quantity: string, values: number[], at: Conditions = {}): Reading[] {
  return replicates(quantity, values, { at: { trial: 'design', ...at } });
}

/** A cell about a quantity that could not be read. */
export function doubtAbout(quantity: string, at: Conditions = {}): Doubt {
  return {
    sheet: 'Trials',
    cell: 'C9',
    text: '?',
    reason: 'the cell holds no number',
    alternatives: [],
    about: { quantity, at: { trial: 'design', ...at } },
  };
}

export const toLimit = { method: 'rounding', to: 'limit' } as const;
