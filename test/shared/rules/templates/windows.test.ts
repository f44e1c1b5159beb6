import { describe, expect, it } from 'vitest';
import { judgeByTemplate, type TemplateScene } from '../../../support/judge-template.ts';
import { makeRectangle } from '../../../support/plane-scenes.ts';

// The place lies on the meridian of Greenwich at 45° N. A window faces south at the middle of it.

/** A wall without end in height along the meridian, close to the window: no sun before solar noon. */
const wallOnTheEast = {
  role: 'proposed' as const,
  ring: makeRectangle(0.5, -3000, 0.5, 3000),
  top: 5000,
};

/**
 * A wall west of the window, 10 m off. At an equinox the sun runs in a plane that leans over by the
 * latitude: seen along the meridian it stands at tan p = cos 45° · cot H, H the hour angle, so that
 * a wall so high takes the sun from H on.
 */
const wallOnTheWest = (hourAngleDeg: number) => ({
  role: 'proposed' as const,
  ring: makeRectangle(-10.5, -3000, 0.5, 3000),
  top: (10 * Math.cos(Math.PI / 4)) / Math.tan((hourAngleDeg * Math.PI) / 180),
});

const windowWith = (...blocks: TemplateScene['blocks']): TemplateScene => ({
  blocks,
  windows: [{ at: [0, 0], facing: 180 }],
});

describe('sun at a window on a day in early spring', () => {
  // EN 17037:2018, from memory: 1.5, 3 or 4 hours. On 21 March the declination is 0.35°, the sun
  // stands above 13° as long as cos H > (sin 13° − sin 45° sin 0.35°)/(cos 45° cos 0.35°) = 0.312,
  // H < 71.8°: 9.57 h before, and 4.79 h from noon on.
  it('leaves an afternoon, which meets every level', async () => {
    for (const level of ['minimum', 'medium', 'high']) {
      const [result] = await judgeByTemplate(`window-exposure-${level}`, windowWith(wallOnTheEast));
      expect(Math.abs((result?.tests[0]?.before ?? NaN) - 9.57)).toBeLessThan(0.05);
      expect(Math.abs((result?.tests[0]?.after ?? NaN) - 4.79)).toBeLessThan(0.05);
      expect(result?.finding).toBe('met');
      // One point has no spacing.
      expect(result?.spacingM).toBeNull();
    }
  });

  it.each([
    // From noon to H = 30° are two hours, to 50° three hours and 20 minutes.
    [30, 2, ['met', 'not-met', 'not-met']],
    [50, 10 / 3, ['met', 'met', 'not-met']],
    [20, 4 / 3, ['not-met', 'not-met', 'not-met']],
  ])('leaves the hours up to %d° west of noon', async (hourAngleDeg, hours, findings) => {
    const scene = windowWith(wallOnTheEast, wallOnTheWest(hourAngleDeg));
    const results = await Promise.all(
      ['minimum', 'medium', 'high'].map((level) =>
        judgeByTemplate(`window-exposure-${level}`, scene),
      ),
    );
    expect(results.map(([result]) => result?.finding)).toEqual(findings);
    // The declination is not quite 0, and a step is five minutes.
    expect(Math.abs((results[0]?.[0]?.tests[0]?.after ?? NaN) - hours)).toBeLessThan(0.1);
  });
});

describe('equinox hours at a window', () => {
  // Poland, §60, as reported: 3 h from 7 to 17, at schools from 8 to 16, 1.5 h for infill. The place
  // keeps Greenwich time; solar noon is at 12:07 on 20 March and 11:52 on 23 September (equation of
  // time −7.4 and +7.6 min). From noon on: 4.88 and 5.13 h to five, 3.88 and 4.13 h to four.
  it.each([
    ['dwellings', [4.88, 5.13]],
    ['schools', [3.88, 4.13]],
    ['infill', [4.88, 5.13]],
  ])('%s: an afternoon is enough', async (id, hours) => {
    const results = await judgeByTemplate(`equinox-hours-${id}`, windowWith(wallOnTheEast));
    expect(results.map(({ finding }) => finding)).toEqual(['met', 'met']);
    results.forEach(({ tests: [test] }, index) => {
      expect(Math.abs((test?.after ?? NaN) - (hours[index] ?? NaN))).toBeLessThan(0.05);
    });
  });

  it('asks for three hours, or half as many for infill', async () => {
    // Two hours from noon on: see above.
    const scene = windowWith(wallOnTheEast, wallOnTheWest(30));
    const findings = async (id: string) =>
      (await judgeByTemplate(`equinox-hours-${id}`, scene)).map(({ finding }) => finding);
    expect(await findings('dwellings')).toEqual(['not-met', 'not-met']);
    expect(await findings('schools')).toEqual(['not-met', 'not-met']);
    expect(await findings('infill')).toEqual(['met', 'met']);
  });
});

describe('hours of true solar time at a sill', () => {
  // GB 50180, as reproduced: 2 h from 8 to 16 on 20 January, 1 h from 9 to 15 at the solstice, both
  // in true solar time: half of a window is 4 h and 3 h, to the second of solar noon.
  it('leaves half of the day behind a wall along the meridian', async () => {
    const [cold] = await judgeByTemplate(
      'two-hours-on-the-great-cold-day',
      windowWith(wallOnTheEast),
    );
    expect(cold?.tests[0]?.before).toBeCloseTo(8, 2);
    expect(Math.abs((cold?.tests[0]?.after ?? NaN) - 4)).toBeLessThan(0.05);
    expect(cold?.finding).toBe('met');
    const [solstice] = await judgeByTemplate(
      'one-hour-at-the-winter-solstice',
      windowWith(wallOnTheEast),
    );
    expect(solstice?.tests[0]?.before).toBeCloseTo(6, 2);
    expect(Math.abs((solstice?.tests[0]?.after ?? NaN) - 3)).toBeLessThan(0.05);
    expect(solstice?.finding).toBe('met');
  });

  it('leaves nothing between two walls without end', async () => {
    const between = windowWith(wallOnTheEast, {
      ...wallOnTheEast,
      ring: makeRectangle(-1, -3000, 0.5, 3000),
    });
    for (const id of ['two-hours-on-the-great-cold-day', 'one-hour-at-the-winter-solstice']) {
      const [result] = await judgeByTemplate(id, between);
      expect(result?.tests[0]?.after).toBeLessThan(0.1);
      expect(result?.finding).toBe('not-met');
    }
  });

  it('counts sun from the front alone: a window to the east has none after noon', async () => {
    const [result] = await judgeByTemplate('one-hour-at-the-winter-solstice', {
      blocks: [{ role: 'proposed', ring: makeRectangle(50, -3000, 1, 3000), top: 5000 }],
      windows: [{ at: [0, 0], facing: 90 }],
    });
    // 9 to 15 in solar time: three hours in front, and the wall takes all of them.
    expect(Math.abs((result?.tests[0]?.before ?? NaN) - 3)).toBeLessThan(0.05);
    expect(result?.finding).toBe('not-met');
  });
});
