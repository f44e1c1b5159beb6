import { useEffect, useRef } from 'react';
import type { LedgerDay } from '../../../../shared/receptors/sun-ledger-schema.ts';
import { Loading } from '../../../components/loading.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { isApiError } from '../../../lib/api-error.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { useReceptor } from '../api/get-receptor.ts';
import { describeLedgerDay, subjectOfClass } from '../sun-sentence.ts';
import { FindingLines } from './finding-lines.tsx';
import { LedgerPicture } from './ledger-picture.tsx';
import { LedgerTable } from './ledger-table.tsx';
import { Sentence } from './sentence.tsx';

export interface ReceptorAccountProps {
  studyId: string;
  receptor: string;
  /** The windows that the rule judges: first and last instant. */
  judged: readonly { fromAt: string; toAt: string }[];
  /** Moves the focus to the answer when another receptor is chosen. */
  shouldTakeFocus: boolean;
}

/** What a proposal changes for one parcel, yard or open space: in sentences, as a picture and as a table. */
export function ReceptorAccount({
  studyId,
  receptor,
  judged,
  shouldTakeFocus,
}: ReceptorAccountProps) {
  const formats = useFormats();
  const detail = useReceptor(studyId, receptor);
  const heading = useRef<HTMLHeadingElement>(null);
  const isLoaded = detail.data !== undefined;
  useEffect(() => {
    if (isLoaded && shouldTakeFocus) heading.current?.focus();
  }, [isLoaded, receptor, shouldTakeFocus]);

  if (detail.isError) {
    return isApiError(detail.error, 'NOT_FOUND') ? (
      <p className="measure say">
        The study has no account of {receptor}. It is a part of the site itself, or it lies beyond
        the reach of any shadow on the studied days.
      </p>
    ) : (
      <ProblemNotice error={detail.error} onRetry={() => void detail.refetch()} />
    );
  }
  if (detail.data === undefined) return <Loading what="the sun ledger" />;

  const { ledger, findings } = detail.data;
  const days = orderByLoss(ledger.days);
  const isUntouched = days.every((day) => !losesSun(day));
  const [first, ...rest] = days;
  return (
    <section className="grid gap-4" aria-labelledby="account-heading">
      <h2 id="account-heading" ref={heading} tabIndex={-1}>
        What changes at {ledger.label}
      </h2>
      <p className="say text-lead">
        {isUntouched || first === undefined ? (
          `On none of the four key dates does the proposal take sun from ${subjectOfClass(ledger.class)}.`
        ) : (
          <Sentence parts={describeLedgerDay(first, ledger.class, formats)} />
        )}
      </p>
      <div className="grid gap-1">
        <h3>What the rule says</h3>
        <FindingLines findings={findings} />
      </div>
      <LedgerPicture ledger={ledger} judged={judged} />
      <div className="measure grid gap-2">
        {(isUntouched ? days : rest).map((day) => (
          <p key={day.date}>
            <Sentence parts={describeLedgerDay(day, ledger.class, formats)} />
          </p>
        ))}
      </div>
      <details>
        <summary className="min-h-6 cursor-pointer font-strong">The same as a table</summary>
        <div className="mt-3">
          <LedgerTable ledger={ledger} />
        </div>
      </details>
    </section>
  );
}

/** To the minute, as the sentences have it. */
function losesSun({ sunHours, lostSpans }: LedgerDay): boolean {
  return Math.round(sunHours.lost * 60) > 0 || lostSpans.length > 0;
}

/** The day that loses most comes first, the others in the order of the year. */
function orderByLoss(days: readonly LedgerDay[]): LedgerDay[] {
  const worst = days.reduce<LedgerDay | null>(
    (found, day) => (found === null || day.sunHours.lost > found.sunHours.lost ? day : found),
    null,
  );
  return worst === null ? [] : [worst, ...days.filter((day) => day !== worst)];
}
