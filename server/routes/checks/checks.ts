import { checkAgain, getCheck, proveSeal } from '#shared/contracts/checks';
import { checkAgain as check } from '../../commands/checks/check-again';
import { proveSeal as prove } from '../../commands/checks/prove-seal';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectAbility } from '../submittals/expect-ability';
import { expectRevision, expectSeen, viewRevision } from '../submittals/load-revision';
import { viewCheck } from './view-check';

export const getCheckRoute = route(getCheck, async ({ deps, params, actor }) =>
  viewCheck(deps, actor, await expectRevision(deps, actor, params)),
);

export const checkAgainRoute = route(checkAgain, async ({ deps, params, version, actor, requestId }) => {
  const row = await expectRevision(deps, actor, params);
  expectAbility(await viewRevision(deps, actor, row), {
    ability: 'checkAgain',
    states: actor.kind === 'agency' ? ['submitted', 'in review'] : ['draft'],
    done: 'checked again',
  });
  await expectSeen(deps, actor, row, version);
  await check(deps, { actor, requestId, row, version });
  return viewCheck(deps, actor, await expectRevision(deps, actor, params));
});

export const proveSealRoute = route(proveSeal, async ({ deps, params, actor }) => {
  const { revision } = await expectRevision(deps, actor, params);
  const proof = await prove(deps.db, actor, revision.id);
  if (proof !== null) return proof;
  throw new Problem('wrong-state', { detail: `Revision ${revision.number} has no check yet.` });
});
