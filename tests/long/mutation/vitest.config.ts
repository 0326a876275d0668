import { defineConfig } from 'vitest/config';
import { LikeliestFirst } from './likeliest-first';

/** Unit tests without projects, those that the run names: Stryker's runner sets pool and workers itself. */
export default defineConfig({
  root: new URL('../../..', import.meta.url).pathname,
  test: {
    include: (process.env.MUTATION_TESTS ?? 'tests/rules/**/*.test.ts').split(','),
    setupFiles: ['tests/long/mutation/fresh-counts.ts', 'tests/setup/fail-on-console.ts'],
    sequence: { sequencer: LikeliestFirst },
  },
});
