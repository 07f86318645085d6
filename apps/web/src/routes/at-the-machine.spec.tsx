import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { type FakeRequest, fakeServer, problem } from '../testing/fake-server';
import { KEYS, makeAnswer, makeCaution, makeFinderResult } from '../testing/finder-results';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as AtTheMachine } from './at-the-machine';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('trainee')));
afterEach(() => {
  server.restore();
  localStorage.clear();
  sessionStorage.clear();
  closeSession('left');
});

type Answering = (request: FakeRequest) => object;

function openPage(result: object | Answering, at = '/machine', more: Parameters<typeof fakeServer>[0] = {}) {
  server = fakeServer({
    'GET /api/finder': (request) => ({ body: typeof result === 'function' ? (result as Answering)(request) : result }),
    ...more,
  });
  const page = (
    <StatusLineProvider>
      <AtTheMachine />
    </StatusLineProvider>
  );
  return renderRoutes([{ path: '*', element: page }], at);
}

const lastQuery = () => Object.fromEntries(server.requests.at(-1)?.query ?? []);
const answered = (answer: object = makeAnswer(), rest: object = {}) => makeFinderResult({ matchCount: 1, answer, ...rest });

describe('the sentence', () => {
  it('takes the focus to the words on arrival, and a letter typed anywhere lands there', async () => {
    const { user } = openPage(makeFinderResult());
    const words = await screen.findByRole('searchbox', { name: /narrow by words/i });
    await waitFor(() => expect(words).toHaveFocus());
    words.blur();
    await user.keyboard('blk anod');
    expect(words).toHaveValue('blk anod');
    await waitFor(() => expect(lastQuery()).toMatchObject({ words: 'blk anod' }));
  });

  it('opens a slot with counts, finds by typing, and says why an option has none', async () => {
    const { user, router } = openPage(makeFinderResult());
    await user.click(await screen.findByRole('button', { name: /material: which material/i }));
    const picker = screen.getByRole('dialog', { name: 'Choose the material' });
    expect(within(picker).getByRole('option', { name: 'black anodised 6061 1 recipe' })).toBeVisible();
    expect(within(picker).getByRole('option', { name: 'clear anodised 6061 not for White mark' })).toBeVisible();
    await user.keyboard('blk');
    expect(within(picker).getAllByRole('option')).toHaveLength(1);
    await user.keyboard('{Enter}');
    expect(screen.queryByRole('dialog')).toBeNull();
    await waitFor(() => expect(router.state.location.search).toBe('?material=black'));
    expect(screen.getByRole('button', { name: /material: black anodised 6061/i })).toHaveFocus();
  });

  it('closes a slot by Escape and changes nothing', async () => {
    const { user, router } = openPage(makeFinderResult());
    await user.click(await screen.findByRole('button', { name: /finish: which/i }));
    await user.keyboard('{ArrowDown}{Escape}');
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(router.state.location.search).toBe('');
  });

  it('begins with machine and lens of the last use, and starts over without losing them', async () => {
    localStorage.setItem('proofplate.machine-and-lens', JSON.stringify({ shopId: 'shop-1', machine: 'bench2', lens: 'f160' }));
    const { user, router } = openPage(makeFinderResult());
    await waitFor(() => expect(router.state.location.search).toBe('?machine=bench2&lens=f160'));
    await user.click(await screen.findByRole('button', { name: /material: which material/i }));
    await user.click(screen.getByRole('option', { name: /black anodised/ }));
    await waitFor(() => expect(router.state.location.search).toBe('?machine=bench2&lens=f160&material=black'));
    await user.click(screen.getByRole('button', { name: 'Start over' }));
    await waitFor(() => expect(router.state.location.search).toBe('?machine=bench2&lens=f160'));
  });

  it('drops a kept machine that left the shop instead of locking the page', async () => {
    localStorage.setItem('proofplate.machine-and-lens', JSON.stringify({ shopId: 'shop-1', machine: 'gone' }));
    const { router } = openPage(makeFinderResult(), '/machine', {
      'GET /api/finder': ({ query }) =>
        query.get('machineId') === 'gone' ? problem(404, 'not-found', 'Not here') : { body: makeFinderResult() },
    });
    expect(await screen.findByText('57 approved recipes')).toBeVisible();
    expect(router.state.location.search).toBe('');
    expect(localStorage.getItem('proofplate.machine-and-lens')).toBeNull();
  });
});

describe('the answer', () => {
  it('reads in the order of safety: cautions, setting, mark to match, set-up, signature, acts', async () => {
    openPage(
      answered(makeAnswer(), { cautions: [makeCaution('Close the enclosure'), makeCaution('Stay with it', { isGeneral: true })] }),
      '/machine?material=black',
    );
    const card = await screen.findByRole('region', { name: 'Setting of R-0031 revision 3' });
    const order = [
      screen.getByText('Close the enclosure'),
      screen.getByText('Only within the limits of use'),
      screen.getByText(/Stay with it\./, { selector: 'span' }),
      card,
      screen.getByRole('heading', { name: 'The mark to match' }),
      screen.getByRole('heading', { name: 'Set-up' }),
      ...screen.getAllByText('Hanne Voss'),
      screen.getByRole('link', { name: 'Start a run' }),
    ];
    for (const [index, piece] of order.entries()) {
      const next = order[index + 1];
      if (next !== undefined) expect(piece.compareDocumentPosition(next) & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy();
    }
    expect(
      within(card)
        .getAllByRole('listitem')
        .map((row) => row.textContent),
    ).toEqual([expect.stringContaining('30'), expect.stringContaining('900'), expect.stringContaining('0.030')]);
    expect(screen.getByText(/Thickness 1 to 3 mm\. Sealed wrought dials only\./)).toBeVisible();
    expect(screen.getAllByText('Approved for use, 3 Mar 2026 09:12 CET. Holds until 30 Sep 2026.')[0]).toBeVisible();
    expect(screen.getByRole('link', { name: 'Start a run' })).toHaveAttribute('href', '/runs/start?revision=revision-3');
  });

  it('fills the sentence by itself and keeps machine and lens for the next time', async () => {
    openPage(answered(), '/machine?words=blk');
    expect(await screen.findByRole('button', { name: /effect: white mark/i })).toBeVisible();
    expect(JSON.parse(localStorage.getItem('proofplate.machine-and-lens') ?? '{}')).toMatchObject({ machine: 'bench2', lens: 'f160' });
  });

  it('folds the sentence to its words on a phone, and opens its slots again by one press', async () => {
    openPage(answered(), '/machine?material=black');
    const change = await screen.findByRole('button', { name: 'Change', hidden: true });
    expect(change.parentElement).toHaveTextContent('On Bench 2 with the F160 lens: black anodised 6061, sealed satin, white mark.');
    fireEvent.click(change);
    expect(screen.queryByRole('button', { name: 'Change', hidden: true })).toBeNull();
  });

  it('keeps ticks of the card and of the steps over a reload', async () => {
    const first = openPage(answered(), '/machine?material=black');
    await first.user.click(await screen.findByRole('button', { name: 'Power is set' }));
    await first.user.click(screen.getByRole('button', { name: 'Step 1 is done' }));
    expect(screen.getByText('1 of 3 set')).toBeVisible();
    first.unmount();
    server.restore();
    openPage(answered(), '/machine?material=black');
    expect(await screen.findByRole('button', { name: 'Power is set' })).toHaveAttribute('aria-pressed', 'true');
    expect(screen.getByText('1 of 2 done')).toBeVisible();
  });

  it('shows a hold before everything else and takes the acts away', async () => {
    const hold = { id: 'h1', subject: 'machine', reason: 'Fumes come back', placedBy: 'Hanne Voss', placedAt: '2026-05-14T08:00:00Z' };
    openPage(answered(makeAnswer({ holds: [hold], blockedBecause: ['held'], allowedActions: [] })), '/machine?material=black');
    const notice = await screen.findByRole('heading', { name: 'Bench 2 is on hold. Start no run.' });
    const card = screen.getByRole('region', { name: /Setting of/ });
    expect(notice.compareDocumentPosition(card) & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Start a run' })).toBeDisabled();
    expect(screen.getByRole('button', { name: /^Print/ })).toBeDisabled();
    expect(screen.queryByRole('button', { name: 'Release the hold' })).toBeNull();
  });

  it('says that it is due to be proved again, and when the machine changed', async () => {
    openPage(answered(makeAnswer({ isOverdue: true, isProfilePresent: false })), '/machine?material=black');
    expect(await screen.findByText(/It is due to be proved again/)).toBeVisible();
    expect(screen.getByText(/Bench 2 was changed after this was proved/)).toBeVisible();
  });

  it('hides every setting of a material that must never be marked', async () => {
    const never = makeCaution('Do not mark PVC.', { level: 'never' });
    openPage(makeFinderResult({ isForbidden: true, cautions: [never], matchCount: 1 }), '/machine?material=black');
    expect(await screen.findByRole('heading', { name: 'Do not mark PVC.' })).toBeVisible();
    expect(screen.getByText('Must not be marked')).toBeVisible();
    expect(screen.queryByRole('region', { name: /Setting of/ })).toBeNull();
    expect(screen.queryByText('Ask for this setting')).toBeNull();
  });

  it('never shows the last answer under a new sentence', async () => {
    let release: () => void = () => undefined;
    const held = new Promise<void>((resolve) => {
      release = resolve;
    });
    const { user } = openPage(answered(), '/machine?material=black', {
      'GET /api/finder': async ({ query }) => {
        if (query.get('effectId') === null) return { body: answered() };
        await held;
        return { body: makeFinderResult({ matchCount: 0 }) };
      },
    });
    await screen.findByRole('region', { name: /Setting of/ });
    await user.click(screen.getByRole('button', { name: /effect: white mark/i }));
    await user.click(screen.getByRole('option', { name: /white mark/ }));
    expect(screen.queryByRole('region', { name: /Setting of/ })).toBeNull();
    release();
    expect(await screen.findByText('No approved recipe for this yet')).toBeVisible();
  });
});

describe('without one answer', () => {
  const near = {
    ...makeAnswer(),
    code: 'R-0047',
    title: 'Titanium grade 2, blue',
    differs: [{ slot: 'machine', has: 'Bench 2', wanted: 'Bench 1' }],
    missingWords: [] as string[],
    whyNot: 'It needs a pulse width of 30 ns.',
  };

  it('names what differs and why, leads to the nearest, and asks with the sentence filled in', async () => {
    const { user, router } = openPage(makeFinderResult({ matchCount: 0, nearMisses: [near] }), '/machine?machine=bench1&material=black', {
      'POST /api/setting-requests': () => ({ status: 201, body: {} }),
    });
    const table = await screen.findByRole('table', { name: 'Nearest approved recipes' });
    expect(within(table).getByText('not Bench 1')).toBeVisible();
    expect(within(table).getAllByText('same')).toHaveLength(4);
    expect(screen.getByText('Why R-0047 does not carry over to Bench 1')).toBeVisible();
    await user.type(screen.getByLabelText(/^Job/), 'J-26-0418');
    await user.click(screen.getByRole('button', { name: 'Ask for this setting' }));
    expect(await screen.findByText(/What becomes of it stands under/)).toBeVisible();
    expect(server.bodies('POST /api/setting-requests')).toEqual([
      { materialId: 'black', machineId: 'bench1', jobReference: 'J-26-0418', note: '' },
    ]);
    await user.click(screen.getByRole('button', { name: 'Mark it on Bench 2: R-0047' }));
    await waitFor(() =>
      expect(Object.fromEntries(new URLSearchParams(router.state.location.search))).toMatchObject({
        machine: 'bench2',
        recipe: 'recipe-31',
      }),
    );
  });

  const gone = {
    ...{ ...KEYS, recipeId: 'r', code: 'R-0040', title: 'Bright', revisionNumber: 2 },
    ...{ by: 'Hanne Voss', at: '2026-05-14T08:00:00Z', reason: 'It wipes off' },
  };

  it('says at once that a recipe was withdrawn', async () => {
    openPage(makeFinderResult({ matchCount: 0, withdrawn: [gone] }), '/machine?material=black');
    expect(await screen.findByRole('heading', { name: 'R-0040 Bright was withdrawn' })).toBeVisible();
    expect(screen.getByText('It wipes off')).toBeVisible();
  });

  it('says so to whoever comes by a link, and leads on to another setting for the same part', async () => {
    const { user, router } = openPage(makeFinderResult({ withdrawn: [gone] }), '/machine?recipe=R-0040');
    expect(await screen.findByRole('heading', { name: 'R-0040 Bright was withdrawn' })).toBeVisible();
    expect(screen.getByText(/withdrawn by Hanne Voss/)).toBeVisible();
    expect(screen.getByText('No approved recipe')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Look for another setting' }));
    await waitFor(() =>
      expect(Object.fromEntries(new URLSearchParams(router.state.location.search))).toEqual({
        ...{ machine: 'bench2', lens: 'f160', material: 'black', finish: 'satin', effect: 'white' },
      }),
    );
  });

  it('never says that nothing is approved yet where only this place has nothing', async () => {
    openPage(makeFinderResult({ matchCount: 0, withdrawn: [gone] }), '/machine?machine=bench2');
    expect(await screen.findByRole('heading', { name: 'R-0040 Bright was withdrawn' })).toBeVisible();
    expect(screen.getByText(/No recipe is approved for what is chosen so far/)).toBeVisible();
    expect(screen.queryByText(/approved yet/)).toBeNull();
  });

  it('offers the nearest and asks, where typed words lead to nothing', async () => {
    const miss = { ...near, differs: [], missingWords: ['purple'], whyNot: '' };
    const { user } = openPage(makeFinderResult({ matchCount: 0, nearMisses: [miss] }), '/machine?words=titanium%20purple', {
      'POST /api/setting-requests': () => ({ status: 201, body: {} }),
    });
    expect(await screen.findByRole('heading', { name: 'No approved recipe has all of “titanium purple”' })).toBeVisible();
    const table = screen.getByRole('table', { name: 'Nearest approved recipes' });
    expect(within(table).getByText('not “purple”')).toBeVisible();
    expect(within(table).queryByText('same')).toBeNull();
    expect(within(table).getByRole('button', { name: 'Show setting: R-0047' })).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Ask for this setting' }));
    expect(screen.getByText('Choose what is marked', { selector: 'p, span, a' })).toBeVisible();
    await user.selectOptions(screen.getByLabelText('Material'), 'black');
    await user.click(screen.getByRole('button', { name: 'Ask for this setting' }));
    await waitFor(() =>
      expect(server.bodies('POST /api/setting-requests')).toEqual([
        { materialId: 'black', jobReference: '', note: 'Looked for “titanium purple”.' },
      ]),
    );
  });

  it('refuses a day that is past at its field', async () => {
    const { user } = openPage(makeFinderResult({ matchCount: 0 }), '/machine?material=black');
    await user.type(await screen.findByLabelText(/^Needed by/), '2020-01-01');
    await user.click(screen.getByRole('button', { name: 'Ask for this setting' }));
    expect((await screen.findAllByText('Enter today or a later day.')).length).toBeGreaterThan(0);
    expect(server.requests.filter(({ method }) => method === 'POST')).toEqual([]);
  });

  it('offers what is left while several fit', async () => {
    const twin = { ...KEYS, recipeId: 'r2', code: 'R-0032', title: 'Dial, thick', revisionNumber: 1 };
    const { user, router } = openPage(
      makeFinderResult({ matchCount: 2, matches: [{ ...twin, recipeId: 'r1', code: 'R-0031' }, twin] }),
      '/machine?material=black',
    );
    await user.click(await screen.findByRole('button', { name: /R-0032 Dial, thick/ }));
    await waitFor(() => expect(new URLSearchParams(router.state.location.search).get('recipe')).toBe('r2'));
  });
});

describe('a shop without an approved recipe', () => {
  const empty = makeFinderResult({ approvedCount: 0, matchCount: 0 });

  it.each(['operator', 'lead', 'owner'] as const)('tells the %s what comes first, with links and what is there already', async (role) => {
    openSession(makeSessionAnswer(role));
    openPage(empty);
    const steps = within(await screen.findByRole('list')).getAllByRole('listitem');
    expect(steps.map((step) => within(step).getByRole('link').getAttribute('href'))).toEqual([
      '/equipment',
      '/materials',
      '/coupons',
      '/recipes',
    ]);
    expect(steps.map((step) => step.textContent?.includes('in the shop'))).toEqual([true, true, false, false]);
    expect(screen.queryByRole('searchbox')).toBeNull();
  });

  it('gives a trainee no way that ends at a closed door', async () => {
    openPage(empty);
    expect(await screen.findByRole('heading', { name: 'No recipe is approved yet' })).toBeVisible();
    expect(screen.queryByRole('link')).toBeNull();
  });
});

describe('coupons that wait at the machine', () => {
  const waiting = { id: 'c7', code: 'C-0007', title: 'Blue on titanium', material: { name: 'titanium' }, finish: { name: 'bead-blasted' } };
  const coupons = { 'GET /api/coupons': () => ({ body: { items: [waiting], nextCursor: null } }) };

  it('are one press away for an operator who has chosen the machine', async () => {
    openSession(makeSessionAnswer('operator'));
    openPage(makeFinderResult(), '/machine?machine=bench2', coupons);
    const list = await screen.findByRole('region', { name: 'Coupons to mark here' });
    expect(within(list).getByRole('link', { name: 'Mark C-0007' })).toHaveAttribute('href', '/coupons/C-0007/mark');
    const read = server.requests.find(({ path }) => path === '/api/coupons');
    expect(Object.fromEntries(read?.query ?? [])).toMatchObject({ state: 'planned', machineId: 'bench2' });
  });

  it('are not asked for by a trainee, nor before a machine is chosen', async () => {
    const asTrainee = openPage(makeFinderResult(), '/machine?machine=bench2', coupons);
    await screen.findByRole('searchbox', { name: /narrow by words/i });
    expect(server.requests.map(({ path }) => path)).not.toContain('/api/coupons');
    asTrainee.unmount();
    server.restore();
    localStorage.clear();
    openSession(makeSessionAnswer('operator'));
    openPage(makeFinderResult(), '/machine', coupons);
    await screen.findByRole('searchbox', { name: /narrow by words/i });
    expect(server.requests.map(({ path }) => path)).not.toContain('/api/coupons');
  });
});

describe('a lead', () => {
  it('places a hold from where the setting is seen', async () => {
    openSession(makeSessionAnswer('lead'));
    const { user } = openPage(answered(makeAnswer({ allowedActions: ['start-run', 'place-hold'] })), '/machine?material=black', {
      'POST /api/holds': () => ({ status: 201, body: {} }),
    });
    await user.click(await screen.findByRole('button', { name: 'Place a hold' }));
    await user.click(screen.getByRole('radio', { name: 'Bench 2' }));
    await user.type(screen.getByLabelText('Reason'), 'Fumes come back');
    await user.click(screen.getByRole('button', { name: 'Put Bench 2 on hold' }));
    expect(await screen.findByText('Bench 2 is on hold. Everybody in the shop gets a mail.')).toBeVisible();
    expect(server.bodies('POST /api/holds')).toEqual([{ machineId: 'bench2', reason: 'Fumes come back' }]);
  });
});
