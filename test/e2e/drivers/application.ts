import type { Page } from '../browser.ts';

/** A file as a person picks it. */
export interface PickedFile {
  name: string;
  content: unknown;
}

/** Starts an application on a parcel found by its address; ends on the application's page. */
export async function startApplication(
  page: Page,
  details: { title: string; description: string; address: string },
): Promise<void> {
  await page.goto('/applications/new');
  await page.getByLabel('Name of the project').fill(details.title);
  await page.getByLabel('What is proposed').fill(details.description);
  await page.getByLabel('Add a parcel by address or number').fill(details.address);
  await page.getByRole('option', { name: details.address }).first().click();
  await page.getByRole('list', { name: 'Picked parcels' }).getByText(details.address).waitFor();
  await page.getByRole('button', { name: 'Save and go on to the massing' }).click();
  await page.getByRole('heading', { name: 'Massing', exact: true }).waitFor();
}

/** Picks a massing file; it is read in the browser and not sent. */
export async function pickMassing(page: Page, file: PickedFile): Promise<void> {
  await page.locator('input[type=file]').setInputFiles({
    name: file.name,
    mimeType: 'application/geo+json',
    buffer: Buffer.from(JSON.stringify(file.content)),
  });
  await page.getByRole('heading', { name: `How ${file.name} was read` }).waitFor();
}

/** Makes a case's transition by its button and confirms it. */
export async function moveCase(page: Page, label: string, reason?: string): Promise<void> {
  await page.getByRole('button', { name: label, exact: true }).first().click();
  const dialog = page.getByRole('alertdialog');
  if (reason !== undefined) await dialog.getByLabel('Reason').fill(reason);
  await dialog.getByRole('button', { name: label, exact: true }).click();
  await dialog.waitFor({ state: 'detached' });
}
