import type { ReceptorDetail } from '../../../../shared/contracts/studies.ts';
import type { LedgerDay } from '../../../../shared/receptors/sun-ledger-schema.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { wordOfClass } from '../receptor-words.ts';
import { describeLedgerDay } from '../sun-sentence.ts';
import { FindingLines } from './finding-lines.tsx';
import { LedgerTable } from './ledger-table.tsx';
import { Sentence } from './sentence.tsx';

export interface ReceptorDayProps {
  detail: ReceptorDetail;
  /** Its account of the chosen day; null while there is none. */
  day: LedgerDay | null;
}

/** The chosen receptor on the chosen day: a sentence, what the rule says, and the ledger hour by hour. */
export function ReceptorDay({ detail, day }: ReceptorDayProps) {
  const formats = useFormats();
  const { ledger, findings } = detail;
  return (
    <section className="grid gap-3" aria-label={`${ledger.label}, ${wordOfClass(ledger.class)}`}>
      <div className="say">
        <p>
          <strong>
            {ledger.label}, {wordOfClass(ledger.class)}.
          </strong>{' '}
          {day === null ? (
            'Its sun ledger holds the four key dates.'
          ) : (
            <Sentence parts={describeLedgerDay(day, ledger.class, formats)} />
          )}
        </p>
      </div>
      <FindingLines findings={findings} />
      <details>
        <summary className="min-h-6 cursor-pointer">Its sun ledger, hour by hour</summary>
        <div className="mt-2">
          <LedgerTable ledger={ledger} />
        </div>
      </details>
    </section>
  );
}
