import { describe, expect, it } from 'vitest';
import { safeReturnAddress } from '../../../../web/features/sign-in/lib/safe-return-address';

describe('where a sign-in goes on to', () => {
  it('is the page that was asked for', () => {
    expect(safeReturnAddress('/submittals?state=draft')).toBe('/submittals?state=draft');
  });

  it.each([
    '//elsewhere.example',
    'https://elsewhere.example',
    '/\\elsewhere.example',
    'javascript:alert(1)',
    '',
  ])('is never another site: %j', (text) => {
    expect(safeReturnAddress(text)).toBeNull();
  });

  it('is not the sign-in page itself, and nothing where nothing was asked for', () => {
    expect(safeReturnAddress('/sign-in')).toBeNull();
    expect(safeReturnAddress(null)).toBeNull();
  });
});
