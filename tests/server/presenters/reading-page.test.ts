import { describe, expect, it } from 'vitest';
import { type AttributeValue, mixRecordSchema } from '#rules/record';
import { ruleSetSchema } from '#rules/rule-sets/schema';
import { askedAttributes, conflictDoubts } from '#server/presenters/asked-attributes';
import { gradationView } from '#server/presenters/gradation-view';
import { queueGroup } from '#server/presenters/queue-group';
import { understoodGroups } from '#server/presenters/understood-groups';
import { aLimit } from '#tests/builders/a-limit';

const edition = ruleSetSchema.parse({
  format: 'clauseway/rule-set@1',
  id: 'cvra-412',
  title: 'Section 412',
  agency: 'Carrow Valley Roads Authority',
  edition: '2026',
  effective: { from: '2026-01-01', to: null },
  layerOf: null,
  tables: [
    {
      id: 'vma-min',
      keys: ['nominalMaximumSize'],
      columns: [{ name: 'min', unit: '%' }],
      rows: [{ nominalMaximumSize: 12.5, min: '14.0' }],
    },
  ],
  rules: [
    {
      id: 'vma',
      clause: '412.03(b)',
      title: 'VMA',
      severity: 'required',
      when: { all: [{ fact: 'course', operator: 'equal', value: 'surface' }] },
      measure: { kind: 'reading', quantity: 'voids-in-mineral-aggregate' },
      limit: { min: { table: 'vma-min', column: 'min' } },
    },
  ],
});

const read = (value: AttributeValue['value'], cell: string): AttributeValue => ({
  value,
  origin: 'reported',
  source: { sheet: 'Submittal', cell, text: String(value) },
});

describe('attributes that are asked', () => {
  const sources = { edition, workbook: {}, facts: {}, typed: {} };

  it('are those that conditions and tables use and nobody states', () => {
    const asked = askedAttributes(sources);
    expect(asked.map(({ name }) => name)).toEqual(['nominalMaximumSize', 'course']);
    expect(asked[1]).toMatchObject({
      values: ['surface', 'intermediate', 'binder', 'base'],
      reason: 'Neither the workbook nor the project states it.',
      value: null,
    });
  });

  it('are not asked where the workbook or else the project states them', () => {
    const workbook = { nominalMaximumSize: read(12.5, 'B4') };
    expect(askedAttributes({ ...sources, workbook, facts: { course: 'Surface course' } })).toEqual([]);
  });

  it('stay on the page with what was typed', () => {
    const [, course] = askedAttributes({ ...sources, typed: { course: 'base' } });
    expect(course?.value).toBe('base');
  });

  it('are asked where workbook and project differ, and are a doubt until answered', () => {
    const conflict = { ...sources, workbook: { course: read('surface', 'B5') }, facts: { course: 'base' } };
    expect(askedAttributes(conflict).find(({ name }) => name === 'course')).toMatchObject({
      reason: 'The workbook says surface, the project says base.',
      values: ['surface', 'base'],
    });
    const [doubt] = conflictDoubts(conflict);
    expect(doubt).toMatchObject({ sheet: 'Submittal', cell: 'B5', about: { attribute: 'course' } });
    expect(doubt?.alternatives.map(({ attribute }) => attribute?.value.value)).toEqual(['surface', 'base']);
    expect(conflictDoubts({ ...conflict, typed: { course: 'base' } })).toEqual([]);
  });

  it('do not conflict over case, hyphens and the word course', () => {
    const same = {
      ...sources,
      workbook: { course: read('surface', 'B5') },
      facts: { course: 'Surface Course' },
    };
    expect(conflictDoubts(same)).toEqual([]);
  });
});

describe('the gradation of the job mix', () => {
  const record = mixRecordSchema.parse({
    attributes: { nominalMaximumSize: { value: 12.5, unit: 'mm', origin: 'reported' } },
    readings: [
      {
        quantity: 'percent-passing',
        value: 38,
        unit: '%',
        at: { trial: 'design', sieve: 2.36 },
        origin: 'measured',
      },
      {
        quantity: 'percent-passing',
        value: 95,
        unit: '%',
        at: { sieve: 12.5 },
        origin: 'measured',
        source: { sheet: 'Gradation', cell: 'C7', text: '95' },
      },
      {
        quantity: 'percent-passing',
        value: 60,
        unit: '%',
        at: { sieve: 9.5, stockpile: 'sand' },
        origin: 'measured',
      },
      {
        quantity: 'percent-passing',
        value: 61,
        unit: '%',
        at: { sieve: 9.5, trial: 'A' },
        origin: 'measured',
      },
    ],
  });

  it('runs from coarse to fine with the limits that were judged, without stockpiles and trials', () => {
    const view = gradationView(record, [
      { kind: 'gradation', subject: '2.36 mm', outcome: 'pass', limit: aLimit({ min: 28, max: 58 }) },
    ]);
    expect(view?.points).toEqual([
      {
        sieve: 12.5,
        usName: '1/2 in',
        passing: 95,
        min: null,
        max: null,
        outcome: null,
        sheet: 'Gradation',
        cell: 'C7',
      },
      {
        sieve: 2.36,
        usName: 'No. 8',
        passing: 38,
        min: 28,
        max: 58,
        outcome: 'pass',
        sheet: null,
        cell: null,
      },
    ]);
  });

  it('ends its maximum density line one sieve above the nominal maximum size', () => {
    expect(gradationView(record, [])?.maximumSizeMm).toBe(19);
    expect(gradationView({ ...record, attributes: {} }, [])?.maximumSizeMm).toBeNull();
  });

  it('is absent where no percent passing was read', () => {
    expect(gradationView({ attributes: {}, readings: [] }, [])).toBeNull();
  });
});

it('groups what was understood by quantity, with its first cell', () => {
  const source = (cell: string) => ({ sheet: 'Trials', cell, text: '' });
  const groups = understoodGroups([
    { quantity: 'binder-content', source: source('B2') },
    { quantity: 'air-voids', source: source('C2') },
    { quantity: 'binder-content', source: source('B3') },
    { quantity: 'binder-content', source: null },
  ]);
  expect(groups.map(({ count, cell }) => [count, cell])).toEqual([
    [2, 'B2'],
    [1, 'C2'],
  ]);
});

describe('the group of a revision in the queue', () => {
  // 12 March 2026 is a Thursday; its week ends on Sunday 15 March.
  const today = '2026-03-12';
  const group = (state: 'submitted' | 'in review', dueOn: string | null) =>
    queueGroup({ state, disposition: null, dueOn }, today);

  it('is late from the day after the due date', () => {
    expect(group('submitted', '2026-03-11')).toBe('late');
    expect(group('in review', '2026-03-12')).toBe('due this week');
  });

  it('is this week up to Sunday', () => {
    expect(group('submitted', '2026-03-15')).toBe('due this week');
    expect(group('submitted', '2026-03-16')).toBe('next week and after');
  });

  it('is with the contractor only where a revision is awaited', () => {
    const returned = (disposition: string) =>
      queueGroup({ state: 'returned', disposition, dueOn: null }, today);
    expect(returned('revise and resubmit')).toBe('with the contractor');
    expect(returned('rejected')).toBeNull();
    expect(returned('approved')).toBeNull();
    expect(queueGroup({ state: 'draft', disposition: null, dueOn: null }, today)).toBeNull();
    expect(queueGroup({ state: 'withdrawn', disposition: null, dueOn: '2026-03-11' }, today)).toBeNull();
  });
});
