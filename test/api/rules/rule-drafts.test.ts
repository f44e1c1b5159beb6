import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { RuleVersion } from '../../../api/modules/rules/rule-version.entity.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import {
  ruleVersionListSchema,
  ruleVersionSchema,
  type RuleVersion as VersionDetail,
} from '../../../shared/contracts/rules.ts';
import type { Rule } from '../../../shared/rules/rule-schema.ts';
import { buildSmallCity, smallCityRule } from '../../support/small-city.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let administrator: Agent;
let inForce: VersionDetail;
/** In the small city, by the real clock, which the database has too. */
const today = new Intl.DateTimeFormat('sv-SE', { timeZone: 'America/Chicago' }).format(new Date());
const farDay = '2099-01-01';

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  administrator = await api.signIn('administrator');
  const [first] = await list();
  if (first === undefined) throw new Error('The small city has a rule.');
  inForce = first;
});
afterAll(() => api.close());

async function list(agent = administrator) {
  return ruleVersionListSchema.parse(await bodyOf(agent.get('/api/rules').expect(200))).rows;
}

async function read(id: string): Promise<VersionDetail> {
  return ruleVersionSchema.parse(await bodyOf(administrator.get(`/api/rules/${id}`).expect(200)));
}

async function createDraft(inForceFrom: string | null = null): Promise<VersionDetail> {
  const highest = Math.max(...(await list()).map(({ rule }) => rule.version));
  const rule: Rule = { ...smallCityRule(), version: highest + 1 };
  const body = await bodyOf(
    administrator.post('/api/rules').send({ rule, inForceFrom }).expect(201),
  );
  return ruleVersionSchema.parse(body);
}

const change = ({ id, rule, stamp }: VersionDetail, title: string, agent = administrator) =>
  agent.put(`/api/rules/${id}`).send({ rule: { ...rule, title }, seen: stamp });

const enact = ({ id, stamp }: VersionDetail, inForceFrom: string | null, agent = administrator) =>
  agent.post(`/api/rules/${id}/enactment`).send({ inForceFrom, seen: stamp });

const discard = ({ id, stamp }: VersionDetail, agent = administrator) =>
  agent.delete(`/api/rules/${id}`).query({ seen: stamp });

describe('a draft', () => {
  it('is written anew, and says who wrote it and who changed it', async () => {
    const draft = await createDraft();
    expect(draft).toMatchObject({ created: { by: 'administrator' }, changed: null, enacted: null });
    const changed = await bodyOf(change(draft, 'Another title').expect(200));
    expect(changed).toMatchObject({
      id: draft.id,
      state: 'draft',
      rule: { title: 'Another title', version: draft.rule.version },
      changed: { by: 'administrator' },
    });
    expect(await read(draft.id)).toEqual(changed);
  });

  it('is not written over what somebody else has changed meanwhile', async () => {
    const draft = await createDraft();
    await change(draft, 'The first').expect(200);
    const body = await bodyOf(change(draft, 'The second').expect(409));
    expect(problemSchema.parse(body).code).toBe('RULE_CHANGED_MEANWHILE');
    expect((await read(draft.id)).rule.title).toBe('The first');
    await enact(draft, today).expect(409);
    await discard(draft).expect(409);
  });

  it('keeps its number and the id of the rule', async () => {
    const draft = await createDraft();
    const wrong = { ...draft.rule, id: 'other' };
    const answer = await administrator
      .put(`/api/rules/${draft.id}`)
      .send({ rule: wrong, seen: draft.stamp });
    expect(answer.status).toBe(422);
    expect(problemSchema.parse(answer.body).errors?.map(({ path }) => path)).toEqual(['rule.id']);
  });

  it('is refused where it cannot be judged here, by the field', async () => {
    const draft = await createDraft();
    const [clause] = draft.rule.clauses;
    const rule = {
      ...draft.rule,
      clauses: [{ ...clause, window: { basis: 'civil', from: '00:00', to: '03:00' } }],
    };
    const body = await bodyOf(
      administrator.put(`/api/rules/${draft.id}`).send({ rule, seen: draft.stamp }).expect(422),
    );
    expect(problemSchema.parse(body).errors).toMatchObject([
      { path: 'rule.clauses.0.window', message: expect.stringContaining('2026-12-21') as string },
    ]);
  });

  it('can be thrown away, and is gone then', async () => {
    const draft = await createDraft();
    await discard(draft).expect(204);
    await administrator.get(`/api/rules/${draft.id}`).expect(404);
    await discard(draft).expect(404);
  });

  it('waits for its day, can be changed until then, and can be called back', async () => {
    const draft = await createDraft();
    const waiting = ruleVersionSchema.parse(await bodyOf(enact(draft, farDay).expect(200)));
    expect(waiting).toMatchObject({
      state: 'scheduled',
      inForceFrom: farDay,
      enacted: { by: 'administrator' },
    });
    const changed = ruleVersionSchema.parse(await bodyOf(change(waiting, 'Better').expect(200)));
    expect(changed).toMatchObject({ state: 'scheduled', rule: { title: 'Better' } });
    const back = await bodyOf(enact(changed, null).expect(200));
    expect(back).toMatchObject({ state: 'draft', inForceFrom: null, enacted: null });
  });

  it('does not come into force in the past, or behind a higher number of the same day', async () => {
    const earlier = await createDraft();
    const later = await createDraft('2098-06-01');
    for (const day of ['2020-01-01', '2098-06-01']) {
      const body = await bodyOf(enact(earlier, day).expect(422));
      expect(problemSchema.parse(body).errors?.map(({ path }) => path)).toEqual(['inForceFrom']);
    }
    await discard(later).expect(204);
  });
});

describe('who changes a draft', () => {
  it.each([
    ['public', 401],
    ['owner', 403],
    ['planner', 403],
    ['board', 403],
  ] as const)('is not %s', async (person, status) => {
    const draft = await createDraft();
    const agent = await api.signIn(person);
    await change(draft, 'Mine', agent).expect(status);
    await enact(draft, today, agent).expect(status);
    await discard(draft, agent).expect(status);
    expect(await read(draft.id)).toEqual(draft);
  });

  it('stays unknown to the public', async () => {
    const [seen] = await list(await api.signIn('public'));
    expect(seen).toMatchObject({ created: { by: null } });
  });
});

describe('a version in force', () => {
  it('is never changed, called back or thrown away', async () => {
    for (const request of [change(inForce, 'Mine'), enact(inForce, farDay), discard(inForce)]) {
      const body = await bodyOf(request.expect(409));
      expect(problemSchema.parse(body).code).toBe('RULE_IS_KEPT');
    }
    expect(await read(inForce.id)).toEqual(inForce);
  });

  it('is followed by a draft put in force today, and then stays to be read as it was', async () => {
    const draft = await createDraft();
    const enacted = ruleVersionSchema.parse(await bodyOf(enact(draft, today).expect(200)));
    expect(enacted).toMatchObject({ state: 'in-force', inForceFrom: today });
    expect(await read(inForce.id)).toEqual({ ...inForce, state: 'retired' });
    await change(enacted, 'Too late').expect(409);
    await change({ ...inForce, stamp: inForce.stamp }, 'Too late').expect(409);
  });

  it.each(["update rule_version set rule = '{}'", 'delete from rule_version'])(
    'is kept by the database itself: %s',
    async (sql) => {
      const em = api.orm.em.fork();
      await expect(em.execute(`${sql} where id = ?`, [inForce.id])).rejects.toThrow(
        'never changed',
      );
      expect(await em.count(RuleVersion, { id: inForce.id })).toBe(1);
    },
  );
});
