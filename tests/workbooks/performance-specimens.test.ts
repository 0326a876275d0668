import { describe, expect, it } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import type { Finding } from '#rules/engine/finding';
import { readWorkbook } from '#rules/reading/interpret';
import { templateMapping } from '#rules/reading/template-mapping';
import type { ResolvedEdition } from '#rules/rule-sets/resolve';
import type { RuleInput } from '#rules/rule-sets/schema';
import { decodeWorkbook } from '#server/workbook/decode';
import { buildTemplate, finishTemplate } from '#server/workbook/write-template';
import { aContext } from '#tests/builders/a-record';
import { anEdition, aRule } from '#tests/builders/a-rule-set';
import { fillTemplate, type TemplateContent } from './fill-template';

const airVoids = aRule({
  id: 'voids',
  measure: { kind: 'reading', quantity: 'air-voids' },
  limit: { min: '3.0', max: '5.0' },
});
const rutDepth = (where: RuleInput['measure']['where']) =>
  aRule({
    id: 'rut',
    measure: {
      kind: 'reading',
      quantity: 'wheel-track-rut-depth',
      at: { passes: 20_000 },
      ...(where ? { where } : {}),
    },
    limit: { max: 12.5 },
  });

async function check(edition: ResolvedEdition, tables: TemplateContent['tables']): Promise<Finding[]> {
  const workbook = buildTemplate(edition, { editionHash: '0f3a' });
  const gradation = { sievesMm: [], stockpiles: [], columns: {} };
  fillTemplate(workbook, { submittal: {}, tables, methods: {}, gradation });
  const decoded = await decodeWorkbook(await finishTemplate(workbook, '0f3a'), 'mix.xlsx');
  if (!decoded.ok) throw new Error(decoded.problem.detail);
  const { grid } = decoded;
  const { record, doubts } = readWorkbook({ grid, mapping: templateMapping(edition), edition, answers: [] });
  expect(doubts).toEqual([]);
  return evaluate(record, edition, aContext()).findings;
}

const outcomeOf = (findings: Finding[], id: string) => findings.find(({ rule }) => rule === id)?.outcome;

const specimens = (values: Record<string, number>) =>
  Object.entries(values).map(([specimen, value]) => ({
    Trial: 'design',
    Specimen: specimen,
    'Air voids': value,
  }));
const tracked = (values: Record<string, number>, header = '') =>
  Object.entries(values).map(([specimen, value]) => ({
    Specimen: specimen,
    Passes: 20_000,
    'Wheel-track rut depth': 4.1,
    ...(header === '' ? {} : { [header]: value }),
  }));

/** With the wheel-tracking specimens in the mean, 2.5 % would be 4.8 % and 4.1 % would be 5.6 %. */
const designs: [string, Record<string, number>, string][] = [
  ['too dense', { '1': 2.4, '2': 2.6 }, 'fail'],
  ['as it should be', { '1': 4, '2': 4.2 }, 'pass'],
];
const wheels = { W1: 7, W2: 7.2 };

describe('a template with reported air voids only, and wheel-tracking specimens at 7 %', () => {
  it.each(designs)('leaves a design %s undecided where all stand among the trials', async (_, design) => {
    const edition = anEdition({ rules: [airVoids, rutDepth(undefined)] });
    const findings = await check(edition, {
      Trials: [...specimens(design), ...specimens(wheels)],
      Performance: tracked(wheels),
    });
    expect(outcomeOf(findings, 'voids')).toBe('undecided');
    expect(outcomeOf(findings, 'rut')).toBe('pass');
  });

  it.each(designs)(
    'judges a design %s where the sheet of free readings names their test',
    async (_, design, outcome) => {
      const edition = anEdition({ rules: [airVoids, rutDepth(undefined)] });
      const findings = await check(edition, {
        Trials: specimens(design),
        Performance: tracked(wheels),
        Readings: Object.entries(wheels).map(([specimen, value]) => ({
          Quantity: 'Air voids',
          Value: value,
          Unit: '%',
          Trial: 'design',
          Specimen: specimen,
          'Form of the test': 'wheel tracking',
        })),
      });
      expect(outcomeOf(findings, 'voids')).toBe(outcome);
    },
  );

  it.each(designs)(
    'has a place for their voids where a rule asks for them: a design %s',
    async (_, design, outcome) => {
      const where = [{ quantity: 'air-voids', min: 6.5, max: 7.5 }];
      const edition = anEdition({ rules: [airVoids, rutDepth(where)] });
      const findings = await check(edition, {
        Trials: specimens(design),
        Performance: tracked(wheels, 'Air voids of the tested specimen'),
      });
      expect(outcomeOf(findings, 'voids')).toBe(outcome);
      expect(outcomeOf(findings, 'rut')).toBe('pass');
    },
  );
});
