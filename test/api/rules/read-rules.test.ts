import { randomUUID } from 'node:crypto';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { RuleVersion } from '../../../api/modules/rules/rule-version.entity.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { ruleVersionListSchema, ruleVersionSchema } from '../../../shared/contracts/rules.ts';
import { ruleSchema } from '../../../shared/rules/rule-schema.ts';
import { brinewell } from '../../support/brinewell.ts';
import { buildSmallCity, smallCityRule } from '../../support/small-city.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

/** The first and the last second of 1 December in the small city, six hours behind Greenwich. */
const dayBegins = '2026-12-01T06:00:00Z';
const dayEnds = '2026-12-02T05:59:59Z';

let api: TestApi;

beforeEach(async () => {
  // The clock alone: timers and the database go on as ever.
  vi.setSystemTime(dayBegins);
  api = await startTestApi();
});
afterEach(async () => {
  await api.close();
  vi.useRealTimers();
});

/** Versions 2, 3, … of the small city's rule, in force from these days. */
async function addVersions(...days: (string | null)[]): Promise<string[]> {
  const em = api.orm.em.fork();
  const versions = days.map((inForceFrom, index) => {
    const rule = { ...smallCityRule(), version: index + 2 };
    return em.create(RuleVersion, { ruleId: rule.id, version: rule.version, inForceFrom, rule });
  });
  await em.flush();
  return versions.map(({ id }) => id);
}

async function list(agent: Agent) {
  return ruleVersionListSchema.parse(await bodyOf(agent.get('/api/rules').expect(200))).rows;
}

/** `version state` of each row. */
async function statesFor(agent: Agent): Promise<string[]> {
  return (await list(agent)).map(({ rule, state }) => `${rule.version} ${state}`);
}

describe('the rule in force', () => {
  it('is read by everybody, complete with what its author left out', async () => {
    await buildSmallCity(api.orm);
    const [row] = await list(await api.signIn('public'));
    expect(row).toMatchObject({ state: 'in-force', inForceFrom: '2026-01-01' });
    // The defaults of the schema, written out by hand.
    expect(row?.rule).toMatchObject({
      id: 'solar-access',
      version: 1,
      citation: 'Zoning Code 18.42',
      clauses: [
        {
          id: 'winter-noon-hours',
          receptors: { classes: ['parcel', 'open-space'], of: 'open' },
          minimumAltitude: 0,
          disregard: { minutes: 0, area: 1 },
          weight: 1,
        },
      ],
      bands: [
        { upTo: 0.1, label: 'negligible' },
        { upTo: 0.2, label: 'minor' },
        { upTo: 0.4, label: 'moderate' },
        { upTo: 1, label: 'substantial' },
      ],
    });
    expect(ruleSchema.parse(row?.rule)).toEqual(row?.rule);
  });

  it('changes at midnight of the municipality, and the one before stays to be read', async () => {
    await buildSmallCity(api.orm);
    await addVersions('2026-12-02');
    const reader = await api.signIn('public');
    vi.setSystemTime(dayEnds);
    expect(await statesFor(reader)).toEqual(['1 in-force']);
    vi.setSystemTime('2026-12-02T06:00:00Z');
    expect(await statesFor(reader)).toEqual(['2 in-force', '1 retired']);
  });

  it('is the one whose day came last, whatever its number', async () => {
    await buildSmallCity(api.orm);
    await addVersions('2026-11-20', '2026-11-10');
    expect(await statesFor(await api.signIn('public'))).toEqual([
      '3 retired',
      '2 in-force',
      '1 retired',
    ]);
  });

  it('is the higher number of two with the same day', async () => {
    await buildSmallCity(api.orm);
    await addVersions('2026-12-01', '2026-12-01');
    expect(await statesFor(await api.signIn('public'))).toEqual([
      '3 in-force',
      '2 retired',
      '1 retired',
    ]);
  });

  it('is none where none is written', async () => {
    const administrator = await api.signIn('administrator');
    await administrator.put('/api/municipality').send(brinewell).expect(201);
    expect(await list(administrator)).toEqual([]);
  });

  it('is not known before the municipality is, whose day counts', async () => {
    const body = await bodyOf((await api.signIn('public')).get('/api/rules').expect(503));
    expect(problemSchema.parse(body).title).toBe('The municipality has not been set up yet.');
  });
});

describe('a version that is not in force yet', () => {
  it.each([
    ['public', false],
    ['owner', false],
    ['board', false],
    ['planner', true],
    ['administrator', true],
  ] as const)('is shown to %s: %s', async (reader, isShown) => {
    await buildSmallCity(api.orm);
    const ids = await addVersions(null, '2026-12-02');
    const agent = await api.signIn(reader);
    expect(await statesFor(agent)).toEqual(
      isShown ? ['3 scheduled', '2 draft', '1 in-force'] : ['1 in-force'],
    );
    for (const id of ids) await agent.get(`/api/rules/${id}`).expect(isShown ? 200 : 404);
  });

  it('stays a draft for ever without a day', async () => {
    await buildSmallCity(api.orm);
    await addVersions(null);
    const planner = await api.signIn('planner');
    vi.setSystemTime('2026-12-12T12:00:00Z');
    expect(await statesFor(planner)).toEqual(['2 draft', '1 in-force']);
  });
});

describe('one version', () => {
  beforeEach(() => buildSmallCity(api.orm));

  it('is the same alone as in the list', async () => {
    await addVersions('2026-11-10', null);
    const planner = await api.signIn('planner');
    const rows = await list(planner);
    expect(rows).toHaveLength(3);
    for (const row of rows) {
      const body = await bodyOf(planner.get(`/api/rules/${row.id}`).expect(200));
      expect(ruleVersionSchema.parse(body)).toEqual(row);
    }
  });

  it('is open to everybody once it is retired', async () => {
    await addVersions('2026-11-10');
    const reader = await api.signIn('public');
    const retired = (await list(reader))[1];
    expect(await bodyOf(reader.get(`/api/rules/${retired?.id}`).expect(200))).toMatchObject({
      state: 'retired',
      rule: { version: 1 },
    });
  });

  it.each([randomUUID(), '1', 'solar-access', "'"])('is not found as %s', async (id) => {
    await (await api.signIn('planner')).get(`/api/rules/${id}`).expect(404);
  });
});
