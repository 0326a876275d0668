import { describe, expect, it } from 'vitest';
import { propertyAt } from '#rules/calculations/design-point';
import type { RoomToMove } from '#rules/engine/room';
import { stretchesOf } from '#rules/engine/room-stretches';
import { type RoundingMethod, roundTo } from '#rules/numerics/round';
import type { Reading } from '#rules/record';
import type { RuleInput, RuleSetInput } from '#rules/rule-sets/schema';
import { attributes } from '#tests/builders/a-record';
import { aRule } from '#tests/builders/a-rule-set';
import fc from '#tests/builders/seeded-fast-check';
import { reading } from './analysis-record';
import { checkWith } from './check-with';

/** Trials whose air voids are exactly the given ones: Gmb = Gmm·(1 − Va/100) with Gmm 2.500. */
function trials(points: [trial: string, binder: number, voids: number][], specimens = 2): Reading[] {
  return points.flatMap(([trial, binder, voids]) => [
    reading('binder-content', binder, { trial }),
    reading('maximum-specific-gravity', 2.5, { trial }),
    ...Array.from({ length: specimens }, (_, place) =>
      reading('bulk-specific-gravity-mix', 2.5 - 0.025 * voids, { trial, specimen: String(place + 1) }),
    ),
  ]);
}

/** The trials of MAR-07: 23.28 − 5.588571·Pb + 0.342857·Pb² by least squares (numpy). */
const five: [string, number, number][] = [
  ['A', 4, 6.4],
  ['B', 4.5, 5.1],
  ['C', 5, 3.9],
  ['D', 5.5, 2.9],
  ['E', 6, 2.1],
];
/** Air voids 5 at 5.0 % and 2.5 at 6.0 %, both exact in binary; 3.75 at 5.5 %. */
const exact: [string, number, number][] = [
  ['A', 5, 5],
  ['B', 6, 2.5],
];

const voids = (overrides: Partial<RuleInput> = {}): RuleInput =>
  aRule({
    id: 'voids',
    clause: '1.1',
    title: 'Air voids',
    measure: { kind: 'reading', quantity: 'air-voids', at: { trial: 'design' } },
    limit: { target: '4.0', tolerance: '0.5' },
    rounding: { method: 'rounding', to: 0.1 },
    ...overrides,
  });
const content = (limit: RuleInput['limit'], overrides: Partial<RuleInput> = {}): RuleInput =>
  aRule({
    id: 'content',
    clause: '1.2',
    title: 'Binder content',
    measure: { kind: 'reading', quantity: 'binder-content', at: { trial: 'design' } },
    limit,
    rounding: { method: 'absolute' },
    ...overrides,
  });

function roomOf(rules: RuleInput[], readings: Reading[], edition: Partial<RuleSetInput> = {}): RoomToMove {
  const roomToMove = edition.roomToMove ?? rules.map(({ id }) => id);
  const { analysis } = checkWith({ edition: { rules, ...edition, roomToMove }, record: { readings } });
  if (analysis.roomToMove === null) throw new Error('No room was computed.');
  return analysis.roomToMove;
}

const declared = (value: number) => reading('binder-content', value);
const ofRule = (room: RoomToMove, id: string) => room.rules.find(({ rule }) => rule === id);

describe('where one rule holds', () => {
  it('is read off the parabola, each end inside by its own rounding', () => {
    const room = roomOf([voids()], [...trials(five), declared(5)]);
    // 4.55 rounds to 4.6, half to even, and is met at 4.7159; 3.45 rounds to 3.4 and is met at 5.21998 (numpy).
    expect(ofRule(room, 'voids')).toMatchObject({
      state: 'computed',
      fit: 'quadratic',
      limitWords: '4.0 ± 0.5 %',
      trials: { from: 4, to: 6 },
      holds: [{ from: 4.72, to: 5.21, below: 'limit', above: 'limit' }],
    });
    expect(room.room).toEqual({
      from: 4.72,
      to: 5.21,
      closedBelowBy: ['voids'],
      closedAboveBy: ['voids'],
      containsDeclared: true,
    });
  });

  it('is narrower without rounding', () => {
    const room = roomOf([voids({ rounding: { method: 'absolute' } })], [...trials(five), declared(5)]);
    // 4.5 is met at 4.7370, 3.5 at 5.1945 (numpy).
    expect(room.room).toMatchObject({ from: 4.74, to: 5.19 });
  });

  it('ends with the trials, dotted, where no limit is met before', () => {
    const room = roomOf([voids({ limit: { max: '4.5' } })], [...trials(five), declared(5)]);
    expect(ofRule(room, 'voids')?.holds).toEqual([{ from: 4.72, to: 6, below: 'limit', above: 'trials' }]);
    expect(room.room).toMatchObject({ closedBelowBy: ['voids'], closedAboveBy: [] });
  });

  it('follows the line between neighbours with fewer than four contents', () => {
    const room = roomOf([voids()], [...trials(five.slice(1, 4)), declared(5)]);
    // 5.1 − 2.4·(Pb − 4.5) is 4.55 at 4.7292; 3.9 − 2·(Pb − 5) is 3.45 at 5.225.
    expect(ofRule(room, 'voids')).toMatchObject({ fit: 'linear', holds: [{ from: 4.73, to: 5.22 }] });
  });

  it('includes the limit itself, and leaves it out where it is exclusive', () => {
    const rounding = { method: 'absolute' as const };
    const from = (limit: RuleInput['limit']) =>
      roomOf([voids({ limit, rounding })], [...trials(exact), declared(5.5)]).room?.from;
    expect(from({ max: '3.75' })).toBe(5.5);
    expect(from({ max: '3.75', exclusive: true })).toBe(5.51);
  });

  it('rounds an exact half as the rule does', () => {
    const to = (method: RoundingMethod) => {
      const rounding = { method, to: 0.5 };
      const rule = voids({ limit: { min: '4.0' }, rounding });
      return roomOf([rule], [...trials(exact), declared(5.2)]).room?.to;
    };
    // At 5.5 % it is 3.75, half way from 3.5 to 4.0: up to the even half step; cut off it is 3.5, and 4.0 ends at 5.4.
    expect(to('rounding')).toBe(5.5);
    expect(to('half-up')).toBe(5.5);
    expect(to('truncate')).toBe(5.4);
  });

  it('is two ranges where a parabola dips below a least', () => {
    // VMA 14.9, 14.6, 14.5, 14.7, 15.1 (MAR-07), least 14.51 at 4.8971; 14.55 rounds to 14.6 and is met at 4.6173 and 5.1768 (numpy).
    const points = [14.9, 14.6, 14.5, 14.7, 15.1];
    const holds = stretchesOf({
      from: 4,
      to: 6,
      turns: [4.8971],
      sideAt: (at) => {
        const value = propertyAt(
          points.map((vma, place) => ({ Pb: 4 + place / 2, value: vma })),
          at,
          'quadratic',
        );
        return value.ok && roundTo({ value: value.value, to: 0.1, method: 'rounding' }) >= 14.6
          ? 'inside'
          : 'below';
      },
    });
    expect(holds).toEqual([
      { from: 4, to: 4.61, below: 'trials', above: 'limit' },
      { from: 5.18, to: 6, below: 'limit', above: 'trials' },
    ]);
  });
});

describe('the room of several rules', () => {
  it('is where all hold, with the rule that closes each end', () => {
    const room = roomOf([voids(), content({ min: '5.0' })], [...trials(five), declared(5.1)]);
    expect(room.room).toEqual({
      from: 5,
      to: 5.21,
      closedBelowBy: ['content'],
      closedAboveBy: ['voids'],
      containsDeclared: true,
    });
  });

  it('names both where two rules close it at the same content', () => {
    const room = roomOf([voids(), content({ max: '5.21' })], [...trials(five), declared(5)]);
    expect(room.room?.closedAboveBy).toEqual(['voids', 'content']);
  });

  it('does not take the end of the trials for a limit', () => {
    const room = roomOf([voids({ limit: { max: '7.0' } }), content({ min: '4.0' })], trials(five));
    expect(room.room).toMatchObject({ from: 4, to: 6, closedBelowBy: [], closedAboveBy: [] });
  });

  it('lies elsewhere where the declared content is outside, and says so', () => {
    const room = roomOf([voids()], [...trials(five), declared(5.4)]);
    expect(room.room).toMatchObject({ from: 4.72, to: 5.21, containsDeclared: false });
  });

  it('says which two rules cross where no content meets all', () => {
    const room = roomOf(
      [voids(), content({ min: '5.30' }), content({ min: '4' }, { id: 'wide' })],
      [...trials(five), declared(5)],
    );
    expect(room).toMatchObject({ room: null, excluding: ['voids', 'content'], reason: null });
  });

  it('names the one rule that holds nowhere', () => {
    const room = roomOf(
      [voids({ limit: { max: '1.0' } }), content({ min: '4' })],
      [...trials(five), declared(5)],
    );
    expect(room).toMatchObject({ room: null, excluding: ['voids'], reason: null });
  });

  it('is none of its own where the edition chose no rules', () => {
    const { analysis } = checkWith({ edition: { rules: [voids()] }, record: { readings: trials(five) } });
    expect(analysis.roomToMove).toBeNull();
  });
});

describe('what cannot be followed', () => {
  const density = aRule({
    id: 'density',
    title: 'Density at the initial gyrations',
    measure: {
      kind: 'reading',
      quantity: 'relative-density',
      at: { trial: 'design', gyrations: 'initial' },
    },
    limit: { max: '89.0' },
  });

  it('leaves relative density out by name, because it is never taken from other trials', () => {
    const room = roomOf([voids(), density], [...trials(five), declared(5)]);
    expect(ofRule(room, 'density')).toMatchObject({ state: 'left out', holds: [], trials: null });
    expect(room.room).toMatchObject({ from: 4.72, to: 5.21 });
  });

  it('gives no room where a rule lacks its data, and says which', () => {
    const room = roomOf(
      [voids(), aRule({ measure: { kind: 'reading', quantity: 'voids-in-mineral-aggregate' } })],
      [...trials(five), declared(5)],
    );
    expect(room.room).toBeNull();
    expect(room.reason).toBe(
      'Voids in the mineral aggregate: No trial has a recomputed value of voids in the mineral aggregate.',
    );
  });

  it('never reads values that are only reported', () => {
    const stated = five.flatMap(([trial, binder, value]) => [
      reading('binder-content', binder, { trial }),
      reading('air-voids', value, { trial }, { origin: 'reported' }),
    ]);
    expect(roomOf([voids()], [...stated, declared(5)]).room).toBeNull();
  });

  it('gives none from a single trial', () => {
    const room = roomOf([voids()], [...trials(five.slice(0, 1)), declared(4)]);
    expect(room.reason).toMatch(/Only one trial binder content/);
  });

  it('gives none where a trial has fewer specimens than the rule asks for', () => {
    const rule = voids({
      measure: { kind: 'reading', quantity: 'air-voids', at: { trial: 'design' }, minimumCount: 3 },
    });
    expect(roomOf([rule], [...trials(five), declared(5)]).reason).toMatch(/asks for at least 3/);
    expect(roomOf([rule], [...trials(five, 3), declared(5)]).room).not.toBeNull();
  });

  it('gives none while a cell behind one of the trials is in doubt', () => {
    const { analysis } = checkWith({
      edition: { rules: [voids()], roomToMove: ['voids'] },
      record: {
        readings: [...trials(five), declared(5)],
        doubts: [
          {
            sheet: 'Trials',
            cell: 'E9',
            text: '2.40*',
            reason: 'E9 has a mark',
            alternatives: [],
            about: { quantity: 'maximum-specific-gravity', at: { trial: 'B' } },
          },
        ],
      },
    });
    expect(analysis.roomToMove?.room).toBeNull();
    expect(analysis.roomToMove?.reason).toMatch(/Trials E9/);
  });

  it('passes over a rule that does not apply, and waits where that is not known', () => {
    const rules = [
      voids(),
      content({ min: '5.0' }, { when: { fact: 'mixType', operator: 'equal', value: 'open-graded' } }),
    ];
    const edition = { rules, roomToMove: ['voids', 'content'] };
    const of = (mixType: string | null) =>
      checkWith({
        edition,
        record: {
          readings: [...trials(five), declared(5)],
          attributes: attributes(mixType === null ? {} : { mixType }),
        },
      }).analysis.roomToMove;
    expect(of('dense-graded')?.room?.from).toBe(4.72);
    expect(of('open-graded')?.room?.from).toBe(5);
    expect(of(null)).toMatchObject({ room: null, reason: expect.stringMatching(/not known/) });
  });

  it('counts the design among the trials where it was compacted itself at a content of its own', () => {
    const own = [
      ...trials([exact[0]!, exact[1]!]),
      declared(5.5),
      reading('maximum-specific-gravity', 2.5, { trial: 'design' }),
      reading('bulk-specific-gravity-mix', 2.4, { trial: 'design', specimen: '1' }),
    ];
    expect(roomOf([voids()], own).trials).toMatchObject([
      { trial: 'A', binderContent: 5 },
      { trial: 'design', binderContent: 5.5 },
      { trial: 'B', binderContent: 6 },
    ]);
    const restated = own.map((each) =>
      each.quantity === 'binder-content' && each.value === 5.5 ? declared(5.05) : each,
    );
    expect(roomOf([voids()], restated).trials.map(({ trial }) => trial)).toEqual(['A', 'B']);
  });
});

describe('for any trials and any limit', () => {
  const hundredth = (min: number, max: number) => fc.integer({ min, max }).map((value) => value / 100);
  const anything = fc.record({
    contents: fc.uniqueArray(hundredth(350, 750), { minLength: 2, maxLength: 6 }),
    values: fc.array(hundredth(0, 900), { minLength: 6, maxLength: 6 }),
    method: fc.constantFrom<RoundingMethod>('rounding', 'half-up', 'truncate', 'absolute'),
    to: fc.constantFrom(0.01, 0.1, 0.5, 1),
    min: fc.option(hundredth(0, 500)),
    width: fc.option(hundredth(0, 400)),
    exclusive: fc.boolean(),
  });

  it('every content inside holds when it is judged again, and 0.01 beyond an end it does not', () => {
    fc.assert(
      fc.property(anything, ({ contents, values, method, to, min, width, exclusive }) => {
        const max = width === null ? null : Number(((min ?? 0) + width).toFixed(2));
        fc.pre(min !== null || max !== null);
        const points = [...contents]
          .sort((a, b) => a - b)
          .map((Pb, place) => ({ Pb, value: values[place]! }));
        const room = roomOf(
          [
            voids({
              limit: {
                ...(min === null ? {} : { min: String(min) }),
                ...(max === null ? {} : { max: String(max) }),
                exclusive,
              },
              rounding: { method, to },
            }),
          ],
          trials(points.map(({ Pb, value }, place) => [`T${place}`, Pb, value])),
        );
        const computed = points.map(({ Pb, value }) => ({
          Pb,
          value: (100 * (2.5 - (2.5 - 0.025 * value))) / 2.5,
        }));
        const holdsAt = (Pb: number) => {
          const value = propertyAt(computed, Pb, 'quadratic');
          if (!value.ok) return false;
          const judged = roundTo({ value: value.value, to, method });
          const isAbove = min === null || (exclusive ? judged > min : judged >= min);
          const isBelow = max === null || (exclusive ? judged < max : judged <= max);
          return isAbove && isBelow;
        };
        const { holds } = ofRule(room, 'voids')!;
        const first = Math.round(points[0]!.Pb * 100);
        const last = Math.round(points.at(-1)!.Pb * 100);
        for (let at = first; at <= last; at += 1) {
          const isInside = holds.some(({ from, to: end }) => from <= at / 100 && at / 100 <= end);
          if (isInside !== holdsAt(at / 100))
            throw new Error(`${at / 100} is ${isInside ? '' : 'not '}inside.`);
        }
        for (const { from, to: end } of holds) {
          expect([from, end]).toEqual([Math.round(from * 100) / 100, Math.round(end * 100) / 100]);
          expect(from).toBeGreaterThanOrEqual(first / 100);
          expect(end).toBeLessThanOrEqual(last / 100);
        }
      }),
      { numRuns: 100 },
    );
  }, 60_000);
});
