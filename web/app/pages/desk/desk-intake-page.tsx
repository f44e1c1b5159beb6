import { Link } from 'react-router-dom';
import { caseStateWords, publicCaseStates } from '../../../../shared/contracts/case-life.ts';
import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import type { MassingSummary } from '../../../../shared/contracts/massings.ts';
import { EmptyState } from '../../../components/empty-state.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useToast } from '../../../components/toast.tsx';
import { listCompleteness } from '../../../features/cases/completeness.ts';
import { CaseTransitions } from '../../../features/cases/components/case-transitions.tsx';
import { CompletenessList } from '../../../features/cases/components/completeness-list.tsx';
import { CorrectionNotice } from '../../../features/cases/components/correction-notice.tsx';
import { useMassing } from '../../../features/massings/api/get-massing.ts';
import { useMassings } from '../../../features/massings/api/list-massings.ts';
import { MassingReview } from '../../../features/massings/components/massing-review.tsx';
import { RevisionComparison } from '../../../features/massings/components/revision-comparison.tsx';
import { RevisionTable } from '../../../features/massings/components/revision-table.tsx';
import { drawnBlocksOf } from '../../../features/massings/drawn-block.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { paths } from '../../paths.ts';
import { useDeskCase } from './desk-case-page.tsx';

/** The application as it came in: what it brings, what was wrong with it, and where it goes next. */
export function DeskIntakePage() {
  const reviewCase = useDeskCase();
  const massings = useMassings(reviewCase.reference);
  return (
    <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1fr)_19rem]">
      <div className="grid gap-8">
        {reviewCase.correction === null ? null : (
          <CorrectionNotice correction={reviewCase.correction} />
        )}
        <ApplicationSection reviewCase={reviewCase} />
        <QueryView query={massings} what="the revisions">
          {({ rows }) => <MassingSections reviewCase={reviewCase} revisions={rows} />}
        </QueryView>
      </div>
      <NextSection reviewCase={reviewCase} />
    </div>
  );
}

function ApplicationSection({ reviewCase }: { reviewCase: CaseDetail }) {
  return (
    <section className="grid gap-2" aria-labelledby="application-heading">
      <h2 id="application-heading">Application</h2>
      <p className="measure whitespace-pre-line">
        {reviewCase.description === '' ? 'Without a description.' : reviewCase.description}
      </p>
      <p className="text-small">By {reviewCase.applicantName}.</p>
      <ul className="text-small">
        {reviewCase.siteParcels.map((parcel) => (
          <li key={parcel.number}>
            {parcel.address} <span className="text-ink-soft">parcel {parcel.number}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

interface MassingSectionsProps {
  reviewCase: CaseDetail;
  /** The latest first. */
  revisions: readonly MassingSummary[];
}

function MassingSections({ reviewCase, revisions }: MassingSectionsProps) {
  const { reference, site } = reviewCase;
  const [shownText, setShown] = useSearchState('revision');
  const latest = revisions[0]?.revision ?? null;
  const wanted = Number(shownText);
  const shown = revisions.some(({ revision }) => revision === wanted) ? wanted : latest;
  const massing = useMassing(reference, shown);
  const latestMassing = useMassing(reference, latest);
  if (latest === null) {
    return (
      <>
        <CompletenessSection items={listCompleteness(reviewCase, null)} />
        <EmptyState title="No massing was sent yet.">
          <p>The applicant uploads it before the application can be submitted.</p>
        </EmptyState>
      </>
    );
  }
  return (
    <>
      <QueryView query={latestMassing} what="the latest revision">
        {(detail) => <CompletenessSection items={listCompleteness(reviewCase, detail)} />}
      </QueryView>
      <section className="grid gap-2" aria-labelledby="revisions-heading">
        <h2 id="revisions-heading">Massing revisions</h2>
        <RevisionTable
          reference={reference}
          revisions={revisions}
          shown={shown}
          onShow={(revision) => setShown(revision === latest ? null : String(revision))}
        />
      </section>
      {revisions.length < 2 ? null : (
        <section className="grid gap-3" aria-labelledby="comparison-heading">
          <h2 id="comparison-heading">What changed between revisions</h2>
          <RevisionComparison key={latest} reference={reference} revisions={revisions} />
        </section>
      )}
      <section className="grid gap-3" aria-labelledby="revision-heading">
        <h2 id="revision-heading">Revision {shown} as it was read</h2>
        <QueryView query={massing} what="the revision">
          {(detail) => (
            <MassingReview
              key={detail.revision}
              blocks={drawnBlocksOf(detail.blocks)}
              issues={detail.issues}
              figures={detail.figures}
              site={site}
            />
          )}
        </QueryView>
      </section>
    </>
  );
}

function CompletenessSection({ items }: { items: ReturnType<typeof listCompleteness> }) {
  return (
    <section className="grid gap-2" aria-labelledby="completeness-heading">
      <h2 id="completeness-heading">Completeness</h2>
      <CompletenessList items={items} />
      <p className="measure text-small text-ink-soft">
        The owner’s consent and the preparer’s signed statement are checked on paper; they are not
        recorded here.
      </p>
    </section>
  );
}

function NextSection({ reviewCase }: { reviewCase: CaseDetail }) {
  const showToast = useToast();
  const isPublic = publicCaseStates.includes(reviewCase.state);
  return (
    <section
      className="grid gap-3 border-t border-ink pt-4 lg:sticky lg:top-4 lg:border-t-0 lg:border-s lg:border-hairline lg:ps-6 lg:pt-0"
      aria-labelledby="next-heading"
    >
      <h2 id="next-heading">What comes next</h2>
      <p>
        The case is <strong>{caseStateWords[reviewCase.state].toLowerCase()}</strong>.
      </p>
      {reviewCase.transitions.length === 0 ? (
        <p>There is nothing for you to decide at the moment.</p>
      ) : (
        <CaseTransitions
          reviewCase={reviewCase}
          onMoved={(moved) => showToast(`The case is now: ${caseStateWords[moved.state]}.`)}
        />
      )}
      {isPublic ? (
        <p className="text-small">
          <Link to={paths.publicCase.href(reviewCase.reference)} className="link">
            How the public sees it
          </Link>
        </p>
      ) : null}
    </section>
  );
}
