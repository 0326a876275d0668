import { ensurePackages } from './lib/ensure-packages.mjs';
import { inRoot, root } from './lib/paths.mjs';
import { LauncherError, reportAndExit, runCommand } from './lib/run-command.mjs';

/** Tests that take longer than a change can wait for: all of them, or the named one with its own options. */
const PARTS = {
  agreement: ['tsx', 'tests/long/agreement.ts'],
  mutation: ['tsx', 'tests/long/mutation.ts'],
};

try {
  await ensurePackages();
  const [name, ...options] = process.argv.slice(2);
  if (name !== undefined && !Object.hasOwn(PARTS, name)) {
    throw new LauncherError(`There is no long test ${name}; there is ${Object.keys(PARTS).join(', ')}.`);
  }
  for (const part of name === undefined ? Object.keys(PARTS) : [name]) {
    const [tool, ...given] = PARTS[part];
    console.log(`\n== ${part}`);
    const code = await runCommand(inRoot(`node_modules/.bin/${tool}`), [...given, ...options], { cwd: root });
    if (code !== 0) process.exitCode = code;
  }
} catch (error) {
  reportAndExit(error);
}
