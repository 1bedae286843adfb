'use strict';
const crypto = require('node:crypto');
const fs = require('node:fs');
const path = require('node:path');
const { stateFolder, writePrivate } = require('./clusterHome.js');

/**
 * The secret that signs access tokens, made on the first start and kept. Demo and network have one each.
 * @param {string} checkout
 * @param {'demo' | 'network'} mode
 * @returns {string}
 */
function tokenSecret(checkout, mode) {
  const file = path.join(stateFolder(checkout), `token-secret-${mode}`);
  if (!fs.existsSync(file)) writePrivate(file, crypto.randomBytes(48).toString('base64url'));
  return fs.readFileSync(file, 'utf8');
}

module.exports = { tokenSecret };
