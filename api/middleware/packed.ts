import compression from 'compression';
import type { RequestHandler } from 'express';

/** What is told piece by piece as it happens: packing would hold it back. */
const streamed = /^(text\/event-stream|application\/x-ndjson)\b/;

/** Answers that are text go out packed to whoever takes them so: scripts, pages, JSON. */
export function packed(): RequestHandler {
  return compression({
    filter: (request, response) => {
      const type = response.getHeader('Content-Type');
      if (typeof type === 'string' && streamed.test(type)) return false;
      return compression.filter(request, response);
    },
  });
}
