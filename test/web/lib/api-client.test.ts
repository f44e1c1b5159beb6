import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { callApi } from '../../../web/lib/api-client.ts';
import { ApiError } from '../../../web/lib/api-error.ts';
import { stubFetch } from '../support/stub-fetch.ts';

const schema = z.object({ number: z.int() });

async function problemOf(call: Promise<unknown>) {
  const error: unknown = await call.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof ApiError)) throw new Error('The call did not fail with an ApiError.');
  return error.problem;
}

afterEach(() => {
  vi.unstubAllGlobals();
});

describe('callApi', () => {
  it('gives the answer as its contract has it', async () => {
    stubFetch(200, { number: 7, more: 'left out' });
    expect(await callApi(schema, '/things/7')).toEqual({ number: 7 });
  });

  it('leaves empty values out of the address', async () => {
    const sent = stubFetch(200, { number: 7 });
    await callApi(schema, '/things', { query: { q: '', page: 2, state: undefined } });
    expect(sent[0]?.url).toBe('/api/things?page=2');
  });

  it('sends the key of a write that the network may repeat', async () => {
    const sent = stubFetch(200, { number: 7 });
    await callApi(schema, '/things', { method: 'POST', body: { a: 1 }, idempotencyKey: 'k-1' });
    expect(sent[0]?.headers.get('Idempotency-Key')).toBe('k-1');
    expect(sent[0]?.body).toEqual({ a: 1 });
  });

  it('fails with the problem details of the server', async () => {
    const problem = { type: 'about:blank', title: 'Sign in.', status: 401, code: 'NOT_SIGNED_IN' };
    stubFetch(401, problem);
    expect(await problemOf(callApi(schema, '/things'))).toEqual(problem);
  });

  it('fails with a sentence where something else answers in the server’s place', async () => {
    stubFetch(502, '<html>Bad gateway</html>');
    const problem = await problemOf(callApi(schema, '/things'));
    expect(problem.status).toBe(502);
    expect(problem.title).toContain('Try again');
  });

  it('fails where an answer does not keep to the contract, naming the member', async () => {
    stubFetch(200, { number: 'seven' });
    const problem = await problemOf(callApi(schema, '/things'));
    expect(problem.code).toBe('INTERNAL');
    expect(problem.detail).toContain('number');
  });

  it('says that the server cannot be reached', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('network')));
    const problem = await problemOf(callApi(schema, '/things'));
    expect(problem.code).toBe('UNAVAILABLE');
    expect(problem.title).toContain('cannot be reached');
  });
});
