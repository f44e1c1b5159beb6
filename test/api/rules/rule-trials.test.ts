import { once } from 'node:events';
import { createServer, request as httpRequest } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Report } from '../../../api/modules/reports/report.entity.ts';
import { RuleVersion } from '../../../api/modules/rules/rule-version.entity.ts';
import { Study } from '../../../api/modules/studies/study.entity.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { trialLineSchema, type RuleTrial } from '../../../shared/contracts/rule-trials.ts';
import { ruleVersionSchema } from '../../../shared/contracts/rules.ts';
import { findingPageSchema, type StudyDetail } from '../../../shared/contracts/studies.ts';
import type { Rule } from '../../../shared/rules/rule-schema.ts';
import { buildSmallCity, smallCityRule } from '../../support/small-city.ts';
import {
  createReviewedCase,
  hasEnded,
  readStudy,
  requestStudy,
  startTestWorker,
  waitForStudy,
} from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let administrator: Agent;
let planner: Agent;
let reference: string;
let study: StudyDetail;

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  administrator = await api.signIn('administrator');
  planner = await api.signIn('planner');
  ({ reference } = await createReviewedCase(api));
  const worker = await startTestWorker(api);
  study = await waitForStudy(planner, (await requestStudy(planner, reference)).id, hasEnded);
  await worker.stop();
});
afterAll(() => api.close());

/** As the rule in force, with another clause beside the first or in its place. */
function draftWith(change: Partial<Rule['clauses'][number]>, version = 2): Rule {
  return { ...smallCityRule(change), version };
}

async function linesOf(rule: Rule, agent = administrator) {
  const { text } = await agent
    .post('/api/rules/trials')
    .send({ study: study.id, rule })
    .buffer(true)
    .parse((response, done) => {
      let all = '';
      response.setEncoding('utf8');
      response.on('data', (part: string) => (all += part));
      response.on('end', () => done(null, all));
    })
    .expect(200)
    .then(({ body }: { body: unknown }) => ({ text: String(body) }));
  return text
    .trim()
    .split('\n')
    .map((line) => trialLineSchema.parse(JSON.parse(line)));
}

async function tryRule(rule: Rule, agent = administrator): Promise<RuleTrial> {
  const last = (await linesOf(rule, agent)).at(-1);
  if (last === undefined || !('result' in last)) throw new Error('The trial has no result.');
  return last.result;
}

const rowOf = ({ rows }: RuleTrial, receptor: string) =>
  rows.find((row) => row.receptor === receptor);

describe('a rule tried on a case', () => {
  it('that asks the same finds the same, as the study did', async () => {
    const trial = await tryRule(draftWith({}));
    expect(trial).toMatchObject({ study: study.id, caseReference: reference, revision: 1 });
    expect(trial.inForce).toMatchObject({ version: 1, met: study.findings?.met });
    expect(trial.draft).toMatchObject({ version: 2, lossIndex: study.findings?.lossIndex });
    expect([...new Set(trial.rows.map(({ change }) => change))]).toEqual(['same']);
    const page = findingPageSchema.parse(
      await bodyOf(planner.get(`/api/studies/${study.id}/receptors`).expect(200)),
    );
    expect(trial.rows).toHaveLength(page.total);
    for (const { receptor, before, after, finding, margin } of page.rows) {
      expect(rowOf(trial, receptor)).toMatchObject({
        inForce: { before, after, finding, margin },
        draft: { before, after, finding, margin },
      });
    }
  });

  // N-1 loses its midwinter sun to the tower and fails the rule in force (small-city.ts).
  it('that asks nothing lets pass what failed, and says that first', async () => {
    const trial = await tryRule(draftWith({ limit: { atLeast: 0 } }));
    expect(trial).toMatchObject({ inForce: { met: false }, draft: { met: true } });
    expect(trial.rows[0]).toMatchObject({
      receptor: 'N-1',
      change: 'better',
      inForce: { finding: 'not-met' },
      draft: { finding: 'met', limit: 0 },
    });
    expect(trial.clauses).toEqual([
      {
        clause: 'winter-noon-hours',
        title: 'Two hours of midwinter sun',
        inForce: expect.objectContaining({ finding: 'not-met', notMet: 1 }) as unknown,
        draft: expect.objectContaining({ finding: 'met', notMet: 0 }) as unknown,
      },
    ]);
  });

  it('that judges by another clause stands beside the one that is dropped', async () => {
    const trial = await tryRule(
      draftWith({
        id: 'yards-alone',
        receptors: { classes: ['yard'], of: 'open' },
        limit: { noWorse: true },
      }),
    );
    expect(rowOf(trial, 'Y-1')).toMatchObject({ clause: 'yards-alone', inForce: null });
    // What the rule in force says of parcels falls away with its clause: N-1 failed there.
    expect(trial.rows.filter(({ change }) => change === 'better')).toMatchObject([
      { receptor: 'N-1', inForce: { finding: 'not-met' }, draft: null },
    ]);
    expect(trial.rows.find(({ clause }) => clause === 'winter-noon-hours')).toMatchObject({
      draft: null,
    });
    expect(trial.clauses.map(({ clause, inForce, draft }) => [clause, inForce, draft])).toEqual([
      ['yards-alone', null, expect.anything()],
      ['winter-noon-hours', expect.anything(), null],
    ]);
  });

  it('tells how far it is in instants before it tells the result', async () => {
    const lines = await linesOf(draftWith({}));
    const progress = lines.flatMap((line) => ('progress' in line ? [line.progress] : []));
    expect(progress.length).toBeGreaterThan(0);
    // 10:00 to 14:00 every 10 minutes are 25 instants, for each of the two rules.
    expect(progress.at(-1)).toEqual({ done: 50, total: 50 });
  });

  it('leaves nothing behind', async () => {
    const counts = async () => {
      const em = api.orm.em.fork();
      return [await em.count(Study), await em.count(RuleVersion), await em.count(Report)];
    };
    const before = await counts();
    const shown = await readStudy(planner, study.id);
    await tryRule(draftWith({ limit: { atLeast: 4 } }), planner);
    expect(await counts()).toEqual(before);
    expect(await readStudy(planner, study.id)).toEqual(shown);
  });

  it('ends when the person goes away, and makes room for the next', async () => {
    const server = createServer(api.app).listen(0, '127.0.0.1');
    await once(server, 'listening');
    const { port } = server.address() as AddressInfo;
    const signedIn = await fetch(`http://127.0.0.1:${port}/api/session`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify({
        email: 'administrator@testham.example',
        password: 'a password of tests',
      }),
    });
    const cookie = signedIn.headers.get('set-cookie')?.split(';')[0] ?? '';
    // Every day of the year at every minute: it would take far longer than this test.
    const long = draftWith({ days: [{ year: true }], step: 1, measure: { kind: 'beam-energy' } });
    for (let time = 0; time < 3; time += 1) {
      const call = httpRequest({
        port,
        host: '127.0.0.1',
        method: 'POST',
        path: '/api/rules/trials',
        headers: { 'Content-Type': 'application/json', Cookie: cookie },
      });
      call.on('error', () => undefined);
      call.end(JSON.stringify({ study: study.id, rule: long }));
      const [answer] = (await once(call, 'response')) as [{ statusCode: number }];
      // Two may run at once: the third is served only where an earlier one has ended.
      expect(answer.statusCode).toBe(200);
      call.destroy();
      await once(call, 'close');
    }
    server.close();
  });
});

describe('a rule that cannot be tried', () => {
  it.each([
    ['public', 401],
    ['owner', 403],
    ['board', 403],
  ] as const)('is that of %s', async (person, status) => {
    const agent = await api.signIn(person);
    await agent
      .post('/api/rules/trials')
      .send({ study: study.id, rule: draftWith({}) })
      .expect(status);
  });

  it('is refused by its field, and nothing is computed', async () => {
    const rule = draftWith({ window: { basis: 'civil', from: '01:00', to: '02:00' } });
    const body = await bodyOf(
      administrator.post('/api/rules/trials').send({ study: study.id, rule }).expect(422),
    );
    expect(problemSchema.parse(body).errors?.[0]?.path).toBe('rule.clauses.0.window');
  });

  it('has a study that is not finished', async () => {
    const waiting = await requestStudy(planner, reference);
    const body = await bodyOf(
      administrator
        .post('/api/rules/trials')
        .send({ study: waiting.id, rule: draftWith({}) })
        .expect(409),
    );
    expect(problemSchema.parse(body).code).toBe('STUDY_NOT_FINISHED');
    await planner.post(`/api/studies/${waiting.id}/cancel`).expect(200);
  });
});

describe('a new version in force', () => {
  it('leaves an earlier study, its evidence and its report as they were', async () => {
    await api.setState((await caseOf(study.id)) ?? '', 'open-for-comment');
    const number = await issueReport();
    const read = async () => ({
      study: await readStudy(planner, study.id),
      evidence: (await planner.get(`/api/studies/${study.id}/evidence`).expect(200)).text,
      csv: (await planner.get(`/api/studies/${study.id}/receptors.csv`).expect(200)).text,
      pdf: (await planner.get(`/api/reports/${number}.pdf`).buffer(true).expect(200))
        .body as Buffer,
    });
    const before = await read();

    const rule = draftWith({ limit: { atLeast: 0 } });
    const today = new Intl.DateTimeFormat('sv-SE', { timeZone: 'America/Chicago' });
    const written = ruleVersionSchema.parse(
      await bodyOf(
        administrator
          .post('/api/rules')
          .send({ rule, inForceFrom: today.format(new Date()) })
          .expect(201),
      ),
    );
    expect(written.state).toBe('in-force');

    expect(await read()).toEqual(before);
    expect(before.study.rule.version).toBe(1);
    // A trial holds a draft against the version that is in force now.
    const trial = await tryRule({ ...rule, version: 3 });
    expect(trial.inForce).toMatchObject({ version: 2, met: true });
  });

  async function caseOf(studyId: string): Promise<string | undefined> {
    return (await api.orm.em.fork().findOne(Study, studyId))?.reviewCase.id;
  }

  async function issueReport(): Promise<string> {
    const body = await bodyOf(planner.post(`/api/cases/${reference}/reports`).send({}).expect(201));
    return (body as { number: string }).number;
  }
});
