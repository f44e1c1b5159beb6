import { z } from 'zod';

/** What may be judged; see `classes` of the evidence file's receptors. */
export const receptorClasses = ['parcel', 'yard', 'open-space', 'collector', 'walk'] as const;
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

/** The measures that are taken over a receptor's area; each has a value before and after. */
const measureSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('sun-hours') }),
  z.strictObject({ kind: z.literal('best-run'), share: z.number().gt(0).max(1) }),
  z.strictObject({ kind: z.literal('shade-share') }),
  z.strictObject({ kind: z.literal('sun-area-hours') }),
  z.strictObject({ kind: z.literal('beam-energy') }),
]);
export type RuleMeasure = z.infer<typeof measureSchema>;
export type MeasureKind = RuleMeasure['kind'];

/** The unit of each measure's value; 1 is a share from 0 to 1. */
export const measureUnits = {
  'sun-hours': 'h',
  'best-run': 'h',
  'shade-share': '1',
  'sun-area-hours': 'm²·h',
  'beam-energy': 'kWh/m²',
} as const satisfies Record<MeasureKind, string>;

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

export const clauseSchema = z
  .strictObject({
    id: z.string().regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'Use small letters, digits and hyphens.'),
    title: z.string().trim().min(1).max(200),
    receptors: z.strictObject({
      classes: z.array(receptorClassSchema).min(1),
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
    /** A receptor shaded anew on more than `area` m² for at most `minutes` a day is not held against the proposal. */
    disregard: z
      .strictObject({ minutes: z.number().min(0).default(0), area: z.number().min(0).default(1) })
      .default({ minutes: 0, area: 1 }),
    weight: z.number().gt(0).max(100).default(1),
  })
  .superRefine((clause, context) => {
    const { window } = clause;
    if (window.basis === 'sun') return;
    if (window.from > window.to) {
      context.addIssue({
        code: 'custom',
        path: ['window', 'to'],
        message: 'The window ends before it begins.',
      });
    }
    if (window.from === window.to && clause.measure.kind !== 'shade-share') {
      context.addIssue({
        code: 'custom',
        path: ['window', 'to'],
        message: 'A single instant can be judged by shade-share only.',
      });
    }
    const toMinutes = (clock: string) => Number(clock.slice(0, 2)) * 60 + Number(clock.slice(3));
    if (window.from < window.to && clause.step > toMinutes(window.to) - toMinutes(window.from)) {
      context.addIssue({
        code: 'custom',
        path: ['step'],
        message: 'The step is longer than the window.',
      });
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
