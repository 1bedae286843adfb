'use strict';
const fs = require('node:fs');
const path = require('node:path');

/** The folder that holds package.json, without symbolic links. */
const checkout = fs.realpathSync(path.resolve(__dirname, '../../..'));

/**
 * Arguments of Node.js that run one of our TypeScript files.
 * @param {string} file relative to the checkout
 * @returns {string[]}
 */
function typeScript(file) {
  return ['--import', 'tsx', path.join(checkout, file)];
}

/** What a TypeScript file of the server needs in its environment: decorators follow the server's settings. */
const typeScriptEnvironment = { TSX_TSCONFIG_PATH: path.join(checkout, 'server', 'tsconfig.json') };

module.exports = { checkout, typeScript, typeScriptEnvironment };
