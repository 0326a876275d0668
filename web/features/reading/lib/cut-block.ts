import type { Cell } from '#rules/reading/cell-grid';
import type { ConditionName } from '#rules/reading/mapping';
import type { Conditions } from '#rules/record';
import { addressOf, type CellPlace, type CellRange, parseAddress } from './cell-address';
import { conditionOfCell } from './condition-value';
import { conditionLabels } from './condition-words';
import { type ConditionsSaid, namesTold } from './conditions-said';

export type CellAt = (place: CellPlace) => Cell | undefined;

interface Part {
  range: CellRange;
  at: Conditions;
}

type Parts = { ok: true; parts: Part[] } | { ok: false; fault: string };

/** Rows (or columns) that follow each other and carry the same name stay one part. */
export function cutBlock(conditions: ConditionsSaid, block: CellRange, cellAt: CellAt): Parts {
  const byRow = cutAlong('row', conditions, block, cellAt);
  if (!byRow.ok) return byRow;
  const parts: Part[] = [];
  for (const row of byRow.parts) {
    const byColumn = cutAlong('column', conditions, row.range, cellAt);
    if (!byColumn.ok) return byColumn;
    for (const part of byColumn.parts) parts.push({ range: part.range, at: { ...row.at, ...part.at } });
  }
  return { ok: true, parts };
}

function cutAlong(
  along: 'row' | 'column',
  conditions: ConditionsSaid,
  block: CellRange,
  cellAt: CellAt,
): Parts {
  const names = namesTold(conditions, along);
  if (names.length === 0) return { ok: true, parts: [{ range: block, at: {} }] };
  const parts: Part[] = [];
  for (let index = block.from[along]; index <= block.to[along]; index++) {
    const at = conditionsAt(names, conditions, { along, index, cellAt });
    if (!at.ok) return at;
    const last = parts.at(-1);
    if (last && JSON.stringify(last.at) === JSON.stringify(at.at))
      last.range = upTo(last.range, along, index);
    else
      parts.push({
        range: upTo({ ...block, from: { ...block.from, [along]: index } }, along, index),
        at: at.at,
      });
  }
  return { ok: true, parts };
}

function conditionsAt(
  names: readonly ConditionName[],
  conditions: ConditionsSaid,
  { along, index, cellAt }: { along: 'row' | 'column'; index: number; cellAt: CellAt },
): { ok: true; at: Conditions } | { ok: false; fault: string } {
  let at: Conditions = {};
  for (const name of names) {
    const place = placeOfName(along, index, conditions[name]?.text ?? '');
    const ask = along === 'row' ? 'Enter the letter of its column.' : 'Enter the number of its row.';
    if (place === null) return { ok: false, fault: `${conditionLabels[name]}: ${ask}` };
    const cell = cellAt(place);
    const address = addressOf(place);
    if (cell === undefined) return { ok: false, fault: `${conditionLabels[name]}: ${address} is empty.` };
    const value = conditionOfCell(name, cell);
    if (!value.ok) return { ok: false, fault: `${conditionLabels[name]}: ${address} ${value.fault}` };
    at = { ...at, ...value.at };
  }
  return { ok: true, at };
}

/** Column `A` names rows, row `4` names columns. */
function placeOfName(along: 'row' | 'column', index: number, text: string): CellPlace | null {
  if (along === 'row') {
    const column = parseAddress(`${text.trim()}1`)?.column;
    return column === undefined ? null : { row: index, column };
  }
  const row = /^[1-9]\d{0,6}$/.test(text.trim()) ? Number(text.trim()) : null;
  return row === null ? null : { row, column: index };
}

function upTo(range: CellRange, along: 'row' | 'column', index: number): CellRange {
  return { from: range.from, to: { ...range.to, [along]: index } };
}
