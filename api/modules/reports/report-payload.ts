import { z } from 'zod';
import { municipalitySchema, parcelSchema } from '../../../shared/contracts/base-data.ts';
import {
  massingBlockFeatureSchema,
  massingFiguresSchema,
} from '../../../shared/contracts/massings.ts';
import { reportNumberSchema } from '../../../shared/contracts/reports.ts';
import { findingRowSchema } from '../../../shared/contracts/studies.ts';
import {
  lngLatSchema,
  multiPolygonSchema,
  polygonalSchema,
} from '../../../shared/geometry/geojson-schema.ts';
import { sunLedgerSchema } from '../../../shared/receptors/sun-ledger-schema.ts';
import { receptorClassSchema, ruleSchema } from '../../../shared/rules/rule-schema.ts';
import { digestSchema, studyFindingsSchema } from '../../../shared/study/evidence-schema.ts';

const instantSchema = z.iso.datetime({ offset: true });

const lineSchema = z.discriminatedUnion('type', [
  z.strictObject({ type: z.literal('LineString'), coordinates: z.array(lngLatSchema).min(2) }),
  z.strictObject({
    type: z.literal('MultiLineString'),
    coordinates: z.array(z.array(lngLatSchema).min(2)),
  }),
]);

/** What the maps show around the site; geometry that touches the map extent, whole or cut. */
const surroundingsSchema = z.object({
  buildings: z.array(
    z.object({
      baseM: z.number(),
      topM: z.number(),
      /** Where its height comes from, as the base data says it. */
      heightSource: z.string(),
      geometry: polygonalSchema,
    }),
  ),
  parcels: z.array(z.object({ number: z.string(), geometry: polygonalSchema })),
  streets: z.array(z.object({ name: z.string(), geometry: polygonalSchema })),
  /** Middle lines, along which the names are written. */
  streetLines: z.array(z.object({ name: z.string(), geometry: lineSchema })),
  water: z.array(z.object({ name: z.string(), geometry: polygonalSchema })),
  openSpace: z.array(z.object({ name: z.string(), geometry: polygonalSchema })),
});

/** The sun and the shadows on the ground (plane at datum 0) at one instant of a key date. */
const reportInstantSchema = z.object({
  at: instantSchema,
  /** Clockwise from true north. */
  azimuthDeg: z.number(),
  /** Apparent. */
  altitudeDeg: z.number(),
  netNewM2: z.number(),
  removedM2: z.number(),
  before: multiPolygonSchema,
  after: multiPolygonSchema,
  netNew: multiPolygonSchema,
});
export type ReportInstant = z.infer<typeof reportInstantSchema>;

const publishedCommentSchema = z.object({
  authorName: z.string(),
  body: z.string(),
  receivedAt: z.iso.datetime(),
  /** The massing revision that was open when the comment was written. */
  revision: z.int().nullable(),
  pin: lngLatSchema.nullable(),
});

/**
 * Everything that a staff report prints, as plain data: collected by the server when a report is
 * previewed or issued, and drawn by `renderReport` without any further look-up.
 * The same payload always gives the same bytes.
 */
export const reportPayloadSchema = z.object({
  payloadVersion: z.literal(1),
  number: reportNumberSchema,
  issuedAt: z.iso.datetime(),
  issuedByName: z.string(),
  /** Public page of the case. */
  caseUrl: z.string(),
  /** Where the evidence file of the study can be had. */
  evidenceUrl: z.string(),
  municipality: municipalitySchema,
  reviewCase: z.object({
    number: z.string(),
    title: z.string(),
    address: z.string(),
    description: z.string(),
    applicantName: z.string(),
  }),
  siteParcels: z.array(parcelSchema).min(1),
  /** The site's parcels, dissolved, as the study has it. */
  site: polygonalSchema,
  revision: z.object({
    revision: z.int(),
    fileName: z.string(),
    /** SHA-256 of the massing file as sent, hexadecimal. */
    sha256: z.string(),
    uploadedAt: z.iso.datetime(),
    figures: massingFiguresSchema,
    blocks: z.array(massingBlockFeatureSchema),
  }),
  /** West, south, east, north in degrees; choose it with `chooseMapExtent`. */
  mapExtent: z.tuple([z.number(), z.number(), z.number(), z.number()]),
  surroundings: surroundingsSchema,
  study: z.object({
    digest: digestSchema,
    engine: z.string(),
    /** When the study was finished. */
    finishedAt: z.iso.datetime(),
    year: z.int(),
    rule: ruleSchema,
    /** For each clause the days judged, and the window's first and last instant on each. */
    judgedDays: z.array(
      z.object({
        clause: z.string(),
        days: z.array(z.object({ date: z.iso.date(), fromAt: instantSchema, toAt: instantSchema })),
      }),
    ),
    keyDates: z.array(z.object({ event: z.string(), date: z.iso.date() })),
    findings: studyFindingsSchema,
    linkeTurbidity: z.number(),
    /** How the engine's two ways to the same areas agreed, in m². */
    largestDifferenceM2: z.number().nullable(),
  }),
  /** Every whole clock hour with the sun up on the key dates, in the order of time. */
  instants: z.array(reportInstantSchema),
  /** Every row of the study, of every clause and every finding. */
  findingRows: z.array(findingRowSchema),
  /** The outlines of at least the receptors that do not meet a clause. */
  receptors: z.array(
    z.object({
      id: z.string(),
      class: receptorClassSchema,
      label: z.string(),
      geometry: polygonalSchema,
    }),
  ),
  /** Of every receptor that does not meet a clause, the most affected first, then of others that lose much. */
  ledgers: z.array(sunLedgerSchema),
  /** In the order in which they were received. */
  publishedComments: z.array(publishedCommentSchema),
  withheldComments: z.int(),
  /** The planner's own words: plain paragraphs, separated by empty lines. */
  narrative: z.string(),
  recommendation: z.string(),
});
export type ReportPayload = z.infer<typeof reportPayloadSchema>;
