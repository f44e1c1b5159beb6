import { useMemo } from 'react';
import type { FindingRow, StudyDetail } from '../../../shared/contracts/studies.ts';
import { useStudyView } from '../../map/use-study-view.ts';
import type { DrawnEvidence } from './api/get-study-evidence.ts';
import { useLiveLosers } from './live/use-live-days.ts';
import { useLiveStudy, type LiveStudyState } from './live/use-live-study.ts';
import { listSunLosers, type SunLoser } from './sun-losers.ts';

/** A finished study as it is looked at: what the address asks for, the engine, and who loses sun. */
export interface StudyLook {
  view: ReturnType<typeof useStudyView>;
  live: LiveStudyState;
  /** On the chosen date; null while it is not known. */
  losers: SunLoser[] | null;
}

export function useStudyLook(
  study: StudyDetail,
  evidence: DrawnEvidence,
  rows: readonly FindingRow[],
): StudyLook {
  const view = useStudyView(study);
  const live = useLiveStudy(study.id);
  const { date } = view;
  const isListed = useMemo(() => listsDate(evidence, date), [evidence, date]);
  const computed = useLiveLosers(live, study.id, date, isListed);
  const losers = useMemo(() => {
    if (isListed) return listSunLosers(evidence, rows, date);
    return computed === undefined
      ? null
      : listSunLosers({ ...evidence, results: { receptors: computed } }, rows, date);
  }, [evidence, rows, date, isListed, computed]);
  return { view, live, losers };
}

/** Whether the study lists instants of a civil date; without them nothing can be said of it. */
function listsDate({ results }: DrawnEvidence, date: string): boolean {
  return results.receptors.some(({ instants }) => instants.some(({ at }) => at.startsWith(date)));
}
