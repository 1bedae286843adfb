'use strict';
const net = require('node:net');

/**
 * Whether nothing listens on a TCP port of the given address.
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>}
 */
function isPortFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/**
 * A TCP port of loopback that is free at this moment, chosen by the system.
 * @returns {Promise<number>}
 */
function freePort() {
  return new Promise((resolve, reject) => {
    const probe = net.createServer();
    probe.once('error', reject);
    probe.listen({ port: 0, host: '127.0.0.1' }, () => {
      const address = probe.address();
      const port = address !== null && typeof address === 'object' ? address.port : 0;
      probe.close(() => resolve(port));
    });
  });
}

module.exports = { isPortFree, freePort };
