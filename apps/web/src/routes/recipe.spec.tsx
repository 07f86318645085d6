import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { type FakeHandler, fakeServer } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeRecipe, makeRecipePage, makeRevision } from '../testing/revisions';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as ComparePage } from './compare';
import { Component as RecipePage } from './recipe';

const approved = makeRevision();
const inReview = makeRevision({ id: 'revision-4', number: 4, state: 'in_review', reason: 'Source lost 6 % power', signOffs: [] });
const older = makeRevision({ id: 'revision-2', number: 2, state: 'superseded', reason: 'Light at the rim' });
const recipe = makeRecipe(approved, [inReview, approved, older], { allowedActions: ['propose-change', 'withdraw'] });

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('lead')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(at: string, handlers: Record<string, FakeHandler> = {}, shown: object = recipe) {
  server = fakeServer({
    'GET /api/recipes': () => ({ body: makeRecipePage([recipe]) }),
    'GET /api/recipes/recipe-42': () => ({ body: shown }),
    'GET /api/deviations': () => ({ body: { items: [], nextCursor: null } }),
    ...handlers,
  });
  const within = (page: React.ReactNode) => <StatusLineProvider>{page}</StatusLineProvider>;
  return renderRoutes(
    [
      { path: '/recipes/:code', element: within(<RecipePage />) },
      { path: '/recipes/:code/compare', element: within(<ComparePage />) },
      { path: '*', element: <p>elsewhere</p> },
    ],
    at,
  );
}

describe('the recipe page', () => {
  it('folds the cautions of all work into one row, whose reasons one tap opens', async () => {
    const caution = (id: string, isGeneral: boolean, subject: string) => ({
      ...{ id, level: 'care' as const, subject, text: `Reason ${id}.`, source: `Source ${id}.` },
      ...{ isGeneral, isAcknowledged: true },
    });
    const revision = makeRevision({
      cautions: [
        caution('own', false, 'Let the part cool.'),
        caution('g1', true, 'Keep the interlock'),
        caution('g2', true, 'Extract fumes'),
      ],
    });
    const { user } = openPage('/recipes/R-0042', {}, makeRecipe(revision, [revision]));
    const own = await screen.findByRole('list', { name: 'Cautions' });
    expect(within(own).getAllByRole('listitem')).toHaveLength(1);
    expect(screen.getByText('Keep the interlock. Extract fumes.')).toBeVisible();
    expect(screen.getByText(/Reason g1/)).not.toBeVisible();
    await user.click(screen.getByText('Why'));
    expect(screen.getByText(/Reason g1/)).toBeVisible();
    expect(screen.getByText('Source g2.')).toBeVisible();
  });

  it('shows the approved setting in the order of the panel, and the ladder with states and reasons', async () => {
    openPage('/recipes/R-0042');
    const card = await screen.findByRole('region', { name: 'Setting of R-0042 revision 3' });
    expect(
      within(card)
        .getAllByRole('listitem')
        .map(({ textContent }) => textContent),
    ).toEqual([expect.stringContaining('Power'), expect.stringContaining('Speed')]);
    const ladder = screen.getByRole('region', { name: 'Revisions' });
    expect(
      within(ladder)
        .getAllByRole('listitem')
        .map(({ textContent }) => textContent),
    ).toEqual([
      expect.stringMatching(/Revision 4.*In review.*Source lost 6 % power/),
      expect.stringMatching(/Revision 3.*Approved/),
      expect.stringMatching(/Revision 2.*Superseded.*Light at the rim/),
    ]);
    expect(screen.getAllByText(/Approved for use as lead operator, 3 Mar 2026 09:12 CET/)[0]).toBeVisible();
  });

  it('shows what each signature is bound to, short and in full, and leads to the runs of the recipe', async () => {
    const { user } = openPage('/recipes/R-0042');
    const signatures = await screen.findByRole('region', { name: 'Signatures' });
    expect(signatures).toHaveTextContent('Signed digest aaaa aaaa …');
    await user.click(within(signatures).getByRole('button', { name: 'Show all' }));
    expect(signatures).toHaveTextContent(`Signed digest ${Array(16).fill('aaaa').join(' ')}`);
    expect(screen.getByRole('link', { name: 'Runs' })).toHaveAttribute('href', '/runs?recipeId=recipe-42&recipe=R-0042');
  });

  it('lets a lead place a hold here, on a button that names the recipe by its code', async () => {
    const { user } = openPage(
      '/recipes/R-0042',
      { 'POST /api/holds': () => ({ status: 201, body: {} }) },
      { ...recipe, allowedActions: ['hold'] },
    );
    await user.click(await screen.findByRole('button', { name: 'Place a hold' }));
    await user.type(screen.getByLabelText('Reason'), 'Grey on the new lot');
    await user.click(screen.getByRole('button', { name: 'Put R-0042 on hold' }));
    await waitFor(() => expect(server.bodies('POST /api/holds')).toEqual([{ recipeId: 'recipe-42', reason: 'Grey on the new lot' }]));
  });

  it('says in its header that it is on hold and lets a lead release it', async () => {
    const hold = { id: 'h1', subject: 'recipe', reason: 'Fumes', placedBy: 'Hanne Voss', placedAt: '2026-05-14T08:00:00.000Z' };
    const held = { ...recipe, isHeld: true, holds: [hold], allowedActions: ['hold'] };
    const { user } = openPage('/recipes/R-0042', { 'POST /api/holds/h1/release': () => ({ body: {} }) }, held);
    expect(await screen.findByText('On hold')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Place a hold' })).toBeNull();
    await user.click(screen.getByRole('button', { name: 'Release the hold' }));
    const dialog = screen.getByRole('dialog');
    await user.type(within(dialog).getByLabelText('Reason'), 'The filter was full');
    await user.click(within(dialog).getByRole('button', { name: 'Release the hold' }));
    await waitFor(() => expect(server.bodies('POST /api/holds/h1/release')).toEqual([{ reason: 'The filter was full' }]));
  });

  it('shows a hold before everything else', async () => {
    const hold = {
      id: 'h1',
      subject: 'recipe' as const,
      reason: 'Brown rims',
      placedBy: 'Hanne Voss',
      placedAt: '2026-05-14T08:00:00.000Z',
    };
    openPage('/recipes/R-0042', {}, { ...recipe, holds: [hold] });
    const alert = await screen.findByRole('alert');
    expect(within(alert).getByText('Brown rims')).toBeVisible();
    const card = screen.getByRole('region', { name: 'Setting of R-0042 revision 3' });
    expect(alert.compareDocumentPosition(card) & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy();
  });

  it('withdraws with password and reason', async () => {
    const { user } = openPage('/recipes/R-0042', {
      'POST /api/revisions/revision-3/withdraw': () => ({ body: { ...approved, state: 'withdrawn' } }),
    });
    await user.click(await screen.findByRole('button', { name: 'Withdraw revision 3' }));
    const dialog = screen.getByRole('dialog', { name: 'Withdraw revision 3' });
    await user.click(within(dialog).getByRole('button', { name: 'Withdraw revision 3' }));
    expect(await within(dialog).findByText('2 entries need a change')).toBeVisible();
    await user.type(within(dialog).getByLabelText('Why it must not be used any more'), 'Brown rims');
    await user.type(within(dialog).getByLabelText('Your password'), 'burnt plate by the window');
    await user.click(within(dialog).getByRole('button', { name: 'Withdraw revision 3' }));
    expect(await screen.findByText('Revision 3 is withdrawn. R-0042 has no approved setting now.')).toBeVisible();
    expect(server.bodies('POST /api/revisions/revision-3/withdraw')).toEqual([
      { reason: 'Brown rims', password: 'burnt plate by the window' },
    ]);
  });

  it('withdraws a revision that is yet to take effect and says what stays', async () => {
    const scheduled = makeRevision({ id: 'revision-5', number: 5, state: 'scheduled' });
    const { user } = openPage(
      '/recipes/R-0042',
      { 'POST /api/revisions/revision-5/withdraw': () => ({ body: { ...scheduled, state: 'withdrawn' } }) },
      makeRecipe(approved, [scheduled, approved], { allowedActions: ['withdraw'] }),
    );
    await user.click(await screen.findByRole('button', { name: 'Withdraw revision 5' }));
    const dialog = screen.getByRole('dialog', { name: 'Withdraw revision 5' });
    expect(within(dialog).getByText(/It then never takes effect/)).toBeVisible();
    await user.type(within(dialog).getByLabelText('Why it must not be used any more'), 'Too hot');
    await user.type(within(dialog).getByLabelText('Your password'), 'burnt plate by the window');
    await user.click(within(dialog).getByRole('button', { name: 'Withdraw revision 5' }));
    expect(await screen.findByText('Revision 5 is withdrawn. R-0042 stays at revision 3.')).toBeVisible();
  });

  it('begins a change as a draft of its own, once its reason is given', async () => {
    const { user, router } = openPage('/recipes/R-0042', {
      'POST /api/recipes/recipe-42/drafts': () => ({ status: 201, body: { ...approved, id: 'draft-1', number: null, state: 'draft' } }),
    });
    await user.click(await screen.findByRole('button', { name: 'Propose a change' }));
    await user.click(screen.getByRole('button', { name: 'Begin the draft' }));
    expect((await screen.findAllByText(/Say why it should change/))[0]).toBeVisible();
    expect(server.bodies('POST /api/recipes/recipe-42/drafts')).toEqual([]);
    await user.type(screen.getByLabelText('Reason for the change'), 'Brown rims');
    await user.click(screen.getByRole('button', { name: 'Begin the draft' }));
    await screen.findByText('elsewhere');
    expect(server.bodies('POST /api/recipes/recipe-42/drafts')).toEqual([{ reason: 'Brown rims' }]);
    expect(router.state.location.pathname).toBe('/recipes/R-0042/revisions/draft-1');
  });

  it('says that a code is not in the shop', async () => {
    openPage('/recipes/R-9999');
    expect(await screen.findByRole('heading', { name: 'There is no such thing here' })).toBeVisible();
  });
});

describe('comparing revisions', () => {
  const side = (revisionId: string, value: number, rest: object = {}) => ({
    revisionId,
    value,
    text: String(value),
    missingBecause: null,
    change: 'same',
    size: null,
    ...rest,
  });
  const comparison = {
    revisions: [approved, inReview],
    referenceId: approved.id,
    rows: [
      {
        group: 'entered',
        key: 'powerPercent',
        label: 'Power',
        unit: '%',
        step: 1,
        isSame: false,
        values: [
          side('revision-3', 60, { change: 'reference' }),
          side('revision-4', 50, { change: 'changed', size: { delta: -10, symbol: '%', percent: null, points: -10 } }),
        ],
      },
      {
        group: 'entered',
        key: 'speedMmPerS',
        label: 'Speed',
        unit: 'mm/s',
        step: 1,
        isSame: true,
        values: [side('revision-3', 800, { change: 'reference' }), side('revision-4', 800)],
      },
    ],
  };
  const compare = { 'GET /api/revisions/compare': () => ({ body: comparison }) };

  it('shows only what differs, names the equal rows, and shows all on demand', async () => {
    const { user, router } = openPage('/recipes/R-0042/compare?ids=revision-3,revision-4', compare);
    expect((await screen.findAllByText('−10 points'))[0]).toBeInTheDocument();
    expect(screen.queryByRole('rowheader', { name: /Speed/ })).toBeNull();
    expect(screen.getAllByText('Equal rows hidden: speed')[0]).toBeInTheDocument();
    await user.click(screen.getByRole('switch', { name: 'Only what differs' }));
    expect(router.state.location.search).toContain('all=1');
    expect((await screen.findAllByText('same'))[0]).toBeInTheDocument();
  });

  it('adds a revision and asks for it, and compares with another column', async () => {
    const { user, router } = openPage('/recipes/R-0042/compare?ids=revision-3,revision-4', compare);
    await user.click(await screen.findByRole('button', { name: 'Add a revision' }));
    await user.click(within(screen.getByRole('dialog')).getByRole('button', { name: /Revision 2/ }));
    expect(new URLSearchParams(router.state.location.search).get('ids')).toBe('revision-3,revision-4,revision-2');
    const [choice] = await screen.findAllByLabelText('Compared with');
    if (choice === undefined) throw new Error('the choice is drawn');
    await user.selectOptions(choice, 'revision-4');
    expect(server.requests.at(-1)?.query.get('referenceId')).toBe('revision-4');
  });
});
