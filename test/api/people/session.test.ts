import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { sessionCookie } from '../../../api/middleware/session.ts';
import { Person } from '../../../api/modules/people/person.entity.ts';
import { sessionSchema } from '../../../shared/contracts/people.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;

beforeAll(async () => {
  api = await startTestApi();
});
afterAll(() => api.close());

const planner = { email: 'planner@testham.example', password: 'a password of tests' };

function signIn(agent: Agent, input: object = planner) {
  return agent.post('/api/session').send(input);
}

/** The `Set-Cookie` of an answer for our cookie. */
function setCookieOf({ headers }: supertest.Response): string {
  const lines: unknown = headers['set-cookie'];
  const line: unknown = Array.isArray(lines) ? lines[0] : undefined;
  if (typeof line !== 'string') throw new Error('No cookie was set.');
  return line;
}

const cookieOf = (response: supertest.Response) => setCookieOf(response).split(';', 1)[0] ?? '';

/** The session's id, which the cookie carries with its signature. */
function sessionIdOf(response: supertest.Response): string {
  const [, value = ''] = cookieOf(response).split('=');
  return /^s:([^.]+)\./.exec(decodeURIComponent(value))?.[1] ?? '';
}

async function storedSessions(sessionId: string): Promise<unknown[]> {
  return api.orm.em.fork().execute('select sess from session where sid = ?', [sessionId]);
}

async function whoIs(cookie: string): Promise<string | null> {
  const body = await bodyOf(supertest(api.app).get('/api/session').set('Cookie', cookie));
  return sessionSchema.parse(body).person?.email ?? null;
}

describe('signing in', () => {
  it('answers with who it is, and with nothing of the password', async () => {
    const response = await signIn(await api.signIn('public')).expect(200);
    expect(sessionSchema.parse(response.body).person).toMatchObject({
      name: 'planner',
      email: planner.email,
      role: 'planner',
    });
    expect(response.text).not.toMatch(/password|argon2/i);
  });

  it('is remembered by the requests that follow', async () => {
    const agent = await api.signIn('public');
    expect(await bodyOf(agent.get('/api/session').expect(200))).toEqual({ person: null });
    await signIn(agent).expect(200);
    const body = await bodyOf(agent.get('/api/session').expect(200));
    expect(sessionSchema.parse(body).person?.email).toBe(planner.email);
  });

  it('takes the e-mail address in capitals as well', async () => {
    const email = planner.email.toUpperCase();
    await signIn(await api.signIn('public'), { ...planner, email }).expect(200);
  });

  it('gives the same answer for a wrong password and for an unknown address', async () => {
    const agent = await api.signIn('public');
    const wrongPassword = await signIn(agent, { ...planner, password: 'not the password' });
    const unknownAddress = await signIn(agent, { ...planner, email: 'nobody@testham.example' });
    expect(wrongPassword.status).toBe(401);
    expect(unknownAddress.status).toBe(401);
    const withoutId = (response: supertest.Response) => ({
      ...problemSchema.parse(response.body),
      requestId: undefined,
    });
    expect(withoutId(unknownAddress)).toEqual(withoutId(wrongPassword));
    expect(problemSchema.parse(wrongPassword.body).code).toBe('SIGN_IN_FAILED');
    expect(wrongPassword.headers['set-cookie']).toBeUndefined();
    expect(unknownAddress.headers['set-cookie']).toBeUndefined();
  });

  it('names what is missing', async () => {
    const body = await bodyOf(signIn(await api.signIn('public'), {}).expect(422));
    expect(problemSchema.parse(body).errors?.map(({ path }) => path)).toEqual([
      'email',
      'password',
    ]);
  });

  it('stores no password, only what argon2id makes of it', async () => {
    const people = await api.orm.em.fork().findAll(Person, { populate: ['passwordHash'] });
    expect(people.map(({ passwordHash }) => passwordHash.split('$')[1])).toEqual(
      people.map(() => 'argon2id'),
    );
    expect(people.filter(({ passwordHash }) => passwordHash.includes(planner.password))).toEqual(
      [],
    );
  });
});

describe('the session', () => {
  it('has a cookie that no script reads and that no other site sends along', async () => {
    const attributes = setCookieOf(await signIn(await api.signIn('public')))
      .split('; ')
      .map((one) => (one.split('=', 1)[0] === 'Expires' ? 'Expires' : one));
    expect(attributes[0]?.startsWith(`${sessionCookie}=`)).toBe(true);
    expect(attributes.slice(1).sort()).toEqual(['Expires', 'HttpOnly', 'Path=/', 'SameSite=Lax']);
  });

  it('has a cookie that travels by https alone where people come by https', async () => {
    const publicUrl = 'https://shadows.testham.example';
    const secureApi = await startTestApi({ variables: { PUBLIC_URL: publicUrl } });
    try {
      const response = await signIn(await secureApi.signIn('public'))
        .set('X-Forwarded-Proto', 'https')
        .set('Origin', publicUrl)
        .expect(200);
      expect(setCookieOf(response).split('; ')).toContain('Secure');
    } finally {
      await secureApi.close();
    }
  });

  it('is kept in the database', async () => {
    const response = await signIn(await api.signIn('public'));
    const rows = await storedSessions(sessionIdOf(response));
    const { person } = sessionSchema.parse(response.body);
    expect(rows).toMatchObject([{ sess: { personId: person?.id } }]);
  });

  it('is not begun for those who only look', async () => {
    const response = await (await api.signIn('public')).get('/api/session').expect(200);
    expect(response.headers['set-cookie']).toBeUndefined();
  });

  it('gets a new id at sign-in, and the one before is worth nothing', async () => {
    const before = await signIn(await api.signIn('public'));
    const after = await supertest(api.app)
      .post('/api/session')
      .set('Cookie', cookieOf(before))
      .send({ ...planner, email: 'board@testham.example' })
      .expect(200);
    expect(sessionIdOf(after)).not.toBe(sessionIdOf(before));
    expect(await storedSessions(sessionIdOf(before))).toEqual([]);
    expect(await whoIs(cookieOf(before))).toBeNull();
    expect(await whoIs(cookieOf(after))).toBe('board@testham.example');
  });

  it('takes no id that somebody has planted', async () => {
    const planted = 'an-id-that-an-attacker-knows';
    const response = await supertest(api.app)
      .post('/api/session')
      .set('Cookie', `${sessionCookie}=${planted}`)
      .send(planner)
      .expect(200);
    expect(sessionIdOf(response)).not.toBe('');
    expect(sessionIdOf(response)).not.toBe(planted);
    expect(await whoIs(`${sessionCookie}=${planted}`)).toBeNull();
  });

  it('is nobody’s once its person is gone', async () => {
    const em = api.orm.em.fork();
    const { passwordHash } = await em.findOneOrFail(
      Person,
      { email: planner.email },
      { populate: ['passwordHash'] },
    );
    const email = 'leaving@testham.example';
    const leaving = em.create(Person, { email, name: 'Leaving', role: 'planner', passwordHash });
    await em.flush();
    const cookie = cookieOf(await signIn(await api.signIn('public'), { ...planner, email }));
    expect(await whoIs(cookie)).toBe(email);
    await em.remove(leaving).flush();
    expect(await whoIs(cookie)).toBeNull();
  });
});

describe('signing out', () => {
  it('ends the session here and in the database', async () => {
    const agent = await api.signIn('public');
    const response = await signIn(agent);
    await agent.delete('/api/session').expect(204);
    expect(await bodyOf(agent.get('/api/session'))).toEqual({ person: null });
    expect(await storedSessions(sessionIdOf(response))).toEqual([]);
    expect(await whoIs(cookieOf(response))).toBeNull();
  });

  it('takes the cookie away', async () => {
    const agent = await api.signIn('planner');
    const line = setCookieOf(await agent.delete('/api/session').expect(204));
    expect(line).toMatch(new RegExp(`^${sessionCookie}=;`));
    expect(line).toContain('Expires=Thu, 01 Jan 1970');
  });

  it('harms nobody who is not signed in', async () => {
    await (await api.signIn('public')).delete('/api/session').expect(204);
  });
});
