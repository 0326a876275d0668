import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { demoWorkbooks } from '#tests/workbooks/demo/write-demo-workbooks';

/** Workbooks to upload by hand, with a list of what each will show. */
export async function writeDemoWorkbooks(dataDirectory: string): Promise<void> {
  const folder = path.resolve(dataDirectory, 'demo-workbooks');
  const list = path.join(folder, 'README.txt');
  if (existsSync(list)) return;
  mkdirSync(folder, { recursive: true });
  const workbooks = await demoWorkbooks();
  for (const { name, bytes } of workbooks) writeFileSync(path.join(folder, name), bytes);
  const lines = workbooks.map(({ name, purpose }) => `${name}\n    ${purpose}`);
  writeFileSync(list, `Invented mixes, to be uploaded by hand.\n\n${lines.join('\n\n')}\n`);
}
