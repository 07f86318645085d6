/** Words into the finder, and the setting stands there, cautions before it. */
export async function findSetting({ page, go }, { words, recipe }) {
  await page.setViewportSize({ width: 820, height: 1180 });
  await go('/machine');
  await page.getByRole('searchbox').fill(words);
  const card = page.getByRole('region', { name: new RegExp(`Setting of ${recipe}`) });
  await card.waitFor();
  const caution = await page.getByText('Run the extraction at the mark').first().boundingBox();
  const setting = await card.boundingBox();
  if (!caution || !setting || caution.y >= setting.y) throw new Error('the cautions do not stand before the setting');
}

/** Fills the sentence slot by slot, as somebody does who knows what lies on the table. */
export async function findSettingFor({ page, go }, slots) {
  await go('/machine');
  for (const [slot, name] of Object.entries(slots)) {
    await page.locator(`[data-slot=${slot}]`).click();
    await page.getByRole('dialog').getByRole('option', { name }).first().click();
    await page.getByRole('dialog').waitFor({ state: 'hidden' });
  }
  await page.getByRole('table', { name: 'Nearest approved recipes' }).waitFor();
}

/** A run under way: lens fitted, steps ticked, nothing marked yet. */
export async function startRun({ page, go }) {
  await go('/machine?words=black%20anodised%20satin');
  await startFromSetting(page);
}

/** Lens fitted, steps ticked, first piece released, parts counted. */
export async function runParts({ page }, { good, scrap }) {
  await startFromSetting(page);
  await page.getByRole('button', { name: 'It matches' }).click();
  await page.getByLabel('Good', { exact: true }).fill(good);
  await page.getByLabel('Scrap', { exact: true }).fill(scrap);
  await page.getByRole('button', { name: /^Finish J-/ }).click();
  await page.getByText('Finished').first().waitFor();
}

async function startFromSetting(page) {
  await page
    .getByRole('link', { name: 'Start a run' })
    .or(page.getByRole('button', { name: 'Start a run' }))
    .first()
    .click();
  await page.waitForURL(/\/runs\/start/);
  await page.getByLabel('Lens fitted now').selectOption({ label: 'F160' });
  await page.getByLabel(/^Job/).fill('4711');
  for (const tick of await page.getByRole('button', { name: /^Step \d+ is done/ }).all()) await tick.click();
  await page.getByRole('button', { name: 'Start the run' }).click();
  await page.waitForURL(/\/runs\/J-\d+/);
}

/** What was withdrawn is not offered any more. */
export async function findNothing({ page, go }, { words }) {
  await go('/machine');
  await page.getByRole('searchbox').fill(words);
  await page
    .getByText(/no approved/i)
    .first()
    .waitFor();
}
