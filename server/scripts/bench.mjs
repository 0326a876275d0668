import { ensurePackages } from './lib/ensure-packages.mjs';
import { inRoot, root } from './lib/paths.mjs';
import { reportAndExit, runCommand } from './lib/run-command.mjs';

/** Measures against the targets, as ratios within one run; says what it saw and judges nothing. */
try {
  await ensurePackages();
  process.exitCode = await runCommand(
    inRoot('node_modules/.bin/tsx'),
    ['tests/bench/run.ts', ...process.argv.slice(2)],
    { cwd: root },
  );
} catch (error) {
  reportAndExit(error);
}
