'use strict';
const { runChild } = require('./children.js');
const { checkout, typeScript, typeScriptEnvironment } = require('./checkout.js');
const { PlainError } = require('./plainError.js');

/**
 * Brings a database to the newest migration.
 * @param {string} ownerUrl
 * @param {string} appUrl
 */
async function migrate(ownerUrl, appUrl) {
  const ended = await runChild(process.execPath, typeScript('server/scripts/migrate.ts'), {
    cwd: checkout,
    env: { ...process.env, ...typeScriptEnvironment, OWNER_DATABASE_URL: ownerUrl, DATABASE_URL: appUrl },
  });
  if (ended.status !== 0) throw new PlainError(`The database could not be migrated.\n${ended.output.trim()}`);
}

module.exports = { migrate };
