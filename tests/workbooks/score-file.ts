import { z } from 'zod';
import { type ReadingResult, readingResultSchema } from '#rules/reading/reading-result';
import { unreadReasons } from '#rules/reading/unread-reason';
import { mixRecordSchema } from '#rules/record';
import { loadGrid } from '#server/cli/load-check-inputs';
import { runCheck } from '#server/cli/run-check';
import type { Score } from './layouts/score';

export interface TestFile {
  name: string;
  file: string;
  score: (result: Pick<ReadingResult, 'record' | 'doubts'>) => Score;
}

export interface FileScore {
  expected: number;
  found: number;
  wrong: number;
  doubts: number;
  /** Cells that hold a number, and those of them that end as not recognised. */
  numeric: number;
  notRecognised: number;
  milliseconds: number;
}

export interface CheckedFile {
  score: FileScore;
  missing: string[];
  extra: string[];
}

const rules = new URL('../../rules/sets/cvra-412-2026.json', import.meta.url).pathname;

const outputSchema = z.object({
  record: mixRecordSchema,
  reading: z.object({
    unread: readingResultSchema.shape.unread,
    doubts: readingResultSchema.shape.doubts,
  }),
});

/** Reads a file the way the command line does, with all that it prints, and holds it against what is true. */
export async function checkFile({ file, score }: TestFile): Promise<CheckedFile> {
  let printed = '';
  let complaint = '';
  const start = performance.now();
  const code = await runCheck(['--rules', rules, '--json', file], {
    out: (text) => {
      printed += text;
    },
    err: (text) => {
      complaint += text;
    },
  });
  const milliseconds = performance.now() - start;
  if (code === 2) throw new Error(`${file}: ${complaint}`);
  const { record, reading } = outputSchema.parse(JSON.parse(printed));
  const { missing, extra, ...told } = score({ record, doubts: reading.doubts });
  const numeric = await numericCells(file);
  const notRecognised = reading.unread.filter(
    ({ sheet, cell, reason }) => reason === unreadReasons.notRecognised && numeric.has(`${sheet}!${cell}`),
  );
  return {
    score: { ...told, numeric: numeric.size, notRecognised: notRecognised.length, milliseconds },
    missing,
    extra,
  };
}

async function numericCells(file: string): Promise<Set<string>> {
  const grid = await loadGrid(file);
  return new Set(
    grid.sheets.flatMap(({ name, cells }) =>
      cells.filter(({ kind }) => kind === 'number').map(({ address }) => `${name}!${address}`),
    ),
  );
}
