import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as PeoplePage } from './people';

const member = (id: string, printedName: string, role: string) => ({
  id,
  printedName,
  email: `${id}@tidewater.example`,
  role,
  state: 'active',
  createdAt: '2026-04-20T08:00:00Z',
  removedAt: null,
  signsFor: null,
  version: 2,
  allowedActions: ['edit', 'remove'],
});
const lists = {
  'GET /api/members': () => ({
    body: { items: [member('member-1', 'Hanne Voss', 'owner'), member('member-2', 'Jonah Pell', 'trainee')], nextCursor: null },
  }),
  'GET /api/invitations': () => ({ body: { items: [], nextCursor: null } }),
  'GET /api/undelivered-letters': () => ({ body: { items: [] } }),
};
const page = (
  <StatusLineProvider>
    <PeoplePage />
  </StatusLineProvider>
);

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('owner')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

async function openPage(handlers: Parameters<typeof fakeServer>[0] = {}) {
  server = fakeServer({ ...lists, ...handlers });
  const rendered = renderRoutes([{ path: '*', element: page }], '/people');
  await screen.findByText('Jonah Pell');
  return rendered;
}

describe('the people page', () => {
  it('changes a role against the version that was read', async () => {
    const { user } = await openPage({ 'PATCH /api/members/member-2': () => ({ body: member('member-2', 'Jonah Pell', 'operator') }) });
    await user.click(screen.getByRole('button', { name: 'Change the role of Jonah Pell' }));
    const dialog = screen.getByRole('dialog', { name: 'Role of Jonah Pell' });
    await user.selectOptions(within(dialog).getByLabelText('Role'), 'operator');
    await user.click(within(dialog).getByRole('button', { name: 'Change the role' }));
    expect(await screen.findByText('Jonah Pell is now operator.')).toBeVisible();
    expect(server.bodies('PATCH /api/members/member-2')).toEqual([{ role: 'operator' }]);
    expect(server.requests.find(({ method }) => method === 'PATCH')?.headers.get('if-match')).toBe('"v2"');
  });

  it('asks before removing somebody, names the consequence, and offers no way to remove oneself', async () => {
    const { user } = await openPage({ 'DELETE /api/members/member-2': () => ({ status: 204 }) });
    expect(screen.queryByRole('button', { name: 'Remove Hanne Voss' })).toBeNull();
    await user.click(screen.getByRole('button', { name: 'Remove Jonah Pell' }));
    const dialog = screen.getByRole('dialog', { name: 'Remove Jonah Pell' });
    expect(dialog).toHaveTextContent('Every session in this shop ends at once');
    expect(server.requests.filter(({ method }) => method === 'DELETE')).toEqual([]);
    await user.click(within(dialog).getByRole('button', { name: 'Remove Jonah Pell' }));
    expect(await screen.findByText('Jonah Pell is removed.')).toBeVisible();
    expect(server.requests.find(({ method }) => method === 'DELETE')?.headers.get('if-match')).toBe('"v2"');
  });

  it('keeps the typed address when an invitation is refused', async () => {
    const { user } = await openPage({
      'POST /api/invitations': () => problem(409, 'already-member', 'This person is in the shop already'),
    });
    await user.click(screen.getByRole('button', { name: 'Invite somebody' }));
    await user.type(screen.getByLabelText('E-mail'), 'jonah@tidewater.example');
    await user.click(screen.getByRole('button', { name: 'Send the invitation' }));
    expect(await screen.findByText('This person is in the shop already.')).toBeVisible();
    expect(screen.getByLabelText('E-mail')).toHaveValue('jonah@tidewater.example');
    await waitFor(() => expect(server.bodies('POST /api/invitations')).toEqual([{ email: 'jonah@tidewater.example', role: 'operator' }]));
  });

  it('shows an owner which letters did not arrive, and the way out', async () => {
    const letter = { id: 'letter-1', kind: 'invitation', address: 'typo@exmaple.invalid', reason: '550 no such mailbox' };
    await openPage({
      'GET /api/undelivered-letters': () => ({ body: { items: [{ ...letter, writtenAt: '2026-05-14T08:00:00Z' }] } }),
    });
    const row = await screen.findByRole('row', { name: /typo@exmaple\.invalid/ });
    expect(row).toHaveTextContent('550 no such mailbox');
    expect(row).toHaveTextContent('Check the address and invite again');
  });

  it('says who can help when the role shows nothing', async () => {
    server = fakeServer({ ...lists, 'GET /api/members': () => problem(403, 'not-permitted', 'Your role does not allow this') });
    renderRoutes([{ path: '*', element: page }], '/people');
    expect(await screen.findByText('Your role does not show this')).toBeVisible();
  });
});
