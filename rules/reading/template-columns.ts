import type { Quantity } from '../quantities/quantity';
import type { Conditions } from '../record';

export interface TemplateColumn {
  /** Without its unit. */
  header: string;
  unit: string | null;
  /** `value` columns hold a quantity; the rest say what it belongs to. */
  role: 'key' | 'value' | 'detail';
  /** Of a key or detail: the condition, or `method`, `testedOn`, `issuer` … */
  names: string | null;
  quantity: string | null;
  /** Conditions that the header itself states. */
  at: Conditions;
  /** Key columns that do not apply to this value. */
  without: string[];
  required: boolean;
  list: string[];
  decimals: number | null;
}

/** Stands in a column's `list` for a column of the sheet of lists. */
export function listReference(name: string): string {
  return `list:${name}`;
}

export function key(header: string, names: string, list: string[] = [], required = false): TemplateColumn {
  return { ...emptyColumn, header, role: 'key', names, list, required };
}

export function detail(header: string, names: string, list: string[] = []): TemplateColumn {
  return { ...emptyColumn, header, role: 'detail', names, list };
}

const emptyColumn: TemplateColumn = {
  header: '',
  unit: null,
  role: 'key',
  names: null,
  quantity: null,
  at: {},
  without: [],
  required: false,
  list: [],
  decimals: null,
};

const conditionHeaders: Partial<Record<keyof Conditions, { header: string; unit: string | null }>> = {
  temperature: { header: 'Temperature', unit: '°C' },
  time: { header: 'Loading time', unit: 's' },
  stress: { header: 'Stress', unit: 'kPa' },
  passes: { header: 'Passes', unit: null },
  frequency: { header: 'Frequency', unit: 'Hz' },
  aging: { header: 'Aging', unit: null },
  variant: { header: 'Form of the test', unit: null },
  gyrations: { header: 'Gyrations', unit: null },
  stockpile: { header: 'Stockpile', unit: null },
  sieve: { header: 'Sieve', unit: null },
  blend: { header: 'Blend', unit: null },
};

export function conditionKey(name: keyof Conditions, required = false): TemplateColumn {
  const { header, unit } = conditionHeaders[name] ?? { header: name, unit: null };
  return { ...key(header, name, [], required), unit };
}

/** "Flat and elongated particles 5:1" */
export function valueColumn(quantity: Quantity, at: Conditions = {}, header?: string): TemplateColumn {
  const stated = [at.variant, at.aging].filter((word) => word !== undefined);
  return {
    ...emptyColumn,
    header: header ?? [sentenceCase(quantity.label), ...stated].join(' '),
    unit: quantity.unit === '1' ? null : quantity.unit,
    role: 'value',
    quantity: quantity.id,
    at,
    list: quantity.methods,
    decimals: quantity.decimals,
  };
}

export function sentenceCase(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
