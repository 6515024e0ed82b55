import { resolve } from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoAccount } from './client';
import { openBrowser, signIn, watchPage } from './harness';

const sample = (name: string) => resolve(import.meta.dirname, '../../samples', name);
const patience = { timeout: 60_000 };

let browser: Browser;
let analyst: Page;
let lead: Page;
/** What the pages complained about: errors, refused content, foreign hosts. */
const complaints: string[] = [];

async function pageOf(role: 'viewer' | 'analyst' | 'lead'): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  const page = await context.newPage();
  watchPage(page, complaints);
  const { email, password } = demoAccount('Marlbeck', role);
  await signIn(page, email, password);
  return page;
}

beforeAll(async () => {
  browser = await openBrowser();
  analyst = await pageOf('analyst');
  lead = await pageOf('lead');
}, 120_000);
afterAll(() => browser?.close());

/** A reason as it stands in the history, not in the box where it is written. */
const inHistory = (page: Page, reason: string) =>
  page.getByRole('listitem').filter({ hasText: reason }).waitFor(patience);

const openScreens = async (page: Page) => {
  await page.getByRole('link', { name: 'Bromate hydrogenation in water' }).first().click();
  await page.getByRole('link', { name: 'Screens', exact: true }).click();
};

describe('the main path', () => {
  it('refuses a faulty workbook, names each cell, and stores nothing', async () => {
    await openScreens(analyst);
    await analyst.getByRole('link', { name: 'Upload workbook' }).first().click();
    await analyst.locator('input[type=file]').setInputFiles(sample('ten-faults.xlsx'));
    await analyst.getByRole('button', { name: 'Upload workbook' }).click();
    await analyst.getByText('nothing was stored').waitFor(patience);
    const faults = analyst.getByRole('table').first();
    expect(await faults.locator('tbody tr').count()).toBeGreaterThanOrEqual(10);
    expect(await faults.innerText()).toMatch(/[A-Z]+\d+/);
  });

  it('takes a screening workbook and analyses it, with progress', async () => {
    await analyst.locator('input[type=file]').setInputFiles(sample('marlbeck-screen.xlsx'));
    await analyst.getByRole('button', { name: 'Upload workbook' }).click();
    const analyse = analyst.getByRole('button', { name: 'Analyse screen' });
    const toScreen = analyst.getByRole('link', { name: 'Go to the screen' });
    await analyse.or(toScreen).waitFor(patience);
    if (await toScreen.isVisible()) await toScreen.click();
    await analyse.click();
    await analyst.getByRole('link', { name: 'See the leaderboard' }).click(patience);
    await analyst.getByRole('heading', { name: 'Leaderboard' }).waitFor(patience);
    await analyst.getByRole('link', { name: 'MB-25' }).first().waitFor(patience);
  }, 120_000);

  it('sorts by k within one order, and keeps the sort in the address', async () => {
    await analyst.getByRole('button', { name: /^Rate constant k/ }).click();
    await expect.poll(() => new URL(analyst.url()).search).toMatch(/sort=k/);
    const shown = async (page: Page) =>
      (await page.locator('table').first().innerText()).split('\n');
    const lines = await shown(analyst);
    const first = lines.findIndex((line) => line.startsWith('First order'));
    expect(first, 'rows stand under a heading for each order').toBeGreaterThan(-1);
    await analyst.reload();
    await expect.poll(async () => (await shown(analyst)).join()).toBe(lines.join());
  });

  it('opens a fit with its curve, rival laws, residuals and Arrhenius plot', async () => {
    await analyst.getByLabel(/search/i).fill('MB-25');
    await analyst.getByRole('link', { name: 'MB-25' }).first().click();
    await analyst.getByRole('heading', { name: 'MB-25' }).waitFor(patience);
    await analyst.getByText('Rival laws').waitFor(patience);
    await analyst.getByText('Apparent activation energy').first().waitFor(patience);
    await expect.poll(() => analyst.locator('svg').count(), patience).toBeGreaterThan(4);
    expect(await analyst.locator('body').innerText()).toContain('marlbeck-screen.xlsx');
  }, 90_000);

  it('nominates as the analyst, and takes to scale-up as the lead', async () => {
    await analyst.getByRole('button', { name: 'Nominate' }).click();
    await analyst.getByRole('textbox', { name: /why/i }).fill('Fast, and clear of its neighbours');
    await analyst.getByRole('button', { name: 'Nominate' }).click();
    await inHistory(analyst, 'Fast, and clear of its neighbours');
    expect(await analyst.getByRole('button', { name: 'Take to scale-up' }).count()).toBe(0);

    await lead.goto(analyst.url());
    await lead.getByRole('button', { name: 'Take to scale-up' }).click();
    await lead.getByText(/calorimetry and hazard review/).waitFor(patience);
    await lead.getByRole('textbox', { name: /why/i }).fill('Agreed in the group meeting');
    await lead.getByRole('button', { name: 'Take to scale-up' }).click();
    await inHistory(lead, 'Agreed in the group meeting');
    const history = await lead.locator('body').innerText();
    expect(history).toContain('Marlbeck analyst');
    expect(history).toContain('Marlbeck lead');
  }, 90_000);

  it('shows the decision to a viewer, who can change nothing', async () => {
    const viewer = await pageOf('viewer');
    await viewer.goto(lead.url());
    await inHistory(viewer, 'Agreed in the group meeting');
    for (const name of ['Nominate', 'Take to scale-up', 'Reopen', 'Add']) {
      expect(await viewer.getByRole('button', { name, exact: true }).count(), name).toBe(0);
    }
  }, 90_000);

  it('leads from a heatmap cell to the fit at that temperature', async () => {
    await analyst.getByRole('link', { name: 'Heatmap', exact: true }).click();
    await analyst.getByRole('heading', { name: 'Heatmap' }).waitFor(patience);
    const cells = analyst.locator('table a[href*="/candidates/"]');
    await cells.last().waitFor(patience);
    expect(await cells.count()).toBeGreaterThan(24 * 4);
    await cells.nth(10).click();
    await analyst.getByText('Rival laws').waitFor(patience);
  }, 90_000);

  it('raised no error, broke no content policy and asked no other host', () => {
    expect(complaints).toEqual([]);
  });
});
