// What no page may have, measured on the page as it stands.
import { accessibilityViolations } from './axe.mjs';
import { COLOUR_SCHEMES, settled, VIEWPORTS } from './screenshots.mjs';

const NARROWEST = { width: 320, height: 640 };
/** 64 px less the line around a control. */
const GLOVE_PX = 62;
/** Between the desk and the tablet two columns are at their narrowest. */
const NARROW_DESK = { width: 1024, height: 768 };
/** A number, a unit or a short word never breaks; a longer one may have to. */
const LONGEST_VALUE = 8;
const CONTROLS = 'button, select, textarea, summary, input:not([type=hidden], [type=file]), a';

/** Faults of accessibility in both modes, whatever is wider than its screen; with `isFloor` also controls too small for gloves. */
export async function pageFaults(page, { isFloor = false } = {}) {
  const faults = [];
  await page.setViewportSize(VIEWPORTS.desk);
  for (const colorScheme of COLOUR_SCHEMES) {
    await page.emulateMedia({ colorScheme });
    await settled(page);
    const violations = await accessibilityViolations(page);
    faults.push(...violations.map((violation) => `${colorScheme}: ${violation}`));
  }
  await page.setViewportSize(VIEWPORTS.tablet);
  faults.push(...(await page.evaluate(sidewaysTables)).map((name) => `the table ${name} scrolls sideways at ${VIEWPORTS.tablet.width} px`));
  for (const size of [VIEWPORTS.desk, NARROW_DESK, VIEWPORTS.tablet, VIEWPORTS.phone]) {
    await page.setViewportSize(size);
    const broken = await page.evaluate(brokenWords, { mostLetters: LONGEST_VALUE });
    faults.push(...broken.map((word) => `“${word}” is broken within at ${size.width} px`));
  }
  for (const size of isFloor ? [VIEWPORTS.tablet, VIEWPORTS.phone] : []) {
    await page.setViewportSize(size);
    const small = await page.evaluate(smallControls, { selector: CONTROLS, leastPx: GLOVE_PX });
    faults.push(...small.map((control) => `too small for a glove at ${size.width} px: ${control}`));
  }
  await page.setViewportSize(NARROWEST);
  const tooWidePx = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  if (tooWidePx > 0) faults.push(`it is ${tooWidePx} px wider than a screen of ${NARROWEST.width} px`);
  await page.setViewportSize(VIEWPORTS.desk);
  return faults;
}

/** Runs in the page: tables of the ordinary kind whose frame is narrower than they are. */
function sidewaysTables() {
  return [...document.querySelectorAll('main table')]
    .filter(({ parentElement }) => parentElement !== null && parentElement.scrollWidth > parentElement.clientWidth + 1)
    .map((table) => table.getAttribute('aria-label') ?? 'without a name');
}

/** Runs in the page: short words and numbers that stand on more than one line. */
function brokenWords({ mostLetters }) {
  const texts = document.createTreeWalker(document.querySelector('main') ?? document.body, NodeFilter.SHOW_TEXT);
  const broken = [];
  for (let node = texts.nextNode(); node !== null; node = texts.nextNode()) {
    for (const { 0: word, index } of node.data.matchAll(/[^\s\u00a0\u2009-]{2,}/g)) {
      if (word.length > mostLetters || !node.parentElement.checkVisibility()) continue;
      const range = document.createRange();
      range.setStart(node, index);
      range.setEnd(node, index + word.length);
      const lines = new Set([...range.getClientRects()].filter(({ width }) => width > 0).map(({ top }) => Math.round(top)));
      if (lines.size > 1) broken.push(word);
    }
  }
  return [...new Set(broken)];
}

/** Runs in the page: controls that are drawn as such. Words that are links within a text or the breadcrumbs keep the height of their line. */
function smallControls({ selector, leastPx }) {
  return [...document.querySelectorAll(`main :is(${selector})`)].flatMap((control) => {
    // A summary within a list gives its row the tap, and a tick its label.
    const wider = { SUMMARY: 'li', INPUT: 'label' }[control.tagName];
    const target = (wider === undefined ? null : control.closest(wider)) ?? control;
    const { width, height } = target.getBoundingClientRect();
    const isDrawn = width > 1 && height > 1 && control.checkVisibility();
    const isInText = control.tagName === 'A' && (getComputedStyle(control).display === 'inline' || control.closest('nav') !== null);
    if (!isDrawn || isInText || height >= leastPx) return [];
    const name = control.getAttribute('aria-label') ?? control.id ?? '';
    return [`${control.tagName.toLowerCase()} “${(control.textContent || name).slice(0, 40)}”, ${Math.round(height)} px`];
  });
}
