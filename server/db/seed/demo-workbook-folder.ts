import { existsSync } from 'node:fs';
import path from 'node:path';

export function demoWorkbookFolder(dataDirectory: string): string {
  return path.resolve(dataDirectory, 'demo-workbooks');
}

/** The list is written last: without it the folder is not whole. */
export function demoWorkbooksAreWritten(dataDirectory: string): boolean {
  return existsSync(path.join(demoWorkbookFolder(dataDirectory), 'README.txt'));
}
