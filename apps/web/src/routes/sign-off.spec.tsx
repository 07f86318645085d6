import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { type FakeHandler, fakeServer, lostConnection, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeChecks, makeEvidenceCell, makeRevision, makeSignOff, makeStep } from '../testing/revisions';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as SignOffPage } from './sign-off';

const current = makeRevision();
const proposed = makeRevision({
  id: 'revision-4',
  number: 4,
  state: 'in_review',
  reason: 'The source lost 6 % power.',
  signOffs: [makeSignOff({ meaning: 'submitted for review', printedName: 'Mirela Ashdown', role: 'operator' })],
  steps: [makeStep(50)],
  comparedWith: current,
  evidence: {
    basis: [
      makeEvidenceCell({
        couponCode: 'C-0117',
        address: 'B4',
        measurements: [
          { quantity: 'lightness', value: 25.7, grade: null, unit: '1', method: 'photo', measuredAt: '2026-05-13T08:00:00.000Z' },
        ],
      }),
    ],
    confirmation: [makeEvidenceCell({ cellId: 'p1', couponId: 'coupon-121', couponCode: 'C-0121', address: 'A1', lot: '2190' })],
    runs: [],
  },
  allowedActions: ['approve', 'return'],
});
const comparison = {
  revisions: [current, proposed],
  referenceId: current.id,
  rows: [
    {
      ...{ group: 'entered', key: 'powerPercent', label: 'Power', unit: '%', step: 1, isSame: false },
      values: [
        { revisionId: current.id, value: 60, text: '60', missingBecause: null, change: 'reference', size: null },
        {
          revisionId: proposed.id,
          value: 50,
          text: '50',
          missingBecause: null,
          change: 'changed',
          size: { delta: -10, symbol: '%', percent: null, points: -10 },
        },
      ],
    },
  ],
};

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('lead')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(handlers: Record<string, FakeHandler> = {}) {
  server = fakeServer({
    'GET /api/revisions/revision-4': () => ({ body: proposed }),
    'GET /api/revisions/revision-3': () => ({ body: current }),
    'GET /api/revisions/compare': () => ({ body: comparison }),
    'GET /api/revisions/revision-4/checks': () => ({ body: makeChecks() }),
    'GET /api/sign-offs/queue': () => ({
      body: {
        items: [{ recipe: proposed.recipe, revision: proposed, isOwn: false, hasCurrent: true, allowedActions: [] }],
        nextCursor: null,
        totalCount: 1,
      },
    }),
    ...handlers,
  });
  const element = (
    <StatusLineProvider>
      <SignOffPage />
    </StatusLineProvider>
  );
  return renderRoutes(
    [
      { path: '/sign-off/:revisionId', element },
      { path: '*', element: <p>elsewhere</p> },
    ],
    '/sign-off/revision-4',
  );
}

async function sign(page: ReturnType<typeof openPage>) {
  await page.user.click(await screen.findByRole('checkbox', { name: 'Let the part cool.' }));
  await page.user.type(screen.getByLabelText('Your password'), 'burnt plate by the window');
  await page.user.click(screen.getByRole('button', { name: 'Approve revision 4' }));
}

describe('the sign-off page', () => {
  it('shows evidence of both revisions, what changes in percent, and the checks', async () => {
    openPage();
    expect(await screen.findByText('Current, revision 3')).toBeVisible();
    expect(screen.getByRole('img', { name: 'Coupon C-0117, cell B4 ringed' })).toBeInTheDocument();
    expect(await screen.findByText(/darker by 3.5 L\*/)).toBeVisible();
    expect((await screen.findAllByText('−17 %'))[0]).toBeInTheDocument();
    expect(screen.getAllByText('10 points')[0]).toBeInTheDocument();
    expect(await screen.findByText('5 of 3 marks count.')).toBeVisible();
    expect(await screen.findByText('1 of 1 waiting, oldest first')).toBeVisible();
  });

  it('shows every number of what is signed, with its set-up, limits and scope, beside the comparison', async () => {
    openPage();
    const signed = await screen.findByRole('region', { name: 'What is signed' });
    const card = within(signed).getByRole('region', { name: 'Setting of R-0042 revision 4' });
    expect(card).toHaveTextContent(/Power12.1 W at the work50%.*Speed270mm\/s/);
    expect(within(signed).getByText('Lens F160 fitted, protective glass clean, extraction on')).toBeVisible();
    expect(within(signed).getByText('Filled area')).toBeVisible();
    expect(await screen.findByRole('region', { name: 'What changes' })).toBeVisible();
    expect(screen.getByRole('link', { name: 'Revision 4' })).toHaveAttribute('href', '/recipes/R-0042/revisions/revision-4');
  });

  it('shows the whole setting of a first revision, each mark step of it, and the grounds that stand for its evidence', async () => {
    const grounds = 'Marked so since 2019 without one return.';
    const first = {
      ...proposed,
      ...{ number: 1, comparedWith: null, route: 'earlier experience' as const, grounds },
      groundsBy: { id: 'member-1', name: 'Hanne Voss' },
      limits: { notes: 'Not on curved parts.', thicknessMm: { from: 2, to: 5 } },
      steps: [makeStep(50), { ...makeStep(35), purpose: 'clean-up' as const }],
      evidence: { basis: [], confirmation: [], runs: [] },
    };
    openPage({ 'GET /api/revisions/revision-4': () => ({ body: first }) });
    const signed = await screen.findByRole('region', { name: 'What is signed' });
    const cards = within(signed).getAllByRole('region', { name: 'Setting of R-0042 revision 1' });
    expect(cards.map(({ textContent }) => textContent)).toEqual([
      expect.stringMatching(/Step 1 of 2: anneal.*50%/),
      expect.stringMatching(/Step 2 of 2: clean up.*35%/),
    ]);
    expect(within(signed).getByText('2 to 5 mm')).toBeVisible();
    expect(within(signed).getByText('Not on curved parts.')).toBeVisible();
    const evidence = screen.getByRole('region', { name: 'Evidence' });
    expect(evidence).toHaveTextContent(`It rests on no coupon.Grounds of Hanne Voss: ${grounds}`);
    expect(signed.compareDocumentPosition(await screen.findByLabelText('Your password'))).toBe(Node.DOCUMENT_POSITION_FOLLOWING);
  });

  it('says in a sentence that a signed revision no longer waits', async () => {
    const others = [1, 2].map((number) => ({ id: `other-${number}`, number }));
    openPage({
      'GET /api/revisions/revision-4': () => ({ body: { ...proposed, state: 'approved' } }),
      'GET /api/sign-offs/queue': () => ({
        body: { items: others.map((revision) => ({ recipe: proposed.recipe, revision })), nextCursor: null, totalCount: 2 },
      }),
    });
    expect(await screen.findByText('2 others wait')).toBeVisible();
  });

  it('signs with the password, the acknowledged cautions and the hash that was checked; it says so only after the answer', async () => {
    const approved = {
      ...proposed,
      state: 'approved',
      signOffs: [...proposed.signOffs, makeSignOff({ id: 's2', signedAt: '2026-05-14T09:00:00.000Z' })],
      allowedActions: [],
    };
    let isSigned = false;
    const page = openPage({
      'GET /api/revisions/revision-4': () => ({ body: isSigned ? approved : proposed }),
      'POST /api/revisions/revision-4/approve': () => {
        isSigned = true;
        return { body: approved };
      },
    });
    await screen.findByRole('button', { name: 'Approve revision 4' });
    expect(screen.queryByText(/Approved for use/)).toBeNull();
    await sign(page);
    expect(await screen.findByText('Approved for use: R-0042 revision 4')).toBeVisible();
    expect(screen.getByText('approved as lead operator, 14 May 2026 11:00 CEST')).toBeVisible();
    expect(server.bodies('POST /api/revisions/revision-4/approve')).toEqual([
      { password: 'burnt plate by the window', contentHash: 'c'.repeat(64), acknowledgedCautionIds: ['caution-1'], comment: '' },
    ]);
  });

  it('asks for every caution and for the password before anything is sent', async () => {
    const { user } = openPage();
    await user.click(await screen.findByRole('button', { name: 'Approve revision 4' }));
    expect(await screen.findByText('2 entries need a change')).toBeVisible();
    expect(screen.getByText('Acknowledge each caution to sign.')).toBeVisible();
    expect(server.bodies('POST /api/revisions/revision-4/approve')).toEqual([]);
  });

  it('says not signed when the connection is lost, keeps what was typed, and sends the same key again', async () => {
    const page = openPage({ 'POST /api/revisions/revision-4/approve': lostConnection });
    await sign(page);
    expect(await screen.findByText(/^Not signed, as far as this page knows/)).toBeVisible();
    expect(screen.getByLabelText('Your password')).toHaveValue('burnt plate by the window');
    await page.user.click(screen.getByRole('button', { name: 'Approve revision 4' }));
    await waitFor(() => expect(keys()).toHaveLength(2));
    expect(new Set(keys()).size).toBe(1);
  });

  it('says not signed with the server’s words when the password is wrong', async () => {
    const page = openPage({ 'POST /api/revisions/revision-4/approve': () => problem(403, 'wrong-password', 'The password is not right') });
    await sign(page);
    expect(await screen.findByText('Not signed. The password is not right.')).toBeVisible();
  });

  it('offers no signature over a failing check, and lists it first', async () => {
    const failing = {
      key: 'photo',
      passes: false,
      title: 'Photo',
      detail: 'No photo of C-0117.',
      isAdvisory: false,
      blocks: 'approve' as const,
    };
    openPage({
      'GET /api/revisions/revision-4/checks': () => ({
        body: makeChecks({ mayApprove: false, items: [...makeChecks().items, failing] }),
      }),
    });
    expect(await screen.findByText('Revision 4 cannot be signed yet')).toBeVisible();
    expect(screen.queryByLabelText('Your password')).toBeNull();
    expect(screen.getAllByRole('listitem').find(({ textContent }) => textContent?.includes('No photo of C-0117.'))).toBeVisible();
  });

  it('sends back with the words for the author', async () => {
    const { user } = openPage({ 'POST /api/revisions/revision-4/return': () => ({ body: { ...proposed, state: 'returned' } }) });
    await user.click(await screen.findByRole('button', { name: 'Send back with a reason' }));
    await user.type(screen.getByLabelText('What the author should do'), 'Prove it on another lot.');
    await user.click(screen.getByRole('button', { name: 'Send back revision 4' }));
    expect(await screen.findByText('elsewhere', {}, { timeout: 8000 })).toBeVisible();
    expect(server.bodies('POST /api/revisions/revision-4/return')).toEqual([{ comment: 'Prove it on another lot.' }]);
  });
});

function keys(): (string | null)[] {
  return server.requests.filter(({ path }) => path.endsWith('/approve')).map(({ headers }) => headers.get('idempotency-key'));
}
