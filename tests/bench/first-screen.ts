import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';

/** Script of the first route, gzip: what index.html names and what those files import without being asked. */
export function benchFirstScreen(): string {
  const folder = path.resolve('dist/web');
  if (!existsSync(path.join(folder, 'index.html')))
    return 'first screen: not built; run `npm run validate` first';
  const html = readFileSync(path.join(folder, 'index.html'), 'utf8');
  const waiting = [...html.matchAll(/(?:src|href)="(\/assets\/[^"]+\.js)"/g)].map((match) => match[1] ?? '');
  const seen = new Set<string>();
  for (let file = waiting.pop(); file !== undefined; file = waiting.pop()) {
    if (seen.has(file)) continue;
    seen.add(file);
    const source = readFileSync(path.join(folder, file), 'utf8');
    for (const [, name] of source.matchAll(/(?:from|import)\s*"\.\/([^"]+\.js)"/g))
      waiting.push(`/assets/${name}`);
  }
  const bytes = [...seen].reduce(
    (sum, file) => sum + gzipSync(readFileSync(path.join(folder, file))).length,
    0,
  );
  return `first screen: ${(bytes / 1000).toFixed(0)} kB gzip of script in ${seen.size} files, target at most 230`;
}
