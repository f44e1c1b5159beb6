import { createCivilTimeFormat } from '../../shared/drawing/civil-time-format.ts';
import { createFigureFormat } from '../../shared/drawing/figure-format.ts';

/** Where and in which form a place reads its figures. */
export interface FormatSettings {
  /** BCP 47, for example `en-US`. */
  locale: string;
  /** IANA name, for example `America/Chicago`. */
  timeZone: string;
}

export type Formats = ReturnType<typeof createFormats>;

/**
 * Dates, times and figures as people of one place write them, the same on screen as on drawings.
 * Instants are RFC 3339, days `YYYY-MM-DD`.
 */
export function createFormats({ locale, timeZone }: FormatSettings) {
  const civil = createCivilTimeFormat(locale, timeZone);
  const figure = createFigureFormat(locale);
  const shortDateFormat = new Intl.DateTimeFormat(locale, { dateStyle: 'medium', timeZone });
  // A figure and its unit stay on one line.
  const whole =
    <Arguments extends unknown[]>(write: (...values: Arguments) => string) =>
    (...values: Arguments) =>
      write(...values).replaceAll(' ', '\u00a0');
  const number = (value: number, decimals = 0) =>
    new Intl.NumberFormat(locale, {
      minimumFractionDigits: decimals,
      maximumFractionDigits: decimals,
    }).format(value);

  return {
    locale,
    timeZone,
    /** For the drawings, which take the two as they are. */
    civil,
    figure,
    /** `1,240.5` */
    number,
    /** `1:10 p.m.` */
    clock: whole(civil.clock),
    /** `CST` */
    zone: civil.zone,
    /** `1:10 p.m. CST` */
    clockWithZone: whole(civil.clockWithZone),
    /** `December 21, 2026, 1:10 p.m. CST` */
    instant: civil.dateAndClock,
    /** The civil day of an instant: `December 21, 2026` */
    dateOfInstant: civil.date,
    /** The same, short for tables: `Dec 21, 2026` */
    shortDateOfInstant: (at: string) => shortDateFormat.format(new Date(at)),
    /** A civil day: `December 21, 2026` */
    date: civil.civilDate,
    /** A civil day without its year: `December 21` */
    dayOfYear: civil.monthAndDay,
    /** `44.0 m` */
    length: whole(figure.length),
    /** `1,240 m²` */
    area: whole(figure.area),
    /** `21,600 m³` */
    volume: whole((cubicMetres: number) => `${figure.whole(cubicMetres)} m³`),
    /** `19.7°` */
    angle: figure.angle,
    /** A share from 0 to 1: `18%` */
    share: figure.percent,
    /** `0.42 kWh/m²` */
    energy: whole((kwhPerM2: number) => figure.inUnit(kwhPerM2, 'kWh/m²')),
    /** `3 h 05 min`, `50 min`; `none` for no time at all. */
    hours: whole(figure.duration),
    /** A value in the unit of a rule's measure. */
    inUnit: whole(figure.inUnit),
    /** `1.4 MB` */
    fileSize: (bytes: number) =>
      bytes < 1_000_000
        ? `${number(Math.max(1, Math.round(bytes / 1000)))} kB`
        : `${number(bytes / 1_000_000, 1)} MB`,
  };
}
