import { useEffect, useRef, useState } from 'react';
import {
  trialLineSchema,
  type RuleTrial,
  type TryRuleInput,
} from '../../../../shared/contracts/rule-trials.ts';
import { callApiForLines } from '../../../lib/api-client.ts';
import { ApiError } from '../../../lib/api-error.ts';

export type TrialState =
  | { status: 'idle' }
  | { status: 'running'; done: number; total: number }
  | { status: 'done'; trial: RuleTrial }
  | { status: 'failed'; error: unknown };

const idle: TrialState = { status: 'idle' };

/** Tries a rule on a case; it ends when it is cancelled or the page is left. */
export function useRuleTrial() {
  const [state, setState] = useState<TrialState>(idle);
  const running = useRef<AbortController | null>(null);
  useEffect(() => () => running.current?.abort(), []);

  const start = async (input: TryRuleInput) => {
    running.current?.abort();
    const run = new AbortController();
    running.current = run;
    setState({ status: 'running', done: 0, total: 0 });
    try {
      const trial = await readTrial(input, run.signal, (progress) => {
        if (!run.signal.aborted) setState({ status: 'running', ...progress });
      });
      if (!run.signal.aborted) setState({ status: 'done', trial });
    } catch (error) {
      if (!run.signal.aborted) setState({ status: 'failed', error });
    }
  };
  const cancel = () => {
    running.current?.abort();
    setState(idle);
  };
  return { state, start, cancel };
}

async function readTrial(
  input: TryRuleInput,
  signal: AbortSignal,
  onProgress: (progress: { done: number; total: number }) => void,
): Promise<RuleTrial> {
  const request = { method: 'POST', body: input, signal } as const;
  for await (const line of callApiForLines(trialLineSchema, '/rules/trials', request)) {
    if ('result' in line) return line.result;
    if ('problem' in line) throw new ApiError(line.problem);
    onProgress(line.progress);
  }
  throw new ApiError({
    type: 'about:blank',
    title: 'The server broke off before it had a result. Try again.',
    status: 0,
    code: 'UNAVAILABLE',
  });
}
