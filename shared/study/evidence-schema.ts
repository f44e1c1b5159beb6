import { z } from 'zod';
import {
  isPolygonal,
  polygonalSchema,
  receptorGeometrySchema,
} from '../geometry/geojson-schema.ts';
import { receptorClassSchema, ruleSchema } from '../rules/rule-schema.ts';

export const evidenceFormat = 'noonmark-study/1';

/** What a block does: see DEVELOPERS.md, "The evidence file". */
export const blockRoles = ['context', 'existing', 'proposed', 'approved', 'by-right'] as const;
export type BlockRole = (typeof blockRoles)[number];

const instantSchema = z.iso.datetime({
  offset: true,
  error: 'Write an instant with its offset, for example 2026-12-21T12:00:00-06:00.',
});

const placeSchema = z.strictObject({
  name: z.string().min(1).max(200),
  timezone: z.string().refine(isTimeZone, 'This is no IANA time zone.'),
  longitude: z.number().min(-180).max(180),
  latitude: z.number().min(-89).max(89),
  /** Metres above sea level: the air above it is thinner for direct beam. */
  elevation: z.number().min(-450).max(9000).default(0),
});

const blockFeatureSchema = z.strictObject({
  type: z.literal('Feature').default('Feature'),
  properties: z
    .strictObject({
      id: z.string().min(1).max(100),
      role: z.enum(blockRoles),
      /** Metres above the one datum. */
      base: z.number(),
      top: z.number(),
    })
    .refine((block) => block.base < block.top, {
      path: ['top'],
      error: 'top must be above base',
    }),
  geometry: polygonalSchema,
});
export type EvidenceBlock = z.infer<typeof blockFeatureSchema>;

const receptorFeatureSchema = z
  .strictObject({
    type: z.literal('Feature').default('Feature'),
    properties: z.strictObject({
      id: z.string().min(1).max(100),
      class: receptorClassSchema,
      label: z.string().max(200).default(''),
      /** Height in metres above the datum at which its shadow is taken. */
      plane: z.number().default(0),
      /** Slope in degrees from the horizontal; it enters energy only. A window stands upright. */
      tilt: z.number().min(0).max(90).optional(),
      /** The direction that the slope or the window faces, degrees clockwise from true north. */
      facing: z.number().min(0).lt(360).optional(),
    }),
    /** A window is a Point or a LineString on its façade, everything else an area. */
    geometry: receptorGeometrySchema,
  })
  .superRefine(({ properties, geometry }, context) => {
    const isWindow = properties.class === 'window';
    if (isWindow === isPolygonal(geometry)) {
      context.addIssue({
        code: 'custom',
        path: ['geometry', 'type'],
        message: isWindow
          ? 'a window is a Point or a LineString on its façade'
          : 'only a window can be a Point or a LineString',
      });
    }
    if (isWindow && properties.facing === undefined) {
      context.addIssue({
        code: 'custom',
        path: ['properties', 'facing'],
        message: 'say which way the window faces, in degrees clockwise from true north',
      });
    }
  });
export type EvidenceReceptor = z.infer<typeof receptorFeatureSchema>;

const uniqueIds = (features: { properties: { id: string } }[], context: z.RefinementCtx) => {
  const seen = new Set<string>();
  features.forEach(({ properties }, index) => {
    if (seen.has(properties.id)) {
      context.addIssue({
        code: 'custom',
        path: ['features', index, 'properties', 'id'],
        message: `the id ${properties.id} stands twice`,
      });
    }
    seen.add(properties.id);
  });
};

const collection = <Feature extends z.ZodType<{ properties: { id: string } }>>(feature: Feature) =>
  z
    .strictObject({
      type: z.literal('FeatureCollection').default('FeatureCollection'),
      features: z.array(feature),
    })
    .superRefine((value, context) => uniqueIds(value.features, context));

const settingsSchema = z.strictObject({
  gridM: z.number().gt(0).max(50).default(1),
  yearEveryDays: z.int().min(1).max(60).default(5),
  yearStepMin: z.int().min(1).max(60).default(5),
  beam: z
    .strictObject({
      model: z.literal('ineichen-perez-2002').default('ineichen-perez-2002'),
      linkeTurbidity: z.number().min(1).max(10).default(3),
    })
    .default({ model: 'ineichen-perez-2002', linkeTurbidity: 3 }),
  /** This engine version computes no extra parts; `year` comes with a later one. */
  include: z.array(z.never('this engine version has no extra parts to include')).default([]),
});

/** What goes into a study; every default is filled in by parsing. */
export const studyInputSchema = z.strictObject({
  format: z.literal(evidenceFormat),
  engine: z.string().max(40).optional(),
  place: placeSchema,
  site: polygonalSchema.optional(),
  blocks: collection(blockFeatureSchema),
  receptors: collection(receptorFeatureSchema),
  year: z.int().min(1900).max(2100),
  instants: z.array(instantSchema).max(5000).optional(),
  settings: settingsSchema.prefault({}),
  rule: ruleSchema,
});
export type StudyInput = z.infer<typeof studyInputSchema>;

export const findingSchema = z.enum(['met', 'not-met', 'disregarded', 'not-affected']);
export type Finding = z.infer<typeof findingSchema>;

const clauseResultSchema = z.strictObject({
  clause: z.string(),
  /** The civil day judged, the worst one of a season; null where the measure adds up over the days. */
  day: z.iso.date().nullable(),
  finding: findingSchema,
  close: z.boolean(),
  /** (before − after) / before in the clause's measure, null where before is 0. */
  loss: z.number().nullable(),
  band: z.string().nullable(),
  /** One for each limit of the clause, in the order in which they stand in the rule. */
  tests: z.array(
    z.strictObject({
      measure: z.string(),
      unit: z.string(),
      before: z.number(),
      after: z.number(),
      /** The bound on the value after, or on the loss, in the measure's unit. */
      limit: z.number(),
      /** How far on the right side of the limit; negative when not met. */
      margin: z.number(),
      met: z.boolean(),
    }),
  ),
  /** Metres between sample points; null for measures over the area, which use none. */
  spacingM: z.number().nullable(),
  /** The finding as one plain sentence. */
  note: z.string(),
  /** For a season: the days on which the limit is not met. */
  daysNotMet: z.int().optional(),
});
export type ClauseResult = z.infer<typeof clauseResultSchema>;

export const studyFindingsSchema = z.strictObject({
  met: z.boolean(),
  /** 0 to 100: the share of clear-sky beam energy lost at the receptors that lose any. */
  lossIndex: z.number(),
  clauses: z.array(
    z.strictObject({
      clause: z.string(),
      finding: z.enum(['met', 'not-met', 'no-receptor']),
      receptorsNotMet: z.array(z.string()),
    }),
  ),
});
export type StudyFindings = z.infer<typeof studyFindingsSchema>;

export const studyInstantSchema = z.strictObject({
  at: instantSchema,
  /** Degrees clockwise from true north. */
  azimuth: z.number(),
  /** Apparent altitude in degrees. */
  altitude: z.number(),
  /** m² on the plane at datum 0, outside the site and the context that stands on it; absent with the sun down. */
  netNew: z.number().optional(),
  removed: z.number().optional(),
});
export type StudyInstant = z.infer<typeof studyInstantSchema>;

export const receptorResultSchema = z.strictObject({
  /** A receptor's id, or `ring:` and the id of the clause that judges the ring. */
  id: z.string(),
  /** m²; null for a window, whose sun is given in shares from 0 to 1. */
  openArea: z.number().nullable(),
  instants: z.array(
    z.strictObject({ at: instantSchema, sunBefore: z.number(), sunAfter: z.number() }),
  ),
  clauses: z.array(clauseResultSchema),
});
export type ReceptorResult = z.infer<typeof receptorResultSchema>;

export const studyResultsSchema = z.strictObject({
  instants: z.array(studyInstantSchema),
  receptors: z.array(receptorResultSchema),
  findings: studyFindingsSchema,
  /** The findings with what is approved nearby standing before and after; only where there is any. */
  cumulative: studyFindingsSchema.optional(),
  /** How the engine's two ways to the same areas agreed; not part of the digest. */
  check: z
    .strictObject({
      largestDifferenceM2: z.number(),
      at: z.string().nullable(),
      receptor: z.string().nullable(),
    })
    .optional(),
});
export type StudyResults = z.infer<typeof studyResultsSchema>;

export const digestSchema = z.string().regex(/^sha256:[0-9a-f]{64}$/);

/** A study as one file that anyone can recompute. */
export const evidenceFileSchema = studyInputSchema.extend({
  engine: z.string().max(40),
  results: studyResultsSchema,
  digest: digestSchema,
});
export type EvidenceFile = z.infer<typeof evidenceFileSchema>;

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}
