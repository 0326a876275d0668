import { describe, expect, it } from 'vitest';
import { changeParts, type DraftDocument, partHash } from '#rules/authoring/document-parts';
import { aRule, aRuleSet } from '#tests/builders/a-rule-set';
import {
  documentOf,
  edit,
  keptBy,
  openCopy,
  redo,
  refreshed,
  refusedBy,
  sendingFailed,
  settle,
  startSending,
  undo,
  type WorkingCopy,
} from '../../../../web/features/drafts/lib/working-copy';

const draft: DraftDocument = { ...aRuleSet({ rules: [aRule(), aRule({ id: 'va' })] }) };
const opened = () => openCopy({ document: draft, version: 1 });
const titled = (title: string, id = 'vma') => ({ part: `rules/${id}`, after: aRule({ id, title }) });
const titlesOf = (copy: WorkingCopy) =>
  (documentOf(copy).rules as { title: string }[]).map(({ title }) => title);
const [vma, va] = [aRule().title, aRule().title];

describe('an author’s view of a draft', () => {
  it('shows what was changed before the server knows of it', () => {
    const copy = edit(opened(), [titled('One')]);
    expect(titlesOf(copy)).toEqual(['One', va]);
    expect(copy.waiting).toMatchObject([{ part: 'rules/vma', before: partHash(aRule()) }]);
  });

  it('sends a part that was changed twice once, over the state that was seen first', () => {
    const copy = edit(edit(opened(), [titled('One')]), [titled('Two')]);
    expect(copy.waiting).toMatchObject([{ before: partHash(aRule()), after: { title: 'Two' } }]);
  });

  it('sends nothing where a change was taken back', () => {
    const copy = undo(edit(opened(), [titled('One')]));
    expect(copy.waiting).toEqual([]);
    expect(titlesOf(copy)).toEqual([vma, va]);
  });

  it('undoes and redoes every act, a removed rule at its place', () => {
    const removed = edit(opened(), [{ part: 'rules/vma', after: null }]);
    expect(titlesOf(removed)).toEqual([va]);
    const back = undo(removed);
    expect(documentOf(back)).toEqual(draft);
    expect(titlesOf(redo(back))).toEqual([va]);
    expect(documentOf(undo(undo(edit(removed, [titled('One', 'va')]))))).toEqual(draft);
  });

  it('undoes what the server keeps already by sending the old state', () => {
    const kept = keptBy(startSending(edit(opened(), [titled('One')])), { version: 2, parts: [] });
    const back = undo(kept);
    expect(back.waiting).toMatchObject([
      { part: 'rules/vma', before: partHash(aRule({ title: 'One' })), after: aRule() },
    ]);
  });

  it('forgets what could be redone once something else is done', () => {
    const copy = edit(undo(edit(opened(), [titled('One')])), [titled('Two')]);
    expect(titlesOf(redo(copy))).toEqual(['Two', va]);
  });
});

describe('an answer of the server', () => {
  it('that keeps all leaves nothing waiting, and shows who encoded the rule', () => {
    const stamped = { ...aRule({ title: 'One' }), encodedBy: 'Tamsin Brook, 2026-03-09', verifiedBy: null };
    const answer = { version: 2, parts: [{ part: 'rules/vma', value: stamped }] };
    const copy = keptBy(startSending(edit(opened(), [titled('One')])), answer);
    expect(copy).toMatchObject({ sending: [], waiting: [], kept: { version: 2 } });
    expect(documentOf(copy).rules).toEqual([stamped, aRule({ id: 'va' })]);
  });

  it('to an earlier state lets what was changed meanwhile follow upon it', () => {
    const sent = startSending(edit(opened(), [titled('One')]));
    const later = edit(sent, [titled('Two')]);
    expect(titlesOf(later)).toEqual(['Two', va]);
    const stamped = { ...aRule({ title: 'One' }), encodedBy: 'T, 2026-03-09', verifiedBy: null };
    const copy = keptBy(later, { version: 2, parts: [{ part: 'rules/vma', value: stamped }] });
    const next = startSending(copy);
    expect(changeParts(copy.kept.document, next.sending)).toMatchObject({ ok: true });
    expect(titlesOf(copy)).toEqual(['Two', va]);
  });

  it('that is lost is asked for again, with nothing lost', () => {
    const failed = sendingFailed(edit(startSending(edit(opened(), [titled('One')])), [titled('Two')]));
    expect(failed.waiting).toMatchObject([{ before: partHash(aRule()), after: { title: 'Two' } }]);
  });
});

describe('somebody else’s change', () => {
  const theirs: DraftDocument = { ...aRuleSet({ rules: [aRule({ title: 'Theirs' }), aRule({ id: 'va' })] }) };
  const conflict = {
    part: 'rules/vma',
    present: aRule({ title: 'Theirs' }),
    by: 'Joaquim Vale',
    at: '2026-03-09T09:00:00.000Z',
  };

  it('of another part stands beside the author’s own', () => {
    const copy = refreshed(edit(opened(), [titled('Mine', 'va')]), { document: theirs, version: 2 });
    expect(titlesOf(copy)).toEqual(['Theirs', 'Mine']);
    expect(changeParts(theirs, copy.waiting)).toMatchObject({ ok: true });
  });

  it('of the same part is found when the author’s own is sent', () => {
    const copy = refreshed(edit(opened(), [titled('Mine')]), { document: theirs, version: 2 });
    expect(changeParts(theirs, copy.waiting)).toMatchObject({
      ok: false,
      conflicts: [{ part: 'rules/vma' }],
    });
  });

  it('that is the author’s own, kept although the answer was lost, is no conflict', () => {
    const mine = aRule({ title: 'Mine' });
    const present = { ...mine, encodedBy: 'Tamsin Brook, 2026-03-09', verifiedBy: null };
    const sent = startSending(edit(opened(), [titled('Mine')]));
    const copy = refusedBy(sent, [{ ...conflict, present }]);
    expect(copy).toMatchObject({ conflicts: [], waiting: [] });
    expect(documentOf(copy).rules).toEqual([present, aRule({ id: 'va' })]);
  });

  it('in conflict shows theirs, keeps mine, and sends the rest', () => {
    const sent = startSending(edit(opened(), [titled('Mine'), titled('Other', 'va')]));
    const copy = refusedBy(sent, [conflict]);
    expect(titlesOf(copy)).toEqual(['Theirs', 'Other']);
    expect(copy.conflicts).toMatchObject([{ by: 'Joaquim Vale', mine: { title: 'Mine' } }]);
    expect(copy.waiting.map(({ part }) => part)).toEqual(['rules/va']);
    const kept = settle(copy, 'rules/vma', 'theirs');
    expect(titlesOf(kept)).toEqual(['Theirs', 'Other']);
    const own = settle(copy, 'rules/vma', 'mine');
    expect(titlesOf(own)).toEqual(['Mine', 'Other']);
    expect(changeParts(theirs, own.waiting)).toMatchObject({ ok: true });
  });
});
