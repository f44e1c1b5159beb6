import { describe, expect, it } from 'vitest';
import {
  beamForAirMassWm2,
  clearSkyBeamWm2,
  extraterrestrialNormalWm2,
  incidenceCosine,
  pressureAtElevationPa,
  relativeAirMass,
} from '../../../shared/solar/clear-sky-beam.ts';
import { sunPositionAt } from '../../../shared/solar/sun-position.ts';

describe('air mass', () => {
  // Kasten and Young (1989), formula values at zenith angles in degrees, worked out from the
  // published formula; 80° and 0° also stand in pvlib's tests/test_atmosphere.py.
  it.each([
    [0, 0.9997],
    [30, 1.154],
    [45, 1.4126],
    [60, 1.9943],
    [70, 2.9031],
    [75, 3.8129],
    [80, 5.586],
    [85, 10.3058],
    [88, 19.4332],
    [90, 37.9196],
  ])('at a zenith angle of %d° follows Kasten and Young', (zenithDeg, expected) => {
    expect(relativeAirMass(90 - zenithDeg)).toBeCloseTo(expected, 3);
  });

  it('is unknown with the sun down', () => {
    expect(relativeAirMass(-0.1)).toBeNull();
  });
});

describe('pressure by elevation', () => {
  // pvlib's tests/test_atmosphere.py.
  it.each([
    [-100, 102532.073],
    [0, 101324.999],
    [1000, 89874.75],
  ])('at %d m is that of the standard atmosphere', (elevationM, expectedPa) => {
    expect(pressureAtElevationPa(elevationM)).toBeCloseTo(expectedPa, 2);
  });
});

describe('irradiance outside the air', () => {
  // 1361 W/m² times Spencer's (1971) series, worked out from the published coefficients.
  it.each([
    [1, 1408.7],
    [80, 1371.8],
    [172, 1316.7],
    [266, 1351.5],
    [355, 1407.4],
  ])('on day %d follows the series of Spencer', (dayOfYear, expectedWm2) => {
    expect(Math.abs(extraterrestrialNormalWm2(dayOfYear) - expectedWm2)).toBeLessThan(0.06);
  });
});

describe('the clear-sky beam', () => {
  // pvlib's tests/test_clearsky.py: Linke turbidity 3, sea level, 1364 W/m² outside the air;
  // apparent zenith and absolute air mass as given there.
  it.each([
    [82.85457, 6.97936, 321.161],
    [46.04676, 1.32355, 888.901],
    [10.56414, 0.93528, 953.249],
    [34.86074, 1.12008, 922.061],
    [72.41687, 3.01614, 655.449],
  ])('at a zenith angle of %d° follows Ineichen and Perez', (zenithDeg, airMass, expectedWm2) => {
    const beam = beamForAirMassWm2(90 - zenithDeg, airMass, 1364, 0, 3);
    expect(Math.abs(beam - expectedWm2)).toBeLessThan(0.01);
  });

  // Duffie and Beckman's daily extraterrestrial radiation, midsummer over midwinter on level ground,
  // worked out by their closed form with the declinations ±23.45°: it hangs on the sun's path alone.
  it.each([
    [25, 1.78],
    [40, 3.1],
    [50, 5.62],
  ])(
    'at %d° N brings midsummer so many times midwinter’s energy before the air',
    (latitude, ratio) => {
      const dailyWh = (date: string, dayOfYear: number) => {
        let sum = 0;
        for (let minute = 0; minute < 1440; minute += 5) {
          const { altitudeDeg } = sunPositionAt(Date.parse(date) + minute * 60_000, 0, latitude);
          const sine = Math.sin((altitudeDeg * Math.PI) / 180);
          if (sine > 0) sum += extraterrestrialNormalWm2(dayOfYear) * sine * (5 / 60);
        }
        return sum;
      };
      const computed = dailyWh('2026-06-21', 172) / dailyWh('2026-12-21', 355);
      // Refraction lends the low winter sun a little.
      expect(Math.abs(computed / ratio - 1)).toBeLessThan(0.03);
    },
  );

  it('is nothing with the sun at or below the horizon', () => {
    const sky = { dayOfYear: 355, elevationM: 0, linkeTurbidity: 3 };
    expect(clearSkyBeamWm2(0, sky)).toBe(0);
    expect(clearSkyBeamWm2(-3, sky)).toBe(0);
  });

  // Common practice, no source: at a middle latitude a midwinter day, were it as long as a
  // midsummer one, would still bring only about half the energy or less on level ground.
  it('brings much less to level ground in an hour of winter noon than of summer noon', () => {
    const noon = (altitudeDeg: number, dayOfYear: number) =>
      clearSkyBeamWm2(altitudeDeg, { dayOfYear, elevationM: 0, linkeTurbidity: 3 }) *
      Math.sin((altitudeDeg * Math.PI) / 180);
    const ratio = noon(90 - 45 - 23.44, 355) / noon(90 - 45 + 23.44, 172);
    expect(ratio).toBeGreaterThan(0.25);
    expect(ratio).toBeLessThan(0.5);
  });
});

describe('incidence on a slope', () => {
  // Reda and Andreas (2008), the example's surface: slope 30°, turned −10° from south, zenith
  // 50.11162°, azimuth 194.340241°; incidence 25.18700° (from memory; recomputed 25.1870°). The
  // azimuth rotation −10° from south is 170° from north in the example's sense.
  it('agrees with the worked example of the NREL algorithm', () => {
    const cosine = incidenceCosine({ azimuthDeg: 194.340241, altitudeDeg: 90 - 50.11162 }, 30, 170);
    expect((Math.acos(cosine) * 180) / Math.PI).toBeCloseTo(25.187, 2);
  });

  it('is nothing from behind', () => {
    expect(incidenceCosine({ azimuthDeg: 0, altitudeDeg: 20 }, 60, 180)).toBe(0);
  });
});
