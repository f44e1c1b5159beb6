import { describe, expect, it } from 'vitest';
import { listArcSteps, moveByKey, snapToStep } from '../../../web/map/sun-arc-steps.ts';
import { computeSunDay } from '../../../web/map/sun-day.ts';

const day = computeSunDay('2026-12-21', 'America/Chicago', -91.3, 46.75);
const at = (clock: string) => Date.parse(`2026-12-21T${clock}:00-06:00`);
const window = { fromMs: at('10:00'), toMs: at('14:00') };

function getSteps(judged: typeof window | null = window) {
  const steps = listArcSteps(day, judged);
  if (steps === null) throw new Error('The sun rises on this day.');
  return steps;
}

describe('the keys of the sun arc', () => {
  it('move by five minutes with the arrows', () => {
    expect(moveByKey(getSteps(), at('11:45'), 'ArrowRight')).toBe(at('11:50'));
    expect(moveByKey(getSteps(), at('11:45'), 'ArrowUp')).toBe(at('11:50'));
    expect(moveByKey(getSteps(), at('11:45'), 'ArrowLeft')).toBe(at('11:40'));
    expect(moveByKey(getSteps(), at('11:45'), 'ArrowDown')).toBe(at('11:40'));
  });

  it('lead back onto whole steps from in between', () => {
    expect(moveByKey(getSteps(), at('11:47'), 'ArrowRight')).toBe(at('11:50'));
    expect(moveByKey(getSteps(), at('11:47'), 'ArrowLeft')).toBe(at('11:45'));
  });

  it('move by an hour with the page keys', () => {
    expect(moveByKey(getSteps(), at('11:45'), 'PageUp')).toBe(at('12:45'));
    expect(moveByKey(getSteps(), at('11:45'), 'PageDown')).toBe(at('10:45'));
  });

  it('lead to the ends of the judged hours with Home and End', () => {
    expect(moveByKey(getSteps(), at('11:45'), 'Home')).toBe(at('10:00'));
    expect(moveByKey(getSteps(), at('11:45'), 'End')).toBe(at('14:00'));
  });

  it('lead to the first and the last sun of a day that is not judged', () => {
    const steps = getSteps(null);
    expect(moveByKey(steps, at('11:45'), 'Home')).toBe(steps.firstMs);
    expect(moveByKey(steps, at('11:45'), 'End')).toBe(steps.lastMs);
  });

  it('stay within the hours of sun', () => {
    const steps = getSteps();
    expect(moveByKey(steps, steps.firstMs, 'ArrowLeft')).toBe(steps.firstMs);
    expect(moveByKey(steps, steps.lastMs, 'PageUp')).toBe(steps.lastMs);
    expect(steps.firstMs).toBeGreaterThanOrEqual(day.sunriseMs ?? 0);
    expect(steps.lastMs).toBeLessThanOrEqual(day.sunsetMs ?? 0);
  });

  it('leave other keys to the page', () => {
    expect(moveByKey(getSteps(), at('11:45'), 'Tab')).toBeNull();
  });
});

describe('listArcSteps', () => {
  it('has none where the sun stays down', () => {
    const night = computeSunDay('2026-12-21', 'Europe/Oslo', 25, 71);
    expect(listArcSteps(night, null)).toBeNull();
  });

  it('takes whole minutes inside a window that ends between them', () => {
    const odd = { fromMs: at('08:20') + 13_000, toMs: at('15:40') + 44_000 };
    const steps = getSteps(odd);
    expect(steps.homeMs).toBe(at('08:21'));
    expect(steps.endMs).toBe(at('15:40'));
  });
});

describe('snapToStep', () => {
  it('takes the nearest five minutes, with the sun up', () => {
    expect(snapToStep(getSteps(), at('11:47'))).toBe(at('11:45'));
    expect(snapToStep(getSteps(), at('11:48'))).toBe(at('11:50'));
    expect(snapToStep(getSteps(), at('02:00'))).toBe(getSteps().firstMs);
  });
});
