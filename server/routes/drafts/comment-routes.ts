import {
  changeDraftComment,
  type DraftComment,
  listDraftComments,
  removeDraftComment,
  writeDraftComment,
} from '#shared/contracts/drafts';
import { changeComment, removeComment, writeComment } from '../../commands/drafts/comment-on-draft';
import { listDraftComments as listComments } from '../../db/queries/drafts';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { expectVersion } from '../../middleware/if-match';
import { allow } from '../../policies/allow';
import { Problem } from '../../problem';
import { type Route, route } from '../define-route';
import { allowWriting, loadDraft } from './load-draft';

async function commentsOf(deps: Deps, actor: RequestActor, draftId: string): Promise<DraftComment[]> {
  const rows = await listComments(deps.db, actor.organisationId, draftId);
  return rows.map(({ comment, by }) => ({
    id: comment.id,
    rule: comment.rule,
    text: comment.text,
    by,
    at: comment.createdAt.toISOString(),
    version: comment.version,
    mine: by.id === actor.personId,
  }));
}

interface Place {
  draftId: string;
  commentId: string;
}

async function expectComment(deps: Deps, actor: RequestActor, { draftId, commentId }: Place) {
  const comments = await commentsOf(deps, actor, draftId);
  const found = comments.find(({ id }) => id === commentId);
  if (found === undefined) throw new Problem('not-found');
  return found;
}

async function expectOwn(deps: Deps, actor: RequestActor, place: Place & { version: number }): Promise<void> {
  await loadDraft(deps, actor, place.draftId);
  const comment = await expectComment(deps, actor, place);
  allow(comment.mine, 'A comment is changed by its writer alone.');
  expectVersion(place.version, comment);
}

const listRoute = route(listDraftComments, async ({ deps, actor, params }) => {
  await loadDraft(deps, actor, params.draftId);
  return { comments: await commentsOf(deps, actor, params.draftId) };
});

const writeRoute = route(writeDraftComment, async ({ deps, actor, params: { draftId }, body, requestId }) => {
  const draft = await loadDraft(deps, actor, draftId);
  allowWriting(draft.abilities.comment);
  const commentId = await writeComment(deps, { actor, requestId, draftId, ...body });
  return expectComment(deps, actor, { draftId, commentId });
});

const changeRoute = route(changeDraftComment, async ({ deps, actor, params, body, version, requestId }) => {
  await expectOwn(deps, actor, { ...params, version });
  await changeComment(deps, { actor, requestId, ...params, ...body, version });
  return expectComment(deps, actor, params);
});

const removeRoute = route(removeDraftComment, async ({ deps, actor, params, version, requestId }) => {
  await expectOwn(deps, actor, { ...params, version });
  await removeComment(deps, { actor, requestId, ...params, version });
  return undefined;
});

export const draftCommentRoutes: Route[] = [listRoute, writeRoute, changeRoute, removeRoute];
