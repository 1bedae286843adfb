'use strict';

/** An error whose message is written for the person at the terminal; the launchers print it without a stack. */
class PlainError extends Error {
  /** @param {string} message */
  constructor(message) {
    super(message);
    this.name = 'PlainError';
  }
}

module.exports = { PlainError };
