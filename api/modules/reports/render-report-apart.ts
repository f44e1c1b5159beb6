import { once } from 'node:events';
import { Worker } from 'node:worker_threads';
import { z } from 'zod';
import type { RenderedReport } from './render-report.ts';
import type { ReportPayload } from './report-payload.ts';

const answerSchema = z.object({ bytes: z.instanceof(Uint8Array), pages: z.int() });

/** Draws a report in a thread of its own: that takes seconds, and others are served meanwhile. */
export async function renderReportApart(payload: ReportPayload): Promise<RenderedReport> {
  const thread = new Worker(new URL('./render-report.thread.mjs', import.meta.url), {
    workerData: payload,
  });
  try {
    const [answer] = await Promise.race([
      // An error of the thread is thrown here.
      once(thread, 'message'),
      once(thread, 'exit').then((): unknown[] => {
        throw new Error('The thread that draws reports ended without an answer.');
      }),
    ]);
    const { bytes, pages } = answerSchema.parse(answer);
    return { bytes: Buffer.from(bytes), pages };
  } finally {
    await thread.terminate();
  }
}
