import { accessibilityProblems } from '../support/e2e/accessibility';
import { signIn } from '../support/e2e/signIn';
import { useVisits } from '../support/e2e/useVisits';
import { viewportNames } from '../support/e2e/viewports';

const come = useVisits();

/** Frames of the demo's lot on the first bench, of four sizes; of OB-300-01 the size differs from its nominal one. */
const frames = ['OB-200-01-3', 'OB-250-01-1', 'OB-300-01-1', 'OB-400-01-1'];

test.each(viewportNames)('on a %s a reviewer compares sizes and reads what they say of the bench', async (viewport) => {
  const open = await come(viewport, '/compare');
  const { page, record } = open;
  await signIn(open, 'reviewer');
  await page.waitForURL('**/compare');
  await page.getByText(/^Choose three sizes or more/).waitFor();
  await open.screenshot('compare-empty');
  const phone = viewport === 'phone';
  if (phone) await page.getByRole('button', { name: 'Choose sizes' }).click();
  const box = (frame: string) => page.getByRole('checkbox', { name: new RegExp(`, ${frame}\\.tif$`) });

  await box(frames[0] as string).focus();
  await page.keyboard.press('Space');
  if (phone) await page.getByRole('button', { name: 'Show the comparison' }).click();
  await page.getByText('No line yet').waitFor();
  await page.getByText(/^One size is too few/).waitFor();
  if (phone) await page.getByRole('button', { name: 'Choose sizes' }).click();
  for (const frame of frames.slice(1)) await box(frame).click();
  if (phone) await page.getByRole('button', { name: 'Show the comparison' }).click();

  // The line is drawn from the third size on; what it says is read once the fourth is part of it.
  const rows = page.getByRole('table').getByRole('row');
  await rows
    .filter({ hasText: frames[3]?.replace(/-\d$/, '') })
    .nth(2)
    .waitFor();
  await page.getByText('Distance, from the slope').first().waitFor();
  const distance = page.getByRole('img', { name: /^Distance from the slope/ });
  const words = (await distance.first().getAttribute('aria-label')) ?? '';
  const [, slopeMm, benchMm] = /slope\s([\d.]+)\s±\s[\d.]+\smm, the bench says\s([\d.]+)/.exec(words) ?? [];
  expect(Number(benchMm)).toBe(500);
  expect(Math.abs(Number(slopeMm) - 500)).toBeLessThan(5);
  await page.getByText('OB-300-01 is off the line').waitFor();
  expect(await rows.filter({ hasText: 'OB-400-01' }).count()).toBeGreaterThanOrEqual(3);
  expect(await rows.filter({ hasText: /OB-300-01.*, out/ }).count()).toBe(3);
  await page.locator('canvas').first().waitFor();
  await open.screenshot('compare');
  expect(await accessibilityProblems(page)).toEqual([]);

  // The choice is part of the address: another person, or a reload, sees the same.
  await page.reload();
  await page.getByText('OB-300-01 is off the line').waitFor();
  await page.getByRole('link', { name: 'Look at OB-300-01' }).click();
  await page.waitForURL('**/measurements/*');
  await page.goBack();
  await page.getByText('OB-300-01 is off the line').waitFor();
  expect(record.foreignRequests).toEqual([]);
  expect(record.errors).toEqual([]);
});
