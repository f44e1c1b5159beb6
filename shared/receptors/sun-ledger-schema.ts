import { z } from 'zod';

/** Before, after and lost (before − after) of one quantity. */
const balanceSchema = z.object({ before: z.number(), after: z.number(), lost: z.number() });

/** Hours are means over the open area; square metres times hours are `areaHours`; energy is direct clear-sky beam. */
const accountSchema = z.object({
  sunHours: balanceSchema,
  areaHoursM2h: balanceSchema,
  beamEnergyKwhM2: balanceSchema,
});

export const ledgerHourSchema = accountSchema.extend({
  fromAt: z.iso.datetime({ offset: true }),
  toAt: z.iso.datetime({ offset: true }),
});

export const ledgerDaySchema = accountSchema.extend({
  date: z.iso.date(),
  /** The key date's name where it is one: `december-solstice`. */
  event: z.string().nullable(),
  /** Null when the sun does not rise or set on that day. */
  sunriseAt: z.iso.datetime({ offset: true }).nullable(),
  sunsetAt: z.iso.datetime({ offset: true }).nullable(),
  /** The stretches in which at least a twentieth of the open area loses the sun. */
  lostSpans: z.array(
    z.object({
      fromAt: z.iso.datetime({ offset: true }),
      toAt: z.iso.datetime({ offset: true }),
    }),
  ),
  hours: z.array(ledgerHourSchema),
  /** The sunlit share of the open area at each step, for the bands under the sun arc. */
  samples: z.array(
    z.object({
      at: z.iso.datetime({ offset: true }),
      altitudeDeg: z.number(),
      shareBefore: z.number(),
      shareAfter: z.number(),
    }),
  ),
});
export type LedgerDay = z.infer<typeof ledgerDaySchema>;

/** The account of one receptor: for each day, hour by hour, sun before, after and lost. */
export const sunLedgerSchema = z.object({
  receptor: z.string(),
  class: z.string(),
  label: z.string(),
  planeM: z.number(),
  /** Null for a window, which has none: what is m² of others is a share of it. */
  openAreaM2: z.number().nullable(),
  stepMin: z.number(),
  days: z.array(ledgerDaySchema),
});
export type SunLedger = z.infer<typeof sunLedgerSchema>;
