import type { FindingRow } from '../../../shared/contracts/studies.ts';

/** Besides those that do not meet a clause, so many receptors get a ledger in the report. */
const mostOthers = 6;
/** What loses less than this share is not shown by a ledger of its own. */
const noticedLoss = 0.1;

/**
 * The receptors whose ledgers a report prints: every one that does not meet a clause, the largest loss
 * first, then some of the others that lose much.
 */
export function chooseLedgers(rows: readonly FindingRow[]): string[] {
  const lossOf = new Map<string, number>();
  for (const { receptor, loss } of rows) {
    lossOf.set(receptor, Math.max(lossOf.get(receptor) ?? 0, loss ?? 0));
  }
  const byLoss = (receptors: Iterable<string>) =>
    [...receptors].sort(
      (one, other) => (lossOf.get(other) ?? 0) - (lossOf.get(one) ?? 0) || (one < other ? -1 : 1),
    );
  const notMet = new Set(
    rows.filter(({ finding }) => finding === 'not-met').map(({ receptor }) => receptor),
  );
  const others = [...lossOf]
    .filter(([receptor, loss]) => !notMet.has(receptor) && loss >= noticedLoss)
    .map(([receptor]) => receptor);
  return [...byLoss(notMet), ...byLoss(others).slice(0, mostOthers)];
}
