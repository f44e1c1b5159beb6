import type { EntityManager } from '@mikro-orm/postgresql';
import { Building } from '../base-data/building.entity.ts';
import { OpenSpace } from '../base-data/open-space.entity.ts';
import { Parcel } from '../base-data/parcel.entity.ts';
import { touchingExtent } from '../base-data/spatial-queries.ts';
import { StreetLine } from '../base-data/street-line.entity.ts';
import { Street } from '../base-data/street.entity.ts';
import { Water } from '../base-data/water.entity.ts';
import { reportPayloadSchema } from './report-payload.ts';
import type { ReportPayload } from './report-payload.ts';

/** The base data that the report's maps show: whatever touches the extent, each layer in a fixed order. */
export async function findSurroundings(
  em: EntityManager,
  extent: ReportPayload['mapExtent'],
): Promise<ReportPayload['surroundings']> {
  const touches = () => touchingExtent(extent);
  const byName = { orderBy: { name: 'asc', id: 'asc' } } as const;
  return reportPayloadSchema.shape.surroundings.parse({
    buildings: await em.find(Building, touches(), { orderBy: { id: 'asc' } }),
    parcels: await em.find(Parcel, touches(), { orderBy: { number: 'asc' } }),
    streets: await em.find(Street, touches(), byName),
    streetLines: await em.find(StreetLine, touches(), byName),
    water: await em.find(Water, touches(), byName),
    openSpace: await em.find(OpenSpace, touches(), byName),
  });
}
