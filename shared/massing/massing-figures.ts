import { z } from 'zod';

/** What a massing amounts to: see `measureMassing` for how each figure is taken. */
export const massingFiguresSchema = z.object({
  proposedBlocks: z.int(),
  existingBlocks: z.int(),
  heightM: z.number().nullable(),
  storeys: z.int().nullable(),
  /** Null where the footprints are too tangled to be measured. */
  footprintM2: z.number().nullable(),
  volumeM3: z.number().nullable(),
});
export type MassingFigures = z.infer<typeof massingFiguresSchema>;
