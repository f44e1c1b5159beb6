import type { FindingRow, StudyDetail } from '../../../../shared/contracts/studies.ts';
import type { Polygonal } from '../../../../shared/geometry/geojson-schema.ts';
import { Loading } from '../../../components/loading.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { useReceptor } from '../api/get-receptor.ts';
import type { DrawnEvidence } from '../api/get-study-evidence.ts';
import { useReceptorDay } from '../use-receptor-day.ts';
import { useStudyLook } from '../use-study-look.ts';
import { ReceptorDay } from './receptor-day.tsx';
import { StudyDownloads } from './study-downloads.tsx';
import { StudySheet } from './study-sheet.tsx';
import { SunLosersTable } from './sun-losers-table.tsx';

export interface StudyExplorerProps {
  /** Finished. */
  study: StudyDetail;
  site: Polygonal | null;
  evidence: DrawnEvidence;
  /** Every finding of the study. */
  rows: readonly FindingRow[];
}

const tableId = 'who-loses-sun';

/** A finished study to look at hour by hour: the map over the sun arc, and who loses sun beside it. */
export function StudyExplorer({ study, site, evidence, rows }: StudyExplorerProps) {
  const look = useStudyLook(study, evidence, rows);
  const { view, live, losers } = look;
  const { date, change } = view;
  const chosen = view.receptor ?? losers?.[0]?.receptor ?? null;
  const receptor = useReceptor(study.id, chosen);
  const receptorDay = useReceptorDay(live, study.id, chosen, date);

  return (
    <div className="grid gap-x-8 gap-y-6 lg:grid-cols-[minmax(0,8fr)_minmax(0,5fr)]">
      <StudySheet
        study={study}
        site={site}
        evidence={evidence}
        rows={rows}
        look={look}
        chosen={chosen}
        onChoose={(next) => change({ receptor: next })}
        tableId={tableId}
      />
      <section id={tableId} aria-label="Who loses sun" className="grid content-start gap-5">
        <SunLosersTable
          key={date}
          studyId={study.id}
          look={look}
          receptorCount={evidence.results.receptors.length}
          chosen={chosen}
          onChoose={(next) => change({ receptor: next })}
        />
        {receptor.isError ? <ProblemNotice error={receptor.error} /> : null}
        {chosen !== null && receptor.isPending ? <Loading what="the sun ledger" /> : null}
        {receptor.data === undefined ? null : (
          <ReceptorDay detail={receptor.data} day={receptorDay} />
        )}
        <StudyDownloads studyId={study.id} />
      </section>
    </div>
  );
}
