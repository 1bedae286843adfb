'use strict';
// The benchmark of the engine.
const { launch } = require('./lib/launch.js');

launch('server/scripts/bench.ts');
