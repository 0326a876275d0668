import type { Cell } from '#rules/reading/cell-grid';
import type { ConditionName } from '#rules/reading/mapping';
import { understandCondition } from '#rules/reading/understand-condition';
import type { Conditions } from '#rules/record';

export type ConditionValue = { ok: true; at: Conditions } | { ok: false; fault: string };

/** What was typed, understood as a cell with the same text would be. */
export function conditionTyped(name: ConditionName, text: string): ConditionValue {
  return conditionOfCell(name, { ...blankCell, value: text.trim(), text: text.trim() });
}

export function conditionOfCell(name: ConditionName, cell: Cell): ConditionValue {
  const understood = understandCondition(name, cell, null, '.');
  if (understood.state === 'value') return { ok: true, at: { [name]: understood.value } };
  if (understood.state === 'doubt') return { ok: false, fault: `“${cell.text}” ${understood.reason}.` };
  return { ok: false, fault: 'Enter the value.' };
}

const blankCell: Cell = {
  address: 'A1',
  row: 1,
  column: 1,
  kind: 'text',
  value: '',
  text: '',
  format: null,
  formula: null,
  cached: false,
  comment: null,
  bold: false,
};
