import type { StudyDetail } from '../../../../shared/contracts/studies.ts';
import { EmptyState } from '../../../components/empty-state.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useStudies } from '../../../features/studies/api/list-studies.ts';
import { StudyFindings } from '../../../features/studies/components/study-findings.tsx';
import { chooseStudy, finishedStudies } from '../../../features/studies/shown-study.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { paths } from '../../paths.ts';
import { useDeskCase } from './desk-case-page.tsx';

/** The findings of a study, each receptor a step away from the map. */
export function DeskFindingsPage() {
  const reviewCase = useDeskCase();
  const studies = useStudies(reviewCase.reference);
  const [revision] = useSearchState('revision');
  return (
    <QueryView query={studies} what="the studies">
      {({ rows }) => {
        const study = chooseStudy(finishedStudies(rows), revision);
        return study === null ? (
          <EmptyState title="There are no findings yet.">
            <p>They come with the first finished study, which is run in the part “Study”.</p>
          </EmptyState>
        ) : (
          <StudyFindings
            key={study.id}
            study={study}
            hrefOnMap={(row) => hrefOnMap(reviewCase.reference, study, row)}
          />
        );
      }}
    </QueryView>
  );
}

function hrefOnMap(
  reference: string,
  study: StudyDetail,
  row: { receptor: string; day: string | null },
): string {
  const search = new URLSearchParams({ receptor: row.receptor });
  if (row.day !== null) search.set('date', row.day);
  if (!study.isCurrent) search.set('revision', String(study.revision));
  return `${paths.deskCase.href(reference, 'study')}?${search.toString()}`;
}
