import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as CouponPage } from './coupon';

// Each test has a coupon of its own: a read that the test before left under way must not be taken for this one's.
let count = 0;
let couponId = '';
let code = '';

const entered = (value: number, unit: string) => ({ entered: { value, unit }, physical: value });
const setting = (speed: number, power: number) => ({
  values: {
    powerPercent: entered(power, 'percentFromZero'),
    speedMmPerS: entered(speed, 'mm/s'),
    frequencyKhz: entered(400, 'kHz'),
    lineSpacingUm: { entered: { value: 0.01, unit: 'mm' }, physical: 10 },
    passes: entered(1, 'count'),
  },
  fill: 'both directions',
  assist: 'none',
  power: { watts: power / 5, basis: 'calibration' },
});
const SPEEDS = [200, 400];
const POWERS = [20, 50];
/** Run order B2, A1, B1; A2 was skipped. */
const RUN_ORDER: Readonly<Record<string, number>> = { A1: 2, A2: 4, B1: 3, B2: 1 };
const cells = SPEEDS.flatMap((speed, rowIndex) =>
  POWERS.map((power, columnIndex) => {
    const address = `${'AB'[rowIndex]}${columnIndex + 1}`;
    return {
      ...{
        id: `cell-${address}`,
        gridId: 'g',
        address,
        rowIndex,
        columnIndex,
        runOrder: RUN_ORDER[address],
        parameters: setting(speed, power),
      },
      ...{ actualParameters: address === 'B1' ? setting(speed, 25) : null, markState: address === 'A2' ? 'skipped' : 'marked' },
      ...{ markNote: address === 'A2' ? 'clamp in the way' : '', markedAt: null, dose: { value: 1, missingBecause: null }, version: 2 },
    };
  }),
);
const coupon = (rest: object = {}) => ({
  ...{ id: couponId, code, title: '', purpose: 'exploration', state: 'marked', storedAt: '', ambientNotes: '', notes: '' },
  ...{
    material: { id: 'm', name: '316L', family: 'stainless steel' },
    finish: { id: 'f', name: 'Brushed' },
    effect: { id: 'e', name: 'Dark anneal' },
  },
  ...{ machine: { id: 'x', name: 'Bench 2' }, lens: { id: 'l', name: 'F160', focalLengthMm: 160, fieldSizeMm: 110, measuredSpotUm: 43 } },
  profile: {
    ...{ id: 'p', number: 4, physicalNumber: 2, physical: { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 20, m2: 1.5 } },
    panel: {
      fields: [
        { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', maximum: 100, step: 1 },
        { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', maximum: 5000 },
      ],
    },
  },
  ...{ calibration: { id: 'k', measuredOn: '2026-05-02' }, confirms: null, lot: '316L-2291', thicknessMm: 1.5, unknownFields: [] },
  ...{ marked: { at: '2026-05-13T14:40:00Z', by: 'Mirela Ashdown' }, sealed: null, isImported: false, isInvented: false },
  grids: [
    {
      ...{ id: 'g', number: 1, rows: 2, columns: 2, cellMm: 5, gapMm: 1.2 },
      rowFactor: { parameter: 'speedMmPerS', spacing: 'steps', levels: SPEEDS.map((speed) => entered(speed, 'mm/s')) },
      columnFactor: { parameter: 'powerPercent', spacing: 'steps', levels: POWERS.map((power) => entered(power, 'percentFromZero')) },
    },
  ],
  ...{ cells, version: 5, allowedActions: ['photograph', 'record-criteria', 'rate', 'measure', 'inspect', 'draft-recipe', 'plan-next'] },
  ...rest,
});
const CRITERION = { quantity: 'lightness', comparison: 'at most', value: 30, unit: '1' };
const rating = (address: string, given: object = {}) => ({
  ...{
    id: `r-${address}`,
    cellId: `cell-${address}`,
    memberId: 'member-1',
    by: 'Hanne Voss',
    rating: 3,
    outcome: null,
    tags: [],
    note: '',
  },
  ...{ ratedAt: '2026-05-13T09:24:00Z', version: 1 },
  ...given,
});
const measured = (address: string, value: number) => ({
  ...{ id: `m-${address}`, cellId: `cell-${address}`, quantity: 'lightness', value, grade: null, unit: '1', method: 'colorimeter' },
  ...{
    methodDetail: { illuminant: 'D65' },
    instrument: 'Colorimeter 1',
    photoId: null,
    uncertainty: null,
    measuredAt: '2026-05-13T09:24:00Z',
  },
  ...{ by: 'Hanne Voss', supersedesId: null, isSuperseded: false, counts: true, reason: '' },
});
const verdict = (address: string, given: object = {}) => ({
  ...{ cellId: `cell-${address}`, rank: null, meanRating: null, meets: null },
  results: [{ criterion: 'Lightness at most 30', value: null, meets: null }],
  ...given,
});
const inspection = (rest: object = {}) => ({
  ...{ couponId, state: 'marked', criteria: [CRITERION], criteriaRecordedAt: '2026-05-13T08:00:00Z', areCriteriaFixed: true },
  ...{ proposedCriteria: [{ ...CRITERION, value: 35 }], ratings: [], measurements: [], corrections: [] },
  ...{ verdicts: cells.map(({ address }) => verdict(address)), missingToInspect: [], missingToSeal: [], version: 5 },
  allowedActions: coupon().allowedActions,
  ...rest,
});
const rateOf = () => `PUT /api/coupons/${couponId}/ratings`;
const readOf = (part: string) => `GET /api/coupons/${couponId}/${part}`;
type Row = ReturnType<typeof rating>;
/** Ratings as the api keeps them: the next read shows what was saved. */
function ratingStore(first: readonly Row[] = []) {
  let rows = [...first];
  return {
    read: () => rows,
    save: ({ body }: { body: unknown }) => {
      // the page sends what the api documents
      const sent = (body as { ratings: { cellId: string; seenVersion: number | null }[] }).ratings;
      const saved = sent.map(({ seenVersion, ...own }) =>
        rating(own.cellId.replace('cell-', ''), { ...own, version: (seenVersion ?? 0) + 1 }),
      );
      rows = [...rows.filter(({ id }) => !saved.some((row) => row.id === id)), ...saved];
      return { body: { ratings: saved } };
    },
  };
}

let server: ReturnType<typeof fakeServer>;
beforeEach(() => {
  count += 1;
  couponId = `coupon-${count}`;
  code = `C-${100 + count}`;
  openSession(makeSessionAnswer('operator'));
});
afterEach(() => {
  server.restore();
  closeSession('left');
  localStorage.clear();
});

async function openPage(handlers: Parameters<typeof fakeServer>[0] = {}, cell = 'B2', ratings = ratingStore()) {
  server = fakeServer({
    [`GET /api/coupons/${code}`]: () => ({ body: coupon() }),
    [readOf('inspection')]: () => ({ body: inspection({ ratings: ratings.read() }) }),
    [readOf('photos')]: () => ({ body: { items: [], nextCursor: null } }),
    [rateOf()]: ratings.save,
    ...handlers,
  });
  const page = (
    <StatusLineProvider>
      <CouponPage />
    </StatusLineProvider>
  );
  const rendered = renderRoutes([{ path: '/coupons/:code', element: page }], `/coupons/${code}?cell=${cell}`);
  await screen.findByRole('grid');
  return rendered;
}
/** By its address: looking every cell up by role takes jsdom most of a test’s time. */
function cellOf(address: string): HTMLElement {
  const cell = document.querySelector<HTMLElement>(`[role=gridcell][data-address="${address}"]`);
  if (cell === null) throw new Error(`no cell ${address}`);
  return cell;
}
function panel(address: string): HTMLElement {
  const region = document.querySelector<HTMLElement>(`section[aria-label="Cell ${address}"]`);
  if (region === null) throw new Error(`the panel does not show ${address}`);
  return region;
}

describe('the coupon’s page', () => {
  it('opens the cell that the link names, with its setting and the numbers that follow from it', async () => {
    await openPage();
    expect(cellOf('B2')).toHaveAttribute('aria-selected', 'true');
    expect(cellOf('B2')).toHaveAccessibleName('B2, power 50 percent, scan speed 400 millimetres per second');
    // 10 W over 400 mm/s and 10 µm; 1 − 400 / (400 kHz · 43 µm)
    expect(within(panel('B2')).getByText('Dose', { selector: 'dt' }).nextSibling).toHaveTextContent('2.5 J/mm²');
    expect(within(panel('B2')).getByText('Pulse overlap', { selector: 'dt' }).nextSibling).toHaveTextContent('97.7 %');
    expect(screen.getByText('Lot 316L-2291, 1.5 mm')).toBeInTheDocument();
  });

  it('shows what was really used, with the plan beside it', async () => {
    await openPage({}, 'B1');
    expect(within(panel('B1')).getByText('planned 20 %')).toBeInTheDocument();
    expect(cellOf('B1')).toHaveAccessibleName(/power 25 percent/);
  });

  it('is rated by digits along the run order, at once, with one version per cell', async () => {
    const { user } = await openPage();
    cellOf('B2').focus();
    await user.keyboard('5');
    expect(cellOf('A1')).toHaveAttribute('aria-selected', 'true');
    expect(document.activeElement).toBe(cellOf('A1'));
    await user.keyboard('2');
    expect(cellOf('B1')).toHaveAttribute('aria-selected', 'true');
    expect(cellOf('B2')).toHaveAccessibleName(/rated 5/);
    await waitFor(() =>
      expect(server.bodies(rateOf())).toEqual([
        { ratings: [{ cellId: 'cell-B2', seenVersion: null, rating: 5, outcome: null, tags: [], note: '' }] },
        { ratings: [{ cellId: 'cell-A1', seenVersion: null, rating: 2, outcome: null, tags: [], note: '' }] },
      ]),
    );
  });

  it('moves to the right instead where the person set it so, over skipped cells', async () => {
    localStorage.setItem('proofplate.move-after-rating', 'right');
    const { user } = await openPage({}, 'A1');
    cellOf('A1').focus();
    await user.keyboard('4');
    expect(cellOf('B1')).toHaveAttribute('aria-selected', 'true');
  });

  it('puts a refused rating back, says so, and sends it again on demand', async () => {
    let isAway = true;
    const ratings = ratingStore();
    const rate = (request: { body: unknown }) => (isAway ? problem(503, 'try-again', 'Too busy') : ratings.save(request));
    const { user } = await openPage({ [rateOf()]: rate }, undefined, ratings);
    cellOf('B2').focus();
    await user.keyboard('5');
    expect(await screen.findByText('B2 was not saved.')).toBeInTheDocument();
    expect(cellOf('B2')).not.toHaveAccessibleName(/rated/);
    isAway = false;
    await user.click(screen.getByRole('button', { name: 'Send again' }));
    await waitFor(() => expect(cellOf('B2')).toHaveAccessibleName(/rated 5/));
    expect(screen.queryByText('B2 was not saved.')).not.toBeInTheDocument();
  });

  it('shows both values when the cell was rated on another screen, and stores the chosen one against the newer version', async () => {
    const current = rating('B2', { rating: 1, version: 4 });
    const ratings = ratingStore();
    let isFirst = true;
    const { user } = await openPage({
      [rateOf()]: (request) => {
        if (!isFirst) return ratings.save(request);
        isFirst = false;
        const yours = { rating: 5, outcome: null, tags: [], note: '' };
        return problem(412, 'stale-version', 'Changed meanwhile', { current: { conflicts: [{ cellId: 'cell-B2', yours, current }] } });
      },
    });
    cellOf('B2').focus();
    await user.keyboard('5');
    const dialog = await screen.findByRole('dialog', { name: /B2 was rated somewhere else/, hidden: true });
    expect(within(dialog).getByText('1')).toBeInTheDocument();
    await user.click(within(dialog).getByRole('button', { name: 'Take the one from here', hidden: true }));
    await waitFor(() => expect(server.bodies(rateOf())[1]).toMatchObject({ ratings: [{ cellId: 'cell-B2', seenVersion: 4, rating: 5 }] }));
  });

  it('keeps tags and note with the rating, and shows what others said', async () => {
    const others = [rating('B2', { id: 'r-2', memberId: 'member-2', by: 'Jonas Brandt', rating: 2, tags: ['haze'] })];
    const { user } = await openPage({}, undefined, ratingStore([rating('B2'), ...others]));
    expect(within(panel('B2')).getByText('Jonas Brandt', { exact: false })).toHaveTextContent('2 Jonas Brandt: haze');
    await user.click(within(panel('B2')).getByRole('button', { name: 'even' }));
    fireEvent.change(within(panel('B2')).getByLabelText('Note'), { target: { value: 'dry cloth test' } });
    fireEvent.blur(within(panel('B2')).getByLabelText('Note'));
    await waitFor(() =>
      expect(server.bodies(rateOf()).at(-1)).toMatchObject({
        ratings: [{ cellId: 'cell-B2', rating: 3, tags: ['even'], note: 'dry cloth test' }],
      }),
    );
  });

  it('asks for the criteria first, with the effect’s own as a proposal, and rates nothing before', async () => {
    const { user } = await openPage({
      [readOf('inspection')]: () => ({
        body: inspection({ criteria: null, criteriaRecordedAt: null, areCriteriaFixed: false }),
      }),
      [`PUT /api/coupons/${couponId}/criteria`]: () => ({ body: inspection() }),
    });
    cellOf('B2').focus();
    await user.keyboard('5');
    expect(server.bodies(rateOf())).toEqual([]);
    expect(screen.getByLabelText('Limit')).toHaveValue('35');
    await user.clear(screen.getByLabelText('Limit'));
    await user.type(screen.getByLabelText('Limit'), '28.5');
    await user.click(screen.getByRole('button', { name: 'Record the criteria' }));
    await waitFor(() =>
      expect(server.requests.find(({ method }) => method === 'PUT')).toMatchObject({
        path: `/api/coupons/${couponId}/criteria`,
        body: { criteria: [{ quantity: 'lightness', comparison: 'at most', value: 28.5 }] },
      }),
    );
    expect(server.requests.find(({ method }) => method === 'PUT')?.headers.get('if-match')).toBe('"v5"');
  });

  it('maps a response with its numbers, hatches what is missing and names the unit', async () => {
    const { user } = await openPage({
      [readOf('inspection')]: () => ({ body: inspection({ measurements: [measured('A1', 26.4), measured('B1', 71)] }) }),
    });
    await user.click(screen.getByRole('radio', { name: 'L*' }));
    expect(cellOf('A1')).toHaveAccessibleName(/L\* of the mark 26$/);
    expect(cellOf('B2')).toHaveAccessibleName(/not measured/);
    const legend = screen.getByRole('group', { name: 'Legend: L* of the mark' });
    expect(legend).toHaveTextContent('26 dark');
    expect(legend).toHaveTextContent('71 light');
    cellOf('A1').focus();
    await user.keyboard('h');
    expect(screen.getByRole('radio', { name: 'Contrast' })).toBeChecked();
  });

  it('takes a block from a spreadsheet, marks what cannot be read, and takes the paste back as one', async () => {
    const { user } = await openPage({
      [`POST /api/coupons/${couponId}/measurements`]: () => ({ status: 201, body: { measurements: [] } }),
    });
    await user.click(screen.getByRole('button', { name: 'Enter measurements' }));
    const field = (address: string) => screen.getByRole('textbox', { name: new RegExp(`^${address}`), hidden: true });
    const paste = () => fireEvent.paste(field('A1'), { clipboardData: { getData: () => '26,4\t30\r\ndark\t27,5\t99' } });
    paste();
    expect(field('B2')).toHaveValue('27,5');
    expect(field('B1')).toBeInvalid();
    // A2 was skipped and takes nothing; one value hung over the edge
    expect(field('A2')).toHaveValue('');
    expect(screen.getByText('1 pasted values lie outside the plate.')).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Undo', hidden: true }));
    expect([field('A1'), field('B2')].map((input) => (input as HTMLInputElement).value)).toEqual(['', '']);
    paste();
    fireEvent.change(screen.getByLabelText('Illuminant'), { target: { value: 'D65' } });
    fireEvent.change(screen.getByLabelText('Observer'), { target: { value: '10°' } });
    fireEvent.change(screen.getByLabelText('Geometry of light and view'), { target: { value: '45/0' } });
    fireEvent.change(screen.getByLabelText('Instrument'), { target: { value: 'Colorimeter 1' } });
    await user.click(screen.getByRole('button', { name: 'Save 2 values', hidden: true }));
    const condition = { methodDetail: { illuminant: 'D65', observer: '10°', geometry: '45/0' }, instrument: 'Colorimeter 1' };
    await waitFor(() =>
      expect(server.bodies(`POST /api/coupons/${couponId}/measurements`)).toEqual([
        {
          measurements: [
            { cellId: 'cell-A1', quantity: 'lightness', method: 'colorimeter', value: 26.4, ...condition },
            { cellId: 'cell-B2', quantity: 'lightness', method: 'colorimeter', value: 27.5, ...condition },
          ],
        },
      ]),
    );
  });

  it('lists what the seal still needs, and takes one reason for all cells that nobody rates', async () => {
    const ratings = {
      code: 'ratings',
      text: '2 cells are not rated. Rate them, or say why not.',
      addresses: ['A1', 'B1'],
      isBlocking: true,
    };
    const { user } = await openPage({
      [readOf('inspection')]: () => ({ body: inspection({ missingToInspect: [ratings] }) }),
      [`POST /api/coupons/${couponId}/inspect`]: () => ({ body: coupon({ state: 'inspected' }) }),
    });
    await user.click(screen.getAllByRole('button', { name: 'Seal coupon' })[0] as HTMLElement);
    const dialog = screen.getByRole('dialog', { name: `Seal ${code}`, hidden: true });
    expect(within(dialog).getByText('A1, B1')).toBeInTheDocument();
    const finish = within(dialog).getByRole('button', { name: 'Finish the inspection', hidden: true });
    expect(finish).toBeDisabled();
    fireEvent.change(within(dialog).getByLabelText('Why these cells are not rated'), { target: { value: 'plate bent there' } });
    await user.click(finish);
    await waitFor(() =>
      expect(server.bodies(`POST /api/coupons/${couponId}/inspect`)).toEqual([
        { unratedCells: ['A1', 'B1'].map((address) => ({ cellId: `cell-${address}`, reason: 'plate bent there' })) },
      ]),
    );
  });

  it('says in words when the shop has no such coupon', async () => {
    server = fakeServer({ 'GET /api/coupons/C-9999': () => problem(404, 'not-found', 'There is no such thing here') });
    renderRoutes(
      [
        {
          path: '/coupons/:code',
          element: (
            <StatusLineProvider>
              <CouponPage />
            </StatusLineProvider>
          ),
        },
      ],
      '/coupons/C-9999',
    );
    expect(await screen.findByText('There is no such thing here')).toBeInTheDocument();
  });
});
