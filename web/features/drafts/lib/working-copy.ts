import {
  contentHash,
  type DraftDocument,
  type PartChange,
  partHash,
  partsOf,
  positionOf,
  putPart,
} from '#rules/authoring/document-parts';
import type { DraftConflict } from '#shared/contracts/drafts';

/** What an author does to one part: what it shall be, null to take it out. */
export interface Edit {
  part: string;
  after: unknown;
  position?: number | undefined;
}

/** A part that two authors changed: the author's own version waits until one of the two is chosen. */
export interface Conflict extends DraftConflict {
  mine: unknown;
}

/** An author's view of a draft: what the server keeps, and what it has not been told yet. */
export interface WorkingCopy {
  kept: { document: DraftDocument; version: number };
  /** On its way; an answer is awaited. */
  sending: readonly PartChange[];
  waiting: readonly PartChange[];
  conflicts: readonly Conflict[];
  /** What brings each act back, the latest last. */
  undone: readonly Edit[][];
  done: readonly Edit[][];
}

export function openCopy(kept: WorkingCopy['kept'], waiting: readonly PartChange[] = []): WorkingCopy {
  return { kept, sending: [], waiting, conflicts: [], done: [], undone: [] };
}

/** The draft as its author sees it. */
export function documentOf({ kept, sending, waiting }: WorkingCopy): DraftDocument {
  return [...sending, ...waiting].reduce(putPart, kept.document);
}

/** One act of the author, which one undo brings back. */
export function edit(copy: WorkingCopy, edits: readonly Edit[]): WorkingCopy {
  const inverse = inverseOf(copy, edits);
  return { ...withEdits(copy, edits), done: [...copy.done, inverse], undone: [] };
}

export function undo(copy: WorkingCopy): WorkingCopy {
  const last = copy.done.at(-1);
  if (last === undefined) return copy;
  const again = inverseOf(copy, last);
  return { ...withEdits(copy, last), done: copy.done.slice(0, -1), undone: [...copy.undone, again] };
}

export function redo(copy: WorkingCopy): WorkingCopy {
  const last = copy.undone.at(-1);
  if (last === undefined) return copy;
  const inverse = inverseOf(copy, last);
  return { ...withEdits(copy, last), done: [...copy.done, inverse], undone: copy.undone.slice(0, -1) };
}

/** All that waits is sent together; a part in conflict waits for its author. */
export function startSending(copy: WorkingCopy): WorkingCopy {
  return copy.sending.length > 0 ? copy : { ...copy, sending: copy.waiting, waiting: [] };
}

/** The server kept what was sent, with the parts that it stamped. */
export function keptBy(
  copy: WorkingCopy,
  answer: { version: number; parts: readonly { part: string; value: unknown }[] },
): WorkingCopy {
  const stamped = answer.parts.map(({ part, value }) => ({ part, after: value }));
  const document = [...copy.sending, ...stamped].reduce(putPart, copy.kept.document);
  const now = partsOf(document);
  const sent = new Set(copy.sending.map(({ part }) => part));
  // What was changed again in the meantime was changed upon what has just been kept.
  const waiting = copy.waiting.map((change) =>
    sent.has(change.part) ? { ...change, before: partHash(now.get(change.part)) } : change,
  );
  return { ...copy, kept: { document, version: answer.version }, sending: [], waiting };
}

/** Nothing of what was sent is kept: the parts in conflict wait for their author, the others for the next sending. */
export function refusedBy(copy: WorkingCopy, conflicts: readonly DraftConflict[]): WorkingCopy {
  const met = new Map(conflicts.map((each) => [each.part, each]));
  const unsent = merged(copy.sending, copy.waiting);
  const document = conflicts.reduce(
    (changed, { part, present }) => putPart(changed, { part, after: present ?? null }),
    copy.kept.document,
  );
  return {
    ...copy,
    kept: { ...copy.kept, document },
    sending: [],
    waiting: unsent.filter(({ part }) => !met.has(part)),
    conflicts: [
      ...copy.conflicts.filter(({ part }) => !met.has(part)),
      ...unsent.flatMap(({ part, after }) => {
        const conflict = met.get(part);
        return conflict === undefined || sameContent(conflict.present, after)
          ? []
          : [{ ...conflict, mine: after }];
      }),
    ],
  };
}

/** The answer was lost: it is sent again, and the server tells whether it had been kept. */
export function sendingFailed(copy: WorkingCopy): WorkingCopy {
  return { ...copy, sending: [], waiting: merged(copy.sending, copy.waiting) };
}

/** Somebody else changed the draft. What waits keeps the state that its author saw, so that a conflict is found. */
export function refreshed(copy: WorkingCopy, kept: WorkingCopy['kept']): WorkingCopy {
  return copy.sending.length > 0 || kept.version <= copy.kept.version ? copy : { ...copy, kept };
}

export function settle(copy: WorkingCopy, part: string, choice: 'mine' | 'theirs'): WorkingCopy {
  const conflict = copy.conflicts.find((each) => each.part === part);
  if (conflict === undefined) return copy;
  const settled = { ...copy, conflicts: copy.conflicts.filter((each) => each !== conflict) };
  return choice === 'theirs' ? settled : edit(settled, [{ part, after: conflict.mine }]);
}

function withEdits(copy: WorkingCopy, edits: readonly Edit[]): WorkingCopy {
  let { waiting } = copy;
  for (const one of edits) waiting = withEdit({ ...copy, waiting }, one);
  return { ...copy, waiting };
}

function withEdit({ kept, sending, waiting }: WorkingCopy, { part, after, position }: Edit): PartChange[] {
  const earlier = waiting.find((change) => change.part === part);
  const seen = partsOf(sending.reduce(putPart, kept.document)).get(part);
  const before = earlier?.before ?? (earlier === undefined ? partHash(seen) : null);
  const rest = waiting.filter((change) => change !== earlier);
  if (before === partHash(after)) return rest;
  return [...rest, { part, before, after, position: position ?? earlier?.position }];
}

/** The author's own change, kept although its answer was lost, is no conflict; only the stamps differ. */
function sameContent(left: unknown, right: unknown): boolean {
  return contentHash(left) === contentHash(right);
}

/** The later change of a part stands, over the state that the earlier one was made upon. */
function merged(earlier: readonly PartChange[], later: readonly PartChange[]): PartChange[] {
  const first = new Map(earlier.map((change) => [change.part, change]));
  const again = later.map((change) => ({ ...change, before: (first.get(change.part) ?? change).before }));
  const parts = new Set(later.map(({ part }) => part));
  return [...earlier.filter(({ part }) => !parts.has(part)), ...again];
}

function inverseOf(copy: WorkingCopy, edits: readonly Edit[]): Edit[] {
  const document = documentOf(copy);
  const parts = partsOf(document);
  return edits
    .map(({ part }) => ({
      part,
      after: parts.get(part) ?? null,
      position: positionOf(document, part) ?? undefined,
    }))
    .toReversed();
}
