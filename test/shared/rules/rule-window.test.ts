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

  it('take the last of February for the 29th in a common year', () => {
    expect(expandDays([{ date: '02-29' }], 2026, larkhaven)[0]?.dates).toEqual(['2026-02-28']);
    expect(expandDays([{ date: '02-29' }], 2028, larkhaven)[0]?.dates).toEqual(['2028-02-29']);
    expect(expandDays([{ year: true }], 2028, larkhaven)[0]?.dates).toHaveLength(366);
  });
});
