import { DateTime } from 'luxon';
import { describe, expect, it } from 'vitest';
import {
  civilClockToMs,
  civilDateOf,
  civilDayBounds,
  createInstantFormat,
  formatInstant,
  standardClockToMs,
  standardOffsetMin,
  wholeClockHours,
} from '../../../shared/solar/civil-time.ts';
import { keyDatesOfYear } from '../../../shared/solar/key-dates.ts';

const clocks = (date: string, zone: string) =>
  wholeClockHours(date, zone).map((atMs) => formatInstant(atMs, zone).slice(11));

describe('the whole hours of a civil day', () => {
  it('are 24 on an ordinary day', () => {
    const hours = clocks('2026-06-21', 'America/Chicago');
    expect(hours).toHaveLength(24);
    expect(hours[0]).toBe('00:00:00-05:00');
    expect(hours.at(-1)).toBe('23:00:00-05:00');
  });

  it('leave out the hour that is missing when clocks go forward', () => {
    const hours = clocks('2026-03-08', 'America/Chicago');
    expect(hours).toHaveLength(23);
    expect(hours.slice(1, 3)).toEqual(['01:00:00-06:00', '03:00:00-05:00']);
  });

  it('have the hour twice that comes twice when clocks go back', () => {
    const hours = clocks('2026-11-01', 'America/Chicago');
    expect(hours).toHaveLength(25);
    expect(hours.slice(1, 3)).toEqual(['01:00:00-05:00', '01:00:00-06:00']);
  });

  it('follow zones that are off by half an hour or a quarter, or change by half an hour', () => {
    expect(clocks('2026-06-21', 'Asia/Kathmandu')[6]).toBe('06:00:00+05:45');
    expect(clocks('2026-06-21', 'Asia/Kolkata')[6]).toBe('06:00:00+05:30');
    // Lord Howe goes back by half an hour: half past one comes twice, no whole hour does.
    expect(clocks('2026-04-05', 'Australia/Lord_Howe')).toHaveLength(24);
    const { startMs, endMs } = civilDayBounds('2026-04-05', 'Australia/Lord_Howe');
    expect((endMs - startMs) / 3_600_000).toBe(24.5);
  });
});

describe('a clock that is read on a day of change', () => {
  const at = (date: string, clock: string, which: 'first' | 'last') =>
    formatInstant(civilClockToMs(date, clock, 'America/Chicago', which), 'America/Chicago');

  it('takes the first instant after the gap for a time that is missing', () => {
    expect(at('2026-03-08', '02:30', 'first')).toBe('2026-03-08T03:00:00-05:00');
    expect(at('2026-03-08', '02:30', 'last')).toBe('2026-03-08T03:00:00-05:00');
  });

  it('tells the first from the last of a time that comes twice', () => {
    expect(at('2026-11-01', '01:30', 'first')).toBe('2026-11-01T01:30:00-05:00');
    expect(at('2026-11-01', '01:30', 'last')).toBe('2026-11-01T01:30:00-06:00');
  });
});

describe('standard time', () => {
  it('is the smaller offset in both hemispheres, and where summer is the standard by name', () => {
    expect(standardOffsetMin(2026, 'America/Chicago')).toBe(-360);
    expect(standardOffsetMin(2026, 'Australia/Sydney')).toBe(600);
    // Ireland calls its summer time the standard one; the smaller offset is that of winter.
    expect(standardOffsetMin(2026, 'Europe/Dublin')).toBe(0);
    expect(standardOffsetMin(2026, 'Asia/Kolkata')).toBe(330);
  });

  it('stands still while the civil clock jumps', () => {
    const hours = ['2026-03-07', '2026-03-09'].map((date) =>
      formatInstant(standardClockToMs(date, '10:00', 'America/Chicago'), 'America/Chicago'),
    );
    expect(hours).toEqual(['2026-03-07T10:00:00-06:00', '2026-03-09T11:00:00-05:00']);
  });
});

describe('an instant in writing', () => {
  it('carries the offset of its zone on both sides of a change, as luxon has it', () => {
    for (const zone of ['America/Chicago', 'Australia/Lord_Howe', 'Asia/Kathmandu', 'Etc/UTC']) {
      const format = createInstantFormat(zone);
      for (let atMs = Date.UTC(2026, 2, 1); atMs < Date.UTC(2026, 3, 10); atMs += 1_234_567) {
        const expected = DateTime.fromMillis(atMs, { zone }).toISO({ suppressMilliseconds: true });
        expect(format(atMs)).toBe(expected?.replace(/Z$/, '+00:00'));
      }
    }
  });

  it('is refused in a zone that is not known', () => {
    expect(() => formatInstant(0, 'Mars/Olympus')).toThrow('Mars/Olympus is no time zone');
  });
});

describe('civil dates', () => {
  it('change at midnight of the zone, on both sides of the date line', () => {
    const atMs = Date.parse('2026-03-20T10:30:00Z');
    expect(civilDateOf(atMs, 'Pacific/Kiritimati')).toBe('2026-03-21');
    expect(civilDateOf(atMs, 'Pacific/Pago_Pago')).toBe('2026-03-19');
  });

  // The equinox of March 2026 falls at 14:46 UTC (from memory): 04:46 of the 21st at UTC+14.
  it('put an equinox on different days', () => {
    expect(keyDatesOfYear(2026, 'Pacific/Kiritimati')[0]?.date).toBe('2026-03-21');
    expect(keyDatesOfYear(2026, 'Pacific/Pago_Pago')[0]?.date).toBe('2026-03-20');
  });
});
