import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { CaseCounter } from '../../../api/modules/cases/case-counter.entity.ts';
import { CaseTransition } from '../../../api/modules/cases/case-transition.entity.ts';
import { changeCaseState } from '../../../api/modules/cases/change-case-state.ts';
import { ReviewCase } from '../../../api/modules/cases/review-case.entity.ts';
import { Person } from '../../../api/modules/people/person.entity.ts';
import { caseDetailSchema } from '../../../shared/contracts/cases.ts';
import { problemSchema } from '../../../shared/contracts/problem.ts';
import { buildSmallCity, tower } from '../../support/small-city.ts';
import { bodyOf, startTestApi, type Agent, type TestApi } from '../../support/test-api.ts';

let api: TestApi;
let owner: Agent;
let planner: Agent;
let applicant: { id: string; role: 'applicant' };

beforeAll(async () => {
  api = await startTestApi();
  await buildSmallCity(api.orm);
  owner = await api.signIn('owner');
  planner = await api.signIn('planner');
  const person = await api.orm.em.fork().findOneOrFail(Person, { name: 'owner' });
  applicant = { id: person.id, role: 'applicant' };
});
afterAll(() => api.close());

// Each test begins a year of its own: no case has a number, and none was given.
afterEach(async () => {
  const em = api.orm.em.fork();
  await em.nativeUpdate(ReviewCase, {}, { number: null });
  await em.nativeDelete(CaseCounter, {});
});

/** A draft that can be submitted. */
async function createSoundDraft(agent = owner): Promise<{ id: string; reference: string }> {
  const reviewCase = await api.createCase('draft');
  await agent
    .post(`/api/cases/${reviewCase.reference}/massings`)
    .attach('file', tower, 'tower.geojson')
    .expect(201);
  return reviewCase;
}

function submit(reference: string) {
  return owner.post(`/api/cases/${reference}/transitions`).send({ to: 'submitted' });
}

async function readCase(agent: Agent, reference: string) {
  return caseDetailSchema.parse(await bodyOf(agent.get(`/api/cases/${reference}`).expect(200)));
}

/** Submits at this instant, past the clock of the server. */
async function submitAt(reference: string, at: string): Promise<string | null> {
  const em = api.orm.em.fork();
  const input = { to: 'submitted' as const };
  const { number } = await changeCaseState(em, applicant, reference, input, new Date(at));
  return number ?? null;
}

describe('the number of a case', () => {
  it('is given at the first submission, and the draft’s key resolves for ever', async () => {
    const { reference } = await createSoundDraft();
    const submitted = caseDetailSchema.parse(await bodyOf(submit(reference).expect(200)));
    const { number } = submitted;
    expect(number).toMatch(/^\d{4}-0001$/);
    expect(submitted.reference).toBe(number);
    expect(await readCase(owner, reference)).toEqual(submitted);
    expect(await readCase(owner, number ?? '')).toEqual(submitted);
  });

  it('stays when a case is sent back and submitted again', async () => {
    const { reference } = await createSoundDraft();
    const { number } = caseDetailSchema.parse(await bodyOf(submit(reference).expect(200)));
    await planner
      .post(`/api/cases/${number}/transitions`)
      .send({ to: 'sent-back', reason: 'Show the stair.' })
      .expect(200);
    const again = caseDetailSchema.parse(await bodyOf(submit(number ?? '').expect(200)));
    expect(again.number).toBe(number);
    const next = await createSoundDraft();
    const { number: nextNumber } = caseDetailSchema.parse(await bodyOf(submit(next.reference)));
    expect(nextNumber).toBe(number?.replace(/0001$/, '0002'));
  });

  it('counts without gaps or repetitions when thirty are submitted at the same time', async () => {
    const drafts = [];
    const another = await api.signIn('owner');
    // From two addresses: there is a limit on uploads.
    for (let index = 0; index < 30; index += 1) {
      drafts.push(await createSoundDraft(index % 2 === 0 ? owner : another));
    }
    const answers = await Promise.all(drafts.map(({ reference }) => submit(reference)));
    const numbers = answers.map(({ body }) => caseDetailSchema.parse(body).number?.slice(5));
    expect(numbers.sort()).toEqual(
      Array.from({ length: 30 }, (_, index) => String(index + 1).padStart(4, '0')),
    );
  });

  it('is one also when the same draft is submitted twice at the same time', async () => {
    const { id, reference } = await createSoundDraft();
    const answers = await Promise.all([submit(reference), submit(reference), submit(reference)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
    const em = api.orm.em.fork();
    expect(await em.count(CaseTransition, { reviewCase: id })).toBe(1);
    expect(await em.findAll(CaseCounter)).toMatchObject([{ lastNumber: 1 }]);
  });

  it('is not used up by a submission that is refused', async () => {
    const unready = await api.createCase('draft');
    await submit(unready.reference).expect(409);
    const { reference } = await createSoundDraft();
    const { number } = caseDetailSchema.parse(await bodyOf(submit(reference).expect(200)));
    expect(number).toMatch(/-0001$/);
  });

  it('begins anew with the year of the municipality’s clock, not of the server’s', async () => {
    const [first, second, third] = [
      await createSoundDraft(),
      await createSoundDraft(),
      await createSoundDraft(),
    ];
    // Six hours behind Greenwich in winter.
    expect(await submitAt(first.reference, '2027-01-01T05:59:59Z')).toBe('2026-0001');
    expect(await submitAt(second.reference, '2027-01-01T06:00:00Z')).toBe('2027-0001');
    expect(await submitAt(third.reference, '2027-06-01T12:00:00Z')).toBe('2027-0002');
  });

  it('grows a digit after 9999', async () => {
    const em = api.orm.em.fork();
    em.create(CaseCounter, { year: 2026, lastNumber: 9999 });
    await em.flush();
    const { reference } = await createSoundDraft();
    expect(await submitAt(reference, '2026-12-01T12:00:00Z')).toBe('2026-10000');
    expect((await readCase(owner, '2026-10000')).number).toBe('2026-10000');
  });
});

describe('a submission that fails in the middle', () => {
  it('leaves nothing half written: no state, no history, no number', async () => {
    const { id, reference } = await createSoundDraft();
    const before = await readCase(owner, reference);
    // The place in the history that the step will ask for is taken, so that writing it fails.
    const em = api.orm.em.fork();
    em.create(CaseTransition, {
      reviewCase: em.getReference(ReviewCase, id),
      position: 2,
      from: 'draft',
      to: 'draft',
      at: new Date(),
      by: em.getReference(Person, applicant.id),
      byRole: 'applicant',
      reason: null,
      dueDate: null,
    });
    await em.flush();

    const { code } = problemSchema.parse(
      await bodyOf(submit(reference).set('Idempotency-Key', 'not-even-the-key').expect(500)),
    );
    expect(code).toBe('INTERNAL');
    const after = await readCase(owner, reference);
    expect(after.history).toHaveLength(1);
    expect({ ...after, history: [] }).toEqual(before);
    const read = api.orm.em.fork();
    expect(await read.count(CaseCounter)).toBe(0);
    expect(await read.execute('select key from idempotency_key')).toEqual([]);

    const next = await createSoundDraft();
    const { number } = caseDetailSchema.parse(await bodyOf(submit(next.reference).expect(200)));
    expect(number).toMatch(/-0001$/);
  });
});
