import { screen, waitFor } from '@testing-library/react';
import { closeSession } from '../lib/session';
import { fakeServer, lostConnection, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as SignIn } from './sign-in';

const routes = [
  { path: '/sign-in', Component: SignIn },
  { path: '*', element: <p>inside the shop</p> },
];

let server: ReturnType<typeof fakeServer>;
const serve = (handlers: Parameters<typeof fakeServer>[0]) => {
  server = fakeServer(handlers);
};

beforeEach(() => closeSession('left'));
afterEach(() => server.restore());

async function signIn(at = '/sign-in') {
  const page = renderRoutes(routes, at);
  await page.user.type(await screen.findByLabelText('E-mail'), 'hanne@tidewater.example');
  await page.user.type(screen.getByLabelText('Password'), 'burnt plate by the window');
  await page.user.click(screen.getByRole('button', { name: 'Sign in' }));
  return page;
}

describe('the sign-in page', () => {
  it('sends the address and the password with the header that other origins cannot set, and leads into the shop', async () => {
    serve({ 'POST /api/auth/sign-in': () => ({ body: makeSessionAnswer() }) });
    await signIn();
    await screen.findByText('inside the shop');
    expect(server.bodies('POST /api/auth/sign-in')).toEqual([{ email: 'hanne@tidewater.example', password: 'burnt plate by the window' }]);
    expect(server.requests[0]?.headers.get('x-requested-by')).toBe('proofplate');
  });

  it('leads back to the page that asked for a session', async () => {
    serve({ 'POST /api/auth/sign-in': () => ({ body: makeSessionAnswer() }) });
    const { router } = await signIn('/sign-in?next=%2Frecipes%2FR-0042%3Fcell%3DB4');
    await screen.findByText('inside the shop');
    expect(router.state.location.pathname + router.state.location.search).toBe('/recipes/R-0042?cell=B4');
  });

  it.each(['https://elsewhere.example/', '//elsewhere.example', '/\\elsewhere.example'])(
    'does not follow %s to another site',
    async (next) => {
      serve({ 'POST /api/auth/sign-in': () => ({ body: makeSessionAnswer() }) });
      const { router } = await signIn(`/sign-in?next=${encodeURIComponent(next)}`);
      await screen.findByText('inside the shop');
      expect(router.state.location.pathname).toBe('/');
    },
  );

  it('says that the two do not go together, takes the focus there and keeps what was typed', async () => {
    serve({ 'POST /api/auth/sign-in': () => problem(401, 'wrong-credentials', 'E-mail or password is not right') });
    await signIn();
    const notice = await screen.findByText('E-mail and password do not go together.');
    await waitFor(() => expect(document.activeElement).toContainElement(notice));
    expect(screen.getByLabelText('E-mail')).toHaveValue('hanne@tidewater.example');
    expect(screen.getByLabelText('Password')).toHaveValue('burnt plate by the window');
  });

  it('says that nothing is known when no answer comes', async () => {
    serve({ 'POST /api/auth/sign-in': lostConnection });
    await signIn();
    expect(await screen.findByText('No answer came from the server.')).toBeVisible();
    expect(screen.getByText(/^You are not signed in\./)).toBeVisible();
    expect(screen.queryByText(/Whether it was saved/)).toBeNull();
    expect(screen.getByLabelText('E-mail')).toHaveValue('hanne@tidewater.example');
  });

  it('shows the password on request and hides it again', async () => {
    serve({});
    const { user } = renderRoutes(routes, '/sign-in');
    const field = await screen.findByLabelText('Password');
    const show = screen.getByRole('button', { name: 'Show password' });
    expect(field).toHaveAttribute('type', 'password');
    await user.click(show);
    expect(field).toHaveAttribute('type', 'text');
    await user.click(show);
    expect(field).toHaveAttribute('type', 'password');
  });
});
