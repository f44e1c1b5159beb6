import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { keepPicture, launchBrowser, visit } from './browser.ts';
import { moveCase } from './drivers/application.ts';
import { findBarriers } from './drivers/barriers.ts';
import { signIn, trySignIn, type Account } from './drivers/session.ts';

let browser: Browser;

beforeAll(async () => {
  browser = await launchBrowser();
});

afterAll(() => browser.close());

interface Screen {
  name: string;
  path: string;
  /** What is there once the page has its data. */
  shows: RegExp;
  as?: Account;
}

const screens: Screen[] = [
  { name: 'home', path: '/', shows: /Larkwicket Court/ },
  { name: 'sign-in', path: '/sign-in', shows: /E-mail address/ },
  { name: 'method', path: '/method', shows: /What is left out/ },
  { name: 'public-case', path: '/cases/2026-0005', shows: /Write a comment/ },
  { name: 'rule', path: '/admin/rules', shows: /18\.42/ },
  {
    name: 'new-application',
    path: '/applications/new',
    shows: /Parcels of the site/,
    as: 'applicant',
  },
  {
    name: 'applications',
    path: '/applications',
    shows: /Tallow Wharf Lofts|Larkwicket Court/,
    as: 'applicant',
  },
  { name: 'desk', path: '/desk', shows: /Tallow Wharf Lofts/, as: 'planner' },
  { name: 'intake', path: '/desk/2026-0001/intake', shows: /Completeness/, as: 'planner' },
  { name: 'study', path: '/desk/2026-0001/study', shows: /Who loses sun on/, as: 'planner' },
  { name: 'findings', path: '/desk/2026-0001/findings', shows: /In a sentence/, as: 'planner' },
  { name: 'comments', path: '/desk/2026-0005/comments', shows: /Publish|Withhold/, as: 'planner' },
  { name: 'report', path: '/desk/2026-0003/report', shows: /2026-0003-R1/, as: 'planner' },
  { name: 'hearings', path: '/hearings', shows: /Before the board/, as: 'board' },
];

describe('every screen', () => {
  it.each(screens)(
    '$name has no barrier and no sideways scrolling from a telephone to a desk',
    async ({ name, path, shows, as }) => {
      const { page, scriptErrors, leave } = await visit(browser);
      if (as !== undefined) await signIn(page, as);
      for (const width of [360, 768, 1440]) {
        await page.setViewportSize({ width, height: 900 });
        await page.goto(path);
        await page.getByText(shows).first().waitFor();
        await page.waitForLoadState('networkidle');
        const overflow = await page.evaluate(() => document.documentElement.scrollWidth);
        expect(overflow, `${name} at ${width} px`).toBeLessThanOrEqual(width);
        await keepPicture(page, `${name}-${width}`);
      }
      expect(await findBarriers(page)).toEqual([]);
      expect(scriptErrors).toEqual([]);
      await leave();
    },
  );
});

describe('signing in', () => {
  it('refuses a wrong password in a sentence that does not tell whether the account exists', async () => {
    const { page, leave } = await visit(browser);
    await trySignIn(page, 'planner', 'not the password');
    const answer = page.getByRole('alert').first();
    await answer.waitFor();
    const wrongPassword = await answer.textContent();
    await page.getByLabel('E-mail address').fill('nobody@larkhaven.example');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await answer.waitFor();
    expect(await answer.textContent()).toBe(wrongPassword);
    await leave();
  });

  it('keeps the desk from an applicant', async () => {
    const { page, leave } = await visit(browser);
    await signIn(page, 'applicant');
    await page.getByRole('heading', { name: 'My applications' }).waitFor();
    await page.goto('/desk');
    await page.getByRole('heading', { name: 'This page is not open to you' }).waitFor();
    await leave();
  });
});

describe('a case at the desk', () => {
  it('is sent back with a reason that the applicant reads', async () => {
    const { page, leave } = await visit(browser);
    await signIn(page, 'planner');
    await page.goto('/desk/2026-0004/intake');
    await moveCase(page, 'Send back for correction', 'Say how high the ridge of the roof is.');
    await leave();
    const owner = await visit(browser);
    await signIn(owner.page, 'osric.pellowfen');
    await owner.page.goto('/applications/2026-0004');
    await owner.page.getByText('Say how high the ridge of the roof is.').first().waitFor();
    await owner.leave();
  });

  it('says what changed from one revision to the next', async () => {
    const { page, leave } = await visit(browser);
    await signIn(page, 'planner');
    await page.goto('/desk/2026-0003/intake');
    await page.getByRole('heading', { name: 'What changed between revisions' }).waitFor();
    await page
      .getByText(/lower|changed|added|removed/i)
      .first()
      .waitFor();
    await leave();
  });
});
