import { screen, waitFor } from '@testing-library/react';
import { renderRoutes } from '../../testing/render';
import { RoleGate } from './role-gate';

const openAt = (address: string, role: 'trainee' | 'operator' | 'lead') =>
  renderRoutes(
    [
      {
        path: '*',
        element: (
          <RoleGate role={role}>
            <p>The page itself</p>
          </RoleGate>
        ),
      },
    ],
    address,
  );

it.each([
  '/coupons',
  '/coupons/plan',
  '/coupons/C-0001/mark',
  '/equipment',
  '/materials/effects',
  '/sign-off',
  '/people',
  '/ledger',
  '/recipes',
])('refuses a trainee %s before anything of it is shown', (address) => {
  openAt(address, 'trainee');
  expect(screen.getByRole('heading', { name: 'Your role does not show this' })).toBeVisible();
  expect(screen.queryByText('The page itself')).toBeNull();
  expect(screen.getByRole('link', { name: 'Go to the machine' })).toHaveAttribute('href', '/machine');
});

it.each([
  ['/machine', 'trainee'],
  ['/runs/J-0001', 'trainee'],
  ['/part-set-up', 'trainee'],
  ['/coupons/plan', 'operator'],
  ['/equipment', 'operator'],
  ['/equipment/machines/new', 'lead'],
] as const)('opens %s to the %s', (address, role) => {
  openAt(address, role);
  expect(screen.getByText('The page itself')).toBeVisible();
});

it('refuses an operator what only leads add', () => {
  openAt('/equipment/machines/new', 'operator');
  expect(screen.getByText(/Leads add machines\. You are signed in as operator\./)).toBeVisible();
});

it.each(['/recipes/R-0031', '/recipes/R-0031/revisions/0192', '/recipes/R-0031/compare'])(
  'takes a trainee from %s to the approved setting at the machine',
  async (address) => {
    const { router } = openAt(address, 'trainee');
    await waitFor(() => expect(router.state.location.pathname + router.state.location.search).toBe('/machine?recipe=R-0031'));
  },
);
