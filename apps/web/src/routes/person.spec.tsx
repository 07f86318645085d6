import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession, type Role } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as PersonPage } from './person';

const lead = {
  ...{ id: 'member-2', printedName: 'Noor Adeyemi', email: 'noor@tidewater.example', role: 'lead', signsFor: null as unknown },
  ...{ state: 'active', createdAt: '2026-04-20T08:00:00Z', removedAt: null, version: 4, allowedActions: ['edit', 'remove'] },
};
const training = {
  ...{ id: 'training-1', subject: 'Fire watch', taughtBy: 'Jo Lind', taughtOn: '2020-01-01', expiresOn: '2020-12-31', isExpired: true },
  ...{ recordedBy: 'Hanne Voss', recordedAt: '2020-01-02T08:00:00Z' },
};
const answers = {
  'GET /api/members/member-2': () => ({ body: lead }),
  'GET /api/members/member-2/training-records': () => ({ body: { items: [training] } }),
  'GET /api/effects': () => ({ body: { items: [{ id: 'effect-1', name: 'Dark anneal' }] } }),
};
const page = (
  <StatusLineProvider>
    <PersonPage />
  </StatusLineProvider>
);

let server: ReturnType<typeof fakeServer>;
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(handlers: Parameters<typeof fakeServer>[0] = {}, role: Role = 'owner') {
  openSession(makeSessionAnswer(role));
  server = fakeServer({ ...answers, ...handlers });
  return renderRoutes([{ path: '/people/:memberId', element: page }], '/people/member-2');
}

describe("a member's page", () => {
  it('shows what was taught and that it no longer counts', async () => {
    openPage();
    expect(await screen.findByRole('heading', { name: 'Noor Adeyemi', level: 1 })).toBeVisible();
    const row = await screen.findByRole('row', { name: /Fire watch/ });
    expect(row).toHaveTextContent('31 Dec 2020');
    expect(row).toHaveTextContent('Run out');
  });

  it('writes a training down and keeps what was typed when a day is refused', async () => {
    let isRefusing = true;
    const { user } = openPage({
      'POST /api/members/member-2/training-records': () =>
        isRefusing
          ? problem(422, 'invalid-fields', 'Some days need another look', {
              errors: [{ pointer: '#/taughtOn', detail: 'This day is still to come.' }],
            })
          : { status: 201, body: { items: [training] } },
    });
    await user.click(await screen.findByRole('button', { name: 'Add a training' }));
    const dialog = screen.getByRole('dialog', { name: 'Training of Noor Adeyemi' });
    await user.click(within(dialog).getByRole('button', { name: 'Write it down' }));
    expect(within(dialog).getAllByText('Say what was taught').length).toBeGreaterThan(0);
    await user.type(within(dialog).getByLabelText('What was taught'), 'Laser safety');
    await user.type(within(dialog).getByLabelText('Who taught it'), 'R. Amsel');
    await user.type(within(dialog).getByLabelText('When'), '2999-02-03');
    await user.click(within(dialog).getByRole('button', { name: 'Write it down' }));
    expect((await within(dialog).findAllByText('This day is still to come.')).length).toBeGreaterThan(0);
    expect(within(dialog).getByLabelText('What was taught')).toHaveValue('Laser safety');
    isRefusing = false;
    await user.click(within(dialog).getByRole('button', { name: 'Write it down' }));
    expect(await screen.findByText('Laser safety is written down.')).toBeVisible();
    expect(server.bodies('POST /api/members/member-2/training-records').at(-1)).toEqual({
      ...{ subject: 'Laser safety', taughtBy: 'R. Amsel', taughtOn: '2999-02-03' },
    });
  });

  it('names the processes that a lead signs for, against the version that was read', async () => {
    const { user } = openPage({ 'PATCH /api/members/member-2': () => ({ body: { ...lead, version: 5 } }) });
    expect(await screen.findByText('Every process of the shop.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Choose the processes' }));
    await user.click(screen.getByRole('radio', { name: 'Only these' }));
    const effect = await screen.findByRole('group', { name: 'Dark anneal' });
    await user.click(within(effect).getByRole('checkbox', { name: 'Fibre, Q-switched' }));
    await user.click(screen.getByRole('button', { name: 'Save' }));
    await waitFor(() =>
      expect(server.bodies('PATCH /api/members/member-2')).toEqual([
        { signsFor: [{ effectId: 'effect-1', sourceKind: 'fibre-q-switched' }] },
      ]),
    );
    expect(server.requests.find(({ method }) => method === 'PATCH')?.headers.get('if-match')).toBe('"v4"');
  });

  it('only shows to a lead', async () => {
    openPage({ 'GET /api/members/member-2': () => ({ body: { ...lead, allowedActions: [] } }) }, 'lead');
    await screen.findByRole('row', { name: /Fire watch/ });
    expect(screen.queryByRole('button', { name: 'Add a training' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Choose the processes' })).toBeNull();
  });
});
