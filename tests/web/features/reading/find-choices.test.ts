import { describe, expect, it } from 'vitest';
import { findChoices } from '../../../../web/features/reading/lib/find-choices';

const choices = [
  {
    id: 'gmb',
    label: 'bulk specific gravity of the mix',
    symbol: 'Gmb',
    aliases: ['Bulk SG'],
    judged: false,
  },
  {
    id: 'gsb',
    label: 'bulk specific gravity of the aggregate',
    symbol: 'Gsb',
    aliases: ['Gsb blend'],
    judged: true,
  },
  { id: 'va', label: 'air voids', symbol: 'Va', aliases: ['Hohlraumgehalt', 'voids total mix'] },
  { id: 'vma', label: 'voids in the mineral aggregate', symbol: 'VMA', aliases: [] },
];
const found = (search: string) => findChoices(choices, search).map(({ choice }) => choice.id);

describe('finding a quantity', () => {
  it('puts the one whose symbol was typed first', () => {
    expect(found('va')[0]).toBe('va');
    expect(found('GMB')[0]).toBe('gmb');
  });

  it('finds by words in any order', () => {
    expect(found('gravity mix')).toEqual(['gmb']);
  });

  it('finds by a name that workbooks use, without its accents, and says which', () => {
    expect(findChoices(choices, 'hohlraum')).toEqual([{ choice: choices[2], alias: 'Hohlraumgehalt' }]);
  });

  it('puts what the section judges before the rest', () => {
    expect(found('bulk specific gravity')).toEqual(['gsb', 'gmb']);
  });

  it('offers all while nothing is typed, and none for nonsense', () => {
    expect(found('').length).toBe(4);
    expect(found('xyz')).toEqual([]);
  });
});
