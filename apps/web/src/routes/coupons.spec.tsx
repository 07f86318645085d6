import { screen, waitFor } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as CouponsPage } from './coupons';

const summary = (code: string, rest: object = {}) => ({
  ...{ id: `id-${code}`, code, title: 'blue tag', purpose: 'exploration', state: 'marked', lot: '', thicknessMm: null, storedAt: '' },
  ...{ material: { id: 'm', name: 'Titanium tag', family: 'titanium' }, finish: { id: 'f', name: 'Bead blasted' } },
  ...{
    effect: { id: 'e', name: 'Colour anneal', key: 'colour-anneal' },
    machine: { id: 'x', name: 'Bench 2' },
    lens: { id: 'l', name: 'F160' },
  },
  ...{ isImported: false, isInvented: false, createdAt: '2026-05-14T07:00:00Z', createdBy: 'Ann Lee', markedAt: '2026-05-14T08:00:00Z' },
  face: { rows: 1, columns: 2, cellMm: 5, gapMm: 1, shows: 'rating', values: [3.5, null], photo: null },
  ...{ cellCount: 2, ratedCount: 1, bestRating: 4 },
  ...rest,
});
const value = (name: string, count: number) => ({ value: name, label: name, count });
const facets = (matchCount: number, totalCount = 3) => ({
  states: [value('marked', matchCount), value('planned', 2)],
  ...{ materials: [value('m', 1)], effects: [value('e', 1)], machines: [value('x', 1)] },
  ...{ matchCount, totalCount },
});

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(items: object[], counts: object, at = '/coupons') {
  server = fakeServer({
    'GET /api/coupons': () => ({ body: { items, nextCursor: null } }),
    'GET /api/coupons/facets': () => ({ body: counts }),
  });
  const page = (
    <StatusLineProvider>
      <CouponsPage />
    </StatusLineProvider>
  );
  return renderRoutes([{ path: '*', element: page }], at);
}

describe('the list of coupons', () => {
  it('shows each plate’s face, and leads a planned one to the machine', async () => {
    openPage([summary('C-0002', { state: 'planned', markedAt: null }), summary('C-0001')], facets(2));
    expect(await screen.findByRole('img', { name: 'Plate of C-0001, 1 by 2 cells, coloured by rating' })).toBeVisible();
    expect(screen.getByRole('link', { name: 'C-0001 blue tag' })).toHaveAttribute('href', '/coupons/C-0001');
    expect(screen.getByRole('link', { name: 'Mark C-0002 blue tag' })).toHaveAttribute('href', '/coupons/C-0002/mark');
    expect(screen.getAllByText('1 of 2')).toHaveLength(2);
  });

  it('shows the photo of a plate where there is one that lies flat', async () => {
    const face = { rows: 1, columns: 2, cellMm: 5, gapMm: 1, shows: 'rating', values: [3.5, null] };
    const corners = [
      { x: 0.1, y: 0.1 },
      { x: 0.9, y: 0.1 },
      { x: 0.9, y: 0.9 },
      { x: 0.1, y: 0.9 },
    ];
    const photo = { id: 'photo-1', urls: { master: '/m', large: '/l', small: '/photo-small' }, corners, widthPx: 400, heightPx: 300 };
    openPage([summary('C-0001', { face: { ...face, photo } })], facets(1));
    const shown = await screen.findByRole('img', { name: 'Plate of C-0001, 1 by 2 cells, photographed' });
    expect(shown.querySelector('img')).toHaveAttribute('src', '/photo-small');
  });

  it('asks for what the address says, and writes a chosen filter into it', async () => {
    const { user, router } = openPage([summary('C-0001')], facets(1), '/coupons?q=blue');
    await user.click(await screen.findByRole('button', { name: 'Filters' }));
    await user.click(screen.getByRole('checkbox', { name: /planned/ }));
    await waitFor(() => expect(router.state.location.search).toBe('?q=blue&state=planned'));
    await waitFor(() =>
      expect(
        server.requests.some(({ path, query }) => path === '/api/coupons' && query.get('state') === 'planned' && query.get('q') === 'blue'),
      ).toBe(true),
    );
  });

  it('names the filter to drop when nothing matches', async () => {
    const { user, router } = openPage([], facets(0), '/coupons?state=marked');
    await user.click(await screen.findByRole('button', { name: 'Drop marked' }));
    expect(router.state.location.search).toBe('');
  });

  it('says what a coupon is for while there is none', async () => {
    openPage([], facets(0, 0));
    expect(await screen.findByRole('heading', { name: 'No coupons yet' })).toBeVisible();
    expect(screen.getByRole('link', { name: 'Enter a plate burnt earlier' })).toHaveAttribute('href', '/coupons/import');
  });

  it('says who can help when the role shows nothing', async () => {
    server = fakeServer({
      'GET /api/coupons': () => ({ status: 403, body: { status: 403, title: 'Your role does not allow this', detail: 'Ask.' } }),
      'GET /api/coupons/facets': () => ({ status: 403, body: { status: 403, title: 'Your role does not allow this', detail: 'Ask.' } }),
    });
    renderRoutes(
      [
        {
          path: '*',
          element: (
            <StatusLineProvider>
              <CouponsPage />
            </StatusLineProvider>
          ),
        },
      ],
      '/coupons',
    );
    expect(await screen.findByText('Your role does not show this')).toBeVisible();
  });
});
