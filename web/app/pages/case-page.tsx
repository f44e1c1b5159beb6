import { useMemo } from 'react';
import { useParams } from 'react-router-dom';
import { commentableCaseStates } from '../../../shared/contracts/case-life.ts';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { TitleStrip } from '../../components/title-strip.tsx';
import { useCase } from '../../features/cases/api/get-case.ts';
import { describeStage } from '../../features/cases/case-stage.ts';
import { CaseFinding } from '../../features/cases/components/case-finding.tsx';
import { CaseHistory } from '../../features/cases/components/case-history.tsx';
import { describeProposal } from '../../features/cases/proposal-in-words.ts';
import { useComments } from '../../features/comments/api/list-comments.ts';
import { isApiError } from '../../lib/api-error.ts';
import { useFormats } from '../../lib/place-context.ts';
import type { MapPin } from '../../map/map-features.ts';
import { CaseChangesSection } from './case-changes-section.tsx';
import { CaseCommentsSection } from './case-comments-section.tsx';
import { CaseDocumentsSection } from './case-documents-section.tsx';
import { NotFoundPage } from './not-found-page.tsx';
import { useChosenPlace } from './use-chosen-place.ts';

/** One case for everybody: what is proposed, what it changes at a place, documents, comments. */
export function CasePage() {
  const { reference = '' } = useParams();
  const reviewCase = useCase(reference);
  if (isApiError(reviewCase.error, 'NOT_FOUND')) return <NotFoundPage />;
  return (
    <div className="sheet-width py-8">
      <QueryView query={reviewCase} what="the case">
        {(detail) => <PublicCase reviewCase={detail} />}
      </QueryView>
    </div>
  );
}

function PublicCase({ reviewCase }: { reviewCase: CaseDetail }) {
  const formats = useFormats();
  const place = useChosenPlace();
  const stage = describeStage(reviewCase.state);
  const comments = useComments(reviewCase.reference, { state: 'published', pageSize: 200 });
  const pins = useMemo(
    () =>
      (comments.data?.rows ?? []).flatMap(({ id, pin, authorName }): MapPin[] =>
        pin === null ? [] : [{ id, lngLat: pin, label: authorName }],
      ),
    [comments.data],
  );
  const isCommentable = commentableCaseStates.includes(reviewCase.state);
  return (
    <div className="grid gap-10">
      <div className="grid gap-3">
        <PageHeading>{reviewCase.title}</PageHeading>
        <TitleStrip
          className="border-t"
          entries={[
            { label: 'Case', value: reviewCase.number ?? reviewCase.reference },
            { label: 'Site', value: reviewCase.address },
            { label: 'Proposal', value: describeProposal(reviewCase, formats) },
            {
              label: 'Stage',
              value: `${stage.title} since ${formats.dateOfInstant(reviewCase.stateSince)}`,
            },
            { label: 'Rule', value: <CaseFinding study={reviewCase.latestStudy} /> },
          ]}
        />
        <div className="measure grid gap-2">
          {reviewCase.description === '' ? null : (
            <p className="whitespace-pre-line">{reviewCase.description}</p>
          )}
          <p>
            <strong>{stage.title}.</strong> {stage.meaning}
          </p>
        </div>
        <nav aria-label="On this page" className="no-print">
          <ul className="flex flex-wrap gap-x-5 gap-y-1">
            <li>
              <a href="#changes" className="link">
                What changes for me
              </a>
            </li>
            <li>
              <a href="#documents" className="link">
                Documents
              </a>
            </li>
            <li>
              <a href="#comments" className="link">
                {isCommentable ? 'Read and write comments' : 'Comments'}
              </a>
            </li>
          </ul>
        </nav>
      </div>
      <CaseChangesSection reviewCase={reviewCase} place={place} pins={pins} />
      <div className="grid gap-x-10 gap-y-10 lg:grid-cols-[minmax(0,7fr)_minmax(0,5fr)]">
        <CaseCommentsSection
          reviewCase={reviewCase}
          comments={comments}
          place={place}
          isCommentable={isCommentable}
        />
        <div className="grid content-start gap-10">
          <CaseDocumentsSection reviewCase={reviewCase} />
          <section className="grid gap-3" aria-labelledby="history-heading">
            <h2 id="history-heading">What has happened</h2>
            <CaseHistory history={reviewCase.history} />
          </section>
        </div>
      </div>
    </div>
  );
}
