import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { municipalitySchema } from '../../../shared/contracts/base-data.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { brinewell } from '../../support/brinewell.ts';
import { bodyOf, startTestApi, type TestApi } from '../../support/test-api.ts';

let api: TestApi;

beforeAll(async () => {
  api = await startTestApi();
});
afterAll(() => api.close());

const place = { ...brinewell, studyYear: 2027 };

describe('the place that a server serves', () => {
  it('is missing, in a sentence, until the administrator sets it up', async () => {
    const everybody = await api.signIn('public');
    const problem = problemSchema.parse(
      await bodyOf(everybody.get('/api/municipality').expect(503)),
    );
    expect(problem.title).toBe('The municipality has not been set up yet.');
  });

  it('is set up by nobody but an administrator', async () => {
    const planner = await api.signIn('planner');
    await planner.put('/api/municipality').send(place).expect(403);
    const everybody = await api.signIn('public');
    await everybody.put('/api/municipality').send(place).expect(401);
  });

  it('is refused with the fields named when it makes no sense', async () => {
    const administrator = await api.signIn('administrator');
    const problem = problemSchema.parse(
      await bodyOf(
        administrator
          .put('/api/municipality')
          .send({ ...place, timeZone: 'Brinewell/Time', extent: [-92, 45.1, -92.2, 45.3] })
          .expect(422),
      ),
    );
    expect(problem.errors?.map(({ path }) => path)).toContain('timeZone');
  });

  it('is set up once and then known to everybody', async () => {
    const administrator = await api.signIn('administrator');
    const body = await bodyOf(administrator.put('/api/municipality').send(place).expect(201));
    expect(municipalitySchema.parse(body)).toEqual(place);
    const everybody = await api.signIn('public');
    expect(await bodyOf(everybody.get('/api/municipality').expect(200))).toEqual(place);
    const again = await bodyOf(administrator.put('/api/municipality').send(place).expect(409));
    expect(problemSchema.parse(again).code).toBe('MUNICIPALITY_SET_UP');
  });
});
