/** Dates and clock times of a place, written as its locale writes them. */
export interface CivilTimeFormat {
  /** `December 21, 2026` */
  date: (at: string) => string;
  /** `1:10 p.m.` */
  clock: (at: string) => string;
  /** `1:10 p.m. CST` */
  clockWithZone: (at: string) => string;
  /** `CST` */
  zone: (at: string) => string;
  /** `December 21, 2026, 1:10 p.m. CST` */
  dateAndClock: (at: string) => string;
  /** The civil date of an instant: `2026-12-21`. */
  civilDateOf: (at: string) => string;
  /** A civil date `2026-12-21` as `December 21, 2026`. */
  civilDate: (date: string) => string;
  /** A civil date `2026-12-21` as `December 21`. */
  monthAndDay: (date: string) => string;
  /** A civil date `2026-12-21` as `Dec 21`. */
  shortMonthAndDay: (date: string) => string;
  /** A whole hour of the clock, 0 to 24, short: `8`, `noon`, `20`. */
  hour: (hour: number) => string;
  /** Hours of the clock since its midnight, from 0 to 24: 13.5 for half past one. */
  clockHours: (at: string) => number;
}

/**
 * @param locale BCP 47, for example `en-US`
 * @param timeZone IANA name, for example `America/Chicago`
 */
export function createCivilTimeFormat(locale: string, timeZone: string): CivilTimeFormat {
  const dates = new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeZone });
  const clocks = new Intl.DateTimeFormat(locale, { hour: 'numeric', minute: '2-digit', timeZone });
  const zones = new Intl.DateTimeFormat(locale, { timeZoneName: 'short', timeZone });
  const civilDates = new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeZone: 'UTC' });
  const monthDays = new Intl.DateTimeFormat(locale, {
    month: 'long',
    day: 'numeric',
    timeZone: 'UTC',
  });
  const shortMonthDays = new Intl.DateTimeFormat(locale, {
    month: 'short',
    day: 'numeric',
    timeZone: 'UTC',
  });
  // Swedish writes dates as ISO 8601 does.
  const isoDates = new Intl.DateTimeFormat('sv-SE', { dateStyle: 'short', timeZone });
  const clockParts = new Intl.DateTimeFormat('en-GB', {
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
    hourCycle: 'h23',
    timeZone,
  });
  const countsToTwelve = clocks.resolvedOptions().hour12 === true;

  const clock = (at: string) =>
    clocks
      .formatToParts(new Date(at))
      .map((part) => (part.type === 'dayPeriod' ? dottedDayPeriod(part.value) : part.value))
      .join('')
      // Newer locale data puts a narrow no-break space before the day period; few fonts have it.
      .replace(/\u202F/g, ' ');
  const zone = (at: string) =>
    zones.formatToParts(new Date(at)).find((part) => part.type === 'timeZoneName')?.value ??
    timeZone;
  const clockWithZone = (at: string) => `${clock(at)} ${zone(at)}`;
  const date = (at: string) => dates.format(new Date(at));

  return {
    date,
    clock,
    clockWithZone,
    zone,
    dateAndClock: (at) => `${date(at)}, ${clockWithZone(at)}`,
    civilDateOf: (at) => isoDates.format(new Date(at)),
    civilDate: (day) => civilDates.format(new Date(`${day}T00:00:00Z`)),
    monthAndDay: (day) => monthDays.format(new Date(`${day}T00:00:00Z`)),
    shortMonthAndDay: (day) => shortMonthDays.format(new Date(`${day}T00:00:00Z`)),
    hour: (hour) => {
      if (hour === 12) return 'noon';
      return String(countsToTwelve ? ((hour + 11) % 12) + 1 : hour);
    },
    clockHours: (at) => {
      const [hours = 0, minutes = 0, seconds = 0] = clockParts
        .format(new Date(at))
        .split(':')
        .map(Number);
      return hours + minutes / 60 + seconds / 3600;
    },
  };
}

/** `AM` to `a.m.`, as English sentences write it; other day periods as they are. */
function dottedDayPeriod(period: string): string {
  if (period === 'AM') return 'a.m.';
  if (period === 'PM') return 'p.m.';
  return period;
}
