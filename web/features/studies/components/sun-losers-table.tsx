import { useQueries } from '@tanstack/react-query';
import { useState } from 'react';
import type { LedgerDay } from '../../../../shared/receptors/sun-ledger-schema.ts';
import { Button } from '../../../components/button.tsx';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import { FindingMark } from '../../../components/finding-mark.tsx';
import { Loading } from '../../../components/loading.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';
import type { SunDay } from '../../../map/sun-day.ts';
import { getReceptorQueryOptions } from '../api/get-receptor.ts';
import { ledgerDayOf, samplesOf } from '../ledger-day.ts';
import { useLiveDays } from '../live/use-live-days.ts';
import { wordOfClass } from '../receptor-words.ts';
import type { SunLoser } from '../sun-losers.ts';
import type { StudyLook } from '../use-study-look.ts';
import { DayBands } from './day-bands.tsx';

export interface SunLosersTableProps {
  studyId: string;
  look: StudyLook;
  receptorCount: number;
  chosen: string | null;
  onChoose: (receptor: string) => void;
}

interface LoserRow extends SunLoser {
  /** Its account of the day; null while it is not there. */
  ledgerDay: LedgerDay | null;
}

const shownAtFirst = 6;
const shownMore = 20;

/** Who loses sun on the chosen day: where the rule is not met first, then by the hours lost. */
export function SunLosersTable(props: SunLosersTableProps) {
  const formats = useFormats();
  const { view, live, losers } = props.look;
  const title = `Who loses sun on ${formats.dayOfYear(view.date)}`;
  if (losers !== null && losers.length > 0) {
    return <Losers {...props} title={title} losers={losers} />;
  }
  return (
    <div className="grid gap-1">
      <h2>{title}</h2>
      {losers !== null ? (
        <p>No receptor loses sun on this day.</p>
      ) : live.status === 'unavailable' ? (
        <p>The study lists the four key dates. Choose one of them to see who loses sun.</p>
      ) : (
        <Loading what="who loses sun" />
      )}
    </div>
  );
}

interface LosersProps extends SunLosersTableProps {
  title: string;
  losers: readonly SunLoser[];
}

function Losers({ studyId, look, title, losers, receptorCount, chosen, onChoose }: LosersProps) {
  const formats = useFormats();
  const { day } = look.view;
  const [shownCount, setShownCount] = useState(shownAtFirst);
  const shown = losers.slice(0, shownCount);
  const days = useDaysOf(look, studyId, shown);
  const rows = inOrderOfLedgers(
    shown.map((loser, index): LoserRow => ({ ...loser, ledgerDay: days[index] ?? null })),
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

/** The accounts of the shown receptors: from the engine beside the page, else from the server. */
function useDaysOf(
  { view: { date }, live }: StudyLook,
  studyId: string,
  shown: readonly SunLoser[],
): (LedgerDay | null | undefined)[] {
  const computed = useLiveDays(
    live,
    studyId,
    shown.map(({ receptor }) => receptor),
    date,
  );
  const isFromServer = live.status === 'unavailable';
  const fetched = useQueries({
    queries: shown.map(({ receptor }) => ({
      ...getReceptorQueryOptions(studyId, receptor),
      enabled: isFromServer,
    })),
  });
  return isFromServer ? fetched.map(({ data }) => ledgerDayOf(data?.ledger, date)) : computed;
}

/** Once every ledger is there its figures give the order; until then the hourly shares do. */
function inOrderOfLedgers(rows: readonly LoserRow[]): LoserRow[] {
  if (rows.some(({ ledgerDay }) => ledgerDay === null)) return [...rows];
  const lostOf = ({ ledgerDay }: LoserRow) => ledgerDay?.sunHours.lost ?? 0;
  return rows.toSorted(
    (a, b) =>
      Number(b.finding === 'not-met') - Number(a.finding === 'not-met') || lostOf(b) - lostOf(a),
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
      cell: ({ ledgerDay, hourly }) => (
        <DayBands
          samples={ledgerDay === null ? hourly : samplesOf(ledgerDay)}
          fromMs={fromMs}
          toMs={toMs}
        />
      ),
    },
    {
      id: 'lost',
      header: 'Lost that day',
      className: 'whitespace-nowrap',
      cell: (row) => (
        <>
          {row.ledgerDay === null ? '…' : formats.hours(row.ledgerDay.sunHours.lost)}
          <span className="block sm:hidden">
            <LoserFinding row={row} />
          </span>
        </>
      ),
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
