import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { request } from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { text } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { listen, type ListeningServer } from '../../support/listening-server.ts';
import { startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

const page = '<!doctype html><title>The client</title>';
const secret = 'nothing for strangers';
/** A built client in small, as Vite lays it out. */
const builtFiles = {
  'index.html': page,
  'mark.svg': '<svg xmlns="http://www.w3.org/2000/svg"/>',
  '.env': secret,
  'assets/index-Ab12Cd34.js': 'export {};',
  'assets/index-Ab12Cd34.css': 'body { margin: 0 }',
  'assets/public-sans-Ab12Cd34.woff2': 'font',
  'assets/shadow-worker-Ab12Cd34.js': 'export {};',
  'assets/.map': secret,
  '../secret.txt': secret,
};

let folder: string;
let api: TestApi;
let reader: Agent;

beforeAll(async () => {
  // Below a folder that begins with a dot, as a checkout may lie.
  folder = path.join(mkdtempSync(path.join(tmpdir(), 'noonmark-web-')), '.hidden/checkout');
  const distFolder = path.join(folder, 'dist');
  mkdirSync(path.join(distFolder, 'assets'), { recursive: true });
  for (const [name, content] of Object.entries(builtFiles)) {
    writeFileSync(path.join(distFolder, name), content);
  }
  api = await startTestApi({ variables: { WEB_DIST: distFolder } });
  reader = await api.signIn('public');
});
afterAll(async () => {
  await api.close();
  rmSync(path.resolve(folder, '../..'), { recursive: true, force: true });
});

/** The policy of an answer, by directive. */
async function policyOf(address: string): Promise<Map<string, string[]>> {
  const { headers } = await reader.get(address);
  const directives = String(headers['content-security-policy']).split(/;\s*/);
  return new Map(
    directives.map((directive) => {
      const [name = '', ...sources] = directive.trim().split(/\s+/);
      return [name, sources];
    }),
  );
}

describe('a page of the client', () => {
  it.each([
    '/',
    '/?q=row',
    '/sign-in',
    '/method',
    '/cases/2026-0001',
    '/applications/draft-abcdefghij',
    '/desk/2026-0001/report',
    '/admin/rules',
    '/a/page/that/nobody/wrote',
    '/index.html',
    '/apiary',
    '/2026-0001.pdf',
  ])('is the same file, never kept without asking again: %s', async (address) => {
    const { headers, text: html } = await reader.get(address).expect(200);
    expect(html).toBe(page);
    expect(headers['content-type']).toBe('text/html; charset=utf-8');
    expect(headers['cache-control']).toMatch(/^(?:no-cache|public, max-age=0)$/);
    const tag = String(headers['etag']);
    await reader.get(address).set('If-None-Match', tag).expect(304);
  });

  it.each(['/api', '/api/', '/api/unknown', '/API/unknown'])('is not %s', async (address) => {
    const response = await reader.get(address).set('Accept', 'text/html').expect(404);
    expect(problemSchema.parse(response.body).code).toBe('NOT_FOUND');
  });

  it('comes whole, also to those who ask for a part that it does not have', async () => {
    for (const address of ['/', '/assets/index-Ab12Cd34.js', '/mark.svg']) {
      const { headers } = await reader.get(address).set('Range', 'bytes=9999-').expect(200);
      expect(headers['accept-ranges']).toBeUndefined();
    }
  });
});

describe('the files of the client', () => {
  it.each([
    ['index-Ab12Cd34.js', 'text/javascript; charset=utf-8'],
    ['index-Ab12Cd34.css', 'text/css; charset=utf-8'],
    ['public-sans-Ab12Cd34.woff2', 'font/woff2'],
    ['shadow-worker-Ab12Cd34.js', 'text/javascript; charset=utf-8'],
  ])('are kept for a year when their name has a hash: %s', async (name, type) => {
    const { headers } = await reader.get(`/assets/${name}`).expect(200);
    expect(headers['content-type']).toBe(type);
    expect(headers['cache-control']).toBe('public, max-age=31536000, immutable');
  });

  it('are asked for again when their name has none', async () => {
    const { headers } = await reader.get('/mark.svg').expect(200);
    expect(headers['content-type']).toBe('image/svg+xml');
    expect(headers['cache-control']).toBe('public, max-age=0');
  });

  it.each(['/assets/index-Gone0000.js', '/assets/', '/assets', '/assets/.map'])(
    'are not replaced by the page, and their want is not kept: %s',
    async (address) => {
      const response = await reader.get(address).expect(404);
      expect(problemSchema.parse(response.body).code).toBe('NOT_FOUND');
      expect(response.headers['cache-control']).toBe('no-store');
    },
  );
});

describe('nothing beside the client', () => {
  let server: ListeningServer;

  beforeAll(async () => {
    server = await listen(api.app);
  });
  afterAll(() => server.close());

  /** The path as it is written here: other senders would put it in order first. */
  async function sendRaw(rawPath: string): Promise<{ status: number; answer: string }> {
    const { port } = server;
    return new Promise((resolve, reject) => {
      const sent = request({ host: '127.0.0.1', port, path: rawPath, agent: false }, (response) => {
        text(response).then(
          (answer) => resolve({ status: response.statusCode ?? 0, answer }),
          reject,
        );
      });
      sent.on('error', reject);
      sent.end();
    });
  }

  it('is missing from it: what belongs to it is handed out', async () => {
    expect(await sendRaw('/mark.svg')).toEqual({ status: 200, answer: builtFiles['mark.svg'] });
  });

  it.each([
    '/../secret.txt',
    '/..%2fsecret.txt',
    '/%2e%2e/secret.txt',
    '/%2e%2e%2fsecret.txt',
    '/..%5csecret.txt',
    '/assets/../../secret.txt',
    '/assets/..%2f..%2fsecret.txt',
    '/assets/%2e%2e/%2e%2e/secret.txt',
    '/assets/%252e%252e%252fsecret.txt',
    '/assets/%00',
    '/assets/index-Ab12Cd34.js%00.txt',
    '/assets/%E0%A4%A',
    '/assets//etc/passwd',
    '//etc/passwd',
    '/assets/../.env',
    '/.env',
    '/%2eenv',
    '/.git/config',
  ])('is handed out for %s, and nothing breaks', async (rawPath) => {
    const { status, answer } = await sendRaw(rawPath);
    if (status === 200) expect(answer).toBe(page);
    else expect(problemSchema.parse(JSON.parse(answer))).toMatchObject({ status: 404 });
  });
});

describe('the content security policy', () => {
  const strict = {
    'default-src': ["'self'"],
    'script-src': ["'self'"],
    'script-src-attr': ["'none'"],
    'style-src': ["'self'"],
    'connect-src': ["'self'"],
    'font-src': ["'self'"],
    'object-src': ["'none'"],
    'base-uri': ["'none'"],
    'form-action': ["'self'"],
    'frame-ancestors': ["'none'"],
  };

  it.each([
    '/',
    '/cases/2026-0001',
    '/index.html',
    '/mark.svg',
    '/assets/index-Ab12Cd34.js',
    '/assets/index-Gone0000.js',
    '/api/session',
    '/api/unknown',
  ])('lets nothing but our own scripts run, and no frame around: %s', async (address) => {
    const policy = await policyOf(address);
    expect(Object.fromEntries(policy)).toMatchObject(strict);
    // Styles in attributes are the one thing that is written into the page.
    const loose = [...policy].filter(([, sources]) => sources.includes("'unsafe-inline'"));
    expect(loose.map(([name]) => name)).toEqual(['style-src-attr']);
    const all = [...policy.values()].flat();
    for (const source of all) {
      expect(["'self'", "'none'", "'unsafe-inline'", 'data:', 'blob:']).toContain(source);
    }
  });

  it('lets the worker that unites shadows evaluate, and that script alone', async () => {
    const policy = await policyOf('/assets/shadow-worker-Ab12Cd34.js');
    expect(Object.fromEntries(policy)).toEqual({
      'default-src': ["'none'"],
      'script-src': ["'self'", "'unsafe-eval'"],
      'connect-src': ["'self'"],
    });
  });

  it('of the page for scripts’ authors lets its own style in, and no script', async () => {
    const policy = await policyOf('/api/docs');
    expect(policy.get('default-src')).toEqual(["'none'"]);
    expect(policy.has('script-src')).toBe(false);
    expect(policy.get('style-src')?.join()).toMatch(/^'sha256-[A-Za-z0-9+/]{43}='$/);
  });
});

describe('the other headers of a page', () => {
  it('guard types, frames and where people came from', async () => {
    const { headers } = await reader.get('/').expect(200);
    expect(headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'x-frame-options': 'SAMEORIGIN',
      'referrer-policy': 'same-origin',
      'cross-origin-resource-policy': 'same-origin',
    });
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['set-cookie']).toBeUndefined();
  });

  it('ask for https where people come by https, and nowhere else', async () => {
    const { headers } = await reader.get('/').expect(200);
    expect(headers['strict-transport-security']).toBeUndefined();
    const secureApi = await startTestApi({
      variables: { WEB_DIST: api.deps.env.WEB_DIST, PUBLIC_URL: 'https://shadows.testham.example' },
    });
    try {
      const secure = await (await secureApi.signIn('public')).get('/').expect(200);
      expect(secure.headers['strict-transport-security']).toMatch(/^max-age=\d{8}/);
    } finally {
      await secureApi.close();
    }
  });
});
