/** The five keys of a setting, chosen on a planning form. */
async function chooseKeys(page, { material = 'black anodised 6061' } = {}) {
  await page.getByLabel('Machine').selectOption({ label: 'Bench 2' });
  await page.getByLabel('Lens').selectOption({ label: 'F160' });
  await page.getByLabel('Material').selectOption({ label: material });
  await page.getByLabel('Finish').selectOption({ label: 'sealed satin' });
  await page.getByLabel('Effect wanted').selectOption({ label: 'Dye bleaching (oxide kept)' });
}

async function fillLevels(region, { from, to, levels }) {
  await region.getByLabel(/^From/).fill(from);
  await region.getByLabel(/^To/).fill(to);
  await region.getByRole('textbox', { name: 'Levels' }).fill(levels);
}

async function fillSetting(region, values) {
  for (const [label, value] of Object.entries(values)) await region.getByLabel(new RegExp(`^${label}`)).fill(value);
}

const SAME_IN_EVERY_CELL = {
  Frequency: '60',
  'Pulse width': '8',
  'Line spacing': '0.03',
  Passes: '1',
  'Focus offset': '0',
  'Fill angle': '0',
  'Angle step': '0',
};
const LETTERS = { Power: '40', Speed: '600', ...SAME_IN_EVERY_CELL };

/** A film that must never be marked cannot be planned, and the page says why. */
export async function refuseNeverMaterial({ page, go }) {
  await go('/coupons/plan');
  await chooseKeys(page, { material: 'sign film' });
  await page.getByText('Do not mark PVC').first().waitFor();
  await page.getByText('The rest of the plan is not asked for').waitFor();
  await page.getByRole('button', { name: 'Save the plan' }).click();
  await page.getByRole('link', { name: /This must not be marked/ }).waitFor();
  if (new URL(page.url()).pathname !== '/coupons/plan') throw new Error('a plan for PVC was saved');
}

async function fillPlan(page) {
  await fillLevels(page.getByRole('region', { name: 'Rows' }), { from: '600', to: '1500', levels: '3' });
  await fillLevels(page.getByRole('region', { name: 'Columns' }), { from: '20', to: '50', levels: '4' });
  await fillSetting(page.getByRole('region', { name: 'The same in every cell' }), SAME_IN_EVERY_CELL);
  await fillSetting(page.getByRole('region', { name: 'Corner marks and letters' }), LETTERS);
}

/** Plans a grid of 3 × 4 cells and takes the artwork along; returns the coupon's code. */
export async function planCoupon({ page, go }) {
  await go('/coupons/plan');
  await chooseKeys(page);
  await page.getByLabel('Lot').fill('6061-B14');
  await fillPlan(page);
  await page.getByRole('checkbox', { name: /^I have read/ }).check();
  await page.getByRole('button', { name: 'Save the plan' }).click();
  await page.waitForURL(/\/coupons\/C-\d+/);
  return /C-\d+/.exec(page.url())?.[0] ?? '';
}

/** The labels first where the plan has them, then every cell in run order. */
export async function markCoupon({ page, go }, { code, cells }) {
  await go(`/coupons/${code}/mark`);
  await page.getByRole('checkbox', { name: /^I have read/ }).check();
  await page.getByRole('button', { name: /^(Labels are marked|Start with the cells)$/ }).click();
  const heading = page.getByRole('heading', { level: 2, name: /^Cell / });
  for (let done = 0; done < cells; done += 1) {
    await page.getByText(`${done} of ${cells} done`).waitFor();
    const address = (await heading.textContent())?.replace('Cell', '').trim();
    await page.getByRole('button', { name: `${address} marked` }).click();
  }
  await page.getByLabel('Kept at').fill('drawer 3');
  await page.getByRole('button', { name: 'The plate is marked' }).click();
  await page.waitForURL(new RegExp(`/coupons/${code}$`));
}

/** Photo, criteria, a rating for every cell by keyboard, two quantities from a block of numbers. */
export async function logCoupon({ page, go }, { code, photo, ratings, lightness, contrast }) {
  await go(`/coupons/${code}`);
  await page.locator('input[type=file]').first().setInputFiles(photo);
  await page.getByText(/^Photo of/).waitFor();
  await recordCriteria(page);
  await rateByKeyboard(page, ratings);
  await enterBlock(page, 'Lightness', lightness);
  await enterBlock(page, 'Contrast to the bare ground', contrast);
}

async function recordCriteria(page) {
  const criteria = page.getByRole('region', { name: /criteria/i });
  // A proof is offered the two criteria of its basis already.
  for (const number of [4, 3]) {
    const takeOut = criteria.getByRole('button', { name: `Take criterion ${number} out` });
    if (await takeOut.isVisible()) await takeOut.click();
  }
  await criteria.getByRole('button', { name: 'Record the criteria' }).click();
  await criteria.getByText('before the first result').waitFor();
}

async function rateByKeyboard(page, ratings) {
  await page.getByLabel('After a rating:').selectOption({ label: 'next to the right' });
  await page.getByRole('gridcell').first().click();
  for (const [index, rating] of [...ratings].entries()) {
    await page.keyboard.press(rating);
    await page.getByText(`${index + 1} of ${ratings.length} cells rated`).waitFor();
  }
}

async function enterBlock(page, quantity, values) {
  await page.getByRole('button', { name: 'Enter measurements' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('What was measured').selectOption({ label: quantity });
  await dialog.getByLabel('How').selectOption({ label: 'Colorimeter' });
  await dialog.getByLabel('Instrument').fill('CM-1');
  await dialog.getByLabel('Illuminant').selectOption('D65');
  await dialog.getByLabel('Observer').selectOption('10°');
  await dialog.getByLabel('Geometry of light and view').selectOption('45/0');
  await dialog.getByRole('table').getByRole('textbox').first().focus();
  await page.evaluate((text) => {
    const clipboardData = new DataTransfer();
    clipboardData.setData('text/plain', text);
    document.activeElement?.dispatchEvent(new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true }));
  }, values);
  await dialog.getByRole('button', { name: /^(Store|Save|Keep)/ }).click();
  await dialog.waitFor({ state: 'hidden' });
}

/** Ends the inspection and seals the coupon; from then on it can be cited. */
export async function sealCoupon({ page }, code) {
  await page.getByRole('button', { name: 'Seal coupon' }).click();
  await page.getByRole('button', { name: 'Finish the inspection' }).click();
  await page.getByRole('button', { name: `Seal ${code}` }).click();
  await page.getByRole('dialog').waitFor({ state: 'hidden' });
}

/** The best cell becomes the draft of a recipe; returns where the draft is. */
export async function draftFrom({ page, go }, { code, cell }) {
  await go(`/coupons/${code}?cell=${cell}`);
  await page.getByRole('button', { name: `Draft a recipe from ${cell}` }).click();
  await page.waitForURL(/\/recipes\/R-\d+\/revisions\//);
  return new URL(page.url()).pathname;
}
