import type { Page } from 'playwright-core';

/** What a page asked for and complained about, in order. */
export interface PageRecord {
  /** Paths of every request to the product. */
  requests: string[];
  /** Requests to any other host; there must be none, ever. */
  foreignRequests: string[];
  /** Errors of the console and uncaught exceptions. */
  errors: string[];
}

/** Records a page from now on. */
export function watchPage(page: Page, ownHost: string): PageRecord {
  const record: PageRecord = { requests: [], foreignRequests: [], errors: [] };
  page.context().on('request', (request) => {
    const url = new URL(request.url());
    if (url.protocol === 'data:' || url.protocol === 'blob:') return;
    if (url.host === ownHost) record.requests.push(url.pathname);
    else record.foreignRequests.push(request.url());
  });
  page.on('console', (message) => {
    if (message.type() === 'error') record.errors.push(message.text());
  });
  page.on('pageerror', (error) => record.errors.push(error.stack ?? error.message));
  return record;
}
