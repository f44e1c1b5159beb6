import type { MultiPolygon, Position } from 'geojson';
import { loadGeos, polygonsWithin } from '../../api/geos.ts';
import type { Ring } from '../../shared/geometry/ring.ts';

/** GEOS as a second opinion on areas and on valid polygons. */
export interface SecondOpinion {
  /** Whether a geometry is valid by OGC's rules. */
  isValid: (geometry: MultiPolygon) => boolean;
  areaM2: (geometry: MultiPolygon) => number;
  union: (geometries: readonly MultiPolygon[]) => MultiPolygon;
  difference: (from: MultiPolygon, less: MultiPolygon) => MultiPolygon;
}

/** Starts GEOS; what it cannot do is thrown. */
export async function loadSecondOpinion(): Promise<SecondOpinion> {
  const complaints: string[] = [];
  const geos = await loadGeos((message) => complaints.push(message));
  const read = (geometry: MultiPolygon) => geos.read(geometry);
  const take = (pointer: number): MultiPolygon => {
    if (pointer === 0) throw new Error(`GEOS: ${complaints.splice(0).join('; ')}`);
    const geometry = geos.write(pointer);
    geos.GEOSGeom_destroy(pointer);
    return { type: 'MultiPolygon', coordinates: polygonsWithin(geometry) };
  };
  return {
    isValid: (geometry) => {
      const pointer = read(geometry);
      const answer = geos.GEOSisValid(pointer);
      geos.GEOSGeom_destroy(pointer);
      return answer === 1;
    },
    areaM2: (geometry) => {
      const pointer = read(geometry);
      const place = geos.Module._malloc(8);
      geos.GEOSArea(pointer, place);
      const areaM2 = geos.Module.getValue(place, 'double');
      geos.Module._free(place);
      geos.GEOSGeom_destroy(pointer);
      return areaM2;
    },
    union: (geometries) => {
      let united = read({ type: 'MultiPolygon', coordinates: [] });
      for (const geometry of geometries) {
        const next = read(geometry);
        const both = geos.GEOSUnion(united, next);
        [united, next].forEach((pointer) => geos.GEOSGeom_destroy(pointer));
        united = both;
      }
      return take(united);
    },
    difference: (from, less) => {
      const [one, other] = [read(from), read(less)];
      const rest = geos.GEOSDifference(one, other);
      [one, other].forEach((pointer) => geos.GEOSGeom_destroy(pointer));
      return take(rest);
    },
  };
}

/** One polygon on the plane: a shell and its holes. */
export function multiPolygonOf(...polygons: readonly (readonly Ring[])[]): MultiPolygon {
  return {
    type: 'MultiPolygon',
    coordinates: polygons.map((rings) =>
      rings.map((ring) => [...ring, ...ring.slice(0, 1)].map(([x, y]): Position => [x, y])),
    ),
  };
}
