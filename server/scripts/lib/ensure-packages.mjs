import { existsSync, readFileSync } from 'node:fs';
import { inRoot, root } from './paths.mjs';
import { LauncherError, runCommand } from './run-command.mjs';

/** Installs the npm packages where they are missing or differ from package-lock.json. */
export async function ensurePackages() {
  if (packagesAreCurrent()) return;
  console.log('Installing packages …');
  const code = await runCommand(
    'npm',
    ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'],
    {
      cwd: root,
    },
  );
  if (code !== 0) throw new LauncherError('The packages could not be installed: npm ci failed, see above.');
}

/**
 * npm writes what it installed into node_modules/.package-lock.json. Times are no help after a clone,
 * so the two lists are compared; a package for another platform may be absent, so optional ones may lack.
 */
function packagesAreCurrent() {
  const installedPath = inRoot('node_modules', '.package-lock.json');
  if (!existsSync(installedPath)) return false;
  const installed = JSON.parse(readFileSync(installedPath, 'utf8')).packages ?? {};
  const wanted = JSON.parse(readFileSync(inRoot('package-lock.json'), 'utf8')).packages ?? {};
  for (const [name, entry] of Object.entries(wanted)) {
    if (name === '') continue;
    const found = installed[name];
    if (!found && (entry.optional || entry.devOptional || entry.peer)) continue;
    if (found?.version !== entry.version) return false;
  }
  return true;
}
