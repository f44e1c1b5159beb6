import { execFile } from 'node:child_process';
import { mkdtemp, readFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import type { Browser } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { keepPicture, launchBrowser, visit, type Page, type Visitor } from './browser.ts';
import { moveCase, pickMassing, startApplication } from './drivers/application.ts';
import { signIn } from './drivers/session.ts';
import { site, twoTierMassing, upsideDownMassing } from './two-tier-elsewhere.ts';

const title = 'Two tiers at Tallowreed Row';
const commentText = 'My seed beds need the noon sun in March.';
let browser: Browser;
let folder: string;
let applicant: Visitor;
let planner: Visitor;
let neighbour: Visitor;
/** Given at submission. */
let caseNumber = '';

beforeAll(async () => {
  browser = await launchBrowser();
  folder = await mkdtemp(path.join(tmpdir(), 'noonmark-e2e-'));
  applicant = await visit(browser);
  planner = await visit(browser, { width: 1440, height: 900 });
  neighbour = await visit(browser, { width: 390, height: 844 });
});

afterAll(() => browser.close());

// Later steps stand on earlier ones: after one that failed, the others fail at once.
let brokenBy: string | null = null;
beforeEach(() => {
  if (brokenBy !== null) throw new Error(`An earlier step failed: ${brokenBy}`);
});
afterEach(({ task }) => {
  if (task.result?.state === 'fail') brokenBy ??= task.name;
});

async function download(page: Page, name: string): Promise<string> {
  const [file] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name }).click(),
  ]);
  const target = path.join(folder, file.suggestedFilename());
  await file.saveAs(target);
  return target;
}

// One case from the first file to the report, each step by the person whose it is; a step that
// fails takes the later ones with it.
describe('the main job on a massing that is in no sample file', () => {
  it('refuses to send a massing with an error, and names the block and the way out', async () => {
    const { page } = applicant;
    await signIn(page, 'applicant');
    await page.getByRole('heading', { name: 'My applications' }).waitFor();
    await startApplication(page, {
      title,
      description: 'A block of two tiers on an empty lot.',
      address: site.address,
    });
    await pickMassing(page, upsideDownMassing);
    await page.getByText('It cannot be sent like this.').waitFor();
    expect(await page.getByText('upper').count()).toBeGreaterThan(0);
    expect(await page.getByRole('button', { name: /Send it as revision/ }).count()).toBe(0);
  });

  it('shows the blocks, their heights and the shadow before anything is sent', async () => {
    const { page } = applicant;
    await page.getByRole('button', { name: 'Choose another file' }).click();
    await pickMassing(page, twoTierMassing);
    await page.getByRole('heading', { name: 'Where its shadow falls' }).waitFor();
    expect(await page.getByText('42.0 m').count()).toBeGreaterThan(0);
    expect(await page.getByText('In three dimensions, with the height of each top.').count()).toBe(
      1,
    );
    await keepPicture(page, 'application-review-1280');
    const revisions = page.getByRole('heading', { name: 'Stored revisions' });
    expect(await revisions.count()).toBe(0);
    await page.getByRole('button', { name: 'Send it as revision 1' }).click();
    await revisions.waitFor();
  });

  it('gives the case its number at submission', async () => {
    const { page } = applicant;
    await moveCase(page, 'Submit the application');
    await page.waitForURL(/\/applications\/\d{4}-\d{4}/);
    caseNumber = /\d{4}-\d{4}/.exec(page.url())?.[0] ?? '';
    expect(caseNumber).toMatch(/^\d{4}-\d{4}$/);
    expect(applicant.scriptErrors).toEqual([]);
  });

  it('lets the planner take it under review and run the study to its end', async () => {
    const { page } = planner;
    await signIn(page, 'planner');
    await page.getByRole('link', { name: title }).first().click();
    await page.goto(`/desk/${caseNumber}/intake`);
    await moveCase(page, 'Declare the application complete');
    await moveCase(page, 'Take under review');
    await page.goto(`/desk/${caseNumber}/study`);
    await page.getByRole('button', { name: /study/i }).first().click();
    await page.getByRole('heading', { name: /Who loses sun/ }).waitFor();
    await page.getByText('not met').first().waitFor();
  });

  it('moves the shadows by the keyboard and keeps the time in the address', async () => {
    const { page } = planner;
    const time = page.getByRole('slider', { name: 'Time of day' });
    const before = await time.getAttribute('aria-valuenow');
    await time.focus();
    await page.keyboard.press('PageDown');
    await expect.poll(() => time.getAttribute('aria-valuenow')).not.toBe(before);
    await expect.poll(() => page.url()).toContain('time=');
    await keepPicture(page, 'study-1440');
  });

  it('opens the sun ledger of who loses sun, with a sentence and a table', async () => {
    const { page } = planner;
    await page.getByRole('region', { name: 'Who loses sun' }).getByRole('link').first().click();
    await page
      .getByText(/of sun now, and .* with the proposal/)
      .first()
      .waitFor();
    await page.getByText('Its sun ledger, hour by hour').waitFor();
  });

  it('sorts and filters the findings and hands them out as files', async () => {
    const { page } = planner;
    await page.goto(`/desk/${caseNumber}/findings?finding=not-met`);
    const rows = page.getByRole('row');
    await rows.getByText(site.neighbour).first().waitFor();
    await page.getByRole('button', { name: 'Lost' }).click();
    await page.waitForURL(/sort=/);
    await rows.getByText(site.neighbour).first().waitFor();
    await keepPicture(page, 'findings-1440');
    const csv = await readFile(await download(page, 'Findings as CSV'), 'utf8');
    expect(csv).toContain('not-met');
    const geojson = JSON.parse(
      await readFile(await download(page, 'Findings as GeoJSON'), 'utf8'),
    ) as {
      features: unknown[];
    };
    expect(geojson.features.length).toBeGreaterThan(0);
  });

  it('has its evidence recomputed by a stranger to the same digest', async () => {
    const evidence = await download(planner.page, 'Evidence file');
    const { stdout } = await promisify(execFile)(process.execPath, [
      '--import',
      'tsx',
      'api/cli/recompute.ts',
      evidence,
      '--verify',
    ]);
    expect(stdout).toMatch(/^Verified: sha256:/);
  });

  it('is hidden from the public until the planner publishes it', async () => {
    const { page } = neighbour;
    await page.goto(`/cases/${caseNumber}`);
    await page.getByRole('heading', { name: 'There is nothing at this address' }).waitFor();
    await planner.page.goto(`/desk/${caseNumber}/intake`);
    await moveCase(planner.page, 'Publish and open for comment');
    await page.goto('/');
    await page.getByRole('link', { name: title }).first().click();
    await page.getByRole('heading', { name: title }).waitFor();
  });

  it('tells a neighbour on a telephone what changes for a parcel', async () => {
    const { page } = neighbour;
    await page.getByLabel('Your address or parcel number').fill(site.neighbour);
    await page.getByRole('option', { name: site.neighbour }).first().click();
    await page
      .getByText(/On December 21/)
      .first()
      .waitFor();
    await keepPicture(page, 'public-case-390');
    const widthPx = await page.evaluate(() => document.documentElement.scrollWidth);
    expect(widthPx).toBeLessThanOrEqual(390);
  });

  it('takes a comment without an account and shows it once the planner publishes it', async () => {
    const { page } = neighbour;
    const form = page.getByRole('form', { name: 'Write a comment' });
    await form.getByLabel('What do you want to say?').fill(commentText);
    await form.getByLabel('Your name').fill('Wenna Plumridge');
    await form.getByLabel('Your e-mail address').fill('wenna@plumridge.example');
    await form.getByRole('button', { name: 'Send the comment' }).click();
    await page
      .getByText(/received|thank/i)
      .first()
      .waitFor();
    await page.reload();
    await page.getByRole('heading', { name: 'Comments' }).waitFor();
    expect(await page.getByText(commentText).count()).toBe(0);
    await planner.page.goto(`/desk/${caseNumber}/comments`);
    await planner.page.getByRole('button', { name: 'Publish', exact: true }).first().click();
    await planner.page.getByRole('button', { name: 'Publish it' }).click();
    await planner.page.getByText('The comment is published.').waitFor();
    await page.reload();
    await page.getByText(commentText).waitFor();
    expect(await page.getByText('wenna@plumridge.example').count()).toBe(0);
    expect(neighbour.scriptErrors).toEqual([]);
  });

  it('ends in a report of several pages that holds the findings and the comment', async () => {
    const { page } = planner;
    await page.goto(`/desk/${caseNumber}/report`);
    await page.getByLabel('Narrative').fill('The block stands on a lot that has been empty.');
    await page.getByLabel('Recommendation').fill('Ask for a lower upper tier.');
    await page.getByRole('button', { name: 'Issue the staff report' }).click();
    await page.getByRole('button', { name: 'Issue the report' }).click();
    await page.getByText(`${caseNumber}-R1`).first().waitFor();
    await keepPicture(page, 'desk-report-1440');
    const response = await page.request.get(`/api/reports/${caseNumber}-R1.pdf`);
    expect(response.headers()['content-type']).toContain('application/pdf');
    const { getDocument } = await import('pdfjs-dist/legacy/build/pdf.mjs');
    const pdf = await getDocument({ data: new Uint8Array(await response.body()) }).promise;
    expect(pdf.numPages).toBeGreaterThanOrEqual(2);
    const pages = await Promise.all(
      Array.from({ length: pdf.numPages }, async (_, index) => {
        const content = await (await pdf.getPage(index + 1)).getTextContent();
        return content.items.map((item) => ('str' in item ? item.str : '')).join(' ');
      }),
    );
    const text = pages.join(' ').replace(/\s+/g, ' ');
    expect(text).toContain(caseNumber);
    expect(text).toContain('Ask for a lower upper tier.');
    expect(text).toContain('seed beds');
    expect(planner.scriptErrors).toEqual([]);
  });
});
