/** A lens, a fibre machine with its panel, the lens on it, and a power table. */
export async function describeMachine({ page, go }) {
  await addLens(page, go);
  await go('/equipment/machines/new');
  await page.getByLabel('Name', { exact: true }).fill('Bench 2');
  await page.getByLabel('Kind of source').selectOption({ label: 'Fibre, pulse width settable (MOPA)' });
  await page.getByLabel(/^Wavelength/).fill('1064');
  await page.getByLabel(/^Rated average power/).fill('20');
  await page.getByLabel(/^Beam quality/).fill('1.4');
  await page.getByLabel(/^Beam diameter at the lens/).fill('7');
  await page.getByLabel(/^Lowest pulse frequency/).fill('1');
  await page.getByLabel(/^Highest pulse frequency/).fill('1000');
  await page.getByRole('button', { name: 'Add the machine' }).click();
  await page.getByRole('heading', { level: 1, name: /Bench 2/ }).waitFor();
  await fitLens(page);
  await addPowerTable(page);
}

async function addLens(page, go) {
  await go('/equipment');
  await page.getByRole('button', { name: 'Add a lens' }).first().click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Name').fill('F160');
  await dialog.getByLabel(/^Focal length/).fill('160');
  await dialog.getByLabel(/^Side of the marking field/).fill('110');
  await dialog.getByRole('button', { name: 'Add the lens' }).click();
  await page.getByText('F160').first().waitFor();
}

async function fitLens(page) {
  await page
    .getByRole('button', { name: /Add a lens|Fit a lens/ })
    .first()
    .click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Lens').selectOption({ label: 'F160' });
  await dialog.getByLabel(/^Working distance/).fill('182');
  await dialog.getByLabel(/^How focus is found/).fill('182 mm gauge');
  await dialog.locator('button[type=submit]').click();
  await dialog.waitFor({ state: 'hidden' });
}

async function addPowerTable(page) {
  await page.getByRole('button', { name: 'Add readings' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Measured on').fill('2026-11-20');
  await dialog.getByLabel('Meter', { exact: true }).fill('PM-1');
  await dialog.getByLabel(/^Pulse frequency/).fill('60');
  await dialog.getByLabel(/^Pulse width/).fill('8');
  await dialog.getByLabel('Percent and watts').fill('10 1.6\n30 5.6\n50 9.7\n70 13.6\n100 19.2');
  await dialog.locator('button[type=submit]').click();
  await dialog.waitFor({ state: 'hidden' });
}
