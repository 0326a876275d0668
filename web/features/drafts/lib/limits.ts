import type { RuleField } from './rule-fields';

export const limitFamilies = [
  { value: 'ends', label: 'at least, at most' },
  { value: 'target', label: 'a target and a tolerance' },
  { value: 'one of', label: 'one of' },
  { value: 'present', label: 'that it is there' },
] as const;

type Family = (typeof limitFamilies)[number]['value'];

export function familyOf(limit: RuleField): Family {
  if ('present' in limit) return 'present';
  if ('oneOf' in limit) return 'one of';
  return 'target' in limit || 'tolerance' in limit ? 'target' : 'ends';
}

/** What each kind of measure can be held against. */
export function limitFamiliesOf(kind: string): readonly Family[] {
  switch (kind) {
    case 'attribute':
      return ['ends', 'one of', 'present', 'target'];
    case 'document':
      return ['present'];
    case 'reading':
      return ['ends', 'target', 'present'];
    default:
      return ['ends', 'target'];
  }
}

export function freshLimit(family: Family, before: RuleField): RuleField {
  if (familyOf(before) === family) return before;
  switch (family) {
    case 'ends':
      return { min: '0.0' };
    case 'target':
      return { target: '0.0', tolerance: '0.0' };
    case 'one of':
      return { oneOf: [] };
    case 'present':
      return { present: true };
  }
}
