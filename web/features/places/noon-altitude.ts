const dayMs = 86_400_000;

/**
 * The sun's altitude at local noon in degrees, for the mark in the header alone: declination by
 * δ = −23.44° · cos(360° · (N + 10) / 365.24), N the day of the year (within about half a degree;
 * from memory). Studies take the sun from shared/solar.
 */
export function noonAltitudeDeg(atMs: number, latitude: number): number {
  const yearStartMs = Date.UTC(new Date(atMs).getUTCFullYear(), 0, 1);
  const dayOfYear = (atMs - yearStartMs) / dayMs + 1;
  const declinationDeg = -23.44 * Math.cos(((dayOfYear + 10) / 365.24) * 2 * Math.PI);
  return 90 - Math.abs(latitude - declinationDeg);
}
