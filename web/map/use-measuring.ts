import type * as maplibregl from 'maplibre-gl';
import { useEffect, useState } from 'react';
import type { LngLat } from '../../shared/geometry/geojson-schema.ts';
import { measureFeatures } from './measured-line.ts';
import { fillSource } from './use-map-contents.ts';

const nothing: readonly LngLat[] = [];

/** Measuring on the map: a line of points that the person sets one after the other. */
export function useMeasuring(map: maplibregl.Map | null) {
  const [points, setPoints] = useState<readonly LngLat[] | null>(null);
  useEffect(() => {
    fillSource(map, 'measure', measureFeatures(points ?? nothing));
  }, [map, points]);
  return {
    isMeasuring: points !== null,
    points: points ?? nothing,
    begin: () => setPoints(nothing),
    add: (point: LngLat) => setPoints((before) => [...(before ?? nothing), point]),
    takeBack: () => setPoints((before) => before?.slice(0, -1) ?? null),
    end: () => setPoints(null),
  };
}
