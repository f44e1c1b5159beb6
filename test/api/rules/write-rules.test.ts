import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { RuleVersion } from '../../../api/modules/rules/rule-version.entity.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { ruleVersionSchema } from '../../../shared/contracts/rules.ts';
import type { Rule } from '../../../shared/rules/rule-schema.ts';
import { brinewell } from '../../support/brinewell.ts';
import { buildSmallCity, smallCityRule } from '../../support/small-city.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

/** Midnight has gone by in Greenwich; in the small city it is still 1 December. */
const now = '2026-12-02T03:00:00Z';
const today = '2026-12-01';
const yesterday = '2026-11-30';

let api: TestApi;
let administrator: Agent;
/** Versions stay, so each test goes on from the number that it finds. */
let next: number;

beforeAll(async () => {
  // The clock alone: timers and the database go on as ever.
  vi.setSystemTime(now);
  api = await startTestApi();
  await buildSmallCity(api.orm);
  administrator = await api.signIn('administrator');
  next = 2;
});
afterEach(async () => {
  next = (await storedVersions()).length + 1;
});
afterAll(async () => {
  await api.close();
  vi.useRealTimers();
});

async function storedVersions(): Promise<number[]> {
  const rows = await api.orm.em.fork().find(RuleVersion, {}, { orderBy: { version: 'asc' } });
  return rows.map(({ version }) => version);
}

const ruleOf = (version: number): Rule => ({ ...smallCityRule(), version });

const draft = () => ({ rule: ruleOf(next), inForceFrom: null });

const write = (input: object, agent = administrator) => agent.post('/api/rules').send(input);

async function written(input: object) {
  return ruleVersionSchema.parse(await bodyOf(write(input).expect(201)));
}

/** Where the fields stand that a refusal names; nothing may have been written. */
async function pathsRefused(input: object): Promise<string[]> {
  const before = await storedVersions();
  const problem = problemSchema.parse(await bodyOf(write(input).expect(422)));
  expect(problem.code).toBe('INPUT_INVALID');
  expect(await storedVersions()).toEqual(before);
  return problem.errors?.map(({ path }) => path) ?? [];
}

describe('the very first version', () => {
  let emptyApi: TestApi;
  let first: Agent;

  beforeAll(async () => {
    emptyApi = await startTestApi();
    first = await emptyApi.signIn('administrator');
    await first.put('/api/municipality').send(brinewell).expect(201);
  });
  afterAll(() => emptyApi.close());

  it.each([
    ['another number than 1', 'rule.version', { version: 2 }],
    ['an id that the register cannot hold', 'rule.id', { id: 'x'.repeat(101) }],
  ])('is refused for %s, by the field', async (_name, path, change) => {
    const input = { inForceFrom: null, rule: { ...ruleOf(1), ...change } };
    const body = await bodyOf(write(input, first).expect(422));
    expect(problemSchema.parse(body).errors?.map((error) => error.path)).toEqual([path]);
  });

  it('gives the rule its id, which may be as long as the register holds', async () => {
    const id = 'x'.repeat(100);
    const input = { inForceFrom: today, rule: { ...ruleOf(1), id } };
    const body = await bodyOf(write(input, first).expect(201));
    expect(body).toMatchObject({ state: 'in-force', rule: { id, version: 1 } });
  });
});

describe('who writes the rule', () => {
  it.each([
    ['public', 401],
    ['owner', 403],
    ['planner', 403],
    ['board', 403],
  ] as const)('is not %s', async (person, status) => {
    const agent = await api.signIn(person);
    await write(draft(), agent).expect(status);
    // Not even whether the input is right is told.
    await write({}, agent).expect(status);
    expect(await storedVersions()).toEqual([1]);
  });
});

describe('a new version', () => {
  it('is a draft without a day', async () => {
    const version = await written(draft());
    expect(version).toMatchObject({ state: 'draft', inForceFrom: null, rule: ruleOf(2) });
    const body = await bodyOf(administrator.get(`/api/rules/${version.id}`).expect(200));
    expect(body).toEqual(version);
  });

  it('waits for its day, which may be far', async () => {
    const inForceFrom = '2031-02-28';
    const version = await written({ ...draft(), inForceFrom });
    expect(version).toMatchObject({ state: 'scheduled', inForceFrom });
  });

  it('holds at once from today, by the calendar of the municipality', async () => {
    const version = await written({ ...draft(), inForceFrom: today });
    expect(version).toMatchObject({ state: 'in-force', inForceFrom: today });
    const body = await bodyOf((await api.signIn('public')).get('/api/rules').expect(200));
    expect(body).toMatchObject({ rows: [{ id: version.id }, { state: 'retired' }] });
  });

  it('is stored complete, with its defaults filled in', async () => {
    const { bands: _bands, citation: _citation, ...short } = ruleOf(next);
    const clauses = short.clauses.map(
      ({ disregard: _disregard, weight: _weight, minimumAltitude: _altitude, ...clause }) => clause,
    );
    const version = await written({ ...draft(), rule: { ...short, clauses } });
    expect(version.rule).toEqual({ ...ruleOf(next), citation: '' });
    const stored = await api.orm.em.fork().findOneOrFail(RuleVersion, version.id);
    expect(stored.rule).toEqual(version.rule);
  });
});

describe('a version that is not right', () => {
  const fallingBands = [
    { upTo: 0.5, label: 'most' },
    { upTo: 0.2, label: 'some' },
  ];

  it.each<[string, string[], () => object]>([
    ['nothing at all', ['rule', 'inForceFrom'], () => ({})],
    ['no rule', ['rule'], () => ({ inForceFrom: null })],
    ['no word about the day', ['inForceFrom'], () => ({ rule: ruleOf(next) })],
    ['an unknown field', ['state'], () => ({ ...draft(), state: 'in-force' })],
    ['a number that is taken', ['rule.version'], () => ({ ...draft(), rule: ruleOf(next - 1) })],
    ['a number left out', ['rule.version'], () => ({ ...draft(), rule: ruleOf(next + 1) })],
    ['another id', ['rule.id'], () => ({ ...draft(), rule: { ...ruleOf(next), id: 'other' } })],
    ['yesterday', ['inForceFrom'], () => ({ ...draft(), inForceFrom: yesterday })],
    ['a day that is none', ['inForceFrom'], () => ({ ...draft(), inForceFrom: '2027-02-29' })],
    ['a time of day', ['inForceFrom'], () => ({ ...draft(), inForceFrom: '2027-02-28T00:00Z' })],
    [
      'a title of spaces',
      ['rule.title'],
      () => ({ ...draft(), rule: { ...ruleOf(next), title: ' ' } }),
    ],
    [
      'a zero character',
      ['rule.title'],
      () => ({ ...draft(), rule: { ...ruleOf(next), title: 'a\0b' } }),
    ],
    ['no clause', ['rule.clauses'], () => ({ ...draft(), rule: { ...ruleOf(next), clauses: [] } })],
    [
      'bands that fall',
      ['rule.bands'],
      () => ({ ...draft(), rule: { ...ruleOf(next), bands: fallingBands } }),
    ],
  ])('is refused for %s, by the field, and nothing is written', async (_name, paths, input) => {
    expect(await pathsRefused(input())).toEqual(paths);
  });

  it.each<[string, string, object]>([
    ['an unknown field', 'colour', { colour: 'red' }],
    ['no letters', 'id', { id: '' }],
    ['no receptors', 'receptors.classes', { receptors: { classes: [] } }],
    ['an unknown receptor', 'receptors.classes.0', { receptors: { classes: ['shed'] } }],
    ['no days', 'days', { days: [] }],
    ['a day that never comes', 'days.0.date', { days: [{ date: '02-30' }] }],
    ['a window without a clock', 'window.basis', { window: { from: '10:00', to: '14:00' } }],
    [
      'a window that ends before it begins',
      'window.to',
      { window: { basis: 'civil', from: '14:00', to: '10:00' } },
    ],
    [
      'a time that no clock shows',
      'window.to',
      { window: { basis: 'civil', from: '10:00', to: '24:00' } },
    ],
    [
      'a step longer than the window',
      'step',
      { window: { basis: 'civil', from: '10:00', to: '10:30' }, step: 60 },
    ],
    ['a step of nothing', 'step', { step: 0 }],
    ['an unknown measure', 'measure.kind', { measure: { kind: 'warmth' } }],
    ['a limit without a figure', 'limit', { limit: { atLeast: '2' } }],
    ['no weight', 'weight', { weight: 0 }],
  ])('is refused for a clause with %s, by its field', async (_name, path, change) => {
    const rule = ruleOf(next);
    const clauses = [
      { ...rule.clauses[0], id: 'first' },
      { ...rule.clauses[0], ...change },
    ];
    const paths = await pathsRefused({ ...draft(), rule: { ...rule, clauses } });
    expect(paths).toEqual([`rule.clauses.1.${path}`]);
  });

  it('is refused for two clauses of one name, at the second', async () => {
    const rule = ruleOf(next);
    const clauses = [rule.clauses[0], rule.clauses[0]];
    expect(await pathsRefused({ ...draft(), rule: { ...rule, clauses } })).toEqual([
      'rule.clauses.1.id',
    ]);
  });
});

describe('a version that is sent twice', () => {
  it('is written once under one key, with the same answer', async () => {
    const input = draft();
    const send = () => write(input).set('Idempotency-Key', 'rule-sent-twice');
    const first = await bodyOf(send().expect(201));
    expect(await bodyOf(send().expect(201))).toEqual(first);
    expect(await storedVersions()).toHaveLength(input.rule.version);
    const other = { ...input, inForceFrom: today };
    await write(other).set('Idempotency-Key', 'rule-sent-twice').expect(409);
  });

  it('may be corrected under the key of the refused one', async () => {
    const key = 'rule-put-right';
    const wrong = { ...draft(), inForceFrom: yesterday };
    await write(wrong).set('Idempotency-Key', key).expect(422);
    await write(draft()).set('Idempotency-Key', key).expect(201);
  });

  it('is written by one of several who send at once, and the others learn why', async () => {
    const input = draft();
    const answers = await Promise.all(
      Array.from({ length: 5 }, (_, index) =>
        // Some with a key, whose transaction is around the write.
        index % 2 === 0 ? write(input) : write(input).set('Idempotency-Key', `at-once-${index}`),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 422, 422, 422, 422]);
    for (const { body } of answers.filter(({ status }) => status === 422)) {
      expect(body).toMatchObject({ errors: [{ path: 'rule.version' }] });
    }
    expect(await storedVersions()).toHaveLength(input.rule.version);
  });
});

describe('a version that is written', () => {
  it.each(['update rule_version set in_force_from = null', 'delete from rule_version'])(
    'stays as it is, also in the database: %s',
    async (sql) => {
      await expect(api.orm.em.fork().execute(sql)).rejects.toThrow('never changed');
    },
  );
});
