import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { chromium, type Browser, type Page } from 'playwright-core';
import { findChromium } from '../../../server/scripts/lib/debianPackages.js';
import { networkHost } from './product';
import { viewports, type ViewportName } from './viewports';
import { watchPage, type PageRecord } from './watchPage';

const screenshotFolder = path.resolve(__dirname, '../../e2e/screenshots');

/** A page of the product, with what happened on it. */
export interface Visit {
  page: Page;
  record: PageRecord;
  viewport: ViewportName;
  /** Saves tests/e2e/screenshots/NAME-VIEWPORT.png. */
  screenshot(name: string): Promise<void>;
  close(): Promise<void>;
}

/** Addresses of the running product: loopback, and as a phone on the network sees it. */
export function productUrls(): { url: string; networkUrl: string } {
  const { RINGWRIGHT_E2E_URL: url, RINGWRIGHT_E2E_NETWORK_URL: networkUrl } = process.env;
  if (url === undefined || networkUrl === undefined)
    throw new Error('The global setup of the browser tests has not run.');
  return { url, networkUrl };
}

/** Debian's Chromium, headless, drawing WebGL by software as a browser with a graphics card would compose it. */
export async function launchBrowser(): Promise<Browser> {
  const executablePath = findChromium();
  if (executablePath === null) throw new Error('Chromium is not installed.');
  return chromium.launch({
    executablePath,
    args: [
      '--no-sandbox',
      '--use-angle=swiftshader',
      '--enable-unsafe-swiftshader',
      `--host-resolver-rules=MAP ${networkHost} 127.0.0.1`,
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-domain-reliability',
      '--disable-sync',
      '--no-default-browser-check',
      '--no-first-run',
      '--no-pings',
    ],
  });
}

/** Opens a path of the product in a fresh profile: no cookies, no memory of earlier visits. */
export async function visit(
  browser: Browser,
  viewport: ViewportName,
  address: string,
  options: { colorScheme?: 'dark' | 'light' } = {},
): Promise<Visit> {
  const phone = viewport === 'phone';
  const context = await browser.newContext({
    viewport: viewports[viewport],
    hasTouch: phone,
    isMobile: phone,
    colorScheme: options.colorScheme ?? 'dark',
    locale: 'en-GB',
    timezoneId: 'UTC',
    acceptDownloads: true,
  });
  const page = await context.newPage();
  const record = watchPage(page, new URL(address).host);
  await page.goto(address);
  return {
    page,
    record,
    viewport,
    screenshot: async (name) => {
      mkdirSync(screenshotFolder, { recursive: true });
      await page.screenshot({ path: path.join(screenshotFolder, `${name}-${viewport}.png`) });
    },
    close: () => context.close(),
  };
}
