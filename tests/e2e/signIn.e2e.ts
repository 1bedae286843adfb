import { accessibilityProblems } from '../support/e2e/accessibility';
import { signIn } from '../support/e2e/signIn';
import { useVisits } from '../support/e2e/useVisits';
import { viewportNames } from '../support/e2e/viewports';
import { productUrls } from '../support/e2e/visit';

const come = useVisits();

describe.each(viewportNames)('sign-in on a %s', (viewport) => {
  test('the page loads without the drawing engine, without another host and without an error', async () => {
    const open = await come(viewport);
    await open.page.getByRole('button', { name: 'Sign in', exact: true }).waitFor();
    await open.page.waitForLoadState('load');
    await open.screenshot('sign-in');
    expect(open.record.requests.filter((path) => path.endsWith('.wasm'))).toEqual([]);
    expect(open.record.foreignRequests).toEqual([]);
    expect(open.record.errors).toEqual([]);
  });

  test.each(['dark', 'light'] as const)('axe finds nothing wrong in the %s theme', async (colorScheme) => {
    const open = await come(viewport, '/', { colorScheme });
    await open.page.getByRole('button', { name: 'Sign in', exact: true }).waitFor();
    expect(await accessibilityProblems(open.page)).toEqual([]);
  });

  test('the demo technician signs in, stays signed in over a reload, and sees the lots', async () => {
    const open = await come(viewport);
    await signIn(open, 'technician');
    await open.page.reload();
    await open.page.getByRole('link', { name: 'Lots' }).first().click();
    await open.page.waitForURL('**/lots');
    await open.page.getByRole('heading', { name: 'Lots' }).first().waitFor();
    await open.screenshot('lots');
    expect(open.record.foreignRequests).toEqual([]);
    expect(open.record.errors).toEqual([]);
  });

  test('a wrong password is refused in words, and the page stays', async () => {
    const open = await come(viewport);
    await open.page.getByLabel('Work e-mail').fill('nobody@nowhere.example');
    await open.page.getByLabel('Password', { exact: true }).fill('not the password');
    await open.page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await open.page.getByRole('alert').waitFor();
    expect(new URL(open.page.url()).pathname).toBe('/sign-in');
  });
});

test('over the local network without TLS, where the page is no secure context, a person signs in too', async () => {
  const open = await come('phone', productUrls().networkUrl);
  expect(await open.page.evaluate('window.isSecureContext')).toBe(false);
  await signIn(open, 'technician');
  await open.page.reload();
  await open.page.getByRole('link', { name: 'Lots' }).first().waitFor();
  expect(open.record.foreignRequests).toEqual([]);
});
