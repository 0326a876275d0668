import type { MutantCoverage } from '@stryker-mutator/api/core';
import type { Logger } from '@stryker-mutator/api/logging';
import type { Injector, PluginContext } from '@stryker-mutator/api/plugin';
import { commonTokens, declareFactoryPlugin, PluginKind, tokens } from '@stryker-mutator/api/plugin';
import type {
  DryRunOptions,
  DryRunResult,
  MutantRunOptions,
  MutantRunResult,
  TestRunner,
  TestRunnerCapabilities,
} from '@stryker-mutator/api/test-runner';
import { DryRunStatus, MutantRunStatus } from '@stryker-mutator/api/test-runner';
import { strykerPlugins as vitestPlugins } from '@stryker-mutator/vitest-runner';
import type { Vitest } from 'vitest/node';
import { coverageByTest } from './coverage-by-test';
import { endKeptThread, KEPT_THREAD, KeptThread } from './kept-thread';

type VitestRunner = TestRunner & { ctx: Vitest };

/**
 * Stryker's runner for Vitest, with two things changed. A mutant that is reached before tests begin is tried by the
 * files that reach it, from their import on, and not by all tests there are. And the thread is kept between mutants.
 */
class KeptVitestRunner implements TestRunner {
  readonly #vitest: VitestRunner;
  readonly #log: Logger;

  constructor(vitest: VitestRunner, log: Logger) {
    this.#vitest = vitest;
    this.#log = log;
  }

  capabilities(): TestRunnerCapabilities | Promise<TestRunnerCapabilities> {
    return this.#vitest.capabilities();
  }

  async init(): Promise<void> {
    await this.#vitest.init?.();
    for (const { config } of this.#vitest.ctx.projects) {
      config.pool = KEPT_THREAD;
      config.poolRunner = { name: KEPT_THREAD, createPoolWorker: (given) => new KeptThread(given) };
    }
  }

  async dryRun(options: DryRunOptions): Promise<DryRunResult> {
    const result = await this.#vitest.dryRun(options);
    if (result.status !== DryRunStatus.Complete) return result;
    const files = this.#vitest.ctx.state.getFiles().map((file) => {
      const raw = (file.meta as { mutantCoverage?: MutantCoverage }).mutantCoverage;
      const testIds = result.tests.filter(({ fileName }) => fileName === file.filepath).map(({ id }) => id);
      const ofFile = Object.entries(result.mutantCoverage?.perTest ?? {}).filter(([id]) =>
        testIds.includes(id),
      );
      return { testIds, coverage: { static: raw?.static ?? {}, perTest: Object.fromEntries(ofFile) } };
    });
    const { mutantCoverage, onlyBeforeTests } = coverageByTest(files);
    this.#log.info(`${onlyBeforeTests.length} mutants are reached only before tests begin.`);
    return { ...result, mutantCoverage };
  }

  async mutantRun(options: MutantRunOptions): Promise<MutantRunResult> {
    const hitLimit = options.hitLimit && Math.max(LEAST_HIT_LIMIT, options.hitLimit / HIT_LIMIT_SHARE);
    const result = await this.#vitest.mutantRun({ ...options, hitLimit, mutantActivation: 'static' });
    if (result.status !== MutantRunStatus.Survived) return result;
    // A file that cannot be loaded under the mutant has no tests that could fail.
    const broken = this.#vitest.ctx.state.getFiles().find((file) => file.result?.state === 'fail');
    if (!broken) return result;
    return {
      status: MutantRunStatus.Killed,
      killedBy: options.testFilter?.slice(0, 1) ?? [],
      failureMessage: broken.result?.errors?.[0]?.message ?? 'The test file could not be loaded.',
      nrOfTests: result.nrOfTests,
    };
  }

  async dispose(): Promise<void> {
    await this.#vitest.dispose?.();
    await endKeptThread();
  }
}

/** Stryker lets a mutant be reached a hundred times as often as the code was before it ends it: here it is five times. */
const HIT_LIMIT_SHARE = 20;
const LEAST_HIT_LIMIT = 1000;

function createRunner(injector: Injector<PluginContext>, log: Logger): KeptVitestRunner {
  const plugin = vitestPlugins[0];
  if (!plugin) throw new Error('Stryker has no runner for Vitest.');
  return new KeptVitestRunner(injector.injectFunction(plugin.factory) as VitestRunner, log);
}
createRunner.inject = tokens(commonTokens.injector, commonTokens.logger);

export const strykerPlugins = [declareFactoryPlugin(PluginKind.TestRunner, 'kept-vitest', createRunner)];
export { strykerValidationSchema } from '@stryker-mutator/vitest-runner';
