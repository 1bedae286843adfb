import type { Page } from 'playwright-core';
import { signIn } from '../support/e2e/signIn';
import { useVisits } from '../support/e2e/useVisits';
import { viewportNames } from '../support/e2e/viewports';
import { productUrls } from '../support/e2e/visit';

const come = useVisits();

let people = 0;
/** A mail address that no other test uses. */
const newEmail = (): string => `person-${Date.now()}-${(people += 1)}@osierbank.example`;

/** Follows the link in the newest mail to a person, as it stands in the inbox of the demo. */
async function followMail(page: Page, email: string, subject: RegExp): Promise<void> {
  await page.goto(`${productUrls().url}/inbox`);
  const mail = page.getByRole('button', { name: new RegExp(`to ${email}`) }).filter({ hasText: subject });
  await mail.first().click();
  await page.getByRole('button', { name: 'Open this link' }).first().click();
}

describe.each(viewportNames)('on a %s', (viewport) => {
  test('a manager invites, the invited person joins by mail, forgets the password and sets a new one', async () => {
    const email = newEmail();
    const manager = await come(viewport, '/people');
    await signIn(manager, 'manager');
    await manager.page.getByLabel('E-mail', { exact: true }).fill('not an address');
    await manager.page.getByRole('button', { name: 'Send the invitation' }).click();
    await manager.page
      .getByText(/mail address/i)
      .first()
      .waitFor();
    await manager.page.getByLabel('E-mail', { exact: true }).fill(email);
    await manager.page.getByLabel('Role').selectOption('reviewer');
    await manager.page.getByRole('button', { name: 'Send the invitation' }).click();
    await manager.page.getByText(email).first().waitFor();
    await manager.screenshot('people-invited');

    const joined = await come(viewport, '/sign-in');
    const { page } = joined;
    await followMail(page, email, /Invitation/);
    await page.getByLabel('Your name').fill('Marla Quill');
    await page.getByLabel('Password', { exact: true }).fill('a first password');
    await joined.screenshot('invitation');
    await page.getByRole('button', { name: 'Take up the invitation' }).click();
    await page.getByRole('heading', { name: 'Today' }).waitFor();
    await page.goto(`${productUrls().url}/account`);
    await page.getByRole('button', { name: 'Sign out' }).first().click();
    await page.getByRole('button', { name: 'Sign in', exact: true }).waitFor();

    await page.goto(`${productUrls().url}/forgot`);
    await page.getByLabel('Work e-mail').fill(email);
    await page.getByRole('button', { name: 'Send the link' }).click();
    await page.getByText(/on its way/i).waitFor();
    await followMail(page, email, /password/i);
    await page.getByRole('textbox', { name: 'New password' }).fill('a second password');
    await page.getByRole('button', { name: 'Set the password' }).click();
    await page.waitForURL('**/sign-in**');
    await page.getByLabel('Work e-mail').fill(email);
    await page.getByLabel('Password', { exact: true }).fill('a first password');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.getByRole('alert').waitFor();
    await page.getByLabel('Password', { exact: true }).fill('a second password');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.getByRole('heading', { name: 'Today' }).waitFor();

    await manager.page.reload();
    await manager.page.getByRole('button', { name: new RegExp(`Marla Quill.*${email}`) }).waitFor();
    expect(joined.record.foreignRequests).toEqual([]);
  });

  test('a client sees the own lots and how far they are, and nothing of the bench', async () => {
    const client = await come(viewport, '/lots');
    await signIn(client, 'client');
    await client.page.getByRole('link', { name: /^L-2607/ }).click();
    await client.page
      .getByText(/^[67] of 8 measured$/)
      .first()
      .waitFor();
    await client.screenshot('lot-client');
    for (const path of ['/capture', '/compare', '/bench']) {
      await client.page.goto(`${productUrls().url}${path}`);
      await client.page.getByText('This page is for the people of the laboratory.', { exact: false }).waitFor();
    }
    await client.screenshot('closed-client');
    await client.page.getByRole('link', { name: 'To the lots' }).click();
    await client.page.waitForURL('**/lots');
  });

  test('a reviewer is told who takes frames', async () => {
    const reviewer = await come(viewport, '/capture');
    await signIn(reviewer, 'reviewer');
    await reviewer.page.getByText('Technicians and managers take frames.', { exact: false }).waitFor();
    expect(await reviewer.page.getByRole('link', { name: 'Capture', exact: true }).count()).toBe(0);
  });

  test('a new laboratory goes from nothing to a bench and a lot, told at each step what is missing', async () => {
    const open = await come(viewport, '/register');
    const { page } = open;
    await page.getByLabel('Name of the laboratory').fill('Alder Weir Optics');
    await page.getByLabel('Your name').fill('Runa Holt');
    await page.getByLabel('Work e-mail').fill(newEmail());
    await page.getByLabel('Password', { exact: true }).fill('short');
    await page.getByRole('button', { name: 'Register' }).click();
    await page
      .getByText(/at least 10 characters/i)
      .first()
      .waitFor();
    await page.getByLabel('Password', { exact: true }).fill('long enough for this');
    await page.getByRole('button', { name: 'Register' }).click();
    await page.getByText('No bench yet.', { exact: false }).first().waitFor();
    await open.screenshot('today-empty');
    for (const [path, words] of [
      ['/lots', 'No lots yet.'],
      ['/capture', 'No pieces yet.'],
      ['/compare', 'Choose three sizes or more.'],
      ['/bench', 'No lasers yet.'],
    ] as const) {
      await page.goto(`${productUrls().url}${path}`);
      await page.getByText(words, { exact: false }).first().waitFor();
    }
    await open.screenshot('bench-empty');

    await page.getByRole('link', { name: 'Add a laser' }).first().click();
    await page.getByLabel('Name', { exact: true }).fill('Red gas laser');
    await page.getByLabel('Wavelength in air, nm').fill('6328');
    await page.getByLabel('Standard uncertainty (k = 1), nm').fill('0.01');
    await page.getByLabel('Class, as printed on its label').selectOption({ label: 'Class 2' });
    await page.getByRole('button', { name: 'Add the laser' }).click();
    await page
      .getByText(/nm/)
      .filter({ hasText: /between|most|least|up to/i })
      .first()
      .waitFor();
    await open.screenshot('laser-wrong');
    await page.getByLabel('Wavelength in air, nm').fill('632.8');
    await page.getByRole('button', { name: 'Add the laser' }).click();
    await page.waitForURL((url) => !url.pathname.endsWith('/new'));

    await page.goto(`${productUrls().url}/bench/cameras/new`);
    await page.getByLabel('Name', { exact: true }).fill('Bare sensor');
    await page.getByLabel('Pixel pitch, µm').fill('5.2');
    await page.getByLabel('Standard uncertainty (k = 1), µm').fill('0.001');
    await page.getByLabel('Width, px').fill('1280');
    await page.getByLabel('Height, px').fill('1024');
    await page.getByRole('button', { name: 'Add the camera' }).click();
    await page.waitForURL((url) => !url.pathname.endsWith('/new'));

    await page.goto(`${productUrls().url}/bench/new`);
    await page.getByLabel('Name', { exact: true }).fill('Bench by the window');
    await page.getByLabel('Laser', { exact: true }).selectOption({ index: 1 });
    await page.getByLabel('Camera', { exact: true }).selectOption({ index: 1 });
    await page.getByLabel('Distance, mm').fill('500');
    await page.getByLabel('Standard uncertainty (k = 1), mm').fill('0.25');
    await page.getByRole('button', { name: 'Add the bench' }).click();
    await page.waitForURL((url) => !url.pathname.endsWith('/new'));
    await page.getByText('Distance, aperture to sensor').filter({ visible: true }).first().waitFor();
    await open.screenshot('bench-first');

    await page.goto(`${productUrls().url}/lots/new`);
    await page.getByLabel('Lot number').fill('L-1');
    await page.getByRole('button', { name: 'Add a client' }).click();
    await page.getByLabel('Name of the client').fill('Lanternhill Instruments');
    await page.getByRole('button', { name: 'Add this client' }).click();
    await page.getByLabel('Name of the client').waitFor({ state: 'detached' });
    await page.getByRole('button', { name: 'Add the lot' }).click();
    await page.waitForURL('**/lots/*/add');
    const addPiece = async () => {
      await page.getByLabel('Serial', { exact: true }).fill('AW-1');
      await page.getByLabel('Nominal size, µm').fill('200');
      await page.getByRole('button', { name: 'Add the piece' }).click();
    };
    await addPiece();
    await page.waitForURL((url) => !url.pathname.endsWith('/add'));
    await page.getByText('AW-1').filter({ visible: true }).first().waitFor();
    expect(open.record.errors).toEqual([]);
    await page.getByRole('link', { name: 'Add pieces' }).first().click();
    await page.waitForURL('**/lots/*/add');
    await addPiece();
    await page.getByText('Nothing was added: one serial number is not new.').waitFor();
    await open.screenshot('piece-twice');
    expect(open.record.foreignRequests).toEqual([]);
  });
});
