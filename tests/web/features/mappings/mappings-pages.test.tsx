// @vitest-environment happy-dom
import { fireEvent, screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aMappingView } from '#tests/builders/a-mapping-view';
import { aSession } from '#tests/builders/a-session';
import { MappingPage } from '../../../../web/features/mappings/components/mapping-page';
import { MappingsPage } from '../../../../web/features/mappings/components/mappings-page';
import { aProblemResponse, renderPage, stubServer } from '../../render-page';

const mapping = aMappingView();
const { sentences: _sentences, versions: _versions, ...item } = mapping;
const base = `/api/mappings/${mapping.id}`;
const laboratories = {
  laboratories: [
    {
      id: mapping.laboratory.id,
      name: mapping.laboratory.name,
      accreditation: null,
      mappings: 1,
      since: '2026-01-01',
      version: 1,
    },
  ],
  abilities: { add: false },
};

function openOne(answers: Record<string, unknown> = {}) {
  const sent = stubServer(
    Object.assign(answers, { 'GET /api/session': aSession(), [`GET ${base}`]: mapping, ...answers }),
  );
  const page = renderPage(<MappingPage mappingId={mapping.id} />, {
    path: '/mappings/:mappingId',
    at: `/mappings/${mapping.id}`,
  });
  return { ...page, sent };
}

function openAll(answers: Record<string, unknown> = {}) {
  const sent = stubServer({
    'GET /api/session': aSession(),
    'GET /api/mappings': { mappings: [item], abilities: { import: true } },
    'GET /api/laboratories': laboratories,
    ...answers,
  });
  const page = renderPage(<MappingsPage />, { path: '/mappings', at: '/mappings' });
  return { ...page, sent };
}

const changes = (sent: ReturnType<typeof openOne>['sent']) =>
  sent.filter(({ method }) => method === 'PATCH').map(({ body }) => body);

describe('the page of a mapping', () => {
  it('says what it says, a sentence a rule, and who taught it', async () => {
    const { stop } = openOne();
    await screen.findByText('Cells under “Remarks” are not readings.');
    expect(screen.getByText('Learned from BW-125-S4 r1.xlsx')).toBeTruthy();
    expect(screen.getByText('Sorcha Lund')).toBeTruthy();
    stop();
  });

  it('is renamed, for the version that was seen', async () => {
    const answers: Record<string, unknown> = {
      [`PATCH ${base}`]: aMappingView({ name: 'Brightwater, since 2026', version: 8 }),
    };
    const { sent, stop } = openOne(answers);
    const name = await screen.findByRole('textbox', { name: 'Name' });
    answers[`GET ${base}`] = answers[`PATCH ${base}`];
    fireEvent.change(name, { target: { value: ' Brightwater, since 2026 ' } });
    fireEvent.click(screen.getByRole('button', { name: 'Rename' }));
    await screen.findByRole('heading', { name: /Brightwater, since 2026/ });
    expect(changes(sent)).toEqual([{ name: 'Brightwater, since 2026' }]);
    expect(sent.find(({ method }) => method === 'PATCH')?.headers.get('If-Match')).toBe('"7"');
    stop();
  });

  it('is retired and says that it is no longer applied', async () => {
    const answers: Record<string, unknown> = {
      [`PATCH ${base}`]: aMappingView({ retiredAt: '2026-03-10T10:00:00.000Z', version: 8 }),
    };
    const { sent, stop } = openOne(answers);
    const retire = await screen.findByRole('button', { name: 'Retire' });
    answers[`GET ${base}`] = answers[`PATCH ${base}`];
    fireEvent.click(retire);
    await screen.findByText(/Retired on 10 March 2026: no longer applied/);
    expect(changes(sent)).toEqual([{ retired: true }]);
    expect(screen.getByRole('button', { name: 'Take into use again' })).toBeTruthy();
    stop();
  });

  it('says why a change was refused', async () => {
    const { stop } = openOne({ [`PATCH ${base}`]: aProblemResponse('version-stale', 412) });
    fireEvent.click(await screen.findByRole('button', { name: 'Retire' }));
    expect(await screen.findByRole('alert')).toBeTruthy();
    expect(screen.getByText(/The mapping is as it was/)).toBeTruthy();
    stop();
  });

  it('offers no change to a reader who may not make one', async () => {
    const { stop } = openOne({ [`GET ${base}`]: aMappingView({ abilities: { change: false } }) });
    await screen.findByText('Learned from BW-125-S4 r1.xlsx');
    expect(screen.queryByRole('button', { name: 'Retire' })).toBeNull();
    stop();
  });
});

describe('the mappings of an organisation', () => {
  it('are listed with laboratory, version and the revisions that were read with them', async () => {
    const { stop } = openAll();
    const row = (await screen.findByRole('link', { name: mapping.name })).closest('tr');
    expect(row?.textContent).toContain('Brightwater Central Laboratory');
    expect(row?.textContent).toContain('9 March 2026, Dele Fairweather');
    stop();
  });

  const document = {
    format: 'clauseway/mapping@1',
    laboratory: 'Elsewhere',
    fingerprint: 'f',
    version: 1,
    rules: [],
  };
  const give = (text: string) => {
    const input = globalThis.document.querySelector<HTMLInputElement>('input[type=file]');
    if (!input) throw new Error('no file input');
    fireEvent.change(input, { target: { files: [new File([text], 'layout.json')] } });
  };

  it('are imported only after what would change is shown', async () => {
    const { sent, stop } = openAll({
      'POST /api/mappings/import/preview': {
        replaces: null,
        added: ['Cells under “Va” are air voids.'],
        removed: [],
        unchanged: 0,
        text: 'It would be a new mapping.',
      },
      'POST /api/mappings/import': aMappingView(),
    });
    await screen.findByRole('link', { name: mapping.name });
    give(JSON.stringify(document));
    await screen.findByText('It would be a new mapping.');
    expect(sent.some(({ path }) => path === '/api/mappings/import')).toBe(false);
    fireEvent.click(screen.getByRole('button', { name: 'Import it' }));
    await waitFor(() => expect(sent.some(({ path }) => path === '/api/mappings/import')).toBe(true));
    await screen.findByText('elsewhere');
    stop();
  });

  it('name every fault of a document that is none, with its place', async () => {
    const { stop } = openAll();
    await screen.findByRole('link', { name: mapping.name });
    give(JSON.stringify({ ...document, rules: [{ id: '' }] }));
    expect((await screen.findAllByText(/layout\.json, rules\/0\//)).length).toBeGreaterThan(1);
    give('not json');
    await screen.findByText(/layout\.json is not a mapping document/);
    stop();
  });
});
