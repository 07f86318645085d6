import { screen, waitFor } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeRun } from '../testing/runs';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as RunsPage } from './runs';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(items: object[], at = '/runs') {
  server = fakeServer({ 'GET /api/runs': () => ({ body: { items, nextCursor: null } }) });
  const page = (
    <StatusLineProvider>
      <RunsPage />
    </StatusLineProvider>
  );
  return renderRoutes([{ path: '*', element: page }], at);
}
const lastQuery = () => Object.fromEntries(server.requests.at(-1)?.query ?? []);

describe('the list of runs', () => {
  it('names job, counts and state, and leads to each run', async () => {
    openPage([makeRun(), makeRun({ id: 'run-6', code: 'J-0006', state: 'finished', good: 24, scrap: 2 })]);
    expect(await screen.findByRole('link', { name: 'J-0006' })).toHaveAttribute('href', '/runs/J-0006');
    expect(screen.getByText('24')).toBeInTheDocument();
    expect(screen.getAllByText('Under way').length).toBeGreaterThan(0);
  });

  it('shows one job with its totals for the customer who asks', async () => {
    const { user, router } = openPage([
      makeRun({ state: 'finished', good: 24, scrap: 2 }),
      makeRun({ id: 'b', code: 'J-0008', state: 'finished', good: 6, scrap: 0 }),
    ]);
    await user.click((await screen.findAllByRole('button', { name: 'Runs of job J-26-0411' }))[0] ?? document.body);
    await waitFor(() => expect(router.state.location.search).toBe('?jobReference=J-26-0411'));
    expect(await screen.findByText(/2 scrap in 2 runs/)).toBeVisible();
    expect(lastQuery()).toMatchObject({ jobReference: 'J-26-0411' });
    await user.click(screen.getByRole('button', { name: 'Remove the filter job J-26-0411' }));
    await waitFor(() => expect(router.state.location.search).toBe(''));
  });

  it('reads its filter out of the address, and offers the way back where nothing matches', async () => {
    const { user, router } = openPage([], '/runs?q=bezel&state=finished');
    expect(await screen.findByText('No run matches')).toBeVisible();
    expect(lastQuery()).toMatchObject({ q: 'bezel', state: 'finished' });
    expect(screen.getByRole('radio', { name: 'Finished' })).toBeChecked();
    await user.click(screen.getByRole('button', { name: 'Show all runs' }));
    await waitFor(() => expect(router.state.location.search).toBe(''));
  });

  it('says where a run begins when there is none', async () => {
    openPage([]);
    expect(await screen.findByText('No runs yet')).toBeVisible();
  });
});
