import { queryOptions, useQuery } from '@tanstack/react-query';
import { municipalitySchema } from '../../../../shared/contracts/base-data.ts';
import { callApi } from '../../../lib/api-client.ts';

export function getMunicipalityQueryOptions() {
  return queryOptions({
    queryKey: ['municipality'],
    queryFn: ({ signal }) => callApi(municipalitySchema, '/municipality', { signal }),
    staleTime: Infinity,
  });
}

export function useMunicipality() {
  return useQuery(getMunicipalityQueryOptions());
}
