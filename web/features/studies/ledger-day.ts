import type { LedgerDay, SunLedger } from '../../../shared/receptors/sun-ledger-schema.ts';
import type { BandSample } from '../../map/ledger-bands.ts';

/** A ledger's account of one civil date; null where it has none. */
export function ledgerDayOf(ledger: SunLedger | undefined, date: string): LedgerDay | null {
  return ledger?.days.find((day) => day.date === date) ?? null;
}

/** The day's shares of sun, ready for its bands. */
export function samplesOf(day: LedgerDay): BandSample[] {
  return day.samples.map(({ at, shareBefore, shareAfter }) => ({
    atMs: Date.parse(at),
    shareBefore,
    shareAfter,
  }));
}
