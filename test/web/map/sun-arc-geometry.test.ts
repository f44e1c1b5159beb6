import { describe, expect, it } from 'vitest';
import {
  arcPath,
  instantOfX,
  layOutArc,
  listAltitudeLines,
  listHourTicks,
  xOfInstant,
  yOfAltitude,
} from '../../../web/map/sun-arc-geometry.ts';
import { computeSunDay } from '../../../web/map/sun-day.ts';

const larkhaven = ['America/Chicago', -91.3, 46.75] as const;
const box = { left: 50, right: 850, top: 20, baseline: 120 };
const winter = computeSunDay('2026-12-21', ...larkhaven);
const summer = computeSunDay('2026-06-21', ...larkhaven);

describe('the axis of the sun arc', () => {
  it('runs from the whole hour before sunrise to the whole hour after sunset', () => {
    const frame = layOutArc(winter, box);
    expect(new Date(frame.fromMs).toISOString()).toBe('2026-12-21T13:00:00.000Z');
    expect(new Date(frame.toMs).toISOString()).toBe('2026-12-21T23:00:00.000Z');
  });

  it('leads from an instant to a place and back', () => {
    const frame = layOutArc(winter, box);
    const atMs = Date.parse('2026-12-21T11:45:00-06:00');
    expect(instantOfX(frame, xOfInstant(frame, atMs))).toBeCloseTo(atMs, 0);
    expect(xOfInstant(frame, frame.fromMs)).toBe(box.left);
    expect(xOfInstant(frame, frame.toMs)).toBe(box.right);
  });

  it('puts the horizon on the base line and a higher sun higher up', () => {
    const frame = layOutArc(winter, box);
    expect(yOfAltitude(frame, 0)).toBe(box.baseline);
    expect(yOfAltitude(frame, 20)).toBeLessThan(yOfAltitude(frame, 10));
  });

  it('keeps the highest sun below the top, and a winter sun well below it', () => {
    const summerTop = yOfAltitude(layOutArc(summer, box), summer.noonAltitudeDeg);
    expect(summerTop).toBeGreaterThan(box.top);
    const winterTop = yOfAltitude(layOutArc(winter, box), winter.noonAltitudeDeg);
    expect(winterTop).toBeGreaterThan(box.top + 0.3 * (box.baseline - box.top));
  });

  it('labels the hours of the clock as the place counts them', () => {
    const frame = layOutArc(winter, box);
    const twelve = listHourTicks(frame, 'America/Chicago', 'en-US').map((tick) => tick.label);
    expect(twelve).toEqual(['7', '8', '9', '10', '11', '12', '1', '2', '3', '4', '5']);
    const ticks24 = listHourTicks(frame, 'America/Chicago', 'de-DE').map((tick) => tick.label);
    expect(ticks24.slice(-3)).toEqual(['15', '16', '17']);
  });

  it('leaves out the hour that the clock skips', () => {
    const day = computeSunDay('2026-03-08', ...larkhaven);
    const frame = { ...layOutArc(day, box), fromMs: day.startMs };
    const labels = listHourTicks(frame, 'America/Chicago', 'de-DE').map((tick) => tick.label);
    expect(labels.slice(0, 4)).toEqual(['0', '1', '3', '4']);
  });

  it('draws altitude lines every 10° for a low sun and every 20° for a high one', () => {
    expect(listAltitudeLines(layOutArc(winter, box))).toEqual([10, 20]);
    expect(listAltitudeLines(layOutArc(summer, box))).toEqual([20, 40, 60]);
  });
});

describe('arcPath', () => {
  it('begins and ends on the horizon', () => {
    const frame = layOutArc(winter, box);
    const points = arcPath(frame, winter)
      .slice(1)
      .split('L')
      .map((point) => point.split(' ').map(Number));
    expect(points.at(0)?.[1]).toBeCloseTo(box.baseline, 0);
    expect(points.at(-1)?.[1]).toBeCloseTo(box.baseline, 0);
    expect(points.length).toBe(winter.curve.length);
  });

  it('is empty in the polar night', () => {
    const night = computeSunDay('2026-12-21', 'Europe/Oslo', 25, 71);
    expect(arcPath(layOutArc(night, box), night)).toBe('');
  });
});
