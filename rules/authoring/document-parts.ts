import { z } from 'zod';
import { hashOf } from '../engine/seal';

/** A rule set as it is being written: it may be unfinished, so nothing is known of its fields yet. */
export type DraftDocument = Record<string, unknown>;

/** What a draft is found and listed by, however unfinished it is otherwise. */
export const headFields = z.looseObject({
  id: z.string().min(1).max(80),
  title: z.string().min(1).max(200),
  edition: z.string().min(1).max(40),
  effective: z.object({
    from: z.iso.date().nullable().default(null),
    to: z.iso.date().nullable().default(null),
  }),
  layerOf: z.object({ id: z.string(), edition: z.string() }).nullable().default(null),
});

/**
 * One thing in a draft that is changed as a whole: `head`, an entry of a list as `rules/vma`, or the order of a list as
 * `order/rules`. Two authors who change different parts never meet.
 */
export interface PartChange {
  part: string;
  /** Hash of the part as its author saw it; null where there was none. */
  before: string | null;
  /** The part as it shall be; null takes it out. */
  after: unknown;
  /** Where a new entry goes in its list; at the end where left out. */
  position?: number | undefined;
}

/** Somebody else changed the part since its author saw it. */
export interface PartConflict {
  part: string;
  /** As it is now; null where it is gone. */
  present: unknown;
}

export type ChangedDocument =
  | { ok: true; document: DraftDocument }
  | { ok: false; conflicts: PartConflict[]; faults: { part: string; detail: string; fix: string }[] };

/** The lists whose entries are parts, with the field that names an entry. */
const LISTS: Record<string, string> = {
  rules: 'id',
  tables: 'id',
  attributes: 'name',
  quantities: 'id',
  documents: 'type',
  cases: 'id',
  'add.rules': 'id',
  'add.tables': 'id',
  'add.attributes': 'name',
  'replace.rules': 'id',
  'replace.tables': 'id',
  'replace.attributes': 'name',
};

type Entry = Record<string, unknown>;

/** Every part of a document by its name, the order of each list among them. */
export function partsOf(document: DraftDocument): Map<string, unknown> {
  const parts = new Map<string, unknown>([['head', headOf(document)]]);
  for (const [list, field] of Object.entries(LISTS)) {
    const entries = listOf(document, list);
    if (entries.length === 0) continue;
    for (const entry of entries) parts.set(`${list}/${String(entry[field])}`, entry);
    parts.set(
      `order/${list}`,
      entries.map((entry) => String(entry[field])),
    );
  }
  return parts;
}

/** What `before` of a change of this part has to be. */
export function partHash(part: unknown): string | null {
  return part === undefined || part === null ? null : hashOf(part);
}

/** Of what a part says: who encoded and verified a rule is not part of it. */
export function contentHash(part: unknown): string | null {
  return isEntry(part) ? partHash({ ...part, encodedBy: null, verifiedBy: null }) : partHash(part);
}

/**
 * Of what a rule says within its edition. A source that names one of the editions that are held against each other
 * moves with them and is no change of the rule.
 */
export function ruleHash(rule: unknown, editions: readonly unknown[]): string | null {
  const source = isEntry(rule) ? rule.source : null;
  const isOwn = isEntry(source) && editions.includes(source.edition);
  return isOwn && isEntry(rule)
    ? contentHash({ ...rule, source: { ...source, edition: null } })
    : contentHash(rule);
}

/** All changes or none: where one part is not as its author saw it, nothing is changed and every conflict is told. */
export function changeParts(document: DraftDocument, changes: readonly PartChange[]): ChangedDocument {
  const conflicts: PartConflict[] = [];
  const faults = changes.flatMap(faultOf);
  let changed = document;
  for (const change of faults.length > 0 ? [] : changes) {
    const present = partsOf(changed).get(change.part) ?? null;
    if (partHash(present) !== change.before) conflicts.push({ part: change.part, present });
    else changed = putPart(changed, change);
  }
  if (conflicts.length > 0 || faults.length > 0) return { ok: false, conflicts, faults };
  return { ok: true, document: changed };
}

/** Where an entry stands in its list; null for what is no entry or not there. */
export function positionOf(document: DraftDocument, part: string): number | null {
  const { list, name } = placeOf(part);
  const field = LISTS[list];
  if (field === undefined) return null;
  const index = listOf(document, list).findIndex((entry) => entry[field] === name);
  return index < 0 ? null : index;
}

/** The document with some of its entries put in place of those of the same name. */
export function withParts(document: DraftDocument, entries: ReadonlyMap<string, unknown>): DraftDocument {
  return [...entries].reduce((changed, [part, after]) => putPart(changed, { part, after }), document);
}

function faultOf({ part, after }: PartChange): { part: string; detail: string; fix: string }[] {
  const { list, name } = placeOf(part);
  const told = (detail: string, fix: string) => [{ part, detail, fix }];
  if (part === 'head') {
    return isEntry(after) ? [] : told('The head of a draft is an object.', 'Send its fields.');
  }
  if (part.startsWith('order/')) {
    return name in LISTS && Array.isArray(after)
      ? []
      : told(`There is no order “${part}”.`, 'Send the names of a list in their new order.');
  }
  const field = LISTS[list];
  if (field === undefined || name === '') {
    return told(`A draft has no part “${part}”.`, 'Name the head, or a list and an entry of it.');
  }
  if (after === null) return [];
  return isEntry(after) && after[field] === name
    ? []
    : told(
        `The entry sent for ${part} does not carry the ${field} ${name}.`,
        `Give it the ${field} ${name}.`,
      );
}

/** The document with one part as its author wants it, whoever changed it since. */
export function putPart(
  document: DraftDocument,
  { part, after, position }: Omit<PartChange, 'before'>,
): DraftDocument {
  const { list, name } = placeOf(part);
  if (part === 'head') return { ...(after as Entry), ...listsOf(document) };
  if (part.startsWith('order/')) return withList(document, name, inOrder(document, name, after as unknown[]));
  const field = LISTS[list] as string;
  const entries = listOf(document, list);
  const place = entries.findIndex((entry) => entry[field] === name);
  if (after === null) {
    return withList(
      document,
      list,
      entries.filter((_, index) => index !== place),
    );
  }
  const kept = entries.filter((_, index) => index !== place);
  const index = place >= 0 ? place : Math.min(position ?? kept.length, kept.length);
  return withList(document, list, kept.toSpliced(index, 0, after as Entry));
}

/** Names that the order leaves out keep their place after those that it names. */
function inOrder(document: DraftDocument, list: string, order: unknown[]): Entry[] {
  const field = LISTS[list] as string;
  const rank = new Map(order.map((name, index) => [String(name), index]));
  const rankOf = (entry: Entry) => rank.get(String(entry[field])) ?? order.length;
  return listOf(document, list).toSorted((a, b) => rankOf(a) - rankOf(b));
}

function headOf(document: DraftDocument): Entry {
  const head: Entry = {};
  for (const [field, value] of Object.entries(document)) {
    if (!(field in LISTS) && !isLayerGroup(field)) head[field] = value;
  }
  return head;
}

function listsOf(document: DraftDocument): Entry {
  return Object.fromEntries(
    Object.entries(document).filter(([field]) => field in LISTS || isLayerGroup(field)),
  );
}

function isLayerGroup(field: string): boolean {
  return `${field}.rules` in LISTS;
}

function listOf(document: DraftDocument, list: string): Entry[] {
  const [group = '', inner] = list.split('.');
  const here = document[group];
  const entries = inner === undefined ? here : isEntry(here) ? here[inner] : undefined;
  return Array.isArray(entries) ? entries.filter(isEntry) : [];
}

function withList(document: DraftDocument, list: string, entries: Entry[]): DraftDocument {
  const [group = '', inner] = list.split('.');
  if (inner === undefined) return { ...document, [group]: entries };
  const here = document[group];
  return { ...document, [group]: { ...(isEntry(here) ? here : {}), [inner]: entries } };
}

/** `rules/vma` is the entry vma of the list rules; a name may hold a slash itself. */
function placeOf(part: string): { list: string; name: string } {
  const slash = part.indexOf('/');
  return slash < 0 ? { list: part, name: '' } : { list: part.slice(0, slash), name: part.slice(slash + 1) };
}

function isEntry(value: unknown): value is Entry {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
