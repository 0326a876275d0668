import type { QueueItem } from '#shared/contracts/queue';
import { dateOfInstant } from '#shared/format/dates';
import { workingDaysBetween } from '#shared/working-days';
import type { QueueRow } from '../db/queries/queue';
import { type Actor, reviews, signs } from '../policies/actor';
import { queueGroup } from './queue-group';

interface Desk {
  actor: Actor;
  /** In the agency's zone. */
  today: string;
  timeZone: string;
}

/** Null where the revision is neither to decide nor awaited. */
export function presentQueueItem(row: QueueRow, { actor, today, timeZone }: Desk): QueueItem | null {
  const { revision } = row;
  const group = queueGroup(revision, today);
  if (group === null) return null;
  const withAgency = group !== 'with the contractor';
  const holds = revision.takenById === actor.personId && reviews(actor);
  return {
    submittalId: row.submittal.id,
    mixDesignation: row.submittal.mixDesignation,
    revision: revision.number,
    version: revision.version,
    contractor: row.contractor,
    project: row.project,
    description: revision.description,
    group,
    receivedOn: revision.receivedOn,
    dueOn: revision.dueOn,
    workingDaysLeft: withAgency && revision.dueOn !== null ? workingDaysBetween(today, revision.dueOn) : null,
    summary: row.summary,
    reviewer:
      revision.takenById === null || row.reviewer === null
        ? null
        : { id: revision.takenById, name: row.reviewer },
    returnState: row.returnState,
    stands: revision.disposition ?? revision.state,
    returnedOn:
      revision.returnedAt === null ? null : dateOfInstant(revision.returnedAt.toISOString(), timeZone),
    abilities: {
      take: revision.state === 'submitted' && reviews(actor),
      giveBack: revision.state === 'in review' && (holds || signs(actor)),
    },
  };
}
