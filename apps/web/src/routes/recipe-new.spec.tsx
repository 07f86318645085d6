import { screen, waitFor } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { type FakeHandler, fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeRevision } from '../testing/revisions';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as NewRecipe } from './recipe-new';

const POST = 'POST /api/recipes';
const list = (...items: object[]) => ({ body: { items, nextCursor: null } });
const revision = makeRevision({ id: 'draft-9', number: null, state: 'draft', route: 'customer-given' });
const { profile } = revision;

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(answer: FakeHandler) {
  server = fakeServer({
    'GET /api/machines': () => list({ id: 'x1', name: 'Bench 1', profile }),
    'GET /api/machines/x1/lenses': () => list({ lensId: 'l1', lensName: 'F160', focalLengthMm: 160, measuredSpotUm: null }),
    'GET /api/materials': () => list({ id: 'm1', name: '316L' }),
    'GET /api/finishes': () => list({ id: 'f1', name: 'brushed' }),
    'GET /api/effects': () => list({ id: 'e1', name: 'Black anneal' }),
    [POST]: answer,
  });
  const element = (
    <StatusLineProvider>
      <NewRecipe />
    </StatusLineProvider>
  );
  return renderRoutes(
    [
      { path: '/recipes/new', element },
      { path: '*', element: <p>elsewhere</p> },
    ],
    '/recipes/new',
  );
}

type User = ReturnType<typeof openPage>['user'];

async function choose(user: User, label: string, option: string) {
  await user.selectOptions(await screen.findByLabelText(label), await screen.findByRole('option', { name: option }));
}

async function fillIn(user: User, powerText: string) {
  await choose(user, 'Machine', 'Bench 1');
  await choose(user, 'Lens', 'F160');
  await choose(user, 'Material', '316L');
  await choose(user, 'Finish', 'brushed');
  await choose(user, 'Effect wanted', 'Black anneal');
  await choose(user, 'How the setting was come by', 'Given by the customer');
  await user.type(screen.getByLabelText('Where the setting comes from'), 'Sheet 12 of the customer');
  await user.type(screen.getByLabelText('Power, %'), powerText);
  await user.type(screen.getByLabelText('Speed, mm/s'), '0.8 m/s');
}
const begin = (user: User) => user.click(screen.getByRole('button', { name: 'Begin the draft' }));

describe('a recipe by another route', () => {
  it('begins as a draft with what was typed, and goes on in its editor', async () => {
    const { user, router } = openPage(() => ({ status: 201, body: revision }));
    await fillIn(user, '60');
    await begin(user);
    expect(await screen.findByText('elsewhere')).toBeVisible();
    expect(router.state.location.pathname).toBe(`/recipes/${revision.recipe.code}/revisions/draft-9`);
    expect(server.bodies(POST)).toEqual([
      {
        ...{ machineId: 'x1', lensId: 'l1', materialId: 'm1', finishId: 'f1', effectId: 'e1' },
        route: 'customer-given',
        reason: 'Sheet 12 of the customer',
        steps: [
          {
            ...{ purpose: 'fill', fill: 'both directions', assist: 'none', pauseAfterS: 0 },
            values: { powerPercent: { value: 60, unit: 'percentFromZero' }, speedMmPerS: { value: 0.8, unit: 'm/s' } },
          },
        ],
      },
    ]);
  });

  it('names every choice that is missing and sends nothing', async () => {
    const { user } = openPage(() => ({ status: 201, body: revision }));
    await begin(user);
    for (const words of ['Choose the machine.', 'Choose the lens.', 'Choose the finish.', 'Say where the setting comes from.'])
      await waitFor(() => expect(screen.getAllByText(words).length).toBeGreaterThan(0));
    expect(server.bodies(POST)).toEqual([]);
  });

  it('says at the field what the panel can show instead', async () => {
    const { user } = openPage(() => ({ status: 201, body: revision }));
    await fillIn(user, '60.5');
    await begin(user);
    await waitFor(() => expect(screen.getAllByText(/Nearest that it can: 60 % or 61 %/).length).toBeGreaterThan(0));
    expect(server.bodies(POST)).toEqual([]);
  });

  it('shows a refusal of the server at its field and keeps what was typed', async () => {
    const errors = [{ pointer: '#/steps/0/values/speedMmPerS', detail: 'Speed is needed.' }];
    const { user } = openPage(() => problem(422, 'invalid-fields', 'One field needs another look.', { errors }));
    await fillIn(user, '60');
    await begin(user);
    await waitFor(() => expect(screen.getAllByText('Speed is needed.').length).toBeGreaterThan(0));
    expect(screen.getByLabelText('Power, %')).toHaveValue('60');
  });
});
