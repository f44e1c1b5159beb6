import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { launchBrowser, visit, type Page, type Visitor } from './browser.ts';
import { signIn } from './drivers/session.ts';
import { mapOf } from './drivers/study-map.ts';

let browser: Browser;
let planner: Visitor;

beforeAll(async () => {
  browser = await launchBrowser();
  planner = await visit(browser, { width: 1440, height: 900 });
  await signIn(planner.page, 'planner');
});

afterAll(() => browser.close());

const study = '/desk/2026-0001/study?date=2026-12-21&time=12:00';

async function openStudy(page: Page, address = study): Promise<void> {
  await page.goto(address);
  await page.getByText(/the proposal shades .* of ground anew/).waitFor();
  await mapOf(page).waitFor();
  await page.waitForLoadState('networkidle');
}

/** Presses Tab until something has the focus, as a person without a pointer does. */
async function tabTo(page: Page, isThere: () => Promise<boolean>): Promise<void> {
  for (let presses = 0; presses < 80; presses += 1) {
    if (await isThere()) return;
    await page.keyboard.press('Tab');
  }
  throw new Error('Tab does not lead there.');
}

const isFocused = (locator: ReturnType<Page['locator']>) => async () =>
  locator.evaluate((element) => element === document.activeElement);

const tabToButton = (page: Page, name: string) =>
  tabTo(page, isFocused(page.getByRole('button', { name, exact: true })));

/** A search parameter of the address, once it is there. */
const inAddress = (page: Page, name: string) => () => new URL(page.url()).searchParams.get(name);

describe('the map by keyboard alone', () => {
  it('is moved and zoomed, and the address follows', async () => {
    const { page } = planner;
    await openStudy(page);
    await tabTo(page, isFocused(mapOf(page)));
    await page.keyboard.press('ArrowUp');
    await expect.poll(inAddress(page, 'view')).toMatch(/^\d/);
    const moved = inAddress(page, 'view')();
    await page.keyboard.press('+');
    await expect.poll(inAddress(page, 'view')).not.toBe(moved);
  });

  it('tells what lies under its cross, with the receptors to choose from', async () => {
    const { page } = planner;
    // The middle of a parcel beside the site.
    await openStudy(page, `${study}&view=18/46.7494/-91.29745`);
    await tabTo(page, isFocused(mapOf(page)));
    await page.keyboard.press('Enter');
    const facts = page.getByRole('region', { name: 'At this place' });
    await facts.getByText(/LH-\d{4}/).waitFor();
    await tabTo(page, isFocused(facts.getByRole('button').first()));
    const chosen = await facts.getByRole('button').first().textContent();
    await page.keyboard.press('Enter');
    await expect.poll(inAddress(page, 'receptor')).toMatch(/./);
    await page
      .getByRole('region', { name: 'Who loses sun' })
      .getByText(chosen?.split(',')[0] ?? 'none')
      .first()
      .waitFor();
  });

  it('measures a distance from cross to cross', async () => {
    const { page } = planner;
    await openStudy(page, `${study}&view=18/46.7494/-91.29745`);
    await tabToButton(page, 'Measure a distance');
    await page.keyboard.press('Enter');
    const panel = page.getByRole('group', { name: 'Measuring' });
    await panel.getByText('Point at where the distance begins.').waitFor();
    expect(await isFocused(mapOf(page))()).toBe(true);
    await page.keyboard.press('Enter');
    await panel.getByText('Point at where it ends.').waitFor();
    // An arrow moves the map by 100 px; at zoom 18 and this latitude a pixel is 0.2046 m.
    const before = inAddress(page, 'view')();
    await page.keyboard.press('ArrowRight');
    await expect.poll(inAddress(page, 'view')).not.toBe(before);
    await page.keyboard.press('Enter');
    const text = await panel.getByText(/^\d+\.\d\sm$/).textContent();
    const metresPerPx = (40_075_016.686 * Math.cos((46.7494 * Math.PI) / 180)) / (512 * 2 ** 18);
    expect(Math.abs(parseFloat(text ?? '') - 100 * metresPerPx)).toBeLessThan(0.3);
    await page.keyboard.press('Backspace');
    await panel.getByText('Point at where it ends.').waitFor();
    await page.keyboard.press('Escape');
    await panel.waitFor({ state: 'detached' });
  });

  it('is tilted, turned and laid flat again, and the address says how', async () => {
    const { page } = planner;
    await openStudy(page);
    await tabToButton(page, 'Tilt the view');
    await page.keyboard.press('Enter');
    await expect.poll(inAddress(page, 'view')).toMatch(/\/55\/0$/);
    await page.getByRole('img', { name: /a tilted view has no one scale/ }).waitFor();
    await tabToButton(page, 'Look from further left');
    await page.keyboard.press('Enter');
    await expect.poll(inAddress(page, 'view')).toMatch(/\/55\/45$/);
    await page.keyboard.press('Shift+Tab');
    await page.keyboard.press('Enter');
    await page.getByRole('img', { name: /True north is up; the scale bar/ }).waitFor();
  });
});

describe('the sun arc by keyboard alone', () => {
  it('goes by steps, by hours and to the ends of the judged hours, without a request', async () => {
    const { page } = planner;
    await openStudy(page);
    const handle = page.getByRole('slider', { name: 'Time of day' });
    await tabTo(page, isFocused(handle));
    const asked: string[] = [];
    page.on('request', (request) => asked.push(request.url()));
    const shows = async (key: string, clock: string) => {
      await page.keyboard.press(key);
      await expect.poll(() => handle.getAttribute('aria-valuetext')).toContain(clock);
      await page.getByText(`At ${clock}\u00a0CST the proposal shades`).waitFor();
    };
    await shows('ArrowRight', '12:05\u00a0p.m.');
    await shows('ArrowLeft', '12:00\u00a0p.m.');
    await shows('PageUp', '1:00\u00a0p.m.');
    await shows('Home', '10:00\u00a0a.m.');
    await shows('End', '2:00\u00a0p.m.');
    expect(await handle.getAttribute('aria-valuetext')).toContain('an hour that the rule judges');
    await shows('PageUp', '3:00\u00a0p.m.');
    expect(await handle.getAttribute('aria-valuetext')).not.toContain('judges');
    await expect.poll(inAddress(page, 'time')).toBe('15:00');
    expect(asked.filter((url) => url.includes('/api/studies/'))).toEqual([]);
    expect(planner.scriptErrors).toEqual([]);
  });

  it('leads to any other day, with who loses sun on it, and says that no hour is judged', async () => {
    const { page } = planner;
    await openStudy(page);
    const picker = page.getByLabel('Another day');
    await tabTo(page, isFocused(picker));
    await page.keyboard.type('11092026');
    await expect.poll(inAddress(page, 'date')).toBe('2026-11-09');
    await page.getByText('The rule judges no hour of this day.').waitFor();
    await page.getByRole('heading', { name: 'Who loses sun on November 9' }).waitFor();
    const losers = page.getByRole('region', { name: 'Who loses sun on November 9' });
    await losers
      .getByText(/\d+\smin/)
      .first()
      .waitFor();
    expect(await losers.getByText('not judged').count()).toBeGreaterThan(0);
  });

  it('plays nothing for those who want nothing to move', async () => {
    const { page } = planner;
    await openStudy(page);
    expect(await page.getByRole('button', { name: 'Play through the day' }).count()).toBe(0);
  });
});

describe('playing through the day', () => {
  it('moves the sun and its shadows without a request until it is stopped', async () => {
    const { page, leave } = await visit(browser, { width: 1280, height: 900 });
    await page.emulateMedia({ reducedMotion: 'no-preference' });
    await openStudy(page, '/cases/2026-0005?date=2026-12-21&time=09:00');
    const handle = page.getByRole('slider', { name: 'Time of day' });
    const minutes = async () => Number(await handle.getAttribute('aria-valuenow'));
    const asked: string[] = [];
    page.on('request', (request) => asked.push(request.url()));
    await page.getByRole('button', { name: 'Play through the day' }).press('Enter');
    await expect.poll(minutes, { timeout: 30_000 }).toBeGreaterThan(9 * 60 + 30);
    await page.getByRole('button', { name: 'Stop' }).press('Enter');
    const stoppedAt = await minutes();
    await page.getByText(/the proposal shades .* of ground anew/).waitFor();
    expect(await minutes()).toBe(stoppedAt);
    expect(asked.filter((url) => url.includes('/api/studies/'))).toEqual([]);
    await leave();
  });
});

describe('where the drawing engine cannot start', () => {
  it('says so, and the server’s shadows follow when the handle rests', async () => {
    const { page, leave } = await visit(browser, { width: 1280, height: 900 });
    await page.route(/shadow-worker/, (route) => route.abort());
    await page.goto('/cases/2026-0005?date=2026-12-21&time=12:00');
    await page.getByText('This browser could not start the drawing engine.').waitFor();
    await page.getByText(/the proposal shades .* of ground anew/).waitFor();
    const [answer] = await Promise.all([
      page.waitForResponse((response) => response.url().includes('/shadows?at=')),
      page.getByRole('slider', { name: 'Time of day' }).press('PageUp'),
    ]);
    expect(answer.status()).toBe(200);
    await leave();
  });
});
