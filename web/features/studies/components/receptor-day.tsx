import type { ReceptorDetail } from '../../../../shared/contracts/studies.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { ledgerDayOf } from '../ledger-day.ts';
import { wordOfClass } from '../receptor-words.ts';
import { describeLedgerDay } from '../sun-sentence.ts';
import { FindingLines } from './finding-lines.tsx';
import { LedgerTable } from './ledger-table.tsx';
import { Sentence } from './sentence.tsx';

export interface ReceptorDayProps {
  detail: ReceptorDetail;
  date: string;
}

/** The chosen receptor on the chosen day: a sentence, what the rule says, and the ledger hour by hour. */
export function ReceptorDay({ detail, date }: ReceptorDayProps) {
  const formats = useFormats();
  const { ledger, findings } = detail;
  const day = ledgerDayOf(ledger, date);
  return (
    <section className="grid gap-3" aria-label={`${ledger.label}, ${wordOfClass(ledger.class)}`}>
      <div className="say">
        <p>
          <strong>
            {ledger.label}, {wordOfClass(ledger.class)}.
          </strong>{' '}
          {day === null ? (
            `The sun ledger holds the four key dates; choose one of them to read this one’s account.`
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
