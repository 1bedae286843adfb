'use strict';
const fs = require('node:fs');
const path = require('node:path');
const { endChild, isClosing, startChild } = require('./children.js');
const { checkout, typeScript, typeScriptEnvironment } = require('./checkout.js');
const { PlainError } = require('./plainError.js');
const { say } = require('./say.js');

const patienceMs = 60_000;
const restartsAllowed = 3;

/**
 * The api or a worker, kept alive: one that ends by itself after it has once answered is started again, up to three
 * times within a minute.
 * @typedef {object} Service
 * @property {string} logFile
 * @property {() => void} nowHealthy to be called when it has answered
 * @property {() => Promise<void>} end
 * @property {Promise<never>} givenUp rejects when it never came up, or ended by itself too often
 *
 * @typedef {{ name: string, file: string, env: NodeJS.ProcessEnv, logFolder: string }} ServiceChoice
 */

/**
 * @param {ServiceChoice} choice
 * @returns {Service}
 */
function startService({ name, file, env, logFolder }) {
  fs.mkdirSync(logFolder, { recursive: true, mode: 0o700 });
  const logFile = path.join(logFolder, `${name}.log`);
  if (fs.existsSync(logFile)) fs.renameSync(logFile, `${logFile}.1`);
  const log = fs.openSync(logFile, 'a', 0o600);
  let wanted = true;
  let healthy = false;
  /** @type {number[]} */
  let restarts = [];
  /** @type {import('./children.js').Child} */
  let child;
  /** @type {(error: Error) => void} */
  let giveUp;
  /** @type {Promise<never>} */
  const givenUp = new Promise((_, reject) => (giveUp = reject));
  // Whoever waits for it hears of it; when nobody does, it must not end the launcher by itself.
  givenUp.catch(() => undefined);

  const launch = () => {
    child = startChild(process.execPath, ['--require', path.join(__dirname, 'endWithParent.js'), ...typeScript(file)], {
      cwd: checkout,
      env: { ...env, ...typeScriptEnvironment },
      output: log,
      linked: true,
    });
    void child.ended.then(({ status, signal }) => {
      if (!wanted || isClosing()) return;
      restarts = restarts.filter((at) => at > Date.now() - patienceMs).concat(Date.now());
      const how = signal ?? `code ${status}`;
      if (!healthy || restarts.length > restartsAllowed) {
        const often = healthy ? 'ended by itself again and again' : 'did not come up';
        giveUp(
          new PlainError(`The ${name} ${often} (${how}). The end of its log (${logFile}):\n${lastLines(logFile)}`),
        );
        return;
      }
      say(`The ${name} ended by itself (${how}); starting it again. Its log: ${logFile}`);
      setTimeout(() => wanted && !isClosing() && launch(), 1000);
    });
  };
  launch();
  return {
    logFile,
    givenUp,
    nowHealthy: () => (healthy = true),
    end: async () => {
      wanted = false;
      await endChild(child);
      fs.closeSync(log);
    },
  };
}

/**
 * The end of a log, without the lines of a stack, for the person who has to find out what went wrong.
 * @param {string} file
 */
function lastLines(file) {
  const lines = fs.readFileSync(file, 'utf8').trim().split('\n');
  return lines
    .filter((line) => !/^\s+at /.test(line))
    .slice(-20)
    .join('\n');
}

module.exports = { startService, lastLines };
