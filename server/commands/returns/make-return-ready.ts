import { and, eq } from 'drizzle-orm';
import type { ReturnFields } from '#shared/contracts/returns';
import { findReturn, peopleWithRole } from '../../db/queries/returns';
import type { RevisionRow } from '../../db/queries/revisions';
import { returns } from '../../db/schema/returns';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { LoadedRevision } from '../../documents/load-revision-documents';
import { enqueueMail } from '../../mail/enqueue-mail';
import { readyToSignMail } from '../../mail/templates/submission-mails';
import type { RequestActor } from '../../middleware/authenticate';
import { expectVersion, expectWritten } from '../../middleware/if-match';
import { Problem } from '../../problem';
import { keepReturn } from './keep-return';
import { returnAddress } from './return-address';
import { recommended, refuseUnfinished } from './return-fields';

interface MakeReady {
  actor: RequestActor;
  row: RevisionRow;
  loaded: LoadedRevision;
  fields: ReturnFields;
  seenVersion: number;
  signingEngineerId: string;
  requestId: string;
}

/** Hands the prepared return to a signing engineer, who is told by mail. */
export async function makeReturnReady(deps: Deps, act: MakeReady): Promise<void> {
  const { actor, row, loaded, fields, seenVersion } = act;
  refuseUnfinished(fields, recommended(loaded));
  const engineers = await peopleWithRole(deps.db, actor.organisationId, 'signing engineer');
  const engineer = engineers.find(({ id }) => id === act.signingEngineerId);
  if (engineer === undefined) {
    const detail = 'This is not a signing engineer of your agency.';
    throw new Problem('invalid-input', { detail, errors: [{ pointer: '/signingEngineerId', detail }] });
  }
  await deps.db.transaction(async (tx) => {
    const inner: Deps = { ...deps, db: tx };
    if (seenVersion === 0) await keepReturn(inner, { actor, row, fields, seenVersion });
    const kept = await findReturn(tx, actor, row.revision.id);
    if (kept === null || kept.state === 'sent')
      throw new Problem('wrong-state', { detail: 'The return has been sent.' });
    if (seenVersion !== 0) expectVersion(seenVersion, kept);
    expectWritten(
      await tx
        .update(returns)
        .set({
          state: 'ready to sign',
          signingEngineerId: engineer.id,
          preparedById: actor.personId,
          savedAt: deps.now(),
          version: kept.version + 1,
        })
        .where(and(eq(returns.id, kept.id), eq(returns.version, kept.version))),
    );
    await enqueueMail(tx, inner, {
      organisationId: row.agency.id,
      kind: 'return ready to sign',
      subject: { kind: 'revision', id: row.revision.id },
      recipients: [{ name: engineer.name, email: engineer.email }],
      content: readyToSignMail({
        mixDesignation: row.submittal.mixDesignation,
        revision: row.revision.number,
        project: row.project,
        preparedBy: actor.person.name,
        disposition: fields.disposition,
        address: returnAddress(deps.settings, row),
      }),
    });
    await writeAudit(tx, inner, {
      actor,
      act: 'return made ready to sign',
      subject: { kind: 'revision', id: row.revision.id },
      detail: { disposition: fields.disposition, signingEngineer: engineer.id },
      requestId: act.requestId,
    });
  });
  deps.wake.mail();
}
