import { describe, expect, it } from 'vitest';
import type { Finding } from '#rules/engine/finding';
import { aCheckView, aNote, aWaiver } from '#tests/builders/a-check-view';
import { aFinding } from '#tests/builders/a-finding';
import { foldedPassLine } from '../../../../web/features/findings/lib/folded-line';
import { ledgerGroups, ledgerRows, tallyOf } from '../../../../web/features/findings/lib/ledger';
import { changedOutcomes } from '../../../../web/lib/changed-outcomes';

const rule = (letter: string, overrides: Parameters<typeof aFinding>[0] = {}): Finding =>
  aFinding({
    rule: `rule-${letter}`,
    clause: `412.02(${letter})`,
    title: `Rule ${letter}`,
    outcome: 'pass',
    margin: 1,
    observed: { value: 15, rounded: 15, text: '15', unit: '%', statistic: 'mean', count: 1 },
    ...overrides,
  });
const passes = ['a', 'b', 'c', 'd', 'e'].map((letter) => rule(letter));
const groupsOf = (findings: Finding[], more: object = {}, order: 'clause' | 'what to do' = 'clause') => {
  const check = aCheckView({ findings, clauseTitles: { '412.02': 'Materials' }, ...more });
  return ledgerGroups(ledgerRows(check), order, check.clauseTitles);
};

describe('the ledger in clause order', () => {
  it('hangs rules under their section with its title', () => {
    const [group] = groupsOf([rule('a'), rule('b', { outcome: 'fail' })]);
    expect(group).toMatchObject({ section: '412.02', title: 'Materials', about: '1 fail · 1 pass' });
    expect(group?.rows).toHaveLength(2);
  });

  it('folds five comfortable passes and shows four', () => {
    expect(groupsOf(passes)[0]).toMatchObject({ rows: [], folded: { length: 5 } });
    expect(groupsOf(passes.slice(1))[0]).toMatchObject({ rows: { length: 4 }, folded: [] });
  });

  it('never folds what is borderline, noted or moved', () => {
    const findings = [
      ...passes,
      rule('f', { borderline: true }),
      rule('g', { subject: 'noted' }),
      rule('h', { subject: 'moved' }),
    ];
    const [group] = groupsOf(findings, {
      notes: [aNote({ finding: 'rule-g~noted' })],
      moved: [{ key: 'rule-h~moved', previousOutcome: 'fail', previousText: '13', previousLimit: null }],
    });
    expect(group?.rows.map((row) => row.finding.clause)).toEqual(['412.02(f)', '412.02(g)', '412.02(h)']);
    expect(group?.folded).toHaveLength(5);
  });

  it('puts what does not add up last among the judged, without a clause number', () => {
    const inconsistent = aFinding({ rule: 'consistency/gse', clause: null, title: 'Gse below Gsb' });
    const groups = groupsOf([inconsistent, rule('a'), rule('z', { outcome: 'not applicable' })]);
    expect(groups.map((group) => group.title)).toEqual(['Materials', 'Does not add up', 'Not applicable']);
    expect(groups[1]?.section).toBeNull();
  });

  it('folds away what does not apply', () => {
    const groups = groupsOf([rule('z', { outcome: 'not applicable' })]);
    expect(groups).toHaveLength(1);
    expect(groups[0]).toMatchObject({ rows: [], folded: { length: 1 } });
  });
});

describe('the ledger by what to do', () => {
  it('asks to put right, send, settle, then informs', () => {
    const groups = groupsOf(
      [
        rule('a', { outcome: 'fail' }),
        rule('b', { outcome: 'not shown' }),
        rule('c', { outcome: 'undecided' }),
        rule('d', { outcome: 'fail', subject: 'waived' }),
        rule('e', { borderline: true }),
        rule('f'),
      ],
      { waivers: [aWaiver({ finding: 'rule-d~waived' })] },
      'what to do',
    );
    expect(groups.map((group) => [group.title, group.rows.length])).toEqual([
      ['Put right', 1],
      ['Send', 1],
      ['Settle', 1],
      ['For your information', 2],
      ['Nothing to do', 1],
    ]);
  });
});

describe('the words of a group', () => {
  it('count outcomes in order of weight and say what qualifies them', () => {
    const check = aCheckView({
      findings: [
        rule('a', { outcome: 'fail', subject: 'waived' }),
        rule('b', { outcome: 'not shown' }),
        rule('c', { outcome: 'undecided' }),
        rule('d', { borderline: true }),
        rule('e'),
      ],
      waivers: [aWaiver({ finding: 'rule-a~waived' })],
    });
    expect(tallyOf(ledgerRows(check))).toBe(
      '1 fail, waived · 1 not shown · 1 undecided · 2 pass, 1 of them borderline',
    );
  });

  // Two-sided: 1.0 of 2.5 is 0.40 of the room; one-sided: 1.2 of a span of 1.5 is 0.80.
  it('name the closest of the folded passes in parts of what its gauge shows', () => {
    const closest = rule('c', {
      title: 'Voids filled',
      margin: 1,
      limit: { min: 70, max: 75, unit: '%', decimals: 0 },
      observed: { value: 71, rounded: 71, text: '71', unit: '%', statistic: 'mean', count: 1 },
    });
    const rows = ledgerRows(aCheckView({ findings: [rule('a', { margin: 1.2 }), closest] }));
    expect(foldedPassLine(rows)).toBe('(a) (c) pass with room; the closest is (c), voids filled, +1 %.');
  });

  it('name sieves where one clause has several', () => {
    const sieve = (opening: string, margin: number) =>
      rule('a', { kind: 'gradation', subject: `${opening} mm`, margin });
    const rows = ledgerRows(aCheckView({ findings: [sieve('12.5', 4), sieve('0.075', 1)] }));
    expect(foldedPassLine(rows)).toBe('(a) passes on 12.5 and 0.075 mm; the closest is 0.075 mm, +1 %.');
  });

  it('say after a new check which outcomes are not what they were', () => {
    expect(changedOutcomes([rule('a')], [rule('a', { outcome: 'fail' })])).toBe(
      'Checked again. Changed: one outcome, 412.02(a) fail.',
    );
    expect(changedOutcomes([rule('a')], [rule('a')])).toBe('Checked again. No outcome changed.');
  });
});
