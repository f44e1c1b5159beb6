import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ReviewCase } from '../../../api/modules/cases/review-case.entity.ts';
import { caseStates, type CaseState } from '../../../shared/contracts/case-life.ts';
import { caseDetailSchema, casePageSchema } from '../../../shared/contracts/cases.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { buildSmallCity, tower } from '../../support/small-city.ts';
import {
  bodyOf,
  startTestApi,
  type Agent,
  type TestApi,
  type TestPerson,
} from '../../support/test-api.ts';

let api: TestApi;
let owner: Agent;
let planner: Agent;
let neighbour: Agent;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  owner = await api.signIn('owner');
  planner = await api.signIn('planner');
  neighbour = await api.signIn('public');
});
afterAll(() => api.close());

const application = {
  title: 'A house with a tower',
  description: 'Two storeys and a tower.',
  siteParcels: ['S-1'],
};

async function readCase(agent: Agent, reference: string) {
  return caseDetailSchema.parse(await bodyOf(agent.get(`/api/cases/${reference}`).expect(200)));
}

async function listCases(agent: Agent, query = {}) {
  return casePageSchema.parse(await bodyOf(agent.get('/api/cases').query(query).expect(200)));
}

function countCases(): Promise<number> {
  return api.orm.em.fork().count(ReviewCase);
}

async function problemOf(request: PromiseLike<{ body: unknown }>) {
  return problemSchema.parse(await bodyOf(request));
}

describe('starting an application', () => {
  it('makes a draft with a key, no number, and the site’s address', async () => {
    const body = await bodyOf(owner.post('/api/cases').send(application).expect(201));
    const reviewCase = caseDetailSchema.parse(body);
    expect(reviewCase).toMatchObject({
      number: null,
      state: 'draft',
      title: application.title,
      address: 'S-1 Test Row',
      siteParcels: [{ number: 'S-1', address: 'S-1 Test Row' }],
      latestRevision: null,
      history: [],
    });
    expect(reviewCase.reference).toMatch(/^draft-[0-9a-f]{16}$/);
    expect(await readCase(owner, reviewCase.reference)).toEqual(reviewCase);
  });

  it('unites the parcels of the site and lists each once', async () => {
    const siteParcels = ['S-1', 'N-1', 'S-1'];
    const body = await bodyOf(
      owner
        .post('/api/cases')
        .send({ ...application, siteParcels })
        .expect(201),
    );
    const reviewCase = caseDetailSchema.parse(body);
    expect(reviewCase.siteParcels.map(({ number }) => number)).toEqual(['S-1', 'N-1']);
    expect(reviewCase.address).toBe('S-1 Test Row, N-1 Test Row');
    expect(reviewCase.site?.type).toBe('Polygon');
  });

  it('is for applicants alone', async () => {
    const before = await countCases();
    await neighbour.post('/api/cases').send(application).expect(401);
    for (const person of ['planner', 'board', 'administrator'] as const) {
      await (await api.signIn(person)).post('/api/cases').send(application).expect(403);
    }
    expect(await countCases()).toBe(before);
  });

  it('names every field that is wrong at once', async () => {
    const before = await countCases();
    const { code, errors } = await problemOf(
      owner
        .post('/api/cases')
        .send({ title: 'x', description: 5, siteParcels: ['', 7], state: 'approved' })
        .expect(422),
    );
    expect(code).toBe('INPUT_INVALID');
    expect(errors?.map(({ path }) => path).sort()).toEqual([
      'description',
      'siteParcels.0',
      'siteParcels.1',
      'state',
      'title',
    ]);
    expect(await countCases()).toBe(before);
  });

  it.each([
    ['the zero character', 'A house\0'],
    ['half a surrogate pair', 'A house \ud83c'],
  ])('refuses %s, which the database does not keep', async (_name, title) => {
    const { errors } = await problemOf(
      owner
        .post('/api/cases')
        .set('Idempotency-Key', 'not-kept-either')
        .send({ ...application, title })
        .expect(422),
    );
    expect(errors?.map(({ path }) => path)).toEqual(['title']);
    await neighbour.get('/api/cases').query({ q: 'A house\0' }).expect(422);
  });

  it('keeps signs beyond the basic plane', async () => {
    const title = 'A house with a roof garden 🌻 – größer';
    const body = await bodyOf(
      owner
        .post('/api/cases')
        .send({ ...application, title })
        .expect(201),
    );
    expect((await readCase(owner, caseDetailSchema.parse(body).reference)).title).toBe(title);
  });

  it('names every parcel that the register does not have', async () => {
    const before = await countCases();
    const { errors } = await problemOf(
      owner
        .post('/api/cases')
        .send({ ...application, siteParcels: ['X-9', 'S-1', 'X-8'] })
        .expect(422),
    );
    expect(errors).toEqual([
      { path: 'siteParcels.0', message: 'There is no parcel X-9.' },
      { path: 'siteParcels.2', message: 'There is no parcel X-8.' },
    ]);
    expect(await countCases()).toBe(before);
  });

  it('has its effect once when it is sent twice at the same time with one Idempotency-Key', async () => {
    const before = await countCases();
    const send = () =>
      owner.post('/api/cases').set('Idempotency-Key', 'one-draft-only').send(application);
    const answers = await Promise.all([send(), send(), send()]);
    expect(answers.map(({ status }) => status)).toEqual([201, 201, 201]);
    expect(new Set(answers.map(({ body }) => caseDetailSchema.parse(body).reference)).size).toBe(1);
    expect(await countCases()).toBe(before + 1);
  });

  it('gives a key back when the write failed', async () => {
    const send = (siteParcels: string[]) =>
      owner
        .post('/api/cases')
        .set('Idempotency-Key', 'second-try-is-fine')
        .send({ ...application, siteParcels });
    await send(['X-9']).expect(422);
    await send(['S-1']).expect(201);
  });

  it('takes the same key of another person for another one', async () => {
    const send = (agent: Agent) =>
      agent.post('/api/cases').set('Idempotency-Key', 'shared-by-chance').send(application);
    const first = caseDetailSchema.parse(await bodyOf(send(owner).expect(201)));
    const other = await api.signIn('other');
    const second = caseDetailSchema.parse(await bodyOf(send(other).expect(201)));
    expect(second.reference).not.toBe(first.reference);
    expect(second.applicantName).toBe('other');
  });
});

describe('changing an application', () => {
  it('keeps what is left out', async () => {
    const { reference } = await api.createCase('draft');
    const before = await readCase(owner, reference);
    await owner.patch(`/api/cases/${reference}`).send({ title: 'Another name' }).expect(200);
    expect(await readCase(owner, reference)).toEqual({ ...before, title: 'Another name' });
  });

  it('changes nothing when one field is wrong', async () => {
    const { reference } = await api.createCase('draft');
    const before = await readCase(owner, reference);
    await owner
      .patch(`/api/cases/${reference}`)
      .send({ title: 'Another name', siteParcels: ['N-1', 'X-9'] })
      .expect(422);
    expect(await readCase(owner, reference)).toEqual(before);
  });

  it.each(caseStates.filter((state) => state !== 'draft' && state !== 'sent-back'))(
    'is refused in the state %s',
    async (state) => {
      const { reference } = await api.createCase(state);
      const { code } = await problemOf(
        owner.patch(`/api/cases/${reference}`).send({ title: 'Another name' }).expect(403),
      );
      expect(code).toBe('FORBIDDEN');
    },
  );

  it('asks for the massing anew once the site is another one', async () => {
    const { reference } = await api.createCase('draft');
    const upload = () =>
      owner.post(`/api/cases/${reference}/massings`).attach('file', tower, 'tower.geojson');
    await upload().expect(201);
    await owner
      .patch(`/api/cases/${reference}`)
      .send({ siteParcels: ['S-1', 'N-1'] })
      .expect(200);
    const submit = () =>
      owner.post(`/api/cases/${reference}/transitions`).send({ to: 'submitted' });
    const { code, title } = await problemOf(submit().expect(409));
    expect(code).toBe('MASSING_UNSOUND');
    expect(title).toContain('The site has changed');
    await upload().expect(201);
    await submit().expect(200);
  });
});

describe('a case', () => {
  const statuses: [CaseState, Record<TestPerson | 'public', number>][] = (
    [
      ['draft', [404, 404, 404, 200, 404, 404]],
      ['submitted', [404, 404, 404, 200, 200, 200]],
      ['sent-back', [404, 404, 404, 200, 200, 200]],
      ['under-review', [404, 404, 404, 200, 200, 200]],
      ['withdrawn', [404, 404, 404, 200, 200, 200]],
      ['open-for-comment', [200, 200, 200, 200, 200, 200]],
      ['approved', [200, 200, 200, 200, 200, 200]],
    ] as const
  ).map(([state, [everybody, other, board, owns, plans, administers]]) => [
    state,
    {
      public: everybody,
      other,
      board,
      owner: owns,
      planner: plans,
      administrator: administers,
    },
  ]);

  it.each(statuses)(
    'in the state %s is there for those who may see it alone',
    async (state, expected) => {
      const { reference } = await api.createCase(state);
      const answers: Record<string, number> = {};
      for (const person of [
        'public',
        'other',
        'board',
        'owner',
        'planner',
        'administrator',
      ] as const) {
        const agent = await api.signIn(person);
        answers[person] = (await agent.get(`/api/cases/${reference}`)).status;
      }
      expect(answers).toEqual(expected);
    },
  );

  it('that a stranger may not see is answered as one that does not exist', async () => {
    const { reference } = await api.createCase('under-review');
    const hidden = await problemOf(neighbour.get(`/api/cases/${reference}`).expect(404));
    const missing = await problemOf(neighbour.get('/api/cases/2026-9999').expect(404));
    expect({ ...hidden, requestId: '' }).toEqual({ ...missing, requestId: '' });
  });

  it('that a stranger may not see is not there for their writes either', async () => {
    const { reference } = await api.createCase('draft');
    const other = await api.signIn('other');
    const path = `/api/cases/${reference}`;
    await other.patch(path).send({ title: 'Mine now' }).expect(404);
    await other.post(`${path}/transitions`).send({ to: 'withdrawn', reason: 'Mine' }).expect(404);
    await planner.post(`${path}/transitions`).send({ to: 'withdrawn', reason: 'No' }).expect(404);
    expect((await readCase(owner, reference)).state).toBe('draft');
  });

  it.each(['1', '2026-1', 'draft-', '2026-0001;drop', "2026-0001'"])(
    'is not there under %s',
    async (reference) => {
      await neighbour.get(`/api/cases/${encodeURIComponent(reference)}`).expect(404);
    },
  );

  it('keeps from the public what was written before it was published', async () => {
    const { id, reference } = await api.createCase('submitted');
    await planner
      .post(`/api/cases/${reference}/transitions`)
      .send({ to: 'sent-back', reason: 'The lift tower is missing.', dueDate: '2026-12-24' })
      .expect(200);
    expect((await readCase(owner, reference)).correction).toEqual({
      reason: 'The lift tower is missing.',
      dueDate: '2026-12-24',
    });
    await api.setState(id, 'open-for-comment');
    const seen = await neighbour.get(`/api/cases/${reference}`).expect(200);
    expect(seen.text).not.toContain('lift tower');
    for (const person of ['other', 'public'] as const) {
      const { history } = await readCase(await api.signIn(person), reference);
      expect(history).toMatchObject([{ from: 'submitted', to: 'sent-back', reason: null }]);
    }
    expect((await readCase(owner, reference)).history[0]?.reason).toContain('lift tower');
  });

  it('says who applies by name, never by e-mail address', async () => {
    const { reference } = await api.createCase('open-for-comment');
    const seen = await neighbour.get(`/api/cases/${reference}`).expect(200);
    expect(seen.text).not.toContain('@');
  });
});

describe('a list of cases', () => {
  it('shows the public what is public and nothing else', async () => {
    const hidden = ['draft', 'submitted', 'sent-back', 'complete', 'under-review', 'withdrawn'];
    for (const state of caseStates) await api.createCase(state);
    const { rows, total } = await listCases(neighbour, { pageSize: 500 });
    expect(rows).toHaveLength(total);
    expect(rows.filter(({ state }) => hidden.includes(state))).toEqual([]);
    const states = new Set(rows.map(({ state }) => state));
    expect(states.size).toBe(caseStates.length - hidden.length);
  });

  it('shows an applicant their own, in every state', async () => {
    const { rows } = await listCases(owner, { view: 'mine', pageSize: 500 });
    expect(new Set(rows.map(({ state }) => state)).size).toBe(caseStates.length);
    expect(new Set(rows.map(({ applicantName }) => applicantName))).toEqual(new Set(['owner']));
  });

  it('shows staff all that has been sent in, and no draft', async () => {
    const { rows } = await listCases(planner, { view: 'desk', pageSize: 500 });
    const states = new Set(rows.map(({ state }) => state));
    expect(states.has('draft')).toBe(false);
    expect(states.size).toBe(caseStates.length - 1);
  });

  it('shows the board on its desk no more than the public', async () => {
    const board = await api.signIn('board');
    const desk = await listCases(board, { view: 'desk', pageSize: 500 });
    expect(desk.total).toBe((await listCases(neighbour, { pageSize: 500 })).total);
  });

  it('asks those who have a view of their own to sign in', async () => {
    await neighbour.get('/api/cases?view=mine').expect(401);
    await neighbour.get('/api/cases?view=desk').expect(401);
    await owner.get('/api/cases?view=desk').expect(403);
  });

  it('does not show a hidden case to a search for it', async () => {
    const { reference } = await api.createCase('submitted');
    expect((await listCases(neighbour, { q: reference })).rows).toEqual([]);
    expect((await listCases(neighbour, { state: 'submitted' })).rows).toEqual([]);
    expect((await listCases(planner, { view: 'desk', q: reference })).total).toBe(1);
  });

  it('finds a case by number, title, address and parcel, and takes wildcards for what they are', async () => {
    const { id, reference } = await api.createCase('approved');
    await api.orm.em
      .fork()
      .nativeUpdate(
        ReviewCase,
        { id },
        { title: '100% sun', address: '7 Nowhere Lane', siteParcels: ['Z-77'] },
      );
    for (const q of [reference, '100% SUN', 'nowhere', 'Z-77']) {
      const { rows } = await listCases(neighbour, { q });
      expect(rows.map((row) => row.reference)).toEqual([reference]);
    }
    expect((await listCases(neighbour, { q: '100_ sun' })).total).toBe(0);
  });

  it('comes in pages that hold every case once', async () => {
    const all = await listCases(planner, { view: 'desk', pageSize: 500, sort: 'title' });
    const pages = [];
    for (let page = 1; page <= Math.ceil(all.total / 7); page += 1) {
      pages.push(await listCases(planner, { view: 'desk', pageSize: 7, page, sort: 'title' }));
    }
    expect(pages.flatMap(({ rows }) => rows)).toEqual(all.rows);
    expect(pages.map(({ total }) => total)).toEqual(pages.map(() => all.total));
    const beyond = await listCases(planner, { view: 'desk', pageSize: 7, page: 1000 });
    expect(beyond).toMatchObject({ rows: [], total: all.total });
  });

  it('is sorted by a field in both directions, and says by which it can be', async () => {
    const numbers = async (sort: string) =>
      (await listCases(planner, { view: 'desk', pageSize: 500, sort })).rows.map(
        ({ number }) => number,
      );
    const ascending = await numbers('number');
    expect(ascending).toEqual([...ascending].sort());
    expect(await numbers('-number')).toEqual([...ascending].reverse());
    const { errors } = await problemOf(neighbour.get('/api/cases?sort=password').expect(422));
    expect(errors?.[0]).toMatchObject({ path: 'sort' });
    expect(errors?.[0]?.message).toContain('stateSince');
  });

  it('names every part of the query that is wrong', async () => {
    const { errors } = await problemOf(
      neighbour.get('/api/cases?page=0&pageSize=501&state=lost&view=all').expect(422),
    );
    expect(errors?.map(({ path }) => path).sort()).toEqual(['page', 'pageSize', 'state', 'view']);
  });
});
