import { describe, expect, it } from 'vitest';
import { clauseParts, sectionOfClause } from '#shared/format/clause';
import { findByFragment, findingFragment, slug } from '#shared/format/finding-key';
import { gaugeText, marginText, observedText } from '#shared/format/margin';
import { sectionWords } from '#shared/format/section-words';
import { shortHash } from '#shared/format/short-hash';
import { splitSymbols, symbolParts } from '#shared/format/symbols';
import { formatBytes, unitWord, withUnit } from '#shared/format/units';
import { aFinding } from '#tests/builders/a-finding';

describe('a section', () => {
  const base = { title: 'Section 412', edition: '2026' };

  it('is its edition, then its layers in their order', () => {
    expect(sectionWords({ base, layers: [] })).toBe('Section 412, edition 2026');
    const layers = [{ title: 'Supplement S-07' }, { title: 'Special provision 3' }];
    expect(sectionWords({ base, layers })).toBe(
      'Section 412, edition 2026, with Supplement S-07 and Special provision 3',
    );
  });
});

describe('a hash', () => {
  it('is short enough to compare by eye, without the name of its method', () => {
    const hash = `7f3a91c0${'0'.repeat(52)}5be2`;
    expect(shortHash(hash)).toBe('7f3a 91c0 … 5be2');
    expect(shortHash(`sha256:${hash}`)).toBe('7f3a 91c0 … 5be2');
  });
});

describe('units', () => {
  it('stand after their number with a space; a ratio has none', () => {
    expect(withUnit('5.6', '%')).toBe('5.6 %');
    expect(withUnit('1000', 's')).toBe('1,000 s');
    expect(withUnit('1.3', '1')).toBe('1.3');
    expect(unitWord('1')).toBe('');
  });

  it('give the size of a file in the words of its reader', () => {
    expect(formatBytes(512)).toBe('512 bytes');
    expect(formatBytes(184_000)).toBe('184 kB');
    expect(formatBytes(1_240_000)).toBe('1.2 MB');
  });
});

describe('trade symbols', () => {
  it('have an upright subscript, acronyms none', () => {
    expect(symbolParts('Pbe')).toEqual({ base: 'P', sub: 'be' });
    expect(symbolParts('Gmm')).toEqual({ base: 'G', sub: 'mm' });
    expect(symbolParts('P0.075')).toEqual({ base: 'P', sub: '0.075' });
    expect(symbolParts('VMA')).toEqual({ base: 'VMA', sub: '' });
    expect(symbolParts('t')).toEqual({ base: 't', sub: '' });
  });

  it('are found in a sentence without touching its words', () => {
    expect(splitSymbols('bring Pbe up; Pbest stays')).toEqual([
      { kind: 'text', text: 'bring ' },
      { kind: 'symbol', base: 'P', sub: 'be' },
      { kind: 'text', text: ' up; Pbest stays' },
    ]);
  });
});

describe('clauses and addresses', () => {
  it('hang the letter from its section', () => {
    expect(clauseParts('412.03(d)')).toEqual({ section: '412.03', letter: '(d)' });
    expect(clauseParts('412')).toEqual({ section: '412', letter: '' });
    expect(sectionOfClause(null)).toBeNull();
  });

  it('name a finding by rule and subject', () => {
    expect(findingFragment({ rule: 'control-points', subject: '12.5 mm' })).toBe('control-points~12.5-mm');
    expect(slug('consistency/Reported value')).toBe('consistency-reported-value');
  });

  it('lead from a clause to its first finding, and from nothing nowhere', () => {
    const first = aFinding({ subject: 'stockpile A' });
    const second = aFinding({ subject: 'stockpile B' });
    expect(findByFragment([first, second], '#412.03(b)')).toBe(first);
    expect(findByFragment([first, second], '#412.03%28b%29')).toBe(first);
    expect(findByFragment([first, second], '#vma~stockpile-b')).toBe(second);
    expect(findByFragment([first, second], '')).toBeNull();
    expect(findByFragment([first, second], '#%')).toBeNull();
  });
});

describe('the margin', () => {
  it('has the decimals of the value that was judged', () => {
    expect(marginText(aFinding())).toBe('−0.1');
    expect(marginText(aFinding({ margin: 0 }))).toBe('0.0');
  });

  it('is empty where the finding has none', () => {
    expect(marginText(aFinding({ outcome: 'not shown', observed: null, margin: null }))).toBe('');
  });

  it('ends the words that stand for the gauge', () => {
    expect(gaugeText(aFinding())).toBe(
      'Voids in the mineral aggregate are 13.9 %, at least 14.0. Margin −0.1.',
    );
  });
});

describe('a value that no rule rounds', () => {
  it('is shown without the idle digits of its calculation', () => {
    expect(observedText({ text: '1.0566037735849056', value: 1.0566037735849056 })).toBe('1.0566');
    expect(observedText({ text: '14.30', value: 14.3 })).toBe('14.30');
    expect(observedText({ text: 'PG 64-22', value: null })).toBe('PG 64-22');
  });
});
