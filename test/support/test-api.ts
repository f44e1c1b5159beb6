import type { MikroORM } from '@mikro-orm/postgresql';
import type { Express } from 'express';
import { pino } from 'pino';
import type { Logger } from 'pino';
import supertest from 'supertest';
import { createApp } from '../../api/app.ts';
import { loadClipper } from '../../api/clipper.ts';
import type { AppDeps } from '../../api/deps.ts';
import { parseEnv } from '../../api/env.ts';
import { createJobQueue } from '../../api/jobs/job-queue.ts';
import { createSessionStore } from '../../api/middleware/session.ts';
import { dissolveParcels } from '../../api/modules/base-data/spatial-queries.ts';
import { ReviewCase } from '../../api/modules/cases/review-case.entity.ts';
import { hashPassword } from '../../api/modules/people/passwords.ts';
import { Person } from '../../api/modules/people/person.entity.ts';
import { createOrm } from '../../api/orm.ts';
import type { CaseState } from '../../shared/contracts/case-life.ts';
import type { Role } from '../../shared/contracts/people.ts';
import { createTestDatabase } from './test-database.ts';

export type Agent = ReturnType<typeof supertest.agent>;

/** The body of an answer, to be checked before it is used. */
export async function bodyOf(request: PromiseLike<{ body: unknown }>): Promise<unknown> {
  const { body } = await request;
  return body;
}

/** The people of every test: `owner` is the applicant of the cases, `other` is another applicant. */
export const testPeople = {
  owner: 'applicant',
  other: 'applicant',
  planner: 'planner',
  board: 'board',
  administrator: 'administrator',
} as const satisfies Record<string, Role>;
export type TestPerson = keyof typeof testPeople;

export interface TestApi {
  app: Express;
  deps: AppDeps;
  orm: MikroORM;
  databaseUrl: string;
  /** Somebody with a browser and an address of their own; `public` does not sign in. */
  signIn: (person: TestPerson | 'public') => Promise<Agent>;
  /** A case of `owner` on S-1 in this state; the life before it is left out. */
  createCase: (state: CaseState) => Promise<{ id: string; reference: string }>;
  setState: (caseId: string, state: CaseState) => Promise<void>;
  close: () => Promise<void>;
}

const password = 'a password of tests';

/**
 * The application on a database of its own, without a socket and without a worker; with other
 * settings or a log that is read, where a test is about them.
 */
export async function startTestApi({
  variables = {},
  logger = pino({ level: 'silent' }),
}: { variables?: NodeJS.ProcessEnv; logger?: Logger } = {}): Promise<TestApi> {
  const database = await createTestDatabase();
  const env = parseEnv({
    NODE_ENV: 'test',
    DATABASE_URL: database.appUrl,
    SESSION_SECRET: 'a secret of tests, long enough to be one',
    PUBLIC_URL: 'http://127.0.0.1:8080',
    TRUSTED_PROXIES: '1',
    ...variables,
  });
  const orm = await createOrm(database.appUrl);
  const queue = createJobQueue(database.appUrl, { supervise: false });
  await queue.start();
  const sessionStore = createSessionStore(database.appUrl);
  const deps = { orm, env, queue, clipper: await loadClipper(), logger, sessionStore };
  const app = createApp(deps);
  await createPeople(orm);
  let cases = 0;
  let agents = 0;

  return {
    app,
    deps,
    orm,
    databaseUrl: database.appUrl,
    signIn: async (person) => {
      agents += 1;
      // As from behind a proxy: limits count by address, and each test has them to itself.
      const agent = supertest.agent(app);
      agent.set('X-Forwarded-For', `10.0.${agents >> 8}.${agents & 255}`);
      if (person !== 'public') {
        await agent
          .post('/api/session')
          .send({ email: addressOf(person), password })
          .expect(200);
      }
      return agent;
    },
    createCase: async (state) => {
      cases += 1;
      const em = orm.em.fork();
      const siteParcels = ['S-1'];
      const site = await dissolveParcels(em, siteParcels);
      if (site === null) throw new Error('Build the small city first.');
      const draftKey = `draft-testcase${String(cases).padStart(6, '0')}`;
      const number = state === 'draft' ? null : `2026-${String(cases).padStart(4, '0')}`;
      const reviewCase = em.create(ReviewCase, {
        draftKey,
        number,
        title: `Case ${cases}`,
        description: 'Made by a test.',
        address: 'S-1 Test Row',
        state,
        stateSince: new Date(),
        siteSince: new Date(0),
        applicant: await em.findOneOrFail(Person, { email: addressOf('owner') }),
        siteParcels,
        ...site,
      });
      await em.flush();
      return { id: reviewCase.id, reference: number ?? draftKey };
    },
    setState: async (caseId, state) => {
      await orm.em.fork().nativeUpdate(ReviewCase, { id: caseId }, { state });
    },
    close: async () => {
      await queue.stop({ graceful: false });
      sessionStore.close();
      await orm.close();
      await database.drop();
    },
  };
}

function addressOf(person: TestPerson): string {
  return `${person}@testham.example`;
}

async function createPeople(orm: MikroORM): Promise<void> {
  const em = orm.em.fork();
  // The least work that argon2 takes: nobody's password is at stake here.
  const passwordHash = await hashPassword(password, { memoryCost: 1024, timeCost: 2 });
  for (const [name, role] of Object.entries(testPeople)) {
    em.create(Person, { email: `${name}@testham.example`, name, role, passwordHash });
  }
  await em.flush();
}
