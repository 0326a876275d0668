import { findingKey } from '#rules/engine/finding';
import { getQueue, getQueueItem, type QueueItem } from '#shared/contracts/queue';
import { dateOfInstant } from '#shared/format/dates';
import { nextActOf } from '#shared/next-acts';
import { newestCheckOf } from '../../db/queries/checks';
import { listWaivers } from '../../db/queries/notes';
import { internalNotes, listQueue, type QueueRow } from '../../db/queries/queue';
import type { RequestActor } from '../../middleware/authenticate';
import { seesQueue } from '../../policies/session-abilities';
import { presentQueueItem } from '../../presenters/present-queue-item';
import { Problem } from '../../problem';
import { route } from '../define-route';

interface Entry {
  row: QueueRow;
  item: QueueItem;
}

export const getQueueRoute = route(getQueue, async ({ deps, query, actor }) => {
  const desk = deskOf(actor, deps.now());
  const entries = entriesOf(await listQueue(deps.db, actor.organisationId), desk);
  const open = entries.filter(({ item }) => item.group !== 'with the contractor');
  const mine = open.filter(({ row }) => row.revision.takenById === actor.personId);
  const notTaken = open.filter(({ row }) => row.revision.state === 'submitted');
  const toSign = open.filter(({ row }) => isToSign(row, actor));
  const chosen = { everyone: entries, mine, 'not taken': notTaken, 'to sign': toSign }[query.who];
  return {
    today: desk.today,
    items: inOrder(chosen, query.by).map(({ item }) => item),
    counts: {
      everyone: open.length,
      mine: mine.length,
      notTaken: notTaken.length,
      toSign: toSign.length,
      late: open.filter(({ item }) => item.group === 'late').length,
      withContractors: entries.length - open.length,
    },
    reviewWorkingDays: actor.organisation.reviewWorkingDays,
  };
});

export const getQueueItemRoute = route(getQueueItem, async ({ deps, params: { submittalId }, actor }) => {
  const desk = deskOf(actor, deps.now());
  const entries = entriesOf(await listQueue(deps.db, actor.organisationId), desk);
  const found = entries.find(({ item }) => item.submittalId === submittalId);
  if (found === undefined) throw new Problem('not-found');
  const { row, item } = found;
  const [check, waivers, notes] = await Promise.all([
    newestCheckOf(deps.db, actor, row.revision.id),
    listWaivers(deps.db, actor, row.revision.id),
    internalNotes(deps.db, actor.organisationId, submittalId),
  ]);
  const waived = waivers.map(({ waiver }) => waiver.finding);
  return {
    item,
    findings: (check?.result.findings ?? []).filter(
      (finding) => nextActOf(finding, waived.includes(findingKey(finding))) !== null,
    ),
    waived,
    changes: row.revision.changes,
    internalNotes: notes.map(({ text, by, at }) => ({
      text,
      by,
      on: dateOfInstant(at.toISOString(), desk.timeZone),
    })),
  };
});

function deskOf(actor: RequestActor, now: Date) {
  if (!seesQueue(actor)) throw new Problem('not-allowed');
  const { timeZone } = actor.organisation;
  return { actor, timeZone, today: dateOfInstant(now.toISOString(), timeZone) };
}

function entriesOf(rows: readonly QueueRow[], desk: ReturnType<typeof deskOf>): Entry[] {
  return rows.flatMap((row) => {
    const item = presentQueueItem(row, desk);
    return item === null ? [] : [{ row, item }];
  });
}

/** In review, ready, and meant for this signing engineer or for whichever comes first. */
function isToSign({ revision, returnState, signingEngineerId }: QueueRow, actor: RequestActor): boolean {
  if (
    revision.state !== 'in review' ||
    returnState !== 'ready to sign' ||
    !actor.roles.includes('signing engineer')
  )
    return false;
  return signingEngineerId === null || signingEngineerId === actor.personId;
}

/** Rows come by due date already; what waits with the contractor stands last either way. */
function inOrder(entries: readonly Entry[], by: 'due' | 'project'): Entry[] {
  const place = ({ item }: Entry) => (item.group === 'with the contractor' ? 1 : 0);
  return entries.toSorted((one, other) => {
    const byProject =
      by === 'project' ? one.item.project.number.localeCompare(other.item.project.number, 'en') : 0;
    return place(one) - place(other) || byProject;
  });
}
