import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import type { StudyDetail } from '../../../../shared/contracts/studies.ts';
import { ChoiceRow } from '../../../components/choice-row.tsx';
import { EmptyState } from '../../../components/empty-state.tsx';
import { Loading } from '../../../components/loading.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useStudyEvidence } from '../../../features/studies/api/get-study-evidence.ts';
import { useEveryFinding } from '../../../features/studies/api/list-every-finding.ts';
import { useStudies } from '../../../features/studies/api/list-studies.ts';
import { isUnderWay } from '../../../features/studies/api/watch-study.ts';
import { RequestStudyButton } from '../../../features/studies/components/request-study-button.tsx';
import { StudyExplorer } from '../../../features/studies/components/study-explorer.tsx';
import { StudyRun } from '../../../features/studies/components/study-run.tsx';
import { chooseStudy, finishedStudies } from '../../../features/studies/shown-study.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { useDeskCase } from './desk-case-page.tsx';

/** The study of a case: run it, then look at it hour by hour. */
export function DeskStudyPage() {
  const reviewCase = useDeskCase();
  const studies = useStudies(reviewCase.reference);
  return (
    <QueryView query={studies} what="the studies">
      {({ rows }) => <Studies reviewCase={reviewCase} studies={rows} />}
    </QueryView>
  );
}

interface StudiesProps {
  reviewCase: CaseDetail;
  /** The latest first. */
  studies: readonly StudyDetail[];
}

function Studies({ reviewCase, studies }: StudiesProps) {
  const [revision, setRevision] = useSearchState('revision');
  const canRun = reviewCase.abilities.includes('request-study');
  const underWay = studies.find(({ status }) => isUnderWay(status)) ?? null;
  const finished = finishedStudies(studies);
  const shown = chooseStudy(finished, revision);
  const hasCurrent = finished.some(({ isCurrent }) => isCurrent);
  return (
    <div className="grid gap-6">
      {underWay === null ? (
        <StudyStanding
          reviewCase={reviewCase}
          latest={studies[0] ?? null}
          hasCurrent={hasCurrent}
          canRun={canRun}
        />
      ) : (
        <StudyRun key={underWay.id} study={underWay} canCancel={canRun} />
      )}
      {finished.length < 2 ? null : (
        <div className="flex flex-wrap items-baseline gap-x-4">
          <span className="label-caps">Study of</span>
          <ChoiceRow
            label="Study of revision"
            options={finished.map((study) => ({
              id: String(study.revision),
              label: `revision ${study.revision}`,
            }))}
            value={shown === null ? null : String(shown.revision)}
            onChange={(next) => setRevision(next === String(finished[0]?.revision) ? null : next)}
          />
        </div>
      )}
      {shown === null ? null : <ShownStudy key={shown.id} reviewCase={reviewCase} study={shown} />}
    </div>
  );
}

interface StudyStandingProps {
  reviewCase: CaseDetail;
  latest: StudyDetail | null;
  hasCurrent: boolean;
  canRun: boolean;
}

/** What stands in the way of reading figures of the current massing, and the button that mends it. */
function StudyStanding({ reviewCase, latest, hasCurrent, canRun }: StudyStandingProps) {
  const { reference, latestRevision } = reviewCase;
  if (latestRevision === null) {
    return (
      <EmptyState title="There is no massing to study yet.">
        <p>The applicant uploads one; then the study can be run.</p>
      </EmptyState>
    );
  }
  const isFailed = latest?.status === 'failed';
  if (hasCurrent && !isFailed) return null;
  const title = isFailed
    ? `The last study failed. ${latest.failure ?? ''}`
    : latest === null
      ? 'No study has been run yet.'
      : `Revision ${latestRevision} has not been studied.`;
  return (
    <EmptyState title={title}>
      {canRun ? (
        <>
          <p>
            It computes the shadows of every hour of the four key dates and judges every neighbour
            by the rule in force.
          </p>
          <RequestStudyButton
            reference={reference}
            label={isFailed ? 'Run the study again' : `Run the study of revision ${latestRevision}`}
          />
        </>
      ) : null}
    </EmptyState>
  );
}

function ShownStudy({ reviewCase, study }: { reviewCase: CaseDetail; study: StudyDetail }) {
  const formats = useFormats();
  const evidence = useStudyEvidence(study.id);
  const rows = useEveryFinding(study.id);
  const error = evidence.error ?? rows.error;
  return (
    <div className="grid gap-6">
      {study.isCurrent ? null : (
        <p className="say">
          This study judges revision {study.revision}; the case has a newer massing.
        </p>
      )}
      {error !== null ? (
        <ProblemNotice
          error={error}
          onRetry={() => {
            void evidence.refetch();
            void rows.refetch();
          }}
        />
      ) : evidence.data === undefined || rows.data === undefined ? (
        <Loading what="the study" />
      ) : (
        <StudyExplorer
          study={study}
          site={reviewCase.site}
          evidence={evidence.data}
          rows={rows.data}
        />
      )}
      <p className="border-t border-hairline pt-3 text-small">
        Study <span className="break-all">{study.digest}</span>, engine {study.engine}
        {study.finishedAt === null ? '' : `, finished ${formats.instant(study.finishedAt)}`}. Rule:{' '}
        {study.rule.title}, version {study.rule.version}
        {study.rule.citation === '' ? '' : ` (${study.rule.citation})`}.
      </p>
    </div>
  );
}
