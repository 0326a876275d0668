import { beforeAll, describe, expect, it, vi } from 'vitest';
import { readAnyLayout } from '#rules/reading/read-any-layout';
import { unreadReasons } from '#rules/reading/unread-reason';
import { demoEdition } from '#tests/workbooks/demo/write-demo-workbooks';
import { heldOutLayouts } from './held-out-layouts';
import { knownLayouts } from './known-layouts';
import { score } from './score';

vi.setConfig({ testTimeout: 60_000, hookTimeout: 60_000 });

const edition = demoEdition();
const layouts = [...knownLayouts, ...heldOutLayouts];

/** Readings of all layouts together, and what each layout is told apart by where it falls short. */
function scoreAll(laidOut: typeof knownLayouts) {
  const totals = { expected: 0, found: 0, wrong: 0, numeric: 0, notRecognised: 0 };
  const told: string[] = [];
  for (const { name, make } of laidOut) {
    const book = make();
    const grid = book.toGrid();
    const result = readAnyLayout({ grid, edition, answers: [] });
    const one = score(result, book.truth);
    totals.expected += one.expected;
    totals.found += one.found;
    totals.wrong += one.wrong;
    totals.numeric += grid.sheets
      .flatMap(({ cells }) => cells)
      .filter(({ kind }) => kind === 'number').length;
    totals.notRecognised += result.unread.filter(
      ({ reason }) => reason === unreadReasons.notRecognised,
    ).length;
    if (one.wrong > 0 || one.found < one.expected) {
      told.push(
        `${name}: ${one.found} of ${one.expected}, ${one.wrong} wrong, ${one.doubts} doubts`,
        ...one.extra,
        ...one.missing,
      );
    }
  }
  return { ...totals, told: told.join('\n') };
}

describe('workbooks in thirty-odd layouts', () => {
  let all: ReturnType<typeof scoreAll>;
  beforeAll(() => {
    all = scoreAll(layouts);
  });

  it('are read with at least 95 % of their readings and at most 0.5 % of them wrong', () => {
    const { expected, found, wrong, told } = all;
    expect(found / expected, told).toBeGreaterThanOrEqual(0.95);
    expect(wrong / expected, told).toBeLessThanOrEqual(0.005);
  });

  it('leave at most 2 % of their numeric cells without a heading that is known', () => {
    const { numeric, notRecognised, told } = all;
    expect(notRecognised / numeric, told).toBeLessThanOrEqual(0.02);
  });

  it.each(layouts.map((layout) => [layout.name, layout] as const))(
    'end every filled cell of "%s" as used, doubted or unused',
    (_, { make }) => {
      const grid = make().toGrid();
      const { uses, unread } = readAnyLayout({ grid, edition, answers: [] });
      const known = new Set(uses.map(({ sheet, cell }) => `${sheet}!${cell}`));
      const cells = grid.sheets.flatMap(({ name, cells: filled }) =>
        filled.map(({ address }) => `${name}!${address}`),
      );
      expect(cells.filter((cell) => !known.has(cell))).toEqual([]);
      const reasons = new Set<string>(Object.values(unreadReasons));
      expect(unread.filter(({ reason }) => !reasons.has(reason))).toEqual([]);
    },
  );
});
