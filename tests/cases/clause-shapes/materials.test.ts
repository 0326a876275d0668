import { aReading } from '#tests/builders/a-reading';
import { attributes } from '#tests/builders/a-record';
import { ALWAYS, describeShape, NO_NUMBER } from './describe-shape';
import { doubtAbout, reading, rule, specimens, toLimit } from './parts';

const rut = 'wheel-track-rut-depth';

/** Tex-242-F: specimens moulded to 93 ± 1 % Gmm, so 6.0 to 8.0 % voids; the depth of 12.5 mm is invented. */
describeShape('4.4.4 test validity', {
  rules: [
    rule('rut-depth', {
      measure: { kind: 'reading', quantity: rut, where: [{ quantity: 'air-voids', min: '6.0', max: '8.0' }] },
      limit: { max: 12.5 },
    }),
  ],
  cases: [
    {
      title: 'both specimens count',
      record: { readings: [...specimens(rut, [10, 12]), ...specimens('air-voids', [6, 8])] },
      expected: { 'rut-depth': 'pass' },
    },
    {
      title: 'the mean is on the limit',
      record: { readings: [...specimens(rut, [12, 13]), ...specimens('air-voids', [7, 7])] },
      expected: { 'rut-depth': 'pass' },
    },
    {
      title: 'only the deeper one counts',
      record: { readings: [...specimens(rut, [5, 13]), ...specimens('air-voids', [8.1, 7])] },
      expected: { 'rut-depth': 'fail' },
    },
    {
      title: 'none counts',
      record: { readings: [...specimens(rut, [5, 6]), ...specimens('air-voids', [5.9, 8.1])] },
      expected: { 'rut-depth': 'not shown' },
    },
    {
      title: 'the voids of one are not known',
      record: { readings: [...specimens(rut, [5, 6]), ...specimens('air-voids', [7])] },
      expected: { 'rut-depth': 'undecided' },
    },
    {
      title: 'nothing is tested',
      record: { readings: specimens('air-voids', [7]) },
      expected: { 'rut-depth': 'not shown' },
    },
  ],
  impossible: { 'rut-depth': { 'not applicable': ALWAYS } },
});

const ratio = (value: number) => [reading('recycled-binder-ratio', value)];
const ratioIs = (operator: 'greaterThan' | 'greaterThanInclusive' | 'lessThanInclusive', value: number) => ({
  fact: 'quantity',
  params: { quantity: 'recycled-binder-ratio', at: {} },
  operator,
  value,
});
const open = { title: 'nothing is known of recycled binder', record: {} };

describeShape('4.5.1 conditional on recycled content', {
  rules: [
    rule('blending-chart', {
      when: ratioIs('greaterThan', 0.25),
      measure: { kind: 'document', type: 'blending-chart' },
      limit: { present: true },
    }),
    rule('recovered-grade', {
      when: ratioIs('greaterThan', 0.25),
      measure: { kind: 'attribute', attribute: 'recoveredGrade' },
      limit: { present: true },
    }),
    rule('one-grade-softer', {
      when: { all: [ratioIs('greaterThanInclusive', 0.15), ratioIs('lessThanInclusive', 0.25)] },
      measure: { kind: 'attribute', attribute: 'binderGrade' },
      limit: { oneOf: { table: 'softer', column: 'grade' } },
    }),
  ],
  edition: {
    attributes: [
      { name: 'specifiedGrade', type: 'text' },
      { name: 'recoveredGrade', type: 'text' },
    ],
    documents: [{ type: 'blending-chart', label: 'Blending chart' }],
    tables: [
      {
        id: 'softer',
        keys: ['specifiedGrade'],
        columns: [{ name: 'grade' }],
        rows: [{ specifiedGrade: 'PG 64-22', grade: 'PG 58-28' }],
      },
    ],
  },
  cases: [
    {
      title: 'above 0.25 with all papers',
      record: {
        attributes: attributes({ recoveredGrade: 'PG 82-10' }),
        readings: ratio(0.251),
        documents: [{ type: 'blending-chart' }],
      },
      expected: { 'blending-chart': 'pass', 'recovered-grade': 'pass', 'one-grade-softer': 'not applicable' },
    },
    {
      title: 'above 0.25 without',
      record: { readings: ratio(0.3) },
      expected: {
        'blending-chart': 'not shown',
        'recovered-grade': 'not shown',
        'one-grade-softer': 'not applicable',
      },
    },
    {
      title: 'exactly 0.25 asks for a softer grade only',
      record: {
        attributes: attributes({ specifiedGrade: 'PG 64-22', binderGrade: 'PG 58-28' }),
        readings: ratio(0.25),
      },
      expected: {
        'blending-chart': 'not applicable',
        'recovered-grade': 'not applicable',
        'one-grade-softer': 'pass',
      },
    },
    {
      title: 'exactly 0.15 asks for it too',
      record: {
        attributes: attributes({ specifiedGrade: 'PG 64-22', binderGrade: 'PG 64-22' }),
        readings: ratio(0.15),
      },
      expected: {
        'blending-chart': 'not applicable',
        'recovered-grade': 'not applicable',
        'one-grade-softer': 'fail',
      },
    },
    {
      title: 'the grade is missing',
      record: { attributes: attributes({ specifiedGrade: 'PG 64-22' }), readings: ratio(0.2) },
      expected: {
        'blending-chart': 'not applicable',
        'recovered-grade': 'not applicable',
        'one-grade-softer': 'not shown',
      },
    },
    {
      ...open,
      expected: {
        'blending-chart': 'undecided',
        'recovered-grade': 'undecided',
        'one-grade-softer': 'undecided',
      },
    },
  ],
  impossible: {
    'blending-chart': {
      fail: 'A document without a date to hold is there or not shown.',
      'at the limit': NO_NUMBER,
    },
    'recovered-grade': { fail: 'Any grade will do.', 'at the limit': NO_NUMBER },
    'one-grade-softer': { 'at the limit': NO_NUMBER },
  },
});

const speed = (value: string) => ({ fact: 'trafficSpeed', operator: 'equal' as const, value });
const grade = { kind: 'attribute' as const, attribute: 'binderGrade' };

describeShape('4.5.2 categorical', {
  rules: [
    rule('grade', {
      when: { not: speed('slow') },
      measure: grade,
      limit: { oneOf: ['PG 64-22', 'PG 70-22'] },
    }),
    rule('grade-for-slow', {
      when: speed('slow'),
      measure: grade,
      limit: { oneOf: ['PG 70-22', 'PG 76-22'] },
    }),
  ],
  edition: { attributes: [{ name: 'trafficSpeed', type: 'text', values: ['standard', 'slow'] }] },
  cases: [
    {
      title: 'a listed grade',
      record: { attributes: attributes({ trafficSpeed: 'standard', binderGrade: 'pg 64 - 22' }) },
      expected: { grade: 'pass', 'grade-for-slow': 'not applicable' },
    },
    {
      title: 'another grade',
      record: { attributes: attributes({ trafficSpeed: 'standard', binderGrade: 'PG 58-28' }) },
      expected: { grade: 'fail', 'grade-for-slow': 'not applicable' },
    },
    {
      title: 'not stiff enough for slow traffic',
      record: { attributes: attributes({ trafficSpeed: 'slow', binderGrade: 'PG 64-22' }) },
      expected: { grade: 'not applicable', 'grade-for-slow': 'fail' },
    },
    {
      title: 'stiff enough for slow traffic',
      record: { attributes: attributes({ trafficSpeed: 'slow', binderGrade: 'PG 76-22' }) },
      expected: { grade: 'not applicable', 'grade-for-slow': 'pass' },
    },
    {
      title: 'no grade',
      record: { attributes: attributes({ trafficSpeed: 'standard' }) },
      expected: { grade: 'not shown', 'grade-for-slow': 'not applicable' },
    },
    {
      title: 'no grade for slow traffic',
      record: { attributes: attributes({ trafficSpeed: 'slow' }) },
      expected: { grade: 'not applicable', 'grade-for-slow': 'not shown' },
    },
    {
      title: 'no speed',
      record: { attributes: attributes({ binderGrade: 'PG 64-22' }) },
      expected: { grade: 'undecided', 'grade-for-slow': 'undecided' },
    },
  ],
  impossible: { grade: { 'at the limit': NO_NUMBER }, 'grade-for-slow': { 'at the limit': NO_NUMBER } },
});

/*
 * Colorado CPL 5112: 40, 45, 50, 55 °C for PG 52, 58, 64, 70; the depth is invented. A condition of the test is a
 * number in the rule, so each temperature is a rule.
 */
const temperatures = { 52: 40, 58: 45, 64: 50, 70: 55 } as const;
const tested = (value: number, temperature: number) =>
  aReading({ quantity: rut, value, at: { trial: 'design', temperature } });
const only = (high: number, outcome: 'pass' | 'fail' | 'not shown' | 'undecided') =>
  Object.fromEntries(
    Object.keys(temperatures).map((each) => [
      `rut-${each}`,
      Number(each) === high ? outcome : ('not applicable' as const),
    ]),
  );

describeShape('4.5.3 a test condition from an attribute', {
  rules: Object.entries(temperatures).map(([high, temperature]) =>
    rule(`rut-${high}`, {
      when: { fact: 'highGrade', operator: 'equal', value: Number(high) },
      measure: { kind: 'reading', quantity: rut, at: { temperature } },
      limit: { max: '12.5' },
    }),
  ),
  edition: { attributes: [{ name: 'highGrade', type: 'number', unit: '°C', values: [52, 58, 64, 70] }] },
  cases: [
    ...Object.entries(temperatures).flatMap(([high, temperature]) => {
      const own = attributes({ highGrade: Number(high) });
      return [
        {
          title: `PG ${high} at ${temperature} °C, on the limit`,
          record: { attributes: own, readings: [tested(12.5, temperature)] },
          expected: only(Number(high), 'pass'),
        },
        {
          title: `PG ${high} too deep`,
          record: { attributes: own, readings: [tested(12.6, temperature), tested(1, temperature + 10)] },
          expected: only(Number(high), 'fail'),
        },
        {
          title: `PG ${high} tested at another temperature`,
          record: { attributes: own, readings: [tested(5, temperature + 0.6)] },
          expected: only(Number(high), 'not shown'),
        },
        {
          title: `PG ${high} without a temperature`,
          record: { attributes: own, readings: [reading(rut, 5)] },
          expected: only(Number(high), 'undecided'),
        },
      ];
    }),
  ],
});

/** Tex-242-F: 10,000, 15,000, 20,000 passes at 12.5 mm for PG 64, 70, 76. */
const passes = 'passes-to-rut-depth';
const forGrade = (binderGrade: string) => attributes({ binderGrade });

describeShape('4.5.4 passes to a depth', {
  rules: [
    rule('passes', {
      measure: { kind: 'reading', quantity: passes },
      limit: { min: { table: 'passes', column: 'min' } },
    }),
  ],
  edition: {
    tables: [
      {
        id: 'passes',
        keys: ['binderGrade'],
        columns: [{ name: 'min', unit: 'passes' }],
        rows: [
          { binderGrade: 'PG 64-22', min: 10000 },
          { binderGrade: 'PG 70-22', min: 15000 },
          { binderGrade: 'PG 76-22', min: 20000 },
        ],
      },
    ],
  },
  cases: [
    {
      title: '10,000 for PG 64-22',
      record: { attributes: forGrade('PG 64-22'), readings: [reading(passes, 10000)] },
      expected: { passes: 'pass' },
    },
    {
      title: '14,999 for PG 70-22',
      record: { attributes: forGrade('PG 70-22'), readings: [reading(passes, 14999)] },
      expected: { passes: 'fail' },
    },
    {
      title: 'more than 20,000, the end of the test, for PG 76-22',
      record: {
        attributes: forGrade('PG 76-22'),
        readings: [aReading({ quantity: passes, value: 20000, qualifier: '>' })],
      },
      expected: { passes: 'pass' },
    },
    {
      title: 'more than 15,000 does not tell for PG 76-22',
      record: {
        attributes: forGrade('PG 76-22'),
        readings: [aReading({ quantity: passes, value: 15000, qualifier: '>' })],
      },
      expected: { passes: 'undecided' },
    },
    { title: 'no test', record: { attributes: forGrade('PG 76-22') }, expected: { passes: 'not shown' } },
  ],
  impossible: { passes: { 'not applicable': ALWAYS } },
});

const mixVoids = 'voids-in-coarse-aggregate-mix';
const rodded = 'voids-in-coarse-aggregate-dry-rodded';
const sieves = (p236: number, p06: number, p0075: number) => [
  reading('percent-passing', p236, { sieve: 2.36 }),
  reading('percent-passing', p06, { sieve: 0.6 }),
  reading('percent-passing', p0075, { sieve: 0.075 }),
];

/*
 * VCA 37.067 of the mix against 42.106 dry-rodded (AASHTO R 46, its equations); the sand ratio of a published
 * gradation, 42.4, 19.8 and 6.3 % passing No. 8, 30 and 200, is 37.4 % (Field Manual for Hot Mix Asphalt, p. 16).
 */
describeShape('4.6.3 a ratio and a derived quantity', {
  rules: [
    rule('stone-on-stone', {
      measure: { kind: 'reading', quantity: mixVoids },
      limit: { max: { quantity: rodded, exclusive: true } },
    }),
    rule('sand-ratio', {
      measure: { kind: 'formula', expression: '100*(P0.6 - P0.075)/(P2.36 - P0.075)', unit: '%' },
      limit: { max: '50.0' },
      rounding: toLimit,
    }),
  ],
  cases: [
    {
      title: 'the published mix',
      record: { readings: [reading(mixVoids, 37.067), reading(rodded, 42.106), ...sieves(42.4, 19.8, 6.3)] },
      expected: { 'stone-on-stone': 'pass', 'sand-ratio': 'pass' },
    },
    // (23 − 5)/(41 − 5) = 50 %
    {
      title: 'voids that are equal fail, a ratio of 50 passes',
      record: { readings: [reading(mixVoids, 42.1), reading(rodded, 42.1), ...sieves(41, 23, 5)] },
      expected: { 'stone-on-stone': 'fail', 'sand-ratio': 'pass' },
    },
    {
      title: 'a ratio above 50',
      record: { readings: [reading(mixVoids, 42), reading(rodded, 42.1), ...sieves(41, 24, 5)] },
      expected: { 'stone-on-stone': 'pass', 'sand-ratio': 'fail' },
    },
    {
      title: 'one of the two is missing',
      record: { readings: [reading(mixVoids, 40), reading('percent-passing', 40, { sieve: 2.36 })] },
      expected: { 'stone-on-stone': 'not shown', 'sand-ratio': 'not shown' },
    },
    {
      title: 'one of the two is in doubt, or nothing to divide by',
      record: { readings: [reading(mixVoids, 40), ...sieves(5, 5, 5)], doubts: [doubtAbout(rodded)] },
      expected: { 'stone-on-stone': 'undecided', 'sand-ratio': 'undecided' },
    },
  ],
  impossible: { 'stone-on-stone': { 'not applicable': ALWAYS }, 'sand-ratio': { 'not applicable': ALWAYS } },
});
