import { describe, expect, it } from 'vitest';
import type { Reading } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aReading } from '#tests/builders/a-reading';
import { findingOf } from './check-with';

/** The same rule for every case: air voids of 3.0 to 5.0 %. */
const rule: Partial<RuleInput> = {
  measure: { kind: 'reading', quantity: 'air-voids' },
  limit: { min: '3.0', max: '5.0' },
  rounding: { method: 'rounding', to: 0.1 },
};

function voids(values: Record<string, number>, at: Reading['at'] = {}): Reading[] {
  return Object.entries(values).map(([specimen, value]) =>
    aReading({ quantity: 'air-voids', value, at: { trial: 'design', specimen, ...at } }),
  );
}

/** Wheel tracking names no trial, as laboratories leave it out: it is the design's. */
function ruts(...specimens: string[]): Reading[] {
  return specimens.map((specimen) =>
    aReading({
      quantity: 'wheel-track-rut-depth',
      value: 5.2,
      at: { specimen, temperature: 50, passes: 20_000 },
    }),
  );
}

/** Gmm 2.500, so that air voids are 100·(2.5 − Gmb)/2.5. */
function gravities(values: Record<string, number>): Reading[] {
  return [
    aReading({ quantity: 'maximum-specific-gravity', value: 2.5 }),
    ...Object.entries(values).map(([specimen, value]) =>
      aReading({ quantity: 'bulk-specific-gravity-mix', value, at: { trial: 'design', specimen } }),
    ),
  ];
}

describe('air voids of specimens that were made for wheel tracking, told apart by their label alone', () => {
  it('never turn a design that fails into one that passes', () => {
    // 2.4 and 2.6 % fail; with 7.0 and 7.2 % the mean would be 4.8 %.
    const readings = [...voids({ '1': 2.4, '2': 2.6, W1: 7, W2: 7.2 }), ...ruts('W1', 'W2')];
    const finding = findingOf({ rule, record: { readings } });
    expect(finding.outcome).toBe('undecided');
    expect(finding.reason).toBe(
      'Specimens W1 and W2 have results of wheel-track rut depth as well, and may have been compacted to other voids for it; without what was measured on them, this would be fail.',
    );
    expect(finding.wouldDecide).toContain('form of the test');
  });

  it('never fail a design that passes without them', () => {
    const readings = [...voids({ '1': 4, '2': 4.2, W1: 7, W2: 7.2 }), ...ruts('W1', 'W2')];
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('undecided');
  });

  it('do not push aside the one mean that is stated for the design', () => {
    // Without specimens 7.1 stands beside 2.5: a value without a specimen would be their mean.
    const mean = aReading({ quantity: 'air-voids', value: 2.5 });
    const limit = { min: '3.0', max: '8.0' };
    const readings = [mean, ...voids({ W1: 7, W2: 7.2 }), ...ruts('W1', 'W2')];
    expect(findingOf({ rule: { ...rule, limit }, record: { readings } }).outcome).toBe('undecided');
  });

  it('leave the verdict as it is where it is the same with and without them', () => {
    const readings = [...voids({ '1': 4, '2': 4.2, '3': 3.9 }), ...ruts('1', '2')];
    const measure = { kind: 'reading' as const, quantity: 'air-voids', minimumCount: 3 };
    const finding = findingOf({ rule: { ...rule, measure }, record: { readings } });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { count: 3, rounded: 4 } });
  });

  it('stand where the design has no others, because then they are what is stated for it', () => {
    const readings = [...voids({ '1': 4, '2': 4.2 }), ...ruts('1', '2')];
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('pass');
  });

  it('are none of the design where another laboratory tested that label', () => {
    const agency = ruts('2').map((reading) => ({
      ...reading,
      at: { ...reading.at, laboratory: 'agency' as const },
    }));
    const readings = [...voids({ '1': 2.4, '2': 4.4 }), ...agency];
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('pass');
  });

  it.each(['fracture-energy', 'flexibility-index', 'dynamic-modulus', 'flow-number', 'creep-strain'])(
    'are looked at as well where the test is one of %s',
    (quantity) => {
      const at = {
        specimen: 'W1',
        temperature: 25,
        ...(quantity === 'creep-strain' ? { time: 1, stress: 200 } : {}),
      };
      const readings = [...voids({ '1': 2.4, W1: 7 }), aReading({ quantity, value: 1000, at })];
      expect(findingOf({ rule, record: { readings } }).outcome).toBe('undecided');
    },
  );

  it('stay the design’s where the test is made on volumetric specimens themselves', () => {
    const stability = aReading({
      quantity: 'marshall-stability',
      value: 10,
      at: { trial: 'design', specimen: '2' },
    });
    const readings = [...voids({ '1': 2.4, '2': 4.4 }), stability];
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('pass');
  });
});

describe('gravities of specimens that were made for wheel tracking', () => {
  it('never turn recomputed air voids into a pass', () => {
    // Gmb 2.440 is 2.4 %, 2.325 is 7.0 %: together 4.7 %.
    const readings = [...gravities({ '1': 2.44, W1: 2.325 }), ...ruts('W1')];
    expect(findingOf({ rule, record: { readings } }).outcome).toBe('undecided');
  });

  it('leave them decided where both readings of the labels agree', () => {
    const readings = [...gravities({ '1': 2.4, '2': 2.405, '3': 2.395 }), ...ruts('1', '2')];
    expect(findingOf({ rule, record: { readings } })).toMatchObject({
      outcome: 'pass',
      observed: { count: 3 },
    });
  });
});

describe('air voids that say for which test their specimens were made', () => {
  it.each([
    ['a design that fails', { '1': 2.4, '2': 2.6 }, 'fail'],
    ['a design that passes', { '1': 4, '2': 4.2 }, 'pass'],
  ])('are no voids of %s', (_, design, outcome) => {
    const readings = [
      ...voids(design),
      ...voids({ W1: 7, W2: 7.2 }, { variant: 'wheel tracking' }),
      ...ruts('W1', 'W2'),
    ];
    expect(findingOf({ rule, record: { readings } })).toMatchObject({ outcome, observed: { count: 2 } });
  });

  it('are not the design’s where it has none of its own, reported or from gravities', () => {
    const reported = [...voids({ W1: 4, W2: 4.2 }, { variant: 'wheel tracking' }), ...ruts('W1', 'W2')];
    expect(findingOf({ rule, record: { readings: reported } }).outcome).toBe('undecided');
    const weighed = gravities({ W1: 2.4 }).map((reading) => ({
      ...reading,
      at:
        reading.quantity === 'maximum-specific-gravity'
          ? reading.at
          : { ...reading.at, variant: 'wheel tracking' },
    }));
    expect(findingOf({ rule, record: { readings: weighed } }).outcome).toBe('undecided');
  });

  it('still tell which specimens of the test count', () => {
    const measure: RuleInput['measure'] = {
      kind: 'reading',
      quantity: 'wheel-track-rut-depth',
      at: { passes: 20_000 },
      where: [{ quantity: 'air-voids', min: 6.5, max: 7.5 }],
    };
    const readings = [
      ...voids({ '1': 4 }),
      ...voids({ W1: 7, W2: 8 }, { variant: 'wheel tracking' }),
      ...ruts('W1', 'W2'),
    ];
    const finding = findingOf({ rule: { measure, limit: { max: 6 } }, record: { readings } });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { count: 1 } });
  });
});

describe('a condition and a limit on a quantity', () => {
  it('are not settled either where they turn on those specimens', () => {
    const readings = [
      ...voids({ '1': 2.4, W1: 7 }),
      ...ruts('W1'),
      aReading({ quantity: 'draindown', value: 0.1 }),
    ];
    const params = { quantity: 'air-voids', at: {} };
    const when = { fact: 'quantity', params, operator: 'greaterThan' as const, value: 4 };
    const draindown = { kind: 'reading' as const, quantity: 'draindown' };
    const conditional = findingOf({
      rule: { when, measure: draindown, limit: { max: 0.3 } },
      record: { readings },
    });
    expect(conditional.outcome).toBe('undecided');
  });
});
