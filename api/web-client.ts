import path from 'node:path';
import express from 'express';
import type { Express } from 'express';
import { shadowWorkerPolicy } from './middleware/security-headers.ts';

const yearMs = 31_536_000_000;

/** Folders are no pages; files are small, and a range past their end would be an error to answer. */
const wholeFiles = { redirect: false, acceptRanges: false };

/** Serves the built client: hashed files for ever, the page itself fresh each time. */
export function mountWebClient(app: Express, distFolder: string): void {
  app.use(
    '/assets',
    express.static(path.join(distFolder, 'assets'), {
      immutable: true,
      maxAge: yearMs,
      index: false,
      fallthrough: false,
      ...wholeFiles,
      setHeaders: (response, filePath) => {
        if (/shadow-worker[^/\\]*\.js$/.test(path.basename(filePath))) {
          response.setHeader('Content-Security-Policy', shadowWorkerPolicy);
        }
      },
    }),
  );
  app.use(express.static(distFolder, { index: false, maxAge: 0, ...wholeFiles }));
  // Every other path is a page of the client, which reads it by itself.
  app.get('/{*any}', (_request, response) => {
    response.set('Cache-Control', 'no-cache');
    // With a root of its own, so that a dot folder above the client hides nothing.
    response.sendFile('index.html', { root: distFolder, acceptRanges: false });
  });
}
