import { findRevision } from '../db/queries/revisions';
import type { Deps } from '../deps';
import type { Actor } from '../policies/actor';
import { seesWaiver } from '../policies/note-visibility';
import { returnItems } from '../presenters/return-items';
import { Problem } from '../problem';
import type { DocumentInput } from './document-input';
import { loadRevisionDocuments } from './load-revision-documents';
import { findingsInput } from './return-input';

/** The findings as either side may save them: nobody's notes, and only waivers that the other side may know of. */
export async function loadFindingsInput(
  deps: Deps,
  actor: Actor,
  params: { submittalId: string; number: number },
): Promise<DocumentInput> {
  const row = await findRevision(deps.db, actor, params);
  if (row === null) throw new Problem('not-found');
  const { facts, sources } = await loadRevisionDocuments(deps.db, actor, row);
  const waivers = sources.waivers.filter((waiver) => seesWaiver({ kind: 'contractor' }, waiver));
  return findingsInput(
    facts,
    returnItems({ ...sources, notes: [], waivers, included: new Set() }),
    deps.now(),
  );
}

/** `CV-2031 BW-125-S4 r1 findings.pdf` */
export function findingsFileName(
  { project, mixDesignation, revision }: DocumentInput,
  extension: string,
): string {
  return `${project.number} ${mixDesignation} r${revision} findings.${extension}`;
}
