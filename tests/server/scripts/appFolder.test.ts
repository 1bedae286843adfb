import { readdirSync } from 'node:fs';
import path from 'node:path';

// Expo Router makes a route of every file in app/: tests, helpers and pictures would become addresses.
test('app/ holds routes and layouts only', () => {
  const app = path.resolve(__dirname, '../../../app');
  const files = readdirSync(app, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(app, path.join(entry.parentPath, entry.name)));
  const route = /^(\([a-z-]+\)\/|[a-z-]+\/|\[[a-zA-Z]+\]\/)*(_layout|index|\+not-found|[a-z-]+|\[[a-zA-Z]+\])\.tsx$/;
  expect(files.length).toBeGreaterThan(0);
  expect(files.filter((file) => !route.test(file))).toEqual([]);
});
