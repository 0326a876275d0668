import { describe, expect, it } from 'vitest';
import { findingKey } from '#rules/engine/finding';
import { includedAtFirst, returnItems } from '#server/presenters/return-items';
import { aFinding } from '#tests/builders/a-finding';

const fail = aFinding({ rule: 'vma', outcome: 'fail', severity: 'required' });
const borderline = aFinding({ rule: 'faa', outcome: 'pass', borderline: true });
const pass = aFinding({ rule: 'cav', outcome: 'pass', borderline: false });
const missing = aFinding({ rule: 'tsr', outcome: 'not shown', observed: null });
const undecided = aFinding({ rule: 'ct', outcome: 'undecided' });
const none = { waivers: [], notes: [], moved: [], included: new Set<string>() };

describe('what a return carries', () => {
  it('goes in the order put right, send, settle, for information, and leaves out comfortable passes', () => {
    const items = returnItems({ ...none, findings: [borderline, undecided, pass, missing, fail] });
    expect(items.map(({ group }) => group)).toEqual(['put right', 'send', 'settle', 'for information']);
  });

  it('always carries required fails, not shown and undecided', () => {
    const items = returnItems({ ...none, findings: [fail, missing, undecided] });
    expect(items.every(({ included, optional }) => included && !optional)).toBe(true);
  });

  it('lets a borderline pass be left out, and carries it at first', () => {
    expect(returnItems({ ...none, findings: [borderline] })[0]).toMatchObject({
      optional: true,
      included: false,
    });
    expect(includedAtFirst({ ...none, findings: [borderline] })).toEqual([findingKey(borderline)]);
  });

  it('never carries the reason of a waiver that stays internal', () => {
    const waiver = {
      finding: findingKey(fail),
      reason: 'known weak scale',
      toBeReturned: false,
      sentAt: null,
    };
    const [item] = returnItems({ ...none, findings: [fail], waivers: [waiver] });
    expect(item).toMatchObject({ group: 'for information', waived: null, finding: { outcome: 'fail' } });
    expect(JSON.stringify(item)).not.toContain('weak scale');
  });

  it('says the reason of a waiver to be returned, and the outcome stays fail', () => {
    const waiver = {
      finding: findingKey(fail),
      reason: 'methylene blue shows no clay',
      toBeReturned: true,
      sentAt: null,
    };
    const [item] = returnItems({ ...none, findings: [fail], waivers: [waiver] });
    expect(item).toMatchObject({ waived: 'methylene blue shows no clay', finding: { outcome: 'fail' } });
  });

  it('carries a pass that has a note to be returned', () => {
    const items = returnItems({
      ...none,
      findings: [pass],
      notes: [{ finding: findingKey(pass), text: 'Well done.' }],
    });
    expect(items).toMatchObject([
      { group: 'for information', included: true, optional: false, notes: ['Well done.'] },
    ]);
  });
});
