import { gzipSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import type { ErrorCode } from '../../../shared/contracts/problem.ts';
import { listen, type ListeningServer } from '../../support/listening-server.ts';
import { buildSmallCity, tower } from '../../support/small-city.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let reader: Agent;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  reader = await api.signIn('public');
});
afterAll(() => api.close());

type Request = ReturnType<Agent['get']>;

/** The problem of an answer, after what every problem has in common. */
async function problemOf(request: Request, status: number, code: ErrorCode) {
  const response = await request.expect(status);
  const { headers } = response;
  expect(headers['content-type']).toBe('application/problem+json; charset=utf-8');
  // Nobody else may be given it from a cache.
  expect(headers['cache-control']).toBe('no-store');
  const problem = problemSchema.strict().parse(response.body);
  expect(problem).toMatchObject({ type: 'about:blank', status, code });
  expect(problem.requestId).toBe(headers['x-request-id']);
  return problem;
}

async function pathsRefused(request: Request): Promise<string[]> {
  const { errors = [] } = await problemOf(request, 422, 'INPUT_INVALID');
  return errors.map(({ path }) => path);
}

describe('an address that is not there', () => {
  it.each([
    '/api',
    '/api/',
    '/api/unknown',
    '/api/cases/2026-0001/unknown',
    '/api/parcels/N-1',
    '/api/index.html',
    '/API/unknown',
    '/api/%E0%A4%A',
    '/api/cases/%E0%A4%A',
    '/api/cases/..%2F..%2Fpackage.json',
  ])('is a problem, not a page: %s', async (path) => {
    await problemOf(reader.get(path), 404, 'NOT_FOUND');
  });

  it.each(['post', 'put', 'patch', 'delete'] as const)(
    'is a problem for %s as well, inside the API and outside',
    async (method) => {
      await problemOf(reader[method]('/api/unknown'), 404, 'NOT_FOUND');
      await problemOf(reader[method]('/cases/2026-0001'), 404, 'NOT_FOUND');
    },
  );

  it('is where an address has no such method', async () => {
    await problemOf(reader.put('/api/parcels'), 404, 'NOT_FOUND');
    await problemOf(reader.delete('/api/rules'), 404, 'NOT_FOUND');
    await problemOf(reader.post('/api/openapi.json').send({}), 404, 'NOT_FOUND');
  });

  it('has a sentence that a person can act on', async () => {
    const { title } = await problemOf(reader.get('/api/unknown'), 404, 'NOT_FOUND');
    expect(title).toBe('There is nothing here. Check the address.');
  });
});

describe('the headers of an address', () => {
  it('are read alone with HEAD', async () => {
    const whole = await reader.get('/api/parcels').set('Accept-Encoding', 'identity').expect(200);
    const head = await reader.head('/api/parcels').expect(200);
    expect(head.body).toEqual({});
    for (const name of ['content-type', 'content-length', 'etag', 'cache-control']) {
      expect(head.headers[name]).toBe(whole.headers[name]);
    }
  });

  it('let no other site read the answer', async () => {
    const { headers } = await reader.get('/api/parcels').set('Origin', 'https://other.example');
    expect(headers['access-control-allow-origin']).toBeUndefined();
    expect(headers['cross-origin-resource-policy']).toBe('same-origin');
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
  });
});

describe('a body of JSON', () => {
  const send = (body: string, type = 'application/json') =>
    reader.post('/api/session').set('Content-Type', type).send(body);

  it.each([
    ['that breaks off', '{"email":"secret@testham.example"'],
    ['that is no JSON', 'email=secret@testham.example'],
    ['that is a text alone', '"secret"'],
    ['that is a number alone', '12'],
    ['that is null', 'null'],
  ])('is refused when it is one %s, and not repeated', async (_name, body) => {
    const problem = await problemOf(send(body), 422, 'INPUT_INVALID');
    expect(problem.errors).toEqual([{ path: '', message: 'The body is not readable JSON.' }]);
    expect(JSON.stringify(problem)).not.toContain('secret');
  });

  it('is refused in letters that are not read here', async () => {
    expect(await pathsRefused(send('{}', 'application/json; charset=iso-8859-15'))).toEqual(['']);
  });

  it('is refused as a list', async () => {
    expect(await pathsRefused(send('[]'))).toEqual(['']);
  });

  it.each(['', '{}'])('is refused by the fields that it lacks: “%s”', async (body) => {
    expect(await pathsRefused(send(body))).toEqual(['email', 'password']);
  });

  it.each(['application/x-www-form-urlencoded', 'text/plain', 'application/xml'])(
    'is not read from %s',
    async (type) => {
      expect(await pathsRefused(send('email=a&password=b', type))).toEqual(['email', 'password']);
    },
  );

  it('is refused above one megabyte, with a sentence that does not speak of a file', async () => {
    const tooLarge = JSON.stringify({ email: 'x'.repeat(2 ** 20) });
    const { title } = await problemOf(send(tooLarge), 413, 'UPLOAD_TOO_LARGE');
    expect(title).toBe('What was sent is too large.');
  });
});

describe('a packed body', () => {
  let server: ListeningServer;

  beforeAll(async () => {
    server = await listen(api.app);
  });
  afterAll(() => server.close());

  async function codeOf(encoding: string, bytes: Buffer): Promise<ErrorCode> {
    const response = await fetch(`http://127.0.0.1:${server.port}/api/session`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', 'Content-Encoding': encoding },
      body: new Uint8Array(bytes),
    });
    return problemSchema.parse(await response.json()).code;
  }

  it.each([
    ['gzip', 'not packed at all'],
    ['br', 'not packed at all'],
    ['an unknown way', '{}'],
  ])('is refused where %s cannot unpack it', async (encoding, text) => {
    expect(await codeOf(encoding, Buffer.from(text))).toBe('INPUT_INVALID');
  });

  it('is measured as it is when unpacked', async () => {
    const packed = gzipSync(JSON.stringify({ email: 'x'.repeat(5 * 2 ** 20) }));
    expect(packed.byteLength).toBeLessThan(2 ** 20);
    expect(await codeOf('gzip', packed)).toBe('UPLOAD_TOO_LARGE');
  });
});

describe('an upload', () => {
  let owner: Agent;
  let path: string;

  beforeAll(async () => {
    owner = await api.signIn('owner');
    path = `/api/cases/${(await api.createCase('draft')).reference}/massings`;
  });
  afterAll(async () => {
    expect(await bodyOf(owner.get(path).expect(200))).toEqual({ rows: [] });
  });

  const form = (body: string, type = 'multipart/form-data; boundary=limit') =>
    owner.post(path).set('Content-Type', type).send(body);
  const part = (disposition: string, body: string) =>
    `--limit\r\nContent-Disposition: form-data; ${disposition}\r\n\r\n${body}\r\n`;
  const whole = part('name="file"; filename="tower.geojson"', tower.toString());

  it.each([
    ['has no boundary', () => form(`${whole}--limit--\r\n`, 'multipart/form-data')],
    ['is no form', () => form('tower')],
    ['breaks off', () => form(whole.slice(0, -20))],
    ['lacks its end', () => form(whole)],
    ['has a header without a colon', () => form('--limit\r\nheader\r\n\r\nx\r\n--limit--\r\n')],
    ['is JSON', () => owner.post(path).send({ file: 'tower' })],
    ['is empty', () => owner.post(path)],
    ['has a text for a file', () => form(`${part('name="file"', tower.toString())}--limit--\r\n`)],
    [
      'has a name that cannot be kept',
      () => form(`${part('name="file"; filename="a\0b"', tower.toString())}--limit--\r\n`),
    ],
    ['comes twice', () => form(`${whole}${whole}--limit--\r\n`)],
  ])('is refused by its field where it %s, and nothing is stored', async (_name, request) => {
    expect(await pathsRefused(request())).toEqual(['file']);
  });

  it('is refused by the name of a field that nobody asked for', async () => {
    const other = part('name="other"; filename="tower.geojson"', tower.toString());
    expect(await pathsRefused(form(`${other}--limit--\r\n`))).toEqual(['other']);
  });
});
