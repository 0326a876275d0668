import { existsSync } from 'node:fs';
import { commandExists, isRoot, LauncherError, runQuietly } from './run-command.mjs';

const commandsByPackage = {
  'mariadb-server': ['mariadbd', 'mariadb-install-db'],
  chromium: ['chromium'],
  'poppler-utils': ['pdftotext'],
};

/** Installs what is missing as root; anyone else is told the name of the Debian package. */
export async function ensureDebianPackages(packages) {
  const missing = packages.filter((name) => commandsByPackage[name].some((command) => !findCommand(command)));
  if (missing.length === 0) return;
  if (!isRoot() || !commandExists('apt-get')) {
    throw new LauncherError(`Missing on this machine: install the Debian package ${missing.join(' and ')}.`);
  }
  console.log(`Installing ${missing.join(', ')} …`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const wait = ['-o', 'DPkg::Lock::Timeout=300'];
  await runQuietly('apt-get', [...wait, 'update', '-q'], { env });
  await runQuietly('apt-get', [...wait, 'install', '-y', '-q', '--no-install-recommends', ...missing], {
    env,
  });
}

/** Debian keeps mariadbd in /usr/sbin, which is not on everybody's path. */
export function findCommand(command) {
  const directories = [...(process.env.PATH ?? '').split(':'), '/usr/sbin', '/usr/local/sbin'];
  const directory = directories.find((candidate) => candidate && existsSync(`${candidate}/${command}`));
  return directory ? `${directory}/${command}` : null;
}
