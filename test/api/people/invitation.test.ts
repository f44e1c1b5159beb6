import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { acceptInvitation } from '../../../api/modules/people/accept-invitation.ts';
import { Invitation } from '../../../api/modules/people/invitation.entity.ts';
import { inviteFirstAdministrator } from '../../../api/modules/people/invite-first-administrator.ts';
import { Person } from '../../../api/modules/people/person.entity.ts';
import { sessionSchema } from '../../../shared/contracts/people.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { bodyOf, startTestApi, type TestApi } from '../../support/test-api.ts';

let api: TestApi;

beforeAll(async () => {
  api = await startTestApi();
});
afterAll(() => api.close());

const hourMs = 3_600_000;
const newcomer = {
  email: 'First@Testham.example',
  name: 'Ada Quill',
  password: 'long enough for a town',
};

/** As on a server where nobody is the administrator yet. */
async function removeAdministrators(): Promise<void> {
  const em = api.orm.em.fork();
  await em.nativeDelete(Person, { role: 'administrator' });
  await em.nativeDelete(Invitation, {});
}
beforeEach(removeAdministrators);
afterEach(removeAdministrators);

async function invite(now = new Date()): Promise<string> {
  const token = await inviteFirstAdministrator(api.orm.em.fork(), now);
  if (token === null) throw new Error('There is an administrator already.');
  return token;
}

async function accept(token: string, input: object = newcomer) {
  return (await api.signIn('public')).post('/api/invitations/accept').send({ ...input, token });
}

async function listAdministrators(): Promise<string[]> {
  const people = await api.orm.em.fork().find(Person, { role: 'administrator' });
  return people.map(({ email }) => email);
}

describe('the one-time link', () => {
  it('makes the first administrator and signs them in', async () => {
    const token = await invite();
    const agent = await api.signIn('public');
    const response = await agent
      .post('/api/invitations/accept')
      .send({ ...newcomer, token })
      .expect(201);
    const person = { name: 'Ada Quill', email: 'first@testham.example', role: 'administrator' };
    expect(sessionSchema.parse(response.body).person).toMatchObject(person);
    const body = await bodyOf(agent.get('/api/session'));
    expect(sessionSchema.parse(body).person).toMatchObject(person);
  });

  it('sets the password with which they sign in afterwards', async () => {
    await accept(await invite());
    const { email, password } = newcomer;
    const agent = await api.signIn('public');
    await agent.post('/api/session').send({ email, password: 'another one' }).expect(401);
    await agent.post('/api/session').send({ email, password }).expect(200);
  });

  it('works once', async () => {
    const token = await invite();
    expect((await accept(token)).status).toBe(201);
    const again = await accept(token, { ...newcomer, email: 'second@testham.example' });
    expect(again.status).toBe(404);
    expect(problemSchema.parse(again.body).title).toBe(
      'This invitation is used up or too old. Ask for a new one.',
    );
    expect(await listAdministrators()).toEqual(['first@testham.example']);
  });

  it('works once also when two use it at the same time', async () => {
    const token = await invite();
    const answers = await Promise.all(
      ['one', 'two', 'three'].map((name) =>
        accept(token, { ...newcomer, email: `${name}@testham.example` }),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 404, 404]);
    expect(await listAdministrators()).toHaveLength(1);
  });

  it('lasts two days', async () => {
    const now = new Date('2026-12-01T12:00:00Z');
    const after = (hours: number) => new Date(now.getTime() + hours * hourMs);
    const token = await invite(now);
    const input = { ...newcomer, token };
    await expect(acceptInvitation(api.orm.em.fork(), input, after(48))).rejects.toThrow('too old');
    expect(await listAdministrators()).toEqual([]);
    const person = await acceptInvitation(api.orm.em.fork(), input, after(47.99));
    expect(person.role).toBe('administrator');
  });

  it('too old is refused over HTTP too', async () => {
    expect((await accept(await invite(new Date(Date.now() - 49 * hourMs)))).status).toBe(404);
    expect(await listAdministrators()).toEqual([]);
  });

  it('stands in the database as a hash alone', async () => {
    const token = await invite();
    const [row] = await api.orm.em
      .fork()
      .execute<{ row: string; hash: string }[]>(
        'select row_to_json(invitation)::text as row, token_hash as hash from invitation',
      );
    expect(row?.hash).toMatch(/^[0-9a-f]{64}$/);
    expect(row?.row).not.toContain(token);
    expect((await accept(row?.hash ?? '')).status).toBe(404);
  });

  it('ends when a new one is given', async () => {
    const earlier = await invite();
    const later = await invite();
    expect((await accept(earlier)).status).toBe(404);
    expect((await accept(later)).status).toBe(201);
  });

  it('is not given where there is an administrator', async () => {
    await accept(await invite());
    expect(await inviteFirstAdministrator(api.orm.em.fork(), new Date())).toBeNull();
  });

  it('is not used up by an address that somebody has already', async () => {
    const token = await invite();
    const taken = await accept(token, { ...newcomer, email: 'Planner@testham.example' });
    expect(taken.status).toBe(422);
    expect(problemSchema.parse(taken.body).errors?.map(({ path }) => path)).toEqual(['email']);
    expect((await accept(token)).status).toBe(201);
  });

  it('asks for a password of twelve characters, and for the rest', async () => {
    const token = await invite();
    const refused = await accept(token, { email: 'x', name: ' ', password: 'eleven char' });
    expect(refused.status).toBe(422);
    expect(
      problemSchema
        .parse(refused.body)
        .errors?.map(({ path }) => path)
        .sort(),
    ).toEqual(['email', 'name', 'password']);
    expect(await listAdministrators()).toEqual([]);
  });

  it('that nobody gave makes nobody', async () => {
    expect((await accept('a-token-that-somebody-made-up-themselves')).status).toBe(404);
    expect(await listAdministrators()).toEqual([]);
  });
});
