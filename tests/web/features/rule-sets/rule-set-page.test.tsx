// @vitest-environment happy-dom
import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { type RuleSetView, ruleSetViewSchema } from '#shared/contracts/rule-sets';
import { aSession } from '#tests/builders/a-session';
import { RuleSetPage } from '../../../../web/features/rule-sets/components/rule-set-page';
import { renderPage, stubServer } from '../../render-page';

const edition = {
  ruleSet: 'cvra-412',
  title: 'Section 412',
  rules: 1,
  layerOf: null,
  startingPoint: true,
  draftId: null,
};

function aView(overrides: Partial<RuleSetView> = {}): RuleSetView {
  return ruleSetViewSchema.parse({
    ...edition,
    edition: '2026',
    state: 'in force',
    from: '2026-01-01',
    to: null,
    agency: 'Carrow Valley Roads Authority',
    layers: [],
    availableLayers: [],
    otherEditions: [
      { ...edition, edition: '2024', state: 'superseded', from: '2024-01-01', to: '2025-12-31' },
    ],
    ruleViews: [
      {
        id: 'vma',
        clause: '412.03(b)',
        title: 'Voids in the mineral aggregate',
        severity: 'required',
        sentence: 'Voids in the mineral aggregate are at least the value of Table 412-2.',
        condition: 'mix type is dense-graded',
        rounding: 'ASTM E29, rounding method, to 0.1',
        precision: null,
        minimumCount: 2,
        quantity: {
          id: 'voids-in-mineral-aggregate',
          label: 'voids in the mineral aggregate',
          own: false,
        },
        advice: null,
        source: 'AASHTO M 323',
        sourceOrigin: 'memory',
        document: 'Supplement S-07',
        displaced: [{ document: 'Section 412, edition 2026', text: 'at least 13.5' }],
        tables: ['vma-min'],
        encodedBy: null,
        verifiedBy: null,
      },
    ],
    removed: [{ id: 'ras', clause: '412.02(l)', title: 'Recycled shingles', document: 'Supplement S-07' }],
    tables: [
      {
        id: 'vma-min',
        title: 'Table 412-2, minimum VMA',
        columns: [
          { name: 'size', label: 'Nominal maximum size', unit: 'mm', key: true },
          { name: 'min', label: 'min', unit: '%', key: false },
        ],
        rows: [{ cells: ['12.5', '14.0'], document: 'Supplement S-07', displaced: '13.5' }],
        usedBy: ['vma'],
      },
    ],
    quantities: [
      { id: 'joint-density', symbol: 'JD', label: 'joint density', unit: '%', methods: ['AASHTO T 166'] },
    ],
    caseCount: 12,
    hash: 'a'.repeat(64),
    templateHref: '/api/rule-sets/cvra-412/2026/template.xlsx',
    exampleHref: '/api/rule-sets/cvra-412/2026/example.xlsx',
    ...overrides,
  });
}

async function open(overrides: Partial<RuleSetView> = {}) {
  stubServer({
    'GET /api/session': aSession(),
    'GET /api/rule-sets/cvra-412/2026': aView(overrides),
  });
  const page = renderPage(<RuleSetPage />, {
    path: '/rule-sets/:ruleSetId/:edition',
    at: '/rule-sets/cvra-412/2026',
  });
  await screen.findByRole('heading', { level: 1 });
  return page;
}

describe('an edition as it reads', () => {
  it('gives every rule as its sentence with condition, rounding, severity and source', async () => {
    await open();
    const rule = within(screen.getByRole('article'));
    expect(rule.getByRole('heading').textContent).toBe(
      '412.03(b)Voids in the mineral aggregate are at least the value of Table 412-2.',
    );
    for (const text of ['mix type is dense-graded', 'required', 'ASTM E29, rounding method, to 0.1']) {
      expect(rule.getByText(text)).toBeTruthy();
    }
    expect(rule.getByText('from memory, verify')).toBeTruthy();
  });

  it('shows what a layer displaced in rules and in tables, and what it removed', async () => {
    const { container } = await open();
    const struck = [...container.querySelectorAll('del')].map((each) => each.textContent);
    expect(struck).toEqual(['at least 13.5', '13.5']);
    expect(container.querySelector('.is-removed')?.textContent).toContain('Recycled shingles');
  });

  it('leads from a rule to the quantity that it measures', async () => {
    await open();
    const quantity = screen.getByRole('link', { name: 'voids in the mineral aggregate' });
    expect(quantity.getAttribute('href')).toBe('/quantities#voids-in-mineral-aggregate');
  });

  it('leads from a rule to its table and back', async () => {
    await open();
    const table = screen.getByRole('link', { name: 'Table 412-2, minimum VMA' });
    expect(table.getAttribute('href')).toContain('#table-vma-min');
    expect(screen.getByRole('link', { name: '412.03(b)' }).getAttribute('href')).toContain('#rule-vma');
  });

  it('shows the quantities that it declares itself, and leads to all others', async () => {
    await open();
    const own = within(screen.getByRole('table', { name: 'Quantities of Section 412' }));
    expect(own.getByRole('rowheader').textContent).toContain('Joint density');
    expect(own.getByText('AASHTO T 166')).toBeTruthy();
    const all = screen.getByRole('link', { name: 'What each quantity means' });
    expect(all.getAttribute('href')).toBe('/quantities');
  });

  it('offers the template and the other editions with their state', async () => {
    await open();
    const template = screen.getByRole('link', { name: /Template for Section 412/ });
    expect(template.getAttribute('href')).toBe('/api/rule-sets/cvra-412/2026/template.xlsx');
    expect(screen.getByRole('link', { name: '2024' }).getAttribute('href')).toBe('/rule-sets/cvra-412/2024');
    expect(screen.getByText('superseded')).toBeTruthy();
  });

  it('offers the filled example where the edition has one', async () => {
    await open();
    const example = screen.getByRole('link', { name: /filled in with an invented mix/ });
    expect(example.getAttribute('href')).toBe('/api/rule-sets/cvra-412/2026/example.xlsx');
  });

  it('offers no example where none fits', async () => {
    await open({ exampleHref: null });
    expect(screen.queryByRole('link', { name: /invented mix/ })).toBeNull();
  });
});
