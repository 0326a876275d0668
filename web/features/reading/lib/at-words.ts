import type { ConditionName } from '#rules/reading/mapping';
import type { Conditions } from '#rules/record';
import { conditionLabels, conditionNames } from './condition-words';

/** "trial B, specimen 3, temperature −10 °C" */
export function atWords(at: Conditions): string {
  return conditionNames
    .flatMap((name) => {
      const value = at[name];
      return value === undefined ? [] : [oneWord(name, value)];
    })
    .join(', ');
}

function oneWord(name: ConditionName, value: string | number): string {
  if (name === 'variant' || name === 'aging') return String(value);
  if (name === 'sieve') return `${value} mm`;
  const [label = '', unit] = conditionLabels[name].split(', ');
  return `${label.toLowerCase()} ${value}${unit ? ` ${unit}` : ''}`;
}
