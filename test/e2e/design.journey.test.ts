import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Browser } from 'playwright-core';
import { createServer, type ViteDevServer } from 'vite';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { keepPicture, launchBrowser, visit, type Visitor } from './browser.ts';
import { findBarriers } from './drivers/barriers.ts';

let browser: Browser;
let developing: ViteDevServer;
let cacheFolder: string;
let visitor: Visitor;
let address: string;

// The built client has no page of the design system; it is served as developers see it.
beforeAll(async () => {
  cacheFolder = mkdtempSync(path.join(tmpdir(), 'noonmark-vite-'));
  developing = await createServer({
    configFile: path.resolve(import.meta.dirname, '../../vite.config.ts'),
    cacheDir: cacheFolder,
    logLevel: 'error',
    server: { port: 18_380, proxy: { '/api': { target: inject('baseUrl') } } },
  });
  await developing.listen();
  address = new URL('/design', developing.resolvedUrls?.local[0]).href;
  browser = await launchBrowser();
  visitor = await visit(browser, { width: 1440, height: 900 });
  // The first visit makes the server bundle what the page needs, and load it anew.
  await visitor.page.goto(address);
  await visitor.page.getByRole('heading', { name: 'The drawing office' }).waitFor();
  await visitor.page.waitForLoadState('networkidle');
});

afterAll(async () => {
  await browser.close();
  await developing.close();
  rmSync(cacheFolder, { recursive: true, force: true });
});

describe('the design system', () => {
  it.each([360, 768, 1440])('has no barrier and no sideways scrolling at %i px', async (width) => {
    const { page } = visitor;
    await page.setViewportSize({ width, height: 900 });
    await page.goto(address);
    await page.getByRole('heading', { name: 'Drawing', exact: true }).waitFor();
    await page.waitForLoadState('networkidle');
    const overflow = await page.evaluate(() => document.documentElement.scrollWidth);
    expect(overflow).toBeLessThanOrEqual(width);
    await keepPicture(page, `design-${width}`);
    expect(await findBarriers(page)).toEqual([]);
  });

  it.each([
    { opener: 'Open a dialog', role: 'dialog', closer: 'Close' },
    { opener: 'Ask once more', role: 'alertdialog', closer: 'Leave it as it is' },
    { opener: 'Ask before harm', role: 'alertdialog', closer: 'Leave it as it is' },
  ] as const)('keeps the keyboard in an open dialog: $opener', async ({ opener, role, closer }) => {
    const { page } = visitor;
    await page.goto(address);
    const button = page.getByRole('button', { name: opener });
    await button.press('Enter');
    const dialog = page.getByRole(role);
    await dialog.waitFor();
    expect(await findBarriers(page)).toEqual([]);
    await keepPicture(page, `design-${opener.toLowerCase().replaceAll(' ', '-')}`);
    for (let presses = 0; presses < 5; presses += 1) {
      await page.keyboard.press('Tab');
      expect(await dialog.evaluate((element) => element.contains(document.activeElement))).toBe(
        true,
      );
    }
    await dialog.getByRole('button', { name: closer }).press('Enter');
    await dialog.waitFor({ state: 'detached' });
    expect(await button.evaluate((element) => element === document.activeElement)).toBe(true);
  });

  it('says short things aloud, and takes them away on demand', async () => {
    const { page } = visitor;
    await page.goto(address);
    await page.getByRole('button', { name: 'Show a short message' }).press('Enter');
    const message = page.getByRole('status').filter({ hasText: 'The comment is published.' });
    await message.waitFor();
    expect(await findBarriers(page)).toEqual([]);
    await message.getByRole('button', { name: 'Close' }).press('Enter');
    await page.getByText('The comment is published.').waitFor({ state: 'detached' });
  });

  it('opens a list of choices by keyboard, without a barrier', async () => {
    const { page } = visitor;
    await page.goto(address);
    await page.getByRole('button', { name: /What it is about/ }).press('Enter');
    await page.getByRole('listbox').waitFor();
    expect(await findBarriers(page)).toEqual([]);
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    await page.getByRole('listbox').waitFor({ state: 'detached' });
    await page.getByRole('button', { name: /Noise/ }).first().waitFor();
    expect(visitor.scriptErrors).toEqual([]);
  });
});
