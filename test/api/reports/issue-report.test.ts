import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { renderReportApart } from '../../../api/modules/reports/render-report-apart.ts';
import { renderReport } from '../../../api/modules/reports/render-report.ts';
import { Report } from '../../../api/modules/reports/report.entity.ts';
import { commentReceiptSchema } from '../../../shared/contracts/comments.ts';
import { reportListSchema, reportSchema } from '../../../shared/contracts/reports.ts';
import type { StudyDetail } from '../../../shared/contracts/studies.ts';
import { buildSmallCity, cottage } from '../../support/small-city.ts';
import {
  createReviewedCase,
  hasEnded,
  requestStudy,
  startTestWorker,
  waitForStudy,
} from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let worker: Awaited<ReturnType<typeof startTestWorker>>;
let planner: Agent;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  worker = await startTestWorker(api);
  planner = await api.signIn('planner');
});
afterAll(async () => {
  await worker.stop();
  await api.close();
});

async function createStudiedCase(): Promise<{ id: string; reference: string; study: StudyDetail }> {
  const reviewCase = await createReviewedCase(api);
  planner = await api.signIn('planner');
  const { id } = await requestStudy(planner, reviewCase.reference);
  const study = await waitForStudy(planner, id, hasEnded);
  await api.setState(reviewCase.id, 'open-for-comment');
  return { ...reviewCase, study };
}

function issue(reference: string) {
  return planner
    .post(`/api/cases/${reference}/reports`)
    .send({ narrative: 'The tower stands south of N-1.', recommendation: 'Refuse it.' });
}

async function list(agent: Agent, reference: string) {
  const body = await bodyOf(agent.get(`/api/cases/${reference}/reports`).expect(200));
  return reportListSchema.parse(body).rows;
}

async function readPdf(number: string) {
  const response = await planner.get(`/api/reports/${number}.pdf`).responseType('blob').expect(200);
  return { bytes: response.body as Buffer, headers: response.headers as Record<string, string> };
}

describe('issuing a report', () => {
  it('draws a PDF from the finished study, with its digest, and names its own SHA-256', async () => {
    const { reference, study } = await createStudiedCase();
    const report = reportSchema.parse(await bodyOf(issue(reference).expect(201)));
    expect(report).toMatchObject({
      number: `${reference}-R1`,
      revision: 1,
      studyId: study.id,
      studyDigest: study.digest,
      issuedByName: 'planner',
      superseded: false,
    });
    const { bytes, headers } = await readPdf(report.number);
    expect(bytes.subarray(0, 5).toString()).toBe('%PDF-');
    expect(bytes.length).toBe(report.sizeBytes);
    expect(createHash('sha256').update(bytes).digest('hex')).toBe(report.sha256);
    expect(headers).toMatchObject({
      'content-type': 'application/pdf',
      'content-disposition': `inline; filename="${report.number}.pdf"`,
      etag: `"${report.sha256}"`,
    });
  });

  it('keeps what it was drawn from: the payload gives the same bytes again', async () => {
    const { reference } = await createStudiedCase();
    const { number } = reportSchema.parse(await bodyOf(issue(reference).expect(201)));
    const report = await api.orm.em
      .fork()
      .findOneOrFail(Report, { number }, { populate: ['payload', 'pdf'] });
    const again = await renderReport(report.payload);
    expect(Buffer.compare(again.bytes, Buffer.from(report.pdf))).toBe(0);
    expect(again.pages).toBe(report.pages);
  });

  it('hands on what goes wrong in the thread that draws it', async () => {
    const { reference } = await createStudiedCase();
    const { number } = reportSchema.parse(await bodyOf(issue(reference).expect(201)));
    const { payload } = await api.orm.em
      .fork()
      .findOneOrFail(Report, { number }, { populate: ['payload'] });
    // A table that leaves out what the findings name is never drawn.
    await expect(renderReportApart({ ...payload, findingRows: [] })).rejects.toThrow();
  });

  it('puts in every receptor that does not meet the rule, the comments, and the words of the planner', async () => {
    const { reference } = await createStudiedCase();
    const neighbour = await api.signIn('public');
    const comment = await bodyOf(
      neighbour.post(`/api/cases/${reference}/comments`).send({
        authorName: 'Nell Fennimarsh',
        authorEmail: 'nell@home.example',
        body: 'My tomatoes get the noon sun.',
      }),
    );
    const { id } = commentReceiptSchema.parse(comment);
    await planner.patch(`/api/comments/${id}`).send({ state: 'published' }).expect(200);
    const { number } = reportSchema.parse(await bodyOf(issue(reference).expect(201)));
    const { payload } = await api.orm.em
      .fork()
      .findOneOrFail(Report, { number }, { populate: ['payload'] });
    expect(payload.receptors.map((receptor) => receptor.id)).toContain('N-1');
    expect(payload.ledgers[0]?.receptor).toBe('N-1');
    expect(payload.publishedComments).toMatchObject([{ body: 'My tomatoes get the noon sun.' }]);
    expect(JSON.stringify(payload)).not.toContain('nell@home.example');
    expect(payload).toMatchObject({
      narrative: 'The tower stands south of N-1.',
      recommendation: 'Refuse it.',
      study: { findings: { met: false } },
    });
  });

  it('numbers reports without gaps, also two at once, and the later takes the place of the earlier', async () => {
    const { reference } = await createStudiedCase();
    const [one, other] = await Promise.all([issue(reference), issue(reference)]);
    expect([one.status, other.status]).toEqual([201, 201]);
    expect(await list(planner, reference)).toMatchObject([
      { number: `${reference}-R2`, superseded: false },
      { number: `${reference}-R1`, superseded: true },
    ]);
  });

  it('is refused without a finished study of the current massing', async () => {
    const { id, reference } = await createReviewedCase(api);
    await api.setState(id, 'open-for-comment');
    expect(await bodyOf(issue(reference).expect(409))).toMatchObject({ code: 'STUDY_MISSING' });
  });

  it('is for planners, in the states for it', async () => {
    const { id, reference } = await createStudiedCase();
    for (const person of ['owner', 'other', 'board', 'administrator'] as const) {
      const agent = await api.signIn(person);
      await agent.post(`/api/cases/${reference}/reports`).send({}).expect(403);
    }
    await api.setState(id, 'under-review');
    await issue(reference).expect(403);
    expect(await list(planner, reference)).toEqual([]);
  });
});

describe('an issued report', () => {
  it('stays the same, byte for byte, after another revision, which supersedes it visibly', async () => {
    const { id, reference } = await createStudiedCase();
    const report = reportSchema.parse(await bodyOf(issue(reference).expect(201)));
    const before = await readPdf(report.number);
    await api.setState(id, 'sent-back');
    const owner = await api.signIn('owner');
    await owner
      .post(`/api/cases/${reference}/massings`)
      .attach('file', cottage, 'smaller.geojson')
      .expect(201);
    await api.setState(id, 'open-for-comment');
    expect(await list(planner, reference)).toMatchObject([
      { number: report.number, revision: 1, superseded: true },
    ]);
    const after = await readPdf(report.number);
    expect(Buffer.compare(after.bytes, before.bytes)).toBe(0);
  });

  it('is not sent again to who has it', async () => {
    const { reference } = await createStudiedCase();
    const report = reportSchema.parse(await bodyOf(issue(reference).expect(201)));
    await planner
      .get(`/api/reports/${report.number}.pdf`)
      .set('If-None-Match', `"${report.sha256}"`)
      .expect(304);
  });

  it('can neither be changed nor deleted in the database', async () => {
    const { reference } = await createStudiedCase();
    await issue(reference).expect(201);
    const em = api.orm.em.fork();
    await expect(em.execute(`update report set pages = 1`)).rejects.toThrow('never changed');
    await expect(em.execute(`delete from report`)).rejects.toThrow('never changed');
  });

  it('is not there under a number that was not given', async () => {
    await planner.get('/api/reports/2026-0001-R99.pdf').expect(404);
    await planner.get('/api/reports/anything.pdf').expect(404);
  });
});
