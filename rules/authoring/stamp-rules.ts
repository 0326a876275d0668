import { tablesOf } from '../rule-sets/tables-of';
import { contentHash, type DraftDocument, partHash, partsOf, withParts } from './document-parts';

const RULE_LISTS = ['rules/', 'add.rules/', 'replace.rules/'];
const TABLE_LISTS = ['tables/', 'add.tables/', 'replace.tables/'];

type Entry = Record<string, unknown>;

interface Stamping {
  before: DraftDocument;
  after: DraftDocument;
  /** Who made the change, and the date in the agency's zone. */
  by: string;
  on: string;
}

/**
 * Names who encoded each changed rule and takes back its verification; a rule whose table changed says something else
 * than was verified, so its verification goes too. `parts` are the rules that were stamped, as they are now.
 */
export function stampRules({ before, after, by, on }: Stamping): {
  document: DraftDocument;
  parts: Map<string, unknown>;
} {
  const old = partsOf(before);
  const now = partsOf(after);
  const tables = changedTables(old, now);
  const stamped = new Map<string, unknown>();
  for (const [part, rule] of now) {
    if (!RULE_LISTS.some((list) => part.startsWith(list))) continue;
    const own = rule as Entry;
    if (contentHash(old.get(part)) !== contentHash(own)) {
      stamped.set(part, { ...own, encodedBy: `${by}, ${on}`, verifiedBy: null });
    } else if (isVerified(own) && [...tablesOf(own)].some((id) => tables.has(id))) {
      stamped.set(part, { ...own, verifiedBy: null });
    }
  }
  return { document: withParts(after, stamped), parts: stamped };
}

function changedTables(old: Map<string, unknown>, now: Map<string, unknown>): Set<string> {
  const names = [...old.keys(), ...now.keys()].filter((part) =>
    TABLE_LISTS.some((list) => part.startsWith(list)),
  );
  const changed = names.filter((part) => partHash(old.get(part)) !== partHash(now.get(part)));
  return new Set(changed.map((part) => part.slice(part.indexOf('/') + 1)));
}

function isVerified(rule: Entry): boolean {
  return typeof rule.verifiedBy === 'string';
}
