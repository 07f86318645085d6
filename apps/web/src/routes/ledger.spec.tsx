import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession, type Role } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as LedgerPage } from './ledger';

// By their text: looking buttons up by role beside a list of some eighty choices takes jsdom most of a test’s time.
const APPROVED = 'Hanne Voss approved R-0031 revision 3';
const HASH = 'ab12cd34ef'.padEnd(64, '0');
const event = (seq: number, given: object = {}) => ({
  seq,
  at: '2026-05-14T08:12:00Z',
  actorMemberId: 'member-1',
  actorName: 'Hanne Voss',
  action: 'revision.approved',
  subjectType: 'revision',
  subjectId: 'revision-3',
  subjectCode: 'R-0031',
  before: { state: 'in_review' },
  after: { state: 'approved', number: 3 },
  previousHash: '0'.repeat(64),
  hash: HASH,
  ...given,
});
const actors = { items: [{ memberId: 'member-1', name: 'Hanne Voss', isActive: true }] };
const answers = {
  'GET /api/ledger/actors': () => ({ body: actors }),
  'GET /api/ledger': () => ({ body: { items: [event(2), event(1, { action: 'shop.created' })], nextCursor: null } }),
};
const page = (
  <StatusLineProvider>
    <LedgerPage />
  </StatusLineProvider>
);

let server: ReturnType<typeof fakeServer>;
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(handlers: Parameters<typeof fakeServer>[0] = {}, { at = '/ledger', role = 'lead' as Role } = {}) {
  openSession(makeSessionAnswer(role));
  server = fakeServer({ ...answers, ...handlers });
  return renderRoutes([{ path: '*', element: page }], at);
}

describe('the ledger page', () => {
  it('tells events in words and opens one to what it changed and to its hashes', async () => {
    const { user } = openPage();
    const row = await screen.findByRole('button', { name: APPROVED });
    expect(row).toHaveAttribute('aria-expanded', 'false');
    await user.click(row);
    const details = screen.getByRole('table', { name: 'What changed' });
    expect(within(details).getByRole('row', { name: 'state in review approved' })).toBeVisible();
    expect(screen.getByText(HASH)).toBeVisible();
    expect(screen.getByRole('link', { name: 'Every event of R-0031' })).toHaveAttribute('href', '/ledger?code=R-0031');
  });

  it('asks for what stands in the address, and puts there what is chosen', async () => {
    const { user, router } = openPage({}, { at: '/ledger?code=R-0031&from=2026-05-01' });
    await screen.findByText(APPROVED);
    const asked = () => server.requests.filter(({ path }) => path === '/api/ledger').map(({ query }) => query.toString());
    expect(asked()[0]).toContain('subjectCode=R-0031&fromDay=2026-05-01');
    await user.selectOptions(screen.getByLabelText('Who'), 'Hanne Voss');
    await waitFor(() => expect(asked().at(-1)).toContain('actorMemberId=member-1'));
    await user.click(screen.getByLabelText('Remove the filter R-0031'));
    expect(router.state.location.search).toBe('?from=2026-05-01&who=member-1');
    await user.click(screen.getByText('Clear all'));
    expect(router.state.location.search).toBe('');
  });

  it('searches for a code once it is one, and says so when it is none', async () => {
    const { user, router } = openPage();
    await user.type(await screen.findByLabelText('Code'), 'dial{Enter}');
    expect(screen.getByText('Type a code like R-0031')).toBeInTheDocument();
    expect(router.state.location.search).toBe('');
    await user.clear(screen.getByLabelText('Code'));
    await user.type(screen.getByLabelText('Code'), 'r-0031{Enter}');
    expect(router.state.location.search).toBe('?code=R-0031');
  });

  it('adds earlier events page by page', async () => {
    const { user } = openPage({
      'GET /api/ledger': ({ query }) => ({
        body:
          query.get('cursor') === 'next'
            ? { items: [event(1, { action: 'revision.submitted' })], nextCursor: null }
            : { items: [event(2)], nextCursor: 'next' },
      }),
    });
    await user.click(await screen.findByText('Show earlier events'));
    expect(await screen.findByText(/submitted R-0031/)).toBeVisible();
    expect(screen.queryByText('Show earlier events')).toBeNull();
  });

  it('says in words that the chain is intact', async () => {
    const intact = { isIntact: true, eventCount: 1204, headHash: HASH, firstBrokenSeq: null, reason: null };
    const { user } = openPage({ 'POST /api/ledger/verify': () => ({ body: intact }) });
    await user.click(screen.getByText('Verify the chain'));
    expect(await screen.findByText('1204 events, each fits the one before it and its own content.')).toBeVisible();
    expect(screen.getByText(HASH)).toBeVisible();
  });

  it('names the first broken event, what still holds and what to do', async () => {
    const broken = { isIntact: false, eventCount: 1204, headHash: HASH, firstBrokenSeq: 417, reason: 'content changed' };
    const { user } = openPage({ 'POST /api/ledger/verify': () => ({ body: broken }) });
    await user.click(screen.getByText('Verify the chain'));
    expect(await screen.findByText('The chain breaks at event 417: its content is not what was written.')).toBeVisible();
    expect(screen.getByText('Events 1 to 416 are as they were written.')).toBeVisible();
  });

  it('does not take a failed check for a broken chain', async () => {
    const { user } = openPage({ 'POST /api/ledger/verify': () => problem(503, 'unavailable', 'The server is busy') });
    await user.click(screen.getByText('Verify the chain'));
    expect(await screen.findByText('The chain was not verified.')).toBeVisible();
  });

  it('offers neither check nor export to an operator', async () => {
    openPage({}, { role: 'operator' });
    await screen.findByText(APPROVED);
    expect(screen.queryByText('Verify the chain')).toBeNull();
    expect(screen.queryByLabelText(/Export/)).toBeNull();
  });

  it('tells an empty ledger from a search without results', async () => {
    const none = { 'GET /api/ledger': () => ({ body: { items: [], nextCursor: null } }) };
    const { unmount } = openPage(none);
    expect(await screen.findByText('Nothing has happened yet')).toBeVisible();
    unmount();
    server.restore();
    const { user, router } = openPage(none, { at: '/ledger?code=R-0031' });
    expect(await screen.findByText('No event matches')).toBeVisible();
    await user.click(screen.getByText('Show every event'));
    expect(router.state.location.search).toBe('');
  });

  it('says who can help when the role shows nothing', async () => {
    openPage({ 'GET /api/ledger': () => problem(403, 'not-permitted', 'Your role does not allow this') }, { role: 'trainee' });
    expect(await screen.findByText('Your role does not show this')).toBeVisible();
  });
});
