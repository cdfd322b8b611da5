import { existsSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import type { NestExpressApplication } from '@nestjs/platform-express';
import express, { type NextFunction, type Request, type Response } from 'express';

const YEAR_SECONDS = 31_536_000;

/**
 * Serves the built store. Hashed assets are kept for a year; every page address answers with the one
 * HTML file, but nothing under `/api` or `/assets` ever does.
 */
export const serveWeb = (
  app: NestExpressApplication,
  folder: string | undefined,
  headFor: (path: string) => Promise<string>,
): void => {
  if (!folder || !existsSync(join(folder, 'index.html'))) return;
  const root = resolve(folder);
  const page = readFileSync(join(root, 'index.html'), 'utf8');
  app.use(
    '/assets',
    express.static(join(root, 'assets'), {
      immutable: true,
      maxAge: YEAR_SECONDS * 1000,
      fallthrough: false,
      index: false,
    }),
  );
  app.use(express.static(root, { index: false, maxAge: 3600_000 }));
  app.use((request: Request, response: Response, next: NextFunction) => {
    if (request.method !== 'GET' && request.method !== 'HEAD') return next();
    if (/^\/(api|assets)(\/|$)/.test(request.path) || /\.[a-z0-9]{2,5}$/i.test(request.path)) return next();
    headFor(request.path)
      .then((head) =>
        response
          .setHeader('Cache-Control', 'no-cache')
          .type('html')
          .send(page.replace('<!--head-->', () => head)),
      )
      .catch(next);
  });
};
