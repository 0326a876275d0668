import { getKeptCheck, listChecks } from '#shared/contracts/checks';
import { findCheck, listCheckHeads } from '../../db/queries/checks';
import { isStartingPoint } from '../../db/queries/returns';
import { loadResolvedEdition } from '../../db/resolved-edition';
import { presentCheckHead } from '../../presenters/present-check-head';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectRevision } from '../submittals/load-revision';

export const listChecksRoute = route(listChecks, async ({ deps, params, actor }) => {
  const { revision } = await expectRevision(deps, actor, params);
  const heads = await listCheckHeads(deps.db, actor, revision.id);
  const editions = await Promise.all(
    heads.map(({ resolvedHash }) => loadResolvedEdition(deps.db, resolvedHash)),
  );
  return { checks: heads.map((head, index) => presentCheckHead(head, editions[index]!)) };
});

export const getKeptCheckRoute = route(getKeptCheck, async ({ deps, params, actor }) => {
  const { revision, agency } = await expectRevision(deps, actor, params);
  const found = await findCheck(deps.db, actor, { revisionId: revision.id, number: params.check });
  if (found === null) throw new Problem('not-found');
  const { head, result } = found;
  const edition = await loadResolvedEdition(deps.db, head.resolvedHash);
  const presented = presentCheckHead(head, edition);
  return {
    ...presented,
    summary: result.summary,
    findings: result.findings,
    startingPoint: await isStartingPoint(deps.db, agency.id, presented.base),
  };
});
