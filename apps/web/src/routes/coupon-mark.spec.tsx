import { screen, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer, lostConnection, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as MarkPage } from './coupon-mark';

const entered = (value: number, unit: string) => ({ entered: { value, unit }, physical: value });
const setting = (speed: number, power: number) => ({
  values: { powerPercent: entered(power, 'percentFromZero'), speedMmPerS: entered(speed, 'mm/s') },
  fill: 'both directions',
  assist: 'none',
  power: { watts: 5, basis: 'not calibrated' },
});
const cell = (address: string, runOrder: number, rest: object = {}) => ({
  ...{
    id: `cell-${address}`,
    gridId: 'g',
    address,
    rowIndex: 0,
    columnIndex: runOrder - 1,
    runOrder,
    parameters: setting(100 * runOrder, 20),
  },
  ...{ actualParameters: null, markState: 'planned', markNote: '', markedAt: null, dose: { value: 1, missingBecause: null }, version: 1 },
  ...rest,
});
const marked = { markState: 'marked', markedAt: '2026-05-14T08:00:00Z', version: 2 };
const coupon = (rest: object = {}) => ({
  ...{ id: 'coupon-1', code: 'C-0124', title: '', purpose: 'exploration', state: 'planned', storedAt: '', ambientNotes: '' },
  material: { id: 'm', name: 'Titanium tag', family: 'titanium' },
  effect: { id: 'e', name: 'Colour anneal' },
  ...{ finish: { id: 'f', name: 'Bead blasted' }, machine: { id: 'x', name: 'Bench 2' }, lens: { id: 'l', name: 'F160' } },
  profile: {
    panel: {
      fields: [
        { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', maximum: 100, step: 1 },
        { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', maximum: 5000 },
      ],
    },
  },
  grids: [{ id: 'g', fillDrawnBy: 'machine', labelStep: setting(500, 30) }],
  cells: [cell('A1', 2), cell('A2', 1)],
  ...{ markingStartedAt: '2026-05-14T07:59:00Z', allowedActions: ['mark'], version: 1 },
  ...rest,
});
const READ = 'GET /api/coupons/C-0124';
const CAUTIONS = 'GET /api/cautions/for';
const extraction = {
  ...{ id: 'caution-1', level: 'care', subject: 'Keep the extraction on', text: 'Titanium dust can catch fire.', source: 'Manual' },
};
const MARK = 'POST /api/coupons/coupon-1/marking/cells';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(handlers: Parameters<typeof fakeServer>[0]) {
  server = fakeServer({ [CAUTIONS]: () => ({ body: { isForbidden: false, items: [extraction] } }), ...handlers });
  const page = (
    <StatusLineProvider>
      <MarkPage />
    </StatusLineProvider>
  );
  return renderRoutes(
    [
      { path: '/coupons/:code/mark', element: page },
      { path: '/coupons/:code', element: <p>the coupon’s page</p> },
    ],
    '/coupons/C-0124/mark',
  );
}

describe('marking a coupon', () => {
  it('shows the labels first, and the first cell of the run once they are marked', async () => {
    const { user } = openPage({
      [READ]: () => ({ body: coupon({ markingStartedAt: null }) }),
      'POST /api/coupons/coupon-1/marking/start': () => ({ body: coupon() }),
    });
    expect(await screen.findByText(/Prove this setting on a scrap edge/)).toBeVisible();
    expect(within(screen.getByRole('list', { name: 'Setting of the labels' })).getByText('500')).toBeVisible();
    await user.click(await screen.findByRole('checkbox', { name: 'I have read this caution' }));
    await user.click(screen.getByRole('button', { name: 'Labels are marked' }));
    expect(await screen.findByRole('heading', { name: 'Cell A2' })).toBeVisible();
  });

  it('begins only after the cautions are said to be read, and keeps them in sight at every cell', async () => {
    const START = 'POST /api/coupons/coupon-1/marking/start';
    const { user } = openPage({ [READ]: () => ({ body: coupon({ markingStartedAt: null }) }), [START]: () => ({ body: coupon() }) });
    const box = await screen.findByRole('checkbox', { name: 'I have read this caution' });
    await user.click(screen.getByRole('button', { name: 'Labels are marked' }));
    expect(box).toHaveFocus();
    expect(box).toHaveAccessibleDescription('Read them and say so before you mark.');
    expect(server.bodies(START)).toEqual([]);
    await user.click(box);
    await user.click(screen.getByRole('button', { name: 'Labels are marked' }));
    expect(await screen.findByRole('heading', { name: 'Cell A2' })).toBeVisible();
    expect(screen.getByText(/Keep the extraction on\./, { selector: 'summary span' })).toBeVisible();
  });

  it('refuses a cool-down that cannot be read, and waits as long as the last one said', async () => {
    const { user } = openPage({ [READ]: () => ({ body: coupon() }) });
    const field = await screen.findByLabelText(/^Cool-down/);
    await user.clear(field);
    await user.type(field, '1.5');
    expect(field).toHaveAccessibleDescription('');
    for (const text of ['-5', '99999', '1,500', 'soon']) {
      await user.clear(field);
      await user.type(field, text);
      expect(field).toHaveValue(text);
      expect(field).toHaveAccessibleDescription(/./);
    }
  });

  it('goes on in run order, and says only what changes', async () => {
    const { user } = openPage({
      [READ]: () => ({ body: coupon() }),
      [MARK]: () => ({ body: { cell: cell('A2', 1, marked), doneCount: 1, cellCount: 2 } }),
    });
    await user.click(await screen.findByRole('button', { name: 'A2 marked' }));
    expect(await screen.findByRole('heading', { name: 'Cell A1' })).toBeVisible();
    expect(screen.getByText('was 100')).toBeVisible();
    expect(screen.getAllByText(/^was /)).toHaveLength(1);
    expect(screen.getByText('1 of 2 done')).toBeVisible();
    expect(server.bodies(MARK)).toEqual([{ cellId: 'cell-A2', cellVersion: 1, outcome: 'marked' }]);
  });

  it('keeps the cell and its key when the connection is lost, so that trying again marks it once', async () => {
    let isDown = true;
    const { user } = openPage({
      [READ]: () => ({ body: coupon() }),
      [MARK]: () => (isDown ? lostConnection() : { body: { cell: cell('A2', 1, marked), doneCount: 1, cellCount: 2 } }),
    });
    await user.click(await screen.findByRole('button', { name: 'A2 marked' }));
    expect(await screen.findByText('A2 was not saved.')).toBeVisible();
    expect(screen.getByRole('heading', { name: 'Cell A2' })).toBeVisible();
    isDown = false;
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('heading', { name: 'Cell A1' })).toBeVisible();
    const keys = server.requests.filter(({ method }) => method === 'POST').map(({ headers }) => headers.get('idempotency-key'));
    expect(new Set(keys).size).toBe(1);
  });

  it('asks for what was really used, and sends only what differs', async () => {
    const { user } = openPage({
      [READ]: () => ({ body: coupon() }),
      [MARK]: () => ({
        body: { cell: cell('A2', 1, { ...marked, markState: 'differs', actualParameters: setting(100, 35) }), doneCount: 1, cellCount: 2 },
      }),
    });
    await user.click(await screen.findByRole('button', { name: 'Differs' }));
    const power = screen.getByRole('textbox', { name: /Power/ });
    await user.clear(power);
    await user.type(power, '35.5');
    await user.click(screen.getByRole('button', { name: 'Marked like this' }));
    expect(await screen.findByText(/cannot show 35.5 %/)).toBeVisible();
    await user.clear(power);
    await user.type(power, '35');
    await user.click(screen.getByRole('button', { name: 'Marked like this' }));
    expect(await screen.findByRole('heading', { name: 'Cell A1' })).toBeVisible();
    // the next cell is compared with what was really dialled in
    expect(screen.getByText('was 35')).toBeVisible();
    expect(server.bodies(MARK)).toEqual([
      { cellId: 'cell-A2', cellVersion: 1, outcome: 'differs', actual: { powerPercent: { value: 35, unit: 'percentFromZero' } }, note: '' },
    ]);
  });

  it('skips with a reason in one tap, and takes the last act back', async () => {
    const { user } = openPage({
      [READ]: () => ({ body: coupon() }),
      [MARK]: () => ({ body: { cell: cell('A2', 1, { ...marked, markState: 'skipped' }), doneCount: 1, cellCount: 2 } }),
      'POST /api/coupons/coupon-1/marking/undo': () => ({ body: { cell: cell('A2', 1, { version: 3 }), doneCount: 0, cellCount: 2 } }),
    });
    expect(await screen.findByRole('button', { name: 'Undo' })).toBeDisabled();
    await user.click(screen.getByRole('button', { name: 'Skip' }));
    await user.click(screen.getByRole('button', { name: 'Clamp in the way' }));
    await user.click(await screen.findByRole('button', { name: 'Undo A2' }));
    expect(await screen.findByText('A2 is to be marked again.')).toBeVisible();
    expect(screen.getByRole('heading', { name: 'Cell A2' })).toBeVisible();
    expect(server.bodies('POST /api/coupons/coupon-1/marking/undo')).toEqual([{ cellId: 'cell-A2', cellVersion: 2 }]);
  });

  it('says so and shows the present state when somebody else marked the cell', async () => {
    let isTaken = false;
    const { user } = openPage({
      [READ]: () => ({ body: isTaken ? coupon({ cells: [cell('A1', 2), cell('A2', 1, marked)] }) : coupon() }),
      [MARK]: () => {
        isTaken = true;
        return problem(412, 'stale-version', 'Somebody changed this in the meantime');
      },
    });
    await user.click(await screen.findByRole('button', { name: 'A2 marked' }));
    expect(await screen.findByText(/A2 was marked by somebody else meanwhile/)).toBeVisible();
    expect(await screen.findByRole('heading', { name: 'Cell A1' })).toBeVisible();
  });

  it('ends with the whole plate and leads to the coupon', async () => {
    const done = coupon({ cells: [cell('A1', 2, marked), cell('A2', 1, { ...marked, markState: 'skipped', markNote: 'clamp' })] });
    const { user } = openPage({
      [READ]: () => ({ body: done }),
      'POST /api/coupons/coupon-1/marking/finish': () => ({ body: coupon({ state: 'marked' }) }),
    });
    expect(await screen.findByText(/1 cell as planned, 0 with other values, 1 skipped \(A2: clamp\)/)).toBeVisible();
    await user.type(screen.getByLabelText(/Kept at/), 'Drawer 3');
    await user.click(screen.getByRole('button', { name: 'The plate is marked' }));
    expect(await screen.findByText('the coupon’s page')).toBeVisible();
    expect(server.bodies('POST /api/coupons/coupon-1/marking/finish')).toEqual([{ storedAt: 'Drawer 3', ambientNotes: '' }]);
  });
});
