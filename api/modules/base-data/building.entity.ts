import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { GeometryType } from './geometry-type.ts';

/** A building that stands; heights in metres above the one datum. */
export const Building = defineEntity({
  name: 'Building',
  properties: {
    id: p.string().length(40).primary(),
    /** The number of the parcel that it stands on. */
    parcel: p.string().length(40).nullable(),
    kind: p.string().length(60),
    storeys: p.integer().nullable(),
    baseM: p.double().$type<number>(),
    topM: p.double().$type<number>(),
    /** Where the height comes from. */
    heightSource: p.string().length(120),
    geometry: p.type(new GeometryType<Polygonal>()).ignoreSchemaChanges('type'),
  },
  indexes: [{ name: 'building_geometry_index', properties: ['geometry'], type: 'gist' }],
});
export type Building = InferEntity<typeof Building>;
