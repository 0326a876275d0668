import { sourceWords } from '#rules/engine/make-finding';
import { type EditionView, viewOf } from '#rules/rule-sets/edition-view';
import type { ResolvedEdition, ResolvedRule, ResolvedTable } from '#rules/rule-sets/resolve';
import type { Rule } from '#rules/rule-sets/schema';
import { cellWords, conditionClause, roundingClause, ruleSentence } from '#rules/rule-sets/sentences';
import { tablesOf } from '#rules/rule-sets/tables-of';
import { capitalised, numberWords, withUnit } from '#rules/rule-sets/words';
import type { RuleSetView, RuleView, TableView } from '#shared/contracts/rule-sets';

type Contents = Pick<RuleSetView, 'ruleViews' | 'removed' | 'tables' | 'quantities'>;

/** Every rule of a resolved edition as a sentence, with its tables and what layers displaced. */
export function ruleSetContents(edition: ResolvedEdition, base: ResolvedEdition): Contents {
  const ruleViews = edition.rules.map((rule) => ruleView(rule, edition));
  return {
    ruleViews,
    removed: edition.removed
      .filter(({ kind }) => kind === 'rule')
      .map(({ id, document }) => {
        const gone = base.rules.find((rule) => rule.id === id);
        return { id, clause: gone?.clause ?? '', title: gone?.title ?? id, document };
      }),
    tables: edition.tables.map((table) => ({
      ...tableView(table, edition),
      usedBy: ruleViews.filter((rule) => rule.tables.includes(table.id)).map(({ id }) => id),
    })),
    quantities: edition.quantities,
  };
}

function ruleView(rule: ResolvedRule, edition: ResolvedEdition): RuleView {
  const view = viewOf(edition);
  const { measure, supplied } = rule;
  return {
    id: rule.id,
    clause: rule.clause,
    title: rule.title,
    severity: rule.severity,
    sentence: ruleSentence(rule, view),
    condition: rule.when === undefined ? null : `where ${conditionClause(rule.when, view)}`,
    rounding: roundingClause(rule, view) || 'nothing to round',
    precision: precisionWords(rule, view),
    quantity: quantityOf(rule, view, edition),
    minimumCount: measure.kind === 'reading' ? (measure.minimumCount ?? null) : null,
    advice: rule.advice ?? null,
    source: sourceWords(rule.source ?? null) ?? supplied.document,
    sourceOrigin: rule.source?.origin ?? 'agency',
    document: supplied.document,
    displaced: supplied.displaced,
    tables: [...tablesOf(rule)],
    encodedBy: rule.encodedBy ?? null,
    verifiedBy: rule.verifiedBy ?? null,
  };
}

function quantityOf({ measure }: Rule, view: EditionView, edition: ResolvedEdition): RuleView['quantity'] {
  const id = measuredId(measure);
  const quantity = id === null ? undefined : view.quantity(id);
  if (quantity === undefined) return null;
  return {
    id: quantity.id,
    label: quantity.label,
    own: edition.quantities.some((each) => each.id === quantity.id),
  };
}

function measuredId(measure: Rule['measure']): string | null {
  switch (measure.kind) {
    case 'reading':
    case 'difference':
      return measure.quantity;
    case 'gradation':
      return 'percent-passing';
    case 'creep-compliance':
      return 'creep-compliance';
    case 'formula':
    case 'attribute':
    case 'document':
      return null;
  }
}

function precisionWords({ precision, measure }: Rule, view: EditionView): string | null {
  if (precision === undefined) return null;
  const unit = measure.kind === 'reading' ? (view.quantity(measure.quantity)?.unit ?? '') : '';
  const source = precision.source == null ? '' : `, ${precision.source}`;
  return `± ${withUnit(numberWords(precision.value), unit)}${source}`;
}

function tableView(table: ResolvedTable, edition: ResolvedEdition): Omit<TableView, 'usedBy'> {
  const view = viewOf(edition);
  const columns = [
    ...table.keys.map((name) => ({
      name,
      label: name === 'sieve' ? 'Sieve' : view.attributeLabel(name),
      unit: name === 'sieve' ? 'mm' : (view.attribute(name)?.unit ?? null),
      key: true,
    })),
    ...table.columns.map(({ name, unit }) => ({
      name,
      label: columnLabels[name] ?? capitalised(wordsOf(name)),
      unit: unit ?? null,
      key: false,
    })),
  ];
  return {
    id: table.id,
    title: table.title ?? table.id,
    columns,
    rows: table.rows.map((row, index) => {
      const supplied = table.rowsSupplied[index] ?? table.supplied;
      const last = supplied.displaced.at(-1);
      return {
        // Units stand in the column heads.
        cells: columns.map(({ name }) => cellWords(row[name], undefined)),
        document: supplied.document,
        displaced: last === undefined ? null : `${last.document}: ${last.text}`,
      };
    }),
  };
}

const columnLabels: Record<string, string> = { min: 'At least', max: 'At most' };

/** `mixingMin` as "mixing min". */
function wordsOf(name: string): string {
  return name.replace(
    /([a-z])([A-Z])/g,
    (_, before: string, after: string) => `${before} ${after.toLowerCase()}`,
  );
}
