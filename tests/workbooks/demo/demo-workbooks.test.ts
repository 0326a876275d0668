import { beforeAll, describe, expect, it, vi } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import type { CheckResult } from '#rules/engine/finding';
import { readWorkbook } from '#rules/reading/interpret';
import type { Answer, ReadingResult } from '#rules/reading/reading-result';
import { templateMapping } from '#rules/reading/template-mapping';
import { decodeWorkbook } from '#server/workbook/decode';
import { demoDates, demoEdition, demoWorkbooks } from './write-demo-workbooks';

vi.setConfig({ testTimeout: 60_000 });

const edition = demoEdition();
const files = new Map<string, Buffer>();

beforeAll(async () => {
  for (const { name, bytes } of await demoWorkbooks()) files.set(name, bytes);
}, 60_000);

async function read(name: string, answers: Answer[] = []): Promise<ReadingResult> {
  const decoded = await decodeWorkbook(files.get(name) ?? Buffer.alloc(0), name);
  if (!decoded.ok) throw new Error(decoded.problem.detail);
  return readWorkbook({ grid: decoded.grid, mapping: templateMapping(edition), edition, answers });
}

async function check(name: string, answers: Answer[] = []): Promise<CheckResult> {
  const { record } = await read(name, answers);
  return evaluate(record, edition, { ...demoDates, facts: {} });
}

function finding({ findings }: CheckResult, rule: string, subject?: string) {
  const found = findings.find(
    (each) => each.rule === rule && (subject === undefined || each.subject === subject),
  );
  if (!found) throw new Error(`no finding of ${rule}`);
  const { outcome, borderline, observed, margin } = found;
  return { outcome, borderline, rounded: observed?.rounded ?? null, margin };
}

const requiredOpen = ({ findings }: CheckResult) =>
  findings.filter(
    ({ severity, outcome }) => severity === 'required' && outcome !== 'pass' && outcome !== 'not applicable',
  );

describe('reading the demo workbooks', () => {
  // Counted by hand from what each mix writes into the template. KD-095-L1: 6 + 3 scalars and the ratio, 3 × 4 of the
  // stockpiles, 3 × 9 + 9 sieves, trials (2 binder contents beside
  // the design's own, which is the scalar again, 9 × 3 masses, 6 heights, 6 Gmm, 4 reported), 6 + 3 of
  // aggregates, 6 × 4 + 3 of moisture, 2 × 2 + 4 + 5 of performance.
  it('reads every value of KD-095-L1 and leaves nothing over', async () => {
    const { record, doubts, unread } = await read('KD-095-L1 r0.xlsx');
    expect(record.readings).toHaveLength(10 + 12 + 36 + 45 + 9 + 27 + 13);
    expect(record.documents).toHaveLength(6);
    expect(Object.keys(record.attributes)).toHaveLength(8);
    expect([doubts, unread]).toEqual([[], []]);
  });

  it('finds the four doubts of BW-125-S6, each with its alternatives', async () => {
    const { doubts } = await read('BW-125-S6 r0.xlsx');
    expect(doubts.map(({ text, alternatives }) => [text, alternatives.map(({ answer }) => answer)])).toEqual([
      ['03/04/2026', ['2026-04-03', '2026-03-04', 'leave out']],
      ['4721,5', ['4721.5 g', 'leave out']],
      ['2.40*', ['2.4', 'leave out']],
      ['0.721', ['72.1 %', '0.721 %', 'leave out']],
    ]);
  });
});

describe('KD-095-L1, the mix that passes', () => {
  it('leaves no required rule open', async () => {
    expect(requiredOpen(await check('KD-095-L1 r0.xlsx')).map(({ rule }) => rule)).toEqual([]);
  });
});

describe('TA-190-B2, the mix that fails', () => {
  it('fails and shows gaps in several kinds of rules', async () => {
    const result = await check('TA-190-B2 r0.xlsx');
    // Gmb is 2.400, 2.402, 2.402 by its masses: mean 2.4013. Gmm is (2.523 + 2.522)/2 = 2.5225.
    // Va = 100·(2.5225 − 2.4013)/2.5225 = 4.80, over 4.5 by 0.3.
    expect(finding(result, 'air-voids')).toMatchObject({ outcome: 'fail', rounded: 4.8, margin: -0.3 });
    // Gsb = 100/(28/2.665 + 22/2.660 + 35/2.640 + 15/2.645) = 2.6521; VMA = 100 − 2.4013·95.4/2.6521 = 13.62.
    expect(finding(result, 'vma')).toMatchObject({ outcome: 'pass', rounded: 13.6, margin: 0.6 });
    // VFA = 100·(13.62 − 4.80)/13.62 = 64.7, rounds to 65, the limit itself.
    expect(finding(result, 'vfa')).toMatchObject({ outcome: 'pass', rounded: 65, margin: 0 });
    // Gse = 95.4/(100/2.5225 − 4.6/1.03) = 2.7120; Pba = 103·(2.7120 − 2.6521)/(2.7120·2.6521) = 0.858;
    // Pbe = 4.6 − 0.858·0.954 = 3.782; 5.8/3.782 = 1.53, over 1.2 by 0.3.
    expect(finding(result, 'dust-proportion')).toMatchObject({ outcome: 'fail', rounded: 1.5, margin: -0.3 });
    // Vbe = 3.782·2.4013/1.03 = 8.82, under 9.0 by 0.2.
    expect(finding(result, 'effective-binder-volume')).toMatchObject({
      outcome: 'fail',
      rounded: 8.8,
      margin: -0.2,
    });
    expect(finding(result, 'sand-equivalent')).toMatchObject({ outcome: 'fail', rounded: 43, margin: -2 });
    expect(finding(result, 'deleterious-materials', 'stockpile 12.5 mm stone')).toMatchObject({
      outcome: 'fail',
      margin: -0.4,
    });
    expect(finding(result, 'stripping-inflection')).toMatchObject({
      outcome: 'fail',
      rounded: 8600,
      margin: -1400,
    });
    // Two dry specimens where three are asked for; one conditioned specimen is saturated to 82 %, over 80.
    expect(finding(result, 'dry-strength').outcome).toBe('undecided');
    expect(finding(result, 'conditioned-strength').outcome).toBe('undecided');
    expect(finding(result, 'saturation')).toMatchObject({ outcome: 'fail', rounded: 82, margin: -2 });
    expect(finding(result, 'binder-certificate').outcome).toBe('not shown');
    expect(finding(result, 'technician-certificate').outcome).toBe('not shown');
    expect(result.summary.recommended).toBe('revise and resubmit');
  });

  it('is put right in its revision 1', async () => {
    const result = await check('TA-190-B2 r1.xlsx');
    expect(requiredOpen(result).map(({ rule }) => rule)).toEqual([]);
    // Gmb is 2.413, 2.416, 2.414: mean 2.4143; Gmm 2.515; Va = 100·(2.515 − 2.4143)/2.515 = 4.00.
    expect(finding(result, 'air-voids')).toMatchObject({ outcome: 'pass', rounded: 4, margin: 0.5 });
  });
});

describe('BW-125-S4, whose dust proportion does not follow', () => {
  it('is judged by the recomputed value, with the cause named', async () => {
    const result = await check('BW-125-S4 r0.xlsx');
    // Gsb = 100/(25/2.65 + 20/2.645 + 35/2.624 + 20/2.635) = 2.6369; Gse = 94.7/(100/2.486 − 5.3/1.028) = 2.7003;
    // Pba = 102.8·(2.7003 − 2.6369)/(2.7003·2.6369) = 0.916; Pbe = 5.3 − 0.916·0.947 = 4.433; 5.6/4.433 = 1.263.
    expect(finding(result, 'dust-proportion')).toMatchObject({
      outcome: 'fail',
      borderline: true,
      rounded: 1.3,
      margin: -0.1,
    });
    const contradiction = result.findings.find(
      ({ kind, title, severity }) => kind === 'consistency' && severity === 'required' && title !== '',
    );
    expect(contradiction?.sentence).toMatch(/1\.06/);
    expect(contradiction?.outcome).toBe('fail');
  });

  it('agrees with its own readings in revision 1', async () => {
    const result = await check('BW-125-S4 r1.xlsx');
    // 4.4/4.433 = 0.99.
    expect(finding(result, 'dust-proportion')).toMatchObject({ outcome: 'pass', rounded: 1 });
    expect(requiredOpen(result).map(({ rule }) => rule)).toEqual([]);
  });
});

describe('BW-125-S6, the workbook in doubt', () => {
  it('leaves undecided what a doubt can change, and only until it is answered', async () => {
    const open = await check('BW-125-S6 r0.xlsx');
    expect(finding(open, 'vfa').outcome).toBe('undecided');
    const { doubts } = await read('BW-125-S6 r0.xlsx');
    const answers = doubts.map(({ sheet, cell, text, alternatives }) => ({
      sheet,
      cell,
      text,
      answer: alternatives[0]?.answer ?? '',
    }));
    const settled = await check('BW-125-S6 r0.xlsx', answers);
    // VMA = 100 − 2.387·94.7/2.6369 = 14.27, Va 3.98: VFA = 100·(14.27 − 3.98)/14.27 = 72.1.
    expect(finding(settled, 'vfa')).toMatchObject({ outcome: 'pass', rounded: 72 });
    expect(requiredOpen(settled).map(({ rule }) => rule)).toEqual([]);
  });
});

describe('the demo workbooks', () => {
  it('are the same bytes’ content each time, so that the seed is deterministic', async () => {
    const [first] = await demoWorkbooks();
    const again = await decodeWorkbook(first?.bytes ?? Buffer.alloc(0), 'a.xlsx');
    const before = await decodeWorkbook(files.get('KD-095-L1 r0.xlsx') ?? Buffer.alloc(0), 'b.xlsx');
    expect(again).toEqual(before);
  }, 60_000);
});
