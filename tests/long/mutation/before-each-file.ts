import fc from 'fast-check';

/**
 * A kept thread remembers what an earlier run counted. What is computed on import or while tests are collected would
 * be held against the hit limit of this mutant, and what an earlier file covered would be laid to this one.
 */
const counters = globalThis as { __stryker__?: { hitCount?: number; mutantCoverage?: unknown } };
if (counters.__stryker__) {
  counters.__stryker__.hitCount = 0;
  delete counters.__stryker__.mutantCoverage;
}

// That one draw fails is enough here; the smallest one is sought where a person reads it.
fc.configureGlobal({ endOnFailure: true });
