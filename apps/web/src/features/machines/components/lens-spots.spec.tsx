import { screen, within } from '@testing-library/react';
import { closeSession, openSession } from '../../../lib/session';
import { fakeServer } from '../../../testing/fake-server';
import { renderRoutes } from '../../../testing/render';
import { makeSessionAnswer } from '../../../testing/sessions';
import type { MachineLens } from '../machines.api';
import { LensSpots } from './lens-spots';

const PAIR: MachineLens = {
  ...{ id: 'p', machineId: 'm1', lensId: 'l1', lensName: 'F160', focalLengthMm: 160, fieldSizeMm: 110, workingDistanceMm: null },
  ...{
    focusMethod: '',
    measuredSpotUm: 38.4,
    spotMethod: 'x',
    spotMeasuredOn: '2026-11-20',
    isMounted: true,
    version: 2,
    allowedActions: [],
  },
};
const spot = (id: string, rest: object) => ({
  ...{ id, spotUm: 36, standardErrorUm: null, method: 'Knife edge', measuredOn: '2026-01-13', coupon: null, fit: null, isInUse: false },
  ...{ createdAt: '2026-01-13T10:00:00Z', createdByName: 'Hanne Voss' },
  ...rest,
});
const plain = (element: HTMLElement) => (element.textContent ?? '').replaceAll('\u00A0', ' ');

let server: ReturnType<typeof fakeServer>;
const show = (items: readonly object[]) => {
  server = fakeServer({ 'GET /api/machines/m1/lenses/l1/spots': () => ({ body: { items, nextCursor: null } }) });
  openSession(makeSessionAnswer());
  renderRoutes([{ path: '/', element: <LensSpots pair={PAIR} /> }], '/');
};
afterEach(() => {
  server.restore();
  closeSession('left');
});

it('lists the measured spots of a lens newest first, with error, threshold, the coupon they come from, and the one in use', async () => {
  const fit = { thresholdPeakFluenceJPerCm2: 2.1234, pointCount: 9 };
  const fromCoupon = {
    spotUm: 38.4,
    standardErrorUm: 0.6,
    method: 'Crater widths',
    coupon: { id: 'c', code: 'C-0012' },
    fit,
    isInUse: true,
  };
  show([spot('s2', fromCoupon), spot('s1', {})]);
  const [newest, earlier] = within(await screen.findByRole('table', { name: 'Measured spots with F160' })).getAllByRole('row');
  if (newest === undefined || earlier === undefined) throw new Error('two rows were expected');
  expect(plain(newest)).toContain('38.4 µm ± 0.6 µm');
  expect(plain(newest)).toContain('threshold 2.12 J/cm² peak');
  expect(plain(newest)).toContain('in use');
  expect(within(newest).getByRole('link', { name: 'C-0012' })).toHaveAttribute('href', '/coupons/C-0012');
  expect(plain(earlier)).toContain('Knife edge');
  expect(plain(earlier)).toContain('earlier');
});
