import { plainText } from '../plain-text';
import type { TableColumn } from './table-column';

/** Stability as measured and as corrected for height: the corrected one is the result, and the other goes into it. */
export function keepCorrected(columns: Map<number, TableColumn>): void {
  const all = [...columns.values()].filter(
    ({ kind, quantities }) => kind === 'value' && quantities.length > 0,
  );
  const saysOf = ({ heads }: TableColumn) => heads.map(({ text }) => plainText(text)).join(' ');
  for (const column of all) {
    if (!corrected.test(saysOf(column)) || notCorrected.test(saysOf(column))) continue;
    for (const other of all) {
      const isSame = other !== column && other.quantities.some((id) => column.quantities.includes(id));
      if (isSame && measured.test(saysOf(other))) makeRaw(other);
    }
  }
  for (const column of all) if (notCorrected.test(saysOf(column))) makeRaw(column);
}

const corrected = /adjust|correct|\bcorr\b|korrig|corrig|correg/i;
const measured = /measur|uncorrect|unadjust|gemess|mesur|medid|observed|unkorrig|sin correg/i;
const notCorrected = /\b(?:corr(?:ection|elation)?\.?|volume|height|adjustment)\s+(?:ratio|factor)/i;

function makeRaw(column: TableColumn): void {
  column.quantities = [];
  column.raw = true;
}

/**
 * A column of targets beside limits, where no column holds results, is the proposed mix: "Sollwert" beside
 * "Anforderung".
 */
export function takeTargets(columns: Map<number, TableColumn>): void {
  const values = [...columns.values()].filter(
    ({ heads, kind }) => heads.length > 0 && (kind === 'value' || kind === 'aside'),
  );
  const isTarget = ({ heads, role }: TableColumn) =>
    role === 'limit' &&
    heads.some(({ text }) =>
      /^\s*(?:soll(?:wert)?|zielwert|target(?: value)?|valeur (?:cible|vis[ée]e)|valor objetivo|objetivo)\s*$/i.test(
        text,
      ),
    );
  const targets = values.filter(isTarget);
  const limits = values.filter((column) => column.role === 'limit' && !isTarget(column));
  const [target, ...more] = targets;
  if (!target || more.length > 0 || limits.length === 0) return;
  if (values.some(({ role, kind }) => role === null && kind === 'value')) return;
  target.role = null;
  target.kind = 'value';
  target.at = { ...target.at, trial: 'design' };
}
