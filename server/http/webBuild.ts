import { existsSync, statSync } from 'node:fs';
import path from 'node:path';
import express, { Router, type Request, type Response } from 'express';

/** File names that carry a hash of their content: a browser may keep them for good. */
const hashed = /(^|[.-])[0-9a-f]{16,}(\.|$)/;

/**
 * Serves the exported web application: files as they are, in their packed form where `name.gz` lies beside `name` and
 * the browser takes it; the start page for every other address that a browser asks a page of.
 */
export function webBuild(webDir: string): Router {
  const root = path.resolve(webDir);
  const router = Router();
  router.get('/{*path}', (request, response, next) => {
    const file = packedFile(root, request);
    if (file === null) {
      next();
      return;
    }
    setCaching(response, file);
    response.type(path.extname(file)).set({ 'Content-Encoding': 'gzip', Vary: 'Accept-Encoding' });
    response.sendFile(`${file}.gz`, { root, cacheControl: false }, (error) => error && next(error));
  });
  router.use(express.static(root, { index: false, cacheControl: false, setHeaders: setCaching }));
  router.get('/{*path}', (request, response, next) => {
    if (path.extname(request.path) !== '' || request.accepts('html') !== 'html') {
      next();
      return;
    }
    setCaching(response, 'index.html');
    response.sendFile('index.html', { root, cacheControl: false }, (error) => error && next(error));
  });
  return router;
}

function setCaching(response: Response, file: string): void {
  const keep = hashed.test(path.basename(file));
  response.set('Cache-Control', keep ? 'public, max-age=31536000, immutable' : 'no-cache');
}

/** Path below `root` of a file that also exists packed, or null. */
function packedFile(root: string, request: Request): string | null {
  if (!request.acceptsEncodings('gzip')) return null;
  const file = path.normalize(decodeURIComponent(request.path)).replace(/^\/+/, '');
  const whole = path.join(root, `${file}.gz`);
  const inside = whole.startsWith(root + path.sep);
  return file !== '' && inside && existsSync(whole) && statSync(whole).isFile() ? file : null;
}
