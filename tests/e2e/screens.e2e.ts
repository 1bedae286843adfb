import type { Page } from 'playwright-core';
import { accessibilityProblems } from '../support/e2e/accessibility';
import { demoPerson, signIn } from '../support/e2e/signIn';
import { useVisits } from '../support/e2e/useVisits';
import { viewportNames } from '../support/e2e/viewports';
import { productUrls } from '../support/e2e/visit';

const come = useVisits();

/** Main screens of a manager, each with words that stand there when its data have come. */
const screens: [path: string, words: RegExp][] = [
  ['/', /Newest sizes/],
  ['/lots', /^L-2607/],
  ['/capture', /^OB-200-01/],
  ['/compare', /^Choose three sizes/],
  ['/bench', /^Sensor K-12/],
  ['/people', /^Ina Felsberg/],
  ['/account', /^Every session on other devices/],
  ['/bench/lasers/new', /^Wavelength in air/],
  ['/bench/cameras/new', /^Pixel pitch/],
  ['/bench/new', /^From the aperture to the sensitive plane/],
  ['/lots/new', /^Their order reference/],
];

const shown = (page: Page, words: RegExp) => page.getByText(words).filter({ visible: true }).first();

describe.each(viewportNames)('on a %s', (viewport) => {
  test.each(['dark', 'light'] as const)('axe finds nothing wrong on the main screens, %s', async (theme) => {
    const open = await come(viewport, '/', { colorScheme: theme });
    const { page } = open;
    await signIn(open, 'manager');
    await page.goto(`${productUrls().url}/account`);
    await page.getByRole('tab', { name: theme === 'dark' ? 'Dark bench' : 'Light desk' }).click();
    const problems: Record<string, unknown> = {};
    for (const [path, words] of screens) {
      await page.goto(`${productUrls().url}${path}`);
      await shown(page, words).waitFor();
      const found = await accessibilityProblems(page);
      if (found.length > 0) problems[path] = found;
      await open.screenshot(`screen-${theme}${path.replaceAll('/', '-')}`);
    }
    expect(problems).toEqual({});
    expect(open.record.foreignRequests).toEqual([]);
    expect(open.record.errors).toEqual([]);
  });

  test('a reload keeps the place, back returns, and an address that is none says so', async () => {
    const open = await come(viewport, '/lots');
    const { page } = open;
    await signIn(open, 'technician');
    await page.waitForURL('**/lots');
    await page.getByRole('link', { name: /^L-2607/ }).click();
    await page.waitForURL('**/lots/*');
    await shown(page, /^OB-250-01/).waitFor();
    const lot = page.url();
    await page.reload();
    await shown(page, /^OB-250-01/).waitFor();
    expect(page.url()).toBe(lot);
    await page.goBack();
    await page.waitForURL('**/lots');
    await page.goForward();
    await page.waitForURL(lot);
    await page.goto(`${productUrls().url}/lots/00000000-0000-4000-8000-000000000000`);
    await page.getByText('There is no such lot', { exact: false }).first().waitFor();
    await page.goto(`${productUrls().url}/no/such/place`);
    await page.getByText('There is nothing at this address.', { exact: false }).first().waitFor();
    await open.screenshot('no-such-place');
  });
});

test('with the keyboard alone one signs in, goes to a size, to its rings, and saves the ring table', async () => {
  const open = await come('desk');
  const { page } = open;
  const person = await demoPerson('reviewer');
  await page.getByRole('button', { name: 'Sign in', exact: true }).waitFor();
  const focused = () =>
    page.evaluate(
      () => document.activeElement?.getAttribute('aria-label') ?? document.activeElement?.textContent ?? '',
    );
  /** Goes on with Tab until what has the focus is called so. */
  async function tabTo(name: RegExp): Promise<void> {
    for (let steps = 0; steps < 80; steps += 1) {
      await page.keyboard.press('Tab');
      if (name.test(await focused())) return;
    }
    throw new Error(`Tab does not lead to ${String(name)}.`);
  }
  await tabTo(/^Work e-mail/);
  await page.keyboard.type(person.email);
  await tabTo(/^Password/);
  await page.keyboard.type(person.password);
  await page.keyboard.press('Enter');
  await page.getByRole('heading', { name: 'Today' }).waitFor();
  await shown(page, /Newest sizes/).waitFor();
  await tabTo(/^OB-200-01.*Bench/);
  await page.keyboard.press('Enter');
  await page.waitForURL('**/measurements/*');
  await page.getByRole('button', { name: /^Ring table, CSV/ }).waitFor();
  const download = page.waitForEvent('download');
  await tabTo(/^Ring table, CSV/);
  await page.keyboard.press('Enter');
  expect((await download).suggestedFilename()).toMatch(/-rings-[0-9a-f]{8}\.csv$/);
  await page.reload();
  await page.getByRole('link', { name: 'Look at the frame' }).first().waitFor();
  await tabTo(/^Look at the frame/);
  await page.keyboard.press('Enter');
  await page.waitForURL('**/frames/**');
  await page.getByText('Dark ring 1, radius').waitFor();
  await tabTo(/^Dark ring chosen on the profile/);
  await page.keyboard.press('ArrowRight');
  await page.getByText('Dark ring 2, radius').waitFor();
  expect(open.record.errors).toEqual([]);
});
