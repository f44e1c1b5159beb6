/** Where and in which form a place reads its figures. */
export interface FormatSettings {
  /** BCP 47, for example `en-US`. */
  locale: string;
  /** IANA name, for example `America/Chicago`. */
  timeZone: string;
}

export type Formats = ReturnType<typeof createFormats>;

/** Dates, times and figures as people of one place write them. Instants are RFC 3339, days `YYYY-MM-DD`. */
export function createFormats({ locale, timeZone }: FormatSettings) {
  const dateFormat = new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeZone });
  const shortDateFormat = new Intl.DateTimeFormat(locale, { dateStyle: 'medium', timeZone });
  const civilDateFormat = new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeZone: 'UTC' });
  const civilDayFormat = new Intl.DateTimeFormat(locale, {
    month: 'long',
    day: 'numeric',
    timeZone: 'UTC',
  });
  const clockFormat = new Intl.DateTimeFormat(locale, {
    hour: 'numeric',
    minute: '2-digit',
    timeZone,
  });
  const zoneFormat = new Intl.DateTimeFormat(locale, { timeZoneName: 'short', timeZone });
  const isEnglish = locale.startsWith('en');

  const number = (value: number, decimals = 0) =>
    new Intl.NumberFormat(locale, {
      minimumFractionDigits: decimals,
      maximumFractionDigits: decimals,
    })
      .format(value === 0 ? 0 : value)
      .replace('-', '\u2212');

  /** `1:10 p.m.` */
  const clock = (at: string) =>
    clockFormat
      .formatToParts(new Date(at))
      .map((part) => {
        if (part.type === 'dayPeriod' && isEnglish) return toAbbreviation(part.value);
        return part.type === 'literal' ? part.value.replace('\u202f', ' ') : part.value;
      })
      .join('');

  /** `CST` */
  const zone = (at: string) =>
    zoneFormat.formatToParts(new Date(at)).find((part) => part.type === 'timeZoneName')?.value ??
    timeZone;

  return {
    locale,
    timeZone,
    number,
    clock,
    zone,
    /** `1:10 p.m. CST` */
    clockWithZone: (at: string) => `${clock(at)} ${zone(at)}`,
    /** `December 21, 2026, 1:10 p.m. CST` */
    instant: (at: string) => `${dateFormat.format(new Date(at))}, ${clock(at)} ${zone(at)}`,
    /** The civil day of an instant: `December 21, 2026` */
    dateOfInstant: (at: string) => dateFormat.format(new Date(at)),
    /** The same, short for tables: `Dec 21, 2026` */
    shortDateOfInstant: (at: string) => shortDateFormat.format(new Date(at)),
    /** A civil day: `December 21, 2026` */
    date: (day: string) => civilDateFormat.format(new Date(`${day}T00:00:00Z`)),
    /** A civil day without its year: `December 21` */
    dayOfYear: (day: string) => civilDayFormat.format(new Date(`${day}T00:00:00Z`)),
    /** Metres: `44.0 m` */
    length: (metres: number, decimals = 1) => `${number(metres, decimals)} m`,
    /** Square metres: `1,240 m²` */
    area: (squareMetres: number, decimals = 0) => `${number(squareMetres, decimals)} m²`,
    /** Cubic metres: `21,600 m³` */
    volume: (cubicMetres: number) => `${number(cubicMetres)} m³`,
    /** Degrees: `19.7°` */
    angle: (degrees: number) => `${number(degrees, 1)}°`,
    /** A share from 0 to 1: `18 %` */
    share: (share: number) => `${number(share * 100)} %`,
    /** kWh/m² */
    energy: (kwhPerM2: number) => `${number(kwhPerM2, 2)} kWh/m²`,
    hours: (hours: number) => hoursAsWords(hours),
    /** `1.4 MB` */
    fileSize: (bytes: number) =>
      bytes < 1_000_000
        ? `${number(Math.max(1, bytes / 1000))} kB`
        : `${number(bytes / 1_000_000, 1)} MB`,
  };
}

/** Hours as hours and minutes: `3 h 05 min`, `50 min`, `2 h`. */
function hoursAsWords(hours: number): string {
  const minutes = Math.round(Math.abs(hours) * 60);
  const sign = hours < 0 && minutes > 0 ? '\u2212' : '';
  if (minutes === 0) return hours === 0 ? '0 min' : 'under 1 min';
  const whole = Math.floor(minutes / 60);
  const rest = minutes % 60;
  if (whole === 0) return `${sign}${rest} min`;
  if (rest === 0) return `${sign}${whole} h`;
  return `${sign}${whole} h ${String(rest).padStart(2, '0')} min`;
}

/** `PM` as running English text has it: `p.m.` */
function toAbbreviation(dayPeriod: string): string {
  const letters = dayPeriod.toLowerCase().replaceAll('.', '');
  return letters === 'am' || letters === 'pm' ? `${letters[0] ?? ''}.m.` : dayPeriod;
}
