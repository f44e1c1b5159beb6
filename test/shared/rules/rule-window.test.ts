import { describe, expect, it } from 'vitest';
import type { Place } from '../../../shared/rules/place.ts';
import { expandDays } from '../../../shared/rules/rule-days.ts';
import type { RuleWindow } from '../../../shared/rules/rule-schema.ts';
import { instantsOfSpan, windowSpans } from '../../../shared/rules/rule-window.ts';
import { formatInstant } from '../../../shared/solar/civil-time.ts';

const larkhaven: Place = {
  longitude: -91.3,
  latitude: 46.75,
  timezone: 'America/Chicago',
  elevation: 186,
};

function spansOf(window: RuleWindow, date: string, minimumAltitude = 0, place = larkhaven) {
  return windowSpans({ window, minimumAltitude }, date, place).map(({ startMs, endMs }) => [
    formatInstant(startMs, place.timezone),
    formatInstant(endMs, place.timezone),
  ]);
}

describe('the window of a clause', () => {
  it('means different instants by the civil and the standard clock in summer', () => {
    expect(spansOf({ basis: 'civil', from: '10:00', to: '14:00' }, '2026-06-21')).toEqual([
      ['2026-06-21T10:00:00-05:00', '2026-06-21T14:00:00-05:00'],
    ]);
    expect(spansOf({ basis: 'standard', from: '10:00', to: '14:00' }, '2026-06-21')).toEqual([
      ['2026-06-21T11:00:00-05:00', '2026-06-21T15:00:00-05:00'],
    ]);
  });

  it('is cut to the time with the sun up, and with it above the minimum altitude', () => {
    const whole = { basis: 'civil', from: '05:00', to: '21:00' } as const;
    const [[start = '', end = ''] = []] = spansOf(whole, '2026-12-21');
    expect(start.slice(11, 16)).toBe('07:48');
    expect(end.slice(11, 16)).toBe('16:17');
    const [[high = ''] = []] = spansOf(whole, '2026-12-21', 10);
    expect(high > start).toBe(true);
  });

  it('counts from sunrise and to sunset', () => {
    const [[start = '', end = ''] = []] = spansOf(
      { basis: 'sun', afterSunrise: 60, beforeSunset: 60 },
      '2026-12-21',
    );
    // By astronomy-engine the centre crosses the apparent horizon at 07:48:59 and at 16:17:47.
    expect([start.slice(11, 19), end.slice(11, 19)]).toEqual(['08:48:59', '15:17:50']);
  });

  it('is empty in polar night', () => {
    const tromso: Place = {
      longitude: 18.95,
      latitude: 69.65,
      timezone: 'Europe/Oslo',
      elevation: 0,
    };
    const window = { basis: 'civil', from: '10:00', to: '14:00' } as const;
    expect(spansOf(window, '2026-12-21', 0, tromso)).toEqual([]);
  });

  it('begins after the hour that is missing when clocks go forward', () => {
    // Clocks in Norway jump from 02:00 to 03:00 on 29 March 2026; at Svalbard's latitude in April
    // the sun is up at night, so the same jump is tried where it matters on 30 March 2025.
    const svalbard: Place = {
      longitude: 15.6,
      latitude: 78.2,
      timezone: 'Arctic/Longyearbyen',
      elevation: 0,
    };
    const window = { basis: 'civil', from: '02:30', to: '09:00' } as const;
    const [[start = ''] = []] = spansOf(window, '2025-03-30', 0, svalbard);
    expect(start >= '2025-03-30T03:00:00+02:00').toBe(true);
  });

  it('lists its instants every step from its start and always its end', () => {
    const minutes = instantsOfSpan({ startMs: 0, endMs: 25 * 60_000 }, 10).map((at) => at / 60_000);
    expect(minutes).toEqual([0, 10, 20, 25]);
    expect(instantsOfSpan({ startMs: 5, endMs: 5 }, 10)).toEqual([5]);
  });
});

describe('windows where clocks change', () => {
  // From memory: in 2026 clocks go forward on 8 March and back on 1 November in the United States;
  // in Australia back on 5 April and forward on 4 October.
  const hoursOf = (window: RuleWindow, date: string, place = larkhaven) =>
    windowSpans({ window, minimumAltitude: 0 }, date, place).reduce(
      (sum, { startMs, endMs }) => sum + (endMs - startMs) / 3_600_000,
      0,
    );
  const melbourne: Place = {
    longitude: 144.9631,
    latitude: -37.8136,
    timezone: 'Australia/Melbourne',
    elevation: 31,
  };

  it('keep their length and their clock on the day itself', () => {
    const nineToThree = { basis: 'civil', from: '09:00', to: '15:00' } as const;
    for (const date of ['2026-03-07', '2026-03-08', '2026-11-01']) {
      expect(hoursOf(nineToThree, date)).toBe(6);
    }
    expect(spansOf(nineToThree, '2026-03-07')[0]?.[0]).toBe('2026-03-07T09:00:00-06:00');
    expect(spansOf(nineToThree, '2026-03-08')[0]?.[0]).toBe('2026-03-08T09:00:00-05:00');
    expect(spansOf(nineToThree, '2026-10-04', 0, melbourne)[0]?.[0]).toBe(
      '2026-10-04T09:00:00+11:00',
    );
  });

  it('of standard time show an hour more on the summer clock, north and south', () => {
    const tenToTwo = { basis: 'standard', from: '10:00', to: '14:00' } as const;
    expect(spansOf(tenToTwo, '2026-03-07')[0]?.[0]).toBe('2026-03-07T10:00:00-06:00');
    expect(spansOf(tenToTwo, '2026-03-08')[0]?.[0]).toBe('2026-03-08T11:00:00-05:00');
    // Victoria's 22 September lies in standard time, 5 October does not.
    expect(spansOf(tenToTwo, '2026-09-22', 0, melbourne)[0]?.[0]).toBe('2026-09-22T10:00:00+10:00');
    expect(spansOf(tenToTwo, '2026-10-05', 0, melbourne)[0]?.[0]).toBe('2026-10-05T11:00:00+11:00');
  });

  it('of the sun and of solar time do not see the change', () => {
    // Boulder, from the sun's position by the NREL algorithm: 9:00 by the clock on 21 March 2026 is
    // 7:52 in true solar time, daylight saving being in force.
    const boulder: Place = {
      longitude: -105.2705,
      latitude: 40.015,
      timezone: 'America/Denver',
      elevation: 1655,
    };
    const solar = { basis: 'solar', from: '07:52', to: '16:00' } as const;
    const [[start = ''] = []] = spansOf(solar, '2026-03-21', 0, boulder);
    expect(start.slice(0, 16)).toMatch(/^2026-03-21T(08:59|09:00)$/);
    const wholeDay = { basis: 'sun', afterSunrise: 0, beforeSunset: 0 } as const;
    const gained = hoursOf(wholeDay, '2026-03-08') - hoursOf(wholeDay, '2026-03-07');
    // A March day at 46.75° N is some three minutes longer than the one before, clocks or not.
    expect(gained * 60).toBeGreaterThan(2.5);
    expect(gained * 60).toBeLessThan(4);
  });

  it('span the hour that is shown twice where the sun is up at night', () => {
    // Late October has no midnight sun; a place far from its zone's meridian has sun at two o'clock.
    const far: Place = { longitude: -130, latitude: 0, timezone: 'Europe/Oslo', elevation: 0 };
    const night = { basis: 'civil', from: '01:00', to: '02:30' } as const;
    // 25 October 2026: 02:30 is shown twice; from the first 01:00 to the last 02:30 are 2.5 hours.
    expect(hoursOf(night, '2026-10-25', far)).toBe(2.5);
    expect(hoursOf(night, '2026-10-24', far)).toBe(1.5);
    // 29 March 2026: 02:00 to 03:00 is missing; the window ends where the gap does.
    expect(hoursOf(night, '2026-03-29', far)).toBe(1);
  });
});

describe('the days of a clause', () => {
  it('turn winter into June south of the equator', () => {
    const south = {
      ...larkhaven,
      latitude: -37.8,
      longitude: 144.96,
      timezone: 'Australia/Melbourne',
    };
    expect(expandDays([{ event: 'winter-solstice' }], 2026, south)[0]?.dates).toEqual([
      '2026-06-21',
    ]);
    expect(expandDays([{ event: 'winter-solstice' }], 2026, larkhaven)[0]?.dates).toEqual([
      '2026-12-21',
    ]);
  });

  it('wrap a season into the next year', () => {
    const [season] = expandDays([{ from: '12-30', to: '01-02', everyDays: 1 }], 2026, larkhaven);
    expect(season).toEqual({
      isSeason: true,
      dates: ['2026-12-30', '2026-12-31', '2027-01-01', '2027-01-02'],
    });
  });

  it('wrap a southern summer, leap day and all', () => {
    const [season] = expandDays([{ from: '12-01', to: '02-29', everyDays: 1 }], 2027, larkhaven);
    expect(season?.dates[0]).toBe('2027-12-01');
    // 31 days of December, 31 of January and 29 of February 2028.
    expect(season?.dates).toHaveLength(91);
    expect(season?.dates.at(-1)).toBe('2028-02-29');
    const [common] = expandDays([{ from: '12-01', to: '02-29', everyDays: 1 }], 2026, larkhaven);
    expect(common?.dates.at(-1)).toBe('2027-02-28');
  });

  it('go on counting from a season’s first day across the year’s end', () => {
    const [season] = expandDays([{ from: '12-20', to: '01-10', everyDays: 7 }], 2026, larkhaven);
    expect(season?.dates).toEqual(['2026-12-20', '2026-12-27', '2027-01-03', '2027-01-10']);
  });

  it('name the solstices by the sun’s height, north and south of the equator', () => {
    const south = { ...larkhaven, latitude: -46.75 };
    const events = [{ event: 'winter-solstice' }, { event: 'summer-solstice' }] as const;
    const datesAt = (place: Place) =>
      expandDays([...events], 2026, place).flatMap(({ dates }) => dates);
    expect(datesAt(larkhaven)).toEqual(['2026-12-21', '2026-06-21']);
    expect(datesAt(south)).toEqual(['2026-06-21', '2026-12-21']);
  });

  it('take the last of February for the 29th in a common year', () => {
    expect(expandDays([{ date: '02-29' }], 2026, larkhaven)[0]?.dates).toEqual(['2026-02-28']);
    expect(expandDays([{ date: '02-29' }], 2028, larkhaven)[0]?.dates).toEqual(['2028-02-29']);
    expect(expandDays([{ year: true }], 2028, larkhaven)[0]?.dates).toHaveLength(366);
  });
});
