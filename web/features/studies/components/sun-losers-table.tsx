import { useQueries } from '@tanstack/react-query';
import { useState } from 'react';
import type { ReceptorDetail } from '../../../../shared/contracts/studies.ts';
import { Button } from '../../../components/button.tsx';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import { FindingMark } from '../../../components/finding-mark.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';
import type { SunDay } from '../../../map/sun-day.ts';
import { getReceptorQueryOptions } from '../api/get-receptor.ts';
import { ledgerDayOf, samplesOf } from '../ledger-day.ts';
import { wordOfClass } from '../receptor-words.ts';
import type { SunLoser } from '../sun-losers.ts';
import { DayBands } from './day-bands.tsx';

export interface SunLosersTableProps {
  studyId: string;
  day: SunDay;
  losers: readonly SunLoser[];
  receptorCount: number;
  chosen: string | null;
  onChoose: (receptor: string) => void;
}

interface LoserRow extends SunLoser {
  detail: ReceptorDetail | undefined;
}

const shownAtFirst = 6;
const shownMore = 20;

/** Who loses sun on the chosen day: where the rule is not met first, then by the hours lost. */
export function SunLosersTable({
  studyId,
  day,
  losers,
  receptorCount,
  chosen,
  onChoose,
}: SunLosersTableProps) {
  const formats = useFormats();
  const [shownCount, setShownCount] = useState(shownAtFirst);
  const shown = losers.slice(0, shownCount);
  const details = useQueries({
    queries: shown.map(({ receptor }) => getReceptorQueryOptions(studyId, receptor)),
  });
  const title = `Who loses sun on ${formats.dayOfYear(day.date)}`;
  if (losers.length === 0) {
    return (
      <div className="grid gap-1">
        <h2>{title}</h2>
        <p>No receptor loses sun on this day.</p>
      </div>
    );
  }
  const rows = inOrderOfLedgers(
    shown.map((loser, index): LoserRow => ({ ...loser, detail: details[index]?.data })),
    day.date,
  );
  const untouched = receptorCount - losers.length;
  const hidden = losers.length - rows.length;
  return (
    <div className="grid gap-2">
      <h2>{title}</h2>
      <DataTable
        caption={title}
        hideCaption
        columns={loserColumns(formats, day, chosen, onChoose)}
        rows={rows}
        rowKey={(row) => row.receptor}
        isRowSelected={(row) => row.receptor === chosen}
      />
      <p className="flex flex-wrap gap-x-4 text-small">
        {hidden > 0 ? (
          <Button kind="plain" onPress={() => setShownCount(shownCount + shownMore)}>
            {hidden > shownMore
              ? `Show ${shownMore} more of ${hidden}`
              : `Show the other ${hidden}`}
          </Button>
        ) : null}
        <span className="py-0.5">
          {untouched === 1
            ? '1 receptor loses nothing on this day.'
            : `${untouched} receptors lose nothing on this day.`}
        </span>
      </p>
    </div>
  );
}

/** Once every ledger is there its figures give the order; until then the hourly shares do. */
function inOrderOfLedgers(rows: readonly LoserRow[], date: string): LoserRow[] {
  const lostOf = (row: LoserRow) => ledgerDayOf(row.detail?.ledger, date)?.sunHours.lost;
  if (rows.some((row) => lostOf(row) === undefined)) return [...rows];
  return rows.toSorted(
    (a, b) =>
      Number(b.finding === 'not-met') - Number(a.finding === 'not-met') ||
      (lostOf(b) ?? 0) - (lostOf(a) ?? 0),
  );
}

function loserColumns(
  formats: Formats,
  day: SunDay,
  chosen: string | null,
  onChoose: (receptor: string) => void,
): TableColumn<LoserRow>[] {
  const fromMs = day.curve.at(0)?.atMs ?? day.startMs;
  const toMs = day.curve.at(-1)?.atMs ?? day.endMs;
  const clock = (ms: number) => formats.clock(new Date(ms).toISOString());
  return [
    {
      id: 'receptor',
      header: 'Receptor',
      isRowHeader: true,
      cell: (row) => (
        <>
          <button
            type="button"
            className="link min-h-6 text-start"
            aria-pressed={row.receptor === chosen}
            onClick={() => onChoose(row.receptor)}
          >
            {row.label}
          </button>
          <span className="block text-label text-ink-soft">{wordOfClass(row.class)}</span>
        </>
      ),
    },
    {
      id: 'bands',
      header: `${clock(fromMs)} – ${clock(toMs)}, before over after`,
      className: 'sm:w-40',
      cell: (row) => {
        const ledgerDay = ledgerDayOf(row.detail?.ledger, day.date);
        return (
          <DayBands
            samples={ledgerDay === null ? row.hourly : samplesOf(ledgerDay)}
            fromMs={fromMs}
            toMs={toMs}
          />
        );
      },
    },
    {
      id: 'lost',
      header: 'Lost that day',
      className: 'whitespace-nowrap',
      cell: (row) => {
        const ledgerDay = ledgerDayOf(row.detail?.ledger, day.date);
        return (
          <>
            {ledgerDay === null ? '…' : formats.hours(ledgerDay.sunHours.lost)}
            <span className="block sm:hidden">
              <LoserFinding row={row} />
            </span>
          </>
        );
      },
    },
    {
      id: 'finding',
      header: 'Rule',
      // On a telephone it stands below the hours lost.
      className: 'hidden sm:table-cell',
      cell: (row) => <LoserFinding row={row} />,
    },
  ];
}

function LoserFinding({ row }: { row: SunLoser }) {
  return row.finding === null ? (
    <span className="text-ink-soft">not judged</span>
  ) : (
    <FindingMark finding={row.finding} close={row.isClose} />
  );
}
