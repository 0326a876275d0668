import { describe, expect, it } from 'vitest';
import { quantitySchema } from '#rules/quantities/quantity';
import { allQuantities } from '#rules/quantities/registry';
import { findQuantities } from '../../../../web/features/quantities/lib/find-quantities';
import { groupQuantities } from '../../../../web/features/quantities/lib/group-quantities';
import { workbookNames } from '../../../../web/features/quantities/lib/workbook-names';

const stability = quantitySchema.parse({
  id: 'marshall-stability',
  symbol: 'MS',
  label: 'Marshall stability',
  unit: 'kN',
  acceptedUnits: ['kN', 'lbf'],
  methods: ['AASHTO T 245', 'EN 12697-34'],
  aliases: ['corrected stability', 'stabilité'],
});
const flow = quantitySchema.parse({
  id: 'marshall-flow',
  symbol: 'MF',
  label: 'Marshall flow',
  unit: 'mm',
  methods: ['AASHTO T 245'],
  aliases: ['flow'],
});
const found = (search: string) =>
  findQuantities([stability, flow], search).map(({ quantity }) => quantity.id);

describe('finding a quantity', () => {
  it.each([
    ['', ['marshall-stability', 'marshall-flow']],
    ['  ', ['marshall-stability', 'marshall-flow']],
    ['MARSHALL', ['marshall-stability', 'marshall-flow']],
    ['ms', ['marshall-stability']],
    ['lbf', ['marshall-stability']],
    ['t 245', ['marshall-stability', 'marshall-flow']],
    ['12697-34 marshall', ['marshall-stability']],
    ['marshall-flow', ['marshall-flow']],
    ['rice gravity', []],
  ])('by “%s”', (search, ids) => {
    expect(found(search)).toEqual(ids);
  });

  it('tells the workbook’s own word that was found, accents aside, and only then', () => {
    expect(findQuantities([stability], 'corrected')).toMatchObject([{ writtenAs: 'corrected stability' }]);
    expect(findQuantities([stability], 'stabilite')).toMatchObject([{ writtenAs: 'stabilité' }]);
    expect(findQuantities([stability], 'stability')[0]?.writtenAs).toBeUndefined();
  });
});

it.each([
  ['Hohlraumgehalt', 'air-voids'],
  ['vides', 'air-voids'],
  ['equivalente de arena', 'sand-equivalent'],
  ['Siebdurchgang', 'percent-passing'],
])('finds “%s” by its name in another language', (search, id) => {
  expect(findQuantities(allQuantities(), search).map(({ quantity }) => quantity.id)).toContain(id);
});

it('names each workbook’s word for a quantity once', () => {
  const names = workbookNames({ id: 'sand-equivalent', aliases: ['SE', 'Clay content'] });
  expect(names.slice(0, 2)).toEqual(['SE', 'Clay content']);
  expect(new Set(names.map((name) => name.toLowerCase())).size).toBe(names.length);
  expect(names).toContain('equivalent de sable');
});

it('puts every quantity of the registry in one group', () => {
  const rows = findQuantities(allQuantities(), '');
  const grouped = groupQuantities(rows).flatMap((group) => group.rows.map(({ quantity }) => quantity.id));
  expect(grouped.toSorted()).toEqual(
    allQuantities()
      .map(({ id }) => id)
      .toSorted(),
  );
});

it('leaves out groups without a row', () => {
  expect(groupQuantities([{ quantity: stability, names: [] }]).map(({ title }) => title)).toEqual(['Mix']);
});
