import { describe, expect, it } from 'vitest';
import { createFormats } from '../../../web/lib/formats.ts';
import { larkhavenFormats, withPlainSpaces } from '../support/render-in-place.tsx';

const formats = larkhavenFormats;

describe('formats of Larkhaven', () => {
  it('shows an instant in civil time with the zone’s short name', () => {
    expect(withPlainSpaces(formats.instant('2026-12-21T19:10:00Z'))).toBe(
      'December 21, 2026, 1:10 p.m. CST',
    );
    expect(withPlainSpaces(formats.instant('2026-06-21T17:05:00Z'))).toBe(
      'June 21, 2026, 12:05 p.m. CDT',
    );
  });

  it('shows the civil day of an instant, which can be the day before that of Greenwich', () => {
    expect(formats.dateOfInstant('2026-12-22T03:00:00Z')).toBe('December 21, 2026');
  });

  it('shows a civil day as it is, whatever the zone', () => {
    expect(formats.date('2026-12-21')).toBe('December 21, 2026');
    expect(formats.dayOfYear('2026-03-01')).toBe('March 1');
  });

  it('shows hours as hours and minutes', () => {
    expect(withPlainSpaces(formats.hours(3 + 5 / 60))).toBe('3 h 05 min');
    expect(withPlainSpaces(formats.hours(50 / 60))).toBe('50 min');
    expect(formats.hours(0)).toBe('none');
  });

  it('keeps a figure and its unit on one line', () => {
    expect(formats.length(44)).toBe('44.0\u00a0m');
    expect(formats.area(1240.4)).toBe('1,240\u00a0m²');
    expect(formats.clock('2026-12-21T19:10:00Z')).toBe('1:10\u00a0p.m.');
  });

  it('names file sizes so that one kilobyte is the least', () => {
    expect(formats.fileSize(12)).toBe('1 kB');
    expect(formats.fileSize(1_440_000)).toBe('1.4 MB');
  });
});

describe('formats of another place', () => {
  it('follow its locale and zone', () => {
    const bremen = createFormats({ locale: 'de-DE', timeZone: 'Europe/Berlin' });
    expect(bremen.clock('2026-12-21T12:10:00Z')).toBe('13:10');
    expect(withPlainSpaces(bremen.length(1234.5))).toBe('1.234,5 m');
  });
});
