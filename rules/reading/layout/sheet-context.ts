import type { Conditions } from '../../record';
import type { ReadingEdition } from '../edition-contents';
import type { ReadingContext } from '../reading-log';
import type { SheetIndex } from '../sheet-index';
import type { Domain } from '../words/context-words';
import type { Candidate } from './candidate';
import type { Surroundings } from './table';
import type { ToldCells } from './told';

/** What is known while one sheet is read. */
export interface SheetContext extends Surroundings {
  index: SheetIndex;
  reading: ReadingContext;
  edition: ReadingEdition;
  decimal: '.' | ',';
  /** What the sheet's name and its lines of label and value say for everything on it. */
  ambient: Conditions;
  subset: 'dry' | 'conditioned' | null;
  domains: Domain[];
  candidates: Candidate[];
  told: ToldCells;
  nextTable: number;
}
