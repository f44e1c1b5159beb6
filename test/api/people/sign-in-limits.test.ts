import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { bodyOf, startTestApi, type TestApi, type TestPerson } from '../../support/test-api.ts';

let api: TestApi;

beforeAll(async () => {
  api = await startTestApi();
});
afterAll(() => api.close());

const password = 'a password of tests';
const addressOf = (person: TestPerson | `guess-${number}`) => `${person}@testham.example`;

/** Statuses of so many sign-ins, one after the other. */
async function trySignIn(
  times: number,
  input: (attempt: number) => { email: string; password: string },
  isFromElsewhere = false,
): Promise<number[]> {
  const statuses: number[] = [];
  let agent = await api.signIn('public');
  for (let attempt = 1; attempt <= times; attempt += 1) {
    if (isFromElsewhere) agent = await api.signIn('public');
    statuses.push((await agent.post('/api/session').send(input(attempt))).status);
  }
  return statuses;
}

describe('guessing passwords', () => {
  it('ends for one account after ten failures, also from many addresses and with the right one', async () => {
    const guess = () => ({ email: addressOf('planner'), password: 'a guess' });
    expect(await trySignIn(10, guess, true)).toEqual(Array<number>(10).fill(401));
    const agent = await api.signIn('public');
    const body = await bodyOf(
      agent
        .post('/api/session')
        .send({ email: addressOf('planner').toUpperCase(), password })
        .expect(429),
    );
    expect(problemSchema.parse(body)).toMatchObject({
      code: 'RATE_LIMITED',
      title: 'Too many requests. Wait a little and try again.',
    });
  });

  it('ends for one address after twenty failures, whichever account is tried', async () => {
    const guess = (attempt: number) => ({ email: addressOf(`guess-${attempt}`), password });
    const statuses = await trySignIn(21, guess);
    expect(statuses.slice(0, 20)).toEqual(Array<number>(20).fill(401));
    expect(statuses[20]).toBe(429);
  });

  it('is no matter for those who know theirs: what succeeds is not counted', async () => {
    const right = () => ({ email: addressOf('board'), password });
    expect(await trySignIn(25, right)).toEqual(Array<number>(25).fill(200));
  });

  it('counts invitations as well', async () => {
    const agent = await api.signIn('public');
    const statuses: number[] = [];
    for (let attempt = 0; attempt < 21; attempt += 1) {
      const response = await agent.post('/api/invitations/accept').send({ token: 'x' });
      statuses.push(response.status);
    }
    expect(statuses.at(-1)).toBe(429);
  });
});
