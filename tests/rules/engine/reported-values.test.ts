import { describe, expect, it } from 'vitest';
import type { Reading } from '#rules/record';
import { aReading } from '#tests/builders/a-reading';
import { checkWith, findingOf } from './check-with';

/** 100·(2.500 − 2.400)/2.500 = 4.0 % */
const raw = [
  aReading({ quantity: 'maximum-specific-gravity', value: 2.5, source: cell('C4', '2.500') }),
  aReading({ quantity: 'bulk-specific-gravity-mix', value: 2.4, source: cell('C5', '2.400') }),
];
const reported = (value: number, text = String(value)) =>
  aReading({ quantity: 'air-voids', value, source: cell('C6', text) });
const airVoids = (readings: Reading[], limit: object = { min: '3.5', max: '4.5' }) => ({
  rule: { measure: { kind: 'reading' as const, quantity: 'air-voids' }, limit },
  record: { readings },
});

function cell(address: string, text: string) {
  return { sheet: 'Summary', cell: address, text };
}

describe('a derived quantity', () => {
  it('is recomputed from its own raw readings, with formula, inputs and cells as evidence', () => {
    const finding = findingOf(airVoids(raw));
    expect(finding).toMatchObject({ outcome: 'pass', observed: { value: 4, rounded: 4 } });
    const [evidence] = finding.evidence;
    expect(evidence).toMatchObject({ origin: 'recomputed', formula: '100·(Gmm − Gmb)/Gmm' });
    const cells = JSON.stringify(evidence?.inputs);
    expect(cells).toContain('"C4"');
    expect(cells).toContain('"C5"');
  });

  it('is judged as reported, and says so, where nothing raw is given', () => {
    const finding = findingOf(airVoids([reported(4.2)]));
    expect(finding).toMatchObject({ outcome: 'pass', observed: { value: 4.2 } });
    expect(finding.reason).toContain('The value is judged as reported.');
  });

  it('keeps its outcome where the reported value differs and comes to the same', () => {
    const finding = findingOf(airVoids([...raw, reported(4.3, '4.3')]));
    expect(finding).toMatchObject({ outcome: 'pass', observed: { value: 4 } });
    expect(finding.reason).toContain('Both give the same outcome.');
  });

  it('is undecided where the reported value differs and comes to another outcome', () => {
    const finding = findingOf(airVoids([...raw, reported(4.6, '4.6')]));
    expect(finding).toMatchObject({ outcome: 'undecided', margin: null, borderline: false });
    expect(finding.reason).toContain('The workbook reports 4.6 % (Summary C6); recomputed it is 4.0 %.');
  });

  it('does not call a difference within its displayed digits a contradiction', () => {
    // Reported 3.5 stands for 3.45 to 3.55, and so does the recomputed 3.48: 100·(2.500 − 2.413)/2.500.
    const readings = [
      raw[0]!,
      aReading({ quantity: 'bulk-specific-gravity-mix', value: 2.413, source: cell('C5', '2.413') }),
      reported(3.5, '3.5'),
    ];
    const finding = findingOf({
      ...airVoids(readings),
      rule: { ...airVoids([]).rule, rounding: { method: 'absolute' } },
    });
    expect(finding).toMatchObject({ outcome: 'fail', observed: { value: 3.48 } });
  });

  it('is required to add up only where the difference changes an outcome', () => {
    const severity = (value: number) =>
      checkWith(airVoids([...raw, reported(value, value.toFixed(1))])).findings.find(
        ({ rule }) => rule === 'consistency/reported-differs',
      )?.severity;
    expect([severity(4.3), severity(4.6)]).toEqual(['advisory', 'required']);
  });

  it('follows the edition’s own tolerance where it sets one', () => {
    const check = airVoids([...raw, reported(4.6, '4.6')]);
    const rule = {
      id: 'va',
      clause: '1',
      title: 'Air voids',
      severity: 'required' as const,
      ...check.rule,
    } as const;
    const outcome = (tolerance: number) =>
      findingOf({
        edition: { rules: [rule], reportedTolerance: { 'air-voids': tolerance } },
        record: check.record,
      }).outcome;
    expect([outcome(0.5), outcome(0.6)]).toEqual(['undecided', 'pass']);
  });
});

describe('a measured property of the blend', () => {
  const stockpile = (name: string, share: number, absorption: number) => [
    aReading({ quantity: 'stockpile-share', value: share, at: { stockpile: name } }),
    aReading({
      quantity: 'water-absorption',
      value: absorption,
      at: { stockpile: name },
      source: cell('D9', absorption.toFixed(2)),
    }),
  ];
  /** (50·1.0 + 50·2.0)/100 = 1.5 % by the arithmetic mean of shares. */
  const stockpiles = [...stockpile('Coarse', 50, 1), ...stockpile('Fine', 50, 2)];
  const stated = (value: number, text: string) =>
    aReading({ quantity: 'water-absorption', value, at: {}, source: cell('D4', text) });
  const check = (readings: Reading[]) =>
    findingOf({
      rule: { measure: { kind: 'reading', quantity: 'water-absorption' }, limit: { max: '1.7' } },
      record: { readings },
    });

  it('counts as stated where it is stated', () => {
    const finding = check([...stockpiles, stated(1.52, '1.5')]);
    expect(finding).toMatchObject({ outcome: 'pass', observed: { value: 1.52 } });
    expect(finding.evidence[0]?.source?.cell).toBe('D4');
  });

  it('is else recomputed from the stockpiles', () => {
    expect(check(stockpiles)).toMatchObject({ outcome: 'pass', observed: { value: 1.5 } });
  });

  it('is undecided where the stated value contradicts the stockpiles and the outcome', () => {
    expect(check([...stockpiles, stated(1.9, '1.9')]).outcome).toBe('undecided');
  });
});

describe('a difference with exactly one named cause', () => {
  /**
   * Invented mix: Pb 5.0, Gb 1.030, Gmm 2.500, Gsb 2.650, P0.075 5.0.
   * Gse = 95/(100/2.5 − 5/1.03) = 95/35.145631 = 2.703039; Pba = 100·1.03·(2.703039 − 2.65)/(2.703039·2.65) = 0.762655;
   * Pbe = 5 − 0.762655·95/100 = 4.275478; dust proportion 5/4.275478 = 1.169460. Over total binder: 5/5.0 = 1.00.
   */
  const readings = [
    aReading({ quantity: 'binder-content', value: 5, source: cell('B1', '5.0') }),
    aReading({ quantity: 'binder-specific-gravity', value: 1.03, at: {}, source: cell('B2', '1.030') }),
    aReading({ quantity: 'maximum-specific-gravity', value: 2.5, source: cell('B3', '2.500') }),
    aReading({
      quantity: 'bulk-specific-gravity-aggregate',
      value: 2.65,
      at: {},
      source: cell('B4', '2.650'),
    }),
    aReading({
      quantity: 'percent-passing',
      value: 5,
      at: { trial: 'design', sieve: 0.075 },
      source: cell('B5', '5.0'),
    }),
    aReading({ quantity: 'dust-proportion', value: 1, source: cell('H24', '1.00') }),
  ];

  it('judges the recomputed value and names the cause', () => {
    const rule = {
      measure: { kind: 'reading' as const, quantity: 'dust-proportion' },
      limit: { max: '1.10' },
      rounding: { method: 'rounding' as const, to: 0.01 },
    };
    const finding = findingOf({ rule, record: { readings } });
    expect(finding).toMatchObject({ outcome: 'fail', observed: { rounded: 1.17 }, margin: -0.07 });
    expect(finding.reason).toContain('H24 divides by total, not effective, binder');
  });
});

describe('a value interpolated between trials', () => {
  const trial = (name: string, pb: number, gmm: number, gmb: number) => [
    aReading({ quantity: 'binder-content', value: pb, at: { trial: name } }),
    aReading({ quantity: 'maximum-specific-gravity', value: gmm, at: { trial: name } }),
    aReading({ quantity: 'bulk-specific-gravity-mix', value: gmb, at: { trial: name, specimen: '1' } }),
  ];
  /** Air voids 100·(2.500 − 2.375)/2.500 = 5.0 at 4.5 % and 100·(2.500 − 2.425)/2.500 = 3.0 at 5.5 %: 4.0 between. */
  const readings = [
    ...trial('A', 4.5, 2.5, 2.375),
    ...trial('B', 5.5, 2.5, 2.425),
    aReading({ quantity: 'binder-content', value: 5 }),
  ];

  it('is judged, marked, and counted as the fewest specimens of the trials', () => {
    const finding = findingOf(airVoids(readings));
    expect(finding).toMatchObject({ outcome: 'pass', observed: { value: 4, count: 1 } });
    expect(finding.evidence[0]?.origin).toBe('interpolated');
    expect(finding.reason).toContain('interpolated');
  });

  it.each(['each', 'range', 'standard-deviation'] as const)('has no %s', (statistic) => {
    const check = airVoids(readings, { max: 5 });
    expect(
      findingOf({ ...check, rule: { ...check.rule, measure: { ...check.rule.measure, statistic } } }).outcome,
    ).toBe('undecided');
  });
});
