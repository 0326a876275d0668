import { type CheckView, checkViewSchema } from '#shared/contracts/checks';
import type { Note, Waiver } from '#shared/contracts/notes';
import { aFinding } from './a-finding';

/** A sealed check of one failing finding, without notes. */
export function aCheckView(overrides: Partial<CheckView> = {}): CheckView {
  const edition = { ruleSet: 'cvra-412', edition: '2026', title: 'Section 412' };
  return checkViewSchema.parse({
    kind: 'check of record',
    madeAt: '2026-03-09T14:02:00.000Z',
    submittedOn: '2026-03-09',
    seal: {
      seal: `7f3a91c0${'0'.repeat(52)}5be2`,
      record: 'a',
      resolvedEdition: 'b',
      context: 'c',
      engineVersion: 'd',
      engine: 'e',
      findings: 'f',
    },
    section: { base: edition, layers: [], state: 'in force' },
    summary: {
      pass: 0,
      fail: 1,
      notShown: 0,
      undecided: 0,
      notApplicable: 0,
      borderline: 0,
      doesNotAddUp: 0,
      recommended: 'revise and resubmit',
    },
    findings: [aFinding()],
    notes: [],
    waivers: [],
    moved: [],
    stale: null,
    recommendation: 'One required rule fails without a waiver.',
    startingPoint: false,
    clauseTitles: { '412.03': 'Volumetric properties' },
    gradation: null,
    hasCreep: false,
    declaration: null,
    ...overrides,
  });
}

export function aNote(overrides: Partial<Note> = {}): Note {
  return {
    id: '0192f0a0-0000-7000-8000-000000000101',
    finding: 'vma~design point',
    kind: 'to be returned',
    side: 'agency',
    text: 'Please bring the voids up.',
    by: 'I. Tordoff',
    at: '2026-03-12T09:00:00.000Z',
    revision: 1,
    answers: null,
    version: 1,
    abilities: { change: false, remove: false, reply: false },
    ...overrides,
  };
}

export function aWaiver(overrides: Partial<Waiver> = {}): Waiver {
  return {
    id: '0192f0a0-0000-7000-8000-000000000201',
    finding: 'vma~design point',
    reason: 'The difference is within the precision of the method.',
    toBeReturned: true,
    by: 'I. Tordoff',
    at: '2026-03-11T09:00:00.000Z',
    version: 1,
    abilities: { remove: false },
    ...overrides,
  };
}
