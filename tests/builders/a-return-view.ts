import { type ReturnItem, type ReturnView, returnViewSchema } from '#shared/contracts/returns';
import { aFinding } from './a-finding';

export function aReturnItem(overrides: Partial<ReturnItem> = {}): ReturnItem {
  return {
    key: 'vma~design point',
    group: 'put right',
    included: true,
    optional: false,
    finding: aFinding(),
    waived: null,
    notes: [],
    previousText: null,
    ...overrides,
  };
}

/** A draft with one finding that the letter has to carry and one that it may, seen by a signing engineer. */
export function aReturnView(overrides: Partial<ReturnView> = {}): ReturnView {
  const borderline = aFinding({
    rule: 'vfa',
    clause: '412.03(c)',
    title: 'Voids filled with asphalt',
    outcome: 'pass',
    borderline: true,
  });
  return returnViewSchema.parse({
    id: '0192f0a0-0000-7000-8000-000000000050',
    state: 'draft',
    version: 7,
    disposition: 'revise and resubmit',
    recommended: 'revise and resubmit',
    recommendation: 'One required finding fails without a waiver.',
    reason: '',
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
    items: [
      aReturnItem(),
      aReturnItem({
        key: 'vfa~design point',
        group: 'for information',
        included: false,
        optional: true,
        finding: borderline,
      }),
    ],
    enclosures: { letter: true, findingsWorkbook: true },
    internalNotes: 4,
    preparedBy: null,
    signingEngineers: [{ id: '0192f0a0-0000-7000-8000-000000000051', name: 'Mairi Halloran' }],
    sent: null,
    savedAt: null,
    abilities: { change: true, makeReady: true, send: true },
    ...overrides,
  } satisfies ReturnView);
}
