'use strict';
// One more worker process. It reads DATABASE_URL and the rest of its environment (see README.md).
const { launch } = require('./lib/launch.js');

launch('server/worker/workerMain.ts');
