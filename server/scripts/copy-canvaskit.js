// Puts Skia's WebAssembly beside the web app: the site serves it itself.
const fs = require('node:fs');
const path = require('node:path');
const from = path.join(path.dirname(require.resolve('canvaskit-wasm/package.json')), 'bin/full/canvaskit.wasm');
const to = path.join(__dirname, '..', '..', 'public', 'canvaskit.wasm');
fs.mkdirSync(path.dirname(to), { recursive: true });
fs.copyFileSync(from, to);
