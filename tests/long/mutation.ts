import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import type { MutantResult, PartialStrykerOptions } from '@stryker-mutator/api/core';
import Stryker from '@stryker-mutator/core';

/**
 * Mutation testing of what the verdicts rest on: every mutant must fail a test of its own directory's set. One
 * directory with its name, some files with `--mutate GLOB`, unchanged results kept with `--incremental`.
 */
const PARTS = {
  numerics: [
    'tests/rules/numerics/**/*.test.ts',
    'tests/reference/{rounding,statistics,two-samples}.test.ts',
  ],
  calculations: [
    'tests/rules/calculations/**/*.test.ts',
    'tests/reference/{creep-compliance,design-point-and-strength,in-place-density,volumetrics}.test.ts',
    'tests/reference/gradation.test.ts',
  ],
  engine: [
    'tests/rules/{engine,consistency}/**/*.test.ts',
    'tests/cases/**/*.test.ts',
    'tests/reference/{gradation,room-to-move,shipped-rules}.test.ts',
    'tests/second-evaluator/settled-disagreements.test.ts',
  ],
};
type Part = keyof typeof PARTS;
const LEAST_SCORE = 90;

const { values, positionals } = parseArgs({
  options: {
    mutate: { type: 'string', multiple: true },
    concurrency: { type: 'string', default: '2' },
    incremental: { type: 'boolean', default: false },
  },
  allowPositionals: true,
});
const known = Object.keys(PARTS) as Part[];
const unknown = positionals.filter((each) => !known.some((part) => part === each));
if (unknown.length > 0)
  throw new Error(`There is no part ${unknown.join(', ')}; there is ${known.join(', ')}.`);

const summaries: string[] = [];
for (const part of known.filter((each) => positionals.length === 0 || positionals.includes(each))) {
  process.env.MUTATION_TESTS = JSON.stringify(PARTS[part]);
  const begun = Date.now();
  const results = await new Stryker(optionsFor(part)).runMutationTest();
  summaries.push(summary(part, results, Math.round((Date.now() - begun) / 1000)));
}
console.log(`\n${summaries.join('\n')}`);

function optionsFor(part: Part): PartialStrykerOptions {
  const loader = ['--import', 'tsx'];
  return {
    mutate: values.mutate ?? [`rules/${part}/**/*.ts`],
    testRunner: 'kept-vitest',
    plugins: [fileURLToPath(new URL('./mutation/kept-vitest-runner.ts', import.meta.url))],
    testRunnerNodeArgs: loader,
    checkerNodeArgs: loader,
    vitest: { configFile: 'tests/long/mutation/vitest.config.ts', related: false },
    coverageAnalysis: 'perTest',
    concurrency: Number(values.concurrency),
    incremental: values.incremental,
    incrementalFile: `.data/mutation/${part}-incremental.json`,
    // The compiler of this project has no interface that Stryker could read its settings with.
    tsconfigFile: 'none',
    tempDirName: `.data/mutation/${part}`,
    ignorePatterns: ['/*', '!/package.json', '!/rules', '!/shared', '!/tests', '/tests/{api,e2e,server,web}'],
    reporters: ['progress-append-only', 'clear-text', 'json'],
    jsonReporter: { fileName: `.data/mutation/${part}.json` },
    clearTextReporter: { allowColor: false, logTests: false, reportTests: false },
    allowConsoleColors: false,
    allowEmpty: false,
  };
}

/** What no test reaches counts as survived, what a comment disables is told beside the score. */
function summary(part: Part, results: MutantResult[], seconds: number): string {
  const count = (...statuses: MutantResult['status'][]) =>
    results.filter(({ status }) => statuses.includes(status)).length;
  const caught = count('Killed', 'Timeout');
  const missed = count('Survived', 'NoCoverage');
  const score = (100 * caught) / (caught + missed);
  if (!(score >= LEAST_SCORE)) process.exitCode = 1;
  return (
    `${part}: ${score.toFixed(1)} % of ${caught + missed} mutants caught in ${seconds} s: ${count('Killed')} killed, ` +
    `${count('Timeout')} timed out, ${count('Survived')} survived, ${count('NoCoverage')} not covered; ` +
    `${count('Ignored')} disabled with a reason, ${count('CompileError', 'RuntimeError')} not to be run`
  );
}
