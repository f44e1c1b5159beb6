import type { MultiPolygon } from 'geojson';
import { degreesPerUnit, type InstantShadowPolygons } from '../shared/study/draw-instant.ts';
import { loadGeos, polygonsWithin, type Geos } from './geos.ts';

let starting: Promise<Geos> | undefined;

/**
 * The same polygons, valid by OGC's rules, for whoever takes them out of the program. Rounding to a
 * millimetre can make borders cross that only came near each other; GEOS finds such places and
 * mends them on the same grid. Most polygons come back as they are.
 *
 * @throws when GEOS can make nothing of them
 */
export async function makePolygonsValid(polygons: MultiPolygon): Promise<MultiPolygon> {
  starting ??= loadGeos();
  const geos = await starting;
  const drawn = geos.read(polygons);
  try {
    if (geos.GEOSisValid(drawn) === 1) return polygons;
    const mended = geos.GEOSMakeValid(drawn);
    const onGrid = mended === 0 ? 0 : geos.GEOSGeom_setPrecision(mended, degreesPerUnit, 0);
    if (mended !== 0) geos.GEOSGeom_destroy(mended);
    if (onGrid === 0) throw new Error('GEOS could not make the shadows valid.');
    const result = geos.write(onGrid);
    geos.GEOSGeom_destroy(onGrid);
    return { type: 'MultiPolygon', coordinates: polygonsWithin(result) };
  } finally {
    geos.GEOSGeom_destroy(drawn);
  }
}

/** An instant's three kinds of shadows, each as `makePolygonsValid` gives it. */
export async function makeShadowsValid(
  drawn: InstantShadowPolygons,
): Promise<InstantShadowPolygons> {
  return {
    ...drawn,
    before: await makePolygonsValid(drawn.before),
    after: await makePolygonsValid(drawn.after),
    netNew: await makePolygonsValid(drawn.netNew),
  };
}
