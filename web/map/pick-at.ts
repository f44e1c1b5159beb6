import type * as maplibregl from 'maplibre-gl';
import { z } from 'zod';
import { pickLayers } from './case-layers.ts';
import type { MapPick } from './case-map-props.ts';

const parcelSchema = z.object({
  number: z.string(),
  address: z.string().default(''),
  use: z.string().default(''),
});
const heightsSchema = z.object({ baseM: z.number(), topM: z.number() });
const namedSchema = z.object({ id: z.string() });

/** What lies under a point of the drawing. */
export function pickAt(map: maplibregl.Map, point: maplibregl.Point): MapPick {
  const { lng, lat } = map.unproject(point);
  const found = <Schema extends z.ZodType>(layerId: string, schema: Schema) =>
    map.queryRenderedFeatures(point, { layers: [layerId] }).flatMap(({ properties }) => {
      const parsed = schema.safeParse(properties);
      return parsed.success ? [parsed.data] : [];
    });
  const receptors = [...new Set(found(pickLayers.receptor, namedSchema).map(({ id }) => id))];
  return {
    lngLat: [lng, lat],
    parcel: found(pickLayers.parcel, parcelSchema)[0] ?? null,
    building: found(pickLayers.building, heightsSchema)[0] ?? null,
    proposal:
      found(pickLayers.proposal, heightsSchema).toSorted((a, b) => b.topM - a.topM)[0] ?? null,
    receptor: receptors[0] ?? null,
    receptors,
    pin: found(pickLayers.pin, namedSchema)[0]?.id ?? null,
  };
}
