import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { launchBrowser, visit, type Page } from './browser.ts';
import { signIn } from './drivers/session.ts';

let browser: Browser;

beforeAll(async () => {
  browser = await launchBrowser();
});

afterAll(() => browser.close());

/** Counts madder pixels (#A3263B, with the paper between the hatch's lines) in parts of the map. */
async function countMadder(page: Page): Promise<{ north: number; south: number }> {
  const map = page
    .getByRole('region', { name: /Map of the study/ })
    .or(page.getByLabel(/Map of the study/))
    .first();
  const picture = (await map.screenshot()).toString('base64');
  return page.evaluate(async (base64) => {
    const image = new Image();
    image.src = `data:image/png;base64,${base64}`;
    await image.decode();
    response;
    const canvas = document.createElement('canvas');
    canvas.width = image.width;
    canvas.height = image.height;
    const context = canvas.getContext('2d');
    if (context === null) throw new Error('no canvas');
    context.drawImage(image, 0, 0);
    const { data } = context.getImageData(0, 0, image.width, image.height);
    const half = Math.floor(image.height / 2);
    const counted = { north: 0, south: 0 };
    for (let index = 0; index < data.length; index += 4) {
      const [red = 0, green = 0, blue = 0] = data.subarray(index, index + 3);
      if (red > 130 && green < 110 && blue < 120 && red - green > 60) {
        const row = Math.floor(index / 4 / image.width);
        counted[row < half ? 'north' : 'south'] += 1;
      }
    }
    return counted;
  }, picture);
}

describe('the map of a study', () => {
  it('hatches net new shadow to the north at noon in December, and next to none at noon in June', async () => {
    const { page, leave } = await visit(browser, { width: 1440, height: 900 });
    await signIn(page, 'planner');
    await page.getByRole('button', { name: 'Sign out' }).waitFor();
    await page.goto('/desk/2026-0001/study?date=2026-12-21&time=12:00');
    await page.getByRole('heading', { name: 'Who loses sun on December 21' }).waitFor();
    await page.getByText('12:00 p.m. CST').first().waitFor();
    await expect
      .poll(async () => (await countMadder(page)).north, { timeout: 60_000 })
      .toBeGreaterThan(500);
    await leave();
  });
});
