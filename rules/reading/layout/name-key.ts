import { quantityById } from '../../quantities/registry';
import { sieveFromName } from '../../quantities/sieves';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import { isMaterial } from './materials';
import { isConditionKey, type TableColumn } from './table-column';
import type { TableContext } from './table-context';

export function nameKeyOf({
  table,
  columns,
  titles,
  labels,
  kinds,
  tableDomains,
}: TableContext): ConditionName {
  const values = [...columns.values()].filter(({ kind }) => kind === 'value');
  const said = [...columns.values()].find((column) => column.corner !== null)?.corner;
  if (said) return said;
  if (headsAreSieves(values.flatMap(({ nameCell }) => nameCell ?? []))) return 'sieve';
  const keyed = [...columns.values()].flatMap(({ key }) => key ?? []);
  if (keyed.includes('sieve')) return 'stockpile';
  if (keyed.includes('stockpile')) return 'specimen';
  const corner = [...columns.values()].find(({ kind }) => kind === 'label');
  const cornerKeys = corner?.heads.flatMap(({ text }) => labels.read(text).keys) ?? [];
  const named = cornerKeys
    .filter(isConditionKey)
    .find((key) => key !== 'sieve' || values.some(({ name }) => name !== null));
  const rowSays = table.rows.flatMap(({ cells }) => {
    const first = cells.find((cell) => kinds.of(cell) === 'text');
    return first ? labels.read(first.text).quantities : [];
  });
  if (named && !(cornerKeys.includes('quantity') && rowSays.length > 0 && named === 'specimen')) return named;
  const ofTitles = titles
    .flatMap(({ keys, quantities, at }) =>
      // "Test temperature -10 °C" says it itself, and asks the heads for nothing.
      quantities.length === 0 ? keys.filter((key) => !(key in at)) : [],
    )
    .find(isConditionKey);
  if (ofTitles && ofTitles !== 'sieve') return ofTitles;
  const upper = values.some(
    (column) => column.quantities.length > 0 && column.name !== null && !givesWay(column, 'stockpile'),
  );
  if (upper) return 'specimen';
  const subjects = rowSays.map((id) => quantityById(id)?.subject);
  const aggregate = subjects.filter((subject) => subject === 'aggregate').length;
  if (aggregate > subjects.length / 2) return 'stockpile';
  const mixOnly = [
    'voids-in-mineral-aggregate',
    'voids-filled-with-asphalt',
    'binder-content',
    'effective-binder-content',
    'dust-proportion',
  ];
  if (rowSays.some((id) => mixOnly.includes(id))) return 'trial';
  if (rowSays.length === 0 && tableDomains.includes('gradation')) return 'stockpile';
  return 'specimen';
}

/** Named openings, or bare figures that fall along the series; 1, 2 and 3 number specimens. */
function headsAreSieves(heads: Cell[]): boolean {
  const named = heads.filter(
    ({ kind, text }) =>
      kind === 'text' && /mm|µm|in\b|["#/″]|no\./i.test(text) && sieveFromName(text) !== null,
  );
  if (named.length > 2 && named.length * 2 > heads.length) return true;
  const openings = heads.flatMap(({ kind, value }) => (kind === 'number' ? [sieveFromName(value)] : []));
  return (
    openings.length > 3 &&
    openings.every((opening, at) => opening !== null && (at === 0 || opening < (openings[at - 1] as number)))
  );
}

/** In a table of names, "RAP" and "Natural sand" are stockpiles and no quantities. */
export function givesWay({ quantities }: TableColumn, key: ConditionName): boolean {
  return key === 'stockpile' && isMaterial(quantities);
}
