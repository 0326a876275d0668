import type { ReadingEdition } from './edition-contents';
import {
  documentQuantity,
  labelQuantity,
  type Mapping,
  type MappingInput,
  mappingFormat,
  mappingSchema,
} from './mapping';
import type { TemplateColumn } from './template-columns';
import {
  listsSheet,
  type TemplateGradation,
  type TemplateLabels,
  type TemplateLayout,
  type TemplateTable,
  templateLayout,
  templateVersion,
} from './template-layout';

type RuleInput = MappingInput['rules'][number];

/** The template's own mapping: the same kind that a laboratory's layout has, made from the layout. */
export function templateMapping(edition: ReadingEdition): Mapping {
  const layout = templateLayout(edition);
  const rules = layout.sheets.flatMap((sheet) => {
    if (sheet.kind === 'labels') return labelRules(sheet);
    return sheet.kind === 'gradation' ? gradationRules(sheet) : tableRules(sheet);
  });
  return mappingSchema.parse({
    format: mappingFormat,
    laboratory: 'Template',
    fingerprint: `template-${templateVersion}`,
    version: templateVersion,
    rules: [...rules, ...listRules(layout)],
  });
}

function labelRules(sheet: TemplateLabels): RuleInput[] {
  return sheet.entries.map((entry) => ({
    id: `${sheet.name}/${entry.label}`,
    anchor: { sheet: sheet.name, header: [entry.label] },
    range: { skip: 0, most: 1 },
    axis: 'right',
    quantity: entry.quantity,
    unit: { header: ['Unit'] },
    at: definedOnly(entry.at),
    decimal: null,
  }));
}

function tableRules(sheet: TemplateTable): RuleInput[] {
  if (sheet.name === 'Documents') return [documentRule(sheet)];
  const keys = sheet.columns.filter((column) => column.role !== 'value');
  return sheet.columns
    .filter((column) => column.role === 'value')
    .map((column) => ({
      id: `${sheet.name}/${column.header}`,
      anchor: { sheet: sheet.name, header: [column.header] },
      range: { skip: sheet.hasMethods ? 1 : 0, most: null },
      axis: 'down',
      quantity: column.quantity ?? { header: ['Quantity'], required: true },
      unit: column.quantity === null ? { header: ['Unit'] } : column.unit,
      at: {
        ...keyReferences(keys, column),
        ...(sheet.hasMethods ? { method: { below: 1 } } : {}),
        ...definedOnly(column.at),
      },
      decimal: null,
    }));
}

function keyReferences(keys: TemplateColumn[], column: TemplateColumn) {
  const apply = keys.filter(
    ({ names }) => names !== null && !['quantity', 'unit'].includes(names) && !column.without.includes(names),
  );
  return Object.fromEntries(
    apply.map((each) => [each.names as string, { header: [each.header], required: each.required }]),
  );
}

function documentRule(sheet: TemplateTable): RuleInput {
  const details = sheet.columns.filter((column) => column.role === 'detail');
  return {
    id: `${sheet.name}/Document`,
    anchor: { sheet: sheet.name, header: ['Document'] },
    axis: 'down',
    quantity: documentQuantity,
    at: Object.fromEntries(details.map((each) => [each.names as string, { header: [each.header] }])),
  };
}

function gradationRules(sheet: TemplateGradation): RuleInput[] {
  const sieve = { header: ['Sieve'], required: true };
  return [
    {
      id: `${sheet.name}/stockpiles`,
      anchor: { sheet: sheet.name, header: ['Stockpiles'] },
      axis: 'cross',
      quantity: 'percent-passing',
      unit: '%',
      at: { sieve, stockpile: { key: 'column' } },
    },
    ...sheet.columns.map(
      (column): RuleInput => ({
        id: `${sheet.name}/${column.header}`,
        anchor: { sheet: sheet.name, header: [column.header] },
        axis: 'down',
        quantity: 'percent-passing',
        unit: '%',
        at: { sieve, ...definedOnly(column.at) },
      }),
    ),
  ];
}

function listRules(layout: TemplateLayout): RuleInput[] {
  return layout.lists.map(({ name }) => ({
    id: `${listsSheet}/${name}`,
    anchor: { sheet: listsSheet, header: [name] },
    axis: 'down',
    quantity: labelQuantity,
  }));
}

function definedOnly(at: object): Record<string, string | number> {
  return Object.fromEntries(Object.entries(at).filter(([, value]) => value !== undefined));
}
