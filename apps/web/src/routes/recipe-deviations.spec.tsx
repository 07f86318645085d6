import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { type FakeHandler, fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeRecipe, makeRecipePage, makeRevision } from '../testing/revisions';
import { makeDeviation } from '../testing/runs';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as RecipePage } from './recipe';

const approved = makeRevision();
const recipe = makeRecipe(approved, [approved]);

let server: ReturnType<typeof fakeServer>;
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(role: 'trainee' | 'operator' | 'lead', deviations: object[], handlers: Record<string, FakeHandler> = {}) {
  openSession(makeSessionAnswer(role));
  server = fakeServer({
    'GET /api/recipes': () => ({ body: makeRecipePage([recipe]) }),
    'GET /api/recipes/recipe-42': () => ({ body: recipe }),
    'GET /api/deviations': () => ({ body: { items: deviations, nextCursor: null } }),
    ...handlers,
  });
  const page = (
    <StatusLineProvider>
      <RecipePage />
    </StatusLineProvider>
  );
  return renderRoutes([{ path: '/recipes/:code', element: page }], '/recipes/R-0042');
}

const panel = () => screen.findByRole('region', { name: 'Deviations' });

describe('deviations on the page of a recipe', () => {
  it('say what may differ, who granted it and until when; those that ended stand behind a tap', async () => {
    const ended = makeDeviation({ id: 'd2', description: 'Speed 260 mm/s', isLive: false });
    const { user } = openPage('operator', [makeDeviation(), ended]);
    const shown = await panel();
    expect(within(shown).getByText('Power 28 % for the thin sheet')).toBeVisible();
    const [granted] = within(shown).getAllByText(/^Granted by Hanne Voss, until 20 May 2026 18:00 CEST or for 50 parts\. 12 parts marked/);
    expect(granted).toBeVisible();
    expect(within(shown).getByText('Speed 260 mm/s')).not.toBeVisible();
    await user.click(within(shown).getByText('1 ended'));
    expect(within(shown).getByText('Speed 260 mm/s')).toBeVisible();
    expect(within(shown).queryByRole('button', { name: 'Grant a deviation' })).toBeNull();
  });

  it('are granted by a lead, with an end by the clock of the shop', async () => {
    const { user } = openPage('lead', [], { 'POST /api/deviations': () => ({ status: 201, body: makeDeviation() }) });
    await user.click(within(await panel()).getByRole('button', { name: 'Grant a deviation' }));
    const dialog = screen.getByRole('dialog', { name: 'Grant a deviation from R-0042 revision 3' });
    await user.type(within(dialog).getByLabelText('What may differ'), 'Power 28 %');
    await user.type(within(dialog).getByLabelText('Why'), 'Old stock');
    await user.type(within(dialog).getByLabelText(/^Ends at/), '2026-05-20T18:00');
    await user.type(within(dialog).getByLabelText(/^Ends after/), '50');
    await user.click(within(dialog).getByRole('button', { name: 'Grant the deviation' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
    expect(server.bodies('POST /api/deviations')).toEqual([
      {
        revisionId: 'revision-3',
        description: 'Power 28 %',
        reason: 'Old stock',
        endsAt: '2026-05-20T16:00:00.000Z',
        maximumQuantity: 50,
      },
    ]);
  });

  it('end by themselves: without an end and without a number of parts nothing is sent, and every message stands at its field', async () => {
    const { user } = openPage('lead', []);
    await user.click(within(await panel()).getByRole('button', { name: 'Grant a deviation' }));
    const dialog = screen.getByRole('dialog');
    await user.type(within(dialog).getByLabelText(/^Ends after/), 'ten');
    await user.clear(within(dialog).getByLabelText(/^Ends after/));
    await user.click(within(dialog).getByRole('button', { name: 'Grant the deviation' }));
    expect(await within(dialog).findByRole('link', { name: /^What may differ: Say what may differ/ })).toBeVisible();
    expect(within(dialog).getByRole('link', { name: 'Why: Say why' })).toBeVisible();
    expect(within(dialog).getByRole('link', { name: /^Ends at: Give an end, a number of parts, or both/ })).toBeVisible();
    expect(server.bodies('POST /api/deviations')).toEqual([]);
  });

  it('say at the field why the server refuses, and keep what was typed', async () => {
    const refusal = { errors: [{ pointer: '#/endsAt', detail: 'The end must lie in the future.' }] };
    const { user } = openPage('lead', [], {
      'POST /api/deviations': () => problem(422, 'invalid-fields', 'One field needs another look', refusal),
    });
    await user.click(within(await panel()).getByRole('button', { name: 'Grant a deviation' }));
    const dialog = screen.getByRole('dialog');
    await user.type(within(dialog).getByLabelText('What may differ'), 'Power 28 %');
    await user.type(within(dialog).getByLabelText('Why'), 'Old stock');
    await user.type(within(dialog).getByLabelText(/^Ends at/), '2020-05-20T18:00');
    await user.click(within(dialog).getByRole('button', { name: 'Grant the deviation' }));
    expect(await within(dialog).findByRole('link', { name: 'Ends at: The end must lie in the future.' })).toBeVisible();
    expect(within(dialog).getByLabelText('What may differ')).toHaveValue('Power 28 %');
  });

  it('are not asked for by a trainee, who sees them at the start of a run', async () => {
    openPage('trainee', []);
    expect(await screen.findByRole('region', { name: 'Signatures' })).toBeVisible();
    expect(screen.queryByRole('region', { name: 'Deviations' })).toBeNull();
    expect(server.requests.map(({ path }) => path)).not.toContain('/api/deviations');
  });
});
