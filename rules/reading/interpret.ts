import type { Quantity } from '../quantities/quantity';
import { allQuantities } from '../quantities/registry';
import type { Conditions } from '../record';
import { withStandardAttributes } from '../rule-sets/attribute';
import { withStandardDocuments } from '../rule-sets/document-types';
import type { Cell, CellGrid, SheetGrid } from './cell-grid';
import type { Correction } from './correction';
import type { ReadingEdition } from './edition-contents';
import { joinAttributes, joinReadings } from './join-duplicates';
import { CellKinds } from './layout/cell-kind';
import { settleCandidates } from './layout/settle-candidates';
import { settleTold } from './layout/settle-told';
import { tellCorrections } from './layout/tell-corrections';
import { ToldCells } from './layout/told';
import {
  attributePrefix,
  documentQuantity,
  isReference,
  labelQuantity,
  type Mapping,
  type MappingRule,
} from './mapping';
import { labelKey } from './plain-text';
import { readAttribute } from './read-attribute';
import { readDocument } from './read-documents';
import { type FindQuantity, readValues } from './read-readings';
import { bindRule, markLabels, type RuleAtAnchor } from './read-rule';
import { createReadingLog, placeKey, placeOf, type ReadingContext } from './reading-log';
import type { Answer, ReadingResult } from './reading-result';
import { SheetIndex } from './sheet-index';
import { submittalFacts } from './submittal-facts';
import { understandCondition } from './understand-condition';
import { unreadReasons } from './unread-reason';
import { valueCells } from './value-places';

export interface ReadWorkbookInput {
  grid: CellGrid;
  mapping: Mapping;
  /** Which attributes, documents and quantities there are words for. */
  edition: ReadingEdition;
  answers: Answer[];
  /** What people said of cells of this workbook; it stands over the mapping. */
  corrections?: readonly Correction[];
}

/** Reads a decoded workbook through a mapping: every filled cell ends as read, doubted, a label or unused. */
export function readWorkbook({
  grid,
  mapping,
  edition,
  answers,
  corrections = [],
}: ReadWorkbookInput): ReadingResult {
  const log = createReadingLog(answers);
  const indexes = grid.sheets.map((sheet) => new SheetIndex(sheet));
  const told = new ToldCells();
  tellCorrections(told, corrections, { indexes, kinds: new CellKinds() });
  const context: ReadingContext = { grid, log: told.quieten(log) };
  const findQuantity = quantityFinder(edition.quantities);
  for (const rule of mapping.rules) {
    for (const index of indexes) {
      if (rule.anchor.sheet === null || labelKey(rule.anchor.sheet) === labelKey(index.sheet.name)) {
        readRule(index, rule, edition, findQuantity, context);
      }
    }
  }
  if (told.size > 0) {
    const plain = readWorkbook({ grid, mapping, edition, answers });
    const left = settleTold(told, [], { grid, log, edition, indexes, atOf: conditionsIn(plain) });
    settleCandidates(left, { log, find: findQuantity, decimalOf: () => '.' });
  }
  const readings = joinReadings(log);
  const attributes = joinAttributes(log);
  for (const index of indexes) passOverRest(index, { grid, log });
  return {
    record: { attributes, readings, documents: log.documents, doubts: log.doubts },
    doubts: log.doubts,
    unread: log.unread,
    uses: log.uses(),
    answered: log.answered,
    stale: answers.filter((answer) => !log.answered.includes(answer)),
    departures: [],
  };
}

/** Whose a value is, as the mapping alone reads it. */
function conditionsIn({
  record,
  doubts,
}: ReadingResult): (place: { sheet: string; cell: string }) => Conditions {
  const at = new Map(doubts.map((doubt) => [placeKey(doubt), doubt.about.at ?? {}]));
  for (const reading of record.readings) if (reading.source) at.set(placeKey(reading.source), reading.at);
  return (place) => at.get(placeKey(place)) ?? {};
}

function readRule(
  index: SheetIndex,
  rule: MappingRule,
  edition: ReadingEdition,
  findQuantity: FindQuantity,
  context: ReadingContext,
): void {
  const anchors = index.findHeader(rule.anchor.header);
  for (const [at, anchor] of anchors.entries()) {
    const bound = bindRule(index, rule, anchor);
    markLabels(bound, context);
    const next = anchors
      .slice(at + 1)
      .find(({ cell }) => cell.row > anchor.cell.row && cell.column === anchor.cell.column);
    const cells = valueCells(index, rule, anchor, next?.cell.row ?? null);
    if (rule.quantity === labelQuantity) {
      const furniture = rule.axis === 'right' && rule.range.most === null ? [] : cells;
      for (const cell of furniture) context.log.use(placeOf(index.sheet, cell), 'label', 'A label.');
    } else if (rule.quantity === documentQuantity) {
      for (const cell of cells) readDocument(bound, cell, withStandardDocuments(edition.documents), context);
    } else if (!isReference(rule.quantity) && rule.quantity.startsWith(attributePrefix)) {
      const attribute = attributeNamed(rule.quantity.slice(attributePrefix.length), edition);
      for (const cell of cells) readAttribute(bound, cell, attribute, context);
    } else {
      readValues(bound, cells, findQuantity, context);
    }
    markUnits(bound, cells, context);
    markKeys(bound, next?.cell.row ?? null, context);
  }
}

function attributeNamed(name: string, edition: ReadingEdition) {
  const known = [...withStandardAttributes(edition.attributes), ...submittalFacts];
  return known.find((attribute) => attribute.name === name) ?? { name, type: 'text' as const };
}

function markUnits(bound: RuleAtAnchor, cells: Cell[], context: ReadingContext): void {
  // Beside a label the unit stands ready before there is a value.
  const places = bound.rule.axis === 'right' ? [bound.anchor.cell, ...cells] : cells;
  for (const place of places) {
    const unitCell = bound.locators.get('unit')?.cellFor(place);
    if (unitCell) context.log.use(placeOf(bound.index.sheet, unitCell), 'label', 'A unit.');
  }
}

/** Prepared keys are part of the layout and nothing to report: sieves without a result, method rows, column heads. */
function markKeys(bound: RuleAtAnchor, nextRow: number | null, context: ReadingContext): void {
  const { index, anchor, rule, locators } = bound;
  if (rule.axis === 'right') return;
  const span = index.spanOf(anchor.cell);
  const firstRow = anchor.cell.row + span.rows + (rule.axis === 'cross' ? 1 : 0) + rule.range.skip;
  const columns = Array.from({ length: span.columns }, (_, at) => anchor.cell.column + at);
  for (const [name, locator] of locators) {
    const own = locator.header ? [locator.header.cell.column] : columns;
    for (const cell of own.flatMap((column) => index.columnCells(column))) {
      if (cell.row <= anchor.cell.row || (nextRow !== null && cell.row >= nextRow)) continue;
      const key = locator.cellFor({
        row: cell.row,
        column: locator.header ? anchor.cell.column : cell.column,
      });
      if (key !== cell || !isPrepared(name, cell, firstRow)) continue;
      context.log.use(placeOf(index.sheet, cell), 'label', 'A key.');
    }
  }
}

function isPrepared(name: string, cell: Cell, firstRow: number): boolean {
  if (cell.row < firstRow) return true;
  return name === 'sieve' && understandCondition('sieve', cell, null, '.').state === 'value';
}

/** Finds a quantity by id, label, symbol or any name that workbooks give it. */
function quantityFinder(own: Quantity[]): FindQuantity {
  const byName = new Map<string, Quantity>();
  const known = [...own, ...allQuantities().filter(({ id }) => !own.some((each) => each.id === id))];
  for (const quantity of known) byName.set(labelKey(quantity.id), quantity);
  for (const quantity of known) {
    for (const name of [quantity.label, quantity.symbol, ...quantity.aliases]) {
      const key = labelKey(name);
      if (!byName.has(key)) byName.set(key, quantity);
    }
  }
  return (name) => byName.get(labelKey(name));
}

/** What is left over is listed, so that nothing in a workbook disappears without a word. */
function passOverRest(index: SheetIndex, context: ReadingContext): void {
  const { sheet } = index;
  const hasLabels = sheet.cells.some((cell) => context.log.isUsed(placeOf(sheet, cell)));
  const firstRow = hasLabels ? firstUsedRow(sheet, context) : 0;
  for (const cell of sheet.cells) {
    const place = placeOf(sheet, cell);
    if (context.log.isUsed(place)) continue;
    if (cell.kind === 'text' && hasLabels && cell.row <= firstRow) {
      context.log.use(place, 'label', 'A title or label.');
    } else if (index.isHidden(cell)) context.log.passOver(place, unreadReasons.hidden);
    else if (cell.kind === 'text' && hasLabels) context.log.passOver(place, unreadReasons.remark);
    else context.log.passOver(place, unreadReasons.noRule);
  }
}

function firstUsedRow(sheet: SheetGrid, context: ReadingContext): number {
  const used = sheet.cells.find((cell) => context.log.isUsed(placeOf(sheet, cell)));
  return used?.row ?? 0;
}
