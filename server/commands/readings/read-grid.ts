import type { CellGrid } from '#rules/reading/cell-grid';
import type { Correction } from '#rules/reading/correction';
import { readWorkbook } from '#rules/reading/interpret';
import { type Mapping, mappingSchema } from '#rules/reading/mapping';
import { readAnyLayout } from '#rules/reading/read-any-layout';
import type { Answer, ReadingResult } from '#rules/reading/reading-result';
import { templateMapping } from '#rules/reading/template-mapping';
import { recogniseTemplate } from '#rules/reading/template-stamp';
import type { Doubt } from '#rules/record';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { Database } from '../../db/client';
import { ownResolvedEdition } from '../projects/own-edition';
import { trimUnread } from './trim-unread';

interface ReadGrid {
  grid: CellGrid;
  /** Of the section that judges it, with its hash and its agency. */
  edition: ResolvedEdition;
  resolvedHash: string;
  agencyId: string;
  answers: Answer[];
  corrections: readonly Correction[];
  /** The version of the laboratory's mapping that the revision is read with. */
  learned: LearnedMapping | null;
}

export interface LearnedMapping {
  id: string;
  name: string;
  number: number;
  document: Mapping;
}

/** What a workbook was read with; `learned` names the laboratory's mapping where it was one. */
export interface MappingUsed {
  name: string;
  document: Record<string, unknown>;
  learned: { id: string; number: number } | null;
}

export interface GridRead {
  read: ReadingResult;
  mapping: MappingUsed;
}

/**
 * Reads a stored grid: the template through its own mapping, any other layout by what its headings say and by what the
 * laboratory's mapping knows of them.
 */
export async function readGrid(db: Database, of: ReadGrid): Promise<GridRead> {
  const { mapping, read } = await readerOf(db, of);
  const unanswered = read([]);
  const answered = of.answers.length === 0 ? unanswered : read(of.answers);
  return {
    read: trimUnread({ ...answered, doubts: everyDoubt(unanswered.doubts, answered.doubts) }),
    mapping,
  };
}

interface GridReader {
  mapping: MappingUsed;
  read: (answers: Answer[]) => ReadingResult;
}

async function readerOf(
  db: Database,
  { grid, edition, resolvedHash, agencyId, corrections, learned }: ReadGrid,
): Promise<GridReader> {
  const stamp = recogniseTemplate(grid);
  if (stamp === null) {
    return {
      mapping:
        learned === null
          ? { name: 'Read by its headings', document: noMapping, learned: null }
          : {
              name: `${learned.name}, version ${learned.number}`,
              document: learned.document,
              learned: { id: learned.id, number: learned.number },
            },
      read: (answers) =>
        readAnyLayout({ grid, edition, answers, corrections, mapping: learned?.document ?? null }),
    };
  }
  // A template of an earlier edition keeps its own places; what they mean is the section's to say.
  const hash = stamp.editionHash;
  const earlier = hash === resolvedHash ? null : await ownResolvedEdition(db, { agencyId, hash });
  const made = earlier ?? edition;
  const mapping = templateMapping(made);
  return {
    mapping: {
      name: `Template of ${made.title}, edition ${made.edition}`.slice(0, 200),
      document: mapping,
      learned: null,
    },
    read: (answers) => readWorkbook({ grid, mapping, edition, answers, corrections }),
  };
}

/** Nothing of such a layout was laid down by anybody. */
const noMapping = mappingSchema.parse({
  laboratory: 'Any',
  fingerprint: 'read by its headings',
  version: 1,
  rules: [],
});

/** The page lists answered doubts too, so that an answer can be seen and taken back. */
function everyDoubt(before: readonly Doubt[], after: readonly Doubt[]): Doubt[] {
  const place = ({ sheet, cell }: Doubt) => `${sheet}!${cell}`;
  const known = new Set(before.map(place));
  return [...before, ...after.filter((doubt) => !known.has(place(doubt)))];
}
