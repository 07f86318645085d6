import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeRun } from '../testing/runs';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as RunPage } from './run';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('trainee')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(run: object, more: Parameters<typeof fakeServer>[0] = {}) {
  server = fakeServer({ 'GET /api/runs/J-0007': () => ({ body: run }), ...more });
  const page = (
    <StatusLineProvider>
      <RunPage />
    </StatusLineProvider>
  );
  return renderRoutes([{ path: '/runs/:code', element: page }], '/runs/J-0007');
}

const released = { ok: true, by: 'member-1', byName: 'Jonah Pell', at: '2026-05-14T07:40:00.000Z', note: '', photoId: null };

describe('a run under way', () => {
  it('releases the first piece in one tap', async () => {
    const { user } = openPage(makeRun(), { 'POST /api/runs/run-7/first-piece': () => ({ body: makeRun({ firstPiece: released }) }) });
    await user.click(await screen.findByRole('button', { name: 'It matches' }));
    expect(await screen.findByText('Released')).toBeVisible();
    expect(server.bodies('POST /api/runs/run-7/first-piece')).toEqual([{ ok: true, note: '' }]);
    expect(screen.queryByRole('button', { name: 'It matches' })).toBeNull();
  });

  it('counts with big buttons and by typing, and finishes', async () => {
    const finished = makeRun({ state: 'finished', good: 25, scrap: 1, firstPiece: released, allowedActions: ['bad-result'] });
    const { user } = openPage(makeRun({ firstPiece: released }), { 'POST /api/runs/run-7/finish': () => ({ body: finished }) });
    await user.clear(await screen.findByLabelText('Good'));
    await user.type(screen.getByLabelText('Good'), '24');
    await user.click(screen.getByRole('button', { name: 'One good more' }));
    await user.click(screen.getByRole('button', { name: 'One scrap fewer' }));
    await user.click(screen.getByRole('button', { name: 'One scrap more' }));
    await user.click(screen.getByRole('button', { name: 'Finish J-0007' }));
    expect(await screen.findByText('J-0007 is finished: 25 good, 1 scrap.')).toBeVisible();
    expect(server.bodies('POST /api/runs/run-7/finish')).toEqual([{ good: 25, scrap: 1, notes: '', measurements: [] }]);
    expect(screen.queryByRole('button', { name: /^Finish/ })).toBeNull();
  });

  it('does not end without parts by a tap too early, nor with what is no count', async () => {
    const { user } = openPage(makeRun({ firstPiece: released }));
    await user.click(await screen.findByRole('button', { name: 'Finish J-0007' }));
    expect(screen.getByRole('alert')).toHaveTextContent('No part is counted yet.');
    await user.clear(screen.getByLabelText('Good'));
    await user.type(screen.getByLabelText('Good'), '2.5');
    await user.click(screen.getByRole('button', { name: 'Finish J-0007' }));
    expect(screen.getByText('Enter a whole number of parts')).toBeVisible();
    expect(server.requests.filter(({ method }) => method === 'POST')).toEqual([]);
  });

  it('says why good parts are refused and keeps the counts', async () => {
    const { user } = openPage(makeRun(), {
      'POST /api/runs/run-7/finish': () => problem(409, 'first-piece-not-released', 'The first piece was not released'),
    });
    await user.click(await screen.findByRole('button', { name: 'One good more' }));
    await user.click(screen.getByRole('button', { name: 'Finish J-0007' }));
    expect(await screen.findByText('The first piece was not released.')).toBeVisible();
    expect(screen.getByLabelText('Good')).toHaveValue('1');
  });

  it('tells a bad result in two taps', async () => {
    const bad = { outcome: 'faint', note: '', at: '2026-05-14T08:00:00.000Z', byName: 'Jonah Pell' };
    const { user } = openPage(makeRun(), { 'POST /api/runs/run-7/bad-result': () => ({ body: makeRun({ badResult: bad }) }) });
    await user.click(await screen.findByRole('button', { name: 'It went wrong' }));
    await user.click(screen.getByRole('button', { name: 'Faint' }));
    expect(await screen.findByText('Under way, bad result')).toBeVisible();
    expect(server.bodies('POST /api/runs/run-7/bad-result')).toEqual([{ outcome: 'faint', note: '' }]);
    expect(screen.queryByRole('button', { name: 'Good' })).toBeNull();
  });

  it('ticks settings and steps on the server', async () => {
    const { user } = openPage(makeRun(), {
      'PATCH /api/runs/run-7/ticks': () => ({ body: makeRun({ ticks: { 'set-up.0': 'x', 'setting.0.powerPercent': 'y' } }) }),
    });
    await user.click(await screen.findByRole('button', { name: 'Power is set' }));
    await waitFor(() => expect(screen.getByRole('button', { name: 'Power is set' })).toHaveAttribute('aria-pressed', 'true'));
    expect(server.bodies('PATCH /api/runs/run-7/ticks')).toEqual([{ tick: ['setting.0.powerPercent'], untick: [] }]);
  });

  it('stops at the top when the revision was withdrawn, says what becomes of the pieces, and puts the setting away', async () => {
    const stop = {
      because: 'withdrawn',
      by: 'Hanne Voss',
      at: '2026-05-14T08:00:00.000Z',
      reason: 'The tint came off',
      approvedNumber: null,
    };
    openPage(makeRun({ stop, firstPiece: { ...released, ok: false }, allowedActions: ['tick', 'finish', 'bad-result'] }));
    const banner = await screen.findByRole('alert');
    expect(banner).toHaveTextContent('R-0031 revision 3 was withdrawn. Mark no more pieces.');
    expect(banner).toHaveTextContent('The tint came off');
    expect(banner).toHaveTextContent('Keep the pieces already marked apart and tell a lead');
    expect(banner).toHaveTextContent('without a released first piece every part counts as scrap');
    expect(within(banner).getByRole('link', { name: 'Look for another setting' })).toHaveAttribute('href', '/machine');
    expect(screen.queryByRole('button', { name: 'Power is set' })).toBeNull();
    expect(screen.queryByText(/then mark another piece/)).toBeNull();
  });

  it('leads from a superseded revision to the one that took its place', async () => {
    const stop = { because: 'superseded', by: null, at: null, reason: '', approvedNumber: 4 };
    openPage(makeRun({ stop, firstPiece: released, allowedActions: ['tick', 'finish', 'bad-result'] }));
    const link = await screen.findByRole('link', { name: 'Open revision 4' });
    expect(link).toHaveAttribute('href', '/machine?recipe=recipe-31');
    expect(screen.getByRole('alert')).toHaveTextContent('R-0031 revision 3 was replaced. Mark no more pieces with it.');
  });

  it('puts cautions, setting and set-up before the first piece; finished, the outcome leads', async () => {
    const cautions = [{ id: 'c', level: 'care', subject: 'Clamp it', text: 'It slips.', source: 'The shop', isGeneral: false }];
    const { unmount } = openPage(makeRun({ cautions }));
    const names = async () => {
      await screen.findByRole('region', { name: 'About the run' });
      return screen
        .getAllByText(/^(Clamp it|Set-up|First piece|Count and finish)$/)
        .filter((found) => found.closest('summary') === null)
        .map(({ textContent }) => textContent);
    };
    expect(await names()).toEqual(['Clamp it', 'Set-up', 'First piece', 'Count and finish']);
    unmount();
    openPage(makeRun({ cautions, state: 'finished', firstPiece: released, allowedActions: ['bad-result'] }));
    expect(await names()).toEqual(['First piece', 'Set-up']);
  });

  it('says what comes next after a piece that does not match and after a bad result', async () => {
    const bad = { outcome: 'faint', note: '', at: '2026-05-14T08:00:00.000Z', byName: 'Jonah Pell' };
    openPage(makeRun({ firstPiece: { ...released, ok: false }, badResult: bad }));
    const [afterPiece, afterResult] = (await screen.findAllByText('Stop the batch.')).map((found) => found.parentElement);
    expect(afterPiece).toHaveTextContent('tell a lead: a lead can put the setting on hold');
    expect(afterResult).toHaveTextContent('The leads were told by letter');
  });

  it('forgets why finishing was refused as soon as the first piece is released', async () => {
    const { user } = openPage(makeRun(), {
      'POST /api/runs/run-7/finish': () => problem(409, 'first-piece-not-released', 'The first piece was not released'),
      'POST /api/runs/run-7/first-piece': () => ({ body: makeRun({ firstPiece: released, version: 2 }) }),
    });
    await user.click(await screen.findByRole('button', { name: 'One good more' }));
    await user.click(screen.getByRole('button', { name: 'Finish J-0007' }));
    expect(await screen.findByText('The first piece was not released.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'It matches' }));
    expect(await screen.findByText('Released')).toBeVisible();
    expect(screen.queryByText('The first piece was not released.')).toBeNull();
    expect(screen.getByLabelText('Good')).toHaveValue('1');
  });

  it('looks again at once when an act is refused by what happened meanwhile', async () => {
    let stop: object | null = null;
    server = fakeServer({
      'GET /api/runs/J-0007': () => ({ body: makeRun({ stop }) }),
      'POST /api/runs/run-7/first-piece': () => {
        stop = { because: 'withdrawn', by: null, at: null, reason: '', approvedNumber: null };
        return problem(409, 'not-approved', 'This revision is not approved');
      },
    });
    const page = (
      <StatusLineProvider>
        <RunPage />
      </StatusLineProvider>
    );
    const { user } = renderRoutes([{ path: '/runs/:code', element: page }], '/runs/J-0007');
    await user.click(await screen.findByRole('button', { name: 'It matches' }));
    expect(await screen.findByText('R-0031 revision 3 was withdrawn. Mark no more pieces.')).toBeVisible();
  });

  it('leads a trainee to the machine and others to the recipe', async () => {
    const { unmount } = openPage(makeRun());
    expect(await screen.findByRole('link', { name: 'R-0031 revision 3' })).toHaveAttribute('href', '/machine?recipe=recipe-31');
    unmount();
    openSession(makeSessionAnswer('operator'));
    openPage(makeRun());
    expect(await screen.findByRole('link', { name: 'R-0031 revision 3' })).toHaveAttribute('href', '/recipes/R-0031');
  });

  it('shows a hold first and takes the release of the first piece away', async () => {
    const hold = { id: 'h', subject: 'machine', reason: 'Fumes', placedBy: 'Hanne Voss' };
    openPage(makeRun({ holds: [hold], allowedActions: ['tick', 'finish', 'bad-result'] }));
    expect(await screen.findByText('Bench 2 is on hold. Start no run.')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'It matches' })).toBeNull();
  });
});

describe('a confirmation run', () => {
  it('measures pieces and sends them with their numbers', async () => {
    const run = makeRun({ kind: 'confirmation', revision: { id: 'r', number: null, state: 'draft' } });
    const { user } = openPage(run, { 'POST /api/runs/run-7/finish': () => ({ body: { ...run, state: 'finished', allowedActions: [] } }) });
    await user.click(await screen.findByRole('button', { name: 'One good more' }));
    await user.click(screen.getByRole('button', { name: 'Add a measurement' }));
    await user.click(screen.getByRole('button', { name: 'Finish J-0007' }));
    expect(screen.getByText('Enter the value.')).toBeVisible();
    await user.type(screen.getByLabelText('Value'), '0.95');
    await user.click(screen.getByRole('button', { name: 'Finish J-0007' }));
    await waitFor(() =>
      expect(server.bodies('POST /api/runs/run-7/finish')).toEqual([
        { good: 1, scrap: 0, notes: '', measurements: [{ piece: 1, quantity: 'contrast', value: 0.95, method: 'photo' }] },
      ]),
    );
  });

  it('shows afterwards which pieces are within the criteria', async () => {
    const measured = (piece: number, meets: boolean | null) => ({
      piece,
      quantity: 'contrast',
      value: 0.9,
      unit: '1',
      method: 'photo',
      meets,
    });
    openPage(
      makeRun({
        kind: 'confirmation',
        state: 'finished',
        allowedActions: [],
        measurements: [measured(1, true), measured(2, false), measured(3, null)],
      }),
    );
    const rows = within(await screen.findByRole('list', { name: 'Measured pieces' })).getAllByRole('listitem');
    expect(rows.map((row) => row.textContent)).toEqual([
      expect.stringContaining('within'),
      expect.stringContaining('outside'),
      expect.stringContaining('no criterion'),
    ]);
  });
});
