import type { LedgerDay } from '../../../shared/receptors/sun-ledger-schema.ts';
import { useReceptor } from './api/get-receptor.ts';
import { ledgerDayOf } from './ledger-day.ts';
import { useLiveDay } from './live/use-live-days.ts';
import type { LiveStudyState } from './live/use-live-study.ts';

/**
 * A receptor's account of any date: from the engine beside the page, or, where the browser could not
 * start it, from the server's ledger of the key dates. Null where there is none, or none yet.
 */
export function useReceptorDay(
  live: LiveStudyState,
  studyId: string,
  receptor: string | null,
  date: string,
): LedgerDay | null {
  const computed = useLiveDay(live, studyId, receptor, date);
  const isFromServer = live.status === 'unavailable';
  const fetched = useReceptor(isFromServer ? studyId : null, receptor);
  return isFromServer ? ledgerDayOf(fetched.data?.ledger, date) : (computed ?? null);
}
