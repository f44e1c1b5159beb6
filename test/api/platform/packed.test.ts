import express from 'express';
import request from 'supertest';
import { describe, expect, it } from 'vitest';
import { packed } from '../../../api/middleware/packed.ts';

const long = 'The sun stands in the south at noon. '.repeat(200);

function appThatSends(type: string, body = long) {
  const app = express();
  app.use(packed());
  app.get('/', (_request, response) => {
    response.setHeader('Content-Type', type);
    response.end(body);
  });
  return app;
}

const ask = (type: string, encodings: string, body?: string) =>
  request(appThatSends(type, body)).get('/').set('Accept-Encoding', encodings);

describe('an answer', () => {
  it.each(['text/html', 'text/javascript', 'application/json', 'application/problem+json'])(
    'of %s goes out packed, and says that it hangs on what is accepted',
    async (type) => {
      const sent = JSON.stringify({ long });
      const { headers, text } = await ask(type, 'gzip', sent);
      expect(headers['content-encoding']).toBe('gzip');
      expect(headers['vary']).toContain('Accept-Encoding');
      expect(text).toBe(sent);
    },
  );

  it('goes out as it is to whoever takes no packing, and where it is short', async () => {
    expect((await ask('text/html', 'identity')).headers['content-encoding']).toBeUndefined();
    expect((await ask('text/html', 'gzip', 'short')).headers['content-encoding']).toBeUndefined();
  });

  it.each(['text/event-stream', 'application/x-ndjson; charset=utf-8', 'application/pdf'])(
    'of %s is not held back to be packed',
    async (type) => {
      expect((await ask(type, 'gzip')).headers['content-encoding']).toBeUndefined();
    },
  );
});
