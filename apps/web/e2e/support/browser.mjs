// A throw-away Chromium profile driven by playwright-core.
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium } from 'playwright-core';

const EXECUTABLE = process.env.CHROMIUM_BIN ?? '/usr/bin/chromium';
const ARGS = [
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/**
 * Opens a browser context of its own; `close()` ends it and removes its profile.
 * Options are those of Playwright's launchPersistentContext (viewport, colorScheme, locale, …).
 */
export async function openBrowser(options = {}) {
  const profile = await mkdtemp(join(tmpdir(), 'proofplate-chromium-'));
  const context = await chromium.launchPersistentContext(profile, {
    executablePath: EXECUTABLE,
    headless: true,
    // Chromium's sandbox refuses to run for root.
    chromiumSandbox: process.getuid?.() !== 0,
    args: ARGS,
    ...options,
  });
  return {
    context,
    page: context.pages()[0] ?? (await context.newPage()),
    async close() {
      await context.close();
      await rm(profile, { recursive: true, force: true });
    },
  };
}

/** Collects what a page must never do: refuse its own policy, throw, or log an error. Call the result to read the list. */
export async function watchPage(page) {
  const findings = [];
  page.on('pageerror', (error) => findings.push(`uncaught: ${error.message}`));
  page.on('console', (message) => {
    // Chromium logs every refusal of the api on its own; the page itself has to tell the person.
    if (/^Failed to load resource: .* status of 4\d\d/.test(message.text())) return;
    if (message.type() === 'error') findings.push(`console: ${message.text()}`);
  });
  await page.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      console.error(`policy ${event.violatedDirective} refused ${event.blockedURI} ${event.sourceFile ?? ''}`);
    });
  });
  return () => [...findings];
}
