import { randomUUID } from 'node:crypto';
import { defineEntity, p } from '@mikro-orm/core';
import type { InferEntity } from '@mikro-orm/core';
import type { Point } from 'geojson';
import { caseStates } from '../../../shared/contracts/case-life.ts';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import { GeometryType } from '../base-data/geometry-type.ts';
import { Person } from '../people/person.entity.ts';

/** One application and its review. */
export const ReviewCase = defineEntity({
  name: 'ReviewCase',
  properties: {
    id: p
      .uuid()
      .primary()
      .onCreate(() => randomUUID()),
    /** `draft-…`: resolves for ever, also once the case has a number. */
    draftKey: p.string().length(40).unique(),
    /** `2026-0001`, given at the first submission. */
    number: p.string().length(20).nullable().unique(),
    title: p.string().length(120),
    description: p.text(),
    state: p.enum([...caseStates]).index(),
    stateSince: p.datetime(3),
    applicant: () => p.manyToOne(Person).index(),
    siteParcels: p.array(),
    /** The parcels' addresses as one line, and their dissolved area, as they were when picked. */
    address: p.text(),
    site: p.type(new GeometryType<Polygonal>()).ignoreSchemaChanges('type'),
    sitePoint: p.type(new GeometryType<Point>()).ignoreSchemaChanges('type'),
    /** When the site was last picked: a massing from before was checked against another one. */
    siteSince: p.datetime(3),
    createdAt: p.datetime(3).onCreate(() => new Date()),
  },
  indexes: [{ name: 'review_case_site_index', properties: ['site'], type: 'gist' }],
});
export type ReviewCase = InferEntity<typeof ReviewCase>;
