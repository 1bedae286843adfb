import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { packagesAreCurrent } from '../../../server/scripts/lib/npmPackages.js';

const checkout = mkdtempSync(path.join(tmpdir(), 'ringwright-packages-'));
afterAll(() => rmSync(checkout, { recursive: true, force: true }));

const wanted = {
  '': { name: 'ringwright' },
  'node_modules/a': { version: '1.0.0', integrity: 'sha512-a' },
  'node_modules/only-elsewhere': { version: '1.0.0', integrity: 'sha512-o', optional: true },
};

function installed(packages: object | null): void {
  rmSync(path.join(checkout, 'node_modules'), { recursive: true, force: true });
  writeFileSync(path.join(checkout, 'package-lock.json'), JSON.stringify({ packages: wanted }));
  if (packages === null) return;
  mkdirSync(path.join(checkout, 'node_modules'));
  writeFileSync(path.join(checkout, 'node_modules/.package-lock.json'), JSON.stringify({ packages }));
}

test.each([
  ['nothing installed', null, false],
  ['all that this machine can use', { 'node_modules/a': { version: '1.0.0', integrity: 'sha512-a' } }, true],
  ['another version', { 'node_modules/a': { version: '0.9.0', integrity: 'sha512-b' } }, false],
  ['one package short', {}, false],
])('packages are current: %s', (_, packages, current) => {
  installed(packages);
  expect(packagesAreCurrent(checkout)).toBe(current);
});
