import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { requestStudy as requestStudyInside } from '../../../api/modules/studies/request-study.ts';
import { runStudy } from '../../../api/modules/studies/run-study.ts';
import { saveStudyResults } from '../../../api/modules/studies/save-study-results.ts';
import {
  claimStudy,
  failStudy,
  reportProgress,
  requeueDeadStudies,
} from '../../../api/modules/studies/study-run.ts';
import { Study } from '../../../api/modules/studies/study.entity.ts';
import { evidenceFileSchema, type EvidenceFile } from '../../../shared/study/evidence-schema.ts';
import { buildSmallCity, massingFile } from '../../support/small-city.ts';
import { createReviewedCase, readStudy, requestStudy } from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let planner: Agent;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  planner = await api.signIn('planner');
});
afterAll(() => api.close());

async function run(studyId: string): Promise<void> {
  const { orm, queue, clipper, logger } = api.deps;
  const stopping = new AbortController().signal;
  await runStudy(studyId, { orm, queue, clipper, logger, stopping });
}

/** As if the study's run had shown no life for a minute. */
async function passTime(studyId: string): Promise<void> {
  await api.orm.em
    .fork()
    .execute(`update study set heartbeat_at = now() - interval '1 minute' where id = ?`, [studyId]);
}

async function readEvidenceOf(studyId: string): Promise<EvidenceFile> {
  const body = await bodyOf(planner.get(`/api/studies/${studyId}/evidence`).expect(200));
  return evidenceFileSchema.parse(body);
}

async function waitingJobs(): Promise<number> {
  return api.deps.queue.getQueueSize('run-study');
}

describe('requesting a study', () => {
  it('queues one job with it, and refuses a second while the first waits', async () => {
    const before = await waitingJobs();
    const { reference } = await createReviewedCase(api);
    const study = await requestStudy(planner, reference);
    expect(study).toMatchObject({ status: 'queued', revision: 1, year: 2026, findings: null });
    expect(study.rule.clauses[0]?.days).toHaveLength(1);
    expect(await waitingJobs()).toBe(before + 1);
    const body = await bodyOf(planner.post(`/api/cases/${reference}/studies`).expect(409));
    expect(body).toMatchObject({ code: 'STUDY_RUNNING' });
    await planner.post(`/api/studies/${study.id}/cancel`).expect(200);
    await requestStudy(planner, reference);
  });

  it('makes one study of two requests that come at once', async () => {
    const { reference } = await createReviewedCase(api);
    const send = () => planner.post(`/api/cases/${reference}/studies`);
    const [one, other] = await Promise.all([send(), send()]);
    expect([one.status, other.status].sort()).toEqual([202, 409]);
  });

  it('is refused without a massing, and with one that has errors', async () => {
    const bare = await api.createCase('under-review');
    const missing = await bodyOf(planner.post(`/api/cases/${bare.reference}/studies`).expect(409));
    expect(missing).toMatchObject({ code: 'MASSING_MISSING' });
    const outside = massingFile([{ id: 'far', top: 9, at: [-35, 5, 10, 10] }]);
    const { reference } = await createReviewedCase(api, outside);
    const unsound = await bodyOf(planner.post(`/api/cases/${reference}/studies`).expect(409));
    expect(unsound).toMatchObject({ code: 'MASSING_UNSOUND' });
  });

  it('leaves nothing behind when it fails after the study was written', async () => {
    const { reference } = await createReviewedCase(api);
    const before = await waitingJobs();
    const lost = await api.deps.orm.em
      .fork()
      .transactional(async (tx) => {
        const [person] = await tx.execute<{ id: string }[]>(
          `select id from person where role = 'planner'`,
        );
        await requestStudyInside(
          tx,
          api.deps.queue,
          { id: person?.id ?? '', role: 'planner' },
          reference,
        );
        throw new Error('power cut');
      })
      .catch((error: unknown) => String(error));
    expect(lost).toContain('power cut');
    expect(await waitingJobs()).toBe(before);
    const list = await bodyOf(planner.get(`/api/cases/${reference}/studies`).expect(200));
    expect(list).toEqual({ rows: [] });
  });
});

describe('a study of bad data', () => {
  it('ends as failed, with a sentence, where its data make no valid study', async () => {
    const { reference } = await createReviewedCase(api);
    const { id } = await requestStudy(planner, reference);
    const em = api.orm.em.fork();
    // The register gets a parcel whose border crosses itself.
    await em.execute(
      `insert into parcel (number, address, zone, use, geometry) values ('X-1', 'X-1 Test Row', 'R', 'dwelling',
         ST_GeomFromText('POLYGON((-91.3002 46.7510, -91.2998 46.7515, -91.2998 46.7510, -91.3002 46.7514, -91.3002 46.7510))', 4326))`,
    );
    await run(id);
    await em.execute(`delete from parcel where number = 'X-1'`);
    const study = await readStudy(planner, id);
    expect(study.status).toBe('failed');
    expect(study.failure).toContain('crosses itself');
  });
});

describe('a study and its workers', () => {
  it('is computed once by two workers that are given it at the same time', async () => {
    const { reference } = await createReviewedCase(api);
    const { id } = await requestStudy(planner, reference);
    await Promise.all([run(id), run(id)]);
    const row = await api.orm.em.fork().findOneOrFail(Study, id);
    expect(row).toMatchObject({ status: 'finished', attempts: 1 });
  });

  it('is not computed again when its job comes again', async () => {
    const { reference } = await createReviewedCase(api);
    const { id } = await requestStudy(planner, reference);
    await run(id);
    const { finishedAt } = await readStudy(planner, id);
    await run(id);
    expect((await readStudy(planner, id)).finishedAt).toBe(finishedAt);
  });

  it('takes nothing from a run that was taken for dead and lives on', async () => {
    const { reference } = await createReviewedCase(api);
    const { id } = await requestStudy(planner, reference);
    const em = api.orm.em.fork();
    const silent = await claimStudy(em, id);
    if (silent === null) throw new Error('The study waits for a run.');
    await passTime(id);
    await requeueDeadStudies(em, api.deps.queue);
    await run(id);
    const finished = await readStudy(planner, id);
    expect(finished.status).toBe('finished');

    expect(await reportProgress(em, silent, 1, 2)).toBe(false);
    await failStudy(em, silent, 'It lives on.');
    expect(
      await saveStudyResults(em, silent, { evidence: await readEvidenceOf(id), shadows: [] }),
    ).toBe(false);
    expect(await readStudy(planner, id)).toEqual(finished);
  });

  it('is given up, with a sentence, when it has taken down three workers', async () => {
    const { reference } = await createReviewedCase(api);
    const { id } = await requestStudy(planner, reference);
    const em = api.orm.em.fork();
    await em.execute(
      `update study set status = 'running', attempts = 3, heartbeat_at = now() - interval '1 hour' where id = ?`,
      [id],
    );
    await requeueDeadStudies(api.orm.em.fork(), api.deps.queue);
    const study = await readStudy(planner, id);
    expect(study.status).toBe('failed');
    expect(study.failure).toContain('3 times');
  });
});
