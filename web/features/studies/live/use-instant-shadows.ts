import { useCallback, useEffect, useRef, useState } from 'react';
import type { InstantShadows } from '../../../../shared/contracts/studies.ts';
import { useShadows } from '../api/get-shadows.ts';
import { createLatestWins, type LatestWins } from './latest-wins.ts';
import type { LiveStudyState } from './use-live-study.ts';

export interface ShownShadows {
  /** The last that were drawn; they may be of an earlier instant than the one asked for. */
  shadows: InstantShadows | null;
  /** Ground that the proposal shades anew then; null where it is not known. */
  netNewM2: number | null;
  error: unknown;
  onRetry: () => void;
}

interface Drawn {
  shadows: InstantShadows;
  netNewM2: number;
}

/**
 * The shadows of an instant: from the engine beside the page, which keeps up with the handle, or,
 * where the browser could not start it, from the server once the handle rests.
 *
 * @param at RFC 3339; null with the sun down
 * @param settledAt the same once it has stayed the same for a while
 */
export function useInstantShadows(
  live: LiveStudyState,
  studyId: string,
  at: string | null,
  settledAt: string | null,
): ShownShadows {
  const [drawn, setDrawn] = useState<Drawn | null>(null);
  const [failure, setFailure] = useState<unknown>(null);
  const asker = useRef<LatestWins<string>>(null);
  const client = live.status === 'ready' ? live.client : null;
  useEffect(() => {
    if (client === null) return;
    const created = createLatestWins<string, Awaited<ReturnType<typeof client.shadowsAt>>>({
      ask: (wanted) => client.shadowsAt(wanted),
      onAnswer: (answer) => {
        setDrawn(answer);
        setFailure(null);
      },
      onError: setFailure,
    });
    asker.current = created;
    return () => {
      asker.current = null;
      created.close();
    };
  }, [client]);
  useEffect(() => {
    if (client !== null && at !== null) asker.current?.want(at);
  }, [client, at]);
  const askAgain = useCallback(() => {
    if (at !== null) asker.current?.want(at);
  }, [at]);

  const isFromServer = live.status === 'unavailable';
  const fetched = useShadows(isFromServer ? studyId : null, settledAt);
  if (isFromServer) {
    return {
      shadows: fetched.data ?? null,
      netNewM2: null,
      error: fetched.error,
      onRetry: () => void fetched.refetch(),
    };
  }
  return {
    shadows: drawn?.shadows ?? null,
    netNewM2: drawn?.netNewM2 ?? null,
    error: failure,
    onRetry: askAgain,
  };
}
