import { describe, expect, it } from 'vitest';
import { creepBandAt } from '#rules/calculations/creep-band';
import type { CreepCurve, CreepMasterCurve } from '#rules/engine/creep-analysis';
import { checkResultSchema } from '#rules/engine/finding';
import type { Reading } from '#rules/record';
import { aCreepTest, curveAtMinusTen, TEST_TIMES } from '#tests/builders/a-creep-test';
import { aReading } from '#tests/builders/a-reading';
import { checkWith } from './check-with';

function analysed(readings: Reading[]) {
  const result = checkWith({ record: { readings } });
  const { creep, recomputed } = result.analysis;
  return {
    result,
    recomputed,
    curves: creep.filter((entry): entry is CreepCurve => entry.kind === 'curve'),
    masters: creep.filter((entry): entry is CreepMasterCurve => entry.kind === 'master-curve'),
    consistency: result.findings.filter(({ rule }) => rule.startsWith('consistency/creep')),
  };
}

/** CRP-15 at 0 °C: τ is 900 s. */
const curveAtZero = (t: number) => 1.2 - 1.155 / (1 + (t / 900) ** 0.55);
/** CRP-15 at −20 °C. */
const curveAtMinusTwenty = (t: number) => 1.2 - 1.155 / (1 + (t / 10 ** 5.354242509439325) ** 0.55);

describe('the analysis of creep tests', () => {
  it('is empty without any', () => {
    expect(analysed([]).curves).toEqual([]);
  });

  it('has one curve a temperature with points, fits and where each point comes from', () => {
    const { curves } = analysed(aCreepTest({ specimens: [0.98, 1, 1.02] }));
    expect(curves).toHaveLength(1);
    const [curve] = curves;
    expect(curve).toMatchObject({
      temperature: -10,
      stress: 200,
      stresses: [200],
      specimens: ['1', '2', '3'],
    });
    expect(curve!.points).toHaveLength(21);
    expect(curve!.points[0]).toEqual({
      specimen: '1',
      temperature: -10,
      time: 1,
      stress: 200,
      // 0.98 times CRP-15's 0.05135117, as strain to six digits: 10.0648 µε under 200 kPa.
      value: 0.050324,
      count: 1,
      origin: 'recomputed',
      source: { sheet: 'Creep', cell: 'E2', text: '10.0648' },
    });
    expect(curve!.fits.map(({ model }) => model)).toEqual(['sigmoid', 'power', 'prony']);
    expect(curve!.fits[0]!.residuals).toHaveLength(21);
  });

  it('keeps everything that its curve is computed from', () => {
    const [curve] = analysed(aCreepTest()).curves;
    const band = creepBandAt(JSON.parse(JSON.stringify(curve!.fits[0])), 70, 0.95);
    expect(band.ok && band.band.estimate).toBeCloseTo(curveAtMinusTen(70), 4);
  });

  it('says how far τ lies beyond the tested times', () => {
    // log10(12712.85/100) = 2.104.
    expect(analysed(aCreepTest()).curves[0]!.fits[0]!.words).toEqual([
      'τ lies 2.1 decades beyond the tested times, so D∞ and τ are held by the shape of the curve, not by tested points.',
    ]);
  });

  it('takes temperatures within a degree together', () => {
    const readings = [-10.4, -10, -9.6].flatMap((temperature) => aCreepTest({ temperature }));
    expect(analysed(readings).curves.map(({ temperature }) => temperature)).toEqual([-10]);
  });

  it('has a curve for each stress beside the one of all, where there are several', () => {
    const readings = [...aCreepTest({ stress: 100 }), ...aCreepTest({ stress: 200 })];
    expect(analysed(readings).curves.map(({ stress, stresses }) => [stress, stresses])).toEqual([
      [null, [100, 200]],
      [100, [100]],
      [200, [200]],
    ]);
  });

  it('says what could not be used', () => {
    const { curves } = analysed(aCreepTest({ stress: null }));
    expect(curves[0]).toMatchObject({
      points: [],
      problems: ['A reading of creep strain does not say under which stress.'],
    });
  });

  it('lists each computed compliance with the stated one beside it', () => {
    const readings = [
      ...aCreepTest({ times: [100] }),
      ...aCreepTest({ as: 'compliance', times: [100], compliance: () => 0.121 }),
    ];
    const [value] = analysed(readings).recomputed.filter(({ quantity }) => quantity === 'creep-compliance');
    expect(value).toMatchObject({ formula: 'εt/σ0', reported: 0.121, unit: '1/GPa' });
  });

  it('shifts several temperatures to one curve', () => {
    const { masters } = analysed([
      ...aCreepTest({ temperature: -20, compliance: curveAtMinusTwenty }),
      ...aCreepTest({ temperature: -10 }),
      ...aCreepTest({ temperature: 0, compliance: curveAtZero }),
    ]);
    expect(masters).toHaveLength(1);
    const [master] = masters;
    expect(master!.referenceTemperature).toBe(-10);
    expect(
      master!.shifts.map(({ temperature, logShift }) => [temperature, Number(logShift.toFixed(2))]),
    ).toEqual([
      [-20, 1.25],
      [-10, 0],
      [0, -1.15],
    ]);
    expect(master!.points).toHaveLength(21);
    expect(master!.fit.residuals).toHaveLength(21);
  });

  it('has no master curve of one temperature', () => {
    expect(analysed(aCreepTest()).masters).toEqual([]);
  });

  it('is what the schema of a check says', () => {
    const { result } = analysed([
      ...aCreepTest({ temperature: -10, stress: 100 }),
      ...aCreepTest({ temperature: -10, stress: 200 }),
      ...aCreepTest({ temperature: 0, compliance: curveAtZero }),
    ]);
    expect(checkResultSchema.safeParse(JSON.parse(JSON.stringify(result))).success).toBe(true);
  });
});

describe('what does not add up in creep tests', () => {
  it('is a compliance that falls with time, as advice', () => {
    const { consistency, curves } = analysed(
      aCreepTest({ compliance: (t) => (t === 20 ? 0.06 : curveAtMinusTen(t)) }),
    );
    expect(consistency).toHaveLength(1);
    expect(consistency[0]).toMatchObject({
      rule: 'consistency/creep-compliance-falls',
      severity: 'advisory',
      outcome: 'fail',
      sentence:
        'Creep compliance at −10 °C under 200 kPa, specimen 1 falls from 0.0672 at 10 s to 0.06 at 20 s.',
    });
    expect(curves[0]!.remarks[0]).toEqual({
      holds: false,
      text: 'Compliance of specimen 1 falls between 10 and 20 s',
    });
  });

  it('is not a compliance that stands still', () => {
    expect(analysed(aCreepTest({ compliance: () => 0.05 })).consistency).toEqual([]);
  });

  it.each([
    // 0.105 and 0.1065 differ by 1.43 % (CRP-19).
    ['within 10 %', 0.1065, 0],
    ['by 10 % exactly', 0.1155, 0],
    ['by more', 0.1156, 1],
  ])('is a dependence on stress %s: %f', (_, other, count) => {
    const readings = [
      ...aCreepTest({ stress: 200, times: [50], compliance: () => 0.105 }),
      ...aCreepTest({ stress: 400, times: [50], compliance: () => other }),
    ];
    expect(analysed(readings).consistency).toHaveLength(count);
  });

  it('says how two levels of stress agree', () => {
    const readings = [
      ...aCreepTest({ stress: 200, times: [50], compliance: () => 0.105 }),
      ...aCreepTest({ stress: 400, times: [50], compliance: () => 0.1065 }),
    ];
    expect(analysed(readings).curves[0]!.remarks).toContainEqual({
      holds: true,
      text: 'Linear: 200 and 400 kPa agree within 1.4 %',
    });
  });

  it('is a reported compliance that its own strains do not give', () => {
    const readings = [
      ...aCreepTest({ times: [100] }),
      ...aCreepTest({ as: 'compliance', times: [100], compliance: () => 0.2 }),
    ];
    const { findings } = analysed(readings).result;
    expect(findings.map(({ rule }) => rule)).toContain('consistency/reported-differs');
  });

  it('does not compare specimens of which one was tested under one stress only', () => {
    const readings = [
      ...aCreepTest({ stress: 200, times: [50], specimens: [1, 2] }),
      ...aCreepTest({ stress: 400, times: [50], specimens: [1] }),
    ];
    expect(analysed(readings).consistency).toEqual([]);
  });
});

it('reads the seven times of the method whatever else a record holds', () => {
  const noise = aReading({ quantity: 'air-voids', value: 4 });
  expect(analysed([noise, ...aCreepTest()]).curves[0]!.points.map(({ time }) => time)).toEqual([
    ...TEST_TIMES,
  ]);
});
