import { afterAll, describe, expect, it, vi } from 'vitest';
import { createWorkbookPool } from '#server/workbook/pool';
import { rawXlsx, sheetData, withDeclaredSize } from '#tests/workbooks/raw-xlsx';

const pool = createWorkbookPool({ threads: 1 });
afterAll(() => pool.close());

const plain = () => rawXlsx({ sheets: ['A', 'B'].map((name) => ({ name, xml: sheetData([[1]]) })) });

describe('the pool that decodes workbooks', () => {
  it('decodes off the main thread and reports sheets as they are done', async () => {
    const seen: string[] = [];
    const onProgress = (done: number, total: number) => seen.push(`${done}/${total}`);
    const result = await pool.decode({ bytes: await plain(), fileName: 'mix.xlsx', onProgress });
    expect(result).toMatchObject({ ok: true, kind: 'xlsx' });
    // Progress comes over a channel of its own and may arrive after the result.
    await vi.waitFor(() => expect(seen.at(-1)).toBe('2/2'));
  }, 30_000);

  it('stays usable after hostile files', async () => {
    const lying = withDeclaredSize(await plain(), 'xl/worksheets/sheet1.xml', 5);
    const hostile: [Buffer, string][] = [
      [Buffer.from('d0cf11e0a1b11ae1', 'hex'), 'old.xlsx'],
      [lying, 'lying.xlsx'],
      [(await plain()).subarray(0, 300), 'short.xlsx'],
    ];
    for (const [bytes, fileName] of hostile) {
      expect(await pool.decode({ bytes, fileName })).toMatchObject({ ok: false });
    }
    expect(await pool.decode({ bytes: await plain(), fileName: 'mix.xlsx' })).toMatchObject({ ok: true });
  }, 30_000);

  it('gives up on a file that takes too much memory, and goes on with the next', async () => {
    const small = createWorkbookPool({ threads: 1, memoryLimitMegabytes: 32 });
    const strings = Array.from(
      { length: 700_000 },
      (_, at) => `<si><t>text number ${at} of very many in one and the same workbook</t></si>`,
    );
    const heavy = await rawXlsx({
      sheets: [{ name: 'A', xml: sheetData([[1]]) }],
      sharedStrings: strings.join(''),
    });
    try {
      const result = await small.decode({ bytes: heavy, fileName: 'heavy.xlsx' });
      expect(result).toMatchObject({ ok: false, problem: { slug: 'too-large' } });
      expect(await small.decode({ bytes: await plain(), fileName: 'mix.xlsx' })).toMatchObject({ ok: true });
    } finally {
      await small.close();
    }
  }, 60_000);

  it('stops a file that takes too long', async () => {
    const hasty = createWorkbookPool({ threads: 1, timeLimitSeconds: 0.001 });
    try {
      const result = await hasty.decode({ bytes: await plain(), fileName: 'slow.xlsx' });
      expect(result).toMatchObject({
        ok: false,
        problem: { detail: expect.stringMatching(/within 0.001 seconds/) },
      });
    } finally {
      await hasty.close();
    }
  }, 30_000);

  it('is cancelled by its caller', async () => {
    const controller = new AbortController();
    const decoding = pool.decode({ bytes: await plain(), fileName: 'mix.xlsx', signal: controller.signal });
    controller.abort();
    await expect(decoding).rejects.toMatchObject({ name: 'AbortError' });
    expect(await pool.decode({ bytes: await plain(), fileName: 'mix.xlsx' })).toMatchObject({ ok: true });
  }, 30_000);
});
