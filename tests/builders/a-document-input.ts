import { type DocumentInput, documentInputSchema } from '#server/documents/document-input';
import { nextActOf } from '#shared/next-acts';
import { aFinding } from './a-finding';

const seal = {
  seal: '7f3a91c0'.repeat(8),
  record: 'a'.repeat(64),
  resolvedEdition: 'b'.repeat(64),
  context: 'c'.repeat(64),
  engineVersion: 'd'.repeat(64),
  engine: '1',
  findings: 'e'.repeat(64),
};

/** A return of one failing finding; override what matters. */
export function aDocumentInput(overrides: Partial<DocumentInput> = {}): DocumentInput {
  const findings = overrides.findings ?? [aFinding({ outcome: 'fail' })];
  return documentInputSchema.parse({
    kind: 'return',
    agency: {
      name: 'Carrow Valley Roads Authority',
      letterhead: {
        department: 'Materials and Pavements',
        address: '14 Weir Street, Carrow',
        telephone: '',
        email: 'materials@cvra.example',
        closing: '',
      },
    },
    contractor: 'Brightwater Paving',
    project: { number: 'CV-2031', title: 'Hollin Ridge Road' },
    mixDesignation: 'BW-125-S4',
    mixDescription: '12.5 mm dense-graded surface course',
    revision: 1,
    date: '2026-03-12',
    submittedOn: '2026-03-09',
    section: 'Section 412, edition 2026, with Supplement S-07',
    disposition: 'revise and resubmit',
    reason: 'The mix is close.',
    textAbove: '',
    textBelow: '',
    to: [
      {
        name: 'Dele Fairweather',
        email: 'dele.fairweather@brightwater.example',
        function: 'quality manager',
      },
    ],
    copies: [],
    signedBy: { name: 'Mairi Halloran', function: 'signing engineer' },
    summary: {
      pass: 24,
      fail: 3,
      notShown: 2,
      undecided: 2,
      notApplicable: 6,
      borderline: 2,
      doesNotAddUp: 1,
      recommended: 'revise and resubmit',
    },
    waivedCount: 1,
    items: findings.flatMap((finding) => {
      const group = nextActOf(finding, false);
      return group === null
        ? []
        : [{ group, finding, waivedBecause: null, notes: [], previousText: null, toPass: '' }];
    }),
    generalNotes: [],
    seal,
    checkedOn: '2026-03-09',
    startingPoint: true,
    enclosesWorkbook: true,
    explanations: {},
    room: null,
    creep: null,
    ...overrides,
    findings,
  } satisfies DocumentInput);
}
