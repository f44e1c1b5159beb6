import { useMemo } from 'react';
import type { CaseDetail } from '../../../shared/contracts/cases.ts';
import type { FindingRow, StudyDetail } from '../../../shared/contracts/studies.ts';
import { ChoiceRow } from '../../components/choice-row.tsx';
import { EmptyState } from '../../components/empty-state.tsx';
import { Loading } from '../../components/loading.tsx';
import { ProblemNotice } from '../../components/problem-notice.tsx';
import { QueryView } from '../../components/query-view.tsx';
import { ParcelSearch } from '../../features/places/components/parcel-search.tsx';
import {
  useStudyEvidence,
  type DrawnEvidence,
} from '../../features/studies/api/get-study-evidence.ts';
import { useStudy } from '../../features/studies/api/get-study.ts';
import { useEveryFinding } from '../../features/studies/api/list-every-finding.ts';
import { ReceptorAccount } from '../../features/studies/components/receptor-account.tsx';
import { StudySheet } from '../../features/studies/components/study-sheet.tsx';
import { SunLosersTable } from '../../features/studies/components/sun-losers-table.tsx';
import { wordOfClass } from '../../features/studies/receptor-words.ts';
import { receptorsAtSameAddress } from '../../features/studies/same-address.ts';
import { useStudyLook } from '../../features/studies/use-study-look.ts';
import type { MapPin } from '../../map/map-features.ts';
import type { ChosenPlace } from './use-chosen-place.ts';

export interface CaseChangesSectionProps {
  reviewCase: CaseDetail;
  place: ChosenPlace;
  /** Where published comments are about. */
  pins: readonly MapPin[];
}

/** "What changes for me": a place found by address or on the map, and its account. */
export function CaseChangesSection({ reviewCase, place, pins }: CaseChangesSectionProps) {
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
          {(detail) => (
            <StudyContents reviewCase={reviewCase} study={detail} place={place} pins={pins} />
          )}
        </QueryView>
      )}
    </section>
  );
}

type StudyContentsProps = CaseChangesSectionProps & { study: StudyDetail };

function StudyContents(props: StudyContentsProps) {
  const evidence = useStudyEvidence(props.study.id);
  const rows = useEveryFinding(props.study.id);
  const error = evidence.error ?? rows.error;
  if (error !== null) {
    return (
      <ProblemNotice
        error={error}
        onRetry={() => {
          void evidence.refetch();
          void rows.refetch();
        }}
      />
    );
  }
  if (evidence.data === undefined || rows.data === undefined) return <Loading what="the study" />;
  return <Changes {...props} evidence={evidence.data} rows={rows.data} />;
}

interface ChangesProps extends StudyContentsProps {
  evidence: DrawnEvidence;
  rows: readonly FindingRow[];
}

const tableId = 'who-loses-sun';

function Changes({ reviewCase, study, place, pins, evidence, rows }: ChangesProps) {
  const look = useStudyLook(study, evidence, rows);
  return (
    <div className="grid gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,5fr)_minmax(0,7fr)]">
      <div className="grid content-start gap-6">
        <div className="no-print">
          <ParcelSearch
            label="Your address or parcel number"
            description="Or point at your parcel on the map."
            onPick={(parcel) => place.choose(parcel.number)}
          />
        </div>
        <PlaceAccount study={study} place={place} evidence={evidence} />
      </div>
      <StudySheet
        study={study}
        site={reviewCase.site}
        evidence={evidence}
        rows={rows}
        look={look}
        chosen={place.receptor}
        onChoose={place.choose}
        pins={pins}
        tableId={tableId}
      />
      <section id={tableId} aria-label="Who loses sun" className="scroll-mt-4 lg:col-span-2">
        <SunLosersTable
          key={look.view.date}
          studyId={study.id}
          look={look}
          receptorCount={evidence.results.receptors.length}
          chosen={place.receptor}
          onChoose={place.choose}
        />
      </section>
    </div>
  );
}

type PlaceAccountProps = Pick<ChangesProps, 'study' | 'place' | 'evidence'>;

function PlaceAccount({ study, place, evidence }: PlaceAccountProps) {
  const { receptor, parcel } = place;
  const judged = useMemo(
    () => study.rule.clauses.flatMap((clause) => clause.days),
    [study.rule.clauses],
  );
  if (receptor === null) {
    return (
      <p className="measure text-ink-soft">
        Then you read here how much sun your place has now and with the proposal, on the four key
        dates of the year, and what the municipality’s rule says about it.
      </p>
    );
  }
  const parts = receptorsAtSameAddress(evidence, receptor);
  if (parts.length === 0) {
    return (
      <p className="measure say" role="status">
        The study has no account of {parcel?.address ?? `parcel ${receptor}`}: it is a part of the
        site itself, or it lies beyond the reach of the proposal’s shadows on the studied days.
      </p>
    );
  }
  return (
    <div className="grid gap-4">
      {parts.length < 2 ? null : (
        <ChoiceRow
          label="Which part of it"
          options={parts.map((part) => ({ id: part.id, label: `The ${wordOfClass(part.class)}` }))}
          value={receptor}
          onChange={(id) => place.choose(id)}
        />
      )}
      <ReceptorAccount
        key={receptor}
        studyId={study.id}
        receptor={receptor}
        judged={judged}
        shouldTakeFocus={place.isFresh}
      />
    </div>
  );
}
