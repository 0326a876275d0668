import { type Conditions, conditionsSchema } from '../record';
import { addressOf } from './cell-address';
import type { Cell } from './cell-grid';
import { type Locator, locate } from './locate-reference';
import { type ConditionName, isReference, type MappingRule } from './mapping';
import { understandDate } from './parse-date';
import { placeOf, type ReadingContext } from './reading-log';
import { averageOf } from './row-role';
import { certain, doubtOf } from './settled';
import type { HeaderMatch, SheetIndex } from './sheet-index';
import { keyWords, understandCondition } from './understand-condition';

/** One anchor of one rule, with everything that its values refer to already located. */
export interface RuleAtAnchor {
  rule: MappingRule;
  index: SheetIndex;
  anchor: HeaderMatch;
  locators: Map<string, Locator>;
}

export function bindRule(index: SheetIndex, rule: MappingRule, anchor: HeaderMatch): RuleAtAnchor {
  const locators = new Map<string, Locator>();
  const references = { ...rule.at, quantity: rule.quantity, unit: rule.unit };
  for (const [name, reference] of Object.entries(references)) {
    if (isReference(reference)) locators.set(name, locate(index, anchor.cell, rule.axis, reference));
  }
  return { rule, index, anchor, locators };
}

/** Marks the anchor and the headers that its values refer to as understood labels. */
export function markLabels({ index, anchor, locators }: RuleAtAnchor, context: ReadingContext): void {
  const cells = [anchor.cell, ...[...locators.values()].map((locator) => locator.header?.cell)];
  for (const cell of cells) {
    if (cell) context.log.use(placeOf(index.sheet, cell), 'label', 'A label.');
  }
}

export type RowKeys =
  | { state: 'known'; at: Conditions; method: string | null; testedOn: string | null }
  | { state: 'in doubt' | 'left out' };

/** The conditions of one value, from the mapping's literals and from the cells that it refers to. */
export function keysOf(bound: RuleAtAnchor, cell: Cell, context: ReadingContext): RowKeys {
  const { rule } = bound;
  const at: Record<string, string | number> = {};
  let state: 'known' | 'in doubt' | 'left out' = 'known';
  for (const [name, stated] of Object.entries(rule.at)) {
    if (!(name in conditionsSchema.shape)) continue;
    if (!isReference(stated)) {
      at[name] = stated;
      continue;
    }
    const key = readKey(bound, name as ConditionName, cell, context);
    if (key.state === 'value') at[name] = key.value;
    else if (key.state === 'left out') state = 'left out';
    else if (key.state === 'doubt' && state === 'known') state = 'in doubt';
  }
  if (state !== 'known') return { state };
  // What a value is tested under never decides what it is, so a doubtful date costs the date and not the value.
  return {
    state,
    at: conditionsSchema.parse(at),
    method: methodOf(bound, cell, context),
    testedOn: testedOnOf(bound, cell, context),
  };
}

function readKey(bound: RuleAtAnchor, name: ConditionName, cell: Cell, context: ReadingContext) {
  const { index, rule, locators } = bound;
  const locator = locators.get(name);
  const place = locator?.placeFor(cell) ?? null;
  if (!locator || place === null) return { state: 'blank' } as const;
  const keyCell = locator.cellFor(cell);
  // A merged value stands for several specimens, so it is no specimen's own.
  if (name === 'specimen' && index.spanOf(cell).rows > 1 && rule.axis === 'down')
    return { state: 'blank' } as const;
  const about = typeof rule.quantity === 'string' ? { quantity: rule.quantity } : {};
  const understood =
    averageKey(bound, locator, name, cell) ??
    understandCondition(name, keyCell, locator.header?.unit ?? null, rule.decimal ?? '.');
  if (understood.state === 'blank') {
    if (!locator.required) return { state: 'blank' } as const;
    const empty = {
      sheet: index.sheet.name,
      cell: addressOf(place.row, place.column),
      text: keyCell?.text ?? '',
    };
    const above = keyAbove(bound, locator, name, cell);
    const offered =
      above === null ? [] : [{ answer: `as above: ${above}`, label: `${above}, as above it`, value: above }];
    const reason = `is empty, so it is not known which ${keyWords[name].replace(/^an? /, '')} its row belongs to`;
    return context.log.settle(empty, doubtOf(reason, offered), about, () => ({}));
  }
  const keyPlace = placeOf(index.sheet, keyCell as Cell);
  const settled = context.log.settle(keyPlace, understood, about, () => ({}));
  if (settled.state === 'value') context.log.use(keyPlace, 'read', `Key: ${keyWords[name]}.`);
  return settled;
}

/** "Mean A" is trial A, and "Mean" the trial of the rows above it. */
function averageKey(bound: RuleAtAnchor, locator: Locator, name: ConditionName, cell: Cell) {
  const named = averageOf(locator.cellFor(cell)?.text ?? '');
  if (named === null) return null;
  const trial = named === '' ? keyAbove(bound, locator, name, cell) : named;
  return trial === null || name === 'specimen' ? null : certain(trial);
}

/** The nearest key above an empty one in its own column of keys. */
function keyAbove(
  bound: RuleAtAnchor,
  locator: Locator,
  name: ConditionName,
  cell: Cell,
): string | number | null {
  for (let row = cell.row - 1; row > bound.anchor.cell.row; row -= 1) {
    const keyCell = locator.cellFor({ row, column: cell.column });
    const above = understandCondition(name, keyCell, null, '.');
    if (averageOf(keyCell?.text ?? '') === null && above.state === 'value') return above.value;
  }
  return null;
}

function methodOf(bound: RuleAtAnchor, cell: Cell, context: ReadingContext): string | null {
  const stated = bound.rule.at.method;
  if (stated === undefined) return null;
  if (!isReference(stated)) return String(stated);
  const methodCell = bound.locators.get('method')?.cellFor(cell);
  if (!methodCell || methodCell.text.trim() === '') return null;
  context.log.use(placeOf(bound.index.sheet, methodCell), 'read', `Test method ${methodCell.text.trim()}.`);
  return methodCell.text.trim();
}

function testedOnOf(bound: RuleAtAnchor, cell: Cell, context: ReadingContext): string | null {
  const dateCell = bound.locators.get('testedOn')?.cellFor(cell) ?? null;
  if (!dateCell) return null;
  const place = placeOf(bound.index.sheet, dateCell);
  const settled = context.log.settle(place, understandDate(dateCell, context.grid.date1904), {}, () => ({}));
  if (settled.state === 'value') context.log.use(place, 'read', `Tested on ${settled.value}.`);
  return settled.state === 'value' ? settled.value : null;
}

/** The cells in words that say whose a row is. */
export function keyCells(bound: RuleAtAnchor, cell: Cell): Cell[] {
  return ['specimen', 'trial', 'stockpile', 'sieve'].flatMap((name) => {
    const key = bound.locators.get(name)?.cellFor(cell);
    return key?.kind === 'text' ? [key] : [];
  });
}
