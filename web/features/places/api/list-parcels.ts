import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { parcelPageSchema } from '../../../../shared/contracts/base-data.ts';
import { callApi } from '../../../lib/api-client.ts';

export interface ListParcelsFilter {
  /** Words of an address or a parcel number. */
  q?: string;
  /** The parcel under this point, longitude and latitude. */
  at?: [number, number];
  numbers?: readonly string[];
  pageSize?: number;
}

export function listParcelsQueryOptions(filter: ListParcelsFilter) {
  return queryOptions({
    queryKey: ['parcels', filter],
    queryFn: ({ signal }) =>
      callApi(parcelPageSchema, '/parcels', {
        query: {
          q: filter.q,
          at: filter.at?.join(','),
          numbers: filter.numbers?.join(','),
          pageSize: filter.pageSize,
        },
        signal,
      }),
    staleTime: 5 * 60_000,
    placeholderData: keepPreviousData,
  });
}

export function useParcels(filter: ListParcelsFilter, options: { enabled?: boolean } = {}) {
  return useQuery({ ...listParcelsQueryOptions(filter), ...options });
}
