import type { ConsoleMessage, Page } from 'playwright-core';
import { accountEndpoints } from '../../../shared/contracts/accounts';

const refreshPath = accountEndpoints.refresh.path;

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
    if (message.type() === 'error' && !saysNobodyIsSignedIn(message)) record.errors.push(message.text());
  });
  page.on('pageerror', (error) => record.errors.push(error.stack ?? error.message));
  return record;
}

/** A page learns from a 401 of the session that nobody is signed in; the browser logs that as an error by itself. */
function saysNobodyIsSignedIn(message: ConsoleMessage): boolean {
  return message.location().url.endsWith(`/api${refreshPath}`) && message.text().includes('401');
}
