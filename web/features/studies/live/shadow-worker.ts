import wasmUrl from 'clipper2-wasm/dist/es/clipper2z.wasm?url';
import { z } from 'zod';
import { createClipper } from '../../../../shared/shadow/clipper.ts';
import { studyInputSchema } from '../../../../shared/study/evidence-schema.ts';
import {
  openLiveStudy,
  type LiveInstant,
  type LiveStudy,
} from '../../../../shared/study/live-study.ts';
import { presentShadows } from '../../../../shared/study/present-shadows.ts';
import type { LiveAnswer, LiveQuestion, LiveShadows } from './live-messages.ts';

/** The engine beside the page: it fetches a study's input once and then answers without a request. */
let study: LiveStudy | null = null;

/** An evidence file is its study's input with results and a digest. */
const evidenceSchema = z
  .looseObject({ results: z.unknown(), digest: z.unknown() })
  .transform(({ results: _results, digest: _digest, ...input }) => input)
  .pipe(studyInputSchema);

self.addEventListener('message', (event: MessageEvent<LiveQuestion>) => {
  void answer(event.data).then(
    (message) => self.postMessage(message),
    (error: unknown) => {
      const message = error instanceof Error ? error.message : String(error);
      self.postMessage({ kind: 'failed', message } satisfies LiveAnswer);
    },
  );
});

async function answer(question: LiveQuestion): Promise<LiveAnswer> {
  if (question.kind === 'open') {
    const [input, wasm] = await Promise.all([
      fetchFile(`/api/studies/${question.studyId}/evidence`).then(readJson),
      fetchFile(wasmUrl).then((response) => response.arrayBuffer()),
    ]);
    study = openLiveStudy(evidenceSchema.parse(input), await createClipper(wasm));
    return { kind: 'open' };
  }
  if (study === null) throw new Error('No study is open.');
  const start = performance.now();
  const answered = answerFrom(study, question);
  // Shown by the browser's own tools, and read by the benchmark.
  performance.measure(question.kind, { start, end: performance.now() });
  return answered;
}

function answerFrom(
  opened: LiveStudy,
  question: Exclude<LiveQuestion, { kind: 'open' }>,
): LiveAnswer {
  switch (question.kind) {
    case 'shadows': {
      const instant = opened.shadowsAt(question.at);
      return { kind: 'shadows', drawn: instant === null ? null : toLiveShadows(instant) };
    }
    case 'day':
      return { kind: 'day', day: opened.dayOf(question.receptor, question.date) };
    case 'losers':
      return { kind: 'losers', losers: opened.losersOn(question.date) };
  }
}

async function fetchFile(url: string): Promise<Response> {
  const response = await fetch(url, { credentials: 'same-origin' });
  if (!response.ok) throw new Error(`${url}: ${response.status}`);
  return response;
}

async function readJson(response: Response): Promise<unknown> {
  return response.json();
}

function toLiveShadows(instant: LiveInstant): LiveShadows {
  return { shadows: presentShadows(instant), netNewM2: instant.netNewM2 };
}
