import { describe, expect, it } from 'vitest';
import type { RoomOfRule, RoomToMove } from '#rules/engine/room';
import { roomWords } from '#rules/engine/room-words';
import { roomGeometry } from '../../../../web/features/room/lib/room-geometry';

const rule = (id: string, overrides: Partial<RoomOfRule> = {}): RoomOfRule => ({
  rule: id,
  clause: '412.03(d)',
  title: id,
  state: 'computed',
  reason: null,
  limitWords: '',
  fit: 'linear',
  trials: { from: 5, to: 6 },
  holds: [{ from: 5.4, to: 6, below: 'limit', above: 'trials' }],
  ...overrides,
});

function geometryOf(room: Partial<RoomToMove> = {}, earlier: number | null = 5.2, namesPx = 300) {
  const whole: RoomToMove = {
    declaredBinderContent: 5.5,
    trials: [5, 6].map((binderContent, place) => ({
      trial: 'AB'[place]!,
      binderContent,
      source: { sheet: 'Trials', cell: `C${place}`, text: String(binderContent) },
    })),
    rules: [rule('dust'), rule('density', { state: 'left out', holds: [], reason: 'x' })],
    room: { from: 5.4, to: 6, closedBelowBy: ['dust'], closedAboveBy: [], containsDeclared: true },
    excluding: [],
    reason: null,
    ...room,
  };
  return roomGeometry(
    {
      room: { ...whole, words: roomWords(whole) },
      earlier: earlier === null ? null : { revision: 0, binderContent: earlier },
    },
    1,
    { widthPx: 960, namesPx, rowPx: 30 },
  );
}

describe('the drawing of the room to move', () => {
  it('keeps binder contents in proportion within the frame', () => {
    const { trials, room, frame } = geometryOf();
    const [first, second] = trials;
    expect(first!.x).toBeGreaterThan(frame.left);
    expect(second!.x).toBeLessThan(frame.right);
    // 5.4 lies two fifths of the way from 5 to 6.
    expect((room!.x1 - first!.x) / (second!.x - first!.x)).toBeCloseTo(0.4, 9);
    expect(room).toMatchObject({ label: 'room 5.40 to 6.00', x2: second!.x });
  });

  it('marks the tick that closes the room, and dots the end of the trials', () => {
    const [dust] = geometryOf().rows;
    expect(dust?.bars[0]?.ends.map(({ kind, closesRoom }) => [kind, closesRoom])).toEqual([
      ['limit', true],
      ['trials', false],
    ]);
  });

  it('puts words in place of a bar that cannot be drawn', () => {
    const { rows } = geometryOf({
      rules: [
        rule('density', { state: 'left out', holds: [], reason: 'x' }),
        rule('dust', { holds: [] }),
        rule('vma', { state: 'not computed', holds: [], reason: 'No trial has one.' }),
      ],
    });
    expect(rows.map(({ words }) => words)).toEqual(['left out', 'nowhere within the trials', 'not computed']);
  });

  it('sets the two designs apart, the later one on its own side', () => {
    const { present, earlier } = geometryOf();
    expect([present?.label, present?.side]).toEqual(['r1 5.50', 'right']);
    expect([earlier?.label, earlier?.side]).toEqual(['r0 5.20', 'left']);
    expect(geometryOf({}, 5.8).present?.side).toBe('left');
    expect(geometryOf({}, 5.5).earlier).toBeNull();
    expect(geometryOf({ declaredBinderContent: null }).present).toBeNull();
    // Alone it keeps clear of the room, which begins at 5.4.
    expect(geometryOf({ declaredBinderContent: 5.3 }, null).present?.side).toBe('left');
    expect(geometryOf({ declaredBinderContent: 5.4 }, null).present?.side).toBe('right');
  });

  it('widens to a declared content beyond the trials', () => {
    const { present, frame } = geometryOf({ declaredBinderContent: 6.8 });
    expect(present!.x).toBeLessThan(frame.right);
  });

  it('puts the names above the bars where there is no room beside them', () => {
    const [row] = geometryOf({}, null, 0).rows;
    expect(row!.nameY).toBeLessThan(row!.y);
  });
});
