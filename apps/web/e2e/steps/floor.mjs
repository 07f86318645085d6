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

/** Lens fitted, steps ticked, first piece released, parts counted. */
export async function runParts({ page }, { good, scrap }) {
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
  await page.getByRole('button', { name: 'It matches' }).click();
  await page.getByLabel('Good', { exact: true }).fill(good);
  await page.getByLabel('Scrap', { exact: true }).fill(scrap);
  await page.getByRole('button', { name: /^Finish J-/ }).click();
  await page.getByText('Finished').first().waitFor();
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
