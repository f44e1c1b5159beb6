import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';

/** Metres in a degree of latitude, near enough to choose a sheet. */
const METRES_PER_DEGREE = 111_200;

/** The shape of every map in a report. */
const widthToHeight = 1.45;

/**
 * Chooses what the report's maps show: the site, and the ground around it on which the shadows of
 * the judged hours fall. Shadows fall towards the pole, so the sheet reaches farther to that side.
 *
 * @param site the site's parcels
 * @param heightM height of the proposal in metres
 * @returns west, south, east, north in degrees; one shape for every case
 */
export function chooseMapExtent(
  site: readonly Polygonal[],
  heightM: number,
): [number, number, number, number] {
  const points = site.flatMap((one) =>
    one.type === 'Polygon' ? one.coordinates.flat(1) : one.coordinates.flat(2),
  );
  const longitudes = points.map((point) => point[0]);
  const latitudes = points.map((point) => point[1]);
  const west = Math.min(...longitudes);
  const east = Math.max(...longitudes);
  const south = Math.min(...latitudes);
  const north = Math.max(...latitudes);
  const middleLatitude = (south + north) / 2;
  const metresPerDegreeEast = METRES_PER_DEGREE * Math.cos((middleLatitude * Math.PI) / 180);

  const reachM = Math.min(Math.max(heightM * 4, 120), 320);
  const polewardM = reachM;
  const equatorwardM = reachM * 0.15;
  const heightOfSheetM = (north - south) * METRES_PER_DEGREE + polewardM + equatorwardM;
  const widthOfSheetM = Math.max(
    (east - west) * metresPerDegreeEast + reachM,
    heightOfSheetM * widthToHeight,
  );
  const finalHeightM = widthOfSheetM / widthToHeight;
  const spareM = finalHeightM - heightOfSheetM;

  const northSideM = (middleLatitude >= 0 ? polewardM : equatorwardM) + spareM / 2;
  const southSideM = (middleLatitude >= 0 ? equatorwardM : polewardM) + spareM / 2;
  const middleLongitude = (west + east) / 2;
  const halfWidthDeg = widthOfSheetM / 2 / metresPerDegreeEast;
  return [
    middleLongitude - halfWidthDeg,
    south - southSideM / METRES_PER_DEGREE,
    middleLongitude + halfWidthDeg,
    north + northSideM / METRES_PER_DEGREE,
  ];
}
