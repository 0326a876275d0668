import { createHash } from 'node:crypto';
import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { findings } from '#server/db/schema/checks';
import { files } from '#server/db/schema/files';
import { audit } from '#server/db/schema/people';
import { readings, replacedWorkbooks, revisions, submittals } from '#server/db/schema/submittals';
import { jobs } from '#server/db/schema/work';
import { demoProjectId, demoSectionId } from '#server/db/seed/seed-projects';
import { rawXlsx, sheetData, withDeclaredSize } from '#tests/workbooks/raw-xlsx';
import {
  aDraft,
  type DemoWorld,
  expectStatus,
  pathOf,
  revisionAt,
  startDemoWorld,
  upload,
} from './harness/demo-world';

let world: DemoWorld;

beforeAll(async () => {
  world = await startDemoWorld();
}, 120_000);
afterAll(() => world.close());

const plain = () => rawXlsx({ sheets: [{ name: 'A', xml: sheetData([['x', 1]]) }] });

describe('a workbook that is uploaded', () => {
  it('stands with its bytes, its draft and its job at once, and is explained when the job has run', async () => {
    const dele = await world.as('Dele Fairweather');
    const bytes = await world.workbook('BW-125-S4 r0.xlsx');
    const { woken } = world;
    const before = woken.jobs;
    const answered = expectStatus(await upload(world, dele, { mixDesignation: 'UP-1' }), 202).body;
    expect(answered).toMatchObject({ state: 'draft', number: 0, hasCheck: false, job: { state: 'waiting' } });
    expect(woken.jobs).toBe(before + 1);
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    expect(answered.workbook).toMatchObject({ fileName: 'BW-125-S4 r0.xlsx', sha256, bytes: bytes.length });
    await world.work();
    const draft = await revisionAt(dele, answered.submittalId);
    expect(draft).toMatchObject({
      hasCheck: true,
      doubts: 0,
      job: { state: 'done', problem: null },
      description: '12.5 mm dense-graded surface course · PG 64-22 · 12 million ESAL',
    });
    const { body: check } = await dele.get(`${pathOf(draft)}/check`).expect(200);
    expect(check).toMatchObject({ kind: 'pre-check', submittedOn: '2026-03-09', stale: null });
    const [revision] = await world.deps.db
      .select()
      .from(revisions)
      .where(eq(revisions.submittalId, draft.submittalId));
    const rows = await world.deps.db
      .select()
      .from(findings)
      .where(eq(findings.revisionId, revision?.id ?? ''));
    expect(rows).toHaveLength(check.findings.length);
    const read = await world.deps.db
      .select()
      .from(readings)
      .where(eq(readings.revisionId, revision?.id ?? ''));
    expect(read.length).toBeGreaterThan(100);
    const [entry] = await world.deps.db
      .select()
      .from(audit)
      .where(eq(audit.subjectId, revision?.id ?? ''));
    expect(entry?.act).toBe('submittal uploaded');
  });

  it('comes back byte for byte', async () => {
    const dele = await world.as('Dele Fairweather');
    const name = 'Mélange № 7 "r0".xlsx';
    const bytes = await plain();
    const { body } = expectStatus(await upload(world, dele, { workbook: { name, bytes } }), 202);
    expect(body.workbook.fileName).toBe(name);
    const answer = await dele
      .get(`${pathOf(body)}/workbook`)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      })
      .expect(200);
    expect((answer.body as Buffer).equals(bytes)).toBe(true);
    expect(answer.get('Content-Disposition')).toContain(encodeURIComponent(name));
    await world.work();
  });

  it('keeps a name alone of a path, however it is spelt', async () => {
    const dele = await world.as('Dele Fairweather');
    const workbook = { name: 'C:\\labs\\mix.xlsx', bytes: await plain() };
    const { body } = expectStatus(await upload(world, dele, { workbook }), 202);
    expect(body.workbook.fileName).toBe('mix.xlsx');
    await world.work();
  });

  it('is one submittal for one idempotency key, however often it is sent', async () => {
    const dele = await world.as('Dele Fairweather');
    const once = await plain();
    const twice = await Promise.all(
      [0, 1].map(async () =>
        dele
          .post('/api/submittals')
          .set('Idempotency-Key', 'one-key-for-both')
          .field('projectId', demoProjectId('CV-2034'))
          .field('sectionId', demoSectionId('CV-2034'))
          .field('laboratoryId', await laboratoryOf('Dele Fairweather'))
          .field('mixDesignation', 'UP-ONCE')
          .attach('workbook', once, 'once.xlsx'),
      ),
    );
    expect(twice.map(({ status }) => status)).toContain(202);
    const rows = await world.deps.db
      .select()
      .from(submittals)
      .where(eq(submittals.mixDesignation, 'UP-ONCE'));
    expect(rows).toHaveLength(1);
    const third = await upload(world, dele, {
      mixDesignation: 'UP-ONCE',
      workbook: { name: 'o.xlsx', bytes: once },
    });
    expect(third.status).toBe(409);
    await world.work();
  });

  it('has a designation of its own among a contractor’s open submittals of one project', async () => {
    const [dele, bram] = [await world.as('Dele Fairweather'), await world.as('Bram Ostler')];
    const workbook = { name: 'a.xlsx', bytes: await plain() };
    expectStatus(await upload(world, dele, { mixDesignation: 'UP-2', workbook }), 202);
    const again = expectStatus(await upload(world, dele, { mixDesignation: 'up-2', workbook }), 409);
    expect(again.body.type).toBe('/problems/already-exists');
    expectStatus(await upload(world, dele, { mixDesignation: 'UP-2', project: 'CV-2031', workbook }), 202);
    expectStatus(await upload(world, bram, { mixDesignation: 'UP-2', workbook }), 202);
    await world.work();
  });
});

async function laboratoryOf(name: string): Promise<string> {
  const { body } = await (await world.as(name)).get('/api/session').expect(200);
  return world.laboratoryOf(body.active.organisationId);
}

describe('who uploads', () => {
  it.each([
    ['Gil Ansah', 403],
    ['Sorcha Lund', 202],
    ['Ines Tordoff', 403],
    ['Edda Marsh', 403],
  ])('%s is answered with %s', async (name, status) => {
    const person = await world.as(name);
    const workbook = { name: 'a.xlsx', bytes: await plain() };
    expect((await upload(world, person, { workbook })).status).toBe(status);
    await world.work();
  });

  it('names project, section and laboratory of its own, with every fault pointed out alike', async () => {
    const dele = await world.as('Dele Fairweather');
    const send = (fields: Record<string, string>) => {
      const sending = dele.post('/api/submittals');
      for (const [name, value] of Object.entries(fields)) sending.field(name, value);
      return sending.attach('workbook', Buffer.from('x'), 'x.xlsx');
    };
    const nobodys = '0197a0a0-0000-7000-8000-00000000dead';
    const good = {
      projectId: demoProjectId('CV-2034'),
      sectionId: demoSectionId('CV-2034'),
      laboratoryId: await laboratoryOf('Dele Fairweather'),
      mixDesignation: 'UP-3',
    };
    const foreign = await send({ ...good, projectId: demoProjectId('CV-2027') });
    const absent = await send({ ...good, projectId: nobodys });
    expect(foreign.status).toBe(422);
    expect(foreign.body.errors).toEqual(absent.body.errors);
    const otherLaboratory = await send({ ...good, laboratoryId: await laboratoryOf('Bram Ostler') });
    expect(otherLaboratory.body.errors[0].pointer).toBe('/laboratoryId');
    const otherSection = await send({ ...good, sectionId: demoSectionId('CV-2031') });
    expect(otherSection.body.errors[0].pointer).toBe('/sectionId');
    const blank = await send({ ...good, mixDesignation: '   ' });
    expect(blank.body.errors).toEqual([{ pointer: '/mixDesignation', detail: 'Enter the mix designation.' }]);
    const missing = await dele.post('/api/submittals').field('mixDesignation', 'UP-3');
    expect(missing.body.errors.map(({ pointer }: { pointer: string }) => pointer).sort()).toEqual([
      '/laboratoryId',
      '/projectId',
      '/sectionId',
    ]);
    const noFile = dele.post('/api/submittals');
    for (const [name, value] of Object.entries(good)) noFile.field(name, value);
    expect((await noFile).body.errors[0].pointer).toBe('/workbook');
  });
});

describe('a file that cannot be used', () => {
  const ole = Buffer.concat([Buffer.from('d0cf11e0a1b11ae1', 'hex'), Buffer.alloc(2048)]);
  const attacks: [string, string, () => Promise<Buffer> | Buffer, RegExp][] = [
    ['an old .xls under a new name', 'old.xlsx', () => ole, /old \.xls format/],
    [
      'a workbook locked with a password',
      'locked.xlsx',
      () => Buffer.concat([ole, Buffer.from('EncryptedPackage', 'utf16le'), Buffer.alloc(512)]),
      /locked with a password/,
    ],
    ['a workbook whose name allows macros', 'mix.xlsm', plain, /macros/],
    [
      'macros inside a .xlsx',
      'macro.xlsx',
      () =>
        rawXlsx({ sheets: [{ name: 'A', xml: '<sheetData/>' }], extraParts: { 'xl/vbaProject.bin': 'x' } }),
      /carries macros/,
    ],
    ['text that calls itself .xlsx', 'text.xlsx', () => Buffer.from('a;b\n1;2'), /text\.xlsx/],
    [
      'a bomb',
      'bomb.xlsx',
      async () => withDeclaredSize(await plain(), 'xl/worksheets/sheet1.xml', 2_000_000_000),
      /bomb\.xlsx/,
    ],
    [
      'a zip that lies about its sizes',
      'lying.xlsx',
      async () => withDeclaredSize(await plain(), 'xl/worksheets/sheet1.xml', 5),
      /lying\.xlsx/,
    ],
    ['a file that was cut off', 'cut.xlsx', async () => (await plain()).subarray(0, 400), /cut\.xlsx/],
    ['an empty file', 'empty.xlsx', () => Buffer.alloc(0), /empty/],
  ];

  it.each(attacks)(
    '%s fails its job with place and remedy, and nothing is lost',
    async (_what, name, make, words) => {
      const dele = await world.as('Dele Fairweather');
      const bytes = await make();
      const { body } = expectStatus(await upload(world, dele, { workbook: { name, bytes } }), 202);
      await world.work();
      const draft = await revisionAt(dele, body.submittalId);
      expect(draft).toMatchObject({ state: 'draft', hasCheck: false, job: { state: 'failed' } });
      expect(draft.job.problem.detail).toMatch(words);
      expect(draft.job.problem.fix).not.toBe('');
      const [kept] = await world.deps.db.select().from(files).where(eq(files.sha256, draft.workbook.sha256));
      expect(kept?.bytes.equals(bytes)).toBe(true);
      expect(draft.abilities).toMatchObject({ replaceWorkbook: true, submit: false, answer: false });
    },
    60_000,
  );

  it('in a layout of its own is read by what its headings say', async () => {
    const dele = await world.as('Dele Fairweather');
    const rows = [
      ['Property', 'Trial A', 'Trial B', 'Limit'],
      ['Maximum specific gravity, Gmm', 2.512, 2.494, null],
      ['Air voids, %', 5.6, 4.4, 4],
    ];
    const bytes = await rawXlsx({ sheets: [{ name: 'Volumetrics', xml: sheetData(rows) }] });
    const { body } = expectStatus(await upload(world, dele, { workbook: { name: 'ours.xlsx', bytes } }), 202);
    await world.work();
    const draft = await revisionAt(dele, body.submittalId);
    expect(draft).toMatchObject({ hasCheck: true, doubts: 0, job: { state: 'done', problem: null } });
    const kept = await world.deps.db
      .select({ quantity: readings.quantity, value: readings.value })
      .from(readings)
      .innerJoin(revisions, eq(revisions.id, readings.revisionId))
      .where(eq(revisions.submittalId, draft.submittalId));
    expect(kept.map(({ quantity, value }) => `${quantity} ${Number(value)}`).toSorted()).toEqual([
      'air-voids 4.4',
      'air-voids 5.6',
      'maximum-specific-gravity 2.494',
      'maximum-specific-gravity 2.512',
    ]);
  });

  it('larger than the cap is refused before it is kept', async () => {
    const dele = await world.as('Dele Fairweather');
    const workbook = { name: 'large.xlsx', bytes: Buffer.alloc(25 * 1024 * 1024 + 1) };
    const answer = await upload(world, dele, { mixDesignation: 'UP-LARGE', workbook });
    expect(answer.status).toBe(413);
    const rows = await world.deps.db
      .select()
      .from(submittals)
      .where(eq(submittals.mixDesignation, 'UP-LARGE'));
    expect(rows).toEqual([]);
  });
});

describe('another workbook for a draft', () => {
  it('takes the place of the first, which stays with the contractor', async () => {
    const dele = await world.as('Dele Fairweather');
    const draft = await aDraft(world, dele, { mixDesignation: 'UP-5' });
    const bytes = await world.workbook('BW-125-S4 r1.xlsx');
    const send = () =>
      dele
        .put(`${pathOf(draft)}/workbook`)
        .set('If-Match', `"${draft.version}"`)
        .set('Idempotency-Key', 'key-of-the-other-workbook')
        .attach('workbook', bytes, 'BW-125-S4 r1.xlsx');
    const replaced = await send();
    // Sent again after a lost answer: the same act, not a refusal and not a second replacement.
    expect(expectStatus(await send(), 202).text).toBe(replaced.text);
    expect(expectStatus(replaced, 202).body).toMatchObject({ number: 0, state: 'draft', hasCheck: false });
    await world.work();
    const now = await revisionAt(dele, draft.submittalId);
    expect(now).toMatchObject({ hasCheck: true, workbook: { fileName: 'BW-125-S4 r1.xlsx' } });
    const kept = await world.deps.db
      .select({ sha256: files.sha256, contractorId: replacedWorkbooks.contractorId })
      .from(replacedWorkbooks)
      .innerJoin(files, eq(files.id, replacedWorkbooks.fileId))
      .innerJoin(revisions, eq(revisions.id, replacedWorkbooks.revisionId))
      .where(eq(revisions.submittalId, draft.submittalId));
    expect(kept).toEqual([{ sha256: draft.workbook.sha256, contractorId: draft.contractor.id }]);
    expect(now.replacedWorkbooks).toMatchObject([
      { fileName: 'BW-125-S4 r0.xlsx', replacedBy: 'Dele Fairweather' },
    ]);
    const first = await dele
      .get(`${pathOf(draft)}/replaced-workbooks/${now.replacedWorkbooks[0].id}`)
      .responseType('blob')
      .expect(200);
    expect(createHash('sha256').update(first.body).digest('hex')).toBe(draft.workbook.sha256);
    expect(first.get('Content-Disposition')).toContain('BW-125-S4 r0.xlsx');
  });

  it('is refused where somebody else has changed the draft since, with the present state', async () => {
    const dele = await world.as('Dele Fairweather');
    const draft = await aDraft(world, dele, { workbook: { name: 'a.xlsx', bytes: await plain() } });
    const send = () =>
      dele
        .put(`${pathOf(draft)}/workbook`)
        .set('If-Match', `"${draft.version}"`)
        .attach('workbook', Buffer.from('x'), 'b.xlsx');
    expectStatus(await send(), 202);
    const stale = expectStatus(await send(), 412);
    expect(stale.body.present.workbook.fileName).toBe('b.xlsx');
    await world.work();
  });
});

describe('the reading of a workbook', () => {
  it('is cancelled by those who upload, and by nobody else', async () => {
    const [dele, gil, bram] = await Promise.all(
      ['Dele Fairweather', 'Gil Ansah', 'Bram Ostler'].map(world.as),
    );
    const { body } = expectStatus(
      await upload(world, dele!, { workbook: { name: 'a.xlsx', bytes: await plain() } }),
      202,
    );
    const cancel = `/api/jobs/${body.job.id}/cancellation`;
    const seen = `"${body.job.version}"`;
    expect((await bram!.post(cancel).set('If-Match', seen).send()).status).toBe(404);
    expect((await gil!.post(cancel).set('If-Match', seen).send()).status).toBe(403);
    const { body: job } = expectStatus(await dele!.post(cancel).set('If-Match', seen).send(), 200);
    expect(job.state).toBe('cancelled');
    const stale = expectStatus(await dele!.post(cancel).set('If-Match', seen).send(), 412);
    expect(stale.body.present).toEqual(job);
    await world.work();
    expect(await revisionAt(dele!, body.submittalId)).toMatchObject({
      hasCheck: false,
      job: { state: 'cancelled' },
      abilities: { replaceWorkbook: true },
    });
    const open = await world.deps.db
      .select()
      .from(jobs)
      .where(and(eq(jobs.id, body.job.id), eq(jobs.state, 'waiting')));
    expect(open).toEqual([]);
  });
});
