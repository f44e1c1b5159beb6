import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let planner: Agent;

beforeAll(async () => {
  api = await startTestApi();
  planner = await api.signIn('planner');
});
afterAll(() => api.close());

const isSignedIn = async () =>
  expect(await bodyOf(planner.get('/api/session'))).toMatchObject({ person: { role: 'planner' } });

describe('a write with the person’s cookie', () => {
  it.each([
    ['another site', 'https://elsewhere.example'],
    ['another port of this machine', 'http://127.0.0.1:8081'],
    ['this machine by another protocol', 'https://127.0.0.1:8080'],
    ['a name that begins like ours', 'http://127.0.0.1:8080.elsewhere.example'],
    ['a page without an origin', 'null'],
    ['an empty origin', ''],
  ])('is refused from %s', async (_name, origin) => {
    for (const write of [
      planner.delete('/api/session'),
      planner.post('/api/cases'),
      planner.patch('/api/cases/2026-0001'),
      planner.put('/api/municipality'),
    ]) {
      const body = await bodyOf(write.set('Origin', origin).expect(403));
      expect(problemSchema.parse(body).code).toBe('ORIGIN_FOREIGN');
    }
    await isSignedIn();
  });

  it('is refused without an origin when the browser says that another site sends it', async () => {
    const body = await bodyOf(
      planner.delete('/api/session').set('Sec-Fetch-Site', 'cross-site').expect(403),
    );
    expect(problemSchema.parse(body).code).toBe('ORIGIN_FOREIGN');
    await isSignedIn();
  });

  it.each(['http://127.0.0.1:8080', 'http://localhost:8080', 'http://[::1]:8080'])(
    'is taken from this site itself, on this machine under any of its names: %s',
    async (origin) => {
      const agent = await api.signIn('planner');
      await agent.delete('/api/session').set('Origin', origin).expect(204);
    },
  );

  it('is taken from a program, which sends no origin', async () => {
    await (await api.signIn('planner')).delete('/api/session').expect(204);
  });

  it('is taken from the public address alone where the server has one', async () => {
    const publicUrl = 'https://shadows.testham.example';
    const publicApi = await startTestApi({ variables: { PUBLIC_URL: publicUrl } });
    try {
      const agent = await publicApi.signIn('public');
      const signOut = (origin: string) => agent.delete('/api/session').set('Origin', origin);
      await signOut(publicUrl).expect(204);
      await signOut('http://shadows.testham.example').expect(403);
      await signOut('http://localhost:8080').expect(403);
    } finally {
      await publicApi.close();
    }
  });
});

describe('reading', () => {
  it('is no write: another site may link to a page', async () => {
    await planner.get('/api/session').set('Origin', 'https://elsewhere.example').expect(200);
  });

  it('gives no other site leave to see the answer', async () => {
    const response = await planner.get('/api/session').set('Origin', 'https://elsewhere.example');
    expect(response.headers['access-control-allow-origin']).toBeUndefined();
    expect(response.headers['cross-origin-resource-policy']).toBe('same-origin');
  });
});
