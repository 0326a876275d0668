import { quantityById } from '../quantities/registry';
import { checkCases } from './check-cases';
import { checkRule } from './check-rule';
import { checkTable } from './check-table';
import { type EditionContents, viewOf } from './edition-view';
import type { DocumentProblem } from './problem';

/** What a schema cannot see: references that lead nowhere, names given twice, limits that contradict. */
export function checkEdition(edition: EditionContents): DocumentProblem[] {
  const view = viewOf(edition);
  return [
    ...duplicates(edition),
    ...edition.quantities.flatMap((quantity, i) =>
      quantityById(quantity.id) === undefined
        ? []
        : [
            {
              pointer: `/quantities/${i}/id`,
              detail: `Quantity ${quantity.id}: the registry already has this quantity.`,
              fix: 'Remove it here, or give it an id of its own.',
            },
          ],
    ),
    ...edition.tables.flatMap((table, i) => checkTable(table, `/tables/${i}`, view)),
    ...edition.rules.flatMap((rule, i) => checkRule(rule, `/rules/${i}`, view)),
    ...edition.roomToMove.flatMap((id, i) =>
      view.rule(id)
        ? []
        : [
            {
              pointer: `/roomToMove/${i}`,
              detail: `roomToMove names the rule ${id}, which this edition does not have.`,
              fix: 'Name a rule of this edition, or remove the entry.',
            },
          ],
    ),
    ...Object.keys(edition.reportedTolerance).flatMap((id) =>
      view.quantity(id)
        ? []
        : [
            {
              pointer: `/reportedTolerance/${id}`,
              detail: `reportedTolerance names the quantity ${id}, which is not known.`,
              fix: 'Use an id of the registry.',
            },
          ],
    ),
    ...checkCases(edition.cases, view),
  ];
}

/** Ids given twice among rules, tables, attributes, quantities, documents and cases. */
export function duplicates(
  edition: Omit<EditionContents, 'roomToMove' | 'reportedTolerance'>,
): DocumentProblem[] {
  return [
    ...repeated('rules', 'rule', edition.rules, (each) => each.id),
    ...repeated('tables', 'table', edition.tables, (each) => each.id),
    ...repeated('attributes', 'attribute', edition.attributes, (each) => each.name),
    ...repeated('quantities', 'quantity', edition.quantities, (each) => each.id),
    ...repeated('documents', 'document type', edition.documents, (each) => each.type),
    ...repeated('cases', 'case', edition.cases, (each) => each.id),
  ];
}

function repeated<T>(list: string, word: string, entries: T[], key: (entry: T) => string): DocumentProblem[] {
  const seen = new Set<string>();
  return entries.flatMap((entry, i) => {
    const id = key(entry);
    if (!seen.has(id)) {
      seen.add(id);
      return [];
    }
    return [
      {
        pointer: `/${list}/${i}`,
        detail: `The ${word} ${id} is given more than once.`,
        fix: `Give each ${word} a name of its own, or remove one.`,
      },
    ];
  });
}
