import type { ReturnFields, ReturnView } from '#shared/contracts/returns';
import type { Revision } from '#shared/contracts/submittals';
import {
  fileHashes,
  findReturn,
  mailsOfReturn,
  peopleOfReturn,
  peopleWithRole,
  type ReturnRow,
} from '../../db/queries/returns';
import { findRevision, type RevisionRow } from '../../db/queries/revisions';
import type { Deps } from '../../deps';
import { type LoadedRevision, loadRevisionDocuments } from '../../documents/load-revision-documents';
import type { Actor } from '../../policies/actor';
import { revisionAbilities } from '../../policies/revision-abilities';
import { presentReturn } from '../../presenters/present-return';
import { Problem } from '../../problem';
import { firstReturnFields, keptReturnFields, recommended } from './return-fields';

export interface LoadedReturn {
  row: RevisionRow;
  loaded: LoadedRevision;
  abilities: Revision['abilities'];
  kept: ReturnRow | null;
  fields: ReturnFields;
}

/** The return that the reader may see: a draft for those who prepare or sign it, the sent one for both sides. */
export async function loadReturn(
  deps: Deps,
  actor: Actor,
  params: { submittalId: string; number: number },
): Promise<LoadedReturn> {
  const row = await findRevision(deps.db, actor, params);
  if (row === null) throw new Problem('not-found');
  const abilities = revisionAbilities(actor, {
    state: row.revision.state,
    number: row.revision.number,
    disposition: row.revision.disposition,
    reviewerId: row.revision.takenById,
    latest: row.submittal.latestNumber === row.revision.number,
    hasCheck: true,
    reading: false,
    standingApproval: row.submittal.standingRevision !== null,
    waiverPolicy: row.agency.waiverPolicy,
  });
  if (!abilities.seeReturn) throw new Problem(actor.kind === 'agency' ? 'not-allowed' : 'not-found');
  const loaded = await loadRevisionDocuments(deps.db, actor, row);
  const kept = await findReturn(deps.db, actor, row.revision.id);
  if (kept === null && row.revision.state === 'returned') throw new Problem('not-found');
  const fields =
    kept === null ? await firstReturnFields(deps.db, actor, { row, loaded }) : keptReturnFields(kept);
  return { row, loaded, abilities, kept, fields };
}

export async function viewReturn(
  deps: Deps,
  actor: Actor,
  params: { submittalId: string; number: number },
): Promise<ReturnView> {
  const { row, loaded, abilities, kept, fields } = await loadReturn(deps, actor, params);
  const [signers, engineers, mails, hashes] = await Promise.all([
    kept === null ? null : peopleOfReturn(deps.db, actor, kept.id),
    peopleWithRole(deps.db, row.agency.id, 'signing engineer'),
    kept === null ? [] : mailsOfReturn(deps.db, actor, kept.id),
    kept === null ? null : fileHashes(deps.db, kept),
  ]);
  return presentReturn({
    placeholderId: row.revision.id,
    kept,
    fields,
    sources: loaded.sources,
    waived: loaded.waived,
    recommended: recommended(loaded),
    internalNotes: loaded.internalNotes,
    preparedBy: signers?.preparedBy ?? null,
    signingEngineers: engineers.map(({ id, name }) => ({ id, name })),
    sentBy: signers?.decidedBy?.name ?? null,
    mails,
    fileHashes: hashes,
    abilities: {
      change: abilities.prepareReturn,
      makeReady: abilities.prepareReturn && !abilities.sendReturn,
      send: abilities.sendReturn,
    },
    forContractor: actor.kind === 'contractor',
  });
}
