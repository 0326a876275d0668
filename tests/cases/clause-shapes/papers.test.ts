import { describe, expect, it } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import { aContext, aRecord } from '#tests/builders/a-record';
import { aLayer, anEdition } from '#tests/builders/a-rule-set';
import { ALWAYS, describeShape, NO_NUMBER } from './describe-shape';
import { doubtAbout, reading, rule, toLimit } from './parts';

const enclosures = [
  'binder-certificate',
  'aggregate-source-approval',
  'power-plot',
  'temperature-chart',
  'property-plots',
];

/** As UFC 3-250-03 lists for a job-mix formula, in part. */
describeShape('5.1.2 documents', {
  rules: enclosures.map((type) =>
    rule(type, { measure: { kind: 'document', type, enclosed: true }, limit: { present: true } }),
  ),
  edition: {
    documents: [
      { type: 'power-plot', label: '0.45-power plot' },
      { type: 'temperature-chart', label: 'Temperature-viscosity chart' },
      { type: 'property-plots', label: 'Plots of five properties against binder content' },
    ],
  },
  cases: [
    {
      title: 'all enclosed',
      record: { documents: enclosures.map((type) => ({ type, enclosed: true })) },
      expected: Object.fromEntries(enclosures.map((type) => [type, 'pass' as const])),
    },
    {
      title: 'all stated, none enclosed',
      record: { documents: enclosures.map((type) => ({ type })) },
      expected: Object.fromEntries(enclosures.map((type) => [type, 'not shown' as const])),
    },
    {
      title: 'all in cells that were not read',
      record: {
        doubts: enclosures.map((document) => ({
          sheet: 'Cover',
          cell: 'B9',
          text: '?',
          reason: 'no such document',
          alternatives: [],
          about: { document },
        })),
      },
      expected: Object.fromEntries(enclosures.map((type) => [type, 'undecided' as const])),
    },
  ],
  impossible: Object.fromEntries(
    enclosures.map((type) => [
      type,
      { fail: 'It is enclosed or not shown.', 'at the limit': NO_NUMBER, 'not applicable': ALWAYS },
    ]),
  ),
});

const dated = (type: string, date: string | null) => ({ type, date });

/*
 * Twelve months for gravities, thirty-six for the design. That the design also ends when a stockpile's gravity moves
 * by more than 0.020 needs the gravity at approval for the same stockpile; a limit takes one named stockpile's.
 */
describeShape('5.2.1 date validity', {
  rules: [
    rule('gravities', {
      measure: { kind: 'document', type: 'gravity-report', maximumAgeMonths: 12, on: 'submitted' },
      limit: { present: true },
    }),
    rule('design', {
      measure: { kind: 'document', type: 'mix-design-report', maximumAgeMonths: 36, on: 'letting' },
      limit: { present: true },
    }),
    rule('gravity-of-coarse', {
      measure: { kind: 'reading', quantity: 'bulk-specific-gravity-aggregate', at: { stockpile: 'Coarse' } },
      limit: {
        target: {
          quantity: 'bulk-specific-gravity-aggregate',
          at: { stockpile: 'Coarse', trial: 'approved' },
        },
        tolerance: '0.020',
      },
    }),
  ],
  edition: { documents: [{ type: 'gravity-report', label: 'Report of aggregate gravities' }] },
  cases: [
    {
      title: 'the last day of each, the gravity on the limit',
      context: { submittedOn: '2026-03-09', lettingOn: '2026-02-28' },
      record: {
        documents: [dated('gravity-report', '2025-03-09'), dated('mix-design-report', '2023-02-28')],
        readings: [
          reading('bulk-specific-gravity-aggregate', 2.65, { stockpile: 'Coarse' }),
          reading('bulk-specific-gravity-aggregate', 2.67, { stockpile: 'Coarse', trial: 'approved' }),
        ],
      },
      expected: { gravities: 'pass', design: 'pass', 'gravity-of-coarse': 'pass' },
    },
    {
      title: 'a day later, the gravity beyond',
      context: { submittedOn: '2026-03-10', lettingOn: '2026-03-01' },
      record: {
        documents: [dated('gravity-report', '2025-03-09'), dated('mix-design-report', '2023-02-28')],
        readings: [
          reading('bulk-specific-gravity-aggregate', 2.65, { stockpile: 'Coarse' }),
          reading('bulk-specific-gravity-aggregate', 2.671, { stockpile: 'Coarse', trial: 'approved' }),
        ],
      },
      expected: { gravities: 'fail', design: 'fail', 'gravity-of-coarse': 'fail' },
    },
    {
      title: 'nothing',
      record: {},
      expected: { gravities: 'not shown', design: 'not shown', 'gravity-of-coarse': 'not shown' },
    },
    {
      title: 'no dates, a gravity in doubt',
      context: { lettingOn: null },
      record: {
        documents: [dated('gravity-report', null), dated('mix-design-report', '2025-01-01')],
        readings: [reading('bulk-specific-gravity-aggregate', 2.65, { stockpile: 'Coarse' })],
        doubts: [doubtAbout('bulk-specific-gravity-aggregate', { stockpile: 'Coarse', trial: 'approved' })],
      },
      expected: { gravities: 'undecided', design: 'undecided', 'gravity-of-coarse': 'undecided' },
    },
  ],
  impossible: {
    gravities: {
      'at the limit': 'A date has no margin; the last day is a case above.',
      'not applicable': ALWAYS,
    },
    design: {
      'at the limit': 'A date has no margin; the last day is a case above.',
      'not applicable': ALWAYS,
    },
    'gravity-of-coarse': { 'not applicable': ALWAYS },
  },
});

describe('6.1 precedence', () => {
  const vma = (min: string) =>
    rule('vma', {
      measure: { kind: 'reading', quantity: 'voids-in-mineral-aggregate' },
      limit: { min },
      rounding: toLimit,
    });
  const supplement = aLayer({ replace: { rules: [vma('14.5')] } });
  const provision = aLayer({
    id: 'sp-1',
    title: 'Special provision 1',
    edition: '1',
    replace: { rules: [vma('15.0')] },
  });
  const base = { rules: [vma('14.0')] };
  const outcome = (layers: (typeof supplement)[], value: number) => {
    const record = aRecord({ readings: [reading('voids-in-mineral-aggregate', value)] });
    return evaluate(record, anEdition(base, layers), aContext()).findings[0];
  };

  it.each([
    ['the base alone', [], 14],
    ['the supplement over the base', [supplement], 14.5],
    ['the special provision over both', [supplement, provision], 15],
    ['whichever comes later', [provision, supplement], 14.5],
  ] as const)('%s', (_, layers, min) => {
    expect(outcome([...layers], min)).toMatchObject({ outcome: 'pass', margin: 0 });
    expect(outcome([...layers], min - 0.1)?.outcome).toBe('fail');
  });

  it('shows which document gave the limit, and each that it displaced', () => {
    expect(outcome([supplement, provision], 15)?.limit?.from).toMatchObject({
      document: 'Special provision 1, 1',
      displaced: [
        { document: 'Section 900, 2026', text: 'vma: at least 14.0 %' },
        { document: 'Supplement 1, 1', text: 'vma: at least 14.5 %' },
      ],
    });
  });

  it('is silent on a rule that a layer removes', () => {
    const removed = aLayer({ remove: { rules: ['vma'] } });
    expect(outcome([removed], 10)).toBeUndefined();
  });
});

const factors = ['voids', 'density', 'grade', 'smoothness'];
const factorReadings = (values: number[]) =>
  values.map((value, i) => ({ ...reading(`pay-factor-${factors[i]}`, value), unit: '%' }));

/** The lowest of four factors (UFGS 02749, 3.11.1); weights as in Section 334-8.3, in part and made to add up. */
describeShape('6.2 the lowest governs', {
  rules: [
    rule('lowest', {
      measure: { kind: 'formula', expression: 'min(PFv, PFd, PFg, PFs)', unit: '%' },
      limit: { min: 75 },
    }),
    rule('weighted', {
      measure: { kind: 'formula', expression: '0.25*PFv + 0.35*PFd + 0.25*PFg + 0.15*PFs', unit: '%' },
      limit: { min: 95 },
    }),
  ],
  edition: {
    quantities: factors.map((factor) => ({
      id: `pay-factor-${factor}`,
      symbol: `PF${factor.charAt(0)}`,
      label: `pay factor for ${factor}`,
      unit: '%',
    })),
  },
  cases: [
    {
      title: 'all of 100',
      record: { readings: factorReadings([100, 100, 100, 100]) },
      expected: { lowest: 'pass', weighted: 'pass' },
    },
    // 25 + 35 + 25 + 0.15·75 = 96.25; multiplied they would give 75.
    {
      title: 'one on the lower limit',
      record: { readings: factorReadings([100, 100, 100, 75]) },
      expected: { lowest: 'pass', weighted: 'pass' },
    },
    // 0.25·80 + 75 = 95
    {
      title: 'a weighted one on its limit',
      record: { readings: factorReadings([80, 100, 100, 100]) },
      expected: { lowest: 'pass', weighted: 'pass' },
    },
    {
      title: 'one too low for both',
      record: { readings: factorReadings([100, 74, 100, 100]) },
      expected: { lowest: 'fail', weighted: 'fail' },
    },
    {
      title: 'one that is missing',
      record: { readings: factorReadings([100, 100, 100]) },
      expected: { lowest: 'not shown', weighted: 'not shown' },
    },
    {
      title: 'one in doubt',
      record: { readings: factorReadings([100, 100, 100]), doubts: [doubtAbout('pay-factor-smoothness')] },
      expected: { lowest: 'undecided', weighted: 'undecided' },
    },
  ],
  impossible: { lowest: { 'not applicable': ALWAYS }, weighted: { 'not applicable': ALWAYS } },
});
