import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import { understandDate } from '../parse-date';
import { plainText } from '../plain-text';
import { placeOf } from '../reading-log';
import { unreadReasons } from '../unread-reason';
import type { Role } from '../words/key-words';
import { isHeading, type LabelMeaning } from './label-meaning';
import { isMaterial } from './materials';
import { keyConditions } from './name-conditions';
import type { SheetContext } from './sheet-context';
import type { TableRow } from './table';
import type { TableColumn } from './table-column';

/** What the keys and labels of one row say of the values in it. */
export interface RowFacts {
  at: Conditions;
  role: Role | null;
  method: string | null;
  testedOn: string | null;
  unit: string | null;
  inDoubt: boolean;
  /** Where the row's key column names a quantity instead of a key. */
  label: LabelMeaning | null;
  subset: 'dry' | 'conditioned' | null;
}

/** Reads the keys of a table row by row; a key that is left blank under a filled one stands for the same. */
export class RowKeys {
  private readonly last = new Map<number, Conditions>();

  constructor(
    private readonly columns: Map<number, TableColumn>,
    private readonly context: SheetContext,
  ) {}

  read(row: TableRow): RowFacts {
    const facts: RowFacts = {
      at: {},
      role: null,
      method: null,
      testedOn: null,
      unit: null,
      inDoubt: false,
      label: null,
      subset: null,
    };
    const doubts: Cell[] = [];
    for (const column of this.columns.values()) {
      if (column.kind === 'key') this.readKey(row, column, facts, doubts);
    }
    for (const cell of row.cells) this.readAside(cell, facts);
    return facts;
  }

  private readKey(row: TableRow, column: TableColumn, facts: RowFacts, _doubts: Cell[]): void {
    const { index, labels, kinds, decimal, reading } = this.context;
    const { key } = column;
    if (key === null) return;
    const cell = index.cellAt(row.row, column.column);
    if (!cell || kinds.of(cell) === 'none') {
      const before = this.last.get(column.column);
      if (before && fillsDown.has(key)) {
        facts.at = { ...before, ...facts.at };
        if (before.variant === 'dry' || before.variant === 'conditioned') facts.subset = before.variant;
      }
      return;
    }
    const place = placeOf(index.sheet, cell);
    if (cell.kind === 'text') {
      const meaning = labels.read(cell.text);
      const role = key === 'variant' ? null : (meaning.role ?? (meaning.furniture ? 'remark' : null));
      if (role !== null && role !== 'serial' && meaning.quantities.length === 0) {
        facts.role = role;
        const named = key === 'trial' ? namedBeside(meaning) : null;
        const before = this.last.get(column.column);
        if (named !== null) facts.at = { ...facts.at, trial: named };
        else if (before && fillsDown.has(key)) facts.at = { ...before, ...facts.at };
        reading.log.use(place, 'label', 'A row of averages, limits or totals.');
        return;
      }
      if (meaning.quantities.length > 0 && !isKeyName(key, meaning)) {
        facts.label = meaning;
        reading.log.use(place, 'label', 'A label.');
        return;
      }
      const isFigure =
        key === 'sieve' || key === 'time' || key === 'temperature' || key === 'passes' || key === 'frequency';
      if (
        isFigure &&
        meaning.keys.length > 0 &&
        !meaning.keys.includes(key) &&
        meaning.unknown.length === 0
      ) {
        facts.role = 'remark';
        return;
      }
      if (key !== 'stockpile' && key !== 'sieve' && meaning.unknown.length > 3) {
        facts.role = 'remark';
        return;
      }
    }
    if (key === 'sieve' && facts.at.sieve !== undefined) {
      reading.log.use(place, 'read', 'Key: a sieve.');
      return;
    }
    const understood = keyConditions(key, cell, { labels, unit: column.unit, decimal });
    if (understood.state === 'value') {
      facts.at = { ...facts.at, ...understood.value };
      if (
        key === 'variant' &&
        (understood.value.variant === 'dry' || understood.value.variant === 'conditioned')
      )
        facts.subset = understood.value.variant;
      this.last.set(column.column, understood.value);
      reading.log.use(place, 'read', `Key: ${key}.`);
    } else if (understood.state === 'doubt') {
      if (key === 'sieve' && this.hasOtherSieve(row, column)) return;
      const settled = reading.log.settle(place, understood, {}, () => ({}));
      if (settled.state === 'value') facts.at = { ...facts.at, ...settled.value };
      else facts.inDoubt = true;
    } else if (key === 'sieve') facts.role = 'total';
  }

  private hasOtherSieve(row: TableRow, column: TableColumn): boolean {
    return [...this.columns.values()].some(
      (other) =>
        other !== column &&
        other.key === 'sieve' &&
        this.context.index.cellAt(row.row, other.column) !== null,
    );
  }

  private readAside(cell: Cell, facts: RowFacts): void {
    const { index, kinds, labels, reading } = this.context;
    const column = this.columns.get(cell.column);
    const place = placeOf(index.sheet, cell);
    switch (column?.kind) {
      case 'unit': {
        const text = plainText(cell.text);
        facts.unit =
          labels.read(`x (${text})`).unit ?? (kinds.of(cell) === 'none' || text === '-' ? null : text);
        reading.log.use(place, 'label', 'A unit.');
        break;
      }
      case 'method':
        facts.method = plainText(cell.text);
        reading.log.use(place, 'read', `Test method ${facts.method}.`);
        break;
      case 'testedOn': {
        const understood = understandDate(cell, reading.grid.date1904);
        if (understood.state === 'value') {
          facts.testedOn = understood.value;
          reading.log.use(place, 'read', `Tested on ${understood.value}.`);
        } else reading.log.passOver(place, unreadReasons.remark);
        break;
      }
      default:
    }
  }
}

/** "RAP" names a stockpile and "P200" a sieve; "Blend %" under the sieves is a row of its own. */
function isKeyName(key: string, meaning: LabelMeaning): boolean {
  if (key === 'sieve') return meaning.at.sieve !== undefined;
  if (key === 'variant') return meaning.subset !== null || meaning.weak;
  if (key === 'stockpile' || key === 'specimen' || key === 'trial')
    return meaning.weak || meaning.unknown.length > 0 || isMaterial(meaning.quantities);
  return false;
}

/** Whose specimens follow is often said once; a specimen's number or a sieve never is. */
const fillsDown = new Set([
  'trial',
  'blend',
  'stockpile',
  'temperature',
  'stress',
  'variant',
  'laboratory',
  'aging',
  'frequency',
]);

/** "Mean A" */
function namedBeside(meaning: LabelMeaning): string | null {
  if (meaning.at.trial !== undefined) return meaning.at.trial;
  const [only, ...more] = meaning.unknown;
  return only !== undefined && more.length === 0 && only.length <= 3 ? only.toUpperCase() : null;
}

/** True where a text says something of the values beside it, and is not a remark or an answer. */
export function isRowLabel(meaning: LabelMeaning): boolean {
  return isHeading(meaning) || meaning.furniture || meaning.document !== null;
}
