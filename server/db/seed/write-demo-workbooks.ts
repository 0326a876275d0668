import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { demoDates, demoWorkbooks } from '#tests/workbooks/demo/write-demo-workbooks';
import { demoWorkbookFolder } from './demo-workbook-folder';
import { demoProjects } from './seed-projects';

/** Workbooks to upload by hand, with a list of what each will show. */
export async function writeDemoWorkbooks(dataDirectory: string, now: Date): Promise<void> {
  const folder = demoWorkbookFolder(dataDirectory);
  mkdirSync(folder, { recursive: true });
  // Dated as if tested for a submission today: certificates would otherwise have run out by the day they are tried.
  const lettingOn = demoProjects[0]?.lettingOn ?? demoDates.lettingOn;
  const workbooks = await demoWorkbooks({ submittedOn: now.toISOString().slice(0, 10), lettingOn });
  for (const { name, bytes } of workbooks) writeFileSync(path.join(folder, name), bytes);
  const lines = workbooks.map(({ name, purpose }) => `${name}\n    ${purpose}`);
  writeFileSync(
    path.join(folder, 'README.txt'),
    `Invented mixes, to be uploaded by hand.\n\n${lines.join('\n\n')}\n`,
  );
}
