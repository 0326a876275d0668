import type { Quantity } from '../quantities/quantity';
import { type Conditions, conditionsSchema } from '../record';
import type { MeasuredQuantity } from './measured-quantities';
import {
  conditionKey,
  detail,
  key,
  sentenceCase,
  type TemplateColumn,
  valueColumn,
} from './template-columns';

type Find = (id: string) => Quantity | undefined;

/** Openings in mm that are usually sieved, coarse to fine. Common practice, no source. */
export const usualSieves = [50, 37.5, 25, 19, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075];

const sheetOf: Record<string, string> = {
  'stockpile-share': 'Stockpiles',
  'bulk-specific-gravity-aggregate': 'Stockpiles',
  'apparent-specific-gravity-aggregate': 'Stockpiles',
  'water-absorption': 'Stockpiles',
  'percent-passing': 'Gradation',
  'binder-content': 'Trials',
  'maximum-specific-gravity': 'Trials',
  'bulk-specific-gravity-mix': 'Trials',
  'bulk-density-mix': 'Trials',
  'maximum-density-mix': 'Trials',
  'mass-in-air': 'Trials',
  'mass-in-water': 'Trials',
  'mass-saturated-surface-dry': 'Trials',
  'specimen-height': 'Trials',
  'specimen-absorption': 'Trials',
  'air-voids': 'Trials',
  'voids-in-mineral-aggregate': 'Trials',
  'voids-filled-with-asphalt': 'Trials',
  'effective-specific-gravity-aggregate': 'Trials',
  'absorbed-binder': 'Trials',
  'effective-binder-content': 'Trials',
  'effective-binder-volume': 'Trials',
  'dust-proportion': 'Trials',
  'film-thickness': 'Trials',
  'relative-density': 'Trials',
  'tensile-strength-dry': 'Moisture',
  'tensile-strength-conditioned': 'Moisture',
  'tensile-strength-ratio': 'Moisture',
  'failure-load': 'Moisture',
  'degree-of-saturation': 'Moisture',
  'creep-strain': 'Creep',
  'creep-compliance': 'Creep',
  'horizontal-deformation': 'Creep',
  'vertical-deformation': 'Creep',
  'rap-binder-content': 'Aggregates',
  'ras-binder-content': 'Aggregates',
  'binder-specific-gravity': 'Submittal',
  'gyrations-initial': 'Submittal',
  'gyrations-design': 'Submittal',
  'gyrations-maximum': 'Submittal',
  'design-air-voids': 'Submittal',
  'mixing-temperature': 'Submittal',
  'compaction-temperature': 'Submittal',
  'rap-content': 'Submittal',
  'ras-content': 'Submittal',
  'recycled-binder-ratio': 'Submittal',
  'anti-strip-content': 'Submittal',
  'lift-thickness': 'Submittal',
};

/** The sheet on which a measured quantity has its place. */
export function placeOfQuantity({ quantity, at, besides }: MeasuredQuantity, find: Find): string {
  const { trial: _trial, laboratory, ...conditions } = at;
  const named = sheetOf[quantity];
  if (named === 'Trials' && besides !== undefined && isOnPerformance(besides, find)) return 'Performance';
  const isScalar = Object.keys(conditions).length === 0 && laboratory === undefined;
  if (named === 'Submittal' && !isScalar) return 'Performance';
  if (named === 'Stockpiles' && laboratory !== undefined) return 'Aggregates';
  if (named !== undefined) return named;
  return find(quantity)?.subject === 'aggregate' ? 'Aggregates' : 'Performance';
}

function isOnPerformance(quantity: string, find: Find): boolean {
  return placeOfQuantity({ quantity, at: {} }, find) === 'Performance';
}

/** Conditions by which the tests of a sheet differ, and so need a column of their own. */
export function keyColumns(measured: MeasuredQuantity[], find: Find): (keyof Conditions)[] {
  const order: (keyof Conditions)[] = [
    'stockpile',
    'variant',
    'aging',
    'gyrations',
    'temperature',
    'frequency',
    'passes',
    'time',
    'stress',
  ];
  const asked = new Set(
    measured.flatMap(({ quantity, at }) => [...Object.keys(at), ...(find(quantity)?.conditions ?? [])]),
  );
  return order.filter((name) => asked.has(name));
}

const gyrationLevels = ['initial', 'design', 'maximum'] as const;

/** The columns of the trials: what was weighed and measured, then what the laboratory reports from it. */
export function trialColumns(measured: MeasuredQuantity[], find: Find): TemplateColumn[] {
  const columns: TemplateColumn[] = [];
  const add = (id: string, options: { at?: Conditions; header?: string; byCompaction?: boolean } = {}) => {
    const quantity = find(id);
    if (!quantity) return;
    const column = valueColumn(quantity, options.at, options.header);
    columns.push(options.byCompaction ? column : { ...column, without: ['gyrations'] });
  };
  add('binder-content', { header: 'Binder content by mass of mix' });
  for (const id of ['mass-in-air', 'mass-saturated-surface-dry', 'mass-in-water'])
    add(id, { byCompaction: true });
  add('bulk-specific-gravity-mix', { byCompaction: true });
  for (const level of gyrationLevels) {
    add('specimen-height', { at: { gyrations: level }, header: `Height at ${level} gyrations` });
  }
  add('maximum-specific-gravity');
  add('air-voids', { byCompaction: true });
  const reported = [
    'voids-in-mineral-aggregate',
    'voids-filled-with-asphalt',
    'effective-specific-gravity-aggregate',
    'absorbed-binder',
    'effective-binder-content',
    'effective-binder-volume',
    'dust-proportion',
  ];
  const placed = new Set([...columns.map((column) => column.quantity), ...reported, 'relative-density']);
  for (const id of reported) add(id);
  for (const level of gyrationLevels) {
    add('relative-density', { at: { gyrations: level }, header: `Relative density at ${level} gyrations` });
  }
  for (const id of new Set(measured.map(({ quantity }) => quantity))) if (!placed.has(id)) add(id);
  return columns;
}

/** Deformations are read on both faces of a specimen; its dimensions and load stand once, in any of its rows. */
export function creepColumns(find: Find): TemplateColumn[] {
  const value = (id: string, without: string[]): TemplateColumn[] => {
    const quantity = find(id);
    return quantity ? [{ ...valueColumn(quantity), list: [], without }] : [];
  };
  const ofSpecimen = ['variant', 'stress', 'time'];
  return [
    conditionKey('temperature', true),
    key('Specimen', 'specimen'),
    key('Face', 'variant', ['front', 'rear']),
    conditionKey('stress'),
    conditionKey('time', true),
    ...value('creep-strain', ['variant']),
    ...value('creep-compliance', ['variant']),
    ...value('horizontal-deformation', []),
    ...value('vertical-deformation', []),
    ...value('specimen-thickness', [...ofSpecimen, 'temperature']),
    ...value('specimen-diameter', [...ofSpecimen, 'temperature']),
    ...value('creep-load', ofSpecimen),
  ];
}

/** The sheet of free readings: quantity and unit stand in the row. */
export function readingsColumns(lists: {
  quantities: string[];
  methods: string[];
  sieves: string[];
}): TemplateColumn[] {
  const value: TemplateColumn = { ...key('Value', 'value'), role: 'value', names: null };
  return [
    key('Quantity', 'quantity', lists.quantities, true),
    value,
    key('Unit', 'unit'),
    key('Trial', 'trial'),
    conditionKey('blend'),
    conditionKey('variant'),
    key('Specimen', 'specimen'),
    conditionKey('stockpile'),
    { ...conditionKey('sieve'), list: lists.sieves },
    conditionKey('gyrations'),
    conditionKey('temperature'),
    conditionKey('time'),
    conditionKey('stress'),
    conditionKey('passes'),
    conditionKey('frequency'),
    conditionKey('aging'),
    key('Laboratory', 'laboratory', ['contractor', 'agency']),
    detail('Method', 'method', lists.methods),
    detail('Tested on', 'testedOn'),
  ];
}

/** A column for each quantity, and one for each form of its test that the rules name. */
export function valueColumns(
  usual: string[],
  measured: MeasuredQuantity[],
  keys: TemplateColumn[],
  find: (id: string) => Quantity | undefined,
): TemplateColumn[] {
  const named = new Set(keys.map((column) => column.names));
  const columns = new Map<string, TemplateColumn>();
  const add = (id: string, at: Conditions) => {
    const quantity = find(id);
    if (!quantity) return;
    const stated = conditionsSchema.parse(
      Object.fromEntries(
        ['variant', 'aging'].flatMap((name) => {
          const value = at[name as 'variant'];
          return value !== undefined && !named.has(name) ? [[name, value]] : [];
        }),
      ),
    );
    columns.set(`${id}|${JSON.stringify(stated)}`, valueColumn(quantity, stated));
  };
  for (const { quantity, at, besides } of measured) {
    if (besides === undefined || sheetOf[quantity] !== 'Trials') add(quantity, at);
    else {
      const ofSpecimen = find(quantity);
      if (ofSpecimen) columns.set(`${quantity}|`, ofTestedSpecimen(ofSpecimen));
    }
  }
  for (const id of usual) if (![...columns.keys()].some((known) => known.startsWith(`${id}|`))) add(id, {});
  const order = (column: TemplateColumn) => {
    const at = usual.indexOf(column.quantity ?? '');
    return at < 0 ? usual.length : at;
  };
  return [...columns.values()].toSorted((a, b) => order(a) - order(b));
}

/** Voids of specimens that were compacted for a test are told apart from those of the design by the test's form. */
function ofTestedSpecimen(quantity: Quantity): TemplateColumn {
  const header = `${sentenceCase(quantity.label)} of the tested specimen`;
  return { ...valueColumn(quantity, { variant: 'performance' }, header), without: ['variant'] };
}
