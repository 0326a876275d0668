import { describe, expect, it, vi } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import { readWorkbook } from '#rules/reading/interpret';
import { templateMapping } from '#rules/reading/template-mapping';
import { resolveEdition } from '#rules/rule-sets/resolve';
import { parseRuleSet } from '#rules/rule-sets/schema';
import performance from '#rules/sets/cvra-431-2026.json';
import { decodeWorkbook } from '#server/workbook/decode';
import { buildTemplate, finishTemplate } from '#server/workbook/write-template';
import { fillTemplate } from './fill-template';
import { openGradedMix } from './performance-mixes';

vi.setConfig({ testTimeout: 60_000 });

const context = { submittedOn: '2026-03-09', lettingOn: '2026-01-14', facts: {} };

async function readBack() {
  const parsed = parseRuleSet(performance);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems));
  const resolution = resolveEdition(parsed.ruleSet);
  if (!resolution.ok) throw new Error(JSON.stringify(resolution.problems));
  const { edition } = resolution;
  const workbook = buildTemplate(edition, { editionHash: '0f3a' });
  fillTemplate(workbook, openGradedMix);
  const decoded = await decodeWorkbook(await finishTemplate(workbook, '0f3a'), 'performance.xlsx');
  if (!decoded.ok) throw new Error(decoded.problem.detail);
  const mapping = templateMapping(edition);
  const reading = readWorkbook({ grid: decoded.grid, mapping, edition, answers: [] });
  const { findings } = evaluate(reading.record, edition, context);
  const open = findings
    .filter(
      ({ kind, outcome }) => kind !== 'consistency' && outcome !== 'pass' && outcome !== 'not applicable',
    )
    .map(({ rule, outcome }) => [rule, outcome]);
  const impossible = findings.filter(
    ({ kind, severity }) => kind === 'consistency' && severity === 'required',
  );
  return { reading, findings, open, impossible };
}

/** The report has to be enclosed, and files are attached after the upload; nobody tested for the agency yet. */
const open = [
  ['agency-air-voids', 'not shown'],
  ['performance-report', 'not shown'],
];

describe('the template of the performance section', () => {
  it('reads an open-graded mix of 20.6 % air voids without a doubt, and every rule holds', async () => {
    const { reading, findings, ...outcome } = await readBack();
    expect([reading.doubts, reading.unread]).toEqual([[], []]);
    expect(outcome).toEqual({ open, impossible: [] });
    const voids = findings.filter(({ rule }) => rule.startsWith('open-voids'));
    expect(voids.map(({ observed }) => observed?.rounded)).toEqual([20.6, 20.6, 20.6]);
  });
});
