import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { creepViewSchema } from '#shared/contracts/creep';
import { aSubmitted, type DemoWorld, pathOf, startDemoWorld } from './harness/demo-world';

let world: DemoWorld;
let place: { submittalId: string; number: number };

beforeAll(async () => {
  world = await startDemoWorld();
  place = await aSubmitted(world, { workbook: 'BW-125-S4 r1.xlsx' });
}, 120_000);
afterAll(() => world.close());

describe('the creep tests of a submittal', () => {
  it('come with points, curves and master curve to both sides', async () => {
    for (const name of ['Dele Fairweather', 'Ines Tordoff']) {
      const { body } = await (await world.as(name)).get(`${pathOf(place)}/creep`).expect(200);
      const view = creepViewSchema.parse(body);
      // Three temperatures, and at −10 °C two levels of stress beside all of them together.
      expect(
        view.curves.map(({ temperature, stress, points }) => [temperature, stress, points.length]),
      ).toEqual([
        [-20, 800, 33],
        [-10, null, 44],
        [-10, 200, 11],
        [-10, 400, 33],
        [0, 200, 33],
      ]);
      expect(view.curves[0]?.points[0]?.source).toMatchObject({ sheet: 'Creep' });
      expect(view.master?.shifts).toHaveLength(3);
    }
  });

  it('are announced with the findings', async () => {
    const dele = await world.as('Dele Fairweather');
    const { body } = await dele.get(`${pathOf(place)}/check`).expect(200);
    expect(body.hasCreep).toBe(true);
  });

  it('answer another contractor as if there were none', async () => {
    const bram = await world.as('Bram Ostler');
    const { body } = await bram.get(`${pathOf(place)}/creep`).expect(404);
    const { body: absent } = await bram
      .get('/api/submittals/0197a0a0-0000-7000-8000-00000000dead/revisions/0/creep')
      .expect(404);
    expect({ ...body, instance: '', requestId: '' }).toEqual({ ...absent, instance: '', requestId: '' });
  });
});
