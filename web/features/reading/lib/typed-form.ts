import type { ConditionName } from '#rules/reading/mapping';
import type { Conditions } from '#rules/record';
import { conditionTyped } from './condition-value';
import { conditionLabels } from './condition-words';
import type { TypedInput } from './reading-act';

/** A reading as it is being typed: everything still text. */
export interface TypedForm {
  quantity: string | null;
  value: string;
  unit: string | null;
  at: Partial<Record<ConditionName, string>>;
  method: string;
  testedOn: string;
}

export const emptyTypedForm: TypedForm = {
  quantity: null,
  value: '',
  unit: null,
  at: {},
  method: '',
  testedOn: '',
};

export type TypedResult =
  | { ok: true; reading: TypedInput }
  /** By field; empty while it is only not complete. */
  | { ok: false; faults: { value?: string; at?: string } };

/** `2.387`, `< 0.1`, `none`, `non-plastic`; a decimal comma is a decimal point. */
export function typedReading(form: TypedForm): TypedResult {
  if (form.quantity === null || form.unit === null || form.value.trim() === '')
    return { ok: false, faults: {} };
  const value = typedValue(form.value);
  if (value === null) return { ok: false, faults: { value: 'Enter a number, < 0.1, none or non-plastic.' } };
  let at: Conditions = {};
  for (const [name, text] of Object.entries(form.at) as [ConditionName, string][]) {
    if (text.trim() === '') continue;
    const condition = conditionTyped(name, text);
    if (!condition.ok) return { ok: false, faults: { at: `${conditionLabels[name]}: ${condition.fault}` } };
    at = { ...at, ...condition.at };
  }
  return {
    ok: true,
    reading: {
      quantity: form.quantity,
      ...value,
      unit: form.unit,
      at,
      method: form.method.trim() === '' ? null : form.method.trim(),
      testedOn: form.testedOn === '' ? null : form.testedOn,
    },
  };
}

/** The form that would type this reading. */
export function formOfTyped({
  quantity,
  value,
  qualifier,
  unit,
  at,
  method,
  testedOn,
}: TypedInput): TypedForm {
  const sign = qualifier === '<' || qualifier === '>' ? `${qualifier} ` : '';
  return {
    quantity,
    value: value === null ? (qualifier ?? '') : `${sign}${value}`,
    unit,
    at: Object.fromEntries(Object.entries(at ?? {}).map(([name, each]) => [name, String(each)])),
    method: method ?? '',
    testedOn: testedOn ?? '',
  };
}

function typedValue(text: string): Pick<TypedInput, 'value' | 'qualifier'> | null {
  const trimmed = text.trim().toLowerCase().replace('−', '-');
  if (trimmed === 'none' || trimmed === 'non-plastic') return { value: null, qualifier: trimmed };
  const match = /^([<>])?\s*(-?\d+(?:[.,]\d+)?(?:e-?\d+)?)$/.exec(trimmed);
  if (!match?.[2]) return null;
  const qualifier = match[1] === '<' || match[1] === '>' ? match[1] : null;
  return { value: Number(match[2].replace(',', '.')), qualifier };
}
