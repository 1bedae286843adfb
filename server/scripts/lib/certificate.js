'use strict';
const fs = require('node:fs');
const os = require('node:os');
const path = require('node:path');
const { X509Certificate } = require('node:crypto');
const { stateFolder, writePrivate } = require('./clusterHome.js');
const { networkAddresses } = require('./networkAddresses.js');
const { PlainError } = require('./plainError.js');

const dayMs = 86_400_000;
const lifetimeDays = 397;

/**
 * Certificate and key for the local network: those that TLS_CERT_FILE and TLS_KEY_FILE name, or a self-signed pair that
 * is made here and kept until it runs out or an address of this machine is not in it.
 * @param {string} checkout
 * @returns {Promise<{ certFile: string, keyFile: string, given: boolean }>}
 */
async function ensureCertificate(checkout) {
  const { TLS_CERT_FILE: givenCert, TLS_KEY_FILE: givenKey } = process.env;
  if (givenCert || givenKey) {
    if (!givenCert || !givenKey) throw new PlainError('Give TLS_CERT_FILE and TLS_KEY_FILE together.');
    for (const file of [givenCert, givenKey]) {
      if (!fs.existsSync(file)) throw new PlainError(`${file} does not exist.`);
    }
    return { certFile: path.resolve(givenCert), keyFile: path.resolve(givenKey), given: true };
  }
  const folder = path.join(stateFolder(checkout), 'tls');
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  const certFile = path.join(folder, 'certificate.pem');
  const keyFile = path.join(folder, 'key.pem');
  const addresses = ['127.0.0.1', ...networkAddresses()];
  if (!stillGood(certFile, keyFile, addresses)) {
    const { generate } = require('selfsigned');
    const pair = await generate([{ name: 'commonName', value: os.hostname() }], {
      keySize: 2048,
      algorithm: 'sha256',
      notBeforeDate: new Date(Date.now() - dayMs),
      notAfterDate: new Date(Date.now() + lifetimeDays * dayMs),
      extensions: [
        { name: 'basicConstraints', cA: false, critical: true },
        { name: 'keyUsage', digitalSignature: true, keyEncipherment: true, critical: true },
        { name: 'extKeyUsage', serverAuth: true },
        {
          name: 'subjectAltName',
          altNames: [
            { type: 2, value: 'localhost' },
            { type: 2, value: os.hostname() },
            ...addresses.map((ip) => ({ type: /** @type {const} */ (7), ip })),
          ],
        },
      ],
    });
    writePrivate(keyFile, pair.private);
    writePrivate(certFile, pair.cert);
  }
  return { certFile, keyFile, given: false };
}

/**
 * @param {string} certFile
 * @param {string} keyFile
 * @param {string[]} addresses
 */
function stillGood(certFile, keyFile, addresses) {
  if (!fs.existsSync(certFile) || !fs.existsSync(keyFile)) return false;
  const certificate = new X509Certificate(fs.readFileSync(certFile));
  if (new Date(certificate.validTo).getTime() < Date.now() + 30 * dayMs) return false;
  return addresses.every((address) => certificate.checkIP(address) !== undefined);
}

module.exports = { ensureCertificate };
