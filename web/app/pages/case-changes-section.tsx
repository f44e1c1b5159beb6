import { useMemo } from 'react';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import type { StudyDetail } from '../../../shared/contracts/studies.ts';
import { EmptyState } from '../../components/empty-state.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { ParcelSearch } from '../../features/places/components/parcel-search.tsx';
import { useStudy } from '../../features/studies/api/get-study.ts';
import { ReceptorAccount } from '../../features/studies/components/receptor-account.tsx';
import { CasePageMap } from './case-page-map.tsx';
import type { ChosenPlace } from './use-chosen-place.ts';

export interface CaseChangesSectionProps {
  reviewCase: CaseDetail;
  place: ChosenPlace;
}

/** "What changes for me": a place found by address or on the map, and its account. */
export function CaseChangesSection({ reviewCase, place }: CaseChangesSectionProps) {
  const { latestStudy } = reviewCase;
  const studyId = latestStudy?.status === 'finished' ? latestStudy.id : null;
  const study = useStudy(studyId);
  return (
    <section id="changes" className="grid scroll-mt-4 gap-4" aria-labelledby="changes-heading">
      <h2 id="changes-heading">What changes for me?</h2>
      {studyId === null ? (
        <EmptyState title="The study of this proposal is not finished yet.">
          <p>As soon as it is, you can look here hour by hour where the sun is lost.</p>
        </EmptyState>
      ) : (
        <QueryView query={study} what="the study">
          {(detail) => <Changes reviewCase={reviewCase} study={detail} place={place} />}
        </QueryView>
      )}
    </section>
  );
}

function Changes({ reviewCase, study, place }: CaseChangesSectionProps & { study: StudyDetail }) {
  const judged = useMemo(
    () => study.rule.clauses.flatMap((clause) => clause.days),
    [study.rule.clauses],
  );
  return (
    <div className="grid gap-x-10 gap-y-8 xl:grid-cols-[minmax(0,5fr)_minmax(0,7fr)]">
      <div className="grid content-start gap-6">
        <ParcelSearch
          label="Your address or parcel number"
          description="Or point at your parcel on the map."
          onPick={(parcel) => place.choose(parcel.number)}
        />
        {place.receptor === null ? (
          <p className="measure text-ink-soft">
            Then you read here how much sun your place has now and with the proposal, on the four
            key dates of the year, and what the municipality’s rule says about it.
          </p>
        ) : (
          <ReceptorAccount
            key={place.receptor}
            studyId={study.id}
            receptor={place.receptor}
            judged={judged}
            shouldTakeFocus={place.isFresh}
          />
        )}
      </div>
      <div className="xl:sticky xl:top-6 xl:self-start">
        <CasePageMap reviewCase={reviewCase} study={study} place={place} />
      </div>
    </div>
  );
}
