import { afterAll, afterEach, beforeAll, expect, it } from 'vitest';
import { studyProgressSchema } from '../../../shared/contracts/studies.ts';
import { buildSmallCity, smallCityRule } from '../../support/small-city.ts';
import {
  createReviewedCase,
  endWorker,
  hasEnded,
  readStudy,
  requestStudy,
  spawnWorker,
  startTestWorker,
  waitForStudy,
} from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let planner: Agent;

beforeAll(async () => {
  api = await startTestApi();
  // Every minute of four hours on 120 days: seconds of work, enough to break into.
  await buildSmallCity(
    api.orm,
    smallCityRule({ step: 1, days: [{ from: '11-01', to: '02-28', everyDays: 1 }] }),
  );
  planner = await api.signIn('planner');
});
// What a test leaves under way must not keep the next one's worker busy.
afterEach(async () => {
  await api.orm.em
    .fork()
    .execute(`update study set status = 'cancelled' where status in ('queued', 'running')`);
});
afterAll(() => api.close());

const isUnderWay = ({ status, instantsDone }: { status: string; instantsDone: number }) =>
  status === 'running' && instantsDone > 0;

it(
  'a running study shows its progress to other processes, as numbers and as events',
  { timeout: 120_000 },
  async () => {
    const { reference } = await createReviewedCase(api);
    const { id } = await requestStudy(planner, reference);
    const events = planner
      .get(`/api/studies/${id}/events`)
      .buffer(true)
      .then(({ text }) => text);
    const worker = spawnWorker(api);
    await waitForStudy(planner, id, isUnderWay);
    const told = (await events)
      .split('\n\n')
      .filter((event) => event.startsWith('event: progress'))
      .map((event) => studyProgressSchema.parse(JSON.parse(event.split('data: ')[1] ?? '')));
    await endWorker(worker, 'SIGTERM');
    const { instantsTotal } = await readStudy(planner, id);
    // Every minute from 10:00 to 14:00 on 120 days, and the hours of the key dates beside them.
    expect(instantsTotal).toBeGreaterThan(120 * 241);
    expect(told[0]).toEqual({ status: 'queued', instantsDone: 0, instantsTotal: 0 });
    expect(told.some(isUnderWay)).toBe(true);
    expect(told.at(-1)).toEqual({
      status: 'finished',
      instantsDone: instantsTotal,
      instantsTotal,
    });
  },
);

it('a study that is cancelled stops and stores no result', { timeout: 120_000 }, async () => {
  const { reference } = await createReviewedCase(api);
  const { id } = await requestStudy(planner, reference);
  const worker = spawnWorker(api);
  await waitForStudy(planner, id, isUnderWay);
  const body = await bodyOf(planner.post(`/api/studies/${id}/cancel`).expect(200));
  expect(body).toMatchObject({ status: 'cancelled' });
  // Told to stop, the worker goes when it has let go of the study.
  await endWorker(worker, 'SIGTERM');
  const study = await readStudy(planner, id);
  expect(study).toMatchObject({ status: 'cancelled', digest: null, findings: null });
  expect(study.instantsDone).toBeLessThan(study.instantsTotal);
});

it(
  'a study is finished by another worker when the first is killed in the middle',
  { timeout: 120_000 },
  async () => {
    const { reference } = await createReviewedCase(api);
    const { id } = await requestStudy(planner, reference);
    const killed = spawnWorker(api);
    await waitForStudy(planner, id, isUnderWay);
    await endWorker(killed, 'SIGKILL');
    expect(await readStudy(planner, id)).toMatchObject({ status: 'running' });
    // The time after which a silent run is taken for dead.
    await api.orm.em
      .fork()
      .execute(`update study set heartbeat_at = now() - interval '1 minute' where id = ?`, [id]);
    const worker = await startTestWorker(api);
    const study = await waitForStudy(planner, id, hasEnded);
    await worker.stop();
    expect(study).toMatchObject({ status: 'finished', failure: null });
  },
);

it(
  'a study is handed back by a worker that is told to stop, and finished by the next',
  { timeout: 120_000 },
  async () => {
    const { reference } = await createReviewedCase(api);
    const { id } = await requestStudy(planner, reference);
    const stopped = spawnWorker(api);
    await waitForStudy(planner, id, isUnderWay);
    expect(await endWorker(stopped, 'SIGTERM')).toBe(0);
    expect(await readStudy(planner, id)).toMatchObject({ status: 'queued' });
    const worker = await startTestWorker(api);
    const study = await waitForStudy(planner, id, hasEnded);
    await worker.stop();
    expect(study).toMatchObject({ status: 'finished', failure: null });
  },
);
