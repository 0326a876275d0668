import type { EditionView } from './edition-view';
import type { DocumentProblem } from './problem';
import type { RuleSetCase } from './schema';

/** Cases must name rules, attributes and quantities that exist. */
export function checkCases(cases: RuleSetCase[], view: EditionView): DocumentProblem[] {
  return cases.flatMap((each, i) => [
    ...each.expected.flatMap((expected, j) =>
      view.rule(expected.rule)
        ? []
        : [
            {
              pointer: `/cases/${i}/expected/${j}/rule`,
              detail: `Case ${each.id} expects a finding of the rule ${expected.rule}, which this edition does not have.`,
              fix: 'Name a rule of this edition, or remove the expectation.',
            },
          ],
    ),
    ...Object.keys(each.record.attributes).flatMap((name) =>
      view.attribute(name)
        ? []
        : [
            {
              pointer: `/cases/${i}/record/attributes/${name}`,
              detail: `Case ${each.id} states the attribute ${name}, which is not known.`,
              fix: 'Declare the attribute, or correct its name.',
            },
          ],
    ),
    ...each.record.readings.flatMap((reading, j) =>
      view.quantity(reading.quantity)
        ? []
        : [
            {
              pointer: `/cases/${i}/record/readings/${j}/quantity`,
              detail: `Case ${each.id} has a reading of the quantity ${reading.quantity}, which is not known.`,
              fix: 'Use an id of the registry, or declare the quantity.',
            },
          ],
    ),
  ]);
}
