import { describe, expect, it } from 'vitest';
import { loader as reading } from '../../../web/features/reading/reading-route';
import { loader as returned } from '../../../web/features/return/return-route';
import { loader as workbook } from '../../../web/features/upload/workbook-route';
import { readRevisionParams } from '../../../web/lib/revision-params';

const submittalId = '0192f0a0-0000-7000-8000-000000000001';
const malformed = [
  ['no number', { submittalId, number: 'one' }],
  ['a number with a fraction', { submittalId, number: '1.5' }],
  ['no submittal', { submittalId: 'nothing', number: '1' }],
] as const;

describe('the address of a revision', () => {
  it('names a submittal and a number', () => {
    expect(readRevisionParams({ submittalId, number: '0' })).toEqual({ submittalId, number: 0 });
  });

  it.each(malformed)('with %s is a page that is not there', (_, params) => {
    expect(() => readRevisionParams(params)).toThrow(expect.objectContaining({ status: 404 }));
  });

  it.each([
    ['reading', reading],
    ['return', returned],
    ['workbook', workbook],
  ])('is read alike on the %s page', async (_, loader) => {
    const request = new Request('http://localhost/');
    const params = { submittalId, number: 'one' };
    await expect(
      loader({ request, params, context: {}, url: new URL(request.url), pattern: '' } as never),
    ).rejects.toMatchObject({ status: 404 });
  });
});
