import { screen } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as AccountPage } from './account';

const session = (id: string, given: object) => ({
  ...{ id, isCurrent: false, shopName: 'Tidewater Marking', startedAt: '2026-05-01T08:00:00Z', lastSeenAt: '2026-05-14T08:00:00Z' },
  ...{ expiresAt: '2026-05-21T08:00:00Z', userAgent: null },
  ...given,
});
const here = session('session-1', { isCurrent: true, userAgent: 'Mozilla/5.0 (X11; Linux x86_64) Gecko/20100101 Firefox/140.0' });
const there = session('session-2', { userAgent: 'Mozilla/5.0 (Linux; Android 15) AppleWebKit/537.36 Chrome/156.0.0.0 Mobile' });
const page = (
  <StatusLineProvider>
    <AccountPage />
  </StatusLineProvider>
);

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(handlers: Parameters<typeof fakeServer>[0] = {}) {
  server = fakeServer({ 'GET /api/auth/sessions': () => ({ body: { items: [here, there] } }), ...handlers });
  return renderRoutes([{ path: '*', element: page }], '/account');
}

describe('the account page', () => {
  it('lists devices in words and signs another one out, never this one', async () => {
    const { user } = openPage({ 'DELETE /api/auth/sessions/session-2': () => ({ status: 204 }) });
    expect(await screen.findByText('Firefox on Linux')).toBeVisible();
    expect(screen.queryByRole('button', { name: /Sign out Firefox on Linux/ })).toBeNull();
    await user.click(screen.getByRole('button', { name: 'Sign out Chrome or Chromium on Android, last used 14 May 2026 10:00 CEST' }));
    expect(await screen.findByText('Chrome or Chromium on Android is signed out.')).toBeVisible();
  });

  it('changes the password and says what that ends', async () => {
    const { user } = openPage({ 'POST /api/auth/change-password': () => ({ status: 204 }) });
    await user.type(screen.getByLabelText('Present password'), 'violet kettle on the roof');
    await user.type(screen.getByLabelText('New password'), 'slow barges under willow');
    await user.click(screen.getByRole('button', { name: 'Change the password' }));
    expect(await screen.findByText('The password is changed. Every other device is signed out.')).toBeVisible();
    expect(screen.getByLabelText('Present password')).toHaveValue('');
    expect(server.bodies('POST /api/auth/change-password')).toEqual([
      { password: 'violet kettle on the roof', newPassword: 'slow barges under willow' },
    ]);
  });

  it('shows at its field that the present password is wrong, and keeps what was typed', async () => {
    const { user } = openPage({
      'POST /api/auth/change-password': () =>
        problem(403, 'password-not-confirmed', 'The password is not right', {
          errors: [{ pointer: '#/password', detail: 'This is not your password.' }],
        }),
    });
    await user.type(screen.getByLabelText('Present password'), 'wrong');
    await user.type(screen.getByLabelText('New password'), 'slow barges under willow');
    await user.click(screen.getByRole('button', { name: 'Change the password' }));
    expect((await screen.findAllByText('This is not your password.')).length).toBeGreaterThan(0);
    expect(screen.getByLabelText('New password')).toHaveValue('slow barges under willow');
  });
});
