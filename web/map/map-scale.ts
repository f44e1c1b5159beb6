/** The circumference that Web Mercator gives the earth, in metres. */
const circumferenceM = 40_075_016.686;

/** Pixels of the whole world's width at zoom 0 in MapLibre. */
const worldPx = 512;

/** Metres of ground to one CSS pixel at a zoom, where the map's middle lies. */
export function metresPerPixel(zoom: number, latitude: number): number {
  const widthM = circumferenceM * Math.cos((latitude * Math.PI) / 180);
  return widthM / (worldPx * 2 ** zoom);
}

/** The longest round length (1, 2 or 5 times a power of ten) whose bar fits into a width. */
export function roundBarLength(metresToPixel: number, widthPx: number): number {
  const longestM = metresToPixel * widthPx;
  const power = 10 ** Math.floor(Math.log10(longestM));
  const factor = [5, 2, 1].find((one) => one * power <= longestM) ?? 1;
  return factor * power;
}
