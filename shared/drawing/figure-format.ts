/** Figures with their units, as a locale writes them; stored values go in, metres and hours. */
export interface FigureFormat {
  /** `1,240` */
  whole: (value: number) => string;
  /** `18.6`: one decimal. */
  decimal: (value: number) => string;
  /** `44.0 m` */
  length: (metres: number) => string;
  /** `+44.0 m` above the ground, `−3.0 m` below it. */
  height: (metres: number) => string;
  /** `1,240 m²` */
  area: (squareMetres: number) => string;
  /** `3 h 05 min`, `50 min`, `none` for no time at all. */
  duration: (hours: number) => string;
  /** `19.7°` */
  angle: (degrees: number) => string;
  /** `42 %` of a share 0.42, as the locale writes percentages. */
  percent: (share: number) => string;
  /** A value in the unit of a rule's measure: `h`, `1` (a share), `m²·h`, `kWh/m²`, `m²`. */
  inUnit: (value: number, unit: string) => string;
}

/** @param locale BCP 47, for example `en-US` */
export function createFigureFormat(locale: string): FigureFormat {
  const decimals = (digits: number) =>
    new Intl.NumberFormat(locale, { minimumFractionDigits: digits, maximumFractionDigits: digits });
  const whole = decimals(0);
  const one = decimals(1);
  const two = decimals(2);
  const signed = new Intl.NumberFormat(locale, {
    minimumFractionDigits: 1,
    maximumFractionDigits: 1,
    signDisplay: 'exceptZero',
  });
  const percents = new Intl.NumberFormat(locale, { style: 'percent', maximumFractionDigits: 1 });
  const twoDigits = new Intl.NumberFormat(locale, { minimumIntegerDigits: 2 });

  const duration = (hours: number) => {
    const minutes = Math.round(Math.abs(hours) * 60);
    if (minutes === 0) return 'none';
    const sign = hours < 0 ? '−' : '';
    const wholeHours = Math.floor(minutes / 60);
    const rest = minutes % 60;
    if (wholeHours === 0) return `${sign}${whole.format(rest)} min`;
    return `${sign}${whole.format(wholeHours)} h ${twoDigits.format(rest)} min`;
  };

  return {
    whole: (value) => write(whole, value),
    decimal: (value) => write(one, value),
    length: (metres) => `${write(one, metres)} m`,
    height: (metres) => `${write(signed, metres)} m`,
    area: (squareMetres) => `${write(whole, squareMetres)} m²`,
    duration,
    angle: (degrees) => `${write(one, degrees)}°`,
    percent: (share) => write(percents, share),
    inUnit: (value, unit) => {
      if (unit === 'h') return duration(value);
      if (unit === '1') return write(percents, value);
      if (unit === 'kWh/m²') return `${write(two, value)} kWh/m²`;
      return `${write(whole, value)} ${unit}`;
    },
  };
}

/** The typographic minus, and never a minus before nothing. */
function write(format: Intl.NumberFormat, value: number): string {
  const text = format.format(value).replace(/\u202F/g, '\u00A0');
  if (!text.startsWith('-')) return text;
  return /[1-9]/.test(text) ? text.replace('-', '−') : text.slice(1);
}
