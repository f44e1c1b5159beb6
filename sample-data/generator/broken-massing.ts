import type { Feature } from 'geojson';
import type { City } from './city.ts';
import { collectionBytes } from './geojson.ts';
import { siteAt } from './massing.ts';
import { toClosedRing } from './plane.ts';
import type { Point } from './shape.ts';

/** A massing with five faults, one in each feature, to see what is said about each. */
export function brokenMassingBytes(city: City, at: Point): Uint8Array {
  const [frame] = siteAt(city, [at]).frames;
  if (!frame) throw new Error('The broken massing needs a parcel.');
  const square = (leftM: number): [number, number][] =>
    toClosedRing([
      frame.at(leftM, 8),
      frame.at(leftM + 6, 8),
      frame.at(leftM + 6, 16),
      frame.at(leftM, 16),
    ]);
  const feature = (
    id: string,
    geometry: Feature['geometry'],
    [base, top]: readonly [number, number],
  ): Feature => ({
    type: 'Feature',
    properties: { id, role: 'proposed', base, top, storeys: 3, name: id },
    geometry,
  });
  const polygon = (ring: [number, number][]): Feature['geometry'] => ({
    type: 'Polygon',
    coordinates: [ring],
  });
  const crossed = toClosedRing([
    frame.at(-14, 8),
    frame.at(-8, 16),
    frame.at(-8, 8),
    frame.at(-13, 19),
  ]);
  return collectionBytes([
    feature('crosses-itself', polygon(crossed), [0, 9]),
    feature('not-closed', polygon(square(-7).slice(0, -1)), [0, 9]),
    feature('top-below-base', polygon(square(0)), [9, 6]),
    feature('only-a-point', { type: 'Point', coordinates: square(7)[0] ?? [] }, [0, 9]),
    feature('latitude-first', polygon(square(7).map(([lng, lat]) => [lat, lng])), [0, 9]),
  ]);
}
