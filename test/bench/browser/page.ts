import { openLiveClient } from '../../../web/features/studies/live/live-client.ts';

/** What the benchmark asks of the page; see `browser-worker.ts`. */
export interface BenchPage {
  open: (studyId: string) => Promise<void>;
  /** Milliseconds from the question to the answer in the page, one for each instant. */
  drawAll: (instants: readonly string[]) => Promise<number[]>;
  accountAll: (receptors: readonly string[], date: string) => Promise<number[]>;
}

declare global {
  interface Window {
    bench: BenchPage;
  }
}

const worker = new Worker(
  new URL('../../../web/features/studies/live/shadow-worker.ts', import.meta.url),
  { type: 'module' },
);

let client: ReturnType<typeof openLiveClient> | null = null;

function opened(): ReturnType<typeof openLiveClient> {
  if (client === null) throw new Error('No study is open.');
  return client;
}

/** One after the other, as a person who drags the handle asks. */
async function timeEach(questions: readonly (() => Promise<unknown>)[]): Promise<number[]> {
  const tookMs: number[] = [];
  for (const ask of questions) {
    const startedMs = performance.now();
    await ask();
    tookMs.push(performance.now() - startedMs);
  }
  return tookMs;
}

window.bench = {
  open: (studyId) =>
    new Promise((resolve, reject) => {
      client = openLiveClient(worker, studyId, {
        onReady: resolve,
        onBroken: () => reject(new Error('The worker could not start.')),
      });
    }),
  drawAll: (instants) => timeEach(instants.map((at) => () => opened().shadowsAt(at))),
  accountAll: (receptors, date) =>
    timeEach(receptors.map((receptor) => () => opened().dayOf(receptor, date))),
};
