import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import type { Said } from '../correction';
import type { SheetIndex } from '../sheet-index';
import type { Domain } from '../words/context-words';

/** One cell that may hold a reading, with everything that the layout says of it. */
export interface Candidate {
  index: SheetIndex;
  cell: Cell;
  /** What its headings may mean. */
  quantities: string[];
  /** Conditions said by its own row and column. */
  at: Conditions;
  /** Conditions said further off: by a title, by the sheet's name, by a line over the table. */
  far: Conditions;
  unit: string | null;
  unknownUnit: string | null;
  method: string | null;
  testedOn: string | null;
  isAverage: boolean;
  /** Stands in a table with headings. */
  isHeaded: boolean;
  /** Its row, and not its column, says which specimen it is. */
  specimenOfRow: boolean;
  subset: 'dry' | 'conditioned' | null;
  onAggregate: boolean;
  onMix: boolean;
  /** Kinds of test spoken of, the nearest first. */
  domains: Domain[];
  /** Number of its table, for what the cells of one table say together. */
  table: number;
  /** Heading words, to say why it was so read. */
  heading: string;
  /** Stands in a heading or a text and not in a cell of its own. */
  written: string | null;
  /** A misspelt word that its heading rests on alone. */
  misspelt: string | null;
  /** What a person or a mapping says that it is; its headings then only say whose it is. */
  told?: ToldReading;
}

export type ToldReading = Extract<Said, { kind: 'reading' }>;
