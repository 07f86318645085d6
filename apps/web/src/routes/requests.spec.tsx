import { screen, waitFor } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer } from '../testing/fake-server';
import { KEYS } from '../testing/finder-results';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as RequestsPage } from './requests';

const makeRequest = (rest: object = {}) => ({
  ...KEYS,
  id: 'request-1',
  state: 'open',
  ...{ jobReference: 'J-26-0418', neededOn: '2026-05-19', note: 'Twenty dials' },
  ...{ askedBy: 'Jonah Pell', askedAt: '2026-05-14T07:30:00.000Z', answer: null, answeredBy: null, answeredAt: null },
  version: 1,
  allowedActions: ['answer'],
  ...rest,
});

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(items: object[], more: Parameters<typeof fakeServer>[0] = {}) {
  server = fakeServer({ 'GET /api/setting-requests': () => ({ body: { items, nextCursor: null } }), ...more });
  const page = (
    <StatusLineProvider>
      <RequestsPage />
    </StatusLineProvider>
  );
  return renderRoutes([{ path: '*', element: page }], '/requests');
}

describe('requests for settings', () => {
  it('show the whole sentence with job and day, and lead to it at the machine', async () => {
    openPage([makeRequest()]);
    expect(await screen.findByRole('heading', { name: 'Black anodised 6061, Sealed satin, White mark' })).toBeVisible();
    expect(screen.getByText(/job J-26-0418, needed by 19 May 2026/)).toBeVisible();
    expect(screen.getByRole('link', { name: 'Look at the machine' })).toHaveAttribute(
      'href',
      '/machine?machine=bench2&lens=f160&material=black&finish=satin&effect=white',
    );
  });

  it('are answered in words', async () => {
    const { user } = openPage([makeRequest()], {
      'POST /api/setting-requests/request-1/answer': () => ({ body: makeRequest({ state: 'answered' }) }),
    });
    await user.click(await screen.findByRole('button', { name: /^Answer Jonah Pell:/ }));
    await user.click(screen.getByRole('button', { name: 'Answer Jonah Pell' }));
    expect(await screen.findByRole('link', { name: 'Answer: Say what became of it' })).toBeVisible();
    await user.type(screen.getByLabelText('Answer'), 'R-0042 is signed');
    await user.click(screen.getByRole('button', { name: 'Answer Jonah Pell' }));
    await waitFor(() =>
      expect(server.bodies('POST /api/setting-requests/request-1/answer')).toEqual([{ state: 'answered', answer: 'R-0042 is signed' }]),
    );
  });

  it('give no act to whoever may not answer', async () => {
    openPage([makeRequest({ allowedActions: [] })]);
    await screen.findByRole('link', { name: 'Look at the machine' });
    expect(screen.queryByRole('button', { name: /^Answer/ })).toBeNull();
  });
});
