import { expect, it } from 'vitest';
import { z } from 'zod';
import { evaluate } from '#rules/engine/evaluate';
import { aReading } from '#tests/builders/a-reading';
import { aContext, aRecord } from '#tests/builders/a-record';
import { anEdition, aRule } from '#tests/builders/a-rule-set';
import records from './design-point-and-strength.json';
import { referenceRecord } from './reference-record';

const number = z.number();
const numbers = z.array(number);

it('finds the range of binder content of the bar chart (MS-2), closed by voids below and by VFA above', () => {
  const { inputs } = referenceRecord(records, 'MAR-07', {
    inputs: z.looseObject({ Pb: numbers, Va: numbers, VMA: numbers }),
    expected: z.unknown(),
  });
  const range = referenceRecord(records, 'MAR-08', {
    inputs: z.looseObject({
      rules: z.object({ Va: z.tuple([number, number]), VMA_min: number, VFA: z.tuple([number, number]) }),
    }),
    expected: z.object({ binder_interval: z.tuple([number, number]) }),
  });
  const { Va, VMA_min, VFA } = range.inputs.rules;
  const rule = (id: string, clause: string, quantity: string, limit: { min?: number; max?: number }) =>
    aRule({ id, clause, measure: { kind: 'reading', quantity }, limit, rounding: { method: 'absolute' } });
  const edition = anEdition({
    rules: [
      rule('voids', '1.1', 'air-voids', { min: Va[0], max: Va[1] }),
      rule('vma', '1.2', 'voids-in-mineral-aggregate', { min: VMA_min }),
      rule('vfa', '1.3', 'voids-filled-with-asphalt', { min: VFA[0], max: VFA[1] }),
    ],
    roomToMove: ['voids', 'vma', 'vfa'],
  });
  // Raw readings that give just these voids: Gmm 2.500, Gmb = Gmm·(1 − Va/100), Gsb = Gmb·Ps/(100 − VMA).
  const readings = inputs.Pb.flatMap((Pb, place) => {
    const at = { trial: 'ABCDE'.charAt(place) };
    const Gmb = 2.5 * (1 - inputs.Va[place]! / 100);
    const Gsb = (Gmb * (100 - Pb)) / (100 - inputs.VMA[place]!);
    return [
      aReading({ quantity: 'binder-content', value: Pb, at }),
      aReading({ quantity: 'maximum-specific-gravity', value: 2.5, at }),
      aReading({ quantity: 'bulk-specific-gravity-mix', value: Gmb, at }),
      aReading({ quantity: 'bulk-specific-gravity-aggregate', value: Gsb, at }),
    ];
  });
  const record = aRecord({ readings: [...readings, aReading({ quantity: 'binder-content', value: 4.96 })] });
  const { roomToMove } = evaluate(record, edition, aContext()).analysis;
  const [from, to] = range.expected.binder_interval;
  expect(roomToMove?.room).toMatchObject({ from, to, closedBelowBy: ['voids'], closedAboveBy: ['vfa'] });
});
