'use strict';
const { checkout } = require('./lib/checkout.js');
const { checkNodeVersion } = require('./lib/nodeVersion.js');
const { chromium, ensureDebianPackages, postgres } = require('./lib/debianPackages.js');
const { endAllChildren } = require('./lib/children.js');
const { ensurePackages } = require('./lib/npmPackages.js');
const { PlainError } = require('./lib/plainError.js');
const { say, sayProblem } = require('./lib/say.js');
const { sum, testParts } = require('./lib/testParts.js');

let interrupted = false;

/** The parts that the command line names; none named: all. */
function chosenParts() {
  const words = process.argv.slice(2);
  const unknown = words.filter((word) => !testParts.some((part) => part.name === word));
  if (unknown.length > 0) {
    const names = testParts.map((part) => part.name).join(' ');
    throw new PlainError(
      `Not understood: ${unknown.join(' ')}\nnpm test runs everything; npm test -- PART … runs some of: ${names}`,
    );
  }
  return words.length === 0 ? testParts : testParts.filter((part) => words.includes(part.name));
}

async function main() {
  checkNodeVersion();
  const parts = chosenParts();
  await ensureDebianPackages(parts.some((part) => part.name === 'e2e') ? [postgres, chromium] : [postgres]);
  await ensurePackages(checkout);

  const counts = [];
  const lines = [];
  for (const part of parts) {
    say(`\n── ${part.title} ──`);
    const started = Date.now();
    const count = await part.run();
    const seconds = ((Date.now() - started) / 1000).toFixed(1);
    counts.push(count);
    lines.push(`${count.failed === 0 ? 'passed' : 'FAILED'}  ${part.title}: ${words(count)} (${seconds} s)`);
  }
  const total = sum(counts);
  say(`\n${lines.join('\n')}\n`);
  say(words(total));
  process.exitCode = total.failed === 0 ? 0 : 1;
}

/** @param {import('./lib/testParts.js').Count} count */
function words({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed, ${skipped} skipped`;
}

for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, () => {
    interrupted = true;
    void endAllChildren().finally(() => process.exit(130));
  });
}
main().catch((error) => {
  if (interrupted) return;
  sayProblem(error);
  // What keeps the tests from running at all is a failure like any other.
  say(words({ passed: 0, failed: 1, skipped: 0 }));
  process.exitCode = 1;
});
