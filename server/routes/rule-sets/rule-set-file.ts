import type { FileResponse } from '../define-route';

/** A rule set as a file that a person can read and another installation can take in. */
export function ruleSetFile(document: Record<string, unknown>, name: string): FileResponse {
  return {
    bytes: Buffer.from(`${JSON.stringify(document, null, 2)}\n`),
    mediaType: 'application/json',
    fileName: `${name}.json`,
  };
}
