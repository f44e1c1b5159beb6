import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { setTimeout as wait } from 'node:timers/promises';
import { createJobQueue } from '../../api/jobs/job-queue.ts';
import { startWorker } from '../../api/jobs/start-worker.ts';
import { studyDetailSchema, type StudyDetail } from '../../shared/contracts/studies.ts';
import { tower } from './small-city.ts';
import { bodyOf, type Agent, type TestApi } from './test-api.ts';

/** A worker in this process; stop it before the API. */
export async function startTestWorker({ deps, databaseUrl }: TestApi): Promise<{
  stop: () => Promise<void>;
}> {
  const queue = createJobQueue(databaseUrl, { supervise: true });
  return startWorker({ orm: deps.orm, queue, clipper: deps.clipper, logger: deps.logger });
}

/** A worker in a process of its own, as `npm start` runs it. */
export function spawnWorker({ databaseUrl, deps }: TestApi): ChildProcess {
  return spawn(process.execPath, ['--import', 'tsx', 'api/worker.ts'], {
    env: {
      ...process.env,
      NODE_ENV: 'test',
      DATABASE_URL: databaseUrl,
      SESSION_SECRET: deps.env.SESSION_SECRET,
      LOG_LEVEL: 'info',
    },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
}

/** Ends a spawned worker and waits until it is gone. */
export async function endWorker(
  worker: ChildProcess,
  signal: 'SIGTERM' | 'SIGKILL',
): Promise<number | null> {
  if (worker.exitCode !== null) return worker.exitCode;
  const ended = once(worker, 'exit');
  worker.kill(signal);
  const [code] = (await ended) as [number | null];
  return code;
}

/** A case under review with a massing of its owner. */
export async function createReviewedCase(
  api: TestApi,
  massing = tower,
): Promise<{ id: string; reference: string }> {
  const reviewCase = await api.createCase('sent-back');
  const owner = await api.signIn('owner');
  await owner
    .post(`/api/cases/${reviewCase.reference}/massings`)
    .attach('file', massing, 'massing.geojson')
    .expect(201);
  await api.setState(reviewCase.id, 'under-review');
  return reviewCase;
}

export async function requestStudy(planner: Agent, reference: string): Promise<StudyDetail> {
  const body = await bodyOf(planner.post(`/api/cases/${reference}/studies`).expect(202));
  return studyDetailSchema.parse(body);
}

export async function readStudy(agent: Agent, id: string): Promise<StudyDetail> {
  const body = await bodyOf(agent.get(`/api/studies/${id}`).expect(200));
  return studyDetailSchema.parse(body);
}

/** Looks at the study until it is as wanted; the test's own time limit ends the wait. */
export async function waitForStudy(
  agent: Agent,
  id: string,
  isWanted: (study: StudyDetail) => boolean,
): Promise<StudyDetail> {
  for (;;) {
    const study = await readStudy(agent, id);
    if (isWanted(study)) return study;
    await wait(50);
  }
}

export const hasEnded = ({ status }: StudyDetail) => status !== 'queued' && status !== 'running';
