import type { FindingRow } from '../../../shared/contracts/studies.ts';
import type { Finding } from '../../../shared/study/evidence-schema.ts';
import type { DrawnEvidence } from './api/get-study-evidence.ts';

/** The sunlit share of a receptor's open area at one instant. */
export interface SunSample {
  atMs: number;
  shareBefore: number;
  shareAfter: number;
}

/** A receptor that loses sun on one day. */
export interface SunLoser {
  receptor: string;
  label: string;
  class: string;
  /** The worst finding of the clauses that judge this day; null where none does. */
  finding: Finding | null;
  isClose: boolean;
  /** At the whole hours of the day: enough to put receptors in order; the ledger has the figures. */
  hourly: SunSample[];
}

const findingOrder = { 'not-met': 0, disregarded: 1, met: 2, 'not-affected': 3 } as const;
const hourMs = 3_600_000;

/** The worst of several findings; null for none. */
export function worstFinding(findings: readonly Finding[]): Finding | null {
  const [worst] = findings.toSorted((a, b) => findingOrder[a] - findingOrder[b]);
  return worst ?? null;
}

/**
 * Who loses sun on a day: where the rule is not met first, then by the hours lost.
 *
 * @param date civil date, `YYYY-MM-DD`, as the instants of the evidence carry it
 */
export function listSunLosers(
  evidence: DrawnEvidence,
  rows: readonly FindingRow[],
  date: string,
): SunLoser[] {
  const properties = new Map(
    evidence.receptors.features.map((feature) => [feature.properties.id, feature.properties]),
  );
  const rowsOfDay = new Map<string, FindingRow[]>();
  for (const row of rows) {
    if (row.day !== date) continue;
    rowsOfDay.set(row.receptor, [...(rowsOfDay.get(row.receptor) ?? []), row]);
  }
  return evidence.results.receptors
    .map((result) => {
      const judged = rowsOfDay.get(result.id) ?? [];
      const hourly = hourlySamples(result, date);
      const finding = worstFinding(judged.map((row) => row.finding));
      const loser: SunLoser = {
        receptor: result.id,
        label: properties.get(result.id)?.label ?? result.id,
        class: properties.get(result.id)?.class ?? '',
        finding,
        isClose: judged.some((row) => row.close && row.finding === finding),
        hourly,
      };
      // A loss within an hour falls between the hourly instants; the rule's finer steps may have met it.
      const judgedLoss = judged.reduce(
        (most, row) => (row.unit === 'h' ? Math.max(most, row.lost) : most),
        0,
      );
      return { loser, lostHours: Math.max(lostHoursOf(hourly), judgedLoss) };
    })
    .filter(({ lostHours }) => lostHours > 0)
    .toSorted(
      (a, b) =>
        Number(b.loser.finding === 'not-met') - Number(a.loser.finding === 'not-met') ||
        b.lostHours - a.lostHours ||
        a.loser.label.localeCompare(b.loser.label, 'en', { numeric: true }),
    )
    .map(({ loser }) => loser);
}

function hourlySamples(
  { openArea, instants }: DrawnEvidence['results']['receptors'][number],
  date: string,
): SunSample[] {
  // A window's sun is given in shares of it.
  const wholeM2 = openArea ?? 1;
  if (wholeM2 <= 0) return [];
  return instants
    .filter(({ at }) => at.startsWith(date))
    .map(({ at, sunBefore, sunAfter }) => ({
      atMs: Date.parse(at),
      shareBefore: sunBefore / wholeM2,
      shareAfter: sunAfter / wholeM2,
    }));
}

/** Hours of sun that are lost, never set off against hours that are gained. */
function lostHoursOf(samples: readonly SunSample[]): number {
  const lost = samples.map((one) => Math.max(0, one.shareBefore - one.shareAfter));
  return samples.slice(1).reduce((sum, sample, index) => {
    const spanMs = sample.atMs - (samples[index]?.atMs ?? sample.atMs);
    return sum + (((lost[index] ?? 0) + (lost[index + 1] ?? 0)) / 2) * (spanMs / hourMs);
  }, 0);
}
