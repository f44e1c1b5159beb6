import { queryOptions, useQuery } from '@tanstack/react-query';
import { z } from 'zod';
import {
  polygonalSchema,
  receptorGeometrySchema,
} from '../../../../shared/geometry/geojson-schema.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Of the evidence file, what the study's page draws: blocks, receptors and their sun hour by hour. */
const drawnEvidenceSchema = z.object({
  blocks: z.object({
    features: z.array(
      z.object({
        properties: z.object({
          id: z.string(),
          role: z.string(),
          base: z.number(),
          top: z.number(),
        }),
        geometry: polygonalSchema,
      }),
    ),
  }),
  receptors: z.object({
    features: z.array(
      z.object({
        properties: z.object({ id: z.string(), class: z.string(), label: z.string() }),
        geometry: receptorGeometrySchema,
      }),
    ),
  }),
  results: z.object({
    receptors: z.array(
      z.object({
        id: z.string(),
        openArea: z.number().nullable(),
        instants: z.array(
          z.object({ at: z.string(), sunBefore: z.number(), sunAfter: z.number() }),
        ),
      }),
    ),
  }),
});
export type DrawnEvidence = z.infer<typeof drawnEvidenceSchema>;

export function getStudyEvidenceQueryOptions(studyId: string) {
  return queryOptions({
    queryKey: ['studies', studyId, 'evidence'],
    queryFn: ({ signal }) =>
      callApi(drawnEvidenceSchema, `/studies/${studyId}/evidence`, { signal }),
    // A finished study never changes.
    staleTime: Infinity,
  });
}

export function useStudyEvidence(studyId: string) {
  return useQuery(getStudyEvidenceQueryOptions(studyId));
}
