import AxeBuilder from '@axe-core/playwright';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { keepPicture, launchBrowser, visit, type Page, type Visitor } from './browser.ts';
import { signIn } from './drivers/session.ts';

let browser: Browser;
let administrator: Visitor;
let page: Page;

beforeAll(async () => {
  browser = await launchBrowser();
  administrator = await visit(browser);
  page = administrator.page;
  await signIn(page, 'admin');
});

afterAll(async () => {
  expect(administrator.scriptErrors).toEqual([]);
  await administrator.leave();
  await browser.close();
});

const widths = [360, 768, 1440];

/** No barrier and no sideways scrolling, from a telephone to a desk, with a picture of each. */
async function look(name: string): Promise<void> {
  for (const width of widths) {
    await page.setViewportSize({ width, height: 900 });
    const overflow = await page.evaluate(() => document.documentElement.scrollWidth);
    expect(overflow, `${name} at ${width} px`).toBeLessThanOrEqual(width);
    await keepPicture(page, `rules-${name}-${width}`);
  }
  // What was announced of a button outlives it there for some seconds.
  const { violations } = await new AxeBuilder({ page }).exclude('[data-live-announcer]').analyze();
  const barriers = violations.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(' ')}`),
  );
  expect(barriers, name).toEqual([]);
  await page.setViewportSize({ width: 1280, height: 900 });
}

async function choose(label: RegExp, option: string): Promise<void> {
  await page.getByRole('button', { name: label }).last().click();
  await page.getByRole('option', { name: option }).click();
}

describe('an administrator', () => {
  it('begins a new version from the one in force', async () => {
    await page.goto('/admin/rules');
    await page.getByRole('heading', { name: /^In force/ }).waitFor();
    await look('list');
    await page.getByRole('link', { name: 'Write a new version' }).click();
    await page.getByRole('heading', { name: 'Write version 2 of the rule' }).waitFor();
  });

  it('adds a clause from a template and sees which instants count', async () => {
    await page.getByRole('button', { name: 'Add from a template' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByRole('textbox').fill('half of a garden');
    await look('templates');
    await dialog
      .getByRole('button', { name: /^Add: Two hours of sun on half of a garden/ })
      .click();
    const title = page.getByLabel('What the clause asks, as a heading');
    await title.waitFor();
    // 21 March, sun above 10°, every ten minutes.
    await page.getByText('One day of', { exact: false }).waitFor();
    const status = page.getByRole('status').filter({ hasText: 'instants count' });
    const before = await status.textContent();
    await page.getByLabel('Minutes between instants').fill('30');
    await status.filter({ hasNotText: before ?? '' }).waitFor();
    await look('form');
  });

  it('is told at the field what is wrong, by the keyboard alone', async () => {
    const step = page.getByLabel('Minutes between instants');
    await step.focus();
    await page.keyboard.press('Control+A');
    await page.keyboard.type('0');
    await page.getByText('Write at least 1.').waitFor();
    await page.getByRole('button', { name: 'Save as a draft' }).focus();
    await page.keyboard.press('Enter');
    await page.getByRole('alert').getByText('Write at least 1.').waitFor();
    await look('problem');
    await step.fill('10');
  });

  it('must choose the clock of an empty clause', async () => {
    await page.getByRole('button', { name: 'Add an empty clause' }).click();
    await page.getByLabel('What the clause asks, as a heading').fill('An hour in June');
    await page.getByText('Choose by which clock the hours are meant.').first().waitFor();
    await choose(/By which clock are the hours meant\?$/, 'Standard time all year');
    await choose(/\bWhich$/, 'June solstice');
    await page
      .getByText('On the June solstice, from 09:00 to 15:00, standard time')
      .filter({ visible: true })
      .waitFor();
    await look('own-clause');
    await page.getByRole('button', { name: 'Remove clause 3' }).click();
    await page.getByRole('button', { name: 'Put it back' }).waitFor();
  });

  it('saves it as a draft and reads in what it differs', async () => {
    await page.getByRole('button', { name: 'Save as a draft' }).click();
    await page.getByRole('heading', { name: 'In what it differs from version 1' }).waitFor();
    await page.getByText('New: On March 21', { exact: false }).waitFor();
    await look('draft');
  });

  it('tries it on a case beside the version in force', async () => {
    await page.getByRole('link', { name: 'Try it on a case' }).click();
    await page.getByRole('combobox', { name: 'Case' }).fill('Tallow');
    await page.getByRole('option', { name: /Tallow Wharf Lofts/ }).click();
    await page.getByRole('button', { name: 'Try it on this case' }).click();
    await page.getByRole('button', { name: 'Stop' }).waitFor();
    await page.getByRole('heading', { name: 'Place by place' }).waitFor();
    await page
      .getByRole('table', { name: 'Clause by clause' })
      .getByText('has no such clause')
      .first()
      .waitFor();
    await look('trial');
  });

  it('puts it in force from a day, and it can no longer be edited', async () => {
    await page.goto('/admin/rules');
    await page.getByRole('link', { name: /^Version 2/ }).click();
    await page.getByRole('button', { name: 'Put it in force' }).click();
    await page.getByRole('alertdialog').waitFor();
    await look('enact');
    await page.getByRole('alertdialog').getByRole('button', { name: 'Put it in force' }).click();
    await page.getByText('Version 2 is in force from today.').waitFor();
    await page.getByRole('link', { name: 'Edit the draft' }).waitFor({ state: 'detached' });
    await page.goto('/admin/rules');
    await page.getByRole('heading', { name: /^In force: .*version 2/ }).waitFor();
    await look('in-force');
  });
});

describe('a neighbour', () => {
  it('sorts, narrows and opens the findings of an earlier study, which kept its version', async () => {
    const visitor = await visit(browser);
    const { page: reader } = visitor;
    await reader.goto('/cases/2026-0005');
    await reader.getByRole('link', { name: 'What the rule says, place by place' }).click();
    await reader.getByText('version 1', { exact: false }).first().waitFor();
    await reader.getByRole('button', { name: 'After', exact: true }).click();
    await reader.locator('th[aria-sort=ascending]', { hasText: 'After' }).waitFor();
    await reader
      .getByRole('button', { name: /^Sun ledger of/ })
      .first()
      .click();
    await reader.getByRole('heading', { name: /^What changes at/ }).waitFor();
    page = reader;
    await look('public-findings');
    expect(visitor.scriptErrors).toEqual([]);
    await visitor.leave();
  });
});
