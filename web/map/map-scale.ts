/** The circumference that Web Mercator gives the earth, in metres. */
const circumferenceM = 40_075_016.686;

/** Pixels of the whole world's width at zoom 0 in MapLibre. */
const worldPx = 512;

/** Metres of ground to one CSS pixel at a zoom, where the map's middle lies. */
export function metresPerPixel(zoom: number, latitude: number): number {
  const widthM = circumferenceM * Math.cos((latitude * Math.PI) / 180);
  return widthM / (worldPx * 2 ** zoom);
}
