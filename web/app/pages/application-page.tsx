import { useMemo, useState } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { caseStateWords, publicCaseStates } from '../../../shared/contracts/case-life.ts';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import type { MassingSite } from '../../../shared/massing/massing-scene.ts';
import { Button } from '../../components/button.tsx';
import { EmptyState } from '../../components/empty-state.tsx';
import { PageHeading } from '../../components/page-heading.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { TitleStrip } from '../../components/title-strip.tsx';
import { useToast } from '../../components/toast.tsx';
import { useCase } from '../../features/cases/api/get-case.ts';
import { useUpdateCase } from '../../features/cases/api/update-case.ts';
import { CaseDetailsForm } from '../../features/cases/components/case-details-form.tsx';
import { CaseHistory } from '../../features/cases/components/case-history.tsx';
import { CaseTransitions } from '../../features/cases/components/case-transitions.tsx';
import { CorrectionNotice } from '../../features/cases/components/correction-notice.tsx';
import { describeProposal } from '../../features/cases/proposal-in-words.ts';
import { useMassing } from '../../features/massings/api/get-massing.ts';
import { useMassings } from '../../features/massings/api/list-massings.ts';
import { MassingReview } from '../../features/massings/components/massing-review.tsx';
import { MassingUpload } from '../../features/massings/components/massing-upload.tsx';
import { RevisionComparison } from '../../features/massings/components/revision-comparison.tsx';
import { RevisionTable } from '../../features/massings/components/revision-table.tsx';
import { drawnBlocksOf } from '../../features/massings/drawn-block.ts';
import { SiteParcelPicker } from '../../features/places/components/site-parcel-picker.tsx';
import { isApiError } from '../../lib/api-error.ts';
import { useFormats, usePlace } from '../../lib/place-context.ts';
import { useSearchState } from '../../lib/use-search-state.ts';
import { paths } from '../paths.ts';
import { NotFoundPage } from './not-found-page.tsx';

/** One application as its applicant sees it: from the site to the submission. */
export function ApplicationPage() {
  const { reference = '' } = useParams();
  const reviewCase = useCase(reference);
  if (isApiError(reviewCase.error, 'NOT_FOUND')) return <NotFoundPage />;
  return (
    <div className="sheet-width grid gap-8 py-8">
      <QueryView query={reviewCase} what="the application">
        {(detail) => <Application reviewCase={detail} />}
      </QueryView>
    </div>
  );
}

function Application({ reviewCase }: { reviewCase: CaseDetail }) {
  const formats = useFormats();
  const navigate = useNavigate();
  const showToast = useToast();
  const { reference, state } = reviewCase;
  return (
    <>
      <div className="grid gap-2">
        <PageHeading>{reviewCase.title}</PageHeading>
        <TitleStrip
          entries={[
            { label: 'Case number', value: reviewCase.number ?? 'given at submission' },
            { label: 'Site', value: reviewCase.address },
            {
              label: 'State',
              value: `${caseStateWords[state]} since ${formats.shortDateOfInstant(reviewCase.stateSince)}`,
            },
            { label: 'Proposal', value: describeProposal(reviewCase, formats) },
          ]}
        />
        {publicCaseStates.includes(state) ? (
          <p>
            <Link to={paths.publicCase.href(reference)} className="link">
              How the public sees it
            </Link>
          </p>
        ) : null}
        {reviewCase.latestStudy?.status === 'finished' ? (
          <p>
            <Link to={paths.caseFindings.href(reference)} className="link">
              What the rule says of your proposal
            </Link>
          </p>
        ) : null}
      </div>
      {reviewCase.correction === null ? null : (
        <CorrectionNotice correction={reviewCase.correction} />
      )}
      <div className="grid gap-x-10 gap-y-8 lg:grid-cols-2">
        <section className="grid content-start gap-3" aria-labelledby="next-heading">
          <h2 id="next-heading">What comes next</h2>
          {reviewCase.transitions.length === 0 ? (
            <p>There is nothing to do for you at the moment.</p>
          ) : (
            <CaseTransitions
              reviewCase={reviewCase}
              onMoved={(moved) => {
                showToast(
                  moved.state === 'submitted'
                    ? `Submitted as case ${moved.reference}.`
                    : `The application is now: ${caseStateWords[moved.state]}.`,
                );
                void navigate(paths.application.href(moved.reference), { replace: true });
              }}
            />
          )}
        </section>
        <SiteSection reviewCase={reviewCase} />
      </div>
      <MassingSection reviewCase={reviewCase} />
      <section className="grid gap-3" aria-labelledby="history-heading">
        <h2 id="history-heading">What has happened</h2>
        <CaseHistory history={reviewCase.history} />
      </section>
    </>
  );
}

function SiteSection({ reviewCase }: { reviewCase: CaseDetail }) {
  const showToast = useToast();
  const updateCase = useUpdateCase(reviewCase.reference);
  const [isEditing, setIsEditing] = useState(false);
  const canEdit = reviewCase.abilities.includes('edit');
  return (
    <section
      className={`grid content-start gap-3 ${isEditing ? 'lg:col-span-2' : ''}`}
      aria-labelledby="site-heading"
    >
      <h2 id="site-heading">Site and description</h2>
      {isEditing ? (
        <CaseDetailsForm
          initial={{
            title: reviewCase.title,
            description: reviewCase.description,
            siteParcels: reviewCase.siteParcels.map(({ number }) => number),
          }}
          submitLabel="Save the changes"
          isPending={updateCase.isPending}
          error={updateCase.error}
          onCancel={() => setIsEditing(false)}
          onSubmit={(input) =>
            updateCase.mutate(input, {
              onSuccess: () => {
                setIsEditing(false);
                showToast('The changes are saved.');
              },
            })
          }
          renderParcels={(picked, onChange) => (
            <SiteParcelPicker picked={picked} onChange={onChange} />
          )}
        />
      ) : (
        <div className="measure grid justify-items-start gap-2">
          <ul>
            {reviewCase.siteParcels.map((parcel) => (
              <li key={parcel.number}>
                {parcel.address}{' '}
                <span className="text-small text-ink-soft">parcel {parcel.number}</span>
              </li>
            ))}
          </ul>
          <p className="whitespace-pre-line">
            {reviewCase.description === '' ? 'No description yet.' : reviewCase.description}
          </p>
          {canEdit ? (
            <Button onPress={() => setIsEditing(true)}>Change site or description</Button>
          ) : null}
        </div>
      )}
    </section>
  );
}

function MassingSection({ reviewCase }: { reviewCase: CaseDetail }) {
  const { municipality } = usePlace();
  const { reference, site } = reviewCase;
  const massings = useMassings(reference);
  const massingSite = useMemo<MassingSite>(
    () => ({
      parcels: site === null ? [] : [site],
      extent: municipality.extent,
      longitude: municipality.longitude,
      latitude: municipality.latitude,
    }),
    [site, municipality],
  );
  const canUpload = reviewCase.abilities.includes('upload-massing');
  return (
    <section className="grid gap-4" aria-labelledby="massing-heading">
      <h2 id="massing-heading">Massing</h2>
      {canUpload ? (
        <MassingUpload
          reference={reference}
          site={massingSite}
          nextRevision={(reviewCase.latestRevision ?? 0) + 1}
          renderReview={(reading) => <MassingReview {...reading} site={site} />}
        />
      ) : null}
      <QueryView query={massings} what="the revisions">
        {({ rows }) =>
          rows.length === 0 ? (
            canUpload ? null : (
              <EmptyState title="No massing is stored." />
            )
          ) : (
            <Revisions reviewCase={reviewCase} revisions={rows} />
          )
        }
      </QueryView>
    </section>
  );
}

interface RevisionsProps {
  reviewCase: CaseDetail;
  revisions: Parameters<typeof RevisionTable>[0]['revisions'];
}

function Revisions({ reviewCase, revisions }: RevisionsProps) {
  const { reference, site } = reviewCase;
  const [shownText, setShown] = useSearchState('revision');
  const latest = revisions[0]?.revision ?? null;
  const wanted = Number(shownText);
  const shown = revisions.some(({ revision }) => revision === wanted) ? wanted : latest;
  const massing = useMassing(reference, shown);
  return (
    <div className="grid gap-8">
      <div className="grid gap-2">
        <h3>Stored revisions</h3>
        <RevisionTable
          reference={reference}
          revisions={revisions}
          shown={shown}
          onShow={(revision) => setShown(revision === latest ? null : String(revision))}
        />
      </div>
      {revisions.length < 2 ? null : (
        <div className="grid gap-2">
          <h3>What changed between revisions</h3>
          <RevisionComparison reference={reference} revisions={revisions} />
        </div>
      )}
      <details open={!reviewCase.abilities.includes('upload-massing')}>
        <summary className="min-h-6 cursor-pointer font-strong">
          How revision {shown} was read
        </summary>
        <div className="mt-4">
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
        </div>
      </details>
    </div>
  );
}
