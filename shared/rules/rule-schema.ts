import { z } from 'zod';
import { checkClause } from './check-clause.ts';

/** What may be judged; see `classes` of the evidence file's receptors. */
export const receptorClasses = [
  'parcel',
  'yard',
  'open-space',
  'collector',
  'walk',
  'window',
] as const;
export const receptorClassSchema = z.enum(receptorClasses);
export type ReceptorClass = z.infer<typeof receptorClassSchema>;

export const dayEvents = [
  'march-equinox',
  'june-solstice',
  'september-equinox',
  'december-solstice',
  'winter-solstice',
  'summer-solstice',
] as const;
export type DayEvent = (typeof dayEvents)[number];

/** Days of every month as they can be in some year, 29 February included. */
const monthDaySchema = z
  .string()
  .regex(
    /^(?:(?:0[13578]|1[02])-(?:0[1-9]|[12]\d|3[01])|(?:0[469]|11)-(?:0[1-9]|[12]\d|30)|02-(?:0[1-9]|[12]\d))$/,
    {
      error: 'Write the day as MM-DD, for example 03-21.',
    },
  );

const clockSchema = z
  .string()
  .regex(/^(?:[01]\d|2[0-3]):[0-5]\d$/, 'Write the time as HH:MM, for example 09:00.');

const daySchema = z.union([
  z.strictObject({ event: z.enum(dayEvents) }),
  z.strictObject({ date: monthDaySchema }),
  z.strictObject({
    from: monthDaySchema,
    to: monthDaySchema,
    everyDays: z.int().min(1).max(60).default(1),
  }),
  z.strictObject({ year: z.literal(true) }),
]);
export type RuleDay = z.infer<typeof daySchema>;

const clockWindow = <Basis extends string>(basis: Basis) =>
  z.strictObject({ basis: z.literal(basis), from: clockSchema, to: clockSchema });

/** No default basis: a rule has to say which clock it means. */
const windowSchema = z.discriminatedUnion('basis', [
  clockWindow('civil'),
  clockWindow('standard'),
  clockWindow('solar'),
  z.strictObject({
    basis: z.literal('sun'),
    /** Minutes. */
    afterSunrise: z.number().min(0).max(720),
    beforeSunset: z.number().min(0).max(720),
  }),
]);
export type RuleWindow = z.infer<typeof windowSchema>;

/** Hours of direct sun, summed over the window; 0 asks for more than none. */
const hoursSchema = z.number().min(0).max(24);

/** What is measured; each has a value before and after. */
const measureSchema = z.discriminatedUnion('kind', [
  /** The share of the area with at least so many hours of sun. */
  z.strictObject({ kind: z.literal('sun-share'), hours: hoursSchema }),
  /** The same in m². */
  z.strictObject({ kind: z.literal('sun-area'), hours: hoursSchema }),
  /** Mean hours of sun over the area. */
  z.strictObject({ kind: z.literal('sun-hours') }),
  /** The longest unbroken time with at least that share of the area in sun. */
  z.strictObject({ kind: z.literal('best-run'), share: z.number().gt(0).max(1) }),
  /** Hours of shade at the most shaded point. */
  z.strictObject({ kind: z.literal('worst-shade-hours') }),
  /** The largest share of the area in shade at any judged instant. */
  z.strictObject({ kind: z.literal('shade-share') }),
  /** Sunlit area × time, added over the days. */
  z.strictObject({ kind: z.literal('sun-area-hours') }),
  /** Direct clear-sky energy on the receptor's plane, added over the days. */
  z.strictObject({ kind: z.literal('beam-energy') }),
]);
export type RuleMeasure = z.infer<typeof measureSchema>;
export type MeasureKind = RuleMeasure['kind'];

const limitLeafSchema = z.union([
  z.strictObject({ atLeast: z.number().min(0), measure: measureSchema.optional() }),
  z.strictObject({ atMost: z.number().min(0), measure: measureSchema.optional() }),
  z.strictObject({ keeps: z.number().min(0).max(1), measure: measureSchema.optional() }),
  z.strictObject({ losesAtMost: z.number().min(0), measure: measureSchema.optional() }),
  z.strictObject({
    losesAtMostShare: z.number().min(0).max(1),
    of: z.enum(['before', 'theoretical']).default('before'),
    measure: measureSchema.optional(),
  }),
  z.strictObject({ noWorse: z.literal(true), measure: measureSchema.optional() }),
]);
export type LimitLeaf = z.infer<typeof limitLeafSchema>;

export type RuleLimit = LimitLeaf | { anyOf: RuleLimit[] } | { allOf: RuleLimit[] };

const limitSchema: z.ZodType<RuleLimit> = z.lazy(() =>
  z.union([
    limitLeafSchema,
    z.strictObject({ anyOf: z.array(limitSchema).min(1).max(10) }),
    z.strictObject({ allOf: z.array(limitSchema).min(1).max(10) }),
  ]),
);

/** The band between two distances in metres outside the site's boundary; without `to` as far as the shadow reaches. */
const ringSchema = z.strictObject({
  from: z.number().min(0).max(2000),
  to: z.number().gt(0).max(2000).optional(),
});
export type ReceptorRing = z.infer<typeof ringSchema>;

/** What stands before, in place of the context and what exists on the site. */
const baselineSchema = z.union([
  z.strictObject({
    /** Metres above the datum of a hypothetical wall along the site's boundary. */
    wall: z.number().gt(0).max(200),
    /** What stands beside the wall. */
    with: z.array(z.enum(['context', 'existing'])).default(['context']),
  }),
  /** What could be built without this approval, with the context. */
  z.literal('by-right'),
  /** Before is nothing at all, after the proposal and nothing else. */
  z.literal('proposal-alone'),
]);
export type ClauseBaseline = z.infer<typeof baselineSchema>;

export const clauseSchema = z
  .strictObject({
    id: z.string().regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'Use small letters, digits and hyphens.'),
    title: z.string().trim().min(1).max(200),
    /** Either classes or a ring. */
    receptors: z.strictObject({
      classes: z.array(receptorClassSchema).default([]),
      ring: ringSchema.optional(),
      /** Height in metres at which the shadow is taken, in place of the receptors' own. */
      plane: z.number().optional(),
      /** Of which area: `open` leaves out what context buildings stand on. */
      of: z.enum(['open', 'whole']).default('open'),
    }),
    days: z.array(daySchema).min(1).max(24),
    window: windowSchema,
    /** Degrees, apparent: a lower sun does not count. */
    minimumAltitude: z.number().min(0).max(60).default(0),
    /** Minutes between judged instants. */
    step: z.int().min(1).max(120).default(10),
    measure: measureSchema,
    limit: limitSchema,
    baseline: baselineSchema.optional(),
    /** A receptor shaded anew on more than `area` m² for at most `minutes` a day is not held against the proposal. */
    disregard: z
      .strictObject({ minutes: z.number().min(0).default(0), area: z.number().min(0).default(1) })
      .default({ minutes: 0, area: 1 }),
    weight: z.number().gt(0).max(100).default(1),
  })
  .superRefine((clause, context) => {
    for (const { path, message } of checkClause(clause)) {
      context.addIssue({ code: 'custom', path, message });
    }
  });
export type RuleClause = z.infer<typeof clauseSchema>;

const bandSchema = z.strictObject({
  /** The largest loss, as a share from 0 to 1, that still has this label. */
  upTo: z.number().gt(0).max(1),
  label: z.string().trim().min(1).max(60),
});

const defaultBands = [
  { upTo: 0.1, label: 'negligible' },
  { upTo: 0.2, label: 'minor' },
  { upTo: 0.4, label: 'moderate' },
  { upTo: 1, label: 'substantial' },
];

/** A municipality's rule: data with a version, complete with its defaults once parsed. */
export const ruleSchema = z
  .strictObject({
    id: z.string().regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'Use small letters, digits and hyphens.'),
    version: z.int().min(1),
    title: z.string().trim().min(1).max(200),
    citation: z.string().trim().max(300).default(''),
    clauses: z.array(clauseSchema).min(1).max(40),
    bands: z.array(bandSchema).min(1).max(10).default(defaultBands),
  })
  .superRefine((rule, context) => {
    const ids = rule.clauses.map((clause) => clause.id);
    ids.forEach((id, index) => {
      if (ids.indexOf(id) !== index) {
        context.addIssue({
          code: 'custom',
          path: ['clauses', index, 'id'],
          message: `Another clause has the id ${id}.`,
        });
      }
    });
    const rising = rule.bands.every(
      (band, index) => band.upTo > (rule.bands[index - 1]?.upTo ?? 0),
    );
    if (!rising || rule.bands.at(-1)?.upTo !== 1) {
      context.addIssue({
        code: 'custom',
        path: ['bands'],
        message: 'The bands must rise and the last must reach 1.',
      });
    }
  });
export type Rule = z.infer<typeof ruleSchema>;
