import { type DraftDocument, partsOf, ruleHash } from '#rules/authoring/document-parts';
import { naturalOrder } from '#rules/engine/natural-order';

/** A rule of a draft as a list shows it; its fields may be unfinished. */
export interface DraftRule {
  /** `rules/vma`, or in a layer `add.rules/vma` and `replace.rules/vma`. */
  part: string;
  id: string;
  clause: string;
  title: string;
  state: 'same' | 'changed' | 'added' | 'removed';
  verified: boolean;
}

const RULE_LISTS = ['rules/', 'add.rules/', 'replace.rules/'];

/** The rules of a draft in clause order, marked by what it started from; those that went stand struck among them. */
export function draftRules(document: DraftDocument, basedOn: DraftDocument | null): DraftRule[] {
  const now = rulesIn(document);
  const before = rulesIn(basedOn ?? {});
  const editions = [document.edition, basedOn?.edition];
  const kept = [...now].map(([part, rule]) => {
    const old = before.get(part);
    const state =
      basedOn === null
        ? 'same'
        : old === undefined
          ? 'added'
          : ruleHash(old, editions) === ruleHash(rule, editions)
            ? 'same'
            : 'changed';
    return listed(part, rule, state);
  });
  const gone = [...before]
    .filter(([part]) => !now.has(part))
    .map(([part, rule]) => listed(part, rule, 'removed'));
  return [...kept, ...gone].toSorted((a, b) => naturalOrder(a.clause, b.clause));
}

function rulesIn(document: DraftDocument): Map<string, Record<string, unknown>> {
  const rules = [...partsOf(document)].filter(([part]) => RULE_LISTS.some((list) => part.startsWith(list)));
  return new Map(rules.map(([part, rule]) => [part, rule as Record<string, unknown>]));
}

function listed(part: string, rule: Record<string, unknown>, state: DraftRule['state']): DraftRule {
  const text = (value: unknown) => (typeof value === 'string' ? value : '');
  const id = text(rule.id);
  return {
    part,
    id,
    clause: text(rule.clause),
    title: text(rule.title) || id,
    state,
    verified: typeof rule.verifiedBy === 'string',
  };
}

/** A supplement or special provision keeps what is new in its own lists. */
export function isLayerDraft({ layerOf }: DraftDocument): boolean {
  return layerOf !== null && layerOf !== undefined;
}

/** An id for a new entry that none of the names has: `rule-2`. */
export function freeName(names: readonly string[], wanted: string): string {
  for (let count = 1; ; count += 1) {
    const name = count === 1 ? wanted : `${wanted}-${count}`;
    if (!names.includes(name)) return name;
  }
}
