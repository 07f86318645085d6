import { letterTo, linkIn } from '../support/product.mjs';

const PASSWORDS = {
  owner: 'quiet harbour brass lantern',
  lead: 'seven grey herons wading',
  operator: 'copper kettle on the quay',
  trainee: 'first snow over the slip',
};

/** An empty shop: its owner signs up. Returns what the person signs with. */
export async function openShop({ page, go }, { shop, name, email }) {
  await go('/sign-up');
  await page.getByLabel('Name of the shop').fill(shop);
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(PASSWORDS.owner);
  await page.getByLabel('Time zone').selectOption('Europe/London');
  await page.getByRole('button', { name: 'Open the shop' }).click();
  await page.waitForURL((url) => url.pathname === '/machine');
  return { email, password: PASSWORDS.owner };
}

/** A form with every field wrong names every field and keeps what was typed. */
export async function refuseWrongSignUp({ page, go }) {
  await go('/sign-up');
  await page.getByLabel('E-mail').fill('not an address');
  await page.getByLabel('Password', { exact: true }).fill('short');
  await page.getByRole('button', { name: 'Open the shop' }).click();
  for (const label of ['Name of the shop', 'Your name', 'E-mail', 'Password']) {
    const field = page.getByLabel(label, { exact: true });
    const describedBy = (await field.getAttribute('aria-describedby')) ?? '';
    const told = await Promise.all(describedBy.split(' ').map((id) => page.locator(`[id="${id}"]`).textContent()));
    if ((await field.getAttribute('aria-invalid')) !== 'true' || told.join('').trim() === '')
      throw new Error(`${label} keeps its fault to itself`);
  }
  if ((await page.getByLabel('E-mail').inputValue()) !== 'not an address') throw new Error('what was typed is gone');
}

export async function invite({ page, go }, { email, role }) {
  await go('/people');
  await page.getByRole('button', { name: 'Invite somebody' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('E-mail').fill(email);
  await dialog.getByLabel('Role').selectOption(role);
  await dialog.getByRole('button', { name: 'Send the invitation' }).click();
  await page.getByRole('table').getByText(email).waitFor();
}

/** The invited person follows the link in the letter. */
export async function join({ page }, { email, name, role }) {
  await page.goto(linkIn(await letterTo(email, /invit|join/i)));
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('Password', { exact: true }).fill(PASSWORDS[role]);
  await page.getByRole('button', { name: /^Join/ }).click();
  await page.waitForURL((url) => url.pathname === '/machine');
  return { email, password: PASSWORDS[role] };
}
