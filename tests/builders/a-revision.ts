import { type Revision, revisionSchema } from '#shared/contracts/submittals';

const edition = { ruleSet: 'cvra-412', edition: '2026', title: 'Section 412' };

export const noAbilities: Revision['abilities'] = {
  answer: false,
  replaceWorkbook: false,
  submit: false,
  withdraw: false,
  startRevision: false,
  revisionNeedsReason: false,
  take: false,
  giveBack: false,
  note: false,
  reply: false,
  waiveAdvisory: false,
  waiveRequired: false,
  prepareReturn: false,
  sendReturn: false,
  checkAgain: false,
  seeReturn: false,
};

/** BW-125-S4 revision 1 in review, seen by somebody who may do nothing. */
export function aRevision(overrides: Partial<Revision> = {}): Revision {
  return revisionSchema.parse({
    submittalId: '0192f0a0-0000-7000-8000-000000000001',
    mixDesignation: 'BW-125-S4',
    number: 1,
    state: 'in review',
    disposition: null,
    version: 3,
    project: {
      id: '0192f0a0-0000-7000-8000-000000000002',
      number: 'CV-2031',
      title: 'Hollin Ridge Road',
      lettingOn: '2026-01-14',
    },
    contractor: { id: '0192f0a0-0000-7000-8000-000000000003', name: 'Brightwater Paving' },
    agency: {
      id: '0192f0a0-0000-7000-8000-000000000004',
      name: 'Carrow Valley Roads Authority',
      timeZone: 'UTC',
    },
    section: {
      id: '0192f0a0-0000-7000-8000-000000000009',
      base: edition,
      layers: [],
      confirmed: true,
      confirmedBy: 'Oona Prescott',
      resolvedHash: 'a'.repeat(64),
      version: 1,
      templateHref: '/api/rule-sets/cvra-412/2026/template.xlsx',
    },
    laboratory: { id: '0192f0a0-0000-7000-8000-000000000005', name: 'Brightwater Central Laboratory' },
    description: '12.5 mm dense-graded surface course',
    revisions: [],
    standingApproval: null,
    reasonForRevision: null,
    workbook: {
      fileName: 'BW-125-S4 r1.xlsx',
      sha256: 'b'.repeat(64),
      bytes: 100_000,
      uploadedBy: 'Dele Fairweather',
      uploadedAt: '2026-03-09T13:00:00.000Z',
    },
    replacedWorkbooks: [],
    mappingName: null,
    reviewer: { id: '0192f0a0-0000-7000-8000-000000000006', name: 'Ines Tordoff' },
    receivedOn: '2026-03-09',
    dueOn: '2026-03-23',
    workingDaysLeft: 7,
    declaration: null,
    job: null,
    doubts: 0,
    hasCheck: true,
    returned: null,
    abilities: noAbilities,
    ...overrides,
  } satisfies Revision);
}
