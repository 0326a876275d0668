import {
  changeDraft,
  discardDraft,
  exportDraft,
  getDraft,
  listStartingPoints,
  publishDraft,
  sendDraftForReview,
  startDraft,
  takeDraftBack,
  verifyRules,
  withdrawEdition,
} from '#shared/contracts/drafts';
import { changeDraft as change } from '../../commands/drafts/change-draft';
import { publishDraft as publish, rulesOf } from '../../commands/drafts/publish-draft';
import { discardDraft as discard, sendForReview, takeBack, verify } from '../../commands/drafts/review-draft';
import { startDraft as start } from '../../commands/drafts/start-draft';
import { withdrawEdition as withdraw } from '../../commands/drafts/withdraw-edition';
import { isShippedDraft, shippedSets } from '../../commands/rule-sets/publish-starting-points';
import { editionReference } from '../../db/queries/editions';
import { allow } from '../../policies/allow';
import { writesRules } from '../../policies/draft-abilities';
import { Problem } from '../../problem';
import { type Route, route } from '../define-route';
import { ruleSetFile } from '../rule-sets/rule-set-file';
import { draftCommentRoutes } from './comment-routes';
import { allowWriting, loadDraft } from './load-draft';

const startRoute = route(startDraft, async ({ deps, actor, body, requestId }) => {
  allowWriting(writesRules(actor));
  return loadDraft(deps, actor, await start(deps, { actor, requestId, ...body }));
});

const getRoute = route(getDraft, ({ deps, actor, params }) => loadDraft(deps, actor, params.draftId));

const changeRoute = route(changeDraft, async ({ deps, actor, params: { draftId }, body, requestId }) => {
  await loadDraft(deps, actor, draftId);
  allowWriting(writesRules(actor));
  return change(deps, { actor, requestId, draftId, changes: body.changes });
});

const sendRoute = route(sendDraftForReview, async ({ deps, actor, params, version, requestId }) => {
  await loadDraft(deps, actor, params.draftId);
  allowWriting(writesRules(actor));
  await sendForReview(deps, { actor, requestId, ...params, version });
  return loadDraft(deps, actor, params.draftId);
});

const takeBackRoute = route(takeDraftBack, async ({ deps, actor, params, version, requestId }) => {
  await loadDraft(deps, actor, params.draftId);
  allowWriting(writesRules(actor));
  await takeBack(deps, { actor, requestId, ...params, version });
  return loadDraft(deps, actor, params.draftId);
});

const verifyRoute = route(verifyRules, async ({ deps, actor, params, body, version, requestId }) => {
  await loadDraft(deps, actor, params.draftId);
  allowWriting(writesRules(actor));
  await verify(deps, { actor, requestId, ...params, ...body, version });
  return loadDraft(deps, actor, params.draftId);
});

const publishRoute = route(publishDraft, async ({ deps, actor, params, body, version, requestId }) => {
  const draft = await loadDraft(deps, actor, params.draftId);
  allowWriting(writesRules(actor));
  if (draft.state === 'in review') {
    allow(draft.abilities.publish, 'You sent this draft for review; a second rule author publishes it.');
  }
  return publish(deps, { actor, requestId, ...params, ...body, version });
});

const discardRoute = route(discardDraft, async ({ deps, actor, params, version, requestId }) => {
  await loadDraft(deps, actor, params.draftId);
  allowWriting(writesRules(actor));
  await discard(deps, { actor, requestId, ...params, version });
  return undefined;
});

const exportRoute = route(exportDraft, async ({ deps, actor, params }) => {
  const { document, ruleSet, edition } = await loadDraft(deps, actor, params.draftId);
  return ruleSetFile(document, `${ruleSet} ${edition} draft`);
});

const withdrawRoute = route(withdrawEdition, async ({ deps, actor, params, body, requestId }) => {
  // Who may see an edition without writing rules is told that; to a contractor's agency it is no act at all.
  if (actor.kind !== 'agency') throw new Problem('not-found');
  allowWriting(writesRules(actor));
  return editionReference(await withdraw(deps, { actor, requestId, ...params, ...body }));
});

const startingPointsRoute = route(listStartingPoints, async ({ actor }) => {
  allowWriting(writesRules(actor));
  return {
    startingPoints: shippedSets()
      .filter((each) => !isShippedDraft(each))
      .map(({ file, parsed }) => ({
        file,
        ruleSet: parsed.id,
        edition: parsed.edition,
        title: parsed.title,
        rules: rulesOf(parsed).length,
        layerOf: parsed.layerOf,
      })),
  };
});

export const draftRoutes: Route[] = [
  startRoute,
  getRoute,
  changeRoute,
  sendRoute,
  takeBackRoute,
  verifyRoute,
  publishRoute,
  discardRoute,
  exportRoute,
  withdrawRoute,
  startingPointsRoute,
  ...draftCommentRoutes,
];
