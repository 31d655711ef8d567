import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { type Express } from 'express';

/** Serves the built client: hashed assets for a year, a missing asset is 404, every other path is the page. */
export function serveClient(app: Express, clientDir: string): void {
  const root = path.resolve(clientDir);
  const page = path.join(root, 'index.html');
  if (!existsSync(page)) return;
  app.use('/assets', express.static(path.join(root, 'assets'), { fallthrough: false, immutable: true, maxAge: '1y', index: false }));
  app.use(express.static(root, { index: false, maxAge: '1h' }));
  app.get('/{*path}', (request, response, next) => {
    if (request.path.startsWith('/api')) return next();
    response.set('Cache-Control', 'no-cache').sendFile(page);
  });
}
