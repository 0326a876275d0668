import { describe, expect, it } from 'vitest';
import { linkedText } from '../../../../web/features/caught-mail/lib/linked-text';

describe('the addresses in a mail', () => {
  it('are set apart from the words around them', () => {
    expect(
      linkedText('Open http://127.0.0.1:4000/invitations/abc to accept.').map(({ text, href }) => [
        text,
        href,
      ]),
    ).toEqual([
      ['Open ', null],
      ['http://127.0.0.1:4000/invitations/abc', 'http://127.0.0.1:4000/invitations/abc'],
      [' to accept.', null],
    ]);
  });

  it('end before the full stop of their sentence', () => {
    expect(linkedText('See https://clauseway.example/a.').map(({ text }) => text)).toEqual([
      'See ',
      'https://clauseway.example/a',
      '.',
    ]);
  });

  it('are only web addresses, never a script', () => {
    expect(linkedText('javascript:alert(1)').every(({ href }) => href === null)).toBe(true);
  });
});
