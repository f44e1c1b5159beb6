import { chromium, type Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';

let browser: Browser;

beforeAll(async () => {
  browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--use-angle=swiftshader',
      '--enable-unsafe-swiftshader',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
});

afterAll(() => browser.close());

describe('a first look', () => {
  it('shows the open cases to anybody, with the caution', async () => {
    const page = await browser.newPage();
    await page.goto(inject('baseUrl'));
    await page.getByRole('link', { name: 'Larkwicket Court', exact: true }).first().waitFor();
    expect(await page.getByText('It is no survey and no legal opinion').count()).toBeGreaterThan(0);
    expect(await page.getByText('Tallow Wharf Lofts').count()).toBe(0);
    await page.close();
  });

  it('refuses a wrong password in a sentence, and lets the planner in with the right one', async () => {
    const page = await browser.newPage();
    await page.goto(`${inject('baseUrl')}/sign-in`);
    await page.getByLabel('E-mail').fill('planner@larkhaven.example');
    await page.getByLabel('Password').fill('not the password');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('alert').first().waitFor();
    await page.getByLabel('Password').fill('larkhaven-demo');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('link', { name: 'Tallow Wharf Lofts' }).first().waitFor();
    await page.close();
  });
});
