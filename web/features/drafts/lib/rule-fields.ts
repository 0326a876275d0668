import { createContext, useContext } from 'react';
import { conditionsSchema } from '#rules/record';
import type { EditionView } from '#rules/rule-sets/edition-view';

/** An object of a rule that may be unfinished. */
export type RuleField = Record<string, unknown>;

interface RuleFormState {
  view: EditionView;
  isDisabled: boolean;
}

export const RuleFormContext = createContext<RuleFormState | null>(null);

export function useRuleForm(): RuleFormState {
  const state = useContext(RuleFormContext);
  if (state === null) throw new Error('A field of a rule stands outside its form.');
  return state;
}

/** What may be an object of a rule, as one: without fields where it is none. */
export function fieldsIn(value: unknown): RuleField {
  return typeof value === 'object' && value !== null ? (value as RuleField) : {};
}

/** The object with one field put, or taken out where there is no value. */
export function withField(value: RuleField, field: string, next: unknown): RuleField {
  const { [field]: _, ...rest } = value;
  return next === undefined || next === '' ? rest : { ...value, [field]: next };
}

/** Conditions that a rule may name, with how they are typed. */
export const conditionNames = Object.keys(conditionsSchema.shape);

const numeric = new Set(['sieve', 'temperature', 'time', 'stress', 'passes', 'frequency', 'gyrations']);

/** A condition from its text: a number where the condition is one. */
export function conditionValue(name: string, text: string): string | number {
  const value = Number(text);
  return numeric.has(name) && text.trim() !== '' && Number.isFinite(value) ? value : text;
}
