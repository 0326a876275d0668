import {
  getReadingChoices,
  keepCorrections,
  listReadingActs,
  previewReading,
  type ReadingProposal,
  takeBackAct,
  typeReadings,
} from '#shared/contracts/corrections';
import { changeReading } from '../../commands/readings/change-reading';
import { previewReading as preview } from '../../commands/readings/preview-reading';
import { listReadingActs as listActs } from '../../db/queries/reading-acts';
import { loadResolvedEdition } from '../../db/resolved-edition';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { presentActs } from '../../presenters/present-acts';
import { presentChoices } from '../../presenters/present-choices';
import { wordsFor } from '../../presenters/words-for';
import { route } from '../define-route';
import { expectRevision, type RevisionPlace } from '../submittals/load-revision';
import { expectDraft } from './expect-draft';
import { viewReading } from './view-reading';

const nothing: ReadingProposal = { takeBack: [], answers: [], corrections: [], typed: [] };

interface Exchange {
  deps: Deps;
  actor: RequestActor;
  params: RevisionPlace;
  version: number;
  requestId: string;
}

/** Makes a change at the version that was seen, and shows the reading as it is then. */
export async function changeAndView(
  { deps, actor, params, version, requestId }: Exchange,
  part: Partial<ReadingProposal>,
) {
  const row = await expectDraft(deps, actor, params, version);
  await changeReading(deps, { actor, row, proposal: { ...nothing, ...part }, requestId });
  return viewReading(deps, actor, await expectRevision(deps, actor, params));
}

const previewReadingRoute = route(previewReading, async ({ deps, params, body, actor, requestId }) => {
  const row = await expectDraft(deps, actor, params, null);
  return preview(deps, { actor, row, proposal: body, requestId });
});

const keepCorrectionsRoute = route(keepCorrections, async ({ body, ...exchange }) =>
  changeAndView(exchange, { corrections: body.corrections }),
);

const typeReadingsRoute = route(typeReadings, async ({ body, ...exchange }) =>
  changeAndView(exchange, { typed: body.readings }),
);

const takeBackActRoute = route(takeBackAct, async ({ params: { actId, ...params }, ...exchange }) =>
  changeAndView({ ...exchange, params }, { takeBack: [actId] }),
);

const listReadingActsRoute = route(listReadingActs, async ({ deps, params, actor }) => {
  const { revision } = await expectRevision(deps, actor, params);
  const [acts, edition] = await Promise.all([
    listActs(deps.db, actor, revision.id),
    loadResolvedEdition(deps.db, revision.section.resolvedHash),
  ]);
  return { acts: presentActs(acts, wordsFor(edition)) };
});

const getReadingChoicesRoute = route(getReadingChoices, async ({ deps, params, actor }) => {
  const { revision } = await expectRevision(deps, actor, params);
  return presentChoices(await loadResolvedEdition(deps.db, revision.section.resolvedHash));
});

export const correctionRoutes = [
  previewReadingRoute,
  keepCorrectionsRoute,
  typeReadingsRoute,
  takeBackActRoute,
  listReadingActsRoute,
  getReadingChoicesRoute,
];
