import type { Page } from '../browser.ts';

/** The accounts of the demo. */
export type Account = 'applicant' | 'osric.pellowfen' | 'planner' | 'board' | 'admin';

/** Signs in with one of the demo's accounts and waits until it is done. */
export async function signIn(page: Page, who: Account): Promise<void> {
  await trySignIn(page, who, 'larkhaven-demo');
  await page.getByRole('button', { name: 'Sign out' }).waitFor();
}

/** Sends the sign-in form, whatever comes of it. */
export async function trySignIn(page: Page, who: Account, password: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(`${who}@larkhaven.example`);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}
