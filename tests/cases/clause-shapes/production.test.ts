import { aReading } from '#tests/builders/a-reading';
import { attributes } from '#tests/builders/a-record';
import { ALWAYS, describeShape } from './describe-shape';
import { doubtAbout, reading, rule, specimens, toLimit } from './parts';

const passing = 'percent-passing';
const production = { trial: 'production' };
const target = (sieve: number, value: number) => reading(passing, value, { sieve });
const produced = (sieve: number, value: number) =>
  aReading({ quantity: passing, value, at: { ...production, sieve } });
const binder = (value: number, trial = 'design') =>
  aReading({ quantity: 'binder-content', value, at: { trial } });

/** Invented figures, as in the clause: 6 for 4.75 mm, 0.4 for binder. */
describeShape('4.3.1 a tolerance about the job-mix target', {
  rules: [
    rule('passing', {
      measure: { kind: 'reading', quantity: passing, at: { ...production, sieve: 4.75 } },
      limit: { target: { quantity: passing, at: { sieve: 4.75 } }, tolerance: 6 },
    }),
    rule('binder', {
      measure: { kind: 'reading', quantity: 'binder-content', at: production },
      limit: { target: { quantity: 'binder-content' }, tolerance: '0.4' },
    }),
  ],
  cases: [
    {
      title: 'both within',
      record: { readings: [target(4.75, 60), produced(4.75, 63), binder(5.2), binder(5.5, 'production')] },
      expected: { passing: 'pass', binder: 'pass' },
    },
    {
      title: 'both on the limit',
      record: { readings: [target(4.75, 60), produced(4.75, 66), binder(5.2), binder(4.8, 'production')] },
      expected: { passing: 'pass', binder: 'pass' },
    },
    {
      title: 'both outside',
      record: { readings: [target(4.75, 60), produced(4.75, 66.1), binder(5.2), binder(5.61, 'production')] },
      expected: { passing: 'fail', binder: 'fail' },
    },
    {
      title: 'nothing produced is not shown',
      record: { readings: [target(4.75, 60), binder(5.2)] },
      expected: { passing: 'not shown', binder: 'not shown' },
    },
    {
      title: 'no target is not shown either',
      record: { readings: [produced(4.75, 60), binder(5.2, 'production')] },
      expected: { passing: 'not shown', binder: 'not shown' },
    },
    {
      title: 'a target in doubt is undecided',
      record: {
        readings: [produced(4.75, 60), binder(5.2, 'production')],
        doubts: [doubtAbout(passing, { sieve: 4.75 }), doubtAbout('binder-content')],
      },
      expected: { passing: 'undecided', binder: 'undecided' },
    },
  ],
  impossible: { passing: { 'not applicable': ALWAYS }, binder: { 'not applicable': ALWAYS } },
});

/*
 * Target 55 ± 6 with control points 28 and 58: preliminary 49 to 61, final 49 to 58 (Washington State amendments, job
 * mix formula tolerances, with AASHTO M 323's control points for 12.5 mm). What lies within the moved limits lies
 * within both, and the other way round, so two rules carry the clause.
 */
describeShape('4.3.2 a derived limit in two steps', {
  rules: [
    rule('tolerance', {
      measure: { kind: 'reading', quantity: passing, at: { ...production, sieve: 2.36 } },
      limit: { target: { quantity: passing, at: { sieve: 2.36 } }, tolerance: 6 },
    }),
    rule('control', {
      measure: { kind: 'gradation', at: production, table: 'control-points' },
      limit: {
        min: { table: 'control-points', column: 'min' },
        max: { table: 'control-points', column: 'max' },
      },
    }),
  ],
  edition: {
    tables: [
      {
        id: 'control-points',
        keys: ['nominalMaximumSize', 'sieve'],
        columns: [
          { name: 'min', unit: '%' },
          { name: 'max', unit: '%' },
        ],
        rows: [{ nominalMaximumSize: 12.5, sieve: 2.36, min: 28, max: 58 }],
      },
    ],
  },
  cases: [
    ...(
      [
        [49, 'pass', 'pass'],
        [48.9, 'fail', 'pass'],
        [58, 'pass', 'pass'],
        [58.1, 'pass', 'fail'],
        [61.1, 'fail', 'fail'],
      ] as const
    ).map(([value, tolerance, control]) => ({
      title: `${value} is ${tolerance === 'pass' && control === 'pass' ? 'inside' : 'outside'} 49 to 58`,
      record: {
        attributes: attributes({ nominalMaximumSize: 12.5 }),
        readings: [target(2.36, 55), produced(2.36, value)],
      },
      expected: { tolerance, 'control~2.36 mm': control },
    })),
    {
      title: '61 is on the preliminary limit, outside the final one',
      record: {
        attributes: attributes({ nominalMaximumSize: 12.5 }),
        readings: [target(2.36, 55), produced(2.36, 61)],
      },
      expected: { tolerance: 'pass', 'control~2.36 mm': 'fail' },
    },
    {
      title: 'no gradation is not shown',
      record: { attributes: attributes({ nominalMaximumSize: 12.5 }) },
      expected: { tolerance: 'not shown', control: 'not shown' },
    },
    {
      title: 'no size and a target in doubt are undecided',
      record: { readings: [produced(2.36, 50)], doubts: [doubtAbout(passing, { sieve: 2.36 })] },
      expected: { tolerance: 'undecided', control: 'undecided' },
    },
  ],
  impossible: { tolerance: { 'not applicable': ALWAYS }, control: { 'not applicable': ALWAYS } },
});

/*
 * UFGS 02749, table 6: No. 4, individual action 6 and suspension 8, average of four 4 and 5. Action is advisory,
 * suspension required. The record holds the last four results and no more: a rule cannot pick them by date.
 */
const four = (values: number[]) =>
  values.map((value, i) =>
    aReading({ quantity: passing, value, at: { ...production, sieve: 4.75, specimen: String(i + 1) } }),
  );
const around = (plus: number) => ({ quantity: passing, at: { sieve: 4.75 }, plus });
const running = (individual: number, average: number) => ({
  measure: {
    kind: 'reading' as const,
    quantity: passing,
    at: { ...production, sieve: 4.75 },
    minimumCount: 4,
    alsoEach: { min: around(-individual), max: around(individual) },
  },
  limit: { target: around(0), tolerance: average },
});

describeShape('4.3.3 single result and running average', {
  rules: [rule('action', { severity: 'advisory', ...running(6, 4) }), rule('suspension', running(8, 5))],
  cases: [
    {
      title: 'all near the target',
      record: { readings: [target(4.75, 60), ...four([60, 62, 59, 61])] },
      expected: { action: 'pass', suspension: 'pass' },
    },
    {
      title: 'on the average of the action level, and on the single one',
      record: { readings: [target(4.75, 60), ...four([62, 64, 64, 66])] },
      expected: { action: 'pass', suspension: 'pass' },
    },
    {
      title: 'one single result beyond action',
      record: { readings: [target(4.75, 60), ...four([60, 60, 60, 66.5])] },
      expected: { action: 'fail', suspension: 'pass' },
    },
    {
      title: 'the average on the suspension level',
      record: { readings: [target(4.75, 60), ...four([65, 65, 65, 65])] },
      expected: { action: 'fail', suspension: 'pass' },
    },
    {
      title: 'one single result beyond suspension',
      record: { readings: [target(4.75, 60), ...four([60, 60, 60, 51.9])] },
      expected: { action: 'fail', suspension: 'fail' },
    },
    {
      title: 'three results are too few',
      record: { readings: [target(4.75, 60), ...four([60, 62, 59])] },
      expected: { action: 'undecided', suspension: 'undecided' },
    },
    {
      title: 'no result is not shown',
      record: { readings: [target(4.75, 60)] },
      expected: { action: 'not shown', suspension: 'not shown' },
    },
  ],
  impossible: { action: { 'not applicable': ALWAYS }, suspension: { 'not applicable': ALWAYS } },
});

/*
 * UFC 3-250-03: at least three specimens at each of at least five binder contents. The specimens of one named trial
 * can be counted; how many trials there are, and how many on either side of the estimate, cannot.
 */
describeShape('4.4.1 a minimum number', {
  rules: ['A', 'B'].map((trial) =>
    rule(`specimens-${trial}`, {
      measure: { kind: 'reading', quantity: 'bulk-specific-gravity-mix', at: { trial }, statistic: 'count' },
      limit: { min: 3 },
    }),
  ),
  cases: [
    {
      title: 'three at one content, two at the other',
      record: {
        readings: [
          ...specimens('bulk-specific-gravity-mix', [2.4, 2.41, 2.4], { trial: 'A' }),
          ...specimens('bulk-specific-gravity-mix', [2.4, 2.41], { trial: 'B' }),
        ],
      },
      expected: { 'specimens-A': 'pass', 'specimens-B': 'fail' },
    },
    {
      title: 'the other way round',
      record: {
        readings: [
          ...specimens('bulk-specific-gravity-mix', [2.4, 2.41], { trial: 'A' }),
          ...specimens('bulk-specific-gravity-mix', [2.4, 2.41, 2.39, 2.4], { trial: 'B' }),
        ],
      },
      expected: { 'specimens-A': 'fail', 'specimens-B': 'pass' },
    },
    {
      title: 'three at the other',
      record: { readings: specimens('bulk-specific-gravity-mix', [2.4, 2.41, 2.39], { trial: 'B' }) },
      expected: { 'specimens-A': 'not shown', 'specimens-B': 'pass' },
    },
    {
      title: 'none at the other',
      record: { readings: specimens('bulk-specific-gravity-mix', [2.4, 2.41, 2.39], { trial: 'A' }) },
      expected: { 'specimens-A': 'pass', 'specimens-B': 'not shown' },
    },
    {
      title: 'cells in doubt at both',
      record: {
        doubts: [
          doubtAbout('bulk-specific-gravity-mix', { trial: 'A' }),
          doubtAbout('bulk-specific-gravity-mix', { trial: 'B' }),
        ],
      },
      expected: { 'specimens-A': 'undecided', 'specimens-B': 'undecided' },
    },
  ],
  impossible: { 'specimens-A': { 'not applicable': ALWAYS }, 'specimens-B': { 'not applicable': ALWAYS } },
});

const dry = 'tensile-strength-dry';

/** 90 % of 690 kPa is 621 kPa. */
describeShape('4.4.2 an average with a floor for singles', {
  rules: [
    rule('strength', {
      measure: { kind: 'reading', quantity: dry, minimumCount: 3, alsoEach: { min: 621 } },
      limit: { min: 690 },
    }),
  ],
  cases: [
    {
      title: 'all above',
      record: { readings: specimens(dry, [700, 710, 720]) },
      expected: { strength: 'pass' },
    },
    {
      title: 'the mean on the limit, a single one on its floor',
      record: { readings: specimens(dry, [621, 729, 720]) },
      expected: { strength: 'pass' },
    },
    {
      title: 'the mean high enough, a single one below its floor',
      record: { readings: specimens(dry, [620, 800, 800]) },
      expected: { strength: 'fail' },
    },
    {
      title: 'the mean too low',
      record: { readings: specimens(dry, [680, 690, 690]) },
      expected: { strength: 'fail' },
    },
    {
      title: 'two are too few',
      record: { readings: specimens(dry, [700, 710]) },
      expected: { strength: 'undecided' },
    },
    { title: 'none is not shown', record: {}, expected: { strength: 'not shown' } },
  ],
  impossible: { strength: { 'not applicable': ALWAYS } },
});

const gmm = 'maximum-specific-gravity';

/*
 * Two rules: the duplicates agree within 0.011, and their mean is used. That the second waits for the first is said
 * by its reader, not by the format.
 */
describeShape('4.4.3 agreement before averaging', {
  rules: [
    rule('agreement', {
      measure: { kind: 'reading', quantity: gmm, statistic: 'range', minimumCount: 2 },
      limit: { max: '0.011' },
    }),
    rule('mean', {
      measure: { kind: 'reading', quantity: gmm, minimumCount: 2 },
      limit: { min: '2.450', max: '2.550' },
    }),
  ],
  cases: [
    {
      title: 'apart by 0.011, which is included',
      record: { readings: specimens(gmm, [2.5, 2.511]) },
      expected: { agreement: 'pass', mean: 'pass' },
    },
    {
      title: 'apart by 0.012',
      record: { readings: specimens(gmm, [2.5, 2.512]) },
      expected: { agreement: 'fail', mean: 'pass' },
    },
    {
      title: 'a mean on the limit',
      record: { readings: specimens(gmm, [2.55, 2.55]) },
      expected: { agreement: 'pass', mean: 'pass' },
    },
    {
      title: 'a mean outside',
      record: { readings: specimens(gmm, [2.56, 2.56]) },
      expected: { agreement: 'pass', mean: 'fail' },
    },
    {
      title: 'one result has no range',
      record: { readings: specimens(gmm, [2.5]) },
      expected: { agreement: 'undecided', mean: 'undecided' },
    },
    { title: 'none is not shown', record: {}, expected: { agreement: 'not shown', mean: 'not shown' } },
  ],
  impossible: { agreement: { 'not applicable': ALWAYS }, mean: { 'not applicable': ALWAYS } },
});

/** Percent compaction and its quality; all invented. */
describeShape('percent within limits, and the agency against the contractor', {
  rules: [
    rule('quality', {
      measure: {
        kind: 'reading',
        quantity: 'field-density',
        statistic: 'percent-within-limits',
        within: { min: 92 },
      },
      limit: { min: 90 },
      rounding: toLimit,
    }),
    rule('split-samples', {
      measure: { kind: 'difference', quantity: 'field-density', between: ['contractor', 'agency'] },
      limit: { max: '1.0' },
      rounding: toLimit,
    }),
  ],
  cases: [
    {
      title: 'all within, and both agree to 1.0',
      record: {
        readings: [
          ...specimens('field-density', [94, 94, 94, 94]),
          reading('field-density', 93, { laboratory: 'agency' }),
        ],
      },
      expected: { quality: 'pass', 'split-samples': 'pass' },
    },
    {
      // n = 4: PWL is linear in Q, 50 + 100·Q/3. Mean 93, s = √2, Q = 0.7071: 73.6 %.
      title: 'too many below, and both apart',
      record: {
        readings: [
          ...specimens('field-density', [91.5, 92.2, 93.6, 94.7]),
          reading('field-density', 95, { laboratory: 'agency' }),
        ],
      },
      expected: { quality: 'fail', 'split-samples': 'fail' },
    },
    {
      // Q = 1.2: 50 + 100·1.2/3 = 90. Mean 93.2 with s = 1: values 93.2 ± √0.75 in pairs.
      title: 'exactly 90 % within',
      record: {
        readings: [
          ...specimens('field-density', [
            93.2 - 0.75 ** 0.5,
            93.2 - 0.75 ** 0.5,
            93.2 + 0.75 ** 0.5,
            93.2 + 0.75 ** 0.5,
          ]),
          reading('field-density', 93.2, { laboratory: 'agency' }),
        ],
      },
      expected: { quality: 'pass', 'split-samples': 'pass' },
    },
    {
      title: 'two results are too few for a percentage',
      record: { readings: specimens('field-density', [94, 95]) },
      expected: { quality: 'undecided', 'split-samples': 'not shown' },
    },
    {
      title: 'nothing is not shown',
      record: {},
      expected: { quality: 'not shown', 'split-samples': 'not shown' },
    },
    {
      title: "a doubt in the agency's result leaves the comparison open",
      record: {
        readings: specimens('field-density', [94, 94, 94]),
        doubts: [doubtAbout('field-density', { laboratory: 'agency' })],
      },
      expected: { quality: 'pass', 'split-samples': 'undecided' },
    },
  ],
  impossible: { quality: { 'not applicable': ALWAYS }, 'split-samples': { 'not applicable': ALWAYS } },
});
