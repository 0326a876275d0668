import { readdir, readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import type { TestFile } from '../score-file';
import { scoreStated } from './score-stated';
import { statedTruthSchema } from './stated-truth';

const here = new URL('./', import.meta.url);

/** Workbooks made elsewhere, with what they state beside them. */
export async function listFileSets(): Promise<{ name: string; files: () => AsyncGenerator<TestFile> }[]> {
  const folders = (await readdir(here, { withFileTypes: true })).filter(
    (each) => each.isDirectory() && each.name.startsWith('set-'),
  );
  return folders
    .map(({ name }) => ({ name, files: () => filesOf(new URL(`${name}/`, here)) }))
    .sort((a, b) => (a.name < b.name ? -1 : 1));
}

async function* filesOf(folder: URL): AsyncGenerator<TestFile> {
  const stated = (await readdir(folder)).filter((name) => name.endsWith('.truth.json'));
  for (const name of stated.sort()) {
    const truth = statedTruthSchema.parse(JSON.parse(await readFile(new URL(name, folder), 'utf8')));
    yield {
      name: truth.file,
      file: fileURLToPath(new URL(truth.file, folder)),
      score: (result) => scoreStated(result, truth),
    };
  }
}
