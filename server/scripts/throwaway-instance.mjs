import { spawn } from 'node:child_process';
import { createWriteStream, existsSync, mkdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { inRoot, root } from './lib/paths.mjs';

/** The product on a directory that is new at the start and gone at the end: what browser journeys run against. */
const parent = existsSync('/dev/shm') ? '/dev/shm' : os.tmpdir();
const directory = path.join(parent, `clauseway-journey-${process.env.PORT}`);
rmSync(directory, { recursive: true, force: true });
mkdirSync(directory, { recursive: true });

const { DATABASE_URL: _, ...environment } = process.env;
const launcher = spawn(process.execPath, [inRoot('server/scripts/start.mjs')], {
  cwd: root,
  stdio: ['inherit', 'pipe', 'inherit'],
  env: { ...environment, CLAUSEWAY_DATA: directory, CLAUSEWAY_THROWAWAY: 'yes' },
});

// The first day starts with a link that stands nowhere else.
launcher.stdout.pipe(createWriteStream(path.join(directory, 'welcome.txt')));
launcher.stdout.pipe(process.stdout);

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => launcher.kill('SIGTERM'));
launcher.on('exit', (code) => {
  rmSync(directory, { recursive: true, force: true });
  process.exit(code ?? 1);
});
