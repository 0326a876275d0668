import { spawnSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, realpathSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const refused: [place: string, imported: string, why: RegExp][] = [
  ['rules/engine/x.ts', 'node:fs', /pure engine/],
  ['rules/engine/x.ts', '#shared/limits', /pure engine/],
  ['shared/contracts/x.ts', '#server/deps', /client and server agree/],
  ['server/routes/queue/x.ts', '../../../web/lib/api', /never imports the browser/],
  ['server/db/queries/x.ts', '../../commands/notes/waive', /know neither commands nor routes/],
  ['server/db/queries/x.ts', '../../routes/define-route', /know neither commands nor routes/],
  ['server/policies/x.ts', '../db/client', /query nothing/],
  ['server/policies/x.ts', '../presenters/present-job', /query nothing/],
  ['server/presenters/x.ts', '../db/client', /queries nothing/],
  ['server/presenters/x.ts', 'drizzle-orm', /queries nothing/],
  ['server/presenters/x.ts', '../deps', /queries nothing/],
  ['server/presenters/x.ts', '../commands/notes/waive', /queries nothing/],
  ['server/commands/notes/x.ts', '../../routes/define-route', /commands no routes/],
  ['server/commands/notes/x.ts', '../../../web/lib/api', /never imports the browser/],
  ['web/features/queue/components/x.tsx', '#server/deps', /never imports the server/],
  ['web/features/queue/components/x.tsx', '../../findings/lib/ties', /never import each other/],
  ['web/features/queue/components/x.tsx', '../../../features/findings/lib/ties', /never import each other/],
  ['web/features/queue/x.tsx', '../findings/lib/ties', /never import each other/],
  ['web/features/queue/components/x.tsx', '../../../app/router', /know no app/],
  ['web/features/queue/x.tsx', '../../app/router', /know no app/],
  ['web/components/ui/x.tsx', '../../features/queue/lib/due-words', /kit knows no feature/],
  ['web/lib/x.ts', '../app/router', /kit knows no feature/],
];

const allowed: [place: string, imported: string][] = [
  ['rules/engine/x.ts', './finding'],
  ['shared/contracts/x.ts', '#rules/engine/finding'],
  ['server/db/queries/x.ts', '../client'],
  ['server/db/seed/x.ts', '../../commands/notes/waive'],
  ['server/presenters/x.ts', '../policies/actor'],
  ['server/commands/notes/x.ts', '../../db/client'],
  ['server/routes/queue/x.ts', '../../commands/notes/waive'],
  ['web/features/queue/components/x.tsx', '../lib/due-words'],
  ['web/features/queue/components/x.tsx', '../../../components/ui/button'],
  ['web/features/queue/components/x.tsx', '../../../lib/api'],
  ['web/features/queue/x.tsx', './components/queue-page'],
  ['web/features/queue/x.tsx', '../../lib/client'],
  ['web/app/x.tsx', '../features/queue/queue-route'],
];

/** Files of one import each in a folder of their own under the product's lint settings, and what is said of each. */
const folder = realpathSync(mkdtempSync(path.join(os.tmpdir(), 'clauseway-zones-')));
let verdicts: Map<string, string>;

beforeAll(() => {
  cpSync('biome.json', path.join(folder, 'biome.json'));
  for (const [index, [place, imported]] of [...refused, ...allowed].entries()) {
    const file = path.join(folder, placeOf(place, index));
    mkdirSync(path.dirname(file), { recursive: true });
    writeFileSync(file, `import { something } from '${imported}';\n\nsomething();\n`);
  }
  const { stdout } = spawnSync(
    path.resolve('node_modules/.bin/biome'),
    [
      'lint',
      '--vcs-enabled=false',
      '--only=style/noRestrictedImports',
      '--reporter=github',
      '--max-diagnostics=none',
      '.',
    ],
    { cwd: folder, encoding: 'utf8' },
  );
  verdicts = new Map(
    [...stdout.matchAll(/file=([^,]+),.*?::(.*)$/gm)].map(([, file = '', said = '']) => [
      path.relative(folder, file),
      said,
    ]),
  );
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Two probes of one place are two files. */
function placeOf(place: string, index: number): string {
  return place.replace(/x(\.tsx?)$/, `x${index}$1`);
}

describe('the direction of imports', () => {
  it.each(refused.map((each, index) => [...each, index] as const))(
    'refuses in %s an import of %s, and says why',
    (place, _imported, why, index) => {
      expect(verdicts.get(placeOf(place, index))).toMatch(why);
    },
  );

  it.each(allowed.map((each, index) => [...each, refused.length + index] as const))(
    'allows in %s an import of %s',
    (place, _imported, index) => {
      expect(verdicts.get(placeOf(place, index))).toBeUndefined();
    },
  );
});
