import type { Cell } from '../cell-grid';
import type { Candidate } from './candidate';
import type { LabelMeaning } from './label-meaning';
import type { TableContext } from './table-context';

export function bareCandidate(
  context: Pick<TableContext, 'index' | 'far' | 'tableSubset' | 'tableDomains' | 'number'>,
  cell: Cell,
): Candidate {
  return {
    index: context.index,
    cell,
    quantities: [],
    at: {},
    far: context.far,
    unit: null,
    unknownUnit: null,
    method: null,
    testedOn: null,
    isAverage: false,
    isHeaded: false,
    specimenOfRow: false,
    subset: context.tableSubset,
    onAggregate: false,
    onMix: false,
    domains: context.tableDomains,
    table: context.number,
    heading: '',
    written: null,
    misspelt: null,
  };
}

/** "Trial 2 (5.0 %)" states that trial's binder content. */
export function readHeadBinders(context: TableContext): void {
  const seen = new Set<Cell>();
  for (const { binder, at, column } of context.columns.values()) {
    if (!binder || seen.has(binder.cell)) continue;
    seen.add(binder.cell);
    const trial = at.trial ?? binder.text;
    context.candidates.push({
      ...bareCandidate(context, binder.cell),
      quantities: ['binder-content'],
      at: { trial, ...(at.laboratory ? { laboratory: at.laboratory } : {}) },
      unit: '%',
      heading: `head of column ${column}`,
      written: binder.text,
    });
  }
}

/** "Trial 1 – 4.5 % asphalt" over a table. */
export function readTitleBinder(title: LabelMeaning, cell: Cell, context: TableContext): void {
  const { trial } = title.at;
  if (title.binder === null || trial === undefined || title.unknown.length > 1) return;
  context.candidates.push({
    ...bareCandidate(context, cell),
    quantities: ['binder-content'],
    at: { trial },
    unit: '%',
    heading: title.text,
    written: title.binder,
  });
}
