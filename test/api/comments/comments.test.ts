import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { commentPageSchema, commentReceiptSchema } from '../../../shared/contracts/comments.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { buildSmallCity } from '../../support/small-city.ts';
import { createReviewedCase } from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let neighbour: Agent;
let planner: Agent;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  neighbour = await api.signIn('public');
  planner = await api.signIn('planner');
});
afterAll(() => api.close());

const words = {
  authorName: 'Nell Fennimarsh',
  authorEmail: 'nell@home.example',
  body: 'My tomatoes get the noon sun.',
  pin: [-91.2998, 46.7505],
};

async function openCase(): Promise<string> {
  const { id, reference } = await createReviewedCase(api);
  await api.setState(id, 'open-for-comment');
  return reference;
}

async function write(reference: string): Promise<string> {
  const body = await bodyOf(
    neighbour.post(`/api/cases/${reference}/comments`).send(words).expect(201),
  );
  return commentReceiptSchema.parse(body).id;
}

async function list(agent: Agent, reference: string, query = {}) {
  const body = await bodyOf(agent.get(`/api/cases/${reference}/comments`).query(query).expect(200));
  return commentPageSchema.parse(body);
}

describe('writing a comment', () => {
  it('needs no account and gives a receipt', async () => {
    const reference = await openCase();
    const body = await bodyOf(
      neighbour.post(`/api/cases/${reference}/comments`).send(words).expect(201),
    );
    expect(commentReceiptSchema.strict().safeParse(body).success).toBe(true);
  });

  it('keeps the massing revision that was open', async () => {
    const reference = await openCase();
    await write(reference);
    expect((await list(planner, reference)).rows[0]?.revision).toBe(1);
  });

  it.each(['report-issued', 'heard', 'approved'] as const)(
    'is refused in the state %s, with a sentence',
    async (state) => {
      const { id, reference } = await createReviewedCase(api);
      await api.setState(id, state);
      const body = await bodyOf(
        neighbour.post(`/api/cases/${reference}/comments`).send(words).expect(403),
      );
      expect(problemSchema.parse(body).title).toContain('not open for comment');
    },
  );

  it('finds no case that is not public', async () => {
    const { reference } = await createReviewedCase(api);
    await neighbour.post(`/api/cases/${reference}/comments`).send(words).expect(404);
  });

  it('names every field that is wrong', async () => {
    const reference = await openCase();
    const body = await bodyOf(
      neighbour
        .post(`/api/cases/${reference}/comments`)
        .send({
          authorName: ' ',
          authorEmail: 'nell',
          body: 'x',
          pin: [500, 0],
          state: 'published',
        })
        .expect(422),
    );
    expect(
      problemSchema
        .parse(body)
        .errors?.map(({ path }) => path)
        .sort(),
    ).toEqual(['authorEmail', 'authorName', 'body', 'pin.0', 'state']);
  });

  it('has its effect once when it is sent twice with the same Idempotency-Key', async () => {
    const reference = await openCase();
    const send = () =>
      neighbour
        .post(`/api/cases/${reference}/comments`)
        .set('Idempotency-Key', 'one-comment-only')
        .send(words)
        .expect(201);
    const [first, second] = [await bodyOf(send()), await bodyOf(send())];
    expect(second).toEqual(first);
    expect((await list(planner, reference)).total).toBe(1);
  });
});

describe('moderating comments', () => {
  it('shows the public nothing before a planner has published it', async () => {
    const reference = await openCase();
    const id = await write(reference);
    expect((await list(neighbour, reference)).rows).toEqual([]);
    await planner.patch(`/api/comments/${id}`).send({ state: 'published' }).expect(200);
    expect((await list(neighbour, reference)).rows).toMatchObject([
      { id, authorName: words.authorName, body: words.body, pin: words.pin, state: 'published' },
    ]);
  });

  it('never shows the public an e-mail address or a reason', async () => {
    const reference = await openCase();
    const id = await write(reference);
    await planner.patch(`/api/comments/${id}`).send({ state: 'published' }).expect(200);
    const response = await neighbour.get(`/api/cases/${reference}/comments`).expect(200);
    expect(response.text).not.toContain(words.authorEmail);
    expect((await list(planner, reference)).rows[0]?.authorEmail).toBe(words.authorEmail);
    for (const reader of ['owner', 'other', 'board'] as const) {
      const seen = await (await api.signIn(reader)).get(`/api/cases/${reference}/comments`);
      expect(seen.text).not.toContain(words.authorEmail);
    }
  });

  it('withholds with a reason that staff read, and publishes again', async () => {
    const reference = await openCase();
    const id = await write(reference);
    await planner.patch(`/api/comments/${id}`).send({ state: 'withheld' }).expect(422);
    await planner
      .patch(`/api/comments/${id}`)
      .send({ state: 'withheld', reason: 'Names a child.' })
      .expect(200);
    expect((await list(neighbour, reference)).rows).toEqual([]);
    expect((await list(planner, reference, { state: 'withheld' })).rows).toMatchObject([
      { id, withheldReason: 'Names a child.' },
    ]);
    await planner.patch(`/api/comments/${id}`).send({ state: 'published' }).expect(200);
    expect((await list(neighbour, reference)).rows).toMatchObject([{ id, withheldReason: null }]);
  });

  it('is for planners alone', async () => {
    const reference = await openCase();
    const id = await write(reference);
    const change = { state: 'published' };
    await neighbour.patch(`/api/comments/${id}`).send(change).expect(401);
    for (const person of ['owner', 'other', 'board', 'administrator'] as const) {
      const agent = await api.signIn(person);
      await agent.patch(`/api/comments/${id}`).send(change).expect(403);
    }
    expect((await list(planner, reference)).rows).toMatchObject([{ state: 'waiting' }]);
  });

  it('finds comments by a word, and takes wildcards for what they are', async () => {
    const reference = await openCase();
    await write(reference);
    expect((await list(planner, reference, { q: 'TOMATO' })).total).toBe(1);
    expect((await list(planner, reference, { q: '%' })).total).toBe(0);
  });
});
