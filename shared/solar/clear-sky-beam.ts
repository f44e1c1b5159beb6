/** W/m²: the mean irradiance of the sun outside the air (Kopp and Lean 2011). */
const solarConstantWm2 = 1361;

const radiansPerDegree = Math.PI / 180;

/** What the clear-sky beam depends on besides the sun's altitude. */
export interface ClearSky {
  /** 1 to 365 or 366. */
  dayOfYear: number;
  elevationM: number;
  linkeTurbidity: number;
}

/**
 * Irradiance outside the air on a plane that faces the sun, W/m²: the solar constant times the
 * series of Spencer, J. W. (1971), "Fourier series representation of the position of the sun",
 * Search 2(5), 172.
 */
export function extraterrestrialNormalWm2(dayOfYear: number): number {
  const angle = (2 * Math.PI * (dayOfYear - 1)) / 365;
  return (
    solarConstantWm2 *
    (1.00011 +
      0.034221 * Math.cos(angle) +
      0.00128 * Math.sin(angle) +
      0.000719 * Math.cos(2 * angle) +
      0.000077 * Math.sin(2 * angle))
  );
}

/**
 * Relative optical air mass: Kasten, F. and Young, A. T. (1989), "Revised optical air mass tables
 * and approximation formula", Applied Optics 28(22), 4735–4738. Null with the sun below the horizon.
 *
 * @param altitudeDeg apparent altitude in degrees
 */
export function relativeAirMass(altitudeDeg: number): number | null {
  if (altitudeDeg < 0) return null;
  const sine = Math.sin(altitudeDeg * radiansPerDegree);
  return 1 / (sine + 0.50572 * (altitudeDeg + 6.07995) ** -1.6364);
}

/** Pressure in Pa at an elevation in metres: the standard atmosphere in the form that pvlib uses. */
export function pressureAtElevationPa(elevationM: number): number {
  return 100 * ((44331.514 - elevationM) / 11880.516) ** (1 / 0.1902632);
}

/**
 * Direct irradiance on a plane that faces the sun under a clear sky, W/m²: Ineichen, P. and Perez,
 * R. (2002), "A new airmass independent formulation for the Linke turbidity coefficient", Solar
 * Energy 73(3), 151–157, with the lower of its two estimates. 0 with the sun below the horizon.
 *
 * @param altitudeDeg apparent altitude in degrees
 */
export function clearSkyBeamWm2(altitudeDeg: number, sky: ClearSky): number {
  const airMass = relativeAirMass(altitudeDeg);
  if (airMass === null || altitudeDeg === 0) return 0;
  const absoluteAirMass = (airMass * pressureAtElevationPa(sky.elevationM)) / 101_325;
  return beamForAirMassWm2(
    altitudeDeg,
    absoluteAirMass,
    extraterrestrialNormalWm2(sky.dayOfYear),
    sky.elevationM,
    sky.linkeTurbidity,
  );
}

/**
 * The formulas of Ineichen and Perez (2002) with every quantity given; see `clearSkyBeamWm2`.
 */
export function beamForAirMassWm2(
  altitudeDeg: number,
  absoluteAirMass: number,
  extraterrestrialWm2: number,
  elevationM: number,
  linkeTurbidity: number,
): number {
  const cosineOfZenith = Math.sin(altitudeDeg * radiansPerDegree);
  const fh1 = Math.exp(-elevationM / 8000);
  const fh2 = Math.exp(-elevationM / 1250);
  const cg1 = 5.09e-5 * elevationM + 0.868;
  const cg2 = 3.92e-5 * elevationM + 0.0387;
  const globalWm2 =
    cg1 *
    extraterrestrialWm2 *
    cosineOfZenith *
    Math.exp(-cg2 * absoluteAirMass * (fh1 + fh2 * (linkeTurbidity - 1)));
  const b = 0.664 + 0.163 / fh1;
  const first = extraterrestrialWm2 * b * Math.exp(-0.09 * absoluteAirMass * (linkeTurbidity - 1));
  const share =
    (1 - (0.1 - 0.2 * Math.exp(-linkeTurbidity)) / (0.1 + 0.882 / fh1)) / cosineOfZenith;
  return Math.max(0, Math.min(first, globalWm2 * Math.max(share, 0)));
}

/**
 * Cosine of the angle between the sun's rays and a plane's normal; 0 with the sun behind it.
 *
 * @param tiltDeg slope from the horizontal; @param facingDeg direction that the slope faces,
 * degrees clockwise from true north
 */
export function incidenceCosine(
  sun: { azimuthDeg: number; altitudeDeg: number },
  tiltDeg: number,
  facingDeg: number,
): number {
  const altitude = sun.altitudeDeg * radiansPerDegree;
  const tilt = tiltDeg * radiansPerDegree;
  const between = (sun.azimuthDeg - facingDeg) * radiansPerDegree;
  return Math.max(
    0,
    Math.sin(altitude) * Math.cos(tilt) + Math.cos(altitude) * Math.sin(tilt) * Math.cos(between),
  );
}
