import { emptyPanelFor } from '@proofplate/recipe-model';
import { fireEvent, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { StatusLineProvider } from '../components/status-line';
import type { TransferGround } from '../features/recipes/transfer/transfer.api';
import { closeSession, openSession } from '../lib/session';
import { type FakeHandler, fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeRevision } from '../testing/revisions';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as TransferPage } from './recipe-transfer';

type Place = TransferGround['targets'][number];

const table = (fullW: number): Place['calibrations'][number] => ({
  ...{ id: `table of ${fullW} W`, measuredOn: '2026-08-17', frequencyKhz: 40, pulseWidthNs: null },
  points: [1, 50, 100].map((percent) => ({ percent, watts: (percent / 100) * fullW })),
});
const place = (name: string, given: Partial<Place> = {}): Place => ({
  ...{ machine: { id: name, name }, lens: { id: 'F160', name: 'F160' }, focalLengthMm: 160, measuredSpotUm: 60, recipes: [] },
  physical: {
    ...{ sourceKind: 'fibre-q-switched', wavelengthNm: 1064, ratedPowerW: 60, pulseWidthsNs: [100], topSpeedMmPerS: 8000 },
    maxPulseEnergyMj: [{ pulseWidthNs: null, energyMj: 1.5 }],
    frequencyRangeKhz: { from: 20, to: 400 },
  },
  panel: emptyPanelFor('fibre-q-switched'),
  calibrations: [table(60)],
  ...given,
});
const set = (value: number, unit: 'percentFromZero' | 'mm/s' | 'kHz' | 'mm' | 'count', physical = value) => ({
  entered: { value, unit },
  physical,
});
// 20 W, 40 kHz, 400 mm/s, 20 µm on a spot of 40 µm: to 60 µm the reference of the physics gives 45 W, 600 mm/s, 30 µm
const ground: TransferGround = {
  source: place('Bench A', { measuredSpotUm: 40, calibrations: [table(40)] }),
  steps: [
    {
      purpose: 'engrave',
      pauseAfterS: 0,
      parameters: {
        values: {
          powerPercent: set(50, 'percentFromZero'),
          speedMmPerS: set(400, 'mm/s'),
          frequencyKhz: set(40, 'kHz'),
          lineSpacingUm: set(0.02, 'mm', 20),
          passes: set(1, 'count'),
        },
        fill: 'both directions',
        assist: 'none',
        power: { watts: 20, basis: 'calibration' },
      },
    },
  ],
  targets: [
    place('Bench B'),
    place('Bench C', { physical: { ...place('x').physical, wavelengthNm: 355 } }),
    place('Bench D', { calibrations: [] }),
    place('Bench E', { physical: { ...place('x').physical, ratedPowerW: 20 }, calibrations: [table(20)] }),
  ],
};
const revision = makeRevision();
const PREVIEW = `/api/revisions/${revision.id}/transfers`;

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(at = '', handlers: Record<string, FakeHandler> = {}) {
  server = fakeServer({
    [`GET /api/revisions/${revision.id}`]: () => ({ body: revision }),
    [`GET ${PREVIEW}/targets`]: () => ({ body: ground }),
    ...handlers,
  });
  return renderRoutes(
    [
      {
        path: '/recipes/:code/revisions/:revisionId/transfer',
        element: (
          <StatusLineProvider>
            <TransferPage />
          </StatusLineProvider>
        ),
      },
      { path: '*', element: <p>elsewhere</p> },
    ],
    `/recipes/R-0042/revisions/${revision.id}/transfer${at}`,
  );
}
const rowOf = (name: RegExp) =>
  within(screen.getByRole('row', { name }))
    .getAllByRole('cell')
    .map(({ textContent }) => textContent?.replaceAll('\u00A0', ' ').trim());

describe('the transfer page', () => {
  it('judges every target before one is chosen, those that keep the numbers first', async () => {
    openPage();
    const targets = within(await screen.findByRole('group', { name: /machine and lens/ })).getAllByRole('listitem');
    expect(targets.map(({ textContent }) => textContent)).toEqual([
      'Bench B, F160Equivalent by these numbers',
      'Bench C, F160Not equivalent',
      'Bench E, F160Not equivalent',
      'Bench D, F160Not known',
    ]);
  });

  it('shows what is kept and what the target’s panel shows, and drafts it', async () => {
    const draft = makeRevision({ id: 'draft-1', number: null, state: 'draft' });
    openPage('', { [`POST ${PREVIEW}`]: () => ({ status: 201, body: draft }) });
    await userEvent.click(await screen.findByRole('radio', { name: /Bench B/ }));
    expect(rowOf(/^Peak fluence/)).toEqual(['79.6', '79.6', 'kept']);
    expect(rowOf(/^Power 50/)).toEqual(['50.0 %', '75.0 %', '']);
    expect(rowOf(/^Speed/)).toEqual(['400 mm/s', '600 mm/s', '']);
    expect(screen.getByRole('img', { name: /The numbers are kept from 20 to 53.33 kHz/ })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Create draft' }));
    expect(await screen.findByText('elsewhere')).toBeInTheDocument();
    expect(server.bodies(`POST ${PREVIEW}`)).toEqual([{ machineId: 'Bench B', lensId: 'F160', choices: [], acceptNotEquivalent: false }]);
  });

  it('follows the slider and the typed frequency, and refuses one outside the interval', async () => {
    openPage('?machine=Bench B&lens=F160');
    const slider = await screen.findByRole('slider', { name: 'Frequency inside the interval' });
    fireEvent.change(slider, { target: { value: '38' } });
    expect(rowOf(/^Speed/)).toEqual(['400 mm/s', '570 mm/s', '']);
    const field = screen.getByRole('textbox', { name: /^Frequency/ });
    await userEvent.clear(field);
    await userEvent.type(field, '42');
    expect(rowOf(/^Speed/)).toEqual(['400 mm/s', '630 mm/s', '']);
    await userEvent.clear(field);
    await userEvent.type(field, '99');
    expect(screen.getByText(/The frequency must be 20 to 53.333 kHz/)).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: /Nearest to the source/ }));
    expect(rowOf(/^Speed/)).toEqual(['400 mm/s', '600 mm/s', '']);
  });

  it('never gives what comes nearest the look or the act of an equivalent setting', async () => {
    openPage('?machine=Bench E&lens=F160');
    expect(await screen.findByText('What comes nearest, not equivalent')).toBeInTheDocument();
    expect(screen.getByText(/the rated 20 W ends the frequencies at 17.8 kHz/)).toBeInTheDocument();
    expect(screen.getByRole('img', { name: /No frequency keeps the numbers/ })).toBeInTheDocument();
    expect(screen.queryByRole('slider')).not.toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Create draft, not equivalent' })).toBeInTheDocument();
  });

  it('carries nothing to another wavelength, and links to where a missing number is entered', async () => {
    openPage('?machine=Bench C&lens=F160');
    expect(await screen.findByText(/works at 355 nm, the source at 1064 nm/)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Create draft/ })).not.toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Plan a coupon' })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('radio', { name: /Bench D/ }));
    expect(screen.getByText(/No power table of Bench D holds at 40 kHz/)).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Open Bench D' })).toHaveAttribute('href', '/equipment/machines/Bench%20D');
    expect(screen.queryByText(/On the panels/)).not.toBeInTheDocument();
  });

  it('says why the server drafted nothing, and keeps what was chosen', async () => {
    const refused = () => problem(409, 'draft-open', 'You have an open draft of this recipe');
    openPage('?machine=Bench B&lens=F160', { [`POST ${PREVIEW}`]: refused });
    await userEvent.click(await screen.findByRole('button', { name: 'Create draft' }));
    expect(await screen.findByRole('alert')).toHaveTextContent(
      'No draft was made.Nothing was changed.You have an open draft of this recipe',
    );
    expect(screen.getByRole('radio', { name: /Bench B/ })).toBeChecked();
  });

  it('sends the reader of a draft back to it', async () => {
    openPage('', { [`GET ${PREVIEW}/targets`]: () => problem(409, 'revision-state', 'Submit it first.') });
    expect(await screen.findByRole('heading', { name: 'A draft is not transferred' })).toBeInTheDocument();
  });
});
