'use strict';
const { PlainError } = require('./plainError.js');

/**
 * One line for the person at the terminal.
 * @param {string} text
 */
function say(text) {
  process.stdout.write(`${text}\n`);
}

/**
 * Says why a launcher cannot go on: our own messages as they are, anything else with its stack.
 * @param {unknown} error
 */
function sayProblem(error) {
  const text = error instanceof PlainError ? error.message : error instanceof Error ? error.stack : String(error);
  process.stderr.write(`\n${text}\n`);
}

module.exports = { say, sayProblem };
