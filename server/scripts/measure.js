'use strict';
// The engine without the web. Standard output carries results and nothing else, so problems go to standard error.
const path = require('node:path');
const { checkout, typeScriptEnvironment } = require('./lib/checkout.js');
const { checkNodeVersion } = require('./lib/nodeVersion.js');
const { requirePackages } = require('./lib/launch.js');
const { sayProblem } = require('./lib/say.js');

try {
  checkNodeVersion();
  requirePackages();
  // npm changes into the folder of the package; paths on the command line are meant from where the person stands.
  if (process.env.npm_lifecycle_event === 'measure' && process.env.INIT_CWD) process.chdir(process.env.INIT_CWD);
} catch (error) {
  sayProblem(error);
  process.exit(2);
}
Object.assign(process.env, typeScriptEnvironment);
require('tsx/cjs/api').register();
require(path.join(checkout, 'server', 'scripts', 'measure.ts'));
