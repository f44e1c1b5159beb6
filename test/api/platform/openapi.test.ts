import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { sessionCookie } from '../../../api/middleware/session.ts';
import packageJson from '../../../package.json' with { type: 'json' };
import {
  compileSchema,
  openApiSchema,
  operationsOf,
  type OpenApiDocument,
} from '../../support/openapi-schema.ts';
import { buildSmallCity, smallCityRule } from '../../support/small-city.ts';
import { createReviewedCase } from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let reader: Agent;
let document: OpenApiDocument;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  reader = await api.signIn('public');
  document = openApiSchema.parse(await bodyOf(reader.get('/api/openapi.json').expect(200)));
});
afterAll(() => api.close());

/** The operations as `GET /api/cases/{number}`. */
const documented = () =>
  operationsOf(document)
    .map(({ method, path }) => `${method.toUpperCase()} ${path}`)
    .sort();

/** The routes that the application has mounted, in the same form. */
function mounted(): string[] {
  const routes = api.app.router.stack.flatMap(({ route }) => (route === undefined ? [] : [route]));
  return routes.flatMap(({ path, stack }) => {
    const template = path.replaceAll(/:([A-Za-z]+)/g, (_whole, name: string) => `{${name}}`);
    return [...new Set(stack.map(({ method }) => `${method.toUpperCase()} ${template}`))];
  });
}

function operationOf(method: string, path: string) {
  const found = operationsOf(document).find((one) => one.method === method && one.path === path);
  if (found === undefined) throw new Error(`${method} ${path} is not documented.`);
  return found.operation;
}

describe('the document of the API', () => {
  it('is OpenAPI 3.1 of this version, as JSON, for everybody', async () => {
    const { headers } = await reader.get('/api/openapi.json').expect(200);
    expect(headers['content-type']).toBe('application/json; charset=utf-8');
    expect(document.info.version).toBe(packageJson.version);
  });

  it('has every route of the API, and no other', () => {
    const routes = mounted();
    expect(routes.filter((route) => route.includes(' /api/')).sort()).toEqual(documented());
    expect(routes.filter((route) => !route.includes(' /api/'))).toEqual(['GET /{*any}']);
  });

  it('has the addresses that outsiders rely on', () => {
    expect(documented()).toEqual(
      expect.arrayContaining([
        'GET /api/health/live',
        'GET /api/health/ready',
        'GET /api/openapi.json',
        'GET /api/docs',
        'GET /api/schemas/study.json',
        'POST /api/session',
        'GET /api/session',
        'DELETE /api/session',
        'GET /api/cases',
        'POST /api/cases',
        'GET /api/cases/{number}',
        'PATCH /api/cases/{number}',
        'POST /api/cases/{number}/transitions',
        'POST /api/cases/{number}/massings',
        'GET /api/cases/{number}/massings',
        'GET /api/cases/{number}/massings/{revision}',
        'POST /api/cases/{number}/studies',
        'GET /api/studies/{id}',
        'GET /api/studies/{id}/events',
        'POST /api/studies/{id}/cancel',
        'GET /api/studies/{id}/shadows',
        'GET /api/studies/{id}/receptors',
        'GET /api/studies/{id}/receptors.csv',
        'GET /api/studies/{id}/receptors/{receptor}',
        'GET /api/studies/{id}/evidence',
        'POST /api/cases/{number}/comments',
        'GET /api/cases/{number}/comments',
        'PATCH /api/comments/{id}',
        'POST /api/cases/{number}/reports',
        'GET /api/reports/{number}.pdf',
        'GET /api/parcels',
        'GET /api/tiles/{layer}/{z}/{x}/{y}.mvt',
        'GET /api/rules',
        'POST /api/rules',
      ]),
    );
  });

  it('names each operation once', () => {
    const ids = operationsOf(document).map(({ operation }) => operation.operationId);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('has no two addresses that differ in the names of their parameters alone', () => {
    const shapes = Object.keys(document.paths).map((path) => path.replaceAll(/\{\w+\}/g, '{}'));
    expect(new Set(shapes).size).toBe(shapes.length);
  });

  it('describes the parameters of each path, all of them required', () => {
    for (const { path, operation } of operationsOf(document)) {
      const names = operation.parameters.filter((one) => one.in === 'path' && one.required);
      expect(names.map(({ name }) => `{${name}}`).sort()).toEqual(
        [...path.matchAll(/\{\w+\}/g)].map(([name]) => name).sort(),
      );
      const keys = operation.parameters.map(({ name, in: place }) => `${place} ${name}`);
      expect(new Set(keys).size).toBe(keys.length);
    }
  });

  it('describes a good answer and the problem of each operation, and no body for reading', () => {
    const problem = { $ref: '#/components/schemas/Problem' };
    for (const { method, operation } of operationsOf(document)) {
      const { default: refusal, ...good } = operation.responses;
      expect(Object.keys(good)).toEqual([expect.stringMatching(/^2\d\d$/)]);
      expect(refusal?.content?.['application/problem+json']?.schema).toEqual(problem);
      if (method === 'get' || method === 'delete') expect(operation.requestBody).toBeUndefined();
    }
  });

  it('asks for the session’s cookie where somebody must be signed in', () => {
    expect(document.components.securitySchemes).toEqual({
      session: { type: 'apiKey', in: 'cookie', name: sessionCookie },
    });
    expect(operationOf('get', '/api/parcels').security).toEqual([{}, { session: [] }]);
    expect(operationOf('post', '/api/rules').security).toEqual([{ session: [] }]);
  });

  it.each(['post /api/rules', 'post /api/cases/{number}/comments'])(
    'tells of the key that makes a write repeatable: %s',
    (operation) => {
      const [method = '', path = ''] = operation.split(' ');
      expect(operationOf(method, path).parameters).toContainEqual(
        expect.objectContaining({ name: 'Idempotency-Key', in: 'header', required: false }),
      );
    },
  );
});

describe('the schemas of the document', () => {
  it('are sound, and what they refer to is there', () => {
    for (const { operation } of operationsOf(document)) {
      const bodies = [operation.requestBody, ...Object.values(operation.responses)];
      const contents = bodies.flatMap((body) => Object.values(body?.content ?? {}));
      const schemas = [...contents, ...operation.parameters].map(({ schema }) => schema);
      for (const schema of schemas) expect(() => compileSchema(document, schema)).not.toThrow();
    }
  });

  it('do not call an answer of JSON a text', () => {
    for (const { operation } of operationsOf(document)) {
      for (const { content = {} } of Object.values(operation.responses)) {
        for (const [type, { schema }] of Object.entries(content)) {
          if (/[/+]json$/.test(type)) expect(schema['type']).not.toBe('string');
        }
      }
    }
  });

  it('take the answers that are given', async () => {
    const { reference } = await createReviewedCase(api);
    const planner = await api.signIn('planner');
    for (const [path, address] of [
      ['/api/health/live', '/api/health/live'],
      ['/api/session', '/api/session'],
      ['/api/municipality', '/api/municipality'],
      ['/api/parcels', '/api/parcels'],
      ['/api/rules', '/api/rules'],
      ['/api/cases', '/api/cases?view=desk'],
      ['/api/cases/{number}', `/api/cases/${reference}`],
      ['/api/cases/{number}/massings', `/api/cases/${reference}/massings`],
      ['/api/cases/{number}/massings/{revision}', `/api/cases/${reference}/massings/1`],
    ] as const) {
      const schema = operationOf('get', path).responses['200']?.content?.['application/json'];
      const answer = await bodyOf(planner.get(address).expect(200));
      expect(compileSchema(document, schema?.schema ?? {}).parse(answer)).toEqual(answer);
      expect(compileSchema(document, schema?.schema ?? {}).safeParse({}).success).toBe(false);
    }
  });

  it('take the problems that are given', async () => {
    const schema = compileSchema(document, { $ref: '#/components/schemas/Problem' });
    for (const path of ['/api/unknown', '/api/parcels?page=0', '/api/cases/2026-0001/reports']) {
      const answer = await bodyOf(reader.get(path));
      expect(schema.parse(answer)).toEqual(answer);
    }
    expect(schema.safeParse({ title: 'Without a code.', status: 404 }).success).toBe(false);
  });

  it('take a body that the server takes, and refuse one that it refuses', async () => {
    const { requestBody } = operationOf('post', '/api/rules');
    const schema = compileSchema(document, requestBody?.content['application/json']?.schema ?? {});
    const good = { rule: { ...smallCityRule(), version: 2 }, inForceFrom: null };
    const bad = { ...good, rule: { ...good.rule, clauses: [] } };
    expect(schema.safeParse(good).success).toBe(true);
    expect(schema.safeParse(bad).success).toBe(false);
    const administrator = await api.signIn('administrator');
    await administrator.post('/api/rules').send(bad).expect(422);
    await administrator.post('/api/rules').send(good).expect(201);
  });
});

describe('the page for scripts’ authors', () => {
  it('lists every operation that the document has', async () => {
    const { text, headers } = await reader.get('/api/docs').expect(200);
    expect(headers['content-type']).toBe('text/html; charset=utf-8');
    const rows = [...text.matchAll(/<code>([A-Z]+)<\/code><\/td>\s*<td><code>([^<]+)<\/code>/g)];
    expect(rows.map(([, method, path]) => `${method} ${path}`).sort()).toEqual(documented());
  });
});
