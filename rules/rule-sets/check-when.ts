import type { AttributeDefinition } from './attribute';
import type { ReportFault } from './check-rule';
import type { EditionView } from './edition-view';
import { matchValue } from './match-value';
import { type Comparison, type Condition, comparisonsOf } from './when';

/** Facts that are not known, and values that a fact can never have. */
export function checkWhen(condition: Condition, at: string, view: EditionView, report: ReportFault): void {
  for (const { comparison, path } of comparisonsOf(condition)) {
    const place = `${at}${path.map((step) => `/${step}`).join('')}`;
    if (comparison.fact === 'quantity') {
      const id = comparison.params?.quantity ?? '';
      if (!view.quantity(id)) {
        report(`${place}/params/quantity`, `the quantity ${id} is not known.`, 'Use an id of the registry.');
      }
      checkNumbers(comparison, place, id, report);
      continue;
    }
    const attribute = view.attribute(comparison.fact);
    if (!attribute) {
      report(
        `${place}/fact`,
        `the attribute ${comparison.fact} is not known.`,
        'Declare it among the attributes, or correct its name.',
      );
      continue;
    }
    checkAttributeValue(comparison, place, attribute, report);
  }
}

const ORDERING = new Set(['lessThan', 'lessThanInclusive', 'greaterThan', 'greaterThanInclusive']);

function checkAttributeValue(
  comparison: Comparison,
  place: string,
  attribute: AttributeDefinition,
  report: ReportFault,
): void {
  if (ORDERING.has(comparison.operator)) {
    if (attribute.type === 'number') checkNumbers(comparison, place, attribute.name, report);
    else if (attribute.type !== 'date') {
      report(
        `${place}/operator`,
        `${attribute.name} is not a number or a date, so it has no order.`,
        'Use equal, notEqual, in or notIn.',
      );
    }
    return;
  }
  for (const value of [comparison.value].flat()) {
    if (matchValue(attribute, value) !== null) continue;
    const allowed = attribute.values
      ?.map((each) => (typeof each === 'object' ? each.value : each))
      .join(', ');
    report(
      `${place}/value`,
      `compares ${attribute.name} with ${JSON.stringify(value)}, which it can never be.`,
      allowed ? `Choose from ${allowed}.` : `Give a value of the type ${attribute.type}.`,
    );
  }
}

function checkNumbers(comparison: Comparison, place: string, name: string, report: ReportFault): void {
  if ([comparison.value].flat().every((value) => typeof value === 'number')) return;
  report(`${place}/value`, `compares ${name} with something that is not a number.`, 'Give a number.');
}
