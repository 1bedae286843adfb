'use strict';
const { PlainError } = require('./plainError.js');

/** Stops early, in words, on a Node.js that the packages do not support. */
function checkNodeVersion() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const fits = (major === 20 && minor >= 19) || (major === 22 && minor >= 13) || major > 22;
  if (!fits) {
    throw new PlainError(
      `Ringwright needs Node.js 20.19 or newer of version 20, or 22.13 and newer. This is ${process.versions.node}.`,
    );
  }
}

module.exports = { checkNodeVersion };
