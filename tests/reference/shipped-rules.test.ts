import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { evaluate } from '#rules/engine/evaluate';
import type { Finding } from '#rules/engine/finding';
import type { MixRecordInput } from '#rules/record';
import { type ResolvedEdition, resolveEdition } from '#rules/rule-sets/resolve';
import { parseRuleSet, type RuleInput } from '#rules/rule-sets/schema';
import { shippedRuleSets } from '#rules/sets/shipped-rule-sets';
import { aReading, replicates } from '#tests/builders/a-reading';
import { aContext, aRecord } from '#tests/builders/a-record';
import { anEdition, aRule } from '#tests/builders/a-rule-set';
import { referenceRecord } from './reference-record';
import records from './shipped-rules.json';

const number = z.number();
const road = shipped('cvra-412-2026.json');
const airfield = shipped('cvra-421-2026.json');

describe('difference limits of duplicate determinations (ASTM C670, d2s of 0.011)', () => {
  const { inputs, expected } = referenceRecord(records, 'PRC-13', {
    inputs: z.object({ results: z.array(number), d2s: number }),
    expected: z.object({ difference: number, acceptable: z.boolean() }),
  });
  const judged = (results: number[]) =>
    findingOf(road, 'maximum-gravity-range', {
      readings: replicates('maximum-specific-gravity', results),
    });

  it('accepts what the record accepts, with its difference', () => {
    const finding = judged(inputs.results);
    expect(finding.outcome === 'pass').toBe(expected.acceptable);
    expect(finding.observed?.rounded).toBe(expected.difference);
    expect(finding.limit?.max).toBe(inputs.d2s);
  });

  it('accepts a difference on the limit and none beyond it, as the record says of its two other pairs', () => {
    expect(judged([2.452, 2.463]).outcome).toBe('pass');
    expect(judged([2.452, 2.464]).outcome).toBe('fail');
  });
});

it('calls 44 percent passing 2.36 mm fine-graded at 12.5 mm, and 38.9 not (AASHTO M 323 classification)', () => {
  const { inputs, expected } = referenceRecord(records, 'GRD-14', {
    inputs: z.object({ 'passing_2.36': number, NMAS: number }),
    expected: z.looseObject({ PCS_control_point: number, class: z.string() }),
  });
  const judged = (value: number) =>
    findingOf(road, 'primary-control-sieve', {
      attributes: {
        nominalMaximumSize: { value: inputs.NMAS, unit: 'mm', origin: 'reported' },
        course: { value: 'surface', origin: 'reported' },
      },
      readings: [aReading({ quantity: 'percent-passing', value, at: { trial: 'design', sieve: 2.36 } })],
    });
  const finding = judged(inputs['passing_2.36']);
  expect(finding.limit?.min).toBe(expected.PCS_control_point);
  expect(finding.outcome === 'pass').toBe(expected.class === 'fine-graded');
  expect(judged(38.9).outcome).toBe('fail');
});

it('accepts the voids of the worked Marshall design (UFC 3-250-03, table 2-9) within the printed limits', () => {
  const { inputs, expected } = referenceRecord(records, 'MAR-04', {
    inputs: z.looseObject({ voids_total_mix: number, voids_filled: number }),
    expected: z.looseObject({
      criteria: z.looseObject({
        voids_total_mix: z.tuple([number, number]),
        voids_filled: z.tuple([number, number]),
      }),
      verdict: z.literal('acceptable'),
    }),
  });
  const { criteria } = expected;
  const voids = findingOf(airfield, 'air-voids', {
    readings: replicates(
      'air-voids',
      Array.from({ length: 4 }, () => inputs.voids_total_mix),
    ),
  });
  const filled = findingOf(airfield, 'vfa', {
    readings: [aReading({ quantity: 'voids-filled-with-asphalt', value: inputs.voids_filled })],
  });
  expect([voids.outcome, filled.outcome]).toEqual(['pass', 'pass']);
  expect([voids.limit?.min, voids.limit?.max]).toEqual(criteria.voids_total_mix);
  expect([filled.limit?.min, filled.limit?.max]).toEqual(criteria.voids_filled);
});

describe('a published job mix with its limits and verdicts (semi-dense concrete, grade II)', () => {
  const limits = z.object({
    stability_min: number,
    flow: z.tuple([number, number]),
    Va: z.tuple([number, number]),
    VMA_min: number,
    VFB: z.tuple([number, number]),
  });
  const { inputs, expected } = referenceRecord(records, 'REQ-SDBC-01', {
    inputs: z.object({ stability_kN: number, flow_mm: number, Va: number, VMA: number, VFB: number }),
    expected: z.object({
      limits,
      verdict: z.literal('all pass'),
      margins: z.object({
        stability: number,
        flow_to_upper: number,
        Va_to_lower: number,
        VMA: number,
        VFB_to_upper: number,
      }),
    }),
  });
  const between = ([min, max]: [number, number]) => ({ min: min.toFixed(1), max: max.toFixed(1) });
  const { margins } = expected;
  const rows: [string, number, RuleInput['limit'], number][] = [
    ['marshall-stability', inputs.stability_kN, { min: expected.limits.stability_min }, margins.stability],
    ['marshall-flow', inputs.flow_mm, between(expected.limits.flow), margins.flow_to_upper],
    ['air-voids', inputs.Va, between(expected.limits.Va), margins.Va_to_lower],
    ['voids-in-mineral-aggregate', inputs.VMA, { min: expected.limits.VMA_min }, margins.VMA],
    ['voids-filled-with-asphalt', inputs.VFB, between(expected.limits.VFB), margins.VFB_to_upper],
  ];

  it.each(rows)('%s of %d passes by the printed difference', (quantity, value, limit, margin) => {
    const edition = anEdition({
      rules: [
        aRule({ measure: { kind: 'reading', quantity }, limit, rounding: { method: 'rounding', to: 0.1 } }),
      ],
    });
    const finding = findingOf(edition, 'vma', { readings: [aReading({ quantity, value })] });
    expect(finding).toMatchObject({ outcome: 'pass', margin });
  });
});

function shipped(file: string): ResolvedEdition {
  const parsed = parseRuleSet(shippedRuleSets.find((each) => each.file === file)?.document);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems));
  const resolution = resolveEdition(parsed.ruleSet);
  if (!resolution.ok) throw new Error(JSON.stringify(resolution.problems));
  return resolution.edition;
}

function findingOf(edition: ResolvedEdition, rule: string, record: MixRecordInput): Finding {
  const { findings } = evaluate(aRecord(record), edition, aContext());
  const [finding, ...others] = findings.filter((each) => each.rule === rule);
  if (!finding || others.length > 0) throw new Error(`${rule} gave ${1 + others.length} findings`);
  return finding;
}
