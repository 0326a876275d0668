import type { MutantCoverage } from '@stryker-mutator/api/core';

/** What one test file covered: by the test that ran, and on import or while its tests were collected. */
export interface FileCoverage {
  testIds: string[];
  coverage: MutantCoverage;
}

export interface CoverageByTest {
  mutantCoverage: MutantCoverage;
  /** Mutants that no running test reached: constants of a module, and what tests compute while they are collected. */
  onlyBeforeTests: string[];
}

/**
 * Coverage with nothing left that every test would have to run for. What a file reaches before its tests begin is
 * laid to all tests of that file: each run loads the file anew under the mutant, so they see it from the start.
 */
export function coverageByTest(files: FileCoverage[]): CoverageByTest {
  const perTest: MutantCoverage['perTest'] = {};
  const before = new Set<string>();
  const during = new Set<string>();
  for (const { testIds, coverage } of files) {
    for (const id of testIds) perTest[id] = { ...coverage.perTest[id] };
    for (const [mutant, hits] of Object.entries(coverage.static)) {
      before.add(mutant);
      for (const [place, id] of testIds.entries()) add(perTest[id]!, mutant, place === 0 ? hits : 1);
    }
    for (const hitsByMutant of Object.values(coverage.perTest)) {
      for (const mutant of Object.keys(hitsByMutant)) during.add(mutant);
    }
  }
  return {
    mutantCoverage: { static: {}, perTest },
    onlyBeforeTests: [...before].filter((mutant) => !during.has(mutant)),
  };
}

function add(hitsByMutant: Record<string, number>, mutant: string, hits: number): void {
  hitsByMutant[mutant] = (hitsByMutant[mutant] ?? 0) + hits;
}
