import type { Page } from '../browser.ts';

/** Signs in with one of the demo's accounts. */
export async function signIn(
  page: Page,
  who: 'applicant' | 'planner' | 'board' | 'admin',
  password = 'larkhaven-demo',
): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(`${who}@larkhaven.example`);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}
