import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeDeviation, makeRun, makeStartSheet } from '../testing/runs';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as RunStart } from './run-start';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('trainee')));
afterEach(() => {
  server.restore();
  sessionStorage.clear();
  closeSession('left');
});

function openPage(sheet: object, more: Parameters<typeof fakeServer>[0] = {}) {
  server = fakeServer({ 'GET /api/runs/start-sheet/revision-3': () => ({ body: sheet }), ...more });
  const page = (
    <StatusLineProvider>
      <RunStart />
    </StatusLineProvider>
  );
  return renderRoutes(
    [
      { path: '/runs/start', element: page },
      { path: '/runs/:code', element: <p>the run</p> },
    ],
    '/runs/start?revision=revision-3',
  );
}

describe('starting a run', () => {
  it('asks which lens is fitted and for the steps that must be ticked, and sends nothing before', async () => {
    const { user } = openPage(makeStartSheet());
    await user.selectOptions(await screen.findByLabelText('Lens fitted now'), 'F254');
    await user.click(screen.getByRole('button', { name: 'Start the run' }));
    expect(await screen.findByRole('link', { name: 'Lens fitted now: Fit F160 first: another lens makes another mark' })).toBeVisible();
    expect(screen.getByRole('link', { name: 'Set-up: Do and tick step 1 first' })).toBeVisible();
    expect(server.requests.filter(({ method }) => method === 'POST')).toEqual([]);
  });

  it('takes over what was ticked at the look-up, starts, and forgets the ticks', async () => {
    sessionStorage.setItem('proofplate.ticks.revision-3', JSON.stringify(['set-up.0', 'setting.0.powerPercent']));
    const { user, router } = openPage(makeStartSheet(), { 'POST /api/runs': () => ({ status: 201, body: makeRun() }) });
    await user.selectOptions(await screen.findByLabelText('Lens fitted now'), 'F160');
    await user.type(screen.getByLabelText(/^Job/), 'J-26-0411');
    await user.click(screen.getByRole('button', { name: 'Start the run' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/runs/J-0007'));
    expect(server.bodies('POST /api/runs')).toEqual([
      expect.objectContaining({
        kind: 'production',
        revisionId: 'revision-3',
        lensFittedId: 'f160',
        jobReference: 'J-26-0411',
        ticks: ['set-up.0', 'setting.0.powerPercent'],
        clientId: expect.stringMatching(/^[0-9a-f-]{36}$/),
      }),
    ]);
    expect(sessionStorage.getItem('proofplate.ticks.revision-3')).toBeNull();
  });

  it('keeps one client id over tries, so that a lost answer makes no second run', async () => {
    sessionStorage.setItem('proofplate.ticks.revision-3', JSON.stringify(['set-up.0']));
    let tries = 0;
    const { user, router } = openPage(makeStartSheet(), {
      'POST /api/runs': () => {
        tries += 1;
        if (tries === 1) throw new TypeError('fetch failed');
        return { status: 201, body: makeRun() };
      },
    });
    await user.selectOptions(await screen.findByLabelText('Lens fitted now'), 'F160');
    await user.click(screen.getByRole('button', { name: 'Start the run' }));
    expect(await screen.findByText('No answer came from the server.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Start the run' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/runs/J-0007'));
    const ids = server.bodies('POST /api/runs').map((body) => (body as { clientId: string }).clientId);
    expect(new Set(ids).size).toBe(1);
  });

  it('says why the server refuses', async () => {
    sessionStorage.setItem('proofplate.ticks.revision-3', JSON.stringify(['set-up.0']));
    const { user } = openPage(makeStartSheet(), { 'POST /api/runs': () => problem(409, 'not-approved', 'This revision is not approved') });
    await user.selectOptions(await screen.findByLabelText('Lens fitted now'), 'F160');
    await user.click(screen.getByRole('button', { name: 'Start the run' }));
    expect(await screen.findByText('This revision is not approved.')).toBeVisible();
  });

  it('tells a trainee who granted a deviation and until when, and cites it', async () => {
    sessionStorage.setItem('proofplate.ticks.revision-3', JSON.stringify(['set-up.0']));
    const sheet = makeStartSheet({ deviations: [makeDeviation()] });
    const { user } = openPage(sheet, { 'POST /api/runs': () => ({ status: 201, body: makeRun() }) });
    const panel = await screen.findByRole('region', { name: 'Deviations' });
    expect(within(panel).getByText(/^Granted by Hanne Voss, until 20 May 2026 18:00 CEST or for 50 parts/)).toBeVisible();
    expect(within(panel).queryByRole('button')).toBeNull();
    await user.selectOptions(screen.getByLabelText('Lens fitted now'), 'F160');
    await user.selectOptions(screen.getByRole('combobox', { name: /^Deviation/ }), 'Power 28 % for the thin sheet');
    await user.click(screen.getByRole('button', { name: 'Start the run' }));
    await waitFor(() => expect(server.bodies('POST /api/runs')).toEqual([expect.objectContaining({ deviationId: 'd1' })]));
  });

  it('lets a lead grant a deviation where it is missing', async () => {
    openSession(makeSessionAnswer('lead'));
    const { user } = openPage(makeStartSheet());
    await user.click(await screen.findByRole('button', { name: 'Grant a deviation' }));
    expect(screen.getByRole('dialog', { name: 'Grant a deviation from R-0031 revision 3' })).toBeVisible();
  });

  it('cannot start under a hold, and shows it first', async () => {
    const hold = { id: 'h', subject: 'recipe', reason: 'Marks come off', placedBy: 'Hanne Voss' };
    openPage(makeStartSheet({ holds: [hold] }));
    expect(await screen.findByText('R-0031 Dial, white on black is on hold. Start no run.')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Start the run' })).toBeDisabled();
  });
});
