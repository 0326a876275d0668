import { describe, expect, it } from 'vitest';
import fc from '#tests/builders/seeded-fast-check';
import { placeNotes } from '../../../../web/features/findings/lib/place-notes';

describe('notes in the margin', () => {
  it('stand level with their rows and reach to the rule', () => {
    expect(
      placeNotes([
        { rowTop: 0, height: 40 },
        { rowTop: 100, height: 40 },
      ]),
    ).toEqual([
      { offset: 0, leader: true },
      { offset: 0, leader: true },
    ]);
  });

  it('move 8 px below the one before where they would meet, and lose their leader', () => {
    expect(
      placeNotes([
        { rowTop: 0, height: 60 },
        { rowTop: 36, height: 40 },
        { rowTop: 72, height: 20 },
      ]),
    ).toEqual([
      { offset: 0, leader: true },
      { offset: 32, leader: false },
      { offset: 44, leader: false },
    ]);
  });

  it('keep several notes of one row in their order', () => {
    const [first, second] = placeNotes([
      { rowTop: 10, height: 30 },
      { rowTop: 10, height: 30 },
    ]);
    expect(first).toEqual({ offset: 0, leader: true });
    expect(second).toEqual({ offset: 38, leader: false });
  });

  it('never stand over each other nor above their row', () => {
    const boxes = fc.array(fc.record({ rowTop: fc.nat(2000), height: fc.nat(200) }), { maxLength: 30 });
    fc.assert(
      fc.property(boxes, (unsorted) => {
        const sorted = [...unsorted].sort((one, other) => one.rowTop - other.rowTop);
        const placed = placeNotes(sorted).map((note, index) => ({
          ...note,
          top: (sorted[index]?.rowTop ?? 0) + note.offset,
          bottom: (sorted[index]?.rowTop ?? 0) + note.offset + (sorted[index]?.height ?? 0),
        }));
        placed.forEach((note, index) => {
          expect(note.offset).toBeGreaterThanOrEqual(0);
          const before = placed[index - 1];
          if (before) expect(note.top).toBeGreaterThanOrEqual(before.bottom + 8);
        });
      }),
    );
  });
});
