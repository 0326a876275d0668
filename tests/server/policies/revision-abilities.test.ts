import { describe, expect, it } from 'vitest';
import type { Actor } from '#server/policies/actor';
import { type RevisionFacts, revisionAbilities } from '#server/policies/revision-abilities';
import type { OrganisationKind, Role } from '#shared/contracts/roles';
import type { Revision, RevisionState } from '#shared/contracts/submittals';

type Ability = keyof Revision['abilities'];

const person = (kind: OrganisationKind, ...roles: Role[]): Actor => ({
  personId: 'me',
  organisationId: kind,
  kind,
  roles,
});
const qualityManager = person('contractor', 'quality manager');
const laboratory = person('contractor', 'laboratory');
const contractorAdministrator = person('contractor', 'administrator');
const reviewer = person('agency', 'reviewer');
const signingEngineer = person('agency', 'signing engineer');
const ruleAuthor = person('agency', 'rule author');
const agencyLaboratory = person('agency', 'laboratory');
const agencyAdministrator = person('agency', 'administrator');

const revision = (overrides: Partial<RevisionFacts> = {}): RevisionFacts => ({
  state: 'draft',
  number: 0,
  disposition: null,
  reviewerId: null,
  latest: true,
  hasCheck: true,
  reading: false,
  standingApproval: false,
  waiverPolicy: 'advisory',
  ...overrides,
});
const held = (overrides: Partial<RevisionFacts> = {}) =>
  revision({ state: 'in review', reviewerId: 'me', ...overrides });

function allowed(actor: Actor, facts: RevisionFacts): Ability[] {
  return Object.entries(revisionAbilities(actor, facts))
    .filter(([name, may]) => may && name !== 'revisionNeedsReason')
    .map(([name]) => name as Ability)
    .sort();
}

describe('what each role may do in each state', () => {
  const table: [string, Actor, RevisionFacts, Ability[]][] = [
    [
      'quality manager, draft',
      qualityManager,
      revision(),
      ['answer', 'checkAgain', 'note', 'replaceWorkbook', 'submit'],
    ],
    [
      'quality manager, submitted',
      qualityManager,
      revision({ state: 'submitted' }),
      ['note', 'reply', 'withdraw'],
    ],
    [
      'quality manager, in review',
      qualityManager,
      revision({ state: 'in review', reviewerId: 'her' }),
      ['note', 'reply', 'withdraw'],
    ],
    [
      'quality manager, returned',
      qualityManager,
      revision({ state: 'returned', disposition: 'revise and resubmit' }),
      ['note', 'reply', 'seeReturn', 'startRevision'],
    ],
    ['quality manager, withdrawn', qualityManager, revision({ state: 'withdrawn' }), ['note']],
    ['laboratory, draft', laboratory, revision(), ['answer', 'checkAgain', 'note', 'replaceWorkbook']],
    ['laboratory, submitted', laboratory, revision({ state: 'submitted' }), ['note']],
    [
      'laboratory, returned',
      laboratory,
      revision({ state: 'returned', disposition: 'approved' }),
      ['note', 'seeReturn', 'startRevision'],
    ],
    ['contractor administrator, draft', contractorAdministrator, revision(), []],
    ['contractor administrator, submitted', contractorAdministrator, revision({ state: 'submitted' }), []],
    [
      'contractor administrator, returned',
      contractorAdministrator,
      revision({ state: 'returned', disposition: 'approved' }),
      ['seeReturn'],
    ],
    ['reviewer, submitted', reviewer, revision({ state: 'submitted' }), ['checkAgain', 'note', 'take']],
    [
      'reviewer who holds it',
      reviewer,
      held(),
      ['checkAgain', 'giveBack', 'note', 'prepareReturn', 'seeReturn', 'waiveAdvisory'],
    ],
    ['reviewer beside the holder', reviewer, held({ reviewerId: 'her' }), ['checkAgain', 'note']],
    [
      'reviewer, returned',
      reviewer,
      held({ state: 'returned', disposition: 'approved' }),
      ['note', 'seeReturn'],
    ],
    ['reviewer, withdrawn', reviewer, revision({ state: 'withdrawn' }), ['note']],
    [
      'signing engineer, submitted',
      signingEngineer,
      revision({ state: 'submitted' }),
      ['checkAgain', 'note'],
    ],
    [
      'signing engineer, in review',
      signingEngineer,
      held({ reviewerId: 'her' }),
      [
        'checkAgain',
        'giveBack',
        'note',
        'prepareReturn',
        'seeReturn',
        'sendReturn',
        'waiveAdvisory',
        'waiveRequired',
      ],
    ],
    ['rule author, in review', ruleAuthor, held({ reviewerId: 'her' }), []],
    ['agency laboratory, in review', agencyLaboratory, held({ reviewerId: 'her' }), []],
    ['agency administrator, submitted', agencyAdministrator, revision({ state: 'submitted' }), []],
    ['agency administrator, in review', agencyAdministrator, held(), []],
  ];
  it.each(table)('%s', (_name, actor, facts, expected) => {
    expect(allowed(actor, facts)).toEqual([...expected].sort());
  });
});

describe('waivers of a reviewer who holds the revision', () => {
  const table: [RevisionFacts['waiverPolicy'], boolean, boolean][] = [
    ['nothing', false, false],
    ['advisory', true, false],
    ['all', true, true],
  ];
  it.each(table)('with the policy "%s": advisory %s, required %s', (waiverPolicy, advisory, required) => {
    const abilities = revisionAbilities(reviewer, held({ waiverPolicy }));
    expect(abilities.waiveAdvisory).toBe(advisory);
    expect(abilities.waiveRequired).toBe(required);
  });

  it('leave the signing engineer free under every policy', () => {
    const abilities = revisionAbilities(
      signingEngineer,
      held({ waiverPolicy: 'nothing', reviewerId: 'her' }),
    );
    expect(abilities.waiveRequired).toBe(true);
  });
});

describe('the next revision', () => {
  const starts = (overrides: Partial<RevisionFacts>) =>
    revisionAbilities(qualityManager, revision(overrides)).startRevision;
  const states: [RevisionState, boolean][] = [
    ['draft', false],
    ['submitted', false],
    ['in review', false],
    ['returned', true],
    ['withdrawn', false],
  ];
  it.each(states)('after revision 0 that is %s: %s', (state, may) => {
    expect(starts({ state, disposition: state === 'returned' ? 'revise and resubmit' : null })).toBe(may);
  });

  it('never follows a rejected one', () => {
    expect(starts({ state: 'returned', disposition: 'rejected' })).toBe(false);
  });

  it('follows a withdrawn revision 1, because what stood before it still stands', () => {
    expect(starts({ state: 'withdrawn', number: 1 })).toBe(true);
  });

  it('follows only the latest', () => {
    expect(starts({ state: 'returned', disposition: 'revise and resubmit', latest: false })).toBe(false);
  });

  it('needs a reason after an approval', () => {
    const facts = revision({ state: 'returned', disposition: 'approved', standingApproval: true });
    expect(revisionAbilities(laboratory, facts).revisionNeedsReason).toBe(true);
  });
});

it('holds back submission and answers while the workbook is read, and without a check', () => {
  expect(allowed(qualityManager, revision({ reading: true }))).toEqual(['note', 'replaceWorkbook']);
  expect(allowed(qualityManager, revision({ hasCheck: false }))).toEqual(['note', 'replaceWorkbook']);
});

it('lets one person with several roles do what each of them may', () => {
  const both = person('agency', 'reviewer', 'signing engineer');
  expect(allowed(both, revision({ state: 'submitted' }))).toEqual(['checkAgain', 'note', 'take']);
  expect(allowed(both, held())).toContain('sendReturn');
});
