import { describe, expect, it } from 'vitest';
import { fitCreep } from '#rules/calculations/creep-fit';
import { evidenceSchema, type Finding, findingSchema } from '#rules/engine/finding';
import type { MixRecordInput, Reading } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aCreepTest, curveAtMinusTen, TEST_TIMES } from '#tests/builders/a-creep-test';
import { aReading } from '#tests/builders/a-reading';
import fc from '#tests/builders/seeded-fast-check';
import { checkWith, findingOf } from './check-with';

type CreepMeasure = Extract<RuleInput['measure'], { kind: 'creep-compliance' }>;

interface CreepCheck {
  measure?: Partial<CreepMeasure>;
  limit?: RuleInput['limit'];
  rule?: Partial<RuleInput>;
  readings?: Reading[];
  record?: MixRecordInput;
}

/** The finding of a rule on creep compliance at −10 °C and 100 s, rounded to 0.001. */
function creepFinding({
  measure = {},
  limit = { min: '0.100' },
  rule = {},
  readings,
  record,
}: CreepCheck): Finding {
  return findingOf({
    rule: {
      id: 'creep',
      title: 'Creep compliance',
      measure: { kind: 'creep-compliance', temperature: -10, time: 100, ...measure },
      limit,
      rounding: { method: 'rounding', to: '0.001' },
      ...rule,
    },
    record: record ?? { readings: readings ?? aCreepTest({ specimens: [0.96, 1, 1.04] }) },
  });
}

/** Three specimens on the curve of CRP-15 at −10 °C: 0.1201664 at 100 s. */
const onCurve = aCreepTest({ specimens: [1, 1, 1] });

describe('a measured compliance', () => {
  it.each([
    // Strains of 23.0720, 24.0333 and 24.9946 µε under 200 kPa: 0.11536, 0.120166 and 0.124973, mean 0.120166.
    ['passes above a least value', { min: '0.100' }, 'pass', 0.02],
    ['passes on a least value', { min: '0.120' }, 'pass', 0],
    ['fails on an exclusive least value', { min: '0.120', exclusive: true }, 'fail', 0],
    ['fails below a least value', { min: '0.121' }, 'fail', -0.001],
    ['passes on a greatest value', { max: '0.120' }, 'pass', 0],
    ['fails above a greatest value', { max: '0.119' }, 'fail', -0.001],
    ['passes within a target and tolerance', { target: '0.125', tolerance: '0.005' }, 'pass', 0],
  ] as const)('%s', (_, limit, outcome, margin) => {
    const finding = creepFinding({ limit });
    expect([finding.outcome, finding.margin]).toEqual([outcome, margin]);
    expect(finding.observed).toMatchObject({ rounded: 0.12, text: '0.120', statistic: 'mean', count: 3 });
  });

  it('says rule, requirement and result in one way', () => {
    const finding = creepFinding({ measure: { stress: 200 } });
    expect(finding.ruleSentence).toBe(
      'Creep compliance at −10 °C at 100 s at 200 kPa is at least 0.100 1/GPa; mean of the specimens tested at that time, else from a fitted sigmoid; never beyond the tested loading times; rounded to 0.001 (ASTM E29, rounding method).',
    );
    expect(finding.requirement).toBe(
      'Creep compliance at −10 °C at 100 s at 200 kPa is at least 0.100 1/GPa.',
    );
    expect(finding.sentence).toBe(
      'Creep compliance at −10 °C at 100 s at 200 kPa is 0.120 1/GPa, at least 0.100.',
    );
    expect(finding.gauge).toEqual({ span: 0.4, scale: 'log' });
  });

  it('opens down to the strain of each specimen in its cell', () => {
    const [mean] = creepFinding({}).evidence;
    expect(mean).toMatchObject({ formula: 'mean of 3', unit: '1/GPa' });
    const first = mean!.inputs![0]!;
    expect(first).toMatchObject({ formula: 'εt/σ0', at: { specimen: '1', time: 100, stress: 200 } });
    expect(first.inputs!.map(({ symbol, source }) => [symbol, source?.cell])).toEqual([
      ['εt', 'E8'],
      ['σ0', undefined],
    ]);
  });

  it.each([
    [99, 'pass'],
    [101, 'pass'],
    [98.9, 'not shown'],
    [101.1, 'not shown'],
  ])('was tested at 100 s when the test was read at %f s: %s', (time, outcome) => {
    const readings = aCreepTest({ times: [1, time] });
    expect(creepFinding({ readings, measure: { source: 'measured' } }).outcome).toBe(outcome);
  });

  it.each([
    [-10.5, 'pass'],
    [-9.5, 'pass'],
    [-10.6, 'not shown'],
    [-9.4, 'not shown'],
  ])('was tested at −10 °C when the workbook says %f °C: %s', (temperature, outcome) => {
    const readings = aCreepTest({ temperature });
    expect(creepFinding({ readings }).outcome).toBe(outcome);
  });

  it('is not shown where there is no creep test at all', () => {
    expect(creepFinding({ readings: [] })).toMatchObject({
      outcome: 'not shown',
      reason: 'There is no reading of creep compliance.',
      sentence: 'Creep compliance at −10 °C at 100 s is not shown, at least 0.100 1/GPa.',
    });
  });

  it('is not shown where every test is at another temperature, and says which', () => {
    expect(creepFinding({ measure: { temperature: 0 } })).toMatchObject({
      outcome: 'not shown',
      reason: 'There is no reading of creep compliance at 0 °C, only at −10 °C.',
    });
  });

  it('is undecided where no reading says the temperature', () => {
    const readings = onCurve.map((reading) => {
      const { temperature: _, ...at } = reading.at;
      return { ...reading, at };
    });
    expect(creepFinding({ readings })).toMatchObject({ outcome: 'undecided' });
  });

  it('is undecided where the strains do not say the stress', () => {
    expect(creepFinding({ readings: aCreepTest({ stress: null }) })).toMatchObject({
      outcome: 'undecided',
      reason: 'A reading of creep strain does not say under which stress.',
    });
  });

  it('is not shown under a stress that was not applied', () => {
    expect(creepFinding({ measure: { stress: 400 } })).toMatchObject({
      outcome: 'not shown',
      reason: 'There is no reading of creep compliance at −10 °C at 400 kPa, only at −10 °C at 200 kPa.',
    });
  });

  it('takes levels of stress together where the rule names none', () => {
    const readings = [
      ...aCreepTest({ stress: 100, times: [100] }),
      ...aCreepTest({ stress: 200, times: [100] }),
    ];
    // One specimen under two stresses is one specimen.
    expect(creepFinding({ readings }).observed).toMatchObject({ rounded: 0.12, count: 1 });
    expect(creepFinding({ readings, measure: { stress: 100 } }).observed?.count).toBe(1);
  });

  it('is as the workbook reports it where nothing rawer is given, and says so', () => {
    const finding = creepFinding({ readings: aCreepTest({ as: 'compliance', specimens: [1, 1.02] }) });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { count: 2 } });
    expect(finding.reason).toContain('The value is judged as reported.');
  });

  it('is taken from the strains where the workbook reports the compliance too', () => {
    const readings = [...onCurve, ...aCreepTest({ as: 'compliance', specimens: [1, 1, 1] })];
    const finding = creepFinding({ readings });
    expect(finding.observed?.count).toBe(3);
    expect(finding.reason).not.toContain('as reported');
  });

  it('is undecided where what is reported has another outcome than what the strains give', () => {
    const readings = [
      ...onCurve,
      ...aCreepTest({ as: 'compliance', compliance: (t) => 0.7 * curveAtMinusTen(t), specimens: [1, 1, 1] }),
    ];
    const finding = creepFinding({ readings });
    expect(finding).toMatchObject({ outcome: 'undecided', wouldDecide: expect.stringContaining('Correct') });
    expect(finding.reason).toContain('0.084 1/GPa');
  });

  it('is undecided where a stated mean has another outcome than its specimens', () => {
    const mean = aReading({
      quantity: 'creep-compliance',
      value: 0.09,
      at: { temperature: -10, time: 100, stress: 200 },
    });
    expect(creepFinding({ readings: [...onCurve, mean] })).toMatchObject({
      outcome: 'undecided',
      reason: expect.stringContaining('0.090 1/GPa'),
    });
    const near = { ...mean, value: 0.119 };
    expect(creepFinding({ readings: [...onCurve, near] }).outcome).toBe('pass');
  });

  it('leaves the agency’s tests to rules that name them', () => {
    const readings = onCurve.map((reading) => ({
      ...reading,
      at: { ...reading.at, laboratory: 'agency' as const },
    }));
    expect(creepFinding({ readings }).outcome).toBe('not shown');
  });

  it('is undecided where two readings of one specimen at one time disagree', () => {
    const twice = [
      ...aCreepTest({ as: 'compliance' }),
      ...aCreepTest({ as: 'compliance', compliance: (t) => 0.2 * t }),
    ];
    expect(creepFinding({ readings: twice })).toMatchObject({
      outcome: 'undecided',
      reason: expect.stringContaining('disagree'),
    });
  });

  it('converts compliances and limits in 1/psi', () => {
    // 0.1 1/GPa is 6.89476e-7 1/psi: NIST SP 811, psi = 6,894.757 Pa.
    const readings = [
      aReading({
        quantity: 'creep-compliance',
        value: 7e-7,
        unit: '1/psi',
        at: { temperature: -10, time: 100 },
      }),
    ];
    const finding = creepFinding({ readings });
    expect(finding.observed?.value).toBeCloseTo(7e-7 / 6.894757293e-6, 6);
    expect(finding.outcome).toBe('pass');
  });

  it.each([
    ['<', 0.09, 'fail'],
    ['<', 0.2, 'undecided'],
    ['>', 0.11, 'pass'],
    ['>', 0.09, 'undecided'],
  ] as const)('known only as %s%f is %s against at least 0.100', (qualifier, value, outcome) => {
    const reading = aReading({
      quantity: 'creep-compliance',
      value,
      qualifier,
      at: { temperature: -10, time: 100 },
    });
    expect(creepFinding({ readings: [reading] }).outcome).toBe(outcome);
  });

  it.each([0, -0.1])('of %f cannot be, and decides nothing', (value) => {
    const reading = aReading({ quantity: 'creep-compliance', value, at: { temperature: -10, time: 100 } });
    expect(creepFinding({ readings: [reading], limit: { max: '1' } })).toMatchObject({
      outcome: 'undecided',
      reason: expect.stringContaining('cannot be'),
    });
  });

  it('is judged by a bound from the scatter of the specimens where the rule asks for one', () => {
    // 0.11536, 0.120167, 0.124973: s = 0.0048066, t(2) = 4.303: the mean less 4.303·s/√3 = 0.120167 − 0.011941.
    const finding = creepFinding({ measure: { source: 'measured', use: 'lower' }, limit: { min: '0.108' } });
    expect(finding.observed).toMatchObject({ rounded: 0.108, statistic: 'lower 95 % bound' });
    expect(finding.outcome).toBe('pass');
  });

  it('of one specimen has no bound', () => {
    const finding = creepFinding({ measure: { source: 'measured', use: 'lower' }, readings: aCreepTest() });
    expect(finding).toMatchObject({ outcome: 'undecided', wouldDecide: 'Test a second specimen.' });
  });

  it('counts only specimens that meet the rule’s conditions', () => {
    const voids = [7, 7.1, 4].map((value, i) =>
      aReading({ quantity: 'air-voids', value, at: { trial: 'design', specimen: String(i + 1) } }),
    );
    const where = [{ quantity: 'air-voids', min: 6.5, max: 7.5 }];
    const readings = [...aCreepTest({ specimens: [0.96, 1, 1.04] }), ...voids];
    expect(creepFinding({ readings, measure: { where } }).observed?.count).toBe(2);
    const unknown = readings.filter(({ quantity, at }) => quantity !== 'air-voids' || at.specimen !== '3');
    expect(creepFinding({ readings: unknown, measure: { where } }).outcome).toBe('undecided');
    const none = [{ quantity: 'air-voids', min: 9 }];
    expect(creepFinding({ readings, measure: { where: none } }).outcome).toBe('not shown');
  });

  it('is not applicable where the rule does not apply', () => {
    const rule = { when: { fact: 'nominalMaximumSize', operator: 'equal' as const, value: 25 } };
    const record = {
      readings: onCurve,
      attributes: { nominalMaximumSize: { value: 12.5, unit: 'mm', origin: 'reported' as const } },
    };
    expect(creepFinding({ rule, record }).outcome).toBe('not applicable');
  });

  it.each(['time', 'temperature'] as const)(
    'is undecided while a cell that may be another reading at its %s is in doubt',
    (name) => {
      const doubtful = {
        ...aCreepTest({ specimens: [1] })[6]!,
        at: { specimen: '4', temperature: -10, time: 100, stress: 200 },
      };
      const doubt = {
        sheet: 'Creep',
        cell: 'E40',
        text: '12,4',
        reason: 'the comma may group thousands',
        alternatives: [],
        about: { quantity: 'creep-strain', at: doubtful.at },
      };
      const elsewhere = { ...doubt, about: { ...doubt.about, at: { ...doubtful.at, [name]: 40 } } };
      const of = (one: typeof doubt) => creepFinding({ record: { readings: onCurve, doubts: [one] } });
      expect(of(doubt)).toMatchObject({ outcome: 'undecided', wouldDecide: expect.stringContaining('E40') });
      expect(of(elsewhere).outcome).toBe('pass');
    },
  );
});

describe('a fitted compliance', () => {
  it('stands between the tested times', () => {
    // CRP-15 at −10 °C: 1.2 − 1.155/(1 + (70/12712.85)^0.55) = 0.107503.
    const finding = creepFinding({ measure: { time: 70 }, readings: onCurve, limit: { min: '0.107' } });
    expect(finding).toMatchObject({
      outcome: 'pass',
      observed: { rounded: 0.108, statistic: 'fitted', count: 3 },
    });
    expect(finding.reason).toMatch(/taken from a sigmoid through 21 points, R² 1/);
  });

  it.each(['sigmoid', 'power', 'prony'] as const)(
    'by the %s is within a percent of a smooth series',
    (model) => {
      const finding = creepFinding({ measure: { time: 70, source: 'fitted', model }, readings: onCurve });
      expect(finding.observed!.value! / curveAtMinusTen(70)).toBeCloseTo(1, 2);
    },
  );

  it('shows its parameters and then its points down to the cells', () => {
    const [value] = creepFinding({ measure: { source: 'fitted' }, readings: onCurve }).evidence;
    expect(value).toMatchObject({ origin: 'fitted', formula: 'D∞ + (D0 − D∞)/(1 + (t/τ)^n)' });
    expect(value!.inputs!.slice(0, 4).map(({ symbol, origin }) => [symbol, origin])).toEqual([
      ['D0', 'fitted'],
      ['D∞', 'fitted'],
      ['τ', 'fitted'],
      ['n', 'fitted'],
    ]);
    expect(value!.inputs).toHaveLength(25);
    expect(value!.inputs!.at(-1)).toMatchObject({
      at: { time: 100 },
      inputs: [{ source: { sheet: 'Creep' } }, {}],
    });
    expect(evidenceSchema.safeParse(value).success).toBe(true);
  });

  it('is taken where the rule wants the curve even at a tested time', () => {
    expect(creepFinding({ measure: { source: 'fitted' } }).observed?.statistic).toBe('fitted');
    expect(creepFinding({ measure: { use: 'lower' } }).observed?.statistic).toBe('lower 95 % bound');
  });

  it('is judged by the bound that the rule names, wider with more confidence', () => {
    const bound = (use: 'lower' | 'upper', confidence: number) =>
      creepFinding({ measure: { use, confidence } }).observed!.value!;
    expect(bound('lower', 0.99)).toBeLessThan(bound('lower', 0.9));
    expect(bound('lower', 0.9)).toBeLessThan(curveAtMinusTen(100));
    expect(bound('upper', 0.9)).toBeGreaterThan(curveAtMinusTen(100));
  });

  it('is undecided where the fit is rejected, and says what would decide it', () => {
    const readings = aCreepTest({ compliance: (t) => curveAtMinusTen(t) * (t === 5 || t === 20 ? 2 : 1) });
    const finding = creepFinding({ measure: { time: 70 }, readings });
    expect(finding).toMatchObject({ outcome: 'undecided', observed: null });
    expect(finding.reason).toMatch(/^The fitted sigmoid is rejected: R² in ln D is 0\.\d+, below 0\.98\.$/);
    expect(finding.wouldDecide).toMatch(/^Test at 70 s/);
  });

  it('leaves a measured value alone where the fit is rejected', () => {
    const readings = aCreepTest({ compliance: (t) => curveAtMinusTen(t) * (t === 5 || t === 20 ? 2 : 1) });
    expect(creepFinding({ readings }).outcome).toBe('pass');
  });

  it('is undecided with too few points', () => {
    const readings = aCreepTest({ times: [1, 10, 100] });
    expect(creepFinding({ measure: { time: 50 }, readings })).toMatchObject({
      outcome: 'undecided',
      reason: expect.stringContaining('more than 4 points, and there are 3'),
    });
  });

  it('is undecided where a point is only known as a bound', () => {
    const [first, ...others] = aCreepTest({ as: 'compliance' });
    const readings = [{ ...first!, qualifier: '<' as const }, ...others];
    expect(creepFinding({ measure: { time: 70 }, readings }).outcome).toBe('undecided');
  });

  it('marks n above 1 and no more', () => {
    const steep = (t: number) => 1.2 - 1.155 / (1 + (t / 30) ** 1.5);
    const finding = creepFinding({ measure: { time: 70 }, readings: aCreepTest({ compliance: steep }) });
    expect(finding.outcome).toBe('pass');
    expect(finding.reason).toContain('n is above 1');
  });

  it('is borderline within the rule’s precision', () => {
    const rule = { precision: { value: '0.008', source: 'an invented round robin' } };
    const finding = creepFinding({ measure: { time: 70 }, readings: onCurve, rule, limit: { min: '0.100' } });
    expect(finding).toMatchObject({ outcome: 'pass', borderline: true, precision: { value: 0.008 } });
  });
});

describe('beyond the tested times', () => {
  it('is undecided where the rule allows no extrapolation, and shows the estimate', () => {
    const finding = creepFinding({ measure: { time: 1000 }, readings: onCurve });
    expect(finding).toMatchObject({
      outcome: 'undecided',
      margin: null,
      observed: { statistic: 'fitted' },
      wouldDecide: 'Load a specimen for 1,000 s at −10 °C.',
    });
    expect(finding.reason).toMatch(
      /^The tests end at 100 s; 1,000 s lies 1\.0 decade beyond, and the rule allows no extrapolation\. The fitted curve gives 0\.27\d there/,
    );
    expect(finding.evidence[0]?.origin).toBe('extrapolated');
    // The gauge draws from the last tested value: it stands last.
    expect(finding.evidence[0]?.inputs?.at(-1)?.at?.time).toBe(100);
  });

  it.each([
    [1000, 1, 'pass'],
    [1001, 1, 'undecided'],
    [1000, 0.99, 'undecided'],
    [100.9, 0, 'pass'],
    [102, 0, 'undecided'],
    [0.1, 1, 'pass'],
    [0.099, 1, 'undecided'],
    [36_000, 2.5, 'undecided'],
  ])('at %f s with %f decades allowed: %s', (time, extrapolationDecades, outcome) => {
    const limit = { min: '0.001' };
    expect(creepFinding({ measure: { time, extrapolationDecades }, readings: onCurve, limit }).outcome).toBe(
      outcome,
    );
  });

  it('is judged by the unfavourable bound: the lower against a least value', () => {
    const finding = creepFinding({
      measure: { time: 1000, extrapolationDecades: 1 },
      readings: onCurve,
      limit: { min: '0.273' },
    });
    // The curve itself gives 0.274 (CRP-15 at 1,000 s: 1.2 − 1.155/(1 + (1000/12712.85)^0.55) = 0.27376).
    expect(finding.outcome).toBe('fail');
    expect(finding.observed).toMatchObject({ statistic: 'lower 95 % bound' });
    expect(finding.reason).toContain('extrapolated 1.0 decade beyond the tested times');
    const [bound] = finding.evidence;
    expect(bound!.inputs![0]!.value).toBeCloseTo(0.27376, 3);
  });

  it('is judged by the unfavourable bound: the upper against a greatest value', () => {
    const finding = creepFinding({
      measure: { time: 1000, extrapolationDecades: 1 },
      readings: onCurve,
      limit: { max: '0.275' },
    });
    expect(finding).toMatchObject({ outcome: 'fail', observed: { statistic: 'upper 95 % bound' } });
  });

  it('is judged by both bounds between two limits', () => {
    const within = (min: string, max: string) =>
      creepFinding({
        measure: { time: 1000, extrapolationDecades: 1 },
        readings: onCurve,
        limit: { min, max },
      });
    expect(within('0.2', '0.4').outcome).toBe('pass');
    expect(within('0.273', '0.4')).toMatchObject({
      outcome: 'fail',
      observed: { statistic: 'lower 95 % bound' },
    });
    expect(within('0.2', '0.275')).toMatchObject({
      outcome: 'fail',
      observed: { statistic: 'upper 95 % bound' },
    });
  });

  it('is judged by the estimate where the rule says so', () => {
    const measure = { time: 1000, extrapolationDecades: 1, use: 'estimate' as const };
    const finding = creepFinding({ measure, readings: onCurve, limit: { min: '0.273' } });
    expect(finding).toMatchObject({ outcome: 'pass', observed: { rounded: 0.274 } });
  });

  it('is not shown where the rule wants it measured', () => {
    expect(creepFinding({ measure: { time: 1000, source: 'measured' } }).outcome).toBe('not shown');
  });
});

describe('indirect-tension deformations', () => {
  const faces = ['1', '2', '3'].flatMap((specimen) =>
    ['face 1', 'face 2'].map((variant) => ({ specimen, variant })),
  );
  const at = { temperature: -10 };
  /** 4 µm horizontally at 50 s and 9.5 µm vertically on each face of three discs, 50 by 150 mm, under 10 kN. */
  function deformations(overrides: { faces?: typeof faces; withLoad?: boolean } = {}): Reading[] {
    const { faces: own = faces, withLoad = true } = overrides;
    const horizontal = own.flatMap((face) =>
      [10, 50, 100].map((time) =>
        aReading({
          quantity: 'horizontal-deformation',
          value: { 10: 3, 50: 4, 100: 5 }[time]!,
          at: { ...at, ...face, time },
          source: { sheet: 'Creep', cell: 'G9', text: '4' },
        }),
      ),
    );
    const vertical = own.map((face) =>
      aReading({ quantity: 'vertical-deformation', value: 9.5, at: { ...at, ...face, time: 50 } }),
    );
    const dimension = (quantity: string, value: number) => aReading({ quantity, value, at: {} });
    return [
      ...horizontal,
      ...vertical,
      dimension('specimen-thickness', 50),
      dimension('specimen-diameter', 150),
      ...(withLoad ? [dimension('creep-load', 10)] : []),
    ];
  }

  it('give the compliance of the method over three specimens', () => {
    // X/Y = 4/9.5 = 0.421053, C = 0.6354/0.421053 − 0.332 = 1.177075; 0.004·150·50/(10·38)·C = 0.092927 at 50 s.
    const finding = creepFinding({
      measure: { time: 50 },
      readings: deformations(),
      limit: { min: '0.090' },
    });
    expect(finding.observed?.value).toBeCloseTo(0.092927, 6);
    expect(finding).toMatchObject({ outcome: 'pass', observed: { count: 3 } });
    expect(finding.evidence[0]).toMatchObject({ formula: 'ΔX·D·b/(P·GL)·C' });
    expect(finding.evidence[0]!.inputs!.find(({ symbol }) => symbol === 'GL')).toMatchObject({
      value: 38,
      formula: expect.stringContaining('from memory, verify'),
    });
  });

  it('are undecided with five faces', () => {
    const finding = creepFinding({
      measure: { time: 50 },
      readings: deformations({ faces: faces.slice(1) }),
    });
    expect(finding).toMatchObject({ outcome: 'undecided', reason: expect.stringContaining('there are 5') });
  });

  it('are undecided without load and stress', () => {
    const finding = creepFinding({ measure: { time: 50 }, readings: deformations({ withLoad: false }) });
    expect(finding).toMatchObject({
      outcome: 'undecided',
      reason: 'Neither the creep load nor the stress of specimen 1 is known.',
    });
  });

  it('take the load from the stress where only that is stated', () => {
    // P = 400·π·50·150/2·10⁻⁶ = 4.712389 kN: 0.092927·10/4.712389.
    const readings = deformations({ withLoad: false }).map((reading) =>
      reading.at.time === undefined ? reading : { ...reading, at: { ...reading.at, stress: 400 } },
    );
    const finding = creepFinding({ measure: { time: 50, stress: 400 }, readings });
    expect(finding.observed?.value).toBeCloseTo(0.197197, 5);
  });

  it('are undecided where the correction factor lies outside its limits', () => {
    const readings = deformations().map((reading) =>
      reading.quantity === 'vertical-deformation' ? { ...reading, value: 30 } : reading,
    );
    expect(creepFinding({ measure: { time: 50 }, readings })).toMatchObject({
      outcome: 'undecided',
      reason: 'The correction factor lies outside the limits of the method.',
    });
  });

  it('give way to a reported compliance where they cannot be used', () => {
    const reported = aReading({ quantity: 'creep-compliance', value: 0.11, at: { ...at, time: 50 } });
    const readings = [...deformations({ faces: faces.slice(1) }), reported];
    expect(creepFinding({ measure: { time: 50 }, readings }).outcome).toBe('pass');
  });
});

describe('no fit passes that may not', () => {
  const wild = fc.array(fc.double({ min: -1.2, max: 1.2, noNaN: true }), { minLength: 7, maxLength: 7 });

  it('a rejected fit never passes or fails, whatever the points', () => {
    let rejected = 0;
    fc.assert(
      fc.property(
        wild,
        fc.constantFrom('sigmoid' as const, 'power' as const, 'prony' as const),
        (offsets, model) => {
          const values = TEST_TIMES.map((t, i) =>
            Number((curveAtMinusTen(t) * Math.exp(offsets[i]!)).toPrecision(6)),
          );
          const readings = aCreepTest({
            as: 'compliance',
            compliance: (t) => values[TEST_TIMES.indexOf(t as 1)]!,
          });
          const fit = fitCreep(
            model,
            TEST_TIMES.map((t, i) => ({ t, D: values[i]! })),
          );
          const finding = creepFinding({
            measure: { time: 70, model },
            readings,
            limit: { min: 0, max: 1000 },
          });
          if (fit.ok && fit.fit.rejected === null) return;
          rejected += 1;
          expect(finding.outcome).toBe('undecided');
        },
      ),
      { numRuns: 150, seed: 5 },
    );
    expect(rejected).toBeGreaterThan(50);
  }, 60_000);

  it('nothing passes beyond what a rule allows, whatever the curve', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 101.1, max: 1e6, noNaN: true }),
        fc.double({ min: 0, max: 3, noNaN: true }),
        (time, extrapolationDecades) => {
          const allowed = Math.log10(time / 100) <= extrapolationDecades;
          const limit = { min: 0, max: 1e9 };
          const finding = creepFinding({ measure: { time, extrapolationDecades }, readings: onCurve, limit });
          if (!allowed && Math.abs(Math.log10(time / 100) - extrapolationDecades) > 1e-6) {
            expect(finding.outcome).toBe('undecided');
          }
        },
      ),
      { numRuns: 100, seed: 6 },
    );
  });

  it('an unidentified curve is judged by a bound as wide as what is not known', () => {
    // CRP-15 at −20 °C: nothing within 1 to 100 s holds D∞ or τ.
    const glassy = (t: number) => 1.2 - 1.155 / (1 + (t / 10 ** 5.354242509439325) ** 0.55);
    const readings = aCreepTest({ compliance: glassy, specimens: [0.99, 1, 1.01] });
    const measure = { time: 10_000, extrapolationDecades: 2 };
    // The curve gives 0.221; a rule that asks for half of that is not met by what is known.
    expect(creepFinding({ measure, readings, limit: { min: '0.110' } }).outcome).not.toBe('pass');
  });

  it('every finding is one that the schema knows', () => {
    for (const time of [0.01, 1, 70, 100, 1e6]) {
      const finding = creepFinding({ measure: { time } });
      expect(findingSchema.safeParse(finding).success).toBe(true);
    }
  });
});

describe('the seal', () => {
  it('does not depend on the order of the readings', () => {
    const readings = aCreepTest({ specimens: [0.96, 1, 1.04] });
    const seal = (own: Reading[]) =>
      checkWith({
        rule: {
          measure: { kind: 'creep-compliance', temperature: -10, time: 70 },
          limit: { min: 0.1 },
        },
        record: { readings: own },
      }).seal.findings;
    expect(seal(readings.toReversed())).toBe(seal(readings));
  });
});
