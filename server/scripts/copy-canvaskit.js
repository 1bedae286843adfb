'use strict';
const path = require('node:path');
const { copyCanvasKit } = require('./lib/canvasKit.js');

copyCanvasKit(path.resolve(__dirname, '../..'));
