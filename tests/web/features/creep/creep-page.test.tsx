// @vitest-environment happy-dom
import { fireEvent, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { evaluate } from '#rules/engine/evaluate';
import type { Reading } from '#rules/record';
import type { RuleInput } from '#rules/rule-sets/schema';
import { creepView } from '#server/presenters/creep-view';
import { aCreepTest } from '#tests/builders/a-creep-test';
import { aContext, aRecord } from '#tests/builders/a-record';
import { aRevision } from '#tests/builders/a-revision';
import { anEdition, aRule } from '#tests/builders/a-rule-set';
import { aSession } from '#tests/builders/a-session';
import { CreepPage } from '../../../../web/features/creep/components/creep-page';
import { renderPage, stubServer } from '../../render-page';

const submittalId = '0192f0a0-0000-7000-8000-000000000001';
const base = `/api/submittals/${submittalId}/revisions/1`;
const at = `/submittals/${submittalId}/r/1`;

const rules = [
  { id: 'measured', clause: '412.06(f)', time: 100, min: '0.100' },
  { id: 'beyond', clause: '412.06(e)', time: 1000, min: '0.180' },
].map(
  ({ id, clause, time, min }): RuleInput =>
    aRule({
      id,
      clause,
      title: 'Creep compliance',
      measure: { kind: 'creep-compliance', temperature: -10, time },
      limit: { min },
      rounding: { method: 'rounding', to: 0.001 },
    }),
);
const three = aCreepTest({ specimens: [0.98, 1, 1.02] });

async function open({
  readings = three,
  own = rules,
  search = '',
}: {
  readings?: Reading[];
  own?: RuleInput[];
  search?: string;
} = {}) {
  const edition = anEdition({ rules: own });
  const { analysis, findings, seal } = evaluate(aRecord({ readings }), edition, aContext());
  const view = creepView({ creep: analysis.creep, findings, rules: edition.rules });
  stubServer({
    'GET /api/session': aSession(),
    [`GET ${base}`]: aRevision(),
    [`GET ${base}/creep`]: JSON.parse(JSON.stringify({ ...view, seal, startingPoint: false })),
  });
  const page = renderPage(<CreepPage />, {
    path: '/submittals/:submittalId/r/:number/creep',
    at: `${at}/creep${search}`,
  });
  await screen.findByRole('heading', { level: 1 });
  return page;
}

describe('the page of creep compliance', () => {
  it('heads with temperature, stress and specimens', async () => {
    await open();
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe(
      'Creep compliance at −10 °C under 200 kPa, three specimens',
    );
  });

  it('draws every point as a link that says what it is and opens its cell', async () => {
    await open();
    const points = screen.getAllByRole('link', { name: /Open its cell/ });
    expect(points).toHaveLength(21);
    expect(points[0]?.getAttribute('aria-label')).toMatch(/^specimen 1, 1 s under 200 kPa: 0\.0503 1\/GPa/);
  });

  it('says why a rule is undecided and what would decide it', async () => {
    await open();
    expect(screen.getByRole('heading', { name: 'Why 412.06(e) is undecided' })).toBeTruthy();
    expect(screen.getByText('Load a specimen for 1,000 s at −10 °C.')).toBeTruthy();
  });

  it('lists each rule with source, value and outcome, leading to its finding', async () => {
    await open();
    const table = screen.getByRole('table', { name: 'Rules on creep compliance' });
    const rows = within(table).getAllByRole('row').slice(1);
    expect(rows.map((row) => row.textContent)).toEqual([
      expect.stringMatching(/412\.06\(e\).*at least 0\.180.*extrapolated.*Undecided/),
      expect.stringMatching(/412\.06\(f\).*at least 0\.100.*measured.*0\.120.*\+0\.020.*Pass/),
    ]);
    expect(within(table).getByRole('link', { name: '412.06(f)' }).getAttribute('href')).toBe(
      `${at}#measured~mix`,
    );
  });

  it('shows the same as a table, with the cells', async () => {
    await open();
    fireEvent.click(screen.getByRole('button', { name: 'Show as a table' }));
    const table = screen.getByRole('table', { name: 'Creep compliance by loading time and specimen' });
    expect(within(table).getAllByRole('row')).toHaveLength(22);
    expect(within(table).getAllByRole('link')[0]?.getAttribute('href')).toBe(
      `${at}/reading?sheet=Creep&cell=E2`,
    );
    expect(screen.queryByRole('link', { name: /Open its cell/ })).toBeNull();
  });

  it('changes the model, and says what the others give', async () => {
    await open();
    expect(screen.getByText(/^The power law has R² 0\.\d{3} and gives 0\.\d+ at 1,000 s\.$/)).toBeTruthy();
    fireEvent.click(screen.getByRole('radio', { name: 'Power law' }));
    expect(screen.getByText('D(t) = D0 + D1·t^m')).toBeTruthy();
  });

  it('hides and shows the band', async () => {
    const { container } = await open();
    expect(container.querySelector('.band')).not.toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'Hide the band' }));
    expect(container.querySelector('.band')).toBeNull();
  });

  it('shows the evidence where no rule stands on it', async () => {
    await open({ own: [aRule()] });
    expect(screen.getAllByRole('link', { name: /Open its cell/ })).toHaveLength(21);
    expect(screen.queryByRole('table', { name: 'Rules on creep compliance' })).toBeNull();
  });

  it('draws the master curve of several temperatures with its shifts', async () => {
    await open({
      readings: [
        ...three,
        ...aCreepTest({ temperature: 0, compliance: (t) => 1.2 - 1.155 / (1 + (t / 900) ** 0.55) }),
      ],
      search: '?temperature=0',
    });
    expect(screen.getByRole('heading', { level: 1 }).textContent).toContain('at 0 °C');
    expect(screen.getByRole('img', { name: /^Master curve of 2 temperatures at −10 °C/ })).toBeTruthy();
    const shifts = screen.getByRole('table', { name: 'Shift factors' });
    expect(
      within(shifts)
        .getAllByRole('row')
        .map((row) => row.textContent),
    ).toEqual([expect.anything(), '−10 °Creference', expect.stringMatching(/^0 °C−1\.1\d/)]);
  });

  it('says so where no creep test was read', async () => {
    await open({ readings: [] });
    expect(screen.getByText('The workbook states no creep test of the design.')).toBeTruthy();
  });

  it('lists a rule that nothing was tested for', async () => {
    await open({
      own: [
        ...rules,
        aRule({
          id: 'warm',
          clause: '412.06(g)',
          title: 'Creep',
          measure: { kind: 'creep-compliance', temperature: 20, time: 10 },
          limit: { max: 5 },
        }),
      ],
    });
    expect(screen.getByRole('heading', { name: 'Asked for, and not tested' })).toBeTruthy();
    expect(screen.getByRole('link', { name: '412.06(g)' })).toBeTruthy();
  });
});
