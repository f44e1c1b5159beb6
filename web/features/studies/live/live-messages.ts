import type { InstantShadows } from '../../../../shared/contracts/studies.ts';
import type { LedgerDay } from '../../../../shared/receptors/sun-ledger-schema.ts';
import type { ReceptorHours } from '../../../../shared/study/live-study.ts';

/** The shadows of one instant as the map draws them, and what changes on the ground in m². */
export interface LiveShadows {
  shadows: InstantShadows;
  netNewM2: number;
}

/** What the page asks its worker; dates are `YYYY-MM-DD`, instants RFC 3339. */
export type LiveQuestion =
  | { kind: 'open'; studyId: string }
  | { kind: 'shadows'; at: string }
  | { kind: 'day'; receptor: string; date: string }
  | { kind: 'losers'; date: string };

export type LiveAnswer =
  | { kind: 'open' }
  /** Null with the sun down. */
  | { kind: 'shadows'; drawn: LiveShadows | null }
  /** Null where the study has no such receptor. */
  | { kind: 'day'; day: LedgerDay | null }
  | { kind: 'losers'; losers: ReceptorHours[] }
  | { kind: 'failed'; message: string };
