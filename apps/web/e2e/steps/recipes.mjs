/** The author takes in every caution and plans five equal cells that are to prove the draft; returns the coupon's code. */
export async function planProof({ page, go }, draft) {
  await go(draft);
  await acknowledgeCautions(page);
  await page.getByRole('button', { name: 'Plan a coupon' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Equal cells').fill('5');
  await dialog.getByLabel(/^Lot of the material/).fill('6061-B15');
  await dialog.getByRole('button', { name: 'Plan the coupon' }).click();
  await page.waitForURL(/\/coupons\/C-\d+/);
  return /C-\d+/.exec(page.url())?.[0] ?? '';
}

async function acknowledgeCautions(page) {
  const boxes = page.getByRole('checkbox', { name: /^Read and taken in/ });
  await boxes.first().waitFor();
  for (const box of await boxes.all()) await box.check({ force: true });
}

/** Cites the cells that proved it and hands the draft to the leads. */
export async function submitDraft({ page, go }, { draft, proof }) {
  await go(draft);
  await acknowledgeCautions(page);
  await page.getByRole('button', { name: 'Choose cells' }).click();
  const dialog = page.getByRole('dialog');
  const marks = dialog.getByRole('group', { name: 'What proved it again' }).getByRole('checkbox', { name: new RegExp(proof) });
  await marks.first().waitFor();
  for (const mark of await marks.all()) await mark.check({ force: true });
  await dialog.getByRole('button', { name: /^(Cite|Save)/ }).click();
  await dialog.waitFor({ state: 'hidden' });
  await page.getByRole('button', { name: 'Submit for review' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Submit for review' }).click();
  await page.getByText('In review').first().waitFor();
}

/** The lead judges what waits longest and signs with the password. */
export async function approve({ page, go }, { password, number }) {
  await go('/sign-off');
  await page.getByRole('link', { name: /R-\d+/ }).first().click();
  await page.waitForURL(/\/sign-off\/./);
  const form = page.getByRole('region', { name: `Sign revision ${number}` });
  await form.getByRole('checkbox').first().waitFor();
  for (const box of await form.getByRole('checkbox').all()) await box.check({ force: true });
  await form.getByLabel('Your password', { exact: true }).fill(password);
  await form.getByRole('button', { name: `Approve revision ${number}` }).click();
  await form.waitFor({ state: 'hidden' });
}

/** A change that is not essential: the old marks still prove it. */
export async function proposeChange({ page, go }, { recipe }) {
  await go(`/recipes/${recipe}`);
  await page.getByRole('button', { name: 'Propose a change' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Reason for the change').fill('Wipe before marking: fingerprints showed.');
  await dialog.getByRole('button', { name: 'Begin the draft' }).click();
  await page.waitForURL(/\/revisions\//);
  await acknowledgeCautions(page);
  await page.getByRole('button', { name: 'Add a set-up step' }).click();
  await page.getByRole('textbox', { name: 'Set-up step 2' }).fill('Wipe with isopropanol, let it dry 30 s');
  await page.getByText('Saved', { exact: true }).waitFor();
  const submit = page.getByRole('button', { name: 'Submit for review' });
  await submit.click();
  await page.getByRole('dialog').getByRole('button', { name: 'Submit for review' }).click();
  await page.getByText('In review').first().waitFor();
}

/** Two revisions side by side: what differs is shown, what is the same is named. */
export async function compare({ page, go }, { recipe }) {
  await go(`/recipes/${recipe}`);
  await page
    .getByRole('link', { name: /^Compare/ })
    .first()
    .click();
  await page.waitForURL(/\/compare/);
  await page.getByText('Wipe before marking').first().waitFor();
}

export async function withdraw({ page, go }, { recipe, number, password }) {
  await go(`/recipes/${recipe}`);
  await page.getByRole('button', { name: `Withdraw revision ${number}` }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Why it must not be used any more').fill('The white went grey on the new lot.');
  await dialog.getByLabel('Your password', { exact: true }).fill(password);
  await dialog.getByRole('button', { name: `Withdraw revision ${number}` }).click();
  await page.getByText('Withdrawn: there is no approved setting').waitFor();
}
