import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeRecipe, makeRecipePage, makeRevision } from '../testing/revisions';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as RecipesPage } from './recipes';

const approved = makeRevision();
const inReview = makeRevision({ id: 'revision-4', number: 4, state: 'in_review', signOffs: [] });
const recipe = makeRecipe(approved, [inReview, approved]);

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('lead')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(page: object, at = '/recipes') {
  server = fakeServer({ 'GET /api/recipes': () => ({ body: page }) });
  const element = (
    <StatusLineProvider>
      <RecipesPage />
    </StatusLineProvider>
  );
  return renderRoutes([{ path: '*', element }], at);
}

describe('the list of recipes', () => {
  it('keeps the approved revision as the row and shows the one under way as a second line', async () => {
    openPage(makeRecipePage([recipe]));
    const row = (await screen.findByRole('link', { name: 'R-0042 316L brushed, black anneal' })).closest('tr');
    if (row === null) throw new Error('the link stands in a row');
    expect(within(row).getByText('Approved')).toBeVisible();
    expect(within(row).getByText('4 in review')).toBeVisible();
    expect(within(row).getByText('1.8')).toBeInTheDocument();
    expect(within(row).getByText('3 Mar 2027')).toBeVisible();
  });

  it('asks for what the address says and writes a chosen filter into it', async () => {
    const { user, router } = openPage(makeRecipePage([recipe]), '/recipes?q=316L');
    await user.click(await screen.findByRole('button', { name: 'Filters' }));
    await user.click(await within(screen.getByRole('dialog')).findByRole('checkbox', { name: /Bench 2/ }));
    expect(router.state.location.search).toBe('?q=316L&machine=x1');
    await waitFor(() => expect(server.requests.at(-1)?.query.get('machineId')).toBe('x1'));
    expect(server.requests.at(-1)?.query.get('q')).toBe('316L');
  });

  it('names the filter to drop, and what that yields, when nothing matches', async () => {
    const none = makeRecipePage([], {
      totalCount: 57,
      materials: [{ value: 'm1', label: 'brass', count: 0 }],
      machines: [
        { value: 'x1', label: 'Bench 1', count: 2 },
        { value: 'x3', label: 'Bench 3', count: 0 },
      ],
    });
    const { user, router } = openPage(none, '/recipes?material=m1&machine=x3');
    expect(await screen.findByRole('heading', { name: 'No recipe matches both' })).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Drop Bench 3' }));
    expect(router.state.location.search).toBe('?material=m1');
  });

  it('tells a new shop what a recipe is and gives the first act', async () => {
    openPage(makeRecipePage([]));
    expect(await screen.findByRole('heading', { name: 'No recipes yet' })).toBeVisible();
    expect(screen.getAllByRole('link', { name: 'Plan a coupon' })).toHaveLength(2);
    const others = screen.getAllByRole('link', { name: 'Add a recipe without a coupon' });
    expect(others.map((link) => link.getAttribute('href'))).toEqual(['/recipes/new', '/recipes/new']);
  });

  it('says on hold before anything else of the state', async () => {
    openPage(makeRecipePage([makeRecipe(approved, [approved], { isHeld: true })]));
    const words = await screen.findByText('On hold');
    expect(words.closest('td')?.textContent).toMatch(/^StateOn holdApproved/);
  });
});
