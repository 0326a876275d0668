import type { CellGrid } from '#rules/reading/cell-grid';
import { readWorkbook } from '#rules/reading/interpret';
import type { Mapping } from '#rules/reading/mapping';
import type { Answer, ReadingResult } from '#rules/reading/reading-result';
import { templateMapping } from '#rules/reading/template-mapping';
import { recogniseTemplate } from '#rules/reading/template-stamp';
import type { Doubt } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { Database } from '../../db/client';
import { Problem } from '../../problem';
import { ownResolvedEdition } from '../projects/own-edition';
import { trimUnread } from './trim-unread';

interface ReadGrid {
  grid: CellGrid;
  fileName: string;
  /** Of the section that judges it, with its hash and its agency. */
  edition: ResolvedEdition;
  resolvedHash: string;
  agencyId: string;
  answers: Answer[];
  /** Where the section's own template is. */
  templateHref: string;
}

export interface GridRead {
  read: ReadingResult;
  mapping: { name: string; document: Mapping };
}

/** Reads a stored grid through the mapping of its layout; another layout than the template is refused with a remedy. */
export async function readGrid(
  db: Database,
  { grid, fileName, edition, resolvedHash, agencyId, answers, templateHref }: ReadGrid,
): Promise<GridRead> {
  const stamp = recogniseTemplate(grid);
  if (stamp === null) {
    throw new Problem('layout-unknown', {
      detail: `${fileName} is not laid out as the template of ${edition.title}, edition ${edition.edition}.`,
      fix: 'Fill in the template and upload that.',
      present: { href: templateHref },
    });
  }
  // A template of an earlier edition keeps its own places; what they mean is the section's to say.
  const hash = stamp.editionHash;
  const earlier = hash === resolvedHash ? null : await ownResolvedEdition(db, { agencyId, hash });
  const made = earlier ?? edition;
  const document = templateMapping(made);
  const unanswered = readWorkbook({ grid, mapping: document, edition, answers: [] });
  const read =
    answers.length === 0 ? unanswered : readWorkbook({ grid, mapping: document, edition, answers });
  return {
    read: trimUnread({ ...read, doubts: everyDoubt(unanswered.doubts, read.doubts) }),
    mapping: { name: `Template of ${made.title}, edition ${made.edition}`.slice(0, 200), document },
  };
}

/** The page lists answered doubts too, so that an answer can be seen and taken back. */
function everyDoubt(before: readonly Doubt[], after: readonly Doubt[]): Doubt[] {
  const place = ({ sheet, cell }: Doubt) => `${sheet}!${cell}`;
  const known = new Set(before.map(place));
  return [...before, ...after.filter((doubt) => !known.has(place(doubt)))];
}
