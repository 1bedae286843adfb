'use strict';
// Builds the web application into dist/web, if its sources have changed.
const { checkout } = require('./lib/checkout.js');
const { ensurePackages } = require('./lib/npmPackages.js');
const { ensureWebBuild } = require('./lib/webBuild.js');
const { say, sayProblem } = require('./lib/say.js');

async function main() {
  await ensurePackages(checkout);
  const made = await ensureWebBuild(checkout);
  say(made ? 'Built dist/web.' : 'dist/web is up to date.');
}

main().catch((error) => {
  sayProblem(error);
  process.exit(1);
});
