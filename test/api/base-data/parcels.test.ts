import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Parcel } from '../../../api/modules/base-data/parcel.entity.ts';
import { parcelPageSchema } from '../../../shared/contracts/base-data.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { buildSmallCity, rectangle } from '../../support/small-city.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

/** Beside the small city, and named with every sign that a search might take for its own. */
const oddParcel = {
  number: 'X_1%',
  address: `5\\7 O'Dell "Row"`,
  zone: 'A',
  use: 'yard',
  geometry: rectangle(400, 400, 40, 40),
};

let api: TestApi;
let reader: Agent;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  const em = api.orm.em.fork();
  em.create(Parcel, oddParcel);
  await em.flush();
  reader = await api.signIn('public');
});
afterAll(() => api.close());

async function find(query: Record<string, string>, agent = reader) {
  return parcelPageSchema.parse(await bodyOf(agent.get('/api/parcels').query(query).expect(200)));
}

async function numbersOf(query: Record<string, string>): Promise<string[]> {
  return (await find(query)).rows.map(({ number }) => number);
}

/** Where the fields stand that an answer complains of. */
async function pathsRefused(query: Record<string, string | string[]>): Promise<string[]> {
  const body = await bodyOf(reader.get('/api/parcels').query(query).expect(422));
  const problem = problemSchema.parse(body);
  expect(problem.code).toBe('INPUT_INVALID');
  return problem.errors?.map(({ path }) => path) ?? [];
}

/** `lng,lat` of a place x metres east and y metres north of the city's middle. */
function pointAt(x: number, y: number): string {
  return String(rectangle(x, y, 1, 1).coordinates[0]?.[0]);
}

const all = ['E-1', 'N-1', 'N-2', 'P-1', 'S-1', 'W-1', 'X_1%'];

describe('the parcels', () => {
  it('are read by everybody, and by everybody alike', async () => {
    const seen = await find({});
    for (const person of ['owner', 'planner', 'board', 'administrator'] as const) {
      expect(await find({}, await api.signIn(person))).toEqual(seen);
    }
  });

  it('come by number, with the fields and the outline of the register', async () => {
    const { rows, ...page } = await find({});
    expect(rows.map(({ number }) => number)).toEqual(all);
    expect(page).toEqual({ page: 1, pageSize: 50, total: 7 });
    expect(rows[1]).toMatchObject({
      number: 'N-1',
      address: 'N-1 Test Row',
      zone: 'R',
      use: 'dwelling',
      geometry: rectangle(0, 40, 40, 40),
    });
    expect(rows[6]).toMatchObject(oddParcel);
  });

  it('have the area of 40 m by 40 m that they were drawn with', async () => {
    // The ellipsoid's area and the local plane's agree to the rounding of 1e-7 degrees, 1 cm a side.
    for (const { areaM2 } of (await find({})).rows) expect(Math.abs(areaM2 - 1600)).toBeLessThan(1);
  });

  it('are sorted and paged, with the number of all', async () => {
    const page = await find({ sort: '-number', pageSize: '3', page: '2' });
    expect(page.rows.map(({ number }) => number)).toEqual(['P-1', 'N-2', 'N-1']);
    expect(page).toMatchObject({ page: 2, pageSize: 3, total: 7 });
    expect((await numbersOf({ sort: 'zone' }))[0]).toBe('X_1%');
  });

  it.each(['99', '9007199254740991'])('are none on the page %s, after the last', async (page) => {
    const beyond = await find({ page, pageSize: '500' });
    expect(beyond).toEqual({ rows: [], page: Number(page), pageSize: 500, total: 7 });
  });

  it.each([
    ['page', '0'],
    ['page', '-1'],
    ['page', '1.5'],
    ['page', '1e300'],
    ['page', 'two'],
    ['pageSize', '0'],
    ['pageSize', '501'],
    ['pageSize', 'many'],
    ['sort', 'geometry'],
    ['sort', '--number'],
  ])('are refused by the field: %s=%s', async (field, value) => {
    expect(await pathsRefused({ [field]: value })).toEqual([field]);
  });
});

describe('a search of parcels', () => {
  it.each([
    ['a number', 'N-1', ['N-1']],
    ['a number in other letters', 'n-1', ['N-1']],
    ['a part of numbers', 'N-', ['N-1', 'N-2']],
    ['an address', 'E-1 Test Row', ['E-1']],
    ['a part of addresses', 'test ROW', ['E-1', 'N-1', 'N-2', 'P-1', 'S-1', 'W-1']],
    ['a text with spaces around it', '  w-1 ', ['W-1']],
    ['no text', '', all],
    ['spaces alone', '   ', all],
    ['a text that stands nowhere', 'Elm Street', []],
    ['a percent sign', '%', ['X_1%']],
    ['an underscore', '_', ['X_1%']],
    ['a backslash', '\\', ['X_1%']],
    ['a quotation mark', '"', ['X_1%']],
    ['an apostrophe', "o'dell", ['X_1%']],
    ['a piece of SQL', "' or true --", []],
    ['200 letters', 'x'.repeat(200), []],
  ])('by %s', async (_name, q, numbers) => {
    expect(await numbersOf({ q })).toEqual(numbers);
  });

  it.each([
    ['a text of more than 200 letters', 'x'.repeat(201)],
    ['a zero character', 'N-1\0'],
  ])('is refused for %s', async (_name, q) => {
    expect(await pathsRefused({ q })).toEqual(['q']);
  });

  it('is refused where the text comes twice', async () => {
    expect(await pathsRefused({ q: ['N-1', 'N-2'] })).toEqual(['q']);
  });
});

describe('parcels at a point', () => {
  it('are the one around it', async () => {
    expect(await numbersOf({ at: pointAt(20, 60) })).toEqual(['N-1']);
    expect(await numbersOf({ at: pointAt(20, 60).replace(',', ', ') })).toEqual(['N-1']);
  });

  it('are all that meet there on a corner', async () => {
    expect(await numbersOf({ at: pointAt(0, 40) })).toEqual(['N-1', 'S-1', 'W-1']);
  });

  it.each([
    ['the street', pointAt(20, -6)],
    ['the other side of the earth', '88.7,-46.75'],
    ['the pole', '0,90'],
  ])('are none on %s', async (_name, at) => {
    expect(await numbersOf({ at })).toEqual([]);
  });

  it.each([
    '',
    ',',
    '-91.3',
    '-91.3,',
    ',46.75',
    '-91.3,46.75,0',
    'here',
    'NaN,NaN',
    '0x10,10',
    '1e999,46.75',
    '180.1,46.75',
    '-91.3,90.1',
    '-91.3;46.75',
  ])('are refused by the field for “%s”', async (at) => {
    expect(await pathsRefused({ at })).toEqual(['at']);
  });

  it('are asked for in a form that the refusal states', async () => {
    const body = await bodyOf(reader.get('/api/parcels?at=46.75,-91.3').expect(422));
    expect(problemSchema.parse(body).errors?.[0]?.message).toBe(
      'Write longitude and latitude in degrees, for example -91.3,46.75.',
    );
  });
});

describe('parcels by a list of numbers', () => {
  it('are those of the list, the unknown ones left out', async () => {
    expect(await numbersOf({ numbers: 'S-1,nowhere,N-1,N-1' })).toEqual(['N-1', 'S-1']);
    expect(await numbersOf({ numbers: 'n-1' })).toEqual([]);
    expect(await numbersOf({ numbers: '' })).toEqual([]);
  });

  it('are at most 200, each of 40 letters at most', async () => {
    const listOf = (count: number) => Array.from({ length: count }, (_, i) => `Z-${i}`).join(',');
    expect(await numbersOf({ numbers: `${listOf(199)},S-1` })).toEqual(['S-1']);
    expect(await pathsRefused({ numbers: listOf(201) })).toEqual(['numbers']);
    expect(await pathsRefused({ numbers: `S-1,${'x'.repeat(41)}` })).toEqual(['numbers.1']);
  });

  it('meet every other condition as well', async () => {
    expect(await numbersOf({ numbers: 'S-1,N-1,N-2', q: 'n-' })).toEqual(['N-1', 'N-2']);
    expect(await numbersOf({ at: pointAt(0, 40), q: 'w-1' })).toEqual(['W-1']);
    expect(await numbersOf({ at: pointAt(20, 60), numbers: 'S-1' })).toEqual([]);
  });
});
