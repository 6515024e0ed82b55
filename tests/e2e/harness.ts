import { existsSync } from 'node:fs';
import { chromium, type Browser, type Page } from 'playwright-core';
import { baseUrl } from './client';

const places = ['/usr/bin/chromium', '/usr/bin/chromium-browser'];

/** Debian's Chromium without a window, which asks nobody but the pages it is shown. */
export function openBrowser(): Promise<Browser> {
  const executablePath = process.env.CHROMIUM ?? places.find((place) => existsSync(place));
  const libraries = process.env.CHROMIUM_LIBRARIES;
  if (!executablePath) throw new Error('Chromium is not installed: run npm test.');
  return chromium.launch({
    executablePath,
    env: libraries ? { ...process.env, LD_LIBRARY_PATH: libraries } : process.env,
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}

/** Signs in through the form, as a person does. */
export async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto(new URL('/sign-in', baseUrl).href);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}

/** Notes what a page complains about: script errors, refused content, requests to other hosts. */
export function watchPage(page: Page, complaints: string[]): void {
  const { host } = new URL(baseUrl);
  page.on('pageerror', (error) => complaints.push(`error: ${error.message}`));
  page.on('console', (message) => {
    const text = message.text();
    // The browser itself notes each refused upload that a test asks for.
    if (message.type() === 'error' && !text.includes('422')) complaints.push(`console: ${text}`);
  });
  page.on('request', (request) => {
    const url = new URL(request.url());
    if (url.protocol.startsWith('http') && url.host !== host) complaints.push(`asked ${url.host}`);
  });
}
