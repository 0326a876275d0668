import type { DraftDocument } from '#rules/authoring/document-parts';
import { lintEdition } from '#rules/authoring/lint/lint-edition';
import type { LintRemark } from '#rules/authoring/lint/remark';
import { type EditionView, viewOf } from '#rules/rule-sets/edition-view';
import type { DocumentProblem } from '#rules/rule-sets/problem';
import { documentName, type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { isLayer, type Layer, parseRuleSet, type RuleSet, ruleSchema } from '#rules/rule-sets/schema';

/** What a draft amounts to as it stands: an edition that can judge, or every reason why it cannot. */
export type CheckedDraft =
  | { ok: true; edition: ResolvedEdition; own: string }
  | { ok: false; problems: DocumentProblem[] };

/** `base` is what a layer sits over; a base edition needs none. */
export function checkDraft(document: DraftDocument, base: RuleSet | Layer | null): CheckedDraft {
  const parsed = parseRuleSet(document);
  if (!parsed.ok) return parsed;
  const { ruleSet } = parsed;
  if (isLayer(ruleSet) && base === null) {
    const detail = `Its base, edition ${ruleSet.layerOf.edition} of ${ruleSet.layerOf.id}, is not published.`;
    return { ok: false, problems: [{ pointer: '/layerOf', detail, fix: 'Publish the base first.' }] };
  }
  const resolution = isLayer(ruleSet) && base ? resolveEdition(base, [ruleSet]) : resolveEdition(ruleSet);
  return resolution.ok ? { ok: true, edition: resolution.edition, own: documentName(ruleSet) } : resolution;
}

export function remarksOn(checked: CheckedDraft): LintRemark[] {
  return checked.ok ? lintEdition(checked.edition, { own: checked.own }) : [];
}

/** Look-ups over a draft whose entries may be unfinished: those that can be read are there. */
export function viewOfDraft(document: DraftDocument): EditionView {
  const whole = parseRuleSet({ ...document, rules: [], cases: [], roomToMove: [] });
  const contents = whole.ok && !isLayer(whole.ruleSet) ? whole.ruleSet : emptyContents;
  const rules = Array.isArray(document.rules) ? document.rules : [];
  const readable = rules.flatMap((rule) => {
    const parsed = ruleSchema.safeParse(rule);
    return parsed.success ? [parsed.data] : [];
  });
  return viewOf({ ...contents, rules: readable });
}

const emptyContents = { tables: [], attributes: [], quantities: [], documents: [] };
