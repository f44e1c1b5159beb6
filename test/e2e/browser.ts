import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { inject } from 'vitest';

export type { Page } from 'playwright-core';

const screenshotFolder = path.resolve(import.meta.dirname, 'screenshots');

/** The map is drawn in software, and the machine may be busy. */
const patienceMs = 30_000;

/** A browser of Debian's, which draws WebGL without a graphics card. */
export function launchBrowser(): Promise<Browser> {
  return chromium.launch({
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
}

/** Somebody at a browser of their own: pages share the sign-in, and errors of scripts are kept. */
export interface Visitor {
  page: Page;
  scriptErrors: string[];
  leave: () => Promise<void>;
}

export async function visit(
  browser: Browser,
  size: { width: number; height: number } = { width: 1280, height: 900 },
): Promise<Visitor> {
  const context: BrowserContext = await browser.newContext({
    baseURL: inject('baseUrl'),
    viewport: size,
    acceptDownloads: true,
    reducedMotion: 'reduce',
  });
  context.setDefaultTimeout(patienceMs);
  const page = await context.newPage();
  const scriptErrors: string[] = [];
  page.on('pageerror', (error) => scriptErrors.push(error.message));
  return { page, scriptErrors, leave: () => context.close() };
}

/** Keeps a picture of the whole page in the git-ignored folder, for people to look at. */
export async function keepPicture(page: Page, name: string): Promise<void> {
  mkdirSync(screenshotFolder, { recursive: true });
  await page.screenshot({ path: path.join(screenshotFolder, `${name}.png`), fullPage: true });
}
