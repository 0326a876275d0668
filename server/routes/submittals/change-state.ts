import {
  giveBackRevision,
  submitRevision,
  takeRevision,
  withdrawRevision,
} from '#shared/contracts/submittals';
import {
  giveBackRevision as giveBack,
  takeRevision as take,
  withdrawRevision as withdraw,
} from '../../commands/submittals/change-state';
import { submitRevision as submit } from '../../commands/submittals/submit-revision';
import { reviews } from '../../policies/actor';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { expectAbility } from './expect-ability';
import { expectRevision, expectSeen, viewRevision, viewRevisionAt } from './load-revision';

export const submitRevisionRoute = route(
  submitRevision,
  async ({ deps, params, body, version, actor, requestId }) => {
    const row = await expectRevision(deps, actor, params);
    expectAbility(await viewRevision(deps, actor, row), {
      ability: 'submit',
      states: ['draft'],
      done: 'submitted',
    });
    await expectSeen(deps, actor, row, version);
    const { declaration, seal } = body;
    await submit(deps, { actor, requestId, row, version, declaration, seal });
    return viewRevisionAt(deps, actor, params);
  },
);

export const withdrawRevisionRoute = route(
  withdrawRevision,
  async ({ deps, params, body, version, actor, requestId }) => {
    const row = await expectRevision(deps, actor, params);
    expectAbility(await viewRevision(deps, actor, row), {
      ability: 'withdraw',
      states: ['submitted', 'in review'],
      done: 'withdrawn',
    });
    await expectSeen(deps, actor, row, version);
    await withdraw(deps, { actor, requestId, row, reason: body.reason });
    return viewRevisionAt(deps, actor, params);
  },
);

export const takeRevisionRoute = route(takeRevision, async ({ deps, params, version, actor, requestId }) => {
  const row = await expectRevision(deps, actor, params);
  if (!reviews(actor)) throw new Problem('not-allowed');
  // Who holds it says more than that it has changed.
  const taken = row.revision.state === 'in review' && row.revision.takenById !== actor.personId;
  if (!taken) await expectSeen(deps, actor, row, version);
  await take(deps, { actor, requestId, row });
  return viewRevisionAt(deps, actor, params);
});

export const giveBackRevisionRoute = route(
  giveBackRevision,
  async ({ deps, params, version, actor, requestId }) => {
    const row = await expectRevision(deps, actor, params);
    expectAbility(await viewRevision(deps, actor, row), {
      ability: 'giveBack',
      states: ['in review'],
      done: 'given back',
    });
    await expectSeen(deps, actor, row, version);
    await giveBack(deps, { actor, requestId, row });
    return viewRevisionAt(deps, actor, params);
  },
);
