import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { CaseState } from '../../../shared/contracts/case-life.ts';
import { caseDetailSchema } from '../../../shared/contracts/cases.ts';
import { reportSchema } from '../../../shared/contracts/reports.ts';
import { studyListSchema } from '../../../shared/contracts/studies.ts';
import { buildSmallCity } from '../../support/small-city.ts';
import {
  createReviewedCase,
  hasEnded,
  requestStudy,
  startTestWorker,
  waitForStudy,
} from '../../support/study-worker.ts';
import {
  bodyOf,
  startTestApi,
  type Agent,
  type TestApi,
  type TestPerson,
} from '../../support/test-api.ts';

type Reader = TestPerson | 'public';
const readers = ['public', 'other', 'board', 'owner', 'planner', 'administrator'] as const;

let api: TestApi;
const agents = new Map<Reader, Agent>();
const paths = new Map<string, string>();
let caseId: string;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  for (const reader of readers) agents.set(reader, await api.signIn(reader));
  const planner = agentOf('planner');
  const { id, reference } = await createReviewedCase(api);
  caseId = id;

  const worker = await startTestWorker(api);
  const finished = await requestStudy(planner, reference);
  await waitForStudy(planner, finished.id, hasEnded);
  await worker.stop();
  const waiting = await requestStudy(planner, reference);
  await api.setState(caseId, 'open-for-comment');
  const report = reportSchema.parse(
    await bodyOf(planner.post(`/api/cases/${reference}/reports`).send({}).expect(201)),
  );

  const ofCase = `/api/cases/${reference}`;
  const ofStudy = `/api/studies/${finished.id}`;
  for (const [name, path] of Object.entries({
    case: ofCase,
    massings: `${ofCase}/massings`,
    massing: `${ofCase}/massings/1`,
    original: `${ofCase}/massings/1/original`,
    comparison: `${ofCase}/massings/comparison?from=1&to=1`,
    studies: `${ofCase}/studies`,
    study: ofStudy,
    events: `${ofStudy}/events`,
    shadows: `${ofStudy}/shadows?at=2026-12-21T12:00:00-06:00`,
    receptors: `${ofStudy}/receptors`,
    clauses: `${ofStudy}/clauses`,
    csv: `${ofStudy}/receptors.csv`,
    geojson: `${ofStudy}/receptors.geojson`,
    receptor: `${ofStudy}/receptors/N-1`,
    evidence: `${ofStudy}/evidence`,
    comments: `${ofCase}/comments`,
    reports: `${ofCase}/reports`,
    pdf: `/api/reports/${report.number}.pdf`,
    'waiting study': `/api/studies/${waiting.id}`,
    'evidence of the waiting study': `/api/studies/${waiting.id}/evidence`,
  })) {
    paths.set(name, path);
  }
});
afterAll(() => api.close());

function agentOf(reader: Reader): Agent {
  const agent = agents.get(reader);
  if (agent === undefined) throw new Error(`${reader} has not come.`);
  return agent;
}

async function statusesFor(name: string): Promise<Record<string, number>> {
  const statuses: Record<string, number> = {};
  for (const reader of readers) {
    statuses[reader] = (await agentOf(reader).get(paths.get(name) ?? '')).status;
  }
  return statuses;
}

const everybody = {
  public: 200,
  other: 200,
  board: 200,
  owner: 200,
  planner: 200,
  administrator: 200,
};
const thoseAtWork = {
  public: 404,
  other: 404,
  board: 404,
  owner: 200,
  planner: 200,
  administrator: 200,
};

const documents = [
  'massings',
  'massing',
  'original',
  'comparison',
  'studies',
  'study',
  'events',
  'shadows',
  'receptors',
  'clauses',
  'csv',
  'geojson',
  'receptor',
  'evidence',
  'comments',
  'reports',
  'pdf',
];

describe.each(['open-for-comment', 'heard', 'refused'] as CaseState[])(
  'in the public state %s',
  (state) => {
    beforeAll(() => api.setState(caseId, state));

    it.each(documents)('everybody reads: %s', async (name) => {
      expect(await statusesFor(name)).toEqual(everybody);
    });

    it('a study that is not finished is for those who work on the case', async () => {
      expect(await statusesFor('waiting study')).toEqual(thoseAtWork);
      const list = async (reader: Reader) => {
        const body = await bodyOf(agentOf(reader).get(paths.get('studies') ?? ''));
        return studyListSchema.parse(body).rows.map(({ status }) => status);
      };
      expect(await list('public')).toEqual(['finished']);
      expect(await list('planner')).toEqual(['queued', 'finished']);
    });

    it("the case's page names the latest study that its reader may see", async () => {
      const latest = async (reader: Reader) => {
        const body = await bodyOf(
          agentOf(reader)
            .get(paths.get('case') ?? '')
            .expect(200),
        );
        return caseDetailSchema.parse(body).latestStudy?.status;
      };
      expect(await latest('public')).toBe('finished');
      expect(await latest('owner')).toBe('queued');
    });

    it('what is not finished has no evidence', async () => {
      expect(await statusesFor('evidence of the waiting study')).toEqual({
        ...thoseAtWork,
        owner: 409,
        planner: 409,
        administrator: 409,
      });
    });
  },
);

describe.each(['submitted', 'sent-back', 'under-review', 'withdrawn'] as CaseState[])(
  'in the state %s, which is not public',
  (state) => {
    beforeAll(() => api.setState(caseId, state));

    it.each(documents)('the owner, planners and the administrator read: %s', async (name) => {
      expect(await statusesFor(name)).toEqual(thoseAtWork);
    });
  },
);

describe('a draft', () => {
  beforeAll(() => api.setState(caseId, 'draft'));

  it.each(['massings', 'massing', 'original', 'comparison'])(
    'its owner alone reads: %s',
    async (name) => {
      expect(await statusesFor(name)).toEqual({ ...thoseAtWork, planner: 404, administrator: 404 });
    },
  );
});
