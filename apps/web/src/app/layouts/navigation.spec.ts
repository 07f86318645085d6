import { barFor, navigationFor } from './navigation';

const labels = (entries: readonly { label: string }[]) => entries.map(({ label }) => label);

describe('the navigation', () => {
  it('shows a role only what it can use, in the order of the work', () => {
    expect(labels(navigationFor('trainee'))).toEqual(['At the machine', 'Runs', 'Part set-up']);
    expect(labels(navigationFor('operator'))).toEqual([
      'At the machine',
      'Coupons',
      'Recipes',
      'Runs',
      'Part set-up',
      'Equipment',
      'Materials',
      'Ledger',
    ]);
    expect(labels(navigationFor('lead'))).toEqual([
      'At the machine',
      'Coupons',
      'Recipes',
      'Sign-off',
      'Runs',
      'Part set-up',
      'Equipment',
      'Materials',
      'People',
      'Ledger',
    ]);
    expect(labels(navigationFor('owner'))).toEqual([...labels(navigationFor('lead')), 'Shop settings']);
  });

  it.each(['trainee', 'operator', 'lead', 'owner'] as const)(
    'gives a %s at most four places in the bar and everything else under More',
    (role) => {
      const { bar, rest } = barFor(role);
      expect(bar.length).toBeLessThanOrEqual(4);
      expect(new Set([...labels(bar), ...labels(rest)])).toEqual(new Set(labels(navigationFor(role))));
      expect(bar.length + rest.length).toBe(navigationFor(role).length);
    },
  );
});
