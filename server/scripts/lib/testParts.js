'use strict';
const fs = require('node:fs');
const os = require('node:os');
const path = require('node:path');
const { runChild } = require('./children.js');
const { checkout } = require('./checkout.js');
const { ensureWebBuild } = require('./webBuild.js');

/**
 * @typedef {{ passed: number, failed: number, skipped: number }} Count
 * @typedef {{ name: string, title: string, run: () => Promise<Count> }} Part
 */

const passedOne = { passed: 1, failed: 0, skipped: 0 };
const failedOne = { passed: 0, failed: 1, skipped: 0 };

/** The parts of the tests, in the order in which they run. @type {Part[]} */
const testParts = [
  { name: 'lint', title: 'Lint', run: () => check('eslint', 'bin/eslint.js', ['.', '--max-warnings', '0']) },
  {
    name: 'format',
    title: 'Format',
    run: () => check('prettier', 'bin/prettier.cjs', ['--check', '.', '--log-level', 'warn']),
  },
  { name: 'types', title: 'Types', run: checkTypes },
  { name: 'server', title: 'Server, shared and reference tests', run: () => jest('server', '--maxWorkers=2') },
  { name: 'client', title: 'Component tests', run: () => jest('client', '--maxWorkers=2') },
  { name: 'export', title: 'Web export', run: exportWeb },
  { name: 'e2e', title: 'Browser tests', run: () => jest('e2e', '--runInBand') },
];

/**
 * One tool of node_modules, counted as one test.
 * @param {string} tool
 * @param {string} file
 * @param {string[]} args
 * @returns {Promise<Count>}
 */
async function check(tool, file, args) {
  const program = path.join(checkout, 'node_modules', tool, file);
  const ended = await runChild(process.execPath, [program, ...args], { cwd: checkout, output: 'inherit' });
  return ended.status === 0 ? passedOne : failedOne;
}

/** The client, the server and the browser tests have a project each. */
async function checkTypes() {
  const counts = [];
  for (const project of ['tsconfig.json', 'server/tsconfig.json', 'tests/e2e/tsconfig.json']) {
    counts.push(await check('typescript', 'bin/tsc', ['--noEmit', '-p', project]));
  }
  return sum(counts);
}

/** @returns {Promise<Count>} */
async function exportWeb() {
  try {
    await ensureWebBuild(checkout);
    return passedOne;
  } catch (error) {
    process.stdout.write(`${error instanceof Error ? error.message : error}\n`);
    return failedOne;
  }
}

/**
 * One project of jest. A test file that cannot even be loaded counts as a failed test.
 * @param {string} project
 * @param {string} workers
 * @returns {Promise<Count>}
 */
async function jest(project, workers) {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'ringwright-report-'));
  const report = path.join(folder, 'report.json');
  try {
    await runChild(
      process.execPath,
      [
        path.join(checkout, 'node_modules', 'jest', 'bin', 'jest.js'),
        ...['--selectProjects', project, '--ci', workers, '--json', `--outputFile=${report}`],
      ],
      { cwd: checkout, output: 'inherit', env: { ...process.env, NODE_ENV: 'test' } },
    );
    if (!fs.existsSync(report)) return failedOne;
    const told = JSON.parse(fs.readFileSync(report, 'utf8'));
    const count = {
      passed: told.numPassedTests,
      failed: told.numFailedTests + told.numRuntimeErrorTestSuites,
      skipped: told.numPendingTests + told.numTodoTests,
    };
    // A run that says it failed, or that ran nothing, must not count as clean.
    const unclean = !told.success && count.failed === 0;
    return unclean || told.numTotalTests === 0 ? { ...count, failed: count.failed + 1 } : count;
  } finally {
    fs.rmSync(folder, { recursive: true, force: true });
  }
}

/** @param {Count[]} counts */
function sum(counts) {
  return counts.reduce((a, b) => ({
    passed: a.passed + b.passed,
    failed: a.failed + b.failed,
    skipped: a.skipped + b.skipped,
  }));
}

module.exports = { testParts, sum };
