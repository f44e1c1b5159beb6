import type { CaseDetail } from '../../../../shared/contracts/cases.ts';
import { useFormats } from '../../../lib/place-context.ts';

export interface CorrectionNoticeProps {
  correction: NonNullable<CaseDetail['correction']>;
}

/** What the planner asked for when the case was sent back. */
export function CorrectionNotice({ correction }: CorrectionNoticeProps) {
  const formats = useFormats();
  return (
    <section className="measure say" aria-label="Correction asked for">
      <h2>The planner asks for a correction</h2>
      <p className="whitespace-pre-line">{correction.reason}</p>
      {correction.dueDate === null ? null : (
        <p>
          Due by <strong>{formats.date(correction.dueDate)}</strong>.
        </p>
      )}
    </section>
  );
}
