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
  const map = page.getByLabel(/^Map of the study/).first();
  const picture = (await map.screenshot()).toString('base64');
  return page.evaluate(async (base64) => {
    const image = new Image();
    image.src = `data:image/png;base64,${base64}`;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = image.width;
    canvas.height = image.height;
    const context = canvas.getContext('2d');
    if (context === null) throw new Error('no canvas');
    context.drawImage(image, 0, 0);
    const { data } = context.getImageData(0, 0, image.width, image.height);
    // The site stands a little below the middle: the lowest third lies south of the tower.
    const southFrom = Math.floor((image.height * 2) / 3);
    const counted = { north: 0, south: 0 };
    for (let index = 0; index < data.length; index += 4) {
      const [red = 0, green = 0, blue = 0] = data.subarray(index, index + 3);
      if (red > 130 && green < 110 && blue < 120 && red - green > 60) {
        const row = Math.floor(index / 4 / image.width);
        counted[row < southFrom ? 'north' : 'south'] += 1;
      }
    }
    return counted;
  }, picture);
}

/** The madder of the map once it has come to rest: two pictures in a row are the same. */
async function countAtRest(page: Page): Promise<{ north: number; south: number }> {
  let last = await countMadder(page);
  await expect
    .poll(
      async () => {
        const next = await countMadder(page);
        const isSame = next.north === last.north && next.south === last.south;
        last = next;
        return isSame;
      },
      { timeout: 60_000, interval: 1000 },
    )
    .toBe(true);
  return last;
}

describe('the map of a study', () => {
  it('hatches the net new shadow to the north of the tower at noon in December', async () => {
    const { page, leave } = await visit(browser, { width: 1440, height: 900 });
    await signIn(page, 'planner');
    const show = async (layer: string) => {
      await page.goto(`/desk/2026-0001/study?date=2026-12-21&time=12:00&layer=${layer}`);
      await page.getByText('12:00 p.m. CST').first().waitFor();
      await page.waitForLoadState('networkidle');
      return countAtRest(page);
    };
    // The outlines of who loses sun are madder in both pictures; the hatch is in the second alone.
    const before = await show('before');
    const after = await show('after');
    expect(after.north - before.north).toBeGreaterThan(600);
    expect(Math.abs(after.south - before.south)).toBeLessThan((after.north - before.north) / 20);
    await leave();
  });
});
