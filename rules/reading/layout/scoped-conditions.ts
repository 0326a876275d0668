import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { placeOf } from '../reading-log';
import type { LabelMeaning } from './label-meaning';
import { keyConditions } from './name-conditions';
import type { TableRow } from './table';
import { type TableContext, unitBeside } from './table-context';

/** In a list of properties a condition belongs to the test that it stands with. */
export function keepScoped(
  row: TableRow,
  { key, meaning, cell }: { key: ConditionName; meaning: LabelMeaning; cell: Cell },
  context: TableContext,
): void {
  const { labels, decimal, table, columns, kinds, reading, index } = context;
  const understood = keyConditions(key, cell, {
    labels,
    unit: meaning.unit ?? unitBeside(row, context),
    decimal,
  });
  if (understood.state !== 'value') return;
  reading.log.use(placeOf(index.sheet, cell), 'read', `Key: ${key}.`);
  const outermost = [...columns.values()].find(({ kind }) => kind === 'label')?.column;
  const outer = table.rows
    .filter((each) => each.row <= row.row)
    .flatMap(({ cells }) => cells.filter((each) => each.column === outermost && kinds.of(each) === 'text'))
    .at(-1);
  const label = row.cells.find((each) => kinds.of(each) === 'text');
  context.scoped.push({ outer: outer && outer !== label ? outer.text : null, at: understood.value });
}

/** The families of tests that a list of properties holds: a condition without an owner fits one family only. */
function familiesIn({ table, kinds, labels }: TableContext): Set<string> {
  const families = new Set<string>();
  for (const { cells } of table.rows) {
    for (const cell of cells) {
      if (kinds.of(cell) !== 'text') continue;
      for (const id of labels.read(cell.text).quantities) {
        const family = familyOf(id);
        if (family) families.add(family);
      }
    }
  }
  return families;
}

function familyOf(id: string): string | null {
  if (/rut|stripping|passes-to|wheel/.test(id)) return 'rutting';
  if (/cracking|flexibility|fracture|post-peak|overlay|fatigue/.test(id)) return 'cracking';
  if (/^creep-(?:comp|strain)|deformation$/.test(id)) return 'creep';
  if (/modulus|phase-angle/.test(id)) return 'modulus';
  return /flow-number|viscosity|penetration|ductility|draindown/.test(id) ? id : null;
}

export function scopedConditions(labels: LabelMeaning[], context: TableContext): Conditions {
  const found: Conditions = {};
  const outer = labels.length > 1 ? labels[0]?.text : null;
  for (const each of context.scoped) {
    const belongs = each.outer === null ? familiesIn(context).size <= 1 : each.outer === outer;
    if (belongs) Object.assign(found, each.at);
  }
  return found;
}
