import { describe, expect, it } from 'vitest';
import { judgeByTemplate } from '../../../support/judge-template.ts';
import { makeRectangle } from '../../../support/plane-scenes.ts';

const footM = 0.3048;

describe('no more shade than a fence would cast', () => {
  const boulder = {
    name: 'Boulder',
    timezone: 'America/Denver',
    longitude: -105.2705,
    latitude: 40.015,
    elevation: 1655,
  };
  // B.R.C. 9-9-17 with the figures worked from it: at 10 and 14 h solar on the winter solstice the
  // sun stands at 20.656°, 29.36° from south; a shadow is 2.6525 times the height. A block of 30 ft
  // that stands 30 ft from the line along the ray shades 79.58 − 30 = 49.58 ft beyond it, a fence of
  // 12 ft 31.83 ft: 17.75 ft too many. It needs (30 − 12) · 2.6525 = 47.75 ft.
  const alongRay = Math.cos((29.357 * Math.PI) / 180);
  const judge = async (template: string, setbackAlongRayFt: number) => {
    const setbackM = setbackAlongRayFt * footM * alongRay;
    const [result] = await judgeByTemplate(template, {
      place: boulder,
      site: makeRectangle(-100, -60, 200, 60),
      blocks: [
        {
          role: 'proposed',
          ring: makeRectangle(-30, -setbackM - 4, 60, 4),
          top: 30 * footM,
        },
      ],
      receptors: [{ class: 'parcel', ring: makeRectangle(-200, 0, 400, 60) }],
    });
    return result;
  };

  it('fails by what the block shades beyond the fence’s shadow', async () => {
    const result = await judge('no-more-shade-than-a-fence-first-area', 30);
    expect(result?.finding).toBe('not-met');
    // 17.75 ft along the ray and 60 m wide, less the allowance of 1 m²; refraction takes 0.3 %.
    const expectedM2 = 17.75 * footM * alongRay * 60;
    const marginM2 = result?.tests[0]?.margin ?? NaN;
    expect(Math.abs(1 - marginM2 - expectedM2)).toBeLessThan(0.02 * expectedM2);
  });

  it('is met from the set-back on that the formula asks for', async () => {
    expect((await judge('no-more-shade-than-a-fence-first-area', 47))?.finding).toBe('not-met');
    expect((await judge('no-more-shade-than-a-fence-first-area', 48))?.finding).toBe('met');
  });

  it('is met beside a fence of 25 ft, whose shadow of 66.31 ft reaches further', async () => {
    expect((await judge('no-more-shade-than-a-fence-second-area', 30))?.finding).toBe('met');
  });
});

describe('no more shade than a wall on the boundary', () => {
  // A block that fills the site shades outside it exactly what a wall of its height would.
  it.each([
    ['no-more-shade-on-collectors-than-a-wall', 'collector', 3.05],
    ['no-more-shade-than-a-high-wall', 'parcel', 7.62],
  ] as const)('%s', async (id, receptorClass, wallM) => {
    const site = makeRectangle(-20, -20, 40, 20);
    const judge = async (top: number) => {
      const [result] = await judgeByTemplate(id, {
        site,
        blocks: [{ role: 'proposed', ring: site, top }],
        receptors: [{ class: receptorClass, ring: makeRectangle(-5, 2, 10, 40) }],
      });
      return result?.finding;
    };
    expect(await judge(wallM)).toBe('not-affected');
    expect(await judge(wallM - 0.5)).toBe('met');
    expect(await judge(wallM + 0.5)).toBe('not-met');
  });
});

describe('hours of shade in two bands beyond the boundary', () => {
  // At 45° N on the December solstice a long block from west to east shades to the north q times its
  // height above the plane, q(H) = (0.9174 cos H + 0.3978)/(0.9174 cos H − 0.3978), H the hour angle
  // (declination 23.44°): 2.53 at noon, 14.06 at 8 and 16 h. A point 5 m from it is in shade while
  // q > 5/h.
  //   h = 1.4 m: 5/h = 3.571, cos H = 0.7710, H = 39.56°: shade from there to 60°, twice: 2.73 h
  //   h = 1.55 m: 5/h = 3.226, cos H = 0.8232, H = 34.59°: 3.39 h; 10 m from it 0.85 h
  //   h = 3 m: 10/h = 3.333, cos H = 0.8054, H = 36.35°: 3.15 h at 10 m; at 5 m 5/h < 2.53: all 8 h
  const site = makeRectangle(-100, -10, 200, 10);
  const judge = (level: number, aboveM: number) =>
    judgeByTemplate(`hours-of-shade-in-two-bands-${level}`, {
      site,
      blocks: [
        { role: 'proposed', ring: site, top: 4 + aboveM },
        // Its neighbours' shade does not count.
        { role: 'context', ring: makeRectangle(-100, -60, 200, 20), top: 60 },
      ],
    });
  const shadeHours = (results: Awaited<ReturnType<typeof judge>>) =>
    results.map(({ tests: [test] }) => test?.after ?? NaN);

  it.each([
    [1.4, [2.73, 0.75], [['met', 'met']]],
    [
      1.55,
      [3.39, 0.85],
      [
        ['not-met', 'met'],
        ['met', 'met'],
      ],
    ],
    [
      3,
      [8, 3.15],
      [
        ['not-met', 'not-met'],
        ['not-met', 'not-met'],
        ['not-met', 'not-met'],
      ],
    ],
  ])('of a block %d m above the plane', async (aboveM, hours, findingsByLevel) => {
    for (const [index, findings] of findingsByLevel.entries()) {
      const results = await judge(index + 1, aboveM);
      expect(results.map(({ finding }) => finding)).toEqual(findings);
      shadeHours(results).forEach((value, band) => {
        // A step of five minutes at each end, and the sun's refraction.
        expect(Math.abs(value - (hours[band] ?? NaN))).toBeLessThan(0.17);
      });
    }
  });
});

describe('shadow on a lot at noon', () => {
  // R-Codes 5.4.2, from memory. At 45° N at noon of the winter solstice a shadow is
  // 1/tan(90° − 45° − 23.44°) = 2.531 times the height: of a lot 40 m deep a block of 3.9 m along its
  // south side shades 24.7 %, one of 4 m 25.3 %, of 5.5 m 34.8 %, of 5.6 m 35.4 %, of 7.8 m 49.4 %,
  // of 8 m 50.6 %; refraction takes 0.2 %.
  it.each([
    ['low', 3.9, 'met', 0.247],
    ['low', 4, 'not-met', 0.253],
    ['medium', 5.5, 'met', 0.348],
    ['medium', 5.6, 'not-met', 0.354],
    ['high', 7.8, 'met', 0.494],
    ['high', 8, 'not-met', 0.506],
  ])('%s density, %d m high: %s', async (density, top, finding, share) => {
    const [result] = await judgeByTemplate(`shadow-on-a-lot-at-noon-${density}-density`, {
      blocks: [
        { role: 'proposed', ring: makeRectangle(-100, -10, 200, 10), top },
        // What stands there, on the lot as well, does not count.
        { role: 'context', ring: makeRectangle(-100, -30, 200, 10), top: 60 },
        { role: 'context', ring: makeRectangle(5, 20, 5, 5), top: 6 },
      ],
      receptors: [{ class: 'parcel', ring: makeRectangle(-10, 0, 20, 40) }],
    });
    expect(result?.tests[0]?.before).toBe(0);
    expect(Math.abs((result?.tests[0]?.after ?? NaN) - share)).toBeLessThan(0.002);
    expect(result?.finding).toBe(finding);
    // An instant has no step.
    expect(result?.close).toBe(false);
  });
});
