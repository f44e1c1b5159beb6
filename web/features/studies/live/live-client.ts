import type { LedgerDay } from '../../../../shared/receptors/sun-ledger-schema.ts';
import type { ReceptorHours } from '../../../../shared/study/live-study.ts';
import type { LiveAnswer, LiveQuestion, LiveShadows } from './live-messages.ts';

/** Asks the worker about one study, and keeps it from being asked more than one thing at a time. */
export interface LiveClient {
  /** Null with the sun down. It goes before everything that waits. */
  shadowsAt: (at: string) => Promise<LiveShadows | null>;
  dayOf: (receptor: string, date: string, signal?: AbortSignal) => Promise<LedgerDay | null>;
  losersOn: (date: string, signal?: AbortSignal) => Promise<ReceptorHours[]>;
  close: () => void;
}

/** What a client needs of a worker. */
export interface WorkerPort {
  postMessage: (question: LiveQuestion) => void;
  onmessage: ((event: MessageEvent<LiveAnswer>) => void) | null;
  onerror: ((event: ErrorEvent) => void) | null;
  terminate: () => void;
}

interface Waiting {
  question: LiveQuestion;
  signal: AbortSignal | undefined;
  resolve: (answer: LiveAnswer) => void;
  reject: (error: Error) => void;
}

/**
 * Opens a study in a worker.
 *
 * @param onReady the worker has read the study
 * @param onBroken it could not start, or broke; every question is refused from then on
 */
export function openLiveClient(
  worker: WorkerPort,
  studyId: string,
  { onReady, onBroken }: { onReady: () => void; onBroken: () => void },
): LiveClient {
  const waiting: Waiting[] = [];
  let asked: Waiting | null = null;
  let isOpen = true;

  const askNext = () => {
    while (asked === null) {
      const next = waiting.shift();
      if (next === undefined) return;
      if (next.signal?.aborted === true) {
        next.reject(new Error('Nobody waits for this any more.'));
        continue;
      }
      asked = next;
      worker.postMessage(next.question);
    }
  };
  const refuseAll = (message: string) => {
    isOpen = false;
    const error = new Error(message);
    asked?.reject(error);
    for (const one of waiting.splice(0)) one.reject(error);
  };
  const ask = (question: LiveQuestion, signal?: AbortSignal, isUrgent = false) =>
    new Promise<LiveAnswer>((resolve, reject) => {
      if (!isOpen) {
        reject(new Error('The worker is closed.'));
        return;
      }
      const entry = { question, signal, resolve, reject };
      if (isUrgent) waiting.unshift(entry);
      else waiting.push(entry);
      askNext();
    });

  worker.onmessage = ({ data }) => {
    const answered = asked;
    asked = null;
    if (data.kind === 'failed') answered?.reject(new Error(data.message));
    else answered?.resolve(data);
    askNext();
  };
  worker.onerror = () => {
    refuseAll('The worker broke.');
    onBroken();
  };
  ask({ kind: 'open', studyId }).then(onReady, () => {
    if (isOpen) onBroken();
  });

  return {
    shadowsAt: async (at) => {
      const answer = await ask({ kind: 'shadows', at }, undefined, true);
      if (answer.kind !== 'shadows') throw unexpected(answer);
      return answer.drawn;
    },
    dayOf: async (receptor, date, signal) => {
      const answer = await ask({ kind: 'day', receptor, date }, signal);
      if (answer.kind !== 'day') throw unexpected(answer);
      return answer.day;
    },
    losersOn: async (date, signal) => {
      const answer = await ask({ kind: 'losers', date }, signal);
      if (answer.kind !== 'losers') throw unexpected(answer);
      return answer.losers;
    },
    close: () => {
      refuseAll('The worker is closed.');
      worker.terminate();
    },
  };
}

function unexpected({ kind }: LiveAnswer): Error {
  return new Error(`The worker answered with ${kind}.`);
}
