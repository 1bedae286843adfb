'use strict';
const os = require('node:os');

/**
 * The IPv4 addresses under which other devices of the local network reach this machine.
 * @returns {string[]}
 */
function networkAddresses() {
  return Object.values(os.networkInterfaces())
    .flatMap((each) => each ?? [])
    .filter((each) => each.family === 'IPv4' && !each.internal && !each.address.startsWith('169.254.'))
    .map((each) => each.address);
}

module.exports = { networkAddresses };
