import { describe, expect, it } from 'vitest';
import { createCivilTimeFormat } from '../../../shared/drawing/civil-time-format.ts';
import { createFigureFormat } from '../../../shared/drawing/figure-format.ts';
import { roundScaleLength } from '../../../shared/drawing/north-and-scale.ts';
import { shortDigest, titleBlockRows } from '../../../shared/drawing/title-block.ts';

const time = createCivilTimeFormat('en-US', 'America/Chicago');
const figures = createFigureFormat('en-US');

describe('createCivilTimeFormat', () => {
  it('writes dates and clocks as people of the place do, with the zone of that day', () => {
    expect(time.dateAndClock('2026-12-21T19:10:00Z')).toBe('December 21, 2026, 1:10 p.m. CST');
    expect(time.clockWithZone('2026-06-21T12:00:00-05:00')).toBe('12:00 p.m. CDT');
    expect(time.clock('2026-12-21T00:05:00-06:00')).toBe('12:05 a.m.');
  });

  it('takes civil dates as they are, in no zone', () => {
    expect(time.civilDate('2026-12-21')).toBe('December 21, 2026');
    expect(time.monthAndDay('2026-12-21')).toBe('December 21');
    expect(time.shortMonthAndDay('2026-12-21')).toBe('Dec 21');
  });

  it('finds the civil date of an instant late in the evening', () => {
    expect(time.civilDateOf('2026-12-22T05:59:00Z')).toBe('2026-12-21');
    expect(time.civilDateOf('2026-12-22T06:00:00Z')).toBe('2026-12-22');
  });

  it('counts hours of the clock, whatever offset the instant is written with', () => {
    expect(time.clockHours('2026-12-21T13:30:00-06:00')).toBe(13.5);
    expect(time.clockHours('2026-12-21T19:30:00Z')).toBe(13.5);
    expect(time.clockHours('2026-12-21T00:00:00-06:00')).toBe(0);
  });

  it('writes hours from 0 to 12 or to 24 by the locale', () => {
    expect([8, 12, 13, 20].map(time.hour)).toEqual(['8', 'noon', '1', '8']);
    const german = createCivilTimeFormat('de-DE', 'Europe/Berlin');
    expect(german.hour(20)).toBe('20');
    expect(german.dateAndClock('2026-12-21T12:10:00Z')).toBe('21. Dezember 2026, 13:10 MEZ');
  });
});

describe('createFigureFormat', () => {
  it.each([
    [3 + 5 / 60, '3 h 05 min'],
    [50 / 60, '50 min'],
    [2, '2 h 00 min'],
    [1 + 59.7 / 60, '2 h 00 min'],
    [0.004, 'none'],
    [-0.39, '−23 min'],
    [-1.43, '−1 h 26 min'],
  ])('writes %f hours as %s', (hours, text) => {
    expect(figures.duration(hours)).toBe(text);
  });

  it('gives lengths, heights, areas and angles their units', () => {
    expect(figures.length(44)).toBe('44.0 m');
    expect(figures.height(44)).toBe('+44.0 m');
    expect(figures.height(-3)).toBe('−3.0 m');
    expect(figures.height(0)).toBe('0.0 m');
    expect(figures.area(1240.4)).toBe('1,240 m²');
    expect(figures.angle(19.66)).toBe('19.7°');
  });

  it('never writes a minus before nothing', () => {
    expect(figures.whole(-0.2)).toBe('0');
    expect(figures.length(-0.04)).toBe('0.0 m');
  });

  it('writes values in the units of the measures', () => {
    expect(figures.inUnit(1.5, 'h')).toBe('1 h 30 min');
    expect(figures.inUnit(0.425, '1')).toBe('42.5%');
    expect(figures.inUnit(0.417, 'kWh/m²')).toBe('0.42 kWh/m²');
    expect(figures.inUnit(1830.2, 'm²·h')).toBe('1,830 m²·h');
  });

  it('follows the locale', () => {
    const german = createFigureFormat('de-DE');
    expect(german.area(1240)).toBe('1.240 m²');
    expect(german.length(44)).toBe('44,0 m');
  });
});

describe('roundScaleLength', () => {
  it.each([
    [99, 50],
    [100, 100],
    [199, 100],
    [201, 200],
    [7.2, 5],
    [0.9, 0.5],
  ])('chooses for at most %f m a bar of %f m', (longest, length) => {
    expect(roundScaleLength(longest)).toBeCloseTo(length, 9);
  });
});

describe('titleBlockRows', () => {
  it('states case, revision, study, date, civil time with zone, azimuth and altitude', () => {
    expect(
      titleBlockRows(
        {
          caseReference: '2026-0014',
          revision: 2,
          studyDigest: `sha256:7f3a91c2${'0'.repeat(56)}`,
          at: '2026-12-21T17:45:00Z',
          azimuthDeg: 176.32,
          altitudeDeg: 19.71,
        },
        time,
        figures,
      ),
    ).toEqual([
      ['2026-0014 · revision 2', 'study 7f3a 91c2'],
      ['December 21, 2026', '11:45 a.m. CST'],
      ['sun 176.3° from north', '19.7° high'],
    ]);
  });

  it('says that there is no study yet, and leaves out a sun that there is not', () => {
    expect(
      titleBlockRows(
        {
          caseReference: 'draft-abcdefghij',
          revision: 1,
          studyDigest: null,
          at: null,
          azimuthDeg: null,
          altitudeDeg: null,
        },
        time,
        figures,
      ),
    ).toEqual([['draft-abcdefghij · revision 1', 'no study yet']]);
  });

  it('shortens a digest to eight digits in two groups', () => {
    expect(shortDigest('sha256:b200320b46553ff6')).toBe('b200 320b');
  });
});
