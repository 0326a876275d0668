import { hash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { digestInScript } from '#rules/engine/digest';
import fc from '#tests/builders/seeded-fast-check';

describe('the hash of a seal', () => {
  it('of "abc" is the one that FIPS 180-4 gives as its example', () => {
    expect(digestInScript('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  });

  it('is the same in script and by the runtime, for any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 300 }), (text) => {
        expect(hash('sha256', text, 'hex')).toBe(digestInScript(text));
      }),
    );
  });
});
