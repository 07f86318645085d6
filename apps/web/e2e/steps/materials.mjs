/** What is marked: a metal with a finish, and a film that must never be marked. */
export async function describeMaterials({ page, go }) {
  await addMaterial(page, go, { name: 'black anodised 6061', family: 'anodised aluminium' });
  await addMaterial(page, go, { name: 'sign film', family: 'vinyl' });
  await page.getByText('Do not mark PVC').waitFor();
  await go('/materials/finishes');
  await page
    .getByRole('button', { name: /Add a finish/ })
    .first()
    .click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Name').fill('sealed satin');
  await dialog.locator('button[type=submit]').click();
  await dialog.waitFor({ state: 'hidden' });
}

async function addMaterial(page, go, { name, family }) {
  await go('/materials/new');
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('What it is').fill(family);
  await page.getByRole('button', { name: 'Add the material' }).click();
  await page.getByRole('heading', { level: 1, name: new RegExp(name) }).waitFor();
}
