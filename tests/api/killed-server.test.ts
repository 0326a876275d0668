import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { demoLaboratories } from '#server/db/seed/seed-organisations';
import { demoProjectId, demoSectionId } from '#server/db/seed/seed-projects';
import { signInTo } from './harness/instance-client';
import { makeInstance, untilReady } from './harness/launcher';
import { eventually } from './harness/waiting';

const patienceMs = 240_000;
const port = '4187';
const url = `http://127.0.0.1:${port}`;

let instance: ReturnType<typeof makeInstance>;

beforeAll(() => {
  instance = makeInstance();
});

afterAll(() => instance.remove(), patienceMs);

async function start(): Promise<void> {
  const launched = instance.launch('start.mjs', [], { PORT: port });
  await untilReady(launched, patienceMs);
}

/** As a power cut would: the server is gone between two instructions. The launcher then ends by itself. */
async function killServer(): Promise<void> {
  const held = JSON.parse(readFileSync(path.join(instance.directory, 'instance.json'), 'utf8'));
  process.kill(held.serverPid, 'SIGKILL');
  await eventually(() => instance.processes().length === 0, 60_000);
}

it(
  'reads on after the server was killed in the middle of reading a workbook',
  async () => {
    await start();
    const dele = await signInTo(url, 'Dele Fairweather');
    const form = new FormData();
    form.set('projectId', demoProjectId('CV-2034'));
    form.set('sectionId', demoSectionId('CV-2034'));
    form.set('laboratoryId', demoLaboratories.brightwater.id);
    form.set('mixDesignation', 'BW-KILLED');
    const bytes = readFileSync(path.join(instance.directory, 'demo-workbooks', 'BW-125-S4 r0.xlsx'));
    form.set('workbook', new Blob([bytes]), 'BW-125-S4 r0.xlsx');
    const uploaded = await dele.post('/api/submittals', form, { 'Idempotency-Key': 'upload-and-kill' });
    expect(uploaded.status).toBe(202);
    const { submittalId } = await uploaded.json();
    await killServer();

    await start();
    const again = await signInTo(url, 'Dele Fairweather');
    const revision = async () => (await again.get(`/api/submittals/${submittalId}/revisions/0`)).json();
    await eventually(async () => ['done', 'failed'].includes((await revision()).job?.state), 90_000);
    expect(await revision()).toMatchObject({ state: 'draft', hasCheck: true, job: { state: 'done' } });
    const kept = await again.get(`/api/submittals/${submittalId}/revisions/0/workbook`);
    const hash = (content: Buffer) => createHash('sha256').update(content).digest('hex');
    expect(hash(Buffer.from(await kept.arrayBuffer()))).toBe(hash(bytes));
  },
  patienceMs,
);

it(
  'sends a return once, whole, where the server was killed while sending it',
  async () => {
    const before = await signInTo(url, 'Mairi Halloran');
    const queue = await (await before.get('/api/queue')).json();
    const item = queue.items.find(
      (each: { mixDesignation: string; group: string }) =>
        each.mixDesignation === 'BW-125-S4' && each.group !== 'with the contractor',
    );
    const address = `/api/submittals/${item.submittalId}/revisions/${item.revision}`;
    const draft = await (await before.get(`${address}/return`)).json();
    const headers = { 'Idempotency-Key': 'send-and-kill', 'If-Match': `"${draft.version}"` };
    const cutOff = before.post(`${address}/return/sending`, {}, headers).catch(() => null);
    await sleep(250);
    await killServer();
    await cutOff;

    await start();
    const mairi = await signInTo(url, 'Mairi Halloran');
    // Where the first sending had not come to its end, its key is free once its lease has run out.
    let answer = await mairi.post(`${address}/return/sending`, {}, headers);
    while (answer.status === 409) {
      await sleep(2_000);
      answer = await mairi.post(`${address}/return/sending`, {}, headers);
    }
    expect(answer.status, await answer.text()).toBe(200);
    const revision = await (await mairi.get(address)).json();
    expect(revision.state).toBe('returned');
    const sent = await (await mairi.get(`${address}/return`)).json();
    expect(sent.state).toBe('sent');
    const letter = Buffer.from(await (await mairi.get(`${address}/return/letter.pdf`)).arrayBuffer());
    expect(createHash('sha256').update(letter).digest('hex')).toBe(sent.sent.letterSha256);
    const subject = `BW-125-S4 / r${item.revision}`;
    const caught = async () =>
      (await (await mairi.get('/api/caught-mail')).json()).mails.filter(
        (mail: { subject: string; attachments: number }) =>
          mail.subject.includes(subject) && mail.attachments > 0,
      );
    await eventually(async () => (await caught()).length > 0, 150_000);
    expect(await caught()).toHaveLength(1);
  },
  patienceMs,
);
