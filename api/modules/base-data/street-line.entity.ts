import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { LineString, MultiLineString } from 'geojson';
import { GeometryType } from './geometry-type.ts';

/** The middle of a street, along which its name is written. */
export const StreetLine = defineEntity({
  name: 'StreetLine',
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    name: p.string().length(200),
    geometry: p.type(new GeometryType<LineString | MultiLineString>()).ignoreSchemaChanges('type'),
  },
  indexes: [{ name: 'street_line_geometry_index', properties: ['geometry'], type: 'gist' }],
});
export type StreetLine = InferEntity<typeof StreetLine>;
