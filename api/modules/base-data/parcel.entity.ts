import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { GeometryType } from './geometry-type.ts';

/** A piece of land of the municipality's register, under the register's own number. */
export const Parcel = defineEntity({
  name: 'Parcel',
  properties: {
    number: p.string().length(40).primary(),
    address: p.string().length(200),
    zone: p.string().length(60),
    use: p.string().length(60),
    geometry: p.type(new GeometryType<Polygonal>()).ignoreSchemaChanges('type'),
  },
  indexes: [{ name: 'parcel_geometry_index', properties: ['geometry'], type: 'gist' }],
});
export type Parcel = InferEntity<typeof Parcel>;
