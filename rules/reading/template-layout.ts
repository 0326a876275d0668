import type { Quantity } from '../quantities/quantity';
import { quantityById } from '../quantities/registry';
import type { Conditions } from '../record';
import { withStandardDocuments } from '../rule-sets/document-types';
import type { ReadingEdition } from './edition-contents';
import { type MeasuredQuantity, measuredQuantities, namedSieves } from './measured-quantities';
import {
  conditionKey,
  detail,
  key,
  listReference,
  sentenceCase,
  type TemplateColumn,
  valueColumn,
} from './template-columns';
import { attributeEntries, quantityEntries } from './template-entries';
import {
  creepColumns,
  keyColumns,
  placeOfQuantity,
  readingsColumns,
  trialColumns,
  usualSieves,
  valueColumns,
} from './template-places';

/** Raised when the template's places change. */
export const templateVersion = 2;

/** One line of the sheet of labels: what is asked, and where its value and unit stand. */
export interface TemplateEntry {
  label: string;
  unit: string | null;
  /** A quantity's id or `attribute:<name>`. */
  quantity: string;
  at: Conditions;
  list: string[];
}

export interface TemplateTable {
  kind: 'table';
  name: string;
  instruction: string;
  columns: TemplateColumn[];
  /** Prepared rows for data. */
  rows: number;
  hasMethods: boolean;
}

export interface TemplateGradation {
  kind: 'gradation';
  name: string;
  instruction: string;
  sievesMm: number[];
  stockpiles: number;
  columns: TemplateColumn[];
}

export interface TemplateLabels {
  kind: 'labels';
  name: string;
  instruction: string;
  entries: TemplateEntry[];
}

export type TemplateSheet = TemplateLabels | TemplateTable | TemplateGradation;

export interface TemplateLayout {
  sheets: TemplateSheet[];
  /** Lists that are too long for a cell's own validation: on a hidden sheet, a column each. */
  lists: { name: string; values: string[] }[];
}

export const headerRow = 4;

/** Where a table's data begins: under its header, and under the row of its methods where it has one. */
export function firstDataRow({ hasMethods }: Pick<TemplateTable, 'hasMethods'>): number {
  return headerRow + (hasMethods ? 2 : 1);
}

export const listsSheet = 'Lists';

/** Which sheets, rows, columns and units an edition needs: everything that it measures has a named place. */
export function templateLayout(edition: ReadingEdition): TemplateLayout {
  const find = (id: string) => edition.quantities.find((quantity) => quantity.id === id) ?? quantityById(id);
  const measured = measuredQuantities(edition).filter(({ quantity }) => find(quantity) !== undefined);
  const hasAgency = measured.some(({ at }) => at.laboratory === 'agency');
  const on = (sheet: string) => measured.filter((each) => placeOfQuantity(each, find) === sheet);
  const table = (
    name: string,
    instruction: string,
    columns: TemplateColumn[],
    rows: number,
  ): TemplateTable => ({
    kind: 'table',
    name,
    instruction,
    columns,
    rows,
    hasMethods: columns.some(
      (column) => column.role === 'value' && column.quantity !== null && column.list.length > 0,
    ),
  });
  const laboratoryKey = hasAgency ? [key('Laboratory', 'laboratory', ['contractor', 'agency'])] : [];
  const own = (sheet: string, names: string[], keys: TemplateColumn[]) =>
    valueColumns(names, on(sheet), keys, find);

  const aggregateKeys = [
    key('Stockpile', 'stockpile'),
    key('Specimen', 'specimen'),
    ...laboratoryKey,
    testedOn,
  ];
  const moistureKeys = [
    key('Trial', 'trial'),
    key('Specimen', 'specimen'),
    key('Subset', 'variant', ['dry', 'conditioned']),
    ...laboratoryKey,
    testedOn,
  ];
  const performance = on('Performance');
  const performanceKeys = [
    key('Trial', 'trial'),
    key('Specimen', 'specimen'),
    ...keyColumns(performance, find).map((name) => ({
      ...conditionKey(name),
      list: namedWords(performance, name),
    })),
    ...laboratoryKey,
    testedOn,
  ];
  const documents = withStandardDocuments(edition.documents).map(({ type, label }) => label ?? type);
  const methods = methodNames(edition, find);
  const sievesMm = [...new Set([...usualSieves, ...namedSieves(edition)])].toSorted((a, b) => b - a);

  return {
    lists: [
      { name: 'Document types', values: documents },
      { name: 'Quantities', values: quantityNames(edition) },
      ...(methods.length === 0 ? [] : [{ name: 'Methods', values: methods }]),
    ],
    sheets: [
      {
        kind: 'labels',
        name: 'Submittal',
        instruction:
          'Fill in column B. Change a unit in column C only if your value is in that unit; leave blank what does not apply.',
        entries: [...attributeEntries(edition), ...quantityEntries(on('Submittal'), find)],
      },
      table(
        'Stockpiles',
        'One row a stockpile. Shares are by mass of aggregate and sum to 100. The names are used on the other sheets.',
        [
          key('Stockpile', 'stockpile', [], true),
          ...own(
            'Stockpiles',
            [
              'stockpile-share',
              'bulk-specific-gravity-aggregate',
              'apparent-specific-gravity-aggregate',
              'water-absorption',
            ],
            [],
          ),
        ],
        12,
      ),
      {
        kind: 'gradation',
        name: 'Gradation',
        instruction:
          'Percent passing. Write the stockpile names, as on Stockpiles, in row 5 over their columns; leave sieves without a result blank.',
        sievesMm,
        stockpiles: 8,
        columns: gradationColumns(hasAgency, find),
      },
      table(
        'Trials',
        'One row a specimen. Give masses or Gmb. Trial "design" is the proposed job mix; write "mean" as the specimen of a row that reports means.',
        [
          key('Trial', 'trial', [], true),
          key('Specimen', 'specimen'),
          key('Compacted to', 'gyrations', ['design', 'maximum']),
          ...laboratoryKey,
          testedOn,
          ...trialColumns(on('Trials'), find),
        ],
        40,
      ),
      table(
        'Aggregates',
        'One row a result. Leave Stockpile blank for a result of the blend; number replicates under Specimen.',
        [...aggregateKeys, ...own('Aggregates', ['sand-equivalent', 'abrasion-loss'], aggregateKeys)],
        30,
      ),
      table(
        'Moisture',
        'One row a specimen. Give load and dimensions, or the strength. Subset says whether the specimen was conditioned.',
        [
          ...moistureKeys,
          ...own(
            'Moisture',
            [
              'specimen-thickness',
              'specimen-diameter',
              'air-voids',
              'degree-of-saturation',
              'failure-load',
              'tensile-strength-dry',
              'tensile-strength-conditioned',
              'tensile-strength-ratio',
            ],
            moistureKeys,
          ).map(withoutSubset),
        ],
        20,
      ),
      table(
        'Performance',
        'One row a specimen and test condition. Leave blank what a test does not give.',
        [...performanceKeys, ...own('Performance', performanceInputs(performance), performanceKeys)],
        30,
      ),
      table(
        'Creep',
        'One row a loading time. Give strain and stress, or compliance, or the deformations of each face with thickness, diameter and load.',
        creepColumns(find),
        120,
      ),
      table(
        'Documents',
        'One row a document. Dates as year-month-day. The file itself is attached after the upload.',
        [
          { ...key('Document', 'type', [listReference('Document types')], true), role: 'key' },
          detail('Issuer', 'issuer'),
          detail('Reference', 'reference'),
          detail('Date', 'date'),
          detail('Valid to', 'validTo'),
        ],
        20,
      ),
      table(
        'Readings',
        'For results that no other sheet has a place for: one reading a row, with the conditions it was obtained under.',
        readingsColumns({
          quantities: [listReference('Quantities')],
          methods: methods.length === 0 ? [] : [listReference('Methods')],
          sieves: sievesMm.map(String),
        }),
        60,
      ),
    ],
  };
}

const testedOn = detail('Tested on', 'testedOn');

/** Words that rules name for a condition, `maximum` for a density: the laboratory picks one, or leaves it blank. */
function namedWords(measured: MeasuredQuantity[], name: keyof Conditions): string[] {
  const named = measured.map(({ at }) => at[name]).filter((value) => typeof value === 'string');
  return [...new Set(named)].toSorted();
}

/** A strength is dry or conditioned by its own name. */
function withoutSubset(column: TemplateColumn): TemplateColumn {
  return column.quantity?.startsWith('tensile-strength') ? { ...column, without: ['variant'] } : column;
}

/** What the indices of a cracking test are computed from. */
function performanceInputs(measured: MeasuredQuantity[]): string[] {
  const asks = (id: string) => measured.some(({ quantity }) => quantity === id);
  const tolerance = asks('cracking-tolerance-index');
  const flexibility = asks('flexibility-index');
  return [
    ...(tolerance ? ['specimen-thickness', 'specimen-diameter', 'post-peak-displacement'] : []),
    ...(tolerance || flexibility ? ['fracture-energy', 'post-peak-slope'] : []),
  ];
}

function gradationColumns(hasAgency: boolean, find: (id: string) => Quantity | undefined): TemplateColumn[] {
  const passing = find('percent-passing');
  if (!passing) return [];
  return [
    { ...valueColumn(passing, {}, 'Blend'), unit: null },
    { ...valueColumn(passing, { trial: 'design' }, 'Job mix formula'), unit: null },
    ...(hasAgency
      ? [{ ...valueColumn(passing, { trial: 'design', laboratory: 'agency' }, 'Agency result'), unit: null }]
      : []),
  ];
}

function quantityNames(edition: ReadingEdition): string[] {
  const ids = new Set(measuredQuantities(edition).map(({ quantity }) => quantity));
  const own = edition.quantities.map((quantity) => quantity.id);
  const named = [...new Set([...own, ...ids])].flatMap((id) => {
    const quantity = edition.quantities.find((each) => each.id === id) ?? quantityById(id);
    return quantity ? [sentenceCase(quantity.label)] : [];
  });
  return named.toSorted();
}

function methodNames(edition: ReadingEdition, find: (id: string) => Quantity | undefined): string[] {
  const measured = measuredQuantities(edition).flatMap(({ quantity }) => find(quantity) ?? []);
  return [...new Set([...edition.quantities, ...measured].flatMap(({ methods }) => methods))].toSorted();
}
