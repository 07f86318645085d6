import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { type FakeHandler, type FakeRequest, fakeServer, lostConnection, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeChecks, makeEvidenceCell, makeRevision, makeStep } from '../testing/revisions';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as DraftPage } from './recipe-draft';

const draft = makeRevision({
  id: 'draft-1',
  number: null,
  state: 'draft',
  signOffs: [],
  reason: '',
  allowedActions: ['edit', 'discard', 'submit', 'start-confirmation'],
});
// A draft saves itself after a pause in the typing; the page has some sixty fields.
const PATCH = 'PATCH /api/revisions/draft-1';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('operator')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

/** Answers as the api does: the same draft, one version on. */
const saves = ({ body }: FakeRequest) => ({ body: { ...draft, ...(body as object), steps: draft.steps, version: draft.version + 1 } });

function openPage(handlers: Record<string, FakeHandler> = {}) {
  server = fakeServer({
    'GET /api/revisions/draft-1': () => ({ body: draft }),
    'GET /api/revisions/draft-1/evidence/candidates': () => ({ body: { basis: [], confirmation: [] } }),
    'GET /api/revisions/draft-1/checks': () => ({ body: makeChecks() }),
    'GET /api/machines/x1/calibrations': () => ({ body: { items: [], nextCursor: null } }),
    [PATCH]: saves,
    ...handlers,
  });
  const element = (
    <StatusLineProvider>
      <DraftPage />
    </StatusLineProvider>
  );
  return renderRoutes(
    [
      { path: '/recipes/:code/revisions/:revisionId', element },
      { path: '*', element: <p>elsewhere</p> },
    ],
    '/recipes/R-0042/revisions/draft-1',
  );
}

const typeInto = (label: RegExp | string, text: string) => fireEvent.change(screen.getByLabelText(label), { target: { value: text } });

describe('the draft editor', () => {
  it('saves what was typed in the panel’s unit by itself, against the version that was read', async () => {
    openPage();
    await screen.findByLabelText('Speed, mm/s');
    typeInto('Speed, mm/s', '0.8 m/s');
    await waitFor(() => expect(server.bodies(PATCH)).toHaveLength(1), { timeout: 8000 });
    expect(server.bodies(PATCH)[0]).toMatchObject({
      steps: [{ values: { powerPercent: { value: 60, unit: 'percentFromZero' }, speedMmPerS: { value: 0.8, unit: 'm/s' } } }],
    });
    expect(server.requests.find(({ method }) => method === 'PATCH')?.headers.get('if-match')).toBe('"v7"');
    expect(await screen.findByText('Saved')).toBeVisible();
  });

  it('shows the power table that is cited although the tables arrive later, and keeps it', async () => {
    const tables = ['2026-01-12', '2026-04-02'].map((measuredOn, index) => ({
      ...{ id: `table-${index + 1}`, measuredOn, meter: 'Thermopile' },
      ...{ points: [20, 60, 100].map((percent) => ({ percent, watts: percent / 5 })), frequencyKhz: null, pulseWidthNs: null },
    }));
    const citing = { ...draft, calibration: tables[0] };
    let arrive: () => void = () => undefined;
    const arrived = new Promise<void>((resolve) => {
      arrive = resolve;
    });
    openPage({
      'GET /api/revisions/draft-1': () => ({ body: citing }),
      'GET /api/machines/x1/calibrations': async () => {
        await arrived;
        return { body: { items: tables, nextCursor: null } };
      },
    });
    const field = await screen.findByLabelText(/Power table/);
    expect(field).toHaveDisplayValue(/12 Jan 2026, Thermopile/);
    arrive();
    await waitFor(() => expect(within(field).getAllByRole('option')).toHaveLength(3));
    expect(field).toHaveDisplayValue(/12 Jan 2026, Thermopile/);
    typeInto('Reason for the change', 'darker');
    await waitFor(() => expect(server.bodies(PATCH)).toEqual([{ reason: 'darker' }]), { timeout: 8000 });
    fireEvent.change(field, { target: { value: 'table-2' } });
    await waitFor(() => expect(server.bodies(PATCH).at(-1)).toEqual({ calibrationId: 'table-2' }), { timeout: 8000 });
  });

  it('says at the field what the panel can show instead, and saves the rest', async () => {
    openPage();
    await screen.findByLabelText('Power, %');
    typeInto('Power, %', '60.5');
    typeInto('Reason for the change', 'darker');
    await waitFor(() => expect(server.bodies(PATCH)).toEqual([{ reason: 'darker' }]), { timeout: 8000 });
    await waitFor(() => expect(screen.getByLabelText('Power, %')).toHaveAccessibleDescription(/Nearest that it can: 60 % or 61 %/));
    expect(screen.getByLabelText('Power, %')).toHaveValue('60.5');
  });

  it('shows both values when the draft was saved in another place meanwhile, and overwrites neither unseen', async () => {
    const theirs = { ...draft, version: 9, reason: 'theirs', steps: [makeStep(50)] };
    let isStale = true;
    const { user } = openPage({
      'GET /api/revisions/draft-1': () => ({ body: isStale && server.bodies(PATCH).length === 0 ? draft : theirs }),
      [PATCH]: (request) => {
        if (isStale) {
          isStale = false;
          return problem(412, 'stale-version', 'Somebody changed this in the meantime', { current: theirs });
        }
        return saves(request);
      },
    });
    await screen.findByLabelText('Reason for the change');
    typeInto('Reason for the change', 'mine');
    const table = await screen.findByRole('table', { name: 'Reason: both values' }, { timeout: 8000 });
    expect(within(table).getByText('mine')).toBeVisible();
    expect(within(table).getByText('theirs')).toBeVisible();
    expect(screen.getByText('changed only there')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Save the draft as decided' }));
    await waitFor(() => expect(server.bodies(PATCH)).toHaveLength(2), { timeout: 8000 });
    expect(server.bodies(PATCH)[1]).toEqual({ reason: 'mine' });
    expect(
      server.requests
        .filter(({ method }) => method === 'PATCH')
        .at(-1)
        ?.headers.get('if-match'),
    ).toBe('"v9"');
    expect(screen.getByLabelText('Power, %')).toHaveValue('50');
  });

  it('leads from what is not saved to the field that keeps it', async () => {
    const { user } = openPage();
    await screen.findByLabelText('Power, %');
    typeInto('Power, %', '60.5');
    await user.click(await screen.findByRole('link', { name: /^Step 1: Power: / }, { timeout: 8000 }));
    expect(screen.getByLabelText('Power, %')).toHaveFocus();
  });

  it('sends again by itself what was not saved, as soon as the browser is back online', async () => {
    let isGone = true;
    openPage({ [PATCH]: (request) => (isGone ? lostConnection() : saves(request)) });
    await screen.findByLabelText('Reason for the change');
    typeInto('Reason for the change', 'darker');
    expect(await screen.findByText(/^Not saved: no answer/, {}, { timeout: 8000 })).toBeVisible();
    isGone = false;
    fireEvent(window, new Event('online'));
    expect(await screen.findByText('Saved')).toBeVisible();
    expect(server.bodies(PATCH).at(-1)).toEqual({ reason: 'darker' });
  });

  it('cites every mark of a coupon that proves it in one act', async () => {
    const marks = ['A1', 'A2'].map((address) => makeEvidenceCell({ cellId: `proof-${address}`, couponCode: 'C-0121', address }));
    const basis = makeEvidenceCell({ cellId: 'basis-1' });
    const resting = { ...draft, evidence: { basis: [basis], confirmation: [], runs: [] } };
    const { user } = openPage({
      'GET /api/revisions/draft-1': () => ({ body: resting }),
      'GET /api/revisions/draft-1/evidence/candidates': () => ({ body: { basis: [], confirmation: marks } }),
      'PUT /api/revisions/draft-1/evidence': () => ({ body: { ...resting, evidence: { ...resting.evidence, confirmation: marks } } }),
    });
    await user.click(await screen.findByRole('button', { name: 'Cite its 2 marks' }));
    await waitFor(() => expect(screen.queryByRole('button', { name: 'Cite its 2 marks' })).toBeNull());
    expect(server.bodies('PUT /api/revisions/draft-1/evidence')).toEqual([
      { basisCellIds: ['basis-1'], confirmationCellIds: ['proof-A1', 'proof-A2'] },
    ]);
  });

  it('stands in the order of the work: reason and evidence before submit', async () => {
    openPage();
    const submit = await screen.findByRole('button', { name: 'Submit for review' });
    for (const earlier of [screen.getByLabelText('Reason for the change'), screen.getByRole('region', { name: 'Evidence' })])
      expect(earlier.compareDocumentPosition(submit)).toBe(Node.DOCUMENT_POSITION_FOLLOWING);
  });

  it('changes the order of set-up steps by buttons', async () => {
    const { user } = openPage();
    await user.click(await screen.findByRole('button', { name: 'Add a set-up step' }));
    typeInto('Set-up step 2', 'Degrease');
    await user.click(screen.getByRole('button', { name: 'Move set-up step 2 up' }));
    expect(screen.getByLabelText('Set-up step 1')).toHaveValue('Degrease');
  });

  it('plans a coupon of equal cells that proves it', async () => {
    const { user } = openPage({ 'POST /api/coupons/confirmation': () => ({ status: 201, body: { code: 'C-0121' } }) });
    await user.click(await screen.findByRole('button', { name: 'Plan a coupon' }));
    const dialog = screen.getByRole('dialog', { name: 'Prove it on a coupon' });
    await user.type(within(dialog).getByLabelText(/Lot of the material/), '2190');
    await user.click(within(dialog).getByRole('button', { name: 'Plan the coupon' }));
    expect(await screen.findByText('elsewhere', {}, { timeout: 8000 })).toBeVisible();
    expect(server.bodies('POST /api/coupons/confirmation')).toEqual([
      { revisionId: 'draft-1', count: 5, acknowledgedCautionIds: [], lot: '2190' },
    ]);
  });

  it('submits for review with a word to the lead', async () => {
    const { user } = openPage({ 'POST /api/revisions/draft-1/submit': () => ({ body: { ...draft, number: 4, state: 'in_review' } }) });
    await user.click(await screen.findByRole('button', { name: 'Submit for review' }));
    const dialog = screen.getByRole('dialog', { name: 'Submit for review' });
    await user.type(within(dialog).getByLabelText(/A word to the lead/), 'Seen at the rim.');
    await user.click(within(dialog).getByRole('button', { name: 'Submit for review' }));
    expect(await screen.findByText('elsewhere', {}, { timeout: 8000 })).toBeVisible();
    expect(server.bodies('POST /api/revisions/draft-1/submit')).toEqual([{ acknowledgedCautionIds: [], comment: 'Seen at the rim.' }]);
  });

  it('offers no submit while a check that it needs fails, and lists every one', async () => {
    const failing = {
      key: 'basis',
      passes: false,
      title: 'Basis',
      detail: 'No sealed coupon.',
      isAdvisory: false,
      blocks: 'submit',
    } as const;
    openPage({
      'GET /api/revisions/draft-1/checks': () => ({
        body: makeChecks({ maySubmit: false, items: [failing, { ...failing, key: 'photo', title: 'Photo', detail: 'No photo.' }] }),
      }),
    });
    expect(await screen.findByText('No sealed coupon.')).toBeVisible();
    expect(screen.getByText('No photo.')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Submit for review' })).toBeDisabled();
  });
});
