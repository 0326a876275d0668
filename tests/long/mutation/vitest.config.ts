import { defineConfig } from 'vitest/config';
import { LikeliestFirst } from './likeliest-first';

/** Unit tests without projects, those that the run names: Stryker's runner sets pool and workers itself. */
export default defineConfig({
  root: new URL('../../..', import.meta.url).pathname,
  test: {
    include: JSON.parse(process.env.MUTATION_TESTS ?? '["tests/rules/**/*.test.ts"]'),
    setupFiles: ['tests/long/mutation/before-each-file.ts', 'tests/setup/fail-on-console.ts'],
    // A slow machine must not pass for a caught mutant; what never ends is Stryker's to stop.
    testTimeout: 600_000,
    hookTimeout: 600_000,
    sequence: { sequencer: LikeliestFirst },
  },
});
