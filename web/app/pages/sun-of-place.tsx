import { useState } from 'react';
import { civilDateOf, formatInstant } from '../../../shared/solar/civil-time.ts';
import { keyDatesOfYear } from '../../../shared/solar/key-dates.ts';
import { sunTableOf, type SunTable } from '../../../shared/solar/sun-table.ts';
import { DataTable, type TableColumn } from '../../components/data-table.tsx';
import { usePlace } from '../../lib/place-context.ts';

interface Row extends SunTable {
  date: string;
}

/** The sun of the municipality on this year's key dates, as an almanac prints it. */
export function SunOfPlace() {
  const { municipality, formats } = usePlace();
  const { timeZone, longitude, latitude } = municipality;
  const [openedMs] = useState(() => Date.now());
  const year = Number(civilDateOf(openedMs, timeZone).slice(0, 4));
  const rows = keyDatesOfYear(year, timeZone).map(({ date }): Row => ({
    date,
    ...sunTableOf(date, timeZone, longitude, latitude),
  }));
  const clock = (atMs: number | null) =>
    atMs === null ? '—' : formats.clock(formatInstant(roundToMinute(atMs), timeZone));
  const columns: TableColumn<Row>[] = [
    {
      id: 'day',
      header: 'Day',
      cell: ({ date }) => formats.dayOfYear(date),
      isRowHeader: true,
      className: 'whitespace-nowrap',
    },
    { id: 'rise', header: 'Sunrise', cell: ({ sunriseMs }) => clock(sunriseMs), align: 'end' },
    {
      id: 'noon',
      header: 'Sun due south or north',
      cell: ({ solarNoonMs }) => clock(solarNoonMs),
      align: 'end',
    },
    { id: 'set', header: 'Sunset', cell: ({ sunsetMs }) => clock(sunsetMs), align: 'end' },
    {
      id: 'height',
      header: 'Highest sun',
      cell: ({ noonAltitudeDeg }) => formats.angle(noonAltitudeDeg),
      align: 'end',
    },
    {
      id: 'declination',
      header: 'Declination',
      cell: ({ declinationDeg }) => `${formats.number(declinationDeg, 2)}°`,
      align: 'end',
    },
    {
      id: 'equation',
      header: 'Sundial ahead of an even clock',
      cell: ({ equationOfTimeMin }) => `${formats.number(equationOfTimeMin, 1)} min`,
      align: 'end',
    },
  ];
  return (
    <DataTable
      caption={`The sun in ${municipality.shortName} on the key dates of ${year}`}
      columns={columns}
      rows={rows}
      rowKey={({ date }) => date}
      stacksWhenNarrow
    />
  );
}

function roundToMinute(atMs: number): number {
  return Math.round(atMs / 60_000) * 60_000;
}
