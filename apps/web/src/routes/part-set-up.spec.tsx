import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeRun } from '../testing/runs';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as PartSetUp } from './part-set-up';

const GROUND = {
  ...{ machine: { id: 'machine-1', name: 'Bench 2' }, lens: { id: 'f160', name: 'F160' }, wavelengthNm: 1064, m2: 1.5, beamDiameterMm: 7 },
  ...{ focalLengthMm: 160, fieldSizeMm: 110, measuredSpotUm: 40, focusOffsetsMm: [0] },
};
const CAUTION = {
  ...{ id: 'c1', level: 'care', subject: 'Clamp the part so that it cannot fly off.', text: 'The manual decides.', source: 'shop' },
  ...{ appliesTo: { roundPart: true }, isShipped: true, version: 1, allowedActions: [] },
};
const PART = '/api/runs/run-7/part-set-up';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('trainee')));
afterEach(() => {
  server.restore();
  sessionStorage.clear();
  closeSession('left');
});

function openPage(at = '/part-set-up?run=J-0007', more: Parameters<typeof fakeServer>[0] = {}) {
  const run = { ...makeRun(), id: 'run-7' };
  server = fakeServer({
    'GET /api/cautions': () => ({ body: { items: [CAUTION], nextCursor: null } }),
    'GET /api/runs': () => ({ body: { items: [run], nextCursor: null } }),
    'GET /api/runs/J-0007': () => ({ body: run }),
    [`GET ${PART}`]: () => ({ body: { setUp: null, ground: GROUND } }),
    ...more,
  });
  const page = (
    <StatusLineProvider>
      <PartSetUp />
    </StatusLineProvider>
  );
  return renderRoutes(
    [
      { path: '/part-set-up', element: page },
      { path: '/runs/:code', element: <p>the run</p> },
    ],
    at,
  );
}

type User = ReturnType<typeof openPage>['user'];
async function typeRing(user: User, lengths: Readonly<Record<string, string>> = {}) {
  await user.click(await screen.findByRole('radio', { name: 'Ring' }));
  const all = { 'Outside diameter': '20', Wall: '2', 'Length along the axis': '8', 'Artwork height': '5', ...lengths };
  for (const [label, text] of Object.entries(all)) await user.type(screen.getByLabelText(new RegExp(`^${label}`)), text);
}
const entered = () => screen.getByRole('region', { name: 'What to enter' });

describe('the part set-up', () => {
  it('says what is still needed, then shows what to enter while the last length is typed', async () => {
    const { user } = openPage();
    expect(await screen.findByText('Clamp the part so that it cannot fly off.')).toBeVisible();
    expect(entered()).toHaveTextContent('Still needed: outside diameter, length along the axis, artwork height');
    await typeRing(user);
    expect(entered()).toHaveTextContent('Ø 20 mm');
    // pi x 20 mm
    expect(entered()).toHaveTextContent('62.832 × 5 mm');
    await user.click(screen.getByRole('radio', { name: 'Inside' }));
    expect(entered()).toHaveTextContent('Ø 16 mm');
    expect(entered()).toHaveTextContent(/Mirror\s*Yes/);
    expect(screen.getByRole('img', { name: /The artwork flat: 50\.265.mm wide, 5.mm high, mirrored/ })).toBeVisible();
    expect(screen.getByText(/Whether the beam and the head reach the place inside/)).toBeVisible();
  });

  it('takes inch, alone or beside a length, and shows the other unit', async () => {
    const { user } = openPage();
    await typeRing(user, { 'Outside diameter': '1 in' });
    expect(entered()).toHaveTextContent('Ø 25.4 mm');
    expect(entered()).toHaveTextContent('1 in');
    await user.click(screen.getByRole('radio', { name: 'inch' }));
    expect(screen.getByLabelText(/^Wall, in/)).toHaveValue('2');
  });

  it('holds all measures in a table, with formula and source', async () => {
    const { user } = openPage();
    await typeRing(user);
    await user.click(screen.getByText('All measures, with formula and source'));
    const table = screen.getByRole('table', { name: 'All measures of the part' });
    expect(within(table).getByText('Wrap length, one whole turn')).toBeVisible();
    expect(within(table).getAllByRole('link', { name: 'round-parts' })[0]).toHaveAttribute('href', '/science/round-parts');
    expect(within(table).queryByText('Sector of the flat artwork')).toBeNull();
  });

  it('says at its field why a part is too small for the steps, and how many it takes', async () => {
    const { user } = openPage();
    await typeRing(user, { 'Index steps': '1' });
    const field = screen.getByLabelText(/^Index steps/);
    expect(field).toBeInvalid();
    expect(field).toHaveAccessibleDescription(/too small for 1 index step with this lens.*Take at least \d+/);
    expect(screen.queryByRole('img')).toBeNull();
  });

  it('keeps the reason where the machine lacks its beam', async () => {
    const ground = { ...GROUND, m2: null };
    const { user } = openPage(undefined, { [`GET ${PART}`]: () => ({ body: { setUp: null, ground } }) });
    await typeRing(user);
    expect(entered()).toHaveTextContent('Ø 20 mm');
    expect(entered()).toHaveTextContent('not known because the beam’s M² is not recorded; add it to the machine');
  });

  it('sends what was typed, nothing that was worked out, and goes back to the run', async () => {
    const { user, router } = openPage(undefined, { [`POST ${PART}`]: () => ({ status: 201, body: {} }) });
    await typeRing(user);
    await user.click(screen.getByRole('button', { name: 'Save with the run' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/runs/J-0007'));
    expect(server.bodies(`POST ${PART}`)).toEqual([
      {
        ...{
          shape: 'ring',
          side: 'outside',
          diameter: { value: 20, unit: 'mm' },
          wall: { value: 2, unit: 'mm' },
          length: { value: 8, unit: 'mm' },
        },
        ...{
          artworkHeight: { value: 5, unit: 'mm' },
          allowance: 'fluence loss',
          allowancePercent: 10,
          focusAt: 'mid',
          steepestEdgeDeg: 30,
        },
        shownIn: 'mm',
      },
    ]);
  });

  it('names every empty length when it is saved too early, and sends nothing', async () => {
    const { user } = openPage();
    await user.click(await screen.findByRole('button', { name: 'Save with the run' }));
    expect(await screen.findByText('3 entries need a change')).toBeVisible();
    expect(server.bodies(`POST ${PART}`)).toEqual([]);
  });

  it('shows a refusal of the server and keeps what was typed', async () => {
    const refusal = () => problem(409, 'run-finished', 'The run is finished');
    const { user } = openPage(undefined, { [`POST ${PART}`]: refusal });
    await typeRing(user);
    await user.click(screen.getByRole('button', { name: 'Save with the run' }));
    expect(await screen.findByText('The run is finished.')).toBeVisible();
    expect(screen.getByLabelText(/^Outside diameter/)).toHaveValue('20');
  });

  it('keeps what was typed for a setting until its run is started', async () => {
    const at = '/part-set-up?revision=revision-3';
    const handlers = { 'GET /api/runs/part-ground/revision-3': () => ({ body: GROUND }) };
    const { user, unmount } = openPage(at, handlers);
    await typeRing(user);
    expect(screen.queryByRole('button', { name: 'Save with the run' })).toBeNull();
    unmount();
    server.restore();
    openPage(at, handlers);
    expect(await screen.findByLabelText(/^Outside diameter/)).toHaveValue('20');
  });

  it('asks a trainee for a run, and an operator for a machine and a lens', async () => {
    const first = openPage('/part-set-up');
    expect(await screen.findByText(/Choose one of your runs/)).toBeVisible();
    first.unmount();
    server.restore();
    openSession(makeSessionAnswer('operator'));
    const physical = { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 20, m2: 1.5, beamDiameterMm: 7 };
    const lens = { lensId: 'f160', lensName: 'F160', focalLengthMm: 160, fieldSizeMm: 110, measuredSpotUm: null };
    const { user } = openPage('/part-set-up', {
      'GET /api/machines': () => ({ body: { items: [{ id: 'm1', name: 'Bench 2', profile: { physical } }], nextCursor: null } }),
      'GET /api/machines/m1/lenses': () => ({ body: { items: [lens], nextCursor: null } }),
    });
    await user.selectOptions(await screen.findByLabelText('Machine'), 'Bench 2');
    await user.selectOptions(await screen.findByLabelText('Lens'), 'F160');
    await typeRing(user);
    expect(entered()).toHaveTextContent('Ø 20 mm');
  });
});
