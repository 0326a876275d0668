import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../..');

export function inRoot(...parts) {
  return path.join(root, ...parts);
}
