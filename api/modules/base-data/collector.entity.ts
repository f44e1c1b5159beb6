import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { GeometryType } from './geometry-type.ts';

/** A solar collector on a roof; its plane in metres above the one datum. */
export const Collector = defineEntity({
  name: 'Collector',
  properties: {
    id: p.string().length(40).primary(),
    building: p.string().length(40).nullable(),
    address: p.string().length(200),
    planeM: p.double().$type<number>(),
    /** Slope from the horizontal. */
    tiltDeg: p.double().$type<number>(),
    /** Clockwise from true north. */
    facingDeg: p.double().$type<number>(),
    geometry: p.type(new GeometryType<Polygonal>()).ignoreSchemaChanges('type'),
  },
  indexes: [{ name: 'collector_geometry_index', properties: ['geometry'], type: 'gist' }],
});
export type Collector = InferEntity<typeof Collector>;
