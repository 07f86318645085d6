import { fireEvent, screen, waitFor } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as PlanPage } from './coupon-plan';

const fields = [
  { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', maximum: 100, step: 1 },
  { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', maximum: 5000, step: 10 },
  { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', step: 0.001 },
];
const level = (value: number, unit: string) => ({ entered: { value, unit }, physical: value });
const preview = {
  ...{
    rows: 1,
    columns: 2,
    rowFactor: null,
    markingTime: {
      ...{ totalS: 73, beamOnS: 60, errorS: null, missingBecause: null, quickestCellS: 30, slowestCellS: 43 },
      overheads: { basis: 'profile', jumpSpeedMmPerS: 5000, notFittedBecause: 'no time is logged; it takes 3' },
    },
    plate: { widthMm: 60, heightMm: 31.4 },
  },
  columnFactor: { parameter: 'powerPercent', spacing: 'steps', levels: [level(20, 'percentFromZero'), level(40, 'percentFromZero')] },
  baseSetting: {},
  cells: [
    { address: 'A1', rowIndex: 0, columnIndex: 0, runOrder: 2, dose: { value: 3, missingBecause: null } },
    { address: 'A2', rowIndex: 0, columnIndex: 1, runOrder: 1, dose: { value: 9, missingBecause: null } },
  ],
  ...{ powerBasis: 'not calibrated', spotUm: 42, doseCaution: null },
  warnings: [{ code: 'dose', title: '1 cell at or above 7 J/mm² may burn too deep', detail: 'Stop the power at 20 %.', addresses: ['A2'] }],
  cautions: [{ id: 'caution-1', subject: 'Keep the extraction on', text: 'Titanium dust can catch fire.', source: 'Manual' }],
};
const page1 = (items: object[]) => () => ({ body: { items, nextCursor: null } });
const choices = {
  'GET /api/machines': page1([
    {
      id: 'x',
      name: 'Bench 2',
      profile: {
        panel: { fields },
        physical: { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 20, m2: 1.5, beamDiameterMm: 7 },
      },
    },
  ]),
  'GET /api/machines/x/lenses': page1([{ lensId: 'l', lensName: 'F160', focalLengthMm: 160, measuredSpotUm: null, isMounted: true }]),
  'GET /api/materials': page1([{ id: 'm', name: 'Titanium tag' }]),
  'GET /api/finishes': page1([{ id: 'f', name: 'Bead blasted' }]),
  'GET /api/effects': page1([{ id: 'e', name: 'Colour anneal' }]),
  'GET /api/machines/x/calibrations': page1([]),
  'GET /api/cautions/for': () => ({ body: { isForbidden: false, items: [] } }),
};

// Every test draws the whole form and its plate.

let server: ReturnType<typeof fakeServer>;
beforeEach(() => {
  sessionStorage.clear();
  openSession(makeSessionAnswer('operator'));
});
afterEach(() => {
  server.restore();
  closeSession('left');
});

async function openPage(handlers: Parameters<typeof fakeServer>[0] = {}, isForbidden = false) {
  server = fakeServer({ ...choices, 'POST /api/coupons/preview': () => ({ body: preview }), ...handlers });
  const page = (
    <StatusLineProvider>
      <PlanPage />
    </StatusLineProvider>
  );
  const rendered = renderRoutes(
    [
      { path: '/coupons/plan', element: page },
      { path: '/coupons/:code/mark', element: <p>at the machine</p> },
    ],
    '/coupons/plan',
  );
  const { user } = rendered;
  await user.selectOptions(await screen.findByLabelText('Machine'), 'x');
  for (const [label, id] of [
    ['Material', 'm'],
    ['Finish', 'f'],
    ['Effect wanted', 'e'],
  ] as const)
    await user.selectOptions(screen.getByLabelText(label), id);
  if (isForbidden) return rendered;
  await user.selectOptions(await screen.findByLabelText('Rows: what varies'), '');
  await user.click(screen.getByRole('switch', { name: 'Mark corner marks and letters' }));
  return rendered;
}
/** Key by key is what the fields' own tests are for; here only the whole text matters. */
const enter = (label: RegExp | string, value: string) => fireEvent.change(screen.getByLabelText(label), { target: { value } });
function fillIn() {
  enter(/^From/, '20');
  enter(/^To/, '40');
  enter('Levels', '2');
  enter(/^Speed/, '800');
  enter(/^Line spacing/, '12 um');
}

describe('planning a coupon', () => {
  it('shows dose, warnings, time and plate of what is typed, and stores it once it is saved', async () => {
    const { user } = await openPage({ 'POST /api/coupons': () => ({ status: 201, body: { id: 'c', code: 'C-0124' } }) });
    expect(screen.getByLabelText('Lens')).toHaveValue('l');
    fillIn();
    expect(await screen.findByText('1 cell at or above 7 J/mm² may burn too deep')).toBeVisible();
    expect(screen.getByRole('gridcell', { name: 'A2, power 40 percent, dose 9.0, above a limit' })).toBeVisible();
    expect(screen.getByText('1 min 13 s')).toBeVisible();
    expect(screen.getByText('60 × 32 mm')).toBeVisible();
    await user.click(screen.getByRole('checkbox', { name: 'I have read this caution' }));
    await user.click(screen.getByRole('button', { name: 'Save the plan' }));
    expect(await screen.findByText('at the machine')).toBeVisible();
    expect(sessionStorage).toHaveLength(0);
    expect(server.bodies('POST /api/coupons')).toEqual([
      expect.objectContaining({
        ...{ machineId: 'x', lensId: 'l', materialId: 'm', finishId: 'f', effectId: 'e', acknowledgedCautionIds: ['caution-1'] },
        columns: { parameter: 'powerPercent', from: 20, to: 40, count: 2, spacing: 'steps' },
        base: {
          values: { speedMmPerS: { value: 800, unit: 'mm/s' }, lineSpacingUm: { value: 12, unit: 'um' } },
          ...{ fill: 'both directions', assist: 'none' },
        },
      }),
    ]);
  });

  it('is not saved before the cautions are said to be read, and gives nobody’s word for it', async () => {
    const { user } = await openPage({ 'POST /api/coupons': () => ({ status: 201, body: { id: 'c', code: 'C-0124' } }) });
    fillIn();
    await screen.findAllByText('Keep the extraction on');
    await user.click(screen.getByRole('button', { name: 'Save the plan' }));
    const box = screen.getByRole('checkbox', { name: 'I have read this caution' });
    await waitFor(() => expect(box).toHaveAccessibleDescription('Read the caution for this work and say so.'));
    expect(server.bodies('POST /api/coupons')).toEqual([]);
    await user.click(screen.getByRole('link', { name: /^Cautions: Read the caution/ }));
    expect(box).toHaveFocus();
    await user.click(box);
    await user.click(screen.getByRole('button', { name: 'Save the plan' }));
    expect(await screen.findByText('at the machine')).toBeVisible();
    expect(server.bodies('POST /api/coupons')).toEqual([expect.objectContaining({ acknowledgedCautionIds: ['caution-1'] })]);
  });

  it('refuses a material that must never be marked as soon as it is chosen, and asks for nothing more', async () => {
    const never = { id: 'n', level: 'never', subject: 'Do not mark PVC.', text: 'It gives off hydrogen chloride.', source: 'A list' };
    const { user } = await openPage(
      {
        'GET /api/cautions/for': ({ query }) => ({
          body: query.get('materialId') === 'm' ? { isForbidden: true, items: [never] } : { isForbidden: false, items: [] },
        }),
      },
      true,
    );
    const refusal = await screen.findByRole('alert');
    expect(refusal).toHaveTextContent('Never. Do not mark PVC.');
    expect(refusal).toHaveTextContent('It gives off hydrogen chloride.');
    expect(refusal).toHaveTextContent('Source: A list.');
    expect(screen.queryByLabelText(/^From/)).not.toBeInTheDocument();
    expect(screen.getByText(/The rest of the plan is not asked for/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Save the plan' }));
    await user.click(await screen.findByRole('link', { name: 'Material: This must not be marked. Choose another material.' }));
    expect(screen.getByLabelText('Material')).toHaveFocus();
    expect(server.bodies('POST /api/coupons')).toEqual([]);
  });

  it('gives what was typed back after the page was left, until it is saved or started afresh', async () => {
    const first = await openPage();
    fillIn();
    first.unmount();
    server.restore();
    server = fakeServer({ ...choices, 'POST /api/coupons/preview': () => ({ body: preview }) });
    const { user, unmount } = renderRoutes([{ path: '/coupons/plan', element: <PlanPage /> }], '/coupons/plan');
    expect(await screen.findByText('The plan that you had begun is restored.')).toBeVisible();
    expect(screen.getByLabelText(/^Speed/)).toHaveValue('800');
    expect(screen.getByLabelText('Rows: what varies')).toHaveValue('');
    await waitFor(() => expect(screen.getByLabelText('Lens')).toHaveValue('l'));
    await user.click(screen.getByRole('button', { name: 'Start afresh' }));
    expect(screen.getByLabelText('Machine')).toHaveValue('');
    unmount();
    renderRoutes([{ path: '/coupons/plan', element: <PlanPage /> }], '/coupons/plan');
    expect(await screen.findByLabelText('Machine')).toHaveValue('');
    expect(screen.queryByText('The plan that you had begun is restored.')).not.toBeInTheDocument();
  });

  it('says at once what the panel cannot show, and lists every missing field after Save, keeping what was typed', async () => {
    const { user } = await openPage();
    enter(/^Speed/, '805');
    await waitFor(() => expect(screen.getByLabelText(/^Speed/)).toHaveAccessibleDescription(/cannot show 805 mm\/s/));
    expect(screen.getByText('Still open: Columns, from · Columns, to · Line spacing.')).toBeVisible();
    expect(screen.getByLabelText(/^From/)).toHaveAccessibleDescription('');
    await user.click(screen.getByRole('button', { name: 'Save the plan' }));
    await waitFor(() => expect(screen.getByLabelText(/^From/)).toHaveAccessibleDescription('Enter the first level.'));
    expect(screen.getByLabelText(/^To/)).toHaveAccessibleDescription('Enter the last level.');
    expect(screen.getByLabelText(/^Speed/)).toHaveValue('805');
    expect(server.bodies('POST /api/coupons')).toEqual([]);
  });

  it('refuses a material that must never be marked, in the words of the caution', async () => {
    const detail = 'Never mark PVC (source). Choose another material, or ask the laser safety officer.';
    await openPage({
      'POST /api/coupons/preview': () => problem(409, 'never-mark', 'This must not be marked', { detail }),
    });
    fillIn();
    expect(await screen.findByText('This must not be marked.')).toBeVisible();
    expect(screen.getByText(detail)).toBeVisible();
  });

  it('shows a refusal of the server at its field', async () => {
    const errors = [{ pointer: '#/columns/count', detail: 'The panel cannot show 2 different levels.' }];
    await openPage({ 'POST /api/coupons/preview': () => problem(422, 'invalid-fields', 'Some fields', { errors }) });
    fillIn();
    await waitFor(() => expect(screen.getByLabelText('Levels')).toHaveAccessibleDescription('The panel cannot show 2 different levels.'));
  });
});
