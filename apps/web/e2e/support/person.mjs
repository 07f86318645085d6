import { openBrowser, watchPage } from './browser.mjs';
import { ORIGIN } from './product.mjs';

/** A person with a browser of their own. `findings()` lists what their pages must never do. */
export async function openAs(name, options = {}) {
  const browser = await openBrowser({ viewport: { width: 1440, height: 900 }, locale: 'en-GB', ...options });
  const { page } = browser;
  page.setDefaultTimeout(20_000);
  const findings = await watchPage(page);
  return { name, page, findings, close: browser.close, go: (path) => page.goto(`${ORIGIN}${path}`) };
}

export async function signIn({ page, go }, { email, password }) {
  await go('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}
