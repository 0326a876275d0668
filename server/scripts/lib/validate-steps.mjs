import { cpSync, mkdirSync, readdirSync, rmSync } from 'node:fs';
import { buildWhenStale } from './build-when-stale.mjs';
import { inRoot, root } from './paths.mjs';
import { LauncherError, runCommand, runQuietly } from './run-command.mjs';

const bin = (name) => inRoot('node_modules', '.bin', name);
const command =
  (name, ...args) =>
  async () =>
    (await runCommand(bin(name), args, { cwd: root })) === 0;

/** Each resolves with true where all is well; what is wrong has been printed by then. */
export const validateSteps = [
  { name: 'types', run: command('tsc', '--noEmit') },
  { name: 'format and lint', run: command('biome', 'check', '.') },
  { name: 'unused code', run: command('knip') },
  { name: 'migrations are current', run: migrationsAreCurrent },
  { name: 'build', run: build },
];

/** Generates once more beside the real folder: a schema that has moved on would add a file. */
async function migrationsAreCurrent() {
  const copy = 'node_modules/.cache/drizzle-check';
  rmSync(inRoot(copy), { recursive: true, force: true });
  mkdirSync(inRoot('node_modules/.cache'), { recursive: true });
  cpSync(inRoot('drizzle'), inRoot(copy), { recursive: true });
  await runQuietly(
    bin('drizzle-kit'),
    ['generate', '--dialect', 'mysql', '--schema', './server/db/schema/*.ts', '--out', copy],
    { cwd: root },
  );
  const before = readdirSync(inRoot('drizzle')).sort().join();
  if (readdirSync(inRoot(copy)).sort().join() === before) return true;
  console.error('The schema has changed without a migration: npm run db:migration <name>.');
  return false;
}

async function build() {
  try {
    await buildWhenStale();
    return true;
  } catch (error) {
    if (!(error instanceof LauncherError)) throw error;
    console.error(error.message);
    return false;
  }
}

/** Runs all of them, so that everything that is wrong is known at once. */
export async function runValidateSteps() {
  const counts = { passed: 0, failed: 0 };
  for (const { name, run } of validateSteps) {
    console.log(`\n== ${name}`);
    const passed = await run();
    counts[passed ? 'passed' : 'failed'] += 1;
    if (!passed) console.error(`-- ${name}: failed`);
  }
  return counts;
}
