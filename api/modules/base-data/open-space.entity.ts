import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { GeometryType } from './geometry-type.ts';

/** A park, a square, or a public walk. */
export const OpenSpace = defineEntity({
  name: 'OpenSpace',
  properties: {
    id: p.string().length(40).primary(),
    class: p.enum(['open-space', 'walk']),
    name: p.string().length(200),
    geometry: p.type(new GeometryType<Polygonal>()).ignoreSchemaChanges('type'),
  },
  indexes: [{ name: 'open_space_geometry_index', properties: ['geometry'], type: 'gist' }],
});
export type OpenSpace = InferEntity<typeof OpenSpace>;
