import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { GeometryType } from './geometry-type.ts';

/** The surface of a street, to be drawn. */
export const Street = defineEntity({
  name: 'Street',
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    name: p.string().length(200),
    geometry: p.type(new GeometryType<Polygonal>()).ignoreSchemaChanges('type'),
  },
  indexes: [{ name: 'street_geometry_index', properties: ['geometry'], type: 'gist' }],
});
export type Street = InferEntity<typeof Street>;
