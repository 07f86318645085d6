import { screen } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as ShopSettingsPage } from './shop-settings';

const policy = {
  ...{ minimumConfirmationMarks: 3, authorMaySign: false, reviewEveryDays: 365, overdueBlocks: false, photoRequired: true },
  ...{ calibrationAgeDays: 180, powerShiftPercent: 5, secondFactorForSigning: false },
};
const shop = {
  ...{ id: 'shop-1', name: 'Tidewater Marking', unitSystem: 'metric', timeZone: 'Europe/Berlin', locale: 'en-GB', policy },
  ...{ createdAt: '2026-04-20T08:00:00Z', version: 7, allowedActions: ['edit', 'changePolicy'] },
};

let server: ReturnType<typeof fakeServer>;
afterEach(() => {
  server.restore();
  closeSession('left');
});

describe('the rules for signing', () => {
  it('offers no second factor, which accounts do not have, and signs the other rules without one', async () => {
    openSession(makeSessionAnswer('owner'));
    server = fakeServer({ 'GET /api/shop': () => ({ body: shop }), 'PATCH /api/shop': () => ({ body: { ...shop, version: 8 } }) });
    const element = (
      <StatusLineProvider>
        <ShopSettingsPage />
      </StatusLineProvider>
    );
    const { user } = renderRoutes([{ path: '/shop', element }], '/shop');
    await user.click(await screen.findByRole('switch', { name: 'An overdue setting blocks runs' }));
    expect(screen.queryByRole('switch', { name: /second factor/ })).not.toBeInTheDocument();
    await user.type(screen.getByLabelText('Your password'), 'kettle on the roof');
    await user.click(screen.getByRole('button', { name: 'Sign the rules' }));
    expect(await screen.findByText('The rules are signed and in force.')).toBeVisible();
    const signed = { policy: { ...policy, overdueBlocks: true }, password: 'kettle on the roof' };
    expect(server.bodies('PATCH /api/shop')).toEqual([signed]);
  });
});
