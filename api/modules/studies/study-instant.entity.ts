import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { InstantShadows } from '../../../shared/contracts/studies.ts';
import { Study } from './study.entity.ts';

/** One instant of a finished study: the sun, the areas and the shadows drawn on the ground. */
export const StudyInstant = defineEntity({
  name: 'StudyInstant',
  uniques: [{ properties: ['study', 'at'] }],
  properties: {
    study: () => p.manyToOne(Study).primary(),
    /** Its place in the study's list, from 0. */
    position: p.integer().primary(),
    at: p.datetime(3),
    /** The same instant as the evidence file writes it, with its offset. */
    atText: p.string().length(40),
    azimuthDeg: p.double().$type<number>(),
    altitudeDeg: p.double().$type<number>(),
    /** Null with the sun down. */
    netNewM2: p.double().$type<number>().nullable(),
    removedM2: p.double().$type<number>().nullable(),
    shadows: p.json<InstantShadows>().nullable().lazy(true, false),
  },
});
export type StudyInstant = InferEntity<typeof StudyInstant>;
