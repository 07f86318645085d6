import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';

export const VIEWPORTS = {
  desk: { width: 1440, height: 900 },
  tablet: { width: 820, height: 1180 },
  phone: { width: 390, height: 844 },
};
export const COLOUR_SCHEMES = ['light', 'dark'];

/** Fades of the controls after a change of mode (120 ms) are over by then. */
const SETTLED_MS = 250;

/** Fonts are there, and no control fades from one mode into the other. */
export async function settled(page) {
  await page.evaluate(() => document.fonts.ready);
  await page.waitForTimeout(SETTLED_MS);
  await page.evaluate(() =>
    Promise.all(
      document
        .getAnimations()
        .filter((animation) => animation instanceof CSSTransition)
        .map(({ finished }) => finished.catch(() => undefined)),
    ),
  );
}

/**
 * Pictures of the page as it stands, in every size and both modes: `<folder>/<name>-<size>-<mode>.png`.
 * `prepare` runs before each picture, for pages that need a click to look their part.
 */
export async function takeScreenshots(page, { name, folder, prepare, sizes = Object.keys(VIEWPORTS), fullPage = false }) {
  await mkdir(folder, { recursive: true });
  const files = [];
  for (const size of sizes) {
    await page.setViewportSize(VIEWPORTS[size]);
    for (const colorScheme of COLOUR_SCHEMES) {
      await page.emulateMedia({ colorScheme });
      await prepare?.(page);
      await settled(page);
      const path = join(folder, `${name}-${size}-${colorScheme}.png`);
      await page.screenshot({ path, fullPage, animations: 'disabled' });
      files.push(path);
    }
  }
  return files;
}
