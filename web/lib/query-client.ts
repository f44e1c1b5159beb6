import { QueryCache, QueryClient } from '@tanstack/react-query';
import { isApiError } from './api-error.ts';

export interface QueryClientOptions {
  /** Called when the server says that nobody is signed in any more. */
  onSignedOut: (client: QueryClient) => void;
}

/** The client's store of server state: what a person can mend (4xx) is not tried again, the rest twice. */
export function createQueryClient({ onSignedOut }: QueryClientOptions): QueryClient {
  const client = new QueryClient({
    queryCache: new QueryCache({
      onError: (error) => {
        if (isApiError(error, 'NOT_SIGNED_IN')) onSignedOut(client);
      },
    }),
    defaultOptions: {
      queries: {
        staleTime: 30_000,
        refetchOnWindowFocus: false,
        retry: (failures, error) =>
          failures < 2 && !(isApiError(error) && error.status >= 400 && error.status < 500),
      },
      mutations: { retry: false },
    },
  });
  return client;
}
