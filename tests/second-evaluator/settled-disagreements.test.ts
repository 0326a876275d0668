import { describe, expect, it } from 'vitest';
import type { DocumentRecord } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { engineFindings, judgeTwice } from './agreement';
import type { DocumentInput, GeneratedCase, ReadingInput } from './generated/parts';

/** Where the two evaluators once parted and the engine was wrong: each in its smallest form, with what is right. */
function aCase(
  rule: Pick<RuleInput, 'measure' | 'limit'>,
  record: { readings?: ReadingInput[]; documents?: DocumentInput[] },
): GeneratedCase {
  return {
    base: {
      format: 'clauseway/rule-set@1',
      id: 'settled',
      title: 'Settled',
      agency: 'Carrow Valley Roads Authority',
      edition: '1',
      effective: { from: null, to: null },
      layerOf: null,
      rules: [{ id: 'rule', clause: '1', title: 'Rule', severity: 'required', ...rule }],
    },
    layers: [],
    record,
    context: { submittedOn: '2026-03-09', lettingOn: null, facts: {} },
  };
}

function coatings(
  ...stated: { value: number | null; qualifier?: ReadingInput['qualifier'] }[]
): ReadingInput[] {
  return stated.map(({ value, qualifier }, i) => ({
    quantity: 'coating',
    value,
    unit: '%',
    at: { trial: 'design', specimen: String(i + 1) },
    origin: 'measured',
    ...(qualifier === undefined ? {} : { qualifier }),
  }));
}

function expectOutcome(drawn: GeneratedCase, outcome: string): void {
  expect(engineFindings(drawn).map((finding) => finding.outcome)).toEqual([outcome]);
  expect(judgeTwice(drawn).disagreements).toEqual([]);
}

describe('the ends of a censored minimum or maximum', () => {
  const of = (statistic: 'min' | 'max', limit: RuleInput['limit'], readings: ReadingInput[]) =>
    aCase({ measure: { kind: 'reading', quantity: 'coating', statistic }, limit }, { readings });

  it('leave it undecided where the largest may be the limit itself or more', () => {
    expectOutcome(
      of('max', { max: '43.8' }, coatings({ value: 43.8 }, { value: 40, qualifier: '>' })),
      'undecided',
    );
  });

  it('leave it undecided where the smallest may be the limit itself or less', () => {
    expectOutcome(
      of('min', { min: '14.0' }, coatings({ value: 14 }, { value: 13, qualifier: '>' })),
      'undecided',
    );
  });

  it('do not pass where the largest may be an exclusive limit itself', () => {
    const limit = { min: { value: '14.0', exclusive: true } };
    expectOutcome(of('max', limit, coatings({ value: 14 }, { value: 14.5, qualifier: '<' })), 'undecided');
  });

  it('pass where the largest is at least an inclusive limit', () => {
    expectOutcome(
      of('max', { min: '14.0' }, coatings({ value: 14 }, { value: 14.5, qualifier: '<' })),
      'pass',
    );
  });

  it('fail where every smallest that is allowed lies below the limit', () => {
    expectOutcome(of('min', { min: '14.0' }, coatings({ value: 15 }, { value: 14, qualifier: '<' })), 'fail');
  });
});

describe('percent within limits', () => {
  // By hand: the mean lies 2/3 of 0.38 above the smallest, s is 0.38/√3, so Q of the upper limit is 1/√3, X 1/4, and
  // the share of the arcsine distribution below 1/4 is 2/π·asin 1/2, a third; nothing lies below the lower limit.
  it('loses no digits to a mean that does not end', () => {
    const within = { min: '99.0', max: '100.0' };
    const measure = {
      kind: 'reading' as const,
      quantity: 'coating',
      statistic: 'percent-within-limits' as const,
      within,
    };
    const readings = coatings({ value: 100 }, { value: 99.62 }, { value: 100 });
    const drawn = aCase({ measure, limit: { min: 60 } }, { readings });
    expect(engineFindings(drawn)[0]?.observed?.value).toBeCloseTo(200 / 3, 9);
    expectOutcome(drawn, 'pass');
  });
});

describe('a range', () => {
  it('is the difference of the decimals as they are written', () => {
    const measure = { kind: 'reading' as const, quantity: 'coating', statistic: 'range' as const };
    const readings = coatings({ value: 66.15 }, { value: 66.16 });
    expectOutcome(aCase({ measure, limit: { min: '0.01' } }, { readings }), 'pass');
    expectOutcome(
      aCase({ measure, limit: { max: { value: '0.01', exclusive: true } } }, { readings }),
      'fail',
    );
  });
});

describe('a doubt at a number of gyrations', () => {
  it('is none about the maximum gyrations where these are stated as another number', () => {
    const measure = { kind: 'reading' as const, quantity: 'coating', at: { gyrations: 'maximum' as const } };
    const stated: ReadingInput = {
      quantity: 'gyrations-maximum',
      value: 160,
      unit: 'gyrations',
      origin: 'measured',
    };
    const doubt = {
      sheet: 'Tests',
      cell: 'E12',
      text: '?',
      reason: 'The cell cannot be read.',
      alternatives: [],
      about: { quantity: 'coating', at: { gyrations: 115 } },
    };
    const drawn = aCase({ measure, limit: { min: 90 } }, { readings: [stated] });
    expectOutcome({ ...drawn, record: { ...drawn.record, doubts: [doubt] } }, 'not shown');
  });
});

describe('two conditions on a specimen', () => {
  const unknown = { quantity: 'permeability', min: 5 };
  const unmet = { quantity: 'overlay-cycles', min: 300 };
  const readings: ReadingInput[] = [
    ...coatings({ value: 95 }, { value: 80 }),
    ...['1', '2'].map((specimen) => ({
      quantity: 'overlay-cycles',
      value: specimen === '1' ? 400 : 200,
      unit: 'cycles',
      at: { specimen },
      origin: 'measured' as const,
    })),
    { quantity: 'permeability', value: 6, unit: '10⁻⁵ cm/s', at: { specimen: '1' }, origin: 'measured' },
  ];

  it.each([
    ['the unmet one first', [unmet, unknown]],
    ['the unknown one first', [unknown, unmet]],
  ])('leave the specimen out by the one that is not met: %s', (_order, where) => {
    const measure = { kind: 'reading' as const, quantity: 'coating', where };
    expectOutcome(aCase({ measure, limit: { min: 90 } }, { readings }), 'pass');
  });
});

describe('two documents of one date', () => {
  const document = (validTo: string | null): Partial<DocumentRecord> & { type: string } => ({
    type: 'binder-certificate',
    date: '2026-02-09',
    validTo,
  });
  const measure = { kind: 'document' as const, type: 'binder-certificate', on: 'submitted' as const };

  it.each([
    ['the expired one first', ['2026-02-28', null]],
    ['the expired one last', [null, '2026-02-28']],
  ])('are judged by the one that holds longer: %s', (_order, ends) => {
    const documents = ends.map(document);
    expectOutcome(aCase({ measure, limit: { present: true } }, { documents }), 'pass');
  });
});

describe('a volumetric reading whose specimen has a result of a test as well', () => {
  const measure = { kind: 'reading' as const, quantity: 'bulk-specific-gravity-mix', minimumCount: 2 };
  const gravity = (value: number, specimen: string): ReadingInput => ({
    quantity: 'bulk-specific-gravity-mix',
    value,
    unit: '1',
    at: { trial: 'design', specimen },
    origin: 'measured',
  });
  const cycles: ReadingInput = {
    quantity: 'overlay-cycles',
    value: 400,
    unit: 'cycles',
    at: { specimen: '2' },
    origin: 'measured',
  };

  it('leaves open what would be decided otherwise without it, however few are left', () => {
    const readings = [gravity(2.4, '1'), gravity(2.3, '2'), cycles];
    expectOutcome(aCase({ measure, limit: { max: '2.36' } }, { readings }), 'undecided');
  });

  it('counts where it makes no difference', () => {
    const readings = [gravity(2.35, '1'), gravity(2.3, '2'), cycles];
    expectOutcome(aCase({ measure, limit: { max: '2.36' } }, { readings }), 'pass');
  });
});

describe('a gradation that is stated as retained', () => {
  const table = {
    id: 'band',
    keys: ['sieve'],
    columns: [{ name: 'min' }, { name: 'max' }],
    rows: [{ sieve: 4.75, min: 40, max: 60 }],
  };
  const measure = { kind: 'gradation' as const, table: 'band' };
  const limit = { min: { table: 'band', column: 'min' } };
  const retained = (quantity: string, sieve: number, value: number, more: Partial<ReadingInput> = {}) => ({
    quantity,
    value,
    unit: '%',
    at: { trial: 'design', sieve },
    origin: 'measured' as const,
    ...more,
  });
  const judged = (readings: ReadingInput[]): GeneratedCase => {
    const drawn = aCase({ measure, limit }, { readings });
    return { ...drawn, base: { ...drawn.base, tables: [table] } };
  };

  it('passes nothing on the strength of what a coarser sieve retains without a number', () => {
    // With 30 on 12.5 mm only 35 pass 4.75 mm; without it 65 would seem to.
    const own = retained('percent-retained', 4.75, 35);
    expectOutcome(judged([retained('percent-retained', 12.5, 30), own]), 'fail');
    expectOutcome(judged([retained('percent-retained', 12.5, 30, { qualifier: '<' }), own]), 'undecided');
    expectOutcome(judged([retained('percent-retained', 12.5, 30, { unit: 'mm' }), own]), 'undecided');
  });

  it('is there, and undecided, where its only percent is censored', () => {
    const only = retained('cumulative-percent-retained', 4.75, 50, { qualifier: '<' });
    expectOutcome(judged([only]), 'undecided');
  });
});

describe('a reading of two named conditions', () => {
  const measure = {
    kind: 'reading' as const,
    quantity: 'coating',
    at: { temperature: 25, variant: 'wet' },
  };
  const stated = (at: ReadingInput['at']) =>
    aCase({ measure, limit: { min: 90 } }, { readings: [{ ...coatings({ value: 95 })[0]!, at }] });

  it('is not shown where it has another value of one, whatever it leaves unsaid of the other', () => {
    expectOutcome(stated({ trial: 'design', temperature: 40 }), 'not shown');
    expectOutcome(stated({ trial: 'design', variant: 'dry' }), 'not shown');
  });

  it('is undecided where it only leaves one unsaid', () => {
    expectOutcome(stated({ trial: 'design', temperature: 25 }), 'undecided');
  });
});

describe('a result of none after so many passes', () => {
  const none = (quantity: string, unit: string): ReadingInput => ({
    quantity,
    value: null,
    qualifier: 'none',
    unit,
    at: { trial: 'design', passes: 20_000 },
    origin: 'measured',
  });

  it('is no depth at all, not as many millimetres as there were passes', () => {
    const measure = { kind: 'reading' as const, quantity: 'wheel-track-rut-depth', at: { passes: 20_000 } };
    const readings = [none('wheel-track-rut-depth', 'mm')];
    expectOutcome(aCase({ measure, limit: { max: '12.5' } }, { readings }), 'pass');
    expectOutcome(aCase({ measure, limit: { min: '1.0' } }, { readings }), 'undecided');
  });

  it('is more than that many of what is counted in passes', () => {
    const measure = { kind: 'reading' as const, quantity: 'stripping-inflection-point' };
    const readings = [none('stripping-inflection-point', 'passes')];
    const drawn = aCase({ measure, limit: { min: 15_000 } }, { readings });
    expect(engineFindings(drawn).map(({ outcome }) => outcome)).toEqual(['pass']);
  });
});
