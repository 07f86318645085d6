import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../../../components/status-line';
import { closeSession, openSession } from '../../../lib/session';
import { fakeServer, problem } from '../../../testing/fake-server';
import { renderRoutes } from '../../../testing/render';
import { makeSessionAnswer } from '../../../testing/sessions';
import { CraterSection } from './crater-section';

let count = 0;
let couponId = '';
let server: ReturnType<typeof fakeServer>;

const series = { pulses: 1, pulseWidthNs: 8, focusOffsetMm: 0 };
const point = (address: string, pulseEnergyUj: number | null, diameterUm: number, rest: object = {}) => ({
  ...{ address, pulseEnergyUj, diameterUm, series, excludedBecause: null, isFarAbove: false },
  ...rest,
});
const found = (rest: object = {}) => ({
  ...{ couponId, series, pointCount: 2, refusedBecause: null, incubation: null, notSavableBecause: null },
  points: [
    point('A1', 40, 22.7),
    point('A2', 400, 68.1, { isFarAbove: true }),
    point('A3', 60, 50, { excludedBecause: 'pulses touch: one every 20 µm, craters of 50 µm' }),
    point('A4', null, 30, { excludedBecause: 'No power is set.' }),
  ],
  fit: {
    ...{ spotRadiusUm: 30, spotRadiusStandardErrorUm: 0.4, thresholdEnergyUj: 30, thresholdEnergyStandardErrorUj: 1.2 },
    ...{ thresholdPeakFluenceJPerCm2: 2.122, thresholdPeakFluenceStandardErrorJPerCm2: 0.061 },
    ...{ slopeUm2: 1800, slopeStandardErrorUm2: 20, interceptUm2: -6122, rSquared: 0.998 },
  },
  remarks: ['More than 10 thresholds: A2.'],
  spot: { diameterUm: 60.01, standardErrorUm: 0.8, method: 'Crater widths of C-0012, n = 2, ± 0.8 µm', measuredOn: '2026-11-20' },
  place: {
    ...{ machineId: 'm', machineName: 'Bench 2', lensId: 'l', lensName: 'F160', version: 3 },
    ...{ measuredSpotUm: 36, spotMethod: 'Knife edge', spotMeasuredOn: '2026-01-13' },
  },
  ...{ formula: 'D² = 2 w² ln(E / Eth)', source: 'J. M. Liu, Opt. Lett. 7 (1982) 196', allowedActions: ['save-spot'] },
  ...rest,
});
const url = () => `/api/coupons/${couponId}/crater-fit`;
const plain = (text: string | null) => (text ?? '').replaceAll('\u00A0', ' ');

async function show(handlers: Parameters<typeof fakeServer>[0]) {
  server = fakeServer(handlers);
  const Page = () => (
    <StatusLineProvider>
      <CraterSection coupon={{ id: couponId, code: 'C-0012' }} />
    </StatusLineProvider>
  );
  renderRoutes([{ path: '/', Component: Page }], '/');
}

beforeEach(() => {
  count += 1;
  couponId = `coupon-${count}`;
  openSession(makeSessionAnswer());
});
afterEach(() => {
  server.restore();
  closeSession('left');
});

describe('threshold and spot of a coupon', () => {
  it('are told in words with their errors, drawn with a name, and every crater stands in the table', async () => {
    await show({ [`GET ${url()}`]: () => ({ body: found() }) });
    const picture = await screen.findByRole('img');
    expect(plain(picture.getAttribute('aria-label'))).toContain('a line through 2 of them with slope 1800 µm²: spot 60.00 ± 0.80 µm');
    const section = screen.getByRole('region', { name: 'Threshold and spot' });
    expect(plain(section.textContent)).toContain('Threshold, peak fluence2.122 ± 0.061 J/cm²');
    expect(screen.getByRole('region', { name: 'Left out of the line' })).toHaveTextContent('A3: pulses touch: one every 20 µm');
    fireEvent.click(screen.getByText(/^4 craters with pulse energy/));
    const rows = within(screen.getByRole('table', { name: 'Craters' })).getAllByRole('row');
    expect(rows.map((row) => within(row).getAllByRole('cell').at(-1)?.textContent)).toEqual([
      expect.stringContaining('yes'),
      expect.stringContaining('more than ten thresholds'),
      expect.stringContaining('left out: pulses touch'),
      expect.stringContaining('left out: No power is set.'),
    ]);
    // one each, a ring round the one far above, none for the one whose pulse energy nobody knows
    expect(picture.querySelectorAll('circle')).toHaveLength(4);
    expect(screen.getByText('More than 10 thresholds: A2.')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: /threshold and spot from craters/ })).toHaveAttribute('href', '/science/ablation');
  });

  it('say why there is no line', async () => {
    const none = found({ fit: null, spot: null, refusedBecause: '4 craters can be used; the line needs 5.' });
    await show({ [`GET ${url()}`]: () => ({ body: none }) });
    expect(await screen.findByText('No line: 4 craters can be used; the line needs 5.')).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /measured spot/ })).toBeNull();
  });

  it('become the measured spot after old and new were shown, with the version that was read', async () => {
    let saved = false;
    const after = () => found(saved ? { notSavableBecause: 'It is the measured spot already.' } : {});
    await show({
      [`GET ${url()}`]: () => ({ body: after() }),
      [`POST ${url()}/measured-spot`]: () => {
        saved = true;
        return { body: after() };
      },
    });
    fireEvent.click(await screen.findByRole('button', { name: 'Save as the measured spot of Bench 2 with F160' }));
    const dialog = screen.getByRole('dialog');
    expect(plain(within(dialog).getByRole('region', { name: 'Old' }).textContent)).toContain('36 µm');
    expect(plain(within(dialog).getByRole('region', { name: 'New' }).textContent)).toContain('60.01 µm (+66.7 %)');
    fireEvent.click(within(dialog).getByRole('button', { name: /^Save/ }));
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
    expect(await screen.findByText('It is the measured spot already.')).toBeInTheDocument();
    const sent = server.requests.find(({ method }) => method === 'POST');
    expect(sent?.body).toEqual({ shownSpotUm: 60.01 });
    expect(sent?.headers.get('if-match')).toBe('"v3"');
  });

  it('keep the dialog open and say so when somebody measured on', async () => {
    const detail = 'The craters give 58 µm by now, not 60.01 µm: somebody measured on. Look at the line again.';
    await show({
      [`GET ${url()}`]: () => ({ body: found() }),
      [`POST ${url()}/measured-spot`]: () => problem(409, 'conflict', 'This clashes with what is stored', { detail }),
    });
    fireEvent.click(await screen.findByRole('button', { name: /Save as the measured spot/ }));
    fireEvent.click(within(screen.getByRole('dialog')).getByRole('button', { name: /^Save/ }));
    expect(await within(screen.getByRole('dialog')).findByText(detail)).toBeInTheDocument();
  });

  it('are only read by an operator, who is told whose act it is', async () => {
    await show({ [`GET ${url()}`]: () => ({ body: found({ allowedActions: [] }) }) });
    expect(await screen.findByText('A lead can make this the measured spot of Bench 2 with F160.')).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Save as/ })).toBeNull();
  });
});
