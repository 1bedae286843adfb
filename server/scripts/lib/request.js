'use strict';
const http = require('node:http');
const https = require('node:https');

/**
 * GET of one of our own services on this machine. Its certificate may be self-signed.
 * @param {string} url
 * @returns {Promise<{ status: number, text: string }>}
 */
function get(url) {
  return new Promise((resolve, reject) => {
    const client = url.startsWith('https:') ? https : http;
    const request = client.get(url, { rejectUnauthorized: false, timeout: 3000 }, (response) => {
      let text = '';
      response.setEncoding('utf8');
      response.on('data', (data) => (text += data));
      response.on('end', () => resolve({ status: response.statusCode ?? 0, text }));
      response.on('error', reject);
    });
    request.on('timeout', () => request.destroy(new Error('no answer within 3 s')));
    request.on('error', reject);
  });
}

/**
 * Asks until the answer is 200.
 * @param {string} url
 * @param {number} limitMs
 * @returns {Promise<boolean>} false: it was not within the limit
 */
async function answersWithin(url, limitMs) {
  const deadline = Date.now() + limitMs;
  while (Date.now() < deadline) {
    const status = await get(url).then(
      (answer) => answer.status,
      () => 0,
    );
    if (status === 200) return true;
    await new Promise((resolve) => setTimeout(resolve, 150));
  }
  return false;
}

module.exports = { get, answersWithin };
