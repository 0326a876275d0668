import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoPassword, demoPerson } from '#server/db/seed/demo-people';
import { seedDemo } from '#server/db/seed/seed-demo';
import type { SubmittalListItem } from '#shared/contracts/submittals';
import { type Browser, browser, startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;
let folder: string;

beforeAll(async () => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'clauseway-seed-'));
  test = await startTestApp({ dataDirectory: folder });
  await seedDemo(test.deps);
}, 180_000);

afterAll(async () => {
  await test.close();
  rmSync(folder, { recursive: true, force: true });
});

async function as(name: string): Promise<Browser> {
  const person = browser(test.app);
  const { email } = demoPerson(name);
  await person.post('/api/session').send({ email, password: demoPassword }).expect(200);
  return person;
}

async function standings(name: string) {
  const { body } = await (await as(name)).get('/api/submittals').expect(200);
  return (body.items as SubmittalListItem[])
    .map(({ mixDesignation, project, revision }) =>
      [project.number, mixDesignation, revision.number, revision.state, revision.disposition].join(' '),
    )
    .sort();
}

describe('the submittals of the demo', () => {
  it('show the agency one of each state that it may see', async () => {
    expect(await standings('Ines Tordoff')).toEqual([
      'CV-2022 TA-190-B2 0 in review ',
      'CV-2031 BW-125-S4 1 in review ',
      'CV-2031 KD-095-L1 0 submitted ',
      'CV-2034 KD-095-L1 0 returned approved',
      'CV-2034 TA-190-B2 0 returned revise and resubmit',
    ]);
  });

  it('show each contractor its own, drafts among them', async () => {
    expect(await standings('Dele Fairweather')).toEqual([
      'CV-2031 BW-125-S4 1 in review ',
      'CV-2034 BW-125-S6 0 draft ',
    ]);
    expect(await standings('Bram Ostler')).toEqual([
      'CV-2022 TA-190-B2 0 in review ',
      'CV-2034 TA-190-B2 1 draft ',
    ]);
  });

  it('fill the home of a contractor with what the agency wrote and the last letter', async () => {
    const { body } = await (await as('Dele Fairweather')).get('/api/home').expect(200);
    expect(body.current).toMatchObject({ mixDesignation: 'BW-125-S6', state: 'draft', canSubmit: true });
    expect(body.fromAgency).toEqual([
      expect.objectContaining({
        mixDesignation: 'BW-125-S4',
        revision: 0,
        clause: '412.03(d)',
        by: 'Ines Tordoff',
      }),
    ]);
    expect(body.lastLetter).toMatchObject({ revision: 0, workbook: true });
    expect(body.submittals).toHaveLength(2);
  });

  it('put one that nobody took, two with Ines Tordoff and one with a contractor into the queue', async () => {
    const { body } = await (await as('Ines Tordoff')).get('/api/queue').expect(200);
    expect(body.counts).toMatchObject({ everyone: 3, mine: 2, notTaken: 1, withContractors: 1, late: 0 });
  });

  it('have a draft with doubts and a revision in review that moved', async () => {
    const dele = await as('Dele Fairweather');
    const { body } = await dele.get('/api/submittals').expect(200);
    const item = (designation: string) =>
      (body.items as SubmittalListItem[]).find(({ mixDesignation }) => mixDesignation === designation);
    expect(item('BW-125-S6')?.doubts).toBeGreaterThanOrEqual(3);
    const second = item('BW-125-S4');
    expect(second?.revision.changes).toMatch(/reading/);
    const { body: check } = await dele.get(`/api/submittals/${second?.id}/revisions/1/check`).expect(200);
    expect(check.moved.map(({ key }: { key: string }) => key)).toContain('dust-proportion~design point');
    expect(check.waivers).toEqual([]);
    expect(check.notes.every(({ kind }: { kind: string }) => kind !== 'internal')).toBe(true);
  });
});
