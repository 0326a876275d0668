import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { ensureDebianPackages } from './lib/ensure-debian-packages.mjs';
import { ensurePackages } from './lib/ensure-packages.mjs';
import { inRoot, root } from './lib/paths.mjs';
import { reportAndExit, runCommand } from './lib/run-command.mjs';
import { runValidateSteps } from './lib/validate-steps.mjs';

/** Everything that a change has to pass, from a bare clone; the last line says how it went. */
const results = inRoot('test-results');

try {
  await ensurePackages();
  await ensureDebianPackages(['mariadb-server', 'chromium', 'poppler-utils']);
  rmSync(results, { recursive: true, force: true });
  mkdirSync(results, { recursive: true });
  const counts = [await runValidateSteps(), await vitest('unit'), await vitest('api'), await playwright()];
  const sum = (key) => counts.reduce((total, each) => total + each[key], 0);
  console.log(`\n${sum('passed')} passed, ${sum('failed')} failed`);
  process.exitCode = sum('failed') > 0 ? 1 : 0;
} catch (error) {
  reportAndExit(error);
}

async function vitest(project) {
  console.log(`\n== ${project} tests`);
  const output = path.join(results, `${project}.json`);
  const code = await runCommand(
    inRoot('node_modules/.bin/vitest'),
    [
      ...['run', '--config', 'tests/vitest.config.ts', '--project', project],
      ...['--reporter=dot', '--reporter=json', `--outputFile.json=${output}`],
    ],
    { cwd: root },
  );
  const report = readReport(output);
  // A file that does not even load fails without any test of its own.
  const failed = report ? report.numFailedTests + brokenFiles(report) : 1;
  return { passed: report?.numPassedTests ?? 0, failed: code !== 0 && failed === 0 ? 1 : failed };
}

function brokenFiles(report) {
  return report.testResults.filter((file) => file.status === 'failed' && file.assertionResults.length === 0)
    .length;
}

async function playwright() {
  console.log('\n== browser journeys');
  const output = path.join(results, 'browser.json');
  const code = await runCommand(
    inRoot('node_modules/.bin/playwright'),
    ['test', '--config', 'tests/playwright.config.ts', '--reporter=list,json'],
    { cwd: root, env: { ...process.env, PLAYWRIGHT_JSON_OUTPUT_NAME: output } },
  );
  const stats = readReport(output)?.stats;
  const failed = stats ? stats.unexpected + stats.flaky : 1;
  return { passed: stats?.expected ?? 0, failed: code !== 0 && failed === 0 ? 1 : failed };
}

function readReport(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null;
}
