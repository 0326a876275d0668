import edition2024 from './cvra-412-2024.json';
import edition2026 from './cvra-412-2026.json';
import edition2027Draft from './cvra-412-2027-draft.json';
import supplement from './cvra-412-s07-2026.json';
import airfield2026 from './cvra-421-2026.json';
import performance2026 from './cvra-431-2026.json';

export interface ShippedRuleSet {
  /** File name in this directory, `cvra-412-2026.json`. */
  file: string;
  /** As in the file; `parseRuleSet` makes it usable. */
  document: unknown;
}

/** Base editions first, so that each layer follows the edition it stands on. */
export const shippedRuleSets: ShippedRuleSet[] = [
  { file: 'cvra-412-2024.json', document: edition2024 },
  { file: 'cvra-412-2026.json', document: edition2026 },
  { file: 'cvra-412-2027-draft.json', document: edition2027Draft },
  { file: 'cvra-412-s07-2026.json', document: supplement },
  { file: 'cvra-421-2026.json', document: airfield2026 },
  { file: 'cvra-431-2026.json', document: performance2026 },
];
