import { readFileSync } from 'node:fs';
import type { Page } from 'playwright-core';
import sharp from 'sharp';
import { accountEndpoints } from '../../shared/contracts/accounts';
import { measurementEndpoints } from '../../shared/contracts/measurements';
import { accessibilityProblems } from '../support/e2e/accessibility';
import { demoPerson, signIn } from '../support/e2e/signIn';
import { useVisits } from '../support/e2e/useVisits';
import { viewportNames, type ViewportName } from '../support/e2e/viewports';
import { productUrls, type Visit } from '../support/e2e/visit';

const come = useVisits();
let framePath = '';

/** Path of the viewer on a measured frame of the demo. */
async function measuredFramePath(): Promise<string> {
  const { url } = productUrls();
  const { email, password } = await demoPerson('technician');
  const headers = { 'Content-Type': 'application/json', 'X-Requested-With': 'ringwright' };
  const answer = await fetch(`${url}/api${accountEndpoints.signIn.path}`, {
    method: 'POST',
    headers,
    body: JSON.stringify({ email, password }),
  });
  const { accessToken } = accountEndpoints.signIn.answer.parse(await answer.json());
  const list = await fetch(`${url}/api${measurementEndpoints.measurements.path}?state=measured`, {
    headers: { Authorization: `Bearer ${accessToken}` },
  });
  const [first] = measurementEndpoints.measurements.answer.parse(await list.json());
  if (first === undefined) throw new Error('The demo holds no measured frame.');
  return `/captures/${first.captureId}/frames/${first.captureFrameId}`;
}

async function openViewer(viewport: ViewportName, colorScheme: 'dark' | 'light' = 'dark'): Promise<Visit> {
  const opened = await come(viewport, '/', { colorScheme });
  await signIn(opened, 'technician');
  if (colorScheme === 'light') await opened.page.evaluate("localStorage.setItem('ringwright.theme', 'light')");
  await opened.page.goto(`${productUrls().url}${framePath}`);
  await sheetIsDrawn(opened.page);
  return opened;
}

const profile = (page: Page) => page.getByRole('slider', { name: 'Dark ring chosen on the profile' });

/** Waits until the sheet shows a measured frame; the drawing follows its data by a moment. */
async function sheetIsDrawn(page: Page): Promise<void> {
  await page.locator('canvas').first().waitFor();
  await profile(page).waitFor();
  await page.waitForTimeout(800);
}

async function coloursOf(page: Page): Promise<number> {
  const box = await page.locator('canvas').first().boundingBox();
  if (box === null) throw new Error('The sheet has no place on the page.');
  const clip = { x: box.x, y: box.y, width: Math.min(300, box.width), height: Math.min(200, box.height) };
  const { data } = await sharp(await page.screenshot({ clip }))
    .removeAlpha()
    .raw()
    .toBuffer({ resolveWithObject: true });
  const seen = new Set<number>();
  for (let i = 0; i < data.length; i += 3) seen.add((data[i]! << 16) | (data[i + 1]! << 8) | data[i + 2]!);
  return seen.size;
}

beforeAll(async () => {
  framePath = await measuredFramePath();
});

describe.each(viewportNames)('the frame viewer on a %s', (viewport) => {
  test('draws the frame with the engine that this application itself sends', async () => {
    const open = await openViewer(viewport);
    expect(open.record.requests.some((path) => path.endsWith('/canvaskit.wasm'))).toBe(true);
    expect(open.record.foreignRequests).toEqual([]);
    expect(open.record.errors).toEqual([]);
    expect(await coloursOf(open.page)).toBeGreaterThan(40);
    await open.screenshot('viewer');
  });

  test('chooses the next ring by key, on the profile and in its numbers', async () => {
    const open = await openViewer(viewport);
    const { page } = open;
    await page.getByText('Dark ring 1, radius').waitFor();
    const rings = Number(await profile(page).getAttribute('aria-valuemax'));
    const next = Math.min(2, rings);
    await profile(page).press('ArrowRight');
    await page.getByText(`Dark ring ${next}, radius`).waitFor();
    expect(await profile(page).getAttribute('aria-valuenow')).toBe(String(next));
  });

  test('saves the profile along the line as CSV', async () => {
    const open = await openViewer(viewport);
    const { page } = open;
    if (viewport === 'phone') await page.getByRole('tab', { name: 'Line' }).click();
    else await page.getByRole('checkbox', { name: 'Line' }).click();
    const arrival = page.waitForEvent('download');
    await page.getByRole('button', { name: /CSV/ }).click();
    const lines = readFileSync(await (await arrival).path(), 'utf8')
      .trim()
      .split(/\r?\n/);
    expect(lines.length).toBeGreaterThan(10);
    await open.screenshot('viewer-line');
  });

  test.each(['dark', 'light'] as const)('axe finds nothing wrong in the %s theme', async (colorScheme) => {
    const open = await openViewer(viewport, colorScheme);
    await open.screenshot(`viewer-${colorScheme}`);
    expect(await accessibilityProblems(open.page)).toEqual([]);
  });
});

test('a ring touched in the frame is chosen in the table and on the profile', async () => {
  const open = await openViewer('desk');
  const { page } = open;
  await profile(page).press('ArrowRight');
  const frame = await page.getByRole('group', { name: /^Frame/ }).boundingBox();
  const row = page.getByRole('row', { name: /^1 / });
  const rowBox = await row.boundingBox();
  if (frame === null || rowBox === null) throw new Error('Frame or row is not on the page.');
  // The centre stands a fifth of the pane from its left, at most 112 px; each row at the height of its ring above it.
  const centreX = frame.x + Math.round(Math.min(112, Math.max(84, frame.width * 0.2)));
  await page.mouse.click(centreX, rowBox.y + rowBox.height / 2);
  await page.getByText('Dark ring 1, radius').waitFor();
  expect(await row.getAttribute('aria-selected')).toBe('true');
  expect(await profile(page).getAttribute('aria-valuenow')).toBe('1');
});

test('the wheel magnifies about the pointer, 0 fits again', async () => {
  const open = await openViewer('desk');
  const { page } = open;
  const frame = page.getByRole('group', { name: /^Frame/ });
  const box = await frame.boundingBox();
  if (box === null) throw new Error('The frame is not on the page.');
  const at = { x: Math.round(box.x + box.width * 0.6), y: Math.round(box.y + box.height * 0.4) };
  const position = () => page.getByText(/^-?[\d.]+, [\d.]+.px$/).innerText();
  await page.mouse.move(at.x, at.y);
  const before = await position();
  await page.mouse.wheel(0, -600);
  await page.waitForTimeout(300);
  await page.mouse.move(at.x + 1, at.y);
  await page.mouse.move(at.x, at.y);
  expect(await position()).toBe(before);
  await page.mouse.move(at.x + 50, at.y);
  const magnified = await position();
  await frame.press('0');
  await page.mouse.move(at.x + 49, at.y);
  await page.mouse.move(at.x + 50, at.y);
  expect(await position()).not.toBe(magnified);
});

test('opened and left twenty times, the viewer leaves no canvas, no error and no memory behind', async () => {
  const open = await openViewer('desk');
  const { page, record } = open;
  const heapBytes = () => page.evaluate<number>('CanvasKit.HEAPU8.length');
  const before = await heapBytes();
  for (let i = 0; i < 20; i += 1) {
    await page.getByRole('link', { name: 'Lots' }).first().click();
    await page.waitForURL('**/lots');
    await page.locator('canvas').first().waitFor({ state: 'detached' });
    await page.goBack();
    await page.locator('canvas').first().waitFor();
    await profile(page).waitFor();
  }
  expect(await page.locator('canvas').count()).toBe(1);
  expect(await heapBytes()).toBeLessThan(before * 1.5);
  expect(record.errors).toEqual([]);
});
