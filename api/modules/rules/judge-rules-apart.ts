import { Worker } from 'node:worker_threads';
import { z } from 'zod';
import { findingRowSchema } from '../../../shared/contracts/studies.ts';
import { ruleSchema, type Rule } from '../../../shared/rules/rule-schema.ts';
import { studyFindingsSchema, type StudyInput } from '../../../shared/study/evidence-schema.ts';
import type { JudgedByRule } from './compare-trial.ts';

const messageSchema = z.union([
  z.object({ progress: z.object({ done: z.int(), total: z.int() }) }),
  z.object({
    judged: z.array(
      z.object({
        rule: ruleSchema,
        findings: studyFindingsSchema,
        rows: z.array(findingRowSchema),
      }),
    ),
  }),
]);

interface JudgeOptions {
  onProgress: (progress: { done: number; total: number }) => void;
  /** Ends the thread at once; the promise is then rejected with the signal's reason. */
  signal: AbortSignal;
}

/** Judges one case by several rules in a thread of its own, so that others are served meanwhile. */
export async function judgeRulesApart(
  input: StudyInput,
  rules: readonly Rule[],
  { onProgress, signal }: JudgeOptions,
): Promise<JudgedByRule[]> {
  signal.throwIfAborted();
  const thread = new Worker(new URL('./judge-rules.thread.mjs', import.meta.url), {
    workerData: { input, rules },
  });
  try {
    return await new Promise<JudgedByRule[]>((resolve, reject) => {
      signal.addEventListener('abort', () => reject(asError(signal.reason)), { once: true });
      thread.on('error', reject);
      thread.on('exit', () => reject(new Error('The thread that judges ended without an answer.')));
      thread.on('message', (value: unknown) => {
        const message = messageSchema.safeParse(value);
        if (!message.success) reject(message.error);
        else if ('progress' in message.data) onProgress(message.data.progress);
        else resolve(message.data.judged);
      });
    });
  } finally {
    await thread.terminate();
  }
}

function asError(reason: unknown): Error {
  return reason instanceof Error ? reason : new Error('The trial was ended.');
}
