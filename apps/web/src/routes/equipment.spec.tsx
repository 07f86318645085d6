import { emptyPanelFor } from '@proofplate/recipe-model';
import { screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import type { Calibration, Machine } from '../features/machines/machines.api';
import { closeSession, openSession, type Role } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as Equipment } from './equipment';
import { Component as MachinePage } from './equipment-machine';
import { Component as NewMachine } from './equipment-machine-new';

// A big form: finding roles in it takes jsdom a while on a slow machine.

const inShop = (page: React.ReactNode) => <StatusLineProvider>{page}</StatusLineProvider>;
const routes = [
  { path: '/equipment', element: inShop(<Equipment />) },
  { path: '/equipment/machines/new', element: inShop(<NewMachine />) },
  { path: '/equipment/machines/:machineId', element: inShop(<MachinePage />) },
];

const machine: Machine = {
  id: 'm1',
  name: 'Bench 1',
  sourceKind: 'fibre-q-switched',
  serialNumber: 'QF-1',
  warmUpMinutes: 10,
  mountedLens: null,
  profile: {
    id: 'p1',
    number: 1,
    physicalNumber: 1,
    physical: { sourceKind: 'fibre-q-switched', wavelengthNm: 1064, ratedPowerW: 20 },
    panel: emptyPanelFor('fibre-q-switched'),
    createdAt: '2026-05-14T08:00:00.000Z',
    createdByName: 'Hanne Voss',
  },
  latestCalibrationOn: null,
  archivedAt: null,
  version: 3,
  allowedActions: ['edit', 'archive', 'add-lens', 'add-calibration'],
};
const none = () => ({ body: { items: [], nextCursor: null } });
const listOf =
  (...items: unknown[]) =>
  () => ({ body: { items, nextCursor: null } });

let server: ReturnType<typeof fakeServer>;
function open(at: string, handlers: Parameters<typeof fakeServer>[0], role: Role = 'lead') {
  const times = {
    ground: { physical: {}, overheads: { basis: 'not known', because: 'the machine’s page gives no jump speed' } },
    items: [],
  };
  const notClocked = { 'GET /api/machines/m1/logged-times': () => ({ body: times }) };
  server = fakeServer({ ...notClocked, 'GET /api/lenses': none, 'GET /api/machines': none, 'GET /api/holds': none, ...handlers });
  openSession(makeSessionAnswer(role));
  return renderRoutes(routes, at);
}
afterEach(() => {
  server.restore();
  closeSession('left');
});

describe('the equipment page', () => {
  it('says what a machine is for when there is none, and offers the first act to a lead only', async () => {
    const { unmount } = open('/equipment', {});
    const empty = await screen.findByText('No machine yet');
    expect(empty).toBeVisible();
    expect(screen.getAllByRole('link', { name: 'Add a machine' })[0]).toHaveAttribute('href', '/equipment/machines/new');
    unmount();
    server.restore();
    open('/equipment', {}, 'operator');
    await screen.findByText('No machine yet');
    expect(screen.queryByRole('link', { name: 'Add a machine' })).toBeNull();
  });

  it('lists machines with what was never entered in words', async () => {
    open('/equipment', { 'GET /api/machines': listOf(machine) });
    const row = (await screen.findByRole('link', { name: 'Bench 1' })).closest('tr');
    expect(within(row ?? document.body).getByText('never')).toBeVisible();
    expect(within(row ?? document.body).getByText('Fibre, Q-switched')).toBeVisible();
  });
});

describe('adding a machine', () => {
  const answer = { 'POST /api/machines': () => ({ status: 201, body: machine }), 'GET /api/machines/m1': () => ({ body: machine }) };
  const rest = {
    'GET /api/machines/m1/lenses': none,
    'GET /api/machines/m1/calibrations': none,
    'GET /api/machines/m1/profiles': none,
    'GET /api/recipes/power-shifts': none,
  };

  it('sends numbers in their units and the panel in its order, after a row was moved, and opens the machine', async () => {
    const { user } = open('/equipment/machines/new', { ...answer, ...rest });
    await user.type(await screen.findByLabelText('Name'), 'Bench 1');
    await user.type(screen.getByLabelText(/^Wavelength/), '1064 nm');
    await user.type(screen.getByLabelText(/^Rated average power/), '20');
    await user.type(screen.getByLabelText(/^Largest pulse energy/), '1');
    await user.click(screen.getByRole('button', { name: 'Move row 1 down' }));
    await waitFor(() => expect(screen.getByLabelText('Move row 2 down')).toHaveFocus());
    await user.click(screen.getByRole('button', { name: 'Add the machine' }));
    expect(await screen.findByRole('heading', { name: 'Bench 1' })).toBeVisible();
    const [body] = server.bodies('POST /api/machines');
    expect(body).toMatchObject({
      name: 'Bench 1',
      mountedLensId: null,
      physical: {
        sourceKind: 'fibre-q-switched',
        wavelengthNm: 1064,
        ratedPowerW: 20,
        maxPulseEnergyMj: [{ pulseWidthNs: null, energyMj: 1 }],
      },
    });
    const [power, speed, ...others] = emptyPanelFor('fibre-q-switched').fields;
    expect(body).toHaveProperty('panel.fields', [speed, power, ...others]);
    expect(server.requests.find(({ method }) => method === 'POST')?.headers.get('idempotency-key')).toMatch(/^.{8,}$/);
  });

  it('shows every wrong entry at its field and in the summary, and keeps what was typed', async () => {
    const { user } = open('/equipment/machines/new', {});
    await user.type(await screen.findByLabelText(/^Wavelength/), '1,064');
    await user.type(screen.getByLabelText(/^Rated average power/), 'a lot');
    await user.clear(screen.getAllByLabelText('Label on the panel')[0] ?? document.body);
    await user.click(screen.getByRole('button', { name: 'Add the machine' }));
    const summary = await screen.findByRole('alert');
    expect(
      within(summary)
        .getAllByRole('link')
        .map((link) => link.textContent),
    ).toEqual([
      expect.stringMatching(/^Name: /),
      expect.stringMatching(/^Wavelength: .*two ways/),
      expect.stringMatching(/^Rated average power: .*not a number/),
      expect.stringMatching(/^Row 1, label: /),
    ]);
    await waitFor(() => expect(summary).toHaveFocus());
    expect(screen.getByLabelText(/^Wavelength/)).toHaveValue('1,064');
    expect(server.bodies('POST /api/machines')).toEqual([]);
  });

  it('shows what the server refuses at the row of the panel', async () => {
    const errors = [{ pointer: '#/panel/fields/1/unit', detail: 'Scan speed is not measured in this unit.' }];
    const { user } = open('/equipment/machines/new', {
      'POST /api/machines': () => problem(422, 'invalid-fields', 'Look again', { errors }),
    });
    await user.type(await screen.findByLabelText('Name'), 'Bench 1');
    await user.type(screen.getByLabelText(/^Wavelength/), '1064');
    await user.type(screen.getByLabelText(/^Rated average power/), '20');
    await user.click(screen.getByRole('button', { name: 'Add the machine' }));
    expect(await screen.findByRole('link', { name: 'Row 2, unit: Scan speed is not measured in this unit.' })).toBeVisible();
  });

  it('lets untouched rows follow the kind of source, and keeps rows that somebody typed', async () => {
    const { user } = open('/equipment/machines/new', {});
    const labels = () => screen.getAllByLabelText('Label on the panel').map((field) => field.getAttribute('value') ?? '');
    const rows = (kind: 'fibre-mopa' | 'diode') => emptyPanelFor(kind).fields.length;
    await user.selectOptions(await screen.findByLabelText('Kind of source'), 'fibre-mopa');
    expect(labels()).toHaveLength(rows('fibre-mopa'));
    await user.type(screen.getAllByLabelText('Label on the panel')[0] ?? document.body, ' 2');
    await user.selectOptions(screen.getByLabelText('Kind of source'), 'diode');
    expect(labels()).toHaveLength(rows('fibre-mopa'));
  });

  it('shows the panel as a setting card while it is typed', async () => {
    const { user } = open('/equipment/machines/new', {});
    const label = (await screen.findAllByLabelText('Label on the panel'))[0] ?? document.body;
    await user.clear(label);
    await user.type(label, 'PWR');
    expect(within(screen.getByRole('region', { name: /^Setting of Example/ })).getByText('PWR')).toBeVisible();
  });
});

describe('a hold on a machine', () => {
  const shown = {
    'GET /api/machines/m1': () => ({ body: machine }),
    'GET /api/machines/m1/lenses': none,
    'GET /api/machines/m1/calibrations': none,
    'GET /api/machines/m1/profiles': none,
    'GET /api/recipes/power-shifts': none,
  };
  const hold = { id: 'h1', subject: 'machine', subjectId: 'm1', reason: 'The mirror is loose', placedBy: 'Hanne Voss' };
  const elsewhere = { ...hold, id: 'h2', subjectId: 'm2', reason: 'Of another machine' };

  it('stands there before everything else and is released there', async () => {
    const { user } = open('/equipment/machines/m1', {
      ...shown,
      'GET /api/holds': listOf(hold, elsewhere),
      'POST /api/holds/h1/release': () => ({ body: {} }),
    });
    expect(await screen.findByRole('heading', { name: 'Bench 1 is on hold. Start no run.' })).toBeVisible();
    expect(screen.queryByText('Of another machine')).toBeNull();
    expect(screen.queryByRole('button', { name: 'Place a hold' })).toBeNull();
    await user.click(screen.getByRole('button', { name: 'Release the hold' }));
    expect(screen.getByRole('dialog', { name: 'Release the hold' })).toBeVisible();
  });

  it('is placed on its page by a lead, and by nobody else', async () => {
    const { user, unmount } = open('/equipment/machines/m1', { ...shown, 'POST /api/holds': () => ({ status: 201, body: {} }) });
    await user.click(await screen.findByRole('button', { name: 'Place a hold' }));
    await user.type(screen.getByLabelText('Reason'), 'The mirror is loose');
    await user.click(screen.getByRole('button', { name: 'Put Bench 1 on hold' }));
    await waitFor(() => expect(server.bodies('POST /api/holds')).toEqual([{ machineId: 'm1', reason: 'The mirror is loose' }]));
    unmount();
    server.restore();
    open('/equipment/machines/m1', shown, 'operator');
    await screen.findByText('Profile version 1');
    expect(screen.queryByRole('button', { name: 'Place a hold' })).toBeNull();
  });
});

describe('power calibrations', () => {
  const calibration: Calibration = {
    id: 'c1',
    machineId: 'm1',
    measuredOn: '2026-05-04',
    meter: 'Thermal head 3',
    meterDueOn: null,
    wavelengthNm: 1064,
    frequencyKhz: 30,
    pulseWidthNs: null,
    points: [
      { percent: 0, watts: 0 },
      { percent: 50, watts: 9 },
      { percent: 100, watts: 18 },
    ],
    notes: '',
    createdAt: '2026-05-04T08:00:00.000Z',
    createdByName: 'Hanne Voss',
  };
  const handlers = {
    'GET /api/machines/m1': () => ({ body: machine }),
    'GET /api/machines/m1/lenses': none,
    'GET /api/machines/m1/profiles': listOf(machine.profile),
    'GET /api/recipes/power-shifts': none,
    'GET /api/machines/m1/calibrations': listOf(calibration),
    'POST /api/machines/m1/calibrations': () => ({ status: 201, body: calibration }),
  };

  it('are a picture that says its readings, and a table', async () => {
    open('/equipment/machines/m1', handlers);
    expect(await screen.findByRole('img', { name: /4 May 2026: 0 percent 0 watts, 50 percent 9 watts/ })).toBeVisible();
    expect(screen.getByText('entered by Hanne Voss')).toBeVisible();
  });

  it('show how the source has aged at one setting, and which recipes its watts have left', async () => {
    const later = {
      ...calibration,
      id: 'c2',
      measuredOn: '2026-11-02',
      points: [0, 50, 100].map((percent) => ({ percent, watts: percent * 0.162 })),
    };
    const shift = {
      ...{ stepIndex: 0, beforeW: 9, afterW: 8.1, shiftPercent: -10, citedOn: '2026-05-04', measuredOn: '2026-11-02' },
      ...{ limitPercent: 5, isCheckDue: true },
    };
    const recipe = { id: 'r1', code: 'R-0012', title: 'Serial plate', revisionNumber: 2, machine: { id: 'm1', name: machine.name } };
    open('/equipment/machines/m1', {
      ...handlers,
      'GET /api/machines/m1/calibrations': listOf(later, calibration),
      'GET /api/recipes/power-shifts': listOf({ ...recipe, shift, reason: null }),
    });
    expect(await screen.findByRole('img', { name: /^At 100.%: 18.00.W on 4 May 2026, 16.20.W on 2 Nov 2026: −10.0.%\.$/ })).toBeVisible();
    const recipes = within(screen.getByRole('region', { name: 'Recipes and their watts now' }));
    expect(await recipes.findByRole('link', { name: 'R-0012' })).toBeVisible();
    expect(recipes.getByText('Check due')).toBeVisible();
    expect(recipes.getByText(/1 of 1 due for a check/)).toBeVisible();
  });

  it('are added from a pasted table; a pair that falls is named before anything is sent', async () => {
    const { user } = open('/equipment/machines/m1', handlers);
    await user.click(await screen.findByRole('button', { name: 'Add readings' }));
    const dialog = within(await screen.findByRole('dialog', { name: 'Add a power calibration' }));
    await user.type(dialog.getByLabelText('Measured on'), '2026-06-01');
    await user.type(dialog.getByLabelText('Meter'), 'Thermal head 3');
    await user.click(dialog.getByLabelText('Percent and watts'));
    await user.paste('percent\twatts\n10\t1\n20\t3\n30\t2.5');
    await user.click(dialog.getByRole('button', { name: 'Add the calibration' }));
    expect((await dialog.findAllByText(/Readings 2 and 3 .* the watts must not fall/)).length).toBeGreaterThan(0);
    expect(server.bodies('POST /api/machines/m1/calibrations')).toEqual([]);
    await user.clear(dialog.getByLabelText('Percent and watts'));
    await user.click(dialog.getByLabelText('Percent and watts'));
    await user.paste('10\t1\n20\t3\n30\t4.5');
    await user.click(dialog.getByRole('button', { name: 'Add the calibration' }));
    await waitFor(() => expect(server.bodies('POST /api/machines/m1/calibrations')).toHaveLength(1));
    expect(server.bodies('POST /api/machines/m1/calibrations')[0]).toMatchObject({
      measuredOn: '2026-06-01',
      wavelengthNm: 1064,
      frequencyKhz: null,
      points: [
        { percent: 10, watts: 1 },
        { percent: 20, watts: 3 },
        { percent: 30, watts: 4.5 },
      ],
    });
  });

  it('and every act are missing for an operator', async () => {
    open(
      '/equipment/machines/m1',
      { ...handlers, 'GET /api/machines/m1': () => ({ body: { ...machine, allowedActions: [] } }) },
      'operator',
    );
    await screen.findByRole('img', { name: /4 May 2026/ });
    for (const name of ['Add readings', 'Archive', 'Add a lens']) expect(screen.queryByRole('button', { name })).toBeNull();
    expect(screen.queryByRole('link', { name: 'Change' })).toBeNull();
  });
});
