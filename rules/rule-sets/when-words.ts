import type { EditionView } from './edition-view';
import type { Comparison, Condition } from './when';
import { andList, numberWords, orList, quantityPhrase, uncapitalised, withUnit } from './words';

/** "Applies where course is surface and design traffic is at least 3 million ESAL." */
export function conditionSentence(condition: Condition | undefined, view: EditionView): string {
  if (condition === undefined) return 'Always applies.';
  return `Applies where ${conditionClause(condition, view)}.`;
}

/** The condition without a verb of its own, for use inside a sentence. */
export function conditionClause(condition: Condition, view: EditionView, nested = false): string {
  if ('all' in condition) return grouped(condition.all, 'and', view, nested);
  if ('any' in condition) return grouped(condition.any, 'or', view, nested);
  if ('not' in condition) return `it is not so that ${conditionClause(condition.not, view, true)}`;
  return comparisonClause(condition, view);
}

function grouped(conditions: Condition[], word: 'and' | 'or', view: EditionView, nested: boolean): string {
  const clauses = conditions.map((each) => conditionClause(each, view, conditions.length > 1));
  const text = word === 'and' ? andList(clauses) : orList(clauses);
  if (!nested || conditions.length === 1) return text;
  return word === 'or' ? `either ${text}` : `both ${text}`;
}

function comparisonClause(comparison: Comparison, view: EditionView): string {
  const values = [comparison.value].flat().map((value) => valueWords(comparison, value, view));
  return `${factLabel(comparison, view)} ${factVerb(comparison, view)} ${operatorWords(comparison.operator, values)}`;
}

/** "design traffic" */
export function factLabel(comparison: Comparison, view: EditionView): string {
  if (comparison.fact !== 'quantity') return uncapitalised(view.attributeLabel(comparison.fact));
  const { quantity: id = '', at = {} } = comparison.params ?? {};
  const quantity = view.quantity(id);
  return quantity ? quantityPhrase(quantity, at) : id;
}

function factVerb(comparison: Comparison, view: EditionView): string {
  const isPlural = comparison.fact === 'quantity' && view.quantity(comparison.params?.quantity ?? '')?.plural;
  return isPlural ? 'are' : 'is';
}

function valueWords(comparison: Comparison, value: string | number | boolean, view: EditionView): string {
  if (typeof value === 'boolean') return value ? 'so' : 'not so';
  if (typeof value === 'string') return allowedLabel(comparison.fact, value, view);
  const unit =
    comparison.fact === 'quantity'
      ? view.quantity(comparison.params?.quantity ?? '')?.unit
      : view.attribute(comparison.fact)?.unit;
  return withUnit(numberWords(value), unit ?? '');
}

/** A closed value under its own label where the edition gives one. */
export function allowedLabel(attributeName: string, value: string, view: EditionView): string {
  const entry = view
    .attribute(attributeName)
    ?.values?.find((each) => typeof each === 'object' && each.value === value);
  return typeof entry === 'object' && entry.label !== undefined ? entry.label : value;
}

function operatorWords(operator: Comparison['operator'], values: string[]): string {
  const first = values[0] ?? '';
  switch (operator) {
    case 'equal':
      return first;
    case 'notEqual':
      return `not ${first}`;
    case 'in':
      return orList(values);
    case 'notIn':
      return `neither ${values.join(' nor ')}`;
    case 'lessThan':
      return `less than ${first}`;
    case 'lessThanInclusive':
      return `at most ${first}`;
    case 'greaterThan':
      return `more than ${first}`;
    case 'greaterThanInclusive':
      return `at least ${first}`;
  }
}
