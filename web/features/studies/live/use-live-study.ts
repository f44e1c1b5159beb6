import { useEffect, useState } from 'react';
import { openLiveClient, type LiveClient, type WorkerPort } from './live-client.ts';

/** The engine beside the page; `unavailable` where the browser could not start it. */
export type LiveStudyState =
  { status: 'starting' } | { status: 'ready'; client: LiveClient } | { status: 'unavailable' };

interface Opened {
  studyId: string;
  state: LiveStudyState;
}

const starting: LiveStudyState = { status: 'starting' };

/** Starts the engine in a worker for one study, and ends it with the page. */
export function useLiveStudy(studyId: string): LiveStudyState {
  const [opened, setOpened] = useState<Opened | null>(null);
  useEffect(() => {
    let isCurrent = true;
    const tell = (state: LiveStudyState) => {
      if (isCurrent) setOpened({ studyId, state });
    };
    const worker = startWorker();
    const client =
      worker === null
        ? null
        : openLiveClient(worker, studyId, {
            onReady: () => {
              if (client !== null) tell({ status: 'ready', client });
            },
            onBroken: () => tell({ status: 'unavailable' }),
          });
    if (client === null) queueMicrotask(() => tell({ status: 'unavailable' }));
    return () => {
      isCurrent = false;
      client?.close();
    };
  }, [studyId]);
  return opened?.studyId === studyId ? opened.state : starting;
}

/** Null where the browser has no workers of modules. */
function startWorker(): WorkerPort | null {
  try {
    return new Worker(new URL('./shadow-worker.ts', import.meta.url), { type: 'module' });
  } catch {
    return null;
  }
}
