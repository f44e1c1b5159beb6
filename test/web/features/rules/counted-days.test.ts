import { describe, expect, it } from 'vitest';
import { countDays, describeDay, monthsOf } from '../../../../web/features/rules/counted-days.ts';
import { placeOfMunicipality } from '../../../../web/features/rules/place-of-municipality.ts';
import { larkhaven } from '../../support/render-in-place.tsx';

const place = placeOfMunicipality(larkhaven);

describe('the calendar of a clause', () => {
  it('has each day once, in order, though two entries name it', () => {
    // The March equinox of 2026 is on 20 March, 14:46 UTC (published almanacs, from memory).
    const days = [{ date: '03-20' }, { event: 'march-equinox' as const }, { date: '01-05' }];
    expect(countDays(days, 2026, place)).toEqual(['2026-01-05', '2026-03-20']);
  });

  it('has twelve months, and those of the next year into which a season runs', () => {
    const winter = countDays([{ from: '12-30', to: '02-02', everyDays: 1 }], 2026, place);
    // 30 and 31 December, January's 31, two of February.
    expect(winter).toHaveLength(35);
    const months = monthsOf(winter, 2026);
    expect(months.map(({ counted }) => counted.size)).toEqual([
      0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 2, 31, 2,
    ]);
    expect(months.at(-1)).toMatchObject({ month: '2027-02', dayCount: 28 });
    expect(monthsOf(['2026-03-20'], 2026)).toHaveLength(12);
  });
});

describe('the day of a clause', () => {
  it('counts the window’s instants with both its ends', () => {
    const window = { basis: 'standard' as const, from: '10:00', to: '14:00' };
    const day = describeDay({ window, minimumAltitude: 0, step: 10 }, '2026-12-21', place);
    // Central Standard Time is six hours behind Greenwich; 24 steps of ten minutes have 25 ends.
    expect(day.instants).toHaveLength(25);
    expect(new Date(day.instants[0] ?? 0).toISOString()).toBe('2026-12-21T16:00:00.000Z');
    expect(new Date(day.instants.at(-1) ?? 0).toISOString()).toBe('2026-12-21T20:00:00.000Z');
    expect(day.daylight[0]?.startMs).toBeLessThan(day.counted[0]?.startMs ?? 0);
  });

  it('has no instant where the sun stays below the lowest that counts', () => {
    const window = { basis: 'sun' as const, afterSunrise: 0, beforeSunset: 0 };
    // Noon on 21 December: 90 − 46.75 − 23.44 = 19.8 degrees.
    const day = (minimumAltitude: number) =>
      describeDay({ window, minimumAltitude, step: 10 }, '2026-12-21', place);
    expect(day(21).instants).toEqual([]);
    expect(day(19).instants.length).toBeGreaterThan(0);
  });
});
