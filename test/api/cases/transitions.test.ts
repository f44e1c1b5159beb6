import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { CaseTransition } from '../../../api/modules/cases/case-transition.entity.ts';
import { caseStates, type CaseState } from '../../../shared/contracts/case-life.ts';
import { caseDetailSchema } from '../../../shared/contracts/cases.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { caseSteps } from '../../support/case-life-table.ts';
import { buildSmallCity, massingFile, tower } from '../../support/small-city.ts';
import {
  createReviewedCase,
  hasEnded,
  requestStudy,
  startTestWorker,
  waitForStudy,
} from '../../support/study-worker.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let owner: Agent;
let planner: Agent;
/** With a sound massing, a finished study and a report: nothing stands in its way. */
let ready: { id: string; reference: string };

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  owner = await api.signIn('owner');
  planner = await api.signIn('planner');
  ready = await createReviewedCase(api);
  await finishStudy(ready.reference);
  await api.setState(ready.id, 'open-for-comment');
  await planner.post(`/api/cases/${ready.reference}/reports`).send({}).expect(201);
});
afterAll(() => api.close());

async function finishStudy(reference: string): Promise<void> {
  const worker = await startTestWorker(api);
  const { id } = await requestStudy(planner, reference);
  const study = await waitForStudy(planner, id, hasEnded);
  await worker.stop();
  expect(study.status).toBe('finished');
}

function take(agent: Agent, reference: string, step: object) {
  return agent.post(`/api/cases/${reference}/transitions`).send(step);
}

async function problemOf(request: PromiseLike<{ body: unknown }>) {
  return problemSchema.parse(await bodyOf(request));
}

async function readCase(agent: Agent, reference: string) {
  return caseDetailSchema.parse(await bodyOf(agent.get(`/api/cases/${reference}`).expect(200)));
}

async function historyOf(caseId: string): Promise<CaseTransition[]> {
  return api.orm.em
    .fork()
    .find(CaseTransition, { reviewCase: caseId }, { orderBy: { position: 'asc' } });
}

describe('from each state', () => {
  /** What the table says of a step by this person, as an answer of the server. */
  function expectedStatus(from: CaseState, to: CaseState, role: 'applicant' | 'planner'): number {
    // A draft is its applicant's alone.
    if (role === 'planner' && from === 'draft') return 404;
    const by = caseSteps.find((step) => step.from === from && step.to === to)?.by ?? [];
    if (by.length === 0) return 409;
    return by.includes(role) ? 200 : 403;
  }

  describe.each(['applicant', 'planner'] as const)('%s', (role) => {
    it.each(caseStates)('gets no further than the table says: %s', async (from) => {
      // An address of its own: there is a limit on writes.
      const agent = await api.signIn(role === 'applicant' ? 'owner' : 'planner');
      const answers: Partial<Record<CaseState, number>> = {};
      for (const to of caseStates) {
        await api.setState(ready.id, from);
        const response = await take(agent, ready.reference, { to, reason: 'As the table says.' });
        answers[to] = response.status;
      }
      expect(answers).toEqual(
        Object.fromEntries(caseStates.map((to) => [to, expectedStatus(from, to, role)])),
      );
    });
  });

  it.each(['board', 'administrator', 'other', 'public'] as const)(
    'no step is open to %s',
    async (person) => {
      const agent = await api.signIn(person);
      await api.setState(ready.id, 'heard');
      const answer = await take(agent, ready.reference, { to: 'approved', reason: 'We say so.' });
      expect(answer.status).toBe(person === 'public' ? 401 : 403);
      expect((await readCase(owner, ready.reference)).state).toBe('heard');
    },
  );
});

describe('a step', () => {
  it('is kept with who, when, from where, where to and why', async () => {
    const { id, reference } = await api.createCase('submitted');
    await take(planner, reference, {
      to: 'sent-back',
      reason: '  The stair is missing.  ',
      dueDate: '2026-12-24',
    }).expect(200);
    expect(await historyOf(id)).toMatchObject([
      {
        position: 1,
        from: 'submitted',
        to: 'sent-back',
        byRole: 'planner',
        reason: 'The stair is missing.',
        dueDate: '2026-12-24',
      },
    ]);
    const { history, stateSince } = await readCase(planner, reference);
    expect(history[0]?.at).toBe(stateSince);
  });

  it('stays in the history for ever: the database refuses a change', async () => {
    const { reference } = await api.createCase('submitted');
    await take(planner, reference, { to: 'complete' }).expect(200);
    const em = api.orm.em.fork();
    await expect(em.execute(`update case_transition set reason = 'x'`)).rejects.toThrow(
      'never changed',
    );
    await expect(em.execute('delete from case_transition')).rejects.toThrow('never changed');
  });

  it('without the reason that it needs is refused, and names the field', async () => {
    const { reference } = await api.createCase('submitted');
    for (const reason of [undefined, '', '   ']) {
      const { code, errors } = await problemOf(
        take(planner, reference, { to: 'sent-back', reason }).expect(422),
      );
      expect(code).toBe('INPUT_INVALID');
      expect(errors?.map(({ path }) => path)).toEqual(['reason']);
    }
    expect((await readCase(planner, reference)).state).toBe('submitted');
  });

  it('that the state does not have is refused in words', async () => {
    const { reference } = await api.createCase('submitted');
    const { code, title } = await problemOf(
      take(planner, reference, { to: 'approved', reason: 'At once.' }).expect(409),
    );
    expect(code).toBe('CASE_TRANSITION_REFUSED');
    expect(title).toBe('A case in the state “Submitted” cannot become “Approved”.');
  });

  it('names every field that is wrong', async () => {
    const { errors } = await problemOf(
      take(planner, '2026-0001', { to: 'done', dueDate: 'soon', by: 'me' }).expect(422),
    );
    expect(errors?.map(({ path }) => path).sort()).toEqual(['by', 'dueDate', 'to']);
  });

  it('has its effect once when it is repeated with the same Idempotency-Key', async () => {
    const { id, reference } = await api.createCase('submitted');
    const send = () =>
      take(planner, reference, { to: 'complete' }).set('Idempotency-Key', 'complete-it-once');
    const first = await send().expect(200);
    const second = await send().expect(200);
    expect(second.body).toEqual(first.body);
    expect(await historyOf(id)).toHaveLength(1);
  });
});

describe('a step from a state that the person no longer has before them', () => {
  it('is refused when the case has moved on', async () => {
    const { reference } = await api.createCase('complete');
    const { code, title } = await problemOf(
      take(planner, reference, { to: 'sent-back', from: 'submitted', reason: 'x' }).expect(409),
    );
    expect(code).toBe('CASE_CHANGED_MEANWHILE');
    expect(title).toContain('Load it again');
    expect((await readCase(planner, reference)).state).toBe('complete');
    await take(planner, reference, { to: 'sent-back', from: 'complete', reason: 'x' }).expect(200);
  });

  it('is won by one of two planners who decide at the same time; the other is told', async () => {
    const { id, reference } = await api.createCase('heard');
    const decide = (to: CaseState) =>
      take(planner, reference, { to, from: 'heard', reason: 'The vote.' });
    const answers = await Promise.all([decide('approved'), decide('refused')]);
    const [won] = answers.filter(({ status }) => status === 200);
    const [lost] = answers.filter(({ status }) => status === 409);
    expect(problemSchema.parse(lost?.body).code).toBe('CASE_CHANGED_MEANWHILE');
    const { state } = caseDetailSchema.parse(won?.body);
    expect((await readCase(planner, reference)).state).toBe(state);
    expect(await historyOf(id)).toMatchObject([{ from: 'heard', to: state }]);
  });
});

describe('submitting', () => {
  const submit = (reference: string) => take(owner, reference, { to: 'submitted' });
  const upload = (reference: string, bytes: Buffer) =>
    owner
      .post(`/api/cases/${reference}/massings`)
      .attach('file', bytes, 'massing.geojson')
      .expect(201);
  const outside = massingFile([{ id: 'far', top: 9, at: [-35, 5, 10, 10] }]);

  it('waits for a massing', async () => {
    const { reference } = await api.createCase('draft');
    const { code, title } = await problemOf(submit(reference).expect(409));
    expect(code).toBe('MASSING_MISSING');
    const { transitions } = await readCase(owner, reference);
    expect(transitions.find(({ to }) => to === 'submitted')?.obstacle).toBe(title);
  });

  it('waits for a sound one, and the latest counts', async () => {
    const { reference } = await api.createCase('sent-back');
    await upload(reference, tower);
    await upload(reference, outside);
    const { code } = await problemOf(submit(reference).expect(409));
    expect(code).toBe('MASSING_UNSOUND');
    expect((await readCase(owner, reference)).state).toBe('sent-back');
    await upload(reference, tower);
    const { transitions } = await readCase(owner, reference);
    expect(transitions.find(({ to }) => to === 'submitted')?.obstacle).toBeNull();
    await submit(reference).expect(200);
  });
});

describe('publishing', () => {
  const publish = (reference: string) => take(planner, reference, { to: 'open-for-comment' });

  it('waits for a finished study of the current massing', async () => {
    const { id, reference } = await createReviewedCase(api);
    expect((await problemOf(publish(reference).expect(409))).code).toBe('STUDY_MISSING');
    const waiting = await requestStudy(planner, reference);
    expect((await problemOf(publish(reference).expect(409))).code).toBe('STUDY_MISSING');
    await planner.post(`/api/studies/${waiting.id}/cancel`);
    await finishStudy(reference);

    await api.setState(id, 'sent-back');
    await owner
      .post(`/api/cases/${reference}/massings`)
      .attach('file', tower, 'second.geojson')
      .expect(201);
    await api.setState(id, 'under-review');
    expect((await problemOf(publish(reference).expect(409))).code).toBe('STUDY_MISSING');
    expect((await readCase(planner, reference)).state).toBe('under-review');
    await finishStudy(reference);
    await publish(reference).expect(200);
  });

  it('to the board waits for a report as well', async () => {
    const { id, reference } = await createReviewedCase(api);
    await finishStudy(reference);
    await api.setState(id, 'open-for-comment');
    const send = () => take(planner, reference, { to: 'report-issued' });
    const { title } = await problemOf(send().expect(409));
    expect(title).toBe('Issue a report on the current massing first.');
    await planner.post(`/api/cases/${reference}/reports`).send({}).expect(201);
    await send().expect(200);
  });
});
