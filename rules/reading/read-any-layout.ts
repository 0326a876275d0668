import { allQuantities } from '../quantities/registry';
import { convert } from '../quantities/units';
import type { Conditions } from '../record';
import type { CellGrid } from './cell-grid';
import type { Correction } from './correction';
import type { ReadingEdition } from './edition-contents';
import { knowsHeading } from './fingerprint';
import { joinAttributes, joinReadings } from './join-duplicates';
import { labelReaderOf } from './label-reader-of';
import { CellKinds } from './layout/cell-kind';
import { decimalMark } from './layout/decimal-mark';
import { findTables } from './layout/find-tables';
import { layoutLines } from './layout/layout-lines';
import { dropMeans } from './layout/means-of-specimens';
import { readTable } from './layout/read-table';
import { settleCandidates } from './layout/settle-candidates';
import { settleTold } from './layout/settle-told';
import type { SheetContext } from './layout/sheet-context';
import { trialsOfSheets } from './layout/sheet-trials';
import { farConditions } from './layout/table-context';
import { tellCorrections } from './layout/tell-corrections';
import { tellMapping } from './layout/tell-mapping';
import { ToldCells } from './layout/told';
import type { Mapping } from './mapping';
import { createReadingLog, placeOf, type ReadingContext } from './reading-log';
import type { Answer, Departure, ReadingResult } from './reading-result';
import { SheetIndex } from './sheet-index';
import { unreadReasons } from './unread-reason';

export interface ReadAnyLayoutInput {
  grid: CellGrid;
  /** Which attributes, documents and quantities there are words for. */
  edition: ReadingEdition;
  answers: Answer[];
  /** What people said of cells of this workbook. */
  corrections?: readonly Correction[];
  /** What the laboratory's workbooks of this layout were said to hold before. */
  mapping?: Mapping | null;
}

/**
 * Reads a workbook in whatever layout a laboratory has: no sheet is known by its name and no value by its address.
 * Cells become numbers and words, words become headings of tables, headings say what each number is; what
 * they leave open is a doubt, and what nothing speaks for is listed as unused.
 */
export function readAnyLayout({
  grid,
  edition,
  answers,
  corrections = [],
  mapping = null,
}: ReadAnyLayoutInput): ReadingResult {
  const log = createReadingLog(answers);
  const kinds = new CellKinds();
  const labels = labelReaderOf(edition);
  const indexes = grid.sheets.map((sheet) => new SheetIndex(sheet));
  const decimals = new Map(grid.sheets.map((sheet) => [sheet.name, decimalMark(sheet)]));
  const told = new ToldCells();
  const departures: Departure[] = [];
  tellCorrections(told, corrections, { indexes, kinds });
  if (mapping !== null) {
    const lines = indexes.flatMap((index) => layoutLines(index, { kinds, labels }));
    const knows = (heading: string) => knowsHeading(mapping.fingerprint, heading);
    tellMapping(mapping, { told, lines, labels, log, departures, decided: [], knows });
  }
  const reading: ReadingContext = { grid, log: told.quieten(log) };
  const candidates: SheetContext['candidates'] = [];
  const trials = trialsOfSheets(grid.sheets);
  let nextTable = 0;
  for (const index of indexes) {
    const name = labels.read(index.sheet.name.replace(/[_-]+/g, ' '));
    const dashed = labels.read(index.sheet.name);
    const context: SheetContext = {
      kinds,
      labels,
      index,
      reading,
      edition,
      decimal: decimals.get(index.sheet.name) ?? '.',
      ambient: withoutDesign({
        ...sheetTemperature(index.sheet.name),
        ...farConditions(name),
        ...farConditions(dashed),
        ...(trials.has(index.sheet.name) ? { trial: trials.get(index.sheet.name) } : {}),
      }),
      subset: name.subset,
      domains: [...name.domains, ...dashed.domains],
      candidates,
      told,
      nextTable,
    };
    for (const table of findTables(index.sheet, { kinds, labels })) {
      context.nextTable = nextTable;
      readTable(table, context);
      nextTable += 1;
    }
  }
  const byId = new Map(
    [...allQuantities(), ...edition.quantities].map((quantity) => [quantity.id, quantity]),
  );
  const left = settleTold(told, candidates, { grid, log, edition, indexes });
  settleCandidates(left, {
    log,
    find: (id) => byId.get(id),
    decimalOf: (sheet) => decimals.get(sheet) ?? '.',
  });
  dropMeans(log);
  const readings = joinReadings(log, { mayLog: true });
  const attributes = joinAttributes(log);
  for (const index of indexes) passOverRest(index, { grid, log });
  return {
    record: { attributes, readings, documents: log.documents, doubts: log.doubts },
    doubts: log.doubts,
    unread: log.unread,
    uses: log.uses(),
    answered: log.answered,
    stale: answers.filter((answer) => !log.answered.includes(answer)),
    departures,
  };
}

/** "Creep -10C", "IDT_20C", "Hamburg 122F": a sheet's name leaves out the sign for degrees. */
function sheetTemperature(name: string): Conditions {
  const match =
    /(?:^|[\s_(])((?:minus |neg |m)?-?\d{1,3}(?:[.,]\d)?)\s*(?:°|deg)?\s*([CF])(?![\p{L}\d])/iu.exec(name);
  if (!match?.[1] || !match[2]) return {};
  const degrees = Number(match[1].replace(/^(?:minus |neg |m)/i, '-').replace(',', '.'));
  const converted = convert(degrees, `°${match[2].toUpperCase()}`, '°C');
  return converted.ok ? { temperature: converted.value } : {};
}

/** A sheet called "JMF" holds the submittal; what is told apart as the design on it says so itself. */
function withoutDesign({ trial, ...rest }: Conditions): Conditions {
  return trial === undefined || trial === 'design' ? rest : { ...rest, trial };
}

/** What is left over is listed, so that nothing in a workbook disappears without a word. */
function passOverRest(index: SheetIndex, { log }: ReadingContext): void {
  for (const cell of index.sheet.cells) {
    const place = placeOf(index.sheet, cell);
    if (log.isUsed(place)) continue;
    log.passOver(place, cell.kind === 'text' ? unreadReasons.remark : unreadReasons.notRecognised);
  }
}
