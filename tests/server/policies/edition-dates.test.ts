import { describe, expect, it } from 'vitest';
import { type DatedEdition, editionState, holdsOn, layersOn } from '#server/policies/edition-dates';

function anEdition(changes: Partial<DatedEdition>): DatedEdition {
  return {
    ruleSetKey: 'section-1',
    edition: '2026',
    effectiveFrom: '2026-01-01',
    effectiveTo: null,
    layerOfKey: null,
    layerOfEdition: null,
    withdrawn: false,
    ...changes,
  };
}

const earlier = anEdition({ edition: '2024', effectiveFrom: '2024-01-01' });
const later = anEdition({});

describe('an edition', () => {
  it('is not yet in force on the day before its first day, and in force on it', () => {
    const all = [later];
    expect(editionState(later, { all, today: '2025-12-31' })).toBe('not yet in force');
    expect(editionState(later, { all, today: '2026-01-01' })).toBe('in force');
  });

  it('without a last day holds until the day before the next one begins', () => {
    const all = [earlier, later];
    expect(holdsOn(earlier, { all, date: '2025-12-31' })).toBe(true);
    expect(holdsOn(earlier, { all, date: '2026-01-01' })).toBe(false);
    expect(editionState(earlier, { all, today: '2026-01-01' })).toBe('superseded');
  });

  it('with a last day holds on it and not on the next', () => {
    const ending = anEdition({ effectiveTo: '2026-06-30' });
    expect(holdsOn(ending, { all: [ending], date: '2026-06-30' })).toBe(true);
    expect(holdsOn(ending, { all: [ending], date: '2026-07-01' })).toBe(false);
  });

  it('goes on where the next one was withdrawn', () => {
    const all = [earlier, { ...later, withdrawn: true }];
    expect(holdsOn(earlier, { all, date: '2026-03-01' })).toBe(true);
  });

  it('of another rule set ends nothing', () => {
    const all = [earlier, anEdition({ ruleSetKey: 'section-2' })];
    expect(holdsOn(earlier, { all, date: '2026-03-01' })).toBe(true);
  });

  it('that is withdrawn holds on no day', () => {
    const withdrawn = anEdition({ withdrawn: true });
    expect(holdsOn(withdrawn, { all: [withdrawn], date: '2026-03-01' })).toBe(false);
    expect(editionState(withdrawn, { all: [withdrawn], today: '2026-03-01' })).toBe('withdrawn');
  });
});

describe('layers', () => {
  const over = (edition: string, changes: Partial<DatedEdition>) =>
    anEdition({ layerOfKey: 'section-1', layerOfEdition: edition, ...changes });

  it('are those over this very edition that hold on the day, by their first days', () => {
    const s2 = over('2026', { ruleSetKey: 's-02', edition: '1', effectiveFrom: '2026-03-01' });
    const s9 = over('2026', { ruleSetKey: 's-09', edition: '1', effectiveFrom: '2026-02-01' });
    const old = over('2024', { ruleSetKey: 's-01', edition: '1', effectiveFrom: '2026-02-01' });
    const all = [later, s2, s9, old];
    const on = (date: string) => layersOn(later, { all, date }).map(({ ruleSetKey }) => ruleSetKey);
    expect(on('2026-01-31')).toEqual([]);
    expect(on('2026-02-01')).toEqual(['s-09']);
    expect(on('2026-03-01')).toEqual(['s-09', 's-02']);
  });
});
