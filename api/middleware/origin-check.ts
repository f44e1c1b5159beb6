import type { RequestHandler } from 'express';
import { AppError } from '../errors.ts';

const readingMethods = new Set(['GET', 'HEAD', 'OPTIONS']);
const loopbackNames = ['localhost', '127.0.0.1', '[::1]'];

/** Refuses a write that a page of another site sends with the person's cookie. */
export function originCheck(publicUrl: string): RequestHandler {
  const origins = new Set(ownOrigins(publicUrl));
  return (request, _response, next) => {
    if (readingMethods.has(request.method)) {
      next();
      return;
    }
    const origin = request.get('origin');
    const isForeign =
      origin === undefined
        ? request.get('sec-fetch-site') === 'cross-site'
        : !origins.has(origin.toLowerCase());
    next(isForeign ? new AppError('ORIGIN_FOREIGN') : undefined);
  };
}

/** A server on this machine is the same under each of its loopback names. */
function ownOrigins(publicUrl: string): string[] {
  const url = new URL(publicUrl);
  if (!loopbackNames.includes(url.hostname)) return [url.origin];
  return loopbackNames.map((name) => `${url.protocol}//${name}${url.port ? `:${url.port}` : ''}`);
}
