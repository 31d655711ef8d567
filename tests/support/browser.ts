import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { afterAll, beforeAll } from 'vitest';
import type { RunningApp } from './app.ts';
import { PASSWORD, type Person } from './world.ts';

const SWITCHES = ['--no-sandbox', '--disable-dev-shm-usage', '--disable-gpu', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--disable-quic'];

/** Debian's Chromium for all tests of a file. */
export function browserForFile(): () => Browser {
  let browser: Browser | undefined;
  beforeAll(async () => {
    browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: SWITCHES });
  });
  afterAll(async () => {
    await browser?.close();
  });
  return () => {
    if (!browser) throw new Error('The browser is not running yet; call this inside a test');
    return browser;
  };
}

export interface OpenPage {
  page: Page;
  context: BrowserContext;
  /** Refusals of the content policy and errors of the page's own scripts. */
  complaints: string[];
}

/** A page of somebody signed in through the door; complaints of policy and scripts are gathered. */
export async function signedInPage(browser: Browser, app: RunningApp, person: Person, options: { width?: number; height?: number; room?: 'day' | 'evening'; hasTouch?: boolean } = {}): Promise<OpenPage> {
  const { width = 1280, height = 900, room = 'day', hasTouch = false } = options;
  const context = await browser.newContext({ viewport: { width, height }, baseURL: app.url, hasTouch, reducedMotion: 'reduce' });
  await context.addInitScript((chosen) => localStorage.setItem('loafmark.room', chosen), room);
  const [name = '', value = ''] = person.cookie.split('=');
  await context.addCookies([{ name, value, url: app.url }]);
  const page = await context.newPage();
  page.setDefaultTimeout(20_000);
  const complaints: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' && /Content Security Policy/.test(message.text())) complaints.push(message.text());
  });
  page.on('pageerror', (error) => complaints.push(String(error)));
  return { page, context, complaints };
}

/** Signs in by typing, as a person does. */
export async function signInByHand(page: Page, person: Person): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail address').fill(person.email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}
