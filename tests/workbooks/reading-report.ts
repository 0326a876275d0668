import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { listFileSets } from './files/file-sets';
import { heldOutLayouts } from './layouts/held-out-layouts';
import { knownLayouts } from './layouts/known-layouts';
import type { Layout } from './layouts/layout';
import { score } from './layouts/score';
import { writeBook } from './layouts/write-book';
import { type CheckedFile, checkFile, type FileScore, type TestFile } from './score-file';

interface Group {
  name: string;
  files: () => AsyncGenerator<TestFile>;
}

const folder = await mkdtemp(join(tmpdir(), 'reading-report-'));

async function* written(layouts: Layout[]): ReturnType<Group['files']> {
  for (const { name, make } of layouts) {
    const book = make();
    const { bytes, extension } = await writeBook(book);
    const file = join(folder, `${name.replace(/[^\w]+/g, '-')}.${extension}`);
    await writeFile(file, bytes);
    yield { name, file, score: (result) => score(result, book.truth) };
  }
}

const groups: Group[] = [
  { name: 'laid out by code, known', files: () => written(knownLayouts) },
  { name: 'laid out by code, held out', files: () => written(heldOutLayouts) },
  ...(await listFileSets()),
];

const { values } = parseArgs({
  options: {
    only: { type: 'string' },
    /** Also what is missing and what is wrong, reading by reading. */
    told: { type: 'boolean', default: false },
    /** Totals only. */
    totals: { type: 'boolean', default: false },
  },
});

const asked = groups.filter(({ name }) => values.only === undefined || name.includes(values.only));
if (asked.length === 0)
  throw new Error(`--only takes a part of ${groups.map(({ name }) => name).join(', ')}.`);

const widths = [46, 9, 8, 7, 8, 14, 8];
const line = (cells: (string | number)[]) =>
  cells.map((cell, at) => String(cell)[at === 0 ? 'padEnd' : 'padStart'](widths[at] ?? 8)).join(' ');

try {
  for (const group of asked) {
    console.log(`\n${group.name}`);
    console.log(line(['', 'readings', 'recall', 'wrong', 'doubts', 'unrecognised', 'time']));
    const scores: FileScore[] = [];
    for await (const tested of group.files()) {
      const checked = await checkFile(tested);
      scores.push(checked.score);
      if (!values.totals) tell(tested.name, checked);
    }
    console.log(line(['all', ...figures(sumOf(scores))]));
  }
} finally {
  await rm(folder, { recursive: true });
}

function tell(name: string, { score, missing, extra }: CheckedFile): void {
  console.log(line([name.slice(0, 45), ...figures(score)]));
  if (!values.told) return;
  for (const each of extra) console.log(`    wrong    ${each}`);
  for (const each of missing) console.log(`    missing  ${each}`);
}

function figures({ expected, found, wrong, doubts, numeric, notRecognised, milliseconds }: FileScore) {
  const share = (part: number, whole: number) =>
    whole === 0 ? '–' : `${((100 * part) / whole).toFixed(1)} %`;
  return [
    expected,
    share(found, expected),
    share(wrong, expected),
    doubts,
    share(notRecognised, numeric),
    `${milliseconds.toFixed(0)} ms`,
  ];
}

function sumOf(scores: FileScore[]): FileScore {
  const sum = (part: (score: FileScore) => number) => scores.reduce((total, score) => total + part(score), 0);
  return {
    expected: sum(({ expected }) => expected),
    found: sum(({ found }) => found),
    wrong: sum(({ wrong }) => wrong),
    doubts: sum(({ doubts }) => doubts),
    numeric: sum(({ numeric }) => numeric),
    notRecognised: sum(({ notRecognised }) => notRecognised),
    milliseconds: sum(({ milliseconds }) => milliseconds),
  };
}
