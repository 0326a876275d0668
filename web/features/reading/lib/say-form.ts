import type { Correction, Said } from '#rules/reading/correction';
import type { Conditions } from '#rules/record';
import type { CellRange } from './cell-address';
import { blockText } from './cell-block';
import { conditionTyped } from './condition-value';
import { conditionLabels } from './condition-words';
import { type ConditionsSaid, namesTold } from './conditions-said';
import { type CellAt, cutBlock } from './cut-block';

export interface SayForm {
  kind: Said['kind'] | null;
  quantity: string | null;
  /** Null: as the cells or their headings say. */
  unit: string | null;
  conditions: ConditionsSaid;
  attribute: string | null;
  document: string | null;
  part: 'date' | 'validTo';
}

export const emptySayForm: SayForm = {
  kind: null,
  quantity: null,
  unit: null,
  conditions: {},
  attribute: null,
  document: null,
  part: 'date',
};

export type Saying =
  | { ok: true; corrections: Correction[] }
  /** Null: there is nothing to complain of yet, it is only not complete. */
  | { ok: false; fault: string | null };

const mostCorrections = 200;

/** What a filled-in form says of a block: one correction, or one for each row or column that is told apart. */
export function sayingOf(
  form: SayForm,
  { sheet, block, cellAt }: { sheet: string; block: CellRange; cellAt: CellAt },
): Saying {
  const plain = plainSaying(form);
  if (plain !== 'reading') {
    if (plain === null) return { ok: false, fault: null };
    return { ok: true, corrections: [{ sheet, range: blockText(block), says: plain }] };
  }
  const shared = sharedConditions(form);
  if (!shared.ok) return shared;
  const parts = cutBlock(form.conditions, block, cellAt);
  if (!parts.ok) return parts;
  if (parts.parts.length > mostCorrections) {
    return { ok: false, fault: `They are ${parts.parts.length} different ones. Choose a smaller block.` };
  }
  const without = namesTold(form.conditions, 'none');
  return {
    ok: true,
    corrections: parts.parts.map(({ range, at }) => ({
      sheet,
      range: blockText(range),
      says: {
        kind: 'reading',
        quantity: form.quantity ?? '',
        unit: form.unit,
        at: { ...shared.at, ...at },
        without,
      },
    })),
  };
}

function plainSaying(form: SayForm): Exclude<Said, { kind: 'reading' }> | 'reading' | null {
  switch (form.kind) {
    case 'not a reading':
      return { kind: 'not a reading' };
    case 'attribute':
      return form.attribute === null ? null : { kind: 'attribute', name: form.attribute };
    case 'document date':
      return form.document === null ? null : { kind: 'document date', type: form.document, part: form.part };
    case 'reading':
      return form.quantity === null ? null : 'reading';
    case null:
      return null;
  }
}

function sharedConditions(form: SayForm): { ok: true; at: Conditions } | { ok: false; fault: string } {
  let at: Conditions = {};
  for (const name of namesTold(form.conditions, 'all')) {
    const value = conditionTyped(name, form.conditions[name]?.text ?? '');
    if (!value.ok) return { ok: false, fault: `${conditionLabels[name]}: ${value.fault}` };
    at = { ...at, ...value.at };
  }
  return { ok: true, at };
}
