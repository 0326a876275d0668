import { describe, expect, it } from 'vitest';
import { mayWaive, noteAbilities, writableKinds } from '#server/policies/note-abilities';
import { type NoteFacts, seesNote, seesWaiver } from '#server/policies/note-visibility';

const agency = { organisationId: 'agency', kind: 'agency' } as const;
const contractor = { organisationId: 'contractor', kind: 'contractor' } as const;
const sentAt = new Date(Date.UTC(2026, 2, 10, 12));

const note = (overrides: Partial<NoteFacts>): NoteFacts => ({
  organisationId: 'agency',
  kind: 'internal',
  sentAt: null,
  ...overrides,
});

describe('who sees a note', () => {
  it('keeps internal notes with the writer on both sides, whatever was sent', () => {
    for (const when of [null, sentAt]) {
      expect(seesNote(contractor, note({ sentAt: when }))).toBe(false);
      expect(seesNote(agency, note({ organisationId: 'contractor', sentAt: when }))).toBe(false);
      expect(seesNote(contractor, note({ organisationId: 'contractor', sentAt: when }))).toBe(true);
    }
  });

  it('shows a note to be returned and a reply once it is sent, never before', () => {
    expect(seesNote(contractor, note({ kind: 'to be returned' }))).toBe(false);
    expect(seesNote(contractor, note({ kind: 'to be returned', sentAt }))).toBe(true);
    const reply = { organisationId: 'contractor', kind: 'reply' } as const;
    expect(seesNote(agency, note(reply))).toBe(false);
    expect(seesNote(agency, note({ ...reply, sentAt }))).toBe(true);
  });
});

describe('who sees a waiver', () => {
  it('shows the contractor only what is to be returned, once sent', () => {
    expect(seesWaiver(contractor, { toBeReturned: true, sentAt: null })).toBe(false);
    expect(seesWaiver(contractor, { toBeReturned: false, sentAt })).toBe(false);
    expect(seesWaiver(contractor, { toBeReturned: true, sentAt })).toBe(true);
    expect(seesWaiver(agency, { toBeReturned: false, sentAt: null })).toBe(true);
  });
});

describe('who writes which kind of note', () => {
  it('lets the agency return notes only while the revision is in its hands', () => {
    const may = { note: true, reply: false };
    expect(writableKinds(agency, 'in review', may)).toEqual(['internal', 'to be returned']);
    expect(writableKinds(agency, 'submitted', may)).toEqual(['internal', 'to be returned']);
    expect(writableKinds(agency, 'returned', may)).toEqual(['internal']);
    expect(writableKinds(agency, 'in review', { note: false, reply: false })).toEqual([]);
  });

  it('lets a contractor write internal notes and replies, as its abilities say', () => {
    expect(writableKinds(contractor, 'draft', { note: true, reply: false })).toEqual(['internal']);
    expect(writableKinds(contractor, 'returned', { note: true, reply: true })).toEqual(['internal', 'reply']);
    expect(writableKinds(contractor, 'returned', { note: false, reply: false })).toEqual([]);
  });
});

describe('who changes a note', () => {
  const may = { note: true, reply: true };
  const me = { personId: 'me', organisationId: 'agency' };
  const own = { writerId: 'me', organisationId: 'agency', kind: 'to be returned', sent: false } as const;

  it('is its writer, until it is sent', () => {
    expect(noteAbilities(me, own, may)).toMatchObject({ change: true, remove: true });
    expect(noteAbilities(me, { ...own, sent: true }, may)).toMatchObject({ change: false, remove: false });
    expect(noteAbilities({ ...me, personId: 'her' }, own, may)).toMatchObject({
      change: false,
      remove: false,
    });
    expect(noteAbilities({ ...me, organisationId: 'other' }, own, may)).toMatchObject({ change: false });
  });

  it('lets the other side reply to what was returned', () => {
    const reader = { personId: 'him', organisationId: 'contractor' };
    expect(noteAbilities(reader, { ...own, sent: true }, may).reply).toBe(true);
    expect(noteAbilities(reader, { ...own, sent: true }, { note: true, reply: false }).reply).toBe(false);
    expect(noteAbilities(me, own, may).reply).toBe(false);
  });
});

it('asks the waiver ability that belongs to the severity', () => {
  const advisoryOnly = { waiveAdvisory: true, waiveRequired: false };
  expect(mayWaive(advisoryOnly, 'advisory')).toBe(true);
  expect(mayWaive(advisoryOnly, 'required')).toBe(false);
});
