import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { createLogger } from '../../../api/logger.ts';
import { createOrm } from '../../../api/orm.ts';
import { OWNER_ROLE } from '../../../api/start/database.mjs';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { buildSmallCity } from '../../support/small-city.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let reader: Agent;
let lines: string[] = [];

beforeAll(async () => {
  const logger = createLogger({ LOG_LEVEL: 'trace' }, { write: (line) => lines.push(line) });
  // No client is built here, whatever the checkout holds.
  api = await startTestApi({ logger, variables: { WEB_DIST: '/nowhere' } });
  await buildSmallCity(api.orm);
  reader = await api.signIn('public');
});
beforeEach(() => {
  lines = [];
});
afterAll(() => api.close());

const levels = { debug: 20, info: 30, error: 50 };

const lineSchema = z.object({
  level: z.number(),
  time: z.iso.datetime(),
  msg: z.string(),
  req: z.strictObject({ id: z.uuid(), method: z.string(), path: z.string() }),
  res: z.strictObject({ status: z.number() }).optional(),
  err: z.looseObject({ type: z.string(), stack: z.string() }).optional(),
});

const readLog = () => lines.map((line) => lineSchema.parse(JSON.parse(line)));

/** As the role that owns the tables, which the application is not. */
async function runAsOwner(sql: string): Promise<void> {
  const url = new URL(api.databaseUrl);
  url.username = OWNER_ROLE;
  const orm = await createOrm(url.href);
  await orm.em.fork().execute(sql);
  await orm.close();
}

describe('an unexpected error', () => {
  /** A reading that fails at its first step. */
  function failOnce(error: Error) {
    vi.spyOn(api.orm.em, 'fork').mockImplementationOnce(() => {
      throw error;
    });
    return reader.get('/api/parcels?q=Fennimarsh').expect(500);
  }

  it('is a problem without its text, with the id under which the log has it', async () => {
    const response = await failOnce(new Error('the cellar is flooded'));
    const { headers, text } = response;
    expect(headers['content-type']).toBe('application/problem+json; charset=utf-8');
    expect(headers['cache-control']).toBe('no-store');
    const { requestId, ...problem } = problemSchema.strict().parse(response.body);
    expect(problem).toEqual({
      type: 'about:blank',
      title: 'Something went wrong on our side. Try again; if it stays, report the request id.',
      status: 500,
      code: 'INTERNAL',
    });
    expect(text).not.toMatch(/cellar|\.ts|\bat /);

    const logged = readLog().filter(({ level }) => level === levels.error);
    expect(logged.map(({ msg }) => msg)).toEqual(['unexpected error', 'request errored']);
    for (const { req } of logged) expect(req.id).toBe(requestId);
    expect(headers['x-request-id']).toBe(requestId);
    expect(logged[0]?.err).toMatchObject({ type: 'Error', message: 'the cellar is flooded' });
    expect(logged[0]?.err?.stack).toContain('request-log.test.ts');
  });

  it('does not stop the next request', async () => {
    await failOnce(new Error('once'));
    await reader.get('/api/parcels').expect(200);
  });

  it('of the database is logged by its code, without what people sent', async () => {
    await runAsOwner('alter table parcel rename column address to street');
    try {
      const response = await reader.get('/api/parcels?q=Fennimarsh').expect(500);
      expect(problemSchema.parse(response.body).code).toBe('INTERNAL');
      expect(response.text).not.toMatch(/parcel|column|select/i);
    } finally {
      await runAsOwner('alter table parcel rename column street to address');
    }
    expect(lines.join('')).not.toContain('Fennimarsh');
    const error = readLog().find(({ msg }) => msg === 'unexpected error')?.err;
    // 42703: undefined_column (PostgreSQL, appendix A).
    expect(error).toMatchObject({ type: 'InvalidFieldNameException', code: '42703' });
    expect(error?.['message']).toBeUndefined();
  });
});

describe('the log of requests', () => {
  it('has one line for each, with method, path and status, louder where it failed', async () => {
    await reader.get('/api/parcels').expect(200);
    await reader.get('/api/unknown').expect(404);
    await reader.get('/cases/2026-0001?receptor=N-1');
    expect(readLog().map(({ level, req, res }) => [level, req.method, req.path, res])).toEqual([
      [levels.debug, 'GET', '/api/parcels', { status: 200 }],
      [levels.info, 'GET', '/api/unknown', { status: 404 }],
      [levels.info, 'GET', '/cases/2026-0001', { status: 404 }],
    ]);
  });

  it('has an id for each that nobody else chooses', async () => {
    const chosen = '00000000-0000-4000-8000-000000000000';
    const ids: unknown[] = [];
    for (let count = 0; count < 3; count += 1) {
      const { headers } = await reader.get('/api/session').set('X-Request-Id', chosen);
      ids.push(headers['x-request-id']);
    }
    expect(readLog().map(({ req }) => req.id)).toEqual(ids);
    expect(new Set([...ids, chosen]).size).toBe(4);
  });

  it('knows nobody who signs in, or fails to', async () => {
    const secrets = { email: 'nell.fennimarsh@home.example', password: 'the password of Nell' };
    const planner = await api.signIn('planner');
    await planner.get('/api/session').expect(200);
    await reader.post('/api/session').send(secrets).expect(401);
    await reader
      .post('/api/session')
      .send({ ...secrets, password: '' })
      .expect(422);
    await reader.post('/api/session').send(`{"email":"${secrets.email}`).type('json').expect(422);
    await reader.get(`/invitation?token=${secrets.password}`);
    const log = lines.join('');
    expect(readLog()).toHaveLength(6);
    expect(log).not.toMatch(/fennimarsh|password|planner|testham|home\.example/i);
    // Neither the cookie nor the address of the machine.
    expect(log).not.toMatch(/noonmark\.session|s%3A|10\.0\.|127\.0\.0\.1|::/);
  });

  it('knows nobody who comments, nor what is looked for', async () => {
    const { id, reference } = await api.createCase('open-for-comment');
    const comment = {
      authorName: 'Nell Fennimarsh',
      authorEmail: 'nell@home.example',
      body: 'My tomatoes get the noon sun.',
      pin: [-91.2998, 46.7505],
    };
    const path = `/api/cases/${reference}/comments`;
    await reader.post(path).send(comment).expect(201);
    await reader
      .post(path)
      .send({ ...comment, pin: 'tomatoes' })
      .expect(422);
    await api.setState(id, 'heard');
    await reader.post(path).send(comment).expect(403);
    const staff = await api.signIn('planner');
    await bodyOf(staff.get(path).query({ q: 'Nell' }).expect(200));
    await reader.get('/api/parcels?q=12+Fennimarsh+Row').expect(200);
    expect(readLog()).toHaveLength(6);
    expect(lines.join('')).not.toMatch(/nell|fennimarsh|home\.example|tomatoes|91\.29/i);
  });
});
