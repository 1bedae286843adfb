'use strict';
// The benchmark of the engine; with `study` its errors against the statistical limit, on simulated frames.
const { launch } = require('./lib/launch.js');

launch(process.argv[2] === 'study' ? 'tests/study/runStudy.ts' : 'server/scripts/bench.ts');
