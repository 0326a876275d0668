import type { Deps } from '../deps';
import type { Actor } from '../policies/actor';
import type { Database } from './client';
import { audit } from './schema/people';

export interface AuditEntry {
  /** Null where the product itself acted. */
  actor: Pick<Actor, 'organisationId' | 'personId'> | null;
  /** "revision submitted" */
  act: string;
  subject: { kind: string; id: string };
  detail?: Record<string, unknown>;
  requestId: string | null;
}

/** Written in the transaction of the act, so that neither stands without the other. */
export async function writeAudit(
  tx: Database,
  { now, newId }: Pick<Deps, 'now' | 'newId'>,
  { actor, act, subject, detail = {}, requestId }: AuditEntry,
): Promise<void> {
  await tx.insert(audit).values({
    id: newId(),
    at: now(),
    organisationId: actor?.organisationId ?? null,
    personId: actor?.personId ?? null,
    act,
    subjectKind: subject.kind,
    subjectId: subject.id,
    detail,
    requestId,
  });
}
