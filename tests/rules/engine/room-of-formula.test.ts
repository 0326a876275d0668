import { describe, expect, it } from 'vitest';
import type { RoomToMove } from '#rules/engine/room';
import type { Reading } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { aRule } from '#tests/builders/a-rule-set';
import fc from '#tests/builders/seeded-fast-check';
import { reading } from './analysis-record';
import { checkWith, findingOf } from './check-with';

/** Trials whose air voids are exactly the given ones: Gmb = Gmm·(1 − Va/100) with Gmm 2.500. */
function trials(points: [trial: string, binder: number, voids: number][]): Reading[] {
  return points.flatMap(([trial, binder, voids]) => [
    reading('binder-content', binder, { trial }),
    reading('maximum-specific-gravity', 2.5, { trial }),
    reading('bulk-specific-gravity-mix', 2.5 - 0.025 * voids, { trial, specimen: '1' }),
  ]);
}

/** Air voids 5 at 5.0 % and 2.5 at 6.0 %: 17.5 − 2.5·Pb. */
const two: [string, number, number][] = [
  ['A', 5, 5],
  ['B', 6, 2.5],
];

function formula(
  expression: string,
  limit: RuleInput['limit'],
  overrides: Partial<RuleInput> = {},
): RuleInput {
  return aRule({
    id: 'formula',
    title: 'The formula',
    measure: { kind: 'formula', expression, at: { trial: 'design' } },
    limit,
    rounding: { method: 'absolute' },
    ...overrides,
  });
}

function roomOf(rule: RuleInput, readings: Reading[]): RoomToMove {
  const { analysis } = checkWith({ edition: { rules: [rule], roomToMove: [rule.id] }, record: { readings } });
  if (analysis.roomToMove === null) throw new Error('No room was computed.');
  return analysis.roomToMove;
}

const declared = (value: number) => reading('binder-content', value);
const ruleOf = (room: RoomToMove) => room.rules[0];

describe('the room of a formula', () => {
  it('follows each symbol on its own curve', () => {
    // Pb/Va = Pb/(17.5 − 2.5·Pb): at least 1.5 from Pb = 26.25/4.75 = 5.5263; at most 2.0 to Pb = 35/6 = 5.8333.
    const room = roomOf(formula('Pb/Va', { min: '1.5', max: '2.0' }), [...trials(two), declared(5.6)]);
    expect(room.room).toMatchObject({ from: 5.53, to: 5.83, closedBelowBy: ['formula'] });
    expect(ruleOf(room)).toMatchObject({ state: 'computed', fit: 'linear', trials: { from: 5, to: 6 } });
  });

  it('is unbroken or in pieces as the formula turns between the trials', () => {
    // (Va − 3.75)² is 0 at 5.5 and 0.0625 at 5.4 and 5.6: at least 0.0625 to 5.40 and again from 5.60.
    const room = roomOf(formula('(Va - 3.75)^2', { min: '0.0625' }), [...trials(two), declared(5.2)]);
    expect(ruleOf(room)?.holds).toEqual([
      { from: 5, to: 5.4, below: 'trials', above: 'limit' },
      { from: 5.6, to: 6, below: 'limit', above: 'trials' },
    ]);
  });

  it('takes aggregate, binder and job-mix gradation as the same at every content', () => {
    const readings = [
      ...trials(two),
      declared(5.2),
      reading('percent-passing', 5, { trial: 'design', sieve: 0.075 }),
      reading('bulk-specific-gravity-aggregate', 2.5),
    ];
    // 5·2.5 − (17.5 − 2.5·Pb) is 9.0 at 5.6.
    const room = roomOf(formula('P0.075*Gsb - Va', { min: '9' }), readings);
    expect(room.room).toMatchObject({ from: 5.6, to: 6, closedAboveBy: [] });
  });

  it('leaves out what does not follow the binder content, and says so', () => {
    const strengths = [
      reading('tensile-strength-dry', 900),
      reading('tensile-strength-conditioned', 800),
      reading('bulk-specific-gravity-aggregate', 2.6),
    ];
    const reason = (expression: string, overrides: Partial<RuleInput> = {}) =>
      ruleOf(
        roomOf(formula(expression, { min: '0' }, overrides), [...trials(two), declared(5.2), ...strengths]),
      );
    expect(reason('TSR/Va')).toMatchObject({
      state: 'left out',
      reason: 'Tensile strength ratio is never taken from other trials.',
    });
    expect(reason('Gsb - 2')).toMatchObject({
      state: 'left out',
      reason: 'Nothing in its formula changes with the binder content.',
    });
    const hot = { kind: 'formula' as const, expression: 'Va', at: { trial: 'design', temperature: 40 } };
    expect(reason('Va', { measure: hot })?.state).toBe('left out');
  });

  it('gives none where a symbol lacks its data', () => {
    const room = roomOf(formula('Va/VMA', { max: '1' }), [...trials(two), declared(5.2)]);
    expect(room).toMatchObject({
      room: null,
      reason: expect.stringMatching(/No trial has a recomputed value/),
    });
    expect(ruleOf(roomOf(formula('Va*Gsb', { max: '9' }), [...trials(two), declared(5.2)]))?.state).toBe(
      'not computed',
    );
  });

  it('holds to 0.01 % what the rule itself gives at that content', () => {
    const hundredth = (min: number, max: number) => fc.integer({ min, max }).map((value) => value / 100);
    const anything = fc.record({
      voids: fc.array(hundredth(100, 900), { minLength: 4, maxLength: 4 }),
      expression: fc.constantFrom('Pb/Va', 'Va*Pb', '(Va - 4)^2', 'Va - Pb', 'sqrt(Va) + Pb'),
      limit: hundredth(0, 3000),
      to: fc.constantFrom(0.01, 0.1, 1),
      asked: hundredth(450, 600),
    });
    fc.assert(
      fc.property(anything, ({ voids, expression, limit, to, asked }) => {
        // Within 0.05 of a trial the rule reads that trial and not the curve.
        fc.pre([4.5, 5, 5.5, 6].every((content) => Math.abs(content - asked) > 0.05));
        const points = voids.map((value, place): [string, number, number] => [
          `T${place}`,
          4.5 + place / 2,
          value,
        ]);
        const rule = formula(expression, { max: String(limit) }, { rounding: { method: 'rounding', to } });
        const readings = [...trials(points), declared(asked)];
        const holds = ruleOf(roomOf(rule, readings))?.holds ?? [];
        const isInside = holds.some(({ from, to: end }) => from <= asked && asked <= end);
        expect(findingOf({ rule, record: { readings } }).outcome).toBe(isInside ? 'pass' : 'fail');
      }),
      { numRuns: 80 },
    );
  }, 60_000);
});
