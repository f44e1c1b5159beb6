import { Body, Equator, Horizon, Observer } from 'astronomy-engine';
import { describe, expect, it } from 'vitest';
import { sunPositionAt } from '../../../shared/solar/sun-position.ts';
import { createSeededRandom } from '../../support/seeded-random.ts';

/** What the study needs: 0.015° moves the tip of a 10 m pole's shadow by 9 cm at 10° of altitude. */
const toleranceDeg = 0.02;

describe('the position of the sun', () => {
  // NREL, "Slope-Aware Backtracking for Single-Axis Trackers" (2020), doi:10.2172/1660126, as
  // carried by pvlib's tests/test_shading.py; 40.0° N, 80.0° W, 1 January 2019, UTC−5.
  it.each([
    ['08:00', 2.404287, 122.79177],
    ['09:00', 11.263058, 133.288729],
    ['10:00', 18.733558, 145.285552],
    ['11:00', 24.109076, 158.939435],
    ['12:00', 26.810735, 173.931802],
    ['13:00', 26.482495, 189.371536],
    ['14:00', 23.170447, 204.13681],
    ['15:00', 17.296785, 217.446538],
    ['16:00', 9.461862, 229.102218],
    ['17:00', 0.524817, 239.330401],
  ])('agrees with the values of NREL at %s', (clock, altitudeDeg, azimuthDeg) => {
    const sun = sunPositionAt(Date.parse(`2019-01-01T${clock}:00-05:00`), -80, 40);
    expect(Math.abs(sun.altitudeDeg - altitudeDeg)).toBeLessThan(toleranceDeg);
    expect(Math.abs(sun.azimuthDeg - azimuthDeg)).toBeLessThan(toleranceDeg);
  });

  // Reda and Andreas, NREL/TP-560-34302 (rev. 2008), appendix A.5: true altitude 39.872046°,
  // azimuth 194.340241°. Its refraction is for 820 mbar; ours is the standard one of 1010 hPa and
  // 10 °C, 0.0204° at this altitude (Sæmundsson's formula), so the two are put together here.
  it('agrees with the worked example of the NREL algorithm', () => {
    const sun = sunPositionAt(Date.parse('2003-10-17T12:30:30-07:00'), -105.1786, 39.742476);
    expect(Math.abs(sun.altitudeDeg - (39.872046 + 0.0204))).toBeLessThan(toleranceDeg);
    expect(Math.abs(sun.azimuthDeg - 194.340241)).toBeLessThan(toleranceDeg);
  });

  // pvlib's tests/test_irradiance.py: 32.2° N, 111° W, 24 June 2014, UTC−7. Near the tropic the
  // sun at clock noon stands far from due south.
  it.each([
    ['12:00', 79.43586438, 144.76567754],
    ['18:00', 17.58312878, 287.04104128],
  ])('stands where pvlib puts it near the tropic at %s', (clock, altitudeDeg, azimuthDeg) => {
    const sun = sunPositionAt(Date.parse(`2014-06-24T${clock}:00-07:00`), -111, 32.2);
    expect(Math.abs(sun.altitudeDeg - altitudeDeg)).toBeLessThan(toleranceDeg);
    const acrossDeg = (sun.azimuthDeg - azimuthDeg) * Math.cos((altitudeDeg * Math.PI) / 180);
    expect(Math.abs(acrossDeg)).toBeLessThan(toleranceDeg);
  });

  it('agrees with astronomy-engine at random instants and places to 65° of latitude', () => {
    const { compared, altitude, across } = compareAtRandom(8000, 0, 65, 2);
    report(
      `sun position against astronomy-engine, ${compared} suns above 2°, to 65° of latitude, ` +
        `1990–2060: altitude off by ${sayError(altitude)}; across by ${sayError(across)}`,
    );
    expect(compared).toBeGreaterThan(3000);
    expect(altitude.worstDeg).toBeLessThan(toleranceDeg);
    expect(across.worstDeg).toBeLessThan(toleranceDeg);
  });

  it('stays close to it nearer the poles and the horizon', () => {
    const polar = compareAtRandom(4000, 65, 90, 2);
    const low = compareAtRandom(30_000, 0, 65, 0, 2);
    report(
      `above 65° of latitude: altitude off by ${sayError(polar.altitude)}; ` +
        `sun from 0° to 2°: altitude off by ${sayError(low.altitude)}`,
    );
    expect(polar.compared).toBeGreaterThan(500);
    expect(low.compared).toBeGreaterThan(300);
    expect(polar.altitude.worstDeg).toBeLessThan(toleranceDeg);
    expect(low.altitude.worstDeg).toBeLessThan(toleranceDeg);
  });
});

interface ErrorSize {
  meanDeg: number;
  worstDeg: number;
}

/** Beside the tests' own output, for whoever reads it. */
const report = (line: string) => process.stdout.write(`${line}\n`);

const sayError = ({ meanDeg, worstDeg }: ErrorSize) =>
  `${meanDeg.toFixed(4)}° in the mean, ${worstDeg.toFixed(4)}° at most`;

/** Against astronomy-engine with its standard refraction; azimuth as the angle that it makes across the sky. */
function compareAtRandom(
  samples: number,
  fromLatitude: number,
  toLatitude: number,
  aboveDeg: number,
  belowDeg = 90,
) {
  const random = createSeededRandom(20260320);
  const altitude: ErrorSize = { meanDeg: 0, worstDeg: 0 };
  const across: ErrorSize = { meanDeg: 0, worstDeg: 0 };
  let compared = 0;
  const [fromMs, toMs] = [Date.UTC(1990, 0, 1), Date.UTC(2061, 0, 1)];
  for (let sample = 0; sample < samples; sample += 1) {
    const atMs = fromMs + random() * (toMs - fromMs);
    const away = fromLatitude + random() * (toLatitude - fromLatitude);
    const latitude = random() < 0.5 ? away : -away;
    const longitude = random() * 360 - 180;
    const observer = new Observer(latitude, longitude, 0);
    const date = new Date(atMs);
    const equator = Equator(Body.Sun, date, observer, true, true);
    const truth = Horizon(date, observer, equator.ra, equator.dec, 'normal');
    if (truth.altitude <= aboveDeg || truth.altitude > belowDeg) continue;
    const sun = sunPositionAt(atMs, longitude, latitude);
    const turnDeg = ((sun.azimuthDeg - truth.azimuth + 540) % 360) - 180;
    const acrossDeg = Math.abs(turnDeg * Math.cos((truth.altitude * Math.PI) / 180));
    const altitudeDeg = Math.abs(sun.altitudeDeg - truth.altitude);
    compared += 1;
    altitude.worstDeg = Math.max(altitude.worstDeg, altitudeDeg);
    across.worstDeg = Math.max(across.worstDeg, acrossDeg);
    altitude.meanDeg += (altitudeDeg - altitude.meanDeg) / compared;
    across.meanDeg += (acrossDeg - across.meanDeg) / compared;
  }
  return { compared, altitude, across };
}
