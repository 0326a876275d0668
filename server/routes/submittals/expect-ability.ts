import type { Revision } from '#shared/contracts/submittals';
import { Problem } from '../../problem';

type Ability = keyof Revision['abilities'];

interface Needed {
  ability: Ability;
  /** States in which somebody with the right role could do it; in others the state is the reason. */
  states: Revision['state'][];
  /** "submitted" */
  done: string;
}

/** Says whether it is the role or the present state that forbids an act. */
export function expectAbility(revision: Revision, { ability, states, done }: Needed): void {
  if (revision.abilities[ability]) return;
  if (!states.includes(revision.state)) {
    throw new Problem('wrong-state', {
      detail: `Revision ${revision.number} is ${revision.state}, so it cannot be ${done}.`,
    });
  }
  if (
    revision.state === 'draft' &&
    (revision.job?.state === 'running' || revision.job?.state === 'waiting')
  ) {
    throw new Problem('wrong-state', {
      detail: 'The workbook is still being read.',
      fix: 'Wait until it is read, or cancel the reading.',
    });
  }
  if (revision.state === 'draft' && !revision.hasCheck && (ability === 'submit' || ability === 'answer')) {
    throw new Problem('wrong-state', {
      detail: 'The workbook has not been read.',
      fix: 'Upload a workbook that can be read.',
    });
  }
  throw new Problem('not-allowed');
}
