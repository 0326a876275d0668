import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aDraft, aSubmitted, type DemoWorld, pathOf, startDemoWorld } from './harness/demo-world';
import { aSignedIn, makeOrganisation } from './harness/organisations';

let world: DemoWorld;
let submitted: { submittalId: string; number: number };
let draft: { submittalId: string; number: number };

beforeAll(async () => {
  world = await startDemoWorld();
  submitted = await aSubmitted(world, { workbook: 'BW-125-S4 r0.xlsx', takenBy: 'Ines Tordoff' });
  draft = await aDraft(world, await world.as('Dele Fairweather'), { workbook: 'KD-095-L1 r0.xlsx' });
}, 180_000);
afterAll(() => world.close());

describe('the room to move of a revision', () => {
  it('is the same for agency and contractor, in figures and in words', async () => {
    const [ines, dele] = [await world.as('Ines Tordoff'), await world.as('Dele Fairweather')];
    const { body } = await ines.get(`${pathOf(submitted)}/room`).expect(200);
    // Parabolas by numpy over the four trials, computed of the workbook's masses: dust proportion is 1.25, the last to
    // round to 1.2, at 5.3635 %; VFA is 75.5, the first to round to 76, at 5.4990 %.
    expect(body.room.room).toEqual({
      from: 5.37,
      to: 5.49,
      closedBelowBy: ['dust-proportion'],
      closedAboveBy: ['vfa'],
      containsDeclared: false,
    });
    expect(body.room.words.answer).toContain(
      'Dust proportion closes it below, voids filled with asphalt above.',
    );
    expect(body.room.trials.map(({ trial }: { trial: string }) => trial)).toEqual(['A', 'B', 'C', 'D']);
    expect(body.room.trials[0].source.sheet).toBe('Trials');
    expect(body.earlier).toBeNull();
    const { body: own } = await dele.get(`${pathOf(submitted)}/room`).expect(200);
    expect(own).toEqual(body);
  });

  it('stands beside the findings, with what would pass and why each limit', async () => {
    const ines = await world.as('Ines Tordoff');
    const { body } = await ines.get(`${pathOf(submitted)}/check`).expect(200);
    expect(body.hasRoom).toBe(true);
    const dust = body.explanations['dust-proportion~design point'];
    expect(dust.toPass.map(({ words }: { words: string }) => words)).toContain(
      'Pb of 5.37 to 5.49 % instead of 5.30 (the room to move)',
    );
    expect(dust.whyThisLimit).toMatch(/^Design traffic 12 million ESAL, in the row /);
  });

  it('of a draft is the contractor’s alone', async () => {
    const [ines, dele] = [await world.as('Ines Tordoff'), await world.as('Dele Fairweather')];
    const { body } = await dele.get(`${pathOf(draft)}/room`).expect(200);
    expect(body.room.declaredBinderContent).toBe(5.9);
    expect((await ines.get(`${pathOf(draft)}/room`)).status).toBe(404);
  });

  it('answers another tenant as if it were not there', async () => {
    const nowhere = { submittalId: '0197a0a0-0000-7000-8000-00000000dead', number: 0 };
    const agency = await makeOrganisation(world, { name: 'Larkmoor Roads', kind: 'agency' });
    const other = await aSignedIn(world, { organisation: agency, roles: ['reviewer', 'signing engineer'] });
    const tollhouse = await world.as('Bram Ostler');
    for (const person of [other, tollhouse]) {
      const hidden = await person.get(`${pathOf(submitted)}/room`);
      const absent = await person.get(`${pathOf(nowhere)}/room`);
      expect([hidden.status, absent.status]).toEqual([404, 404]);
      const { requestId: _one, instance: _here, ...answer } = hidden.body;
      const { requestId: _other, instance: _there, ...nothing } = absent.body;
      expect(answer).toEqual(nothing);
    }
  });
});
