import { screen, waitFor, within } from '@testing-library/react';
import { closeSession } from '../lib/session';
import { fakeServer, problem } from '../testing/fake-server';
import { renderRoutes } from '../testing/render';
import { makeSessionAnswer } from '../testing/sessions';
import { Component as SignUp } from './sign-up';

const routes = [
  { path: '/sign-up', Component: SignUp },
  { path: '*', element: <p>inside the shop</p> },
];
const SIGN_UP = 'POST /api/auth/sign-up';
const WRONG: readonly [label: string, message: string][] = [
  ['Name of the shop', 'Enter the name that stands on set-up sheets'],
  ['Your name', 'Enter your name as it shall stand under what you sign'],
  ['E-mail', 'Enter an address like name@shop.example'],
  ['Password', 'Use 15 characters or more'],
];

let server: ReturnType<typeof fakeServer>;
beforeEach(() => closeSession('left'));
afterEach(() => server.restore());

async function openPage() {
  const page = renderRoutes(routes, '/sign-up');
  await screen.findByRole('heading', { name: 'Open a shop' });
  return page;
}

async function fillIn({ user }: Awaited<ReturnType<typeof openPage>>) {
  await user.type(screen.getByLabelText('Name of the shop'), 'Tidewater Marking');
  await user.type(screen.getByLabelText('Your name'), 'Hanne Voss');
  await user.type(screen.getByLabelText('E-mail'), 'hanne@tidewater.example');
  await user.type(screen.getByLabelText('Password'), 'burnt plate by the window');
}

describe('the page that opens a shop', () => {
  it('shows every wrong field’s message at the field and in a linked summary that takes the focus, and keeps what was typed', async () => {
    server = fakeServer({});
    const { user } = await openPage();
    await user.type(screen.getByLabelText('E-mail'), 'hanne');
    await user.type(screen.getByLabelText('Password'), 'short');
    await user.click(screen.getByRole('button', { name: 'Open the shop' }));

    const summary = await screen.findByRole('alert', { name: '4 entries need a change' });
    await waitFor(() => expect(summary).toHaveFocus());
    for (const [label, message] of WRONG) {
      expect(within(summary).getByRole('link', { name: `${label}: ${message}` })).toBeVisible();
      expect(screen.getByLabelText(label)).toHaveAccessibleDescription(message);
      expect(screen.getByLabelText(label)).toBeInvalid();
    }
    expect(screen.getByLabelText('E-mail')).toHaveValue('hanne');
    expect(screen.getByLabelText('Password')).toHaveValue('short');
    expect(server.requests).toEqual([]);
  });

  it('names a blank name and a text that is too long in the same answer as the rest, without asking the server', async () => {
    server = fakeServer({});
    const { user } = await openPage();
    await user.click(screen.getByLabelText('Name of the shop'));
    await user.paste('x'.repeat(121));
    await user.type(screen.getByLabelText('Your name'), '   ');
    await user.click(screen.getByLabelText('Password'));
    await user.paste('long password '.repeat(10));
    await user.click(screen.getByRole('button', { name: 'Open the shop' }));
    const summary = await screen.findByRole('alert', { name: '4 entries need a change' });
    expect(
      within(summary)
        .getAllByRole('link')
        .map(({ textContent }) => textContent),
    ).toEqual([
      'Name of the shop: Use at most 120 characters; these are 121.',
      'Your name: Enter your name as it shall stand under what you sign',
      'E-mail: Enter the e-mail address you sign in with',
      'Password: Use at most 128 characters',
    ]);
    expect(server.requests).toEqual([]);
  });

  it('leads from the summary to the field', async () => {
    server = fakeServer({});
    const { user } = await openPage();
    await user.click(screen.getByRole('button', { name: 'Open the shop' }));
    await user.click(await screen.findByRole('link', { name: /^Your name/ }));
    expect(screen.getByLabelText('Your name')).toHaveFocus();
  });

  it('shows what the server refuses at the field it names', async () => {
    server = fakeServer({
      [SIGN_UP]: () =>
        problem(422, 'invalid', 'Some entries cannot be taken', {
          errors: [{ pointer: '#/password', detail: 'This password is on a list of stolen ones.' }],
        }),
    });
    const page = await openPage();
    await fillIn(page);
    await page.user.click(screen.getByRole('button', { name: 'Open the shop' }));
    await waitFor(() =>
      expect(screen.getByLabelText('Password')).toHaveAccessibleDescription('This password is on a list of stolen ones.'),
    );
    await waitFor(() => expect(screen.getByRole('alert', { name: 'One entry needs a change' })).toHaveFocus());
    expect(screen.getByLabelText('Name of the shop')).toHaveValue('Tidewater Marking');
  });

  it('sends the same idempotency key again after no answer, and leads into the shop', async () => {
    let calls = 0;
    server = fakeServer({
      [SIGN_UP]: () => {
        calls += 1;
        if (calls === 1) throw new TypeError('fetch failed');
        return { status: 201, body: makeSessionAnswer() };
      },
    });
    const page = await openPage();
    await fillIn(page);
    await page.user.click(screen.getByRole('button', { name: 'Open the shop' }));
    await screen.findByText('No answer came from the server.');
    await page.user.click(screen.getByRole('button', { name: 'Open the shop' }));
    await screen.findByText('inside the shop');
    const keys = server.requests.map(({ headers }) => headers.get('idempotency-key'));
    expect(keys[0]).toMatch(/^[0-9a-f]{32}$/);
    expect(keys[1]).toBe(keys[0]);
    expect(server.bodies(SIGN_UP)[1]).toMatchObject({ shopName: 'Tidewater Marking', name: 'Hanne Voss', unitSystem: 'metric' });
  });
});
