import type { LedgerDay, SunLedger } from '../../../../shared/receptors/sun-ledger-schema.ts';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';
import { lostBetween } from '../sun-sentence.ts';

type LedgerHour = LedgerDay['hours'][number];

/** The sun ledger as a table: the key dates, and each of them hour by hour. */
export function LedgerTable({ ledger }: { ledger: SunLedger }) {
  const formats = useFormats();
  return (
    <div className="grid gap-3">
      <DataTable
        caption={`Sun on ${ledger.label}`}
        hideCaption
        columns={dayColumns(formats)}
        rows={ledger.days}
        rowKey={(day) => day.date}
      />
      <p className="text-small text-ink-soft">
        {ledger.openAreaM2 === null
          ? 'Hours are means along the window'
          : `Hours are means over the ${formats.area(ledger.openAreaM2)} of open area`}
        , taken every {ledger.stepMin} minutes at {formats.length(ledger.planeM)} above the ground.
        Square metre hours are sunlit area times time. Energy is direct sun under a clear sky.
      </p>
      {ledger.days.map((day) => (
        <details key={day.date}>
          <summary className="min-h-6 cursor-pointer">
            {formats.dayOfYear(day.date)}, hour by hour
          </summary>
          <DataTable
            className="mt-2"
            caption={`Sun on ${ledger.label} on ${formats.date(day.date)}, hour by hour`}
            hideCaption
            columns={hourColumns(formats)}
            rows={day.hours}
            rowKey={(hour) => hour.fromAt}
          />
        </details>
      ))}
    </div>
  );
}

function dayColumns(formats: Formats): TableColumn<LedgerDay>[] {
  return [
    {
      id: 'day',
      header: 'Day',
      isRowHeader: true,
      className: 'whitespace-nowrap',
      cell: (day) => formats.dayOfYear(day.date),
    },
    ...balanceColumns<LedgerDay>(formats),
    {
      id: 'spans',
      header: 'Lost',
      className: 'min-w-36',
      cell: (day) => (day.lostSpans.length === 0 ? '–' : lostBetween(day.lostSpans, formats)),
    },
  ];
}

function hourColumns(formats: Formats): TableColumn<LedgerHour>[] {
  return [
    {
      id: 'hour',
      header: 'From – to',
      isRowHeader: true,
      className: 'whitespace-nowrap',
      cell: (hour) => `${formats.clock(hour.fromAt)} – ${formats.clock(hour.toAt)}`,
    },
    ...balanceColumns<LedgerHour>(formats),
  ];
}

/** Hours, square metres and energy side by side: an hour of low winter sun is worth less than one in summer. */
function balanceColumns<
  Row extends Pick<LedgerHour, 'sunHours' | 'areaHoursM2h' | 'beamEnergyKwhM2'>,
>(formats: Formats): TableColumn<Row>[] {
  return [
    {
      id: 'before',
      header: 'Sun now',
      align: 'end',
      cell: (row) => formats.hours(row.sunHours.before),
    },
    {
      id: 'after',
      header: 'With the proposal',
      align: 'end',
      cell: (row) => formats.hours(row.sunHours.after),
    },
    {
      id: 'lost',
      header: 'Difference',
      align: 'end',
      cell: (row) => <strong>{formats.hours(-row.sunHours.lost)}</strong>,
    },
    {
      id: 'area',
      header: 'Square metre hours',
      align: 'end',
      cell: (row) => formats.number(-row.areaHoursM2h.lost),
    },
    {
      id: 'energy',
      header: 'Energy, kWh/m²',
      align: 'end',
      cell: (row) => formats.number(-row.beamEnergyKwhM2.lost, 2),
    },
  ];
}
