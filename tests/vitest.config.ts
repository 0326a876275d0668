import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const root = new URL('..', import.meta.url).pathname;

export default defineConfig({
  root,
  plugins: [react()],
  test: {
    // By default one core would stay idle, of the two that every machine for this has.
    maxWorkers: 2,
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: [
            'tests/{rules,shared,server,web,reference,cases,workbooks,second-evaluator}/**/*.test.{ts,tsx}',
          ],
          setupFiles: ['tests/setup/fail-on-console.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'api',
          // Each file has a database of its own and nothing else to share; loading the server once saves minutes.
          isolate: false,
          include: ['tests/api/**/*.test.ts'],
          setupFiles: ['tests/setup/fail-on-console.ts'],
          globalSetup: ['tests/setup/database.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
