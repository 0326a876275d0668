import { existsSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

/** Two fresh instances of the product: one with the demo, one that has had no first day yet. */
export const demoPort = 4190;
export const emptyPort = 4191;

/** Where an instance keeps its data while the journeys run. */
export function instanceDirectory(port: number): string {
  return path.join(existsSync('/dev/shm') ? '/dev/shm' : os.tmpdir(), `clauseway-journey-${port}`);
}
