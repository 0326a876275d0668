import { describe, expect, it } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import type { Reading } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { creepView } from '#server/presenters/creep-view';
import { creepViewSchema } from '#shared/contracts/creep';
import { aCreepTest, curveAtMinusTen } from '#tests/builders/a-creep-test';
import { aContext, aRecord } from '#tests/builders/a-record';
import { anEdition, aRule } from '#tests/builders/a-rule-set';

function aCreepRule(id: string, measure: object, limit: RuleInput['limit']): RuleInput {
  return aRule({
    id,
    clause: `1.${id}`,
    title: 'Creep compliance',
    measure: { kind: 'creep-compliance', temperature: -10, time: 100, ...measure },
    limit,
    rounding: { method: 'rounding', to: 0.001 },
  });
}

function viewOf(readings: Reading[], rules: RuleInput[]) {
  const edition = anEdition({ rules });
  const { analysis, findings } = evaluate(aRecord({ readings }), edition, aContext());
  return creepView({ creep: analysis.creep, findings, rules: edition.rules });
}

const three = aCreepTest({ specimens: [0.98, 1, 1.02] });

describe('the view of creep tests', () => {
  it('is what its contract says, without what only a fit needs', () => {
    const view = viewOf([...three, ...aCreepTest({ temperature: 0 })], [aCreepRule('a', {}, { min: '0.1' })]);
    const seal = Object.fromEntries(
      ['seal', 'record', 'resolvedEdition', 'context', 'engineVersion', 'engine', 'findings'].map((name) => [
        name,
        'x',
      ]),
    );
    const parsed = creepViewSchema.safeParse({ ...view, seal, startingPoint: false });
    expect(parsed.error?.issues ?? []).toEqual([]);
    expect(view.master?.shifts.map(({ temperature }) => temperature)).toEqual([-10, 0]);
  });

  it('samples each curve from before the tests to a decade beyond them', () => {
    const [curve] = viewOf(three, []).curves;
    const { samples } = curve!.fits[0]!;
    expect([samples[0]!.time, samples.at(-1)!.time]).toEqual(
      [1 / 2.2, 1000].map((time) => Number(time.toPrecision(12))),
    );
    for (const { time, estimate, lower, upper } of samples) {
      expect(estimate / curveAtMinusTen(time)).toBeCloseTo(1, 1);
      if (lower !== null && upper !== null) expect(lower < estimate && estimate < upper).toBe(true);
    }
  });

  it('puts each finding on the curve of its temperature, with value, limits and band in 1/GPa', () => {
    const view = viewOf(three, [
      aCreepRule('measured', {}, { min: '0.100' }),
      aCreepRule('beyond', { time: 1000 }, { min: '0.180' }),
      aCreepRule('warm', { temperature: 5 }, { max: '0.5' }),
    ]);
    const [curve] = view.curves;
    expect(curve!.findings.map(({ finding, source, min }) => [finding.rule, source, min])).toEqual([
      ['beyond', 'extrapolated', 0.18],
      ['measured', 'measured', 0.1],
    ]);
    expect(curve!.findings[0]!.band!.lower).toBeLessThan(curve!.findings[0]!.estimate!);
    expect(view.others.map(({ finding }) => [finding.rule, finding.outcome])).toEqual([
      ['warm', 'not shown'],
    ]);
  });

  it('shows the estimate where its bound was judged', () => {
    const rule = aCreepRule('bound', { time: 1000, extrapolationDecades: 1 }, { min: '0.01' });
    const [view] = viewOf(three, [rule]).curves[0]!.findings;
    expect(view!.finding.observed!.value).toBeLessThan(view!.estimate!);
    expect(view!.estimate! / curveAtMinusTen(1000)).toBeCloseTo(1, 1);
  });

  it('puts a rule of one stress on the curve of that stress', () => {
    const readings = [...aCreepTest({ stress: 100 }), ...aCreepTest({ stress: 200 })];
    const { curves } = viewOf(readings, [aCreepRule('a', { stress: 200 }, { min: '0.1' })]);
    expect(curves.map(({ stress, findings }) => [stress, findings.length])).toEqual([
      [null, 0],
      [100, 0],
      [200, 1],
    ]);
  });

  it('calls a value reported where no strain stands behind it', () => {
    const { curves } = viewOf(aCreepTest({ as: 'compliance', specimens: [1, 1.01] }), [
      aCreepRule('a', {}, { min: '0.1' }),
    ]);
    expect(curves[0]!.findings[0]!.source).toBe('reported');
  });

  it('has tests without any rule on them, and nothing without tests', () => {
    expect(viewOf(three, []).curves[0]!.findings).toEqual([]);
    expect(viewOf([], [])).toEqual({ curves: [], master: null, others: [] });
  });
});
