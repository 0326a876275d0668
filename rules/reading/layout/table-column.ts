import type { Conditions } from '../../record';
import type { Cell } from '../cell-grid';
import type { ConditionName } from '../mapping';
import type { Domain } from '../words/context-words';
import type { DocumentPart, KeyName, Role } from '../words/key-words';

export type ColumnKind = 'key' | 'label' | 'value' | 'unit' | 'method' | 'testedOn' | 'document' | 'aside';

/** What stands over a column, and so what its cells are. */
export interface TableColumn {
  column: number;
  heads: Cell[];
  kind: ColumnKind;
  key: ConditionName | null;
  part: DocumentPart | null;
  quantities: string[];
  weak: boolean;
  misspelt: string | null;
  at: Conditions;
  role: Role | null;
  unit: string | null;
  unknownUnit: string | null;
  method: string | null;
  raw: boolean;
  attribute: string | null;
  subset: 'dry' | 'conditioned' | null;
  onAggregate: boolean;
  onMix: boolean;
  domains: Domain[];
  /** With those of its table, for values that no label of their own says more of. */
  allDomains: Domain[];
  /** A heading that names whose the column is, without saying of what kind that is. */
  name: string | null;
  nameCell: Cell | null;
  nameKey: ConditionName | null;
  /** An upper heading that only names: "Stockpile A" over "% retained" and "% passing". */
  groupName: Cell | null;
  /** What its heading says of the heads beside it, where that is not what stands under it. */
  corner: ConditionName | null;
  /** Binder content by which a trial is named, and the cell that says so. */
  binder: { text: string; cell: Cell } | null;
  /** It was said what stands under it, so its heading is the name of that and of nothing else. */
  isTold?: boolean;
}

const conditionKeys = new Set<KeyName>([
  'trial',
  'blend',
  'variant',
  'specimen',
  'stockpile',
  'sieve',
  'gyrations',
  'temperature',
  'time',
  'stress',
  'passes',
  'frequency',
  'aging',
  'laboratory',
]);

export function isConditionKey(key: KeyName): key is ConditionName {
  return conditionKeys.has(key);
}
