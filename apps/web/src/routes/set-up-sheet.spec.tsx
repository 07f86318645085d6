import { screen } from '@testing-library/react';
import { StatusLineProvider } from '../components/status-line';
import { closeSession, openSession } from '../lib/session';
import { fakeServer } from '../testing/fake-server';
import { makeAnswer, makeCaution, makeFinderResult } from '../testing/finder-results';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as SetUpSheet } from './set-up-sheet';

let server: ReturnType<typeof fakeServer>;
beforeEach(() => openSession(makeSessionAnswer('trainee')));
afterEach(() => {
  server.restore();
  closeSession('left');
});

function openPage(answer: object | null) {
  server = fakeServer({
    'GET /api/finder': () => ({ body: makeFinderResult({ matchCount: 1, answer, cautions: [makeCaution('Close the enclosure')] }) }),
    'GET /api/finder/sheet-code': () => ({ body: { url: 'x', modules: ['101', '010', '101'] } }),
  });
  const page = (
    <StatusLineProvider>
      <SetUpSheet />
    </StatusLineProvider>
  );
  return renderRoutes([{ path: '*', element: page }], '/machine/sheet?recipe=recipe-31');
}

describe('the set-up sheet', () => {
  it('says what it is, what to beware of, what to dial, who signed, and that paper goes out of date', async () => {
    openPage(makeAnswer());
    const sheet = await screen.findByRole('article', { name: 'Set-up sheet of R-0031' });
    for (const words of [
      'Close the enclosure',
      '0.030',
      'Seat the dial in fixture T-14',
      'Hanne Voss',
      'Uncontrolled when printed. Scan the code before use.',
    ])
      expect(sheet).toHaveTextContent(words);
    expect(sheet).toHaveTextContent('Approved for use, 3 Mar 2026 09:12 CET. Holds until 30 Sep 2026. Digest 7f3a c21e');
    expect(screen.getByRole('img', { name: 'Code that opens the current revision' })).toBeInTheDocument();
    expect(server.requests[0]?.query.get('recipeId')).toBe('recipe-31');
  });

  it('prints nothing valid under a hold, nor of what is not approved', async () => {
    const { unmount } = openPage(makeAnswer({ blockedBecause: ['A hold is on the recipe: Marks come off'] }));
    expect(await screen.findByText('A hold is on the recipe: Marks come off')).toBeVisible();
    expect(screen.queryByRole('article')).toBeNull();
    unmount();
    server.restore();
    openPage(null);
    expect(await screen.findByText('There is no approved revision of this recipe.')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Print' })).toBeNull();
  });
});
