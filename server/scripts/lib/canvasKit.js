'use strict';
const fs = require('node:fs');
const path = require('node:path');

/**
 * Puts Skia's WebAssembly, which comes with a package, into public/: the site serves it itself.
 * @param {string} checkout
 */
function copyCanvasKit(checkout) {
  const source = path.join(checkout, 'node_modules', 'canvaskit-wasm', 'bin', 'full', 'canvaskit.wasm');
  const target = path.join(checkout, 'public', 'canvaskit.wasm');
  if (fs.existsSync(target) && fs.statSync(target).size === fs.statSync(source).size) return;
  fs.mkdirSync(path.dirname(target), { recursive: true });
  fs.copyFileSync(source, target);
}

module.exports = { copyCanvasKit };
