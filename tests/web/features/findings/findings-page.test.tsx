// @vitest-environment happy-dom
import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aCheckView, aNote, aWaiver } from '#tests/builders/a-check-view';
import { aFinding } from '#tests/builders/a-finding';
import { aRevision, noAbilities } from '#tests/builders/a-revision';
import { aSession } from '#tests/builders/a-session';
import { FindingsPage } from '../../../../web/features/findings/components/findings-page';
import { aProblemResponse, listenToAnnouncements, renderPage, stubServer } from '../../render-page';

const submittalId = '0192f0a0-0000-7000-8000-000000000001';
const base = `/api/submittals/${submittalId}/revisions/1`;
const at = `/submittals/${submittalId}/r/1`;
const path = '/submittals/:submittalId/r/:number';

const vfa = aFinding({
  rule: 'vfa',
  clause: '412.03(c)',
  title: 'Voids filled with asphalt',
  requirement: 'Voids filled with asphalt are 65 to 75 %.',
  outcome: 'pass',
  margin: 3,
});

async function open(options: { abilities?: object; check?: object; hash?: string; answers?: object } = {}) {
  const sent = stubServer({
    'GET /api/session': aSession(),
    [`GET ${base}`]: aRevision({ abilities: { ...noAbilities, ...options.abilities } }),
    [`GET ${base}/check`]: aCheckView({ findings: [aFinding(), vfa], ...options.check }),
    ...options.answers,
  });
  const page = renderPage(<FindingsPage />, { path, at: at + (options.hash ?? '') });
  await screen.findByRole('heading', { level: 1 });
  return { ...page, sent };
}
/** The dimmed section and the letter are two elements, between which some name computations put a space. */
const clauseButton = (clause: string) =>
  screen.getByRole('button', { name: (name) => name.replace(/\s/g, '') === clause });

describe('the findings page', () => {
  it('heads with the mix and lists every outcome with its clauses as links', async () => {
    await open();
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe(
      'BW-125-S4 revision 1, Brightwater Paving',
    );
    const index = screen.getAllByRole('list')[0];
    const link = within(index ?? document.body).getByRole('link', { name: '412.03(b)' });
    expect(link.getAttribute('href')).toBe(`${at}#vma~design-point`);
  });

  it('says in the thread why this limit, what would pass and what would decide', async () => {
    const undecided = aFinding({
      rule: 'tsr',
      clause: '412.05(a)',
      outcome: 'undecided',
      margin: null,
      wouldDecide: 'Add 1 more result of the same kind.',
    });
    const way = { quantity: 'binder-content', name: 'Pb', unit: '%', present: 5.3, from: 5.37, to: 5.49 };
    await open({
      check: {
        findings: [
          aFinding({
            limit: {
              ...aFinding().limit!,
              from: {
                document: 'Section 412, 2026',
                table: null,
                tableTitle: null,
                row: null,
                displaced: [],
              },
            },
          }),
          undecided,
        ],
        explanations: {
          'vma~design point': {
            whyThisLimit: 'Section 412, 2026 sets it in the rule itself.',
            toPass: [{ ...way, words: 'Pb of 5.37 to 5.49 % instead of 5.30 (the room to move)' }],
          },
        },
      },
    });
    fireEvent.click(clauseButton('412.03(b)'));
    expect(screen.getByText(/sets it in the rule itself/)).toBeTruthy();
    expect(screen.getByText('To pass').nextElementSibling?.textContent).toBe(
      'Pb of 5.37 to 5.49 % instead of 5.30 (the room to move).',
    );
    fireEvent.click(clauseButton('412.05(a)'));
    expect(screen.getByText('Would decide it').nextElementSibling?.textContent).toBe(
      'Add 1 more result of the same kind.',
    );
  });

  it('leads to the room to move where there is one', async () => {
    await open({ check: { hasRoom: true } });
    expect(screen.getByRole('link', { name: 'Room to move' }).getAttribute('href')).toBe(`${at}/room`);
  });

  it('opens a row in place with its rule, rounding and cell, and closes it again', async () => {
    await open();
    const button = clauseButton('412.03(b)');
    expect(button.getAttribute('aria-expanded')).toBe('false');
    fireEvent.click(button);
    expect(button.getAttribute('aria-expanded')).toBe('true');
    expect(screen.getByText('13.94 becomes 13.9: ASTM E29, rounding method, to 0.1')).toBeTruthy();
    expect(screen.getByText(/Trials G9 holds 13.9/)).toBeTruthy();
    fireEvent.click(button);
    expect(button.getAttribute('aria-expanded')).toBe('false');
  });

  it('walks the rows with J and K', async () => {
    const { stop } = await open();
    fireEvent.keyDown(document.body, { key: 'j' });
    expect(document.activeElement).toBe(clauseButton('412.03(b)'));
    fireEvent.keyDown(document.activeElement ?? document.body, { key: 'j' });
    expect(document.activeElement).toBe(clauseButton('412.03(c)'));
    fireEvent.keyDown(document.activeElement ?? document.body, { key: 'k' });
    expect(document.activeElement).toBe(clauseButton('412.03(b)'));
    stop();
  });

  it('opens the row that the address names by its clause', async () => {
    const { stop } = await open({ hash: '#412.03(b)' });
    await waitFor(() => expect(clauseButton('412.03(b)').getAttribute('aria-expanded')).toBe('true'));
    stop();
  });

  it('keeps a note on the row in focus, for whom its writer says', async () => {
    const { sent, stop } = await open({
      abilities: { note: true },
      answers: { [`POST ${base}/notes`]: aNote() },
    });
    act(() => clauseButton('412.03(b)').focus());
    fireEvent.keyDown(clauseButton('412.03(b)'), { key: 'n' });
    const field = await screen.findByLabelText('Note on 412.03(b)');
    fireEvent.change(field, { target: { value: 'Bring the voids up.' } });
    fireEvent.click(screen.getByLabelText('internal'));
    fireEvent.click(screen.getByText('Keep the note'));
    await waitFor(() => expect(sent.some((request) => request.method === 'POST')).toBe(true));
    expect(sent.find((request) => request.method === 'POST')?.body).toEqual({
      finding: 'vma~design point',
      kind: 'internal',
      text: 'Bring the voids up.',
      answers: null,
    });
    stop();
  });

  it('asks for the reason before a waiver is sent', async () => {
    const { sent, stop } = await open({ abilities: { note: true, waiveRequired: true } });
    act(() => clauseButton('412.03(b)').focus());
    fireEvent.keyDown(clauseButton('412.03(b)'), { key: 'w' });
    fireEvent.click(await screen.findByText('Waive 412.03(b)'));
    expect(screen.getByText('Give the reason.')).toBeTruthy();
    expect(sent.every((request) => request.method === 'GET')).toBe(true);
    stop();
  });

  it('offers no waiver of a pass, nor to a reader who may not', async () => {
    const { stop } = await open({ abilities: { note: true, waiveRequired: true } });
    fireEvent.click(clauseButton('412.03(c)'));
    expect(screen.queryByText('Waive with a reason')).toBeNull();
    fireEvent.click(clauseButton('412.03(b)'));
    expect(screen.getByText('Waive with a reason')).toBeTruthy();
    stop();
  });

  it('says why W does nothing on a row that cannot be waived', async () => {
    const said = listenToAnnouncements();
    const { stop } = await open({ abilities: { waiveAdvisory: true } });
    fireEvent.keyDown(document.body, { key: 'w' });
    act(() => clauseButton('412.03(c)').focus());
    fireEvent.keyDown(clauseButton('412.03(c)'), { key: 'w' });
    act(() => clauseButton('412.03(b)').focus());
    fireEvent.keyDown(clauseButton('412.03(b)'), { key: 'w' });
    expect(said).toEqual([
      'Go to the row of a fail first.',
      '412.03(c) is pass; only a fail can be waived.',
      '412.03(b) is required; you may not waive it.',
    ]);
    expect(screen.queryByLabelText('Reason for waiving 412.03(b)')).toBeNull();
    stop();
  });

  it('edits the note of the row in focus with E', async () => {
    const { stop } = await open({
      abilities: { note: true },
      check: { notes: [aNote({ abilities: { change: true, remove: true, reply: false } })] },
    });
    act(() => clauseButton('412.03(b)').focus());
    fireEvent.keyDown(clauseButton('412.03(b)'), { key: 'e' });
    expect(await screen.findByDisplayValue('Please bring the voids up.')).toBeTruthy();
    stop();
  });

  it('says that a waiver still stands where it could not be taken back', async () => {
    const waiver = aWaiver({ abilities: { remove: true } });
    await open({
      abilities: { waiveRequired: true },
      check: { waivers: [waiver] },
      answers: { [`DELETE /api/waivers/${waiver.id}`]: aProblemResponse('version-stale', 412) },
    });
    fireEvent.click(clauseButton('412.03(b)'));
    fireEvent.click(screen.getByText('Take the waiver back'));
    expect(await screen.findByText(/The waiver still stands\./)).toBeTruthy();
  });

  it('leads to the decision only who may take it', async () => {
    await open();
    expect(screen.queryByText('Decide and return')).toBeNull();
  });

  it('bars and strikes what moved since the revision before', async () => {
    const { container } = await open({
      check: {
        moved: [
          { key: 'vma~design point', previousOutcome: 'fail', previousText: '13.2', previousLimit: null },
        ],
      },
    });
    expect(container.querySelectorAll('.is-changed')).toHaveLength(1);
    expect(container.querySelector('.is-changed del')?.textContent).toBe('13.2');
  });

  it('says why the check is stale and makes another', async () => {
    const { sent } = await open({
      abilities: { checkAgain: true },
      check: { stale: 'The letting date of the project has changed.' },
      answers: { [`POST ${base}/checks`]: aCheckView() },
    });
    expect(screen.getByText('The letting date of the project has changed.')).toBeTruthy();
    fireEvent.click(screen.getByText('Check again'));
    await waitFor(() => expect(sent.some(({ path: asked }) => asked.endsWith('/checks'))).toBe(true));
  });

  it('submits only under its declaration, with the seal that was seen', async () => {
    const { sent } = await open({
      abilities: { submit: true },
      check: { declaration: 'The check lists one fail: 412.03(b).' },
      answers: { [`POST ${base}/submission`]: aRevision() },
    });
    expect(screen.getByText('The check lists one fail: 412.03(b).')).toBeTruthy();
    const button = screen.getByRole('button', { name: 'Submit revision 1' });
    fireEvent.click(button);
    expect(screen.getByText('Tick the declaration before submitting.')).toBeTruthy();
    fireEvent.click(screen.getByLabelText('I declare this for Brightwater Paving.'));
    fireEvent.click(button);
    await waitFor(() => expect(sent.some((request) => request.method === 'POST')).toBe(true));
    const request = sent.find(({ method }) => method === 'POST');
    expect(request?.headers.get('If-Match')).toBe('"3"');
    expect(request?.body).toMatchObject({ accepted: true, seal: aCheckView().seal.seal });
  });

  it('withdraws only with a reason', async () => {
    const { sent } = await open({
      abilities: { withdraw: true },
      answers: { [`POST ${base}/withdrawal`]: aRevision({ state: 'withdrawn' }) },
    });
    fireEvent.click(screen.getByText('Withdraw'));
    fireEvent.click(screen.getByText('Withdraw revision 1'));
    expect(screen.getByText('Say why.')).toBeTruthy();
    fireEvent.change(screen.getByLabelText('Why it is withdrawn'), { target: { value: 'Wrong binder.' } });
    fireEvent.click(screen.getByText('Withdraw revision 1'));
    await waitFor(() => expect(sent.some((request) => request.method === 'POST')).toBe(true));
    expect(sent.find((request) => request.method === 'POST')?.body).toEqual({ reason: 'Wrong binder.' });
  });

  it('keeps the note and says what to do where it could not be kept', async () => {
    const { stop } = await open({
      abilities: { note: true },
      answers: { [`POST ${base}/notes`]: aProblemResponse('not-allowed', 403, { fix: 'Ask a reviewer.' }) },
    });
    fireEvent.click(clauseButton('412.03(b)'));
    fireEvent.click(screen.getByText('Write a note on 412.03(b)'));
    const field = await screen.findByLabelText('Note on 412.03(b)');
    fireEvent.change(field, { target: { value: 'Kept text' } });
    fireEvent.click(screen.getByText('Keep the note'));
    expect(await screen.findByText(/Ask a reviewer\./)).toBeTruthy();
    expect(screen.getByDisplayValue('Kept text')).toBeTruthy();
    stop();
  });
});
