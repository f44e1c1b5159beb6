import { queryOptions, useQueries, useQuery } from '@tanstack/react-query';
import type { LedgerDay } from '../../../../shared/receptors/sun-ledger-schema.ts';
import type { LiveClient } from './live-client.ts';
import type { LiveStudyState } from './use-live-study.ts';

/** The engine computes what is asked of it; nothing of it grows old. */
const computed = { staleTime: Infinity, retry: false, structuralSharing: false } as const;

function dayQueryOptions(
  client: LiveClient | null,
  studyId: string,
  receptor: string | null,
  date: string,
) {
  return queryOptions({
    ...computed,
    queryKey: ['studies', studyId, 'live', 'day', receptor, date],
    queryFn: ({ signal }): Promise<LedgerDay | null> =>
      client === null || receptor === null
        ? Promise.resolve(null)
        : client.dayOf(receptor, date, signal),
    enabled: client !== null && receptor !== null,
  });
}

/** The accounts of receptors on any one date, in their order; undefined where one is not there yet. */
export function useLiveDays(
  live: LiveStudyState,
  studyId: string,
  receptors: readonly string[],
  date: string,
): (LedgerDay | null | undefined)[] {
  const client = live.status === 'ready' ? live.client : null;
  const days = useQueries({
    queries: receptors.map((receptor) => dayQueryOptions(client, studyId, receptor, date)),
  });
  return days.map(({ data }) => data);
}

/** The account of one receptor on any date; undefined while it is not there. */
export function useLiveDay(
  live: LiveStudyState,
  studyId: string,
  receptor: string | null,
  date: string,
): LedgerDay | null | undefined {
  const client = live.status === 'ready' ? live.client : null;
  return useQuery(dayQueryOptions(client, studyId, receptor, date)).data;
}

/** Who loses sun on a date that the study does not list; undefined while it is not known. */
export function useLiveLosers(
  live: LiveStudyState,
  studyId: string,
  date: string,
  isListed: boolean,
) {
  const client = live.status === 'ready' ? live.client : null;
  return useQuery({
    ...computed,
    queryKey: ['studies', studyId, 'live', 'losers', date],
    queryFn: ({ signal }) =>
      client === null ? Promise.resolve([]) : client.losersOn(date, signal),
    enabled: client !== null && !isListed,
  }).data;
}
