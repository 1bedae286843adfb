import type { Browser } from 'playwright-core';
import type { ViewportName } from './viewports';
import { launchBrowser, productUrls, visit, type Visit } from './visit';

/** Opens a path of the product (or a whole address) in a fresh profile. */
export type Come = (
  viewport: ViewportName,
  path?: string,
  options?: { colorScheme?: 'dark' | 'light' },
) => Promise<Visit>;

/** One browser for the tests of a file; what a test opens is closed after it. */
export function useVisits(): Come {
  let browser: Browser;
  const visits: Visit[] = [];
  beforeAll(async () => {
    browser = await launchBrowser();
  });
  afterEach(async () => {
    for (const open of visits.splice(0)) await open.close();
  });
  afterAll(() => browser.close());
  return async (viewport, path = '/', options = {}) => {
    const open = await visit(browser, viewport, new URL(path, productUrls().url).href, options);
    visits.push(open);
    return open;
  };
}
