import { readFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { launchBrowser, visit } from './browser.ts';

const distFolder = path.resolve(
  process.env['WEB_DIST'] ?? path.join(import.meta.dirname, '../../dist'),
);

/** Vite's manifest: each chunk by its source, with what it imports at once and what only when asked. */
const manifestSchema = z.record(
  z.string(),
  z.object({
    file: z.string(),
    imports: z.array(z.string()).default([]),
    dynamicImports: z.array(z.string()).default([]),
  }),
);
const manifest = manifestSchema.parse(
  JSON.parse(readFileSync(path.join(distFolder, '.vite/manifest.json'), 'utf8')),
);

const mapSource = 'map/map-canvas.tsx';
/** The first public page comes with the shell. */
const firstPage = 'index.html';
/** 170 kB of script, gzipped; the project's own target. */
const mostBytes = 170_000;

function chunkOf(source: string) {
  const chunk = manifest[source];
  if (chunk === undefined) throw new Error(`The build has no ${source}.`);
  return chunk;
}

/** A chunk and everything that it imports at once. */
function loadedWith(source: string, known = new Set<string>()): Set<string> {
  if (known.has(source)) return known;
  known.add(source);
  for (const imported of chunkOf(source).imports) loadedWith(imported, known);
  return known;
}

function gzippedBytes(source: string): number {
  return gzipSync(readFileSync(path.join(distFolder, chunkOf(source).file)), { level: 9 }).length;
}

describe('the built client', () => {
  it('shows its first public page with less than 170 kB of script, gzipped', () => {
    const bytes = [...loadedWith(firstPage)].reduce((sum, source) => sum + gzippedBytes(source), 0);
    // Less than a tenth of it would mean that the test counts the wrong files.
    expect(bytes).toBeGreaterThan(mostBytes / 10);
    expect(bytes).toBeLessThan(mostBytes);
  });

  it('loads the drawing of the map only when a map is shown, on no page at once', () => {
    expect(gzippedBytes(mapSource)).toBeGreaterThan(200_000);
    const loadedAtOnce = Object.keys(manifest)
      .filter((source) => source !== mapSource)
      .filter((source) => loadedWith(source).has(mapSource));
    expect(loadedAtOnce).toEqual([]);
  });

  it('splits its routes: every other page is a chunk that waits until it is opened', () => {
    const pages = Object.keys(manifest).filter((source) => source.startsWith('app/pages/'));
    expect(pages.length).toBeGreaterThan(12);
    const atOnce = loadedWith(firstPage);
    expect(pages.filter((page) => atOnce.has(page))).toEqual([]);
  });

  it('leaves out the page of the design system', () => {
    expect(Object.keys(manifest).filter((source) => source.includes('design'))).toEqual([]);
  });
});

describe('a visitor’s browser', () => {
  let browser: Browser;
  beforeAll(async () => {
    browser = await launchBrowser();
  });
  afterAll(() => browser.close());

  it.each([
    { address: '/', hasMap: true },
    { address: '/cases/2026-0005', hasMap: true },
    { address: '/method', hasMap: false },
    { address: '/sign-in', hasMap: false },
    { address: '/admin/rules', hasMap: false },
    { address: '/design', hasMap: false },
  ])('fetches the map’s drawing where one is shown: $address', async ({ address, hasMap }) => {
    const { page, leave } = await visit(browser);
    const fetched: string[] = [];
    page.on('request', (request) => fetched.push(new URL(request.url()).pathname));
    await page.goto(address);
    if (hasMap) await page.locator('canvas').first().waitFor();
    await page.getByRole('heading', { level: 1 }).waitFor();
    await page.waitForLoadState('networkidle');
    expect(fetched.includes(`/${chunkOf(mapSource).file}`)).toBe(hasMap);
    await leave();
  });
});
