import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { GeometryType } from './geometry-type.ts';

/** A yard of a dwelling, judged as a receptor of its own. */
export const Yard = defineEntity({
  name: 'Yard',
  properties: {
    id: p.string().length(40).primary(),
    parcel: p.string().length(40),
    address: p.string().length(200),
    label: p.string().length(200),
    geometry: p.type(new GeometryType<Polygonal>()).ignoreSchemaChanges('type'),
  },
  indexes: [{ name: 'yard_geometry_index', properties: ['geometry'], type: 'gist' }],
});
export type Yard = InferEntity<typeof Yard>;
