import { Link, useParams } from 'react-router-dom';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import type { StudyDetail } from '../../../shared/contracts/studies.ts';
import { EmptyState } from '../../components/empty-state.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { useCase } from '../../features/cases/api/get-case.ts';
import { useStudies } from '../../features/studies/api/list-studies.ts';
import { StudyFindings } from '../../features/studies/components/study-findings.tsx';
import { chooseStudy, finishedStudies } from '../../features/studies/shown-study.ts';
import { isApiError } from '../../lib/api-error.ts';
import { useSearchState } from '../../lib/use-search-state.ts';
import { paths } from '../paths.ts';
import { NotFoundPage } from './not-found-page.tsx';

/** The findings of a case for everybody who may read its study: neighbours, applicant, staff. */
export function CaseFindingsPage() {
  const { reference = '' } = useParams();
  const reviewCase = useCase(reference);
  if (isApiError(reviewCase.error, 'NOT_FOUND')) return <NotFoundPage />;
  return (
    <div className="sheet-width grid gap-6 py-8">
      <QueryView query={reviewCase} what="the case">
        {(detail) => <Findings reviewCase={detail} />}
      </QueryView>
    </div>
  );
}

function Findings({ reviewCase }: { reviewCase: CaseDetail }) {
  const { reference, title } = reviewCase;
  const studies = useStudies(reference);
  const [revision] = useSearchState('revision');
  return (
    <>
      <div className="grid gap-2">
        <p className="no-print">
          <Link to={paths.publicCase.href(reference)} className="link">
            Back to the case
          </Link>
        </p>
        <PageHeading title={`Findings: ${title}`}>What the rule says of {title}</PageHeading>
      </div>
      <QueryView query={studies} what="the studies">
        {({ rows }) => {
          const study = chooseStudy(finishedStudies(rows), revision);
          return study === null ? (
            <EmptyState title="There are no findings yet.">
              <p>They come with the first finished study of the planning department.</p>
            </EmptyState>
          ) : (
            <StudyFindings
              key={study.id}
              study={study}
              hrefOnMap={(row) => hrefOnMap(reference, study, row)}
            />
          );
        }}
      </QueryView>
    </>
  );
}

function hrefOnMap(
  reference: string,
  study: StudyDetail,
  { receptor, day }: { receptor: string; day: string | null },
): string {
  const search = new URLSearchParams({ receptor });
  if (day !== null) search.set('date', day);
  if (!study.isCurrent) search.set('revision', String(study.revision));
  return `${paths.publicCase.href(reference)}?${search.toString()}#changes`;
}
