import type { ConditionName } from '#rules/reading/mapping';

export type ConditionHow = 'headings' | 'all' | 'row' | 'column' | 'none';

/** How a condition of the chosen cells is told. */
export interface ConditionSaid {
  how: ConditionHow;
  /** The value for all, the letter of the column that names each row, or the number of the row that names each column. */
  text: string;
}

export type ConditionsSaid = Partial<Record<ConditionName, ConditionSaid>>;

export function namesTold(conditions: ConditionsSaid, how: ConditionHow): ConditionName[] {
  return (Object.keys(conditions) as ConditionName[]).filter((name) => conditions[name]?.how === how);
}
