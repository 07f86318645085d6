import { screen, within } from '@testing-library/react';
import { StatusLineProvider } from '../../components/status-line';
import { closeSession, openSession } from '../../lib/session';
import { fakeServer, problem } from '../../testing/fake-server';
import { renderRoutes } from '../../testing/render';
import { makeSessionAnswer } from '../../testing/sessions';
import { MachineTime } from './components/machine-time';
import { RunTime } from './components/run-time';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => {
  localStorage.clear();
  openSession(makeSessionAnswer('operator'));
});
afterEach(() => {
  server.restore();
  closeSession('left');
});

const overheads = {
  ...{ basis: 'fitted', jumpSpeedMmPerS: 5000, n: 8, spreadS: 0.1, lineMs: 0.8, lineStandardErrorMs: 0.1 },
  ...{ scanMs: null, scanStandardErrorMs: null, scanMissingBecause: 'time per scan and time per line need 4 logs' },
};
const ground = { physical: {}, overheads };
const step = { lineSpacingUm: 50, speedMmPerS: 1000, passes: 1, fill: 'both directions' };
const timing = { steps: [step], pausesS: 0, missingBecause: null, ground };
const logged = {
  ...{ id: 't1', runCode: 'J-0007', couponCode: null, address: null, pausesS: 0, seconds: 5, counts: true, profileNumber: 1 },
  ...{
    isOfPresentMachine: true,
    isOutlier: false,
    replaced: null,
    reason: '',
    loggedBy: 'Jonah Pell',
    loggedAt: '2026-05-14T07:40:00.000Z',
  },
  areas: [{ widthMm: 20, heightMm: 10, ...step, count: 1 }],
  predicted: { totalS: 4, beamOnS: 3.9, errorS: 0.1, missingBecause: null },
};

function open(element: React.ReactNode, handlers: Parameters<typeof fakeServer>[0]) {
  server = fakeServer(handlers);
  return renderRoutes([{ path: '/', element: <StatusLineProvider>{element}</StatusLineProvider> }], '/');
}
const run = { id: 'run-7', code: 'J-0007', revisionId: 'v1', isOpen: true };
const TIMES = 'GET /api/runs/run-7/logged-times';
const LOG = 'POST /api/runs/run-7/logged-times';

describe('the marking time of a run', () => {
  it('says how long the part takes once its area is typed, and logs the time typed as minutes and seconds', async () => {
    const { user } = open(<RunTime run={run} />, {
      [TIMES]: () => ({ body: { timing, partArea: null, items: [] } }),
      [LOG]: () => ({ status: 201, body: logged }),
    });
    await user.type(await screen.findByLabelText(/Width along the lines/), '20');
    await user.type(screen.getByLabelText(/Height across them/), '10');
    // 4.02 s beam, 2 ms jumps and 201 lines of 0.8 ms; ± by hand from the spread and 201 × 0.1 ms
    expect(screen.getByText('4.2 s ± 0.1 s')).toBeVisible();
    expect(screen.getByText('With overheads fitted from 8 logged times.')).toBeVisible();
    await user.type(screen.getByLabelText('Or type the time'), '0:05');
    expect(screen.getByText('5.0 s: +19.5 % against predicted 4.2 s.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Log this time' }));
    expect(await screen.findByText('5.0 s is logged for J-0007.')).toBeVisible();
    expect(server.bodies(LOG)).toEqual([{ seconds: 5, widthMm: 20, heightMm: 10 }]);
  });

  it('takes the area from the part set-up and logs with two taps', async () => {
    const { user } = open(<RunTime run={run} />, {
      [TIMES]: () => ({ body: { timing, partArea: { widthMm: 201.06, heightMm: 7.5 }, items: [] } }),
      [LOG]: () => ({ status: 201, body: logged }),
    });
    await user.click(await screen.findByRole('button', { name: 'Start the clock' }));
    await user.click(screen.getByRole('button', { name: 'Stop and log' }));
    await screen.findByText('5.0 s is logged for J-0007.');
    expect(server.bodies(LOG)).toEqual([{ seconds: expect.any(Number), widthMm: 201.06, heightMm: 7.5 }]);
  });

  it('asks for the area before it logs, and keeps a refused time in the field', async () => {
    const { user } = open(<RunTime run={run} />, {
      [TIMES]: () => ({ body: { timing, partArea: null, items: [] } }),
      [LOG]: () =>
        problem(422, 'invalid-fields', 'Some fields need another look', {
          errors: [{ pointer: '#/seconds', detail: 'The pauses take 60 s.' }],
        }),
    });
    await user.type(await screen.findByLabelText('Or type the time'), '12');
    await user.click(screen.getByRole('button', { name: 'Log this time' }));
    expect(screen.getByText('Enter the width.')).toBeVisible();
    await user.type(screen.getByLabelText(/Width along the lines/), '20');
    await user.type(screen.getByLabelText(/Height across them/), '10');
    await user.click(screen.getByRole('button', { name: 'Log this time' }));
    expect(await screen.findByText('The pauses take 60 s.')).toBeVisible();
    expect(screen.getByLabelText('Or type the time')).toHaveValue('12');
  });
});

describe('the marking time of a machine', () => {
  const LIST = 'GET /api/machines/m1/logged-times';

  it('shows the overheads with their error, why one is not known, and a picture that says its points', async () => {
    open(<MachineTime machine={{ id: 'm1', name: 'Bench 2' }} />, { [LIST]: () => ({ body: { ground, items: [logged] } }) });
    expect(await screen.findByText('0.800 ms ± 0.10 ms')).toBeVisible();
    expect(screen.getByText('Time per scan: time per scan and time per line need 4 logs.')).toBeVisible();
    expect(screen.getByRole('img', { name: /J-0007: predicted 4\.0\ss, logged 5\.0\ss/u })).toBeVisible();
    expect(within(screen.getByRole('table')).getByText('+25.0 %')).toBeVisible();
  });

  it('takes a time out of the count with its reason', async () => {
    const { user } = open(<MachineTime machine={{ id: 'm1', name: 'Bench 2' }} />, {
      [LIST]: () => ({ body: { ground, items: [logged] } }),
      'POST /api/machines/m1/logged-times/t1/corrections': () => ({ status: 201, body: { ...logged, counts: false } }),
    });
    await user.click(await screen.findByRole('button', { name: /Correct the time of J-0007/ }));
    await user.selectOptions(screen.getByLabelText('What is to be done'), 'strike');
    await user.click(screen.getByRole('button', { name: 'Take it out' }));
    expect(await screen.findAllByText(/Say what was wrong/)).not.toHaveLength(0);
    await user.type(screen.getByLabelText('What was wrong'), 'Door was opened');
    await user.click(screen.getByRole('button', { name: 'Take it out' }));
    expect(await screen.findByText(/is taken out of the count\. The first one stays on record/)).toBeVisible();
    const body = { counts: false, reason: 'Door was opened' };
    expect(server.bodies('POST /api/machines/m1/logged-times/t1/corrections')).toEqual([body]);
  });
});
