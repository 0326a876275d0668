import { canonicalText } from '../engine/canonical-text';
import { allQuantities } from '../quantities/registry';
import type { Cell, CellGrid } from './cell-grid';
import type { Correction, Said } from './correction';
import type { ReadingEdition } from './edition-contents';
import { fingerprintOfLines, knowsHeading } from './fingerprint';
import { labelReaderOf } from './label-reader-of';
import { CellKinds } from './layout/cell-kind';
import { type LayoutLine, layoutLines } from './layout/layout-lines';
import { tellCorrections } from './layout/tell-corrections';
import { type DecidedLine, tellMapping } from './layout/tell-mapping';
import { ToldCells } from './layout/told';
import { lineRules } from './line-rules';
import type { Mapping, MappingRule } from './mapping';
import { createReadingLog } from './reading-log';
import type { ReadingResult } from './reading-result';
import { saidByAnswer } from './said-by-answer';
import { SheetIndex } from './sheet-index';

export interface LearnMapping {
  grid: CellGrid;
  edition: ReadingEdition;
  corrections: readonly Correction[];
  /** As the workbook was read with all of it, every doubt listed, answered or not. */
  read: ReadingResult;
  /** The mapping that the workbook was read with. */
  base: Mapping | null;
}

export interface Learned {
  fingerprint: string;
  rules: MappingRule[];
  /** Rules of the mapping so far that an answer set aside. */
  dropped: string[];
  /** What holds for this workbook only, a sentence each. */
  notLearned: string[];
}

/** What was said of some cells, on whichever sheets. */
export interface SaidGroup {
  says: Said;
  cells: { sheet: string; cell: Cell }[];
}

/**
 * What people said of the cells of one workbook as rules of its layout: anchored to headings, so that they hold for
 * other values, further rows and moved tables. What no heading tells from its neighbours is not learned, and said.
 */
export function learnMapping({ grid, edition, corrections, read, base }: LearnMapping): Learned {
  const around = { kinds: new CellKinds(), labels: labelReaderOf(edition) };
  const indexes = grid.sheets.map((sheet) => new SheetIndex(sheet));
  const lines = indexes.flatMap((index) => layoutLines(index, around));
  const told = new ToldCells();
  tellCorrections(told, corrections, { indexes, kinds: around.kinds });
  const decided = base === null ? [] : decidedLines(base, lines, { read, labels: around.labels });
  for (const { says, cells, line } of decided) {
    if (says === null) continue;
    for (const cell of cells) told.tell({ says, by: 'mapping', sheet: line.index.sheet.name, cell });
  }
  tellAnswers(told, { read, edition, indexes });
  const groups = groupsOf(told);
  const learned = lineRules(groups, { lines, read, told });
  const anchored = new Set(learned.rules.map(({ id }) => id));
  return {
    fingerprint: fingerprintOfLines(lines),
    rules: learned.rules,
    dropped: [...new Set(decided.map(({ rule }) => rule))].filter((id) => !anchored.has(id)),
    notLearned: learned.notLearned,
  };
}

/** Departures from the mapping that an answer settled: what stands there now is learned in place of what stood there. */
function decidedLines(
  base: Mapping,
  lines: readonly LayoutLine[],
  { read, labels }: { read: ReadingResult; labels: ReturnType<typeof labelReaderOf> },
): DecidedLine[] {
  const decided: DecidedLine[] = [];
  const log = createReadingLog(read.answered);
  const knows = (heading: string) => knowsHeading(base.fingerprint, heading);
  tellMapping(base, { told: new ToldCells(), lines, labels, log, departures: [], decided, knows });
  return decided;
}

function tellAnswers(
  told: ToldCells,
  {
    read,
    edition,
    indexes,
  }: { read: ReadingResult; edition: ReadingEdition; indexes: readonly SheetIndex[] },
): void {
  const byId = new Map([...allQuantities(), ...edition.quantities].map((each) => [each.id, each]));
  for (const { sheet, cell: address, answer } of read.answered) {
    const doubt = read.doubts.find((each) => each.sheet === sheet && each.cell === address);
    const index = indexes.find((each) => each.sheet.name === sheet);
    const cell = index?.sheet.cells.find((each) => each.address === address);
    const says = doubt && cell ? saidByAnswer(doubt, answer, cell, (id) => byId.get(id)) : null;
    if (says && cell) told.tell({ says, by: 'correction', sheet, cell });
  }
}

function groupsOf(told: ToldCells): SaidGroup[] {
  const groups = new Map<string, SaidGroup>();
  for (const { says, sheet, cell } of told.all()) {
    if (says.kind === 'in doubt' || says.kind === 'left out') continue;
    const key = canonicalText(says);
    const group: SaidGroup = groups.get(key) ?? { says, cells: [] };
    group.cells.push({ sheet, cell });
    groups.set(key, group);
  }
  return [...groups.values()];
}
