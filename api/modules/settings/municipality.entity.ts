import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';

/** The place that this server serves: one row. */
export const Municipality = defineEntity({
  name: 'Municipality',
  properties: {
    shortName: p.string().length(40).primary(),
    name: p.string().length(120),
    timeZone: p.string().length(60),
    locale: p.string().length(35),
    longitude: p.double().$type<number>(),
    latitude: p.double().$type<number>(),
    elevationM: p.double().$type<number>(),
    /** West, south, east, north in degrees. */
    extent: p.json<[number, number, number, number]>(),
    studyYear: p.integer(),
  },
});
export type Municipality = InferEntity<typeof Municipality>;
