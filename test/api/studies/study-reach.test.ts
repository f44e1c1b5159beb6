import { describe, expect, it } from 'vitest';
import { computeStudyReach } from '../../../api/modules/studies/study-reach.ts';

const place = { longitude: -91.3, latitude: 46.75 };
const heights = { siteTopM: 44, contextTopM: 20, lowestPlaneM: 0 };
const noon = '2026-12-21T12:00:00-06:00';

describe('the reach of a study', () => {
  // Closed formula: length of shadow = height / tan(altitude); tan 1° = 0.0174551.
  it('is that of a sun at 1° where every instant has a higher sun', () => {
    const reach = computeStudyReach([noon], place, heights);
    expect(reach.receptorsM).toBeCloseTo(44 / 0.0174551, 0);
    expect(reach.contextM).toBeCloseTo((44 + 20) / 0.0174551, 0);
  });

  it('grows with a lower sun, and ends with one at 0.1°', () => {
    // Sunrise is at about 7:48 there on that day.
    const justUp = Array.from({ length: 60 }, (_, minute) =>
      new Date(Date.parse('2026-12-21T07:20:00-06:00') + minute * 60_000).toISOString(),
    );
    const { receptorsM } = computeStudyReach(justUp, place, heights);
    expect(receptorsM).toBeGreaterThan(44 / 0.0174551);
    // tan 0.1° = 0.00174533
    expect(receptorsM).toBeLessThanOrEqual(44 / 0.00174532);
  });

  it('takes no notice of instants with the sun down', () => {
    const night = '2026-12-21T00:00:00-06:00';
    expect(computeStudyReach([night, noon], place, heights)).toEqual(
      computeStudyReach([noon], place, heights),
    );
  });

  it('counts heights from the lowest plane on which shadows are taken', () => {
    const sunken = computeStudyReach([noon], place, { ...heights, lowestPlaneM: -6 });
    expect(sunken.receptorsM).toBeCloseTo(50 / 0.0174551, 0);
  });
});
