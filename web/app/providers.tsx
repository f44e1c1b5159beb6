import { QueryClientProvider } from '@tanstack/react-query';
import { lazy, Suspense, useState, type ReactNode } from 'react';
import { Loading } from '../components/loading.tsx';
import { ToastProvider } from '../components/toast.tsx';
import { PlaceProvider } from '../features/places/components/place-provider.tsx';
import { getSessionQueryOptions } from '../features/session/api/get-session.ts';
import { createQueryClient } from '../lib/query-client.ts';

const SetUpApp = lazy(async () => ({ default: (await import('./set-up-app.tsx')).SetUpApp }));

/** What every page stands on: server state, the place with its formats, short messages. */
export function Providers({ children }: { children: ReactNode }) {
  const [client] = useState(() =>
    createQueryClient({
      onSignedOut: (signedOut) => {
        signedOut.setQueryData(getSessionQueryOptions().queryKey, { person: null });
      },
    }),
  );
  return (
    <QueryClientProvider client={client}>
      <PlaceProvider
        whenNotSetUp={
          <Suspense fallback={<Loading />}>
            <SetUpApp />
          </Suspense>
        }
      >
        <ToastProvider>{children}</ToastProvider>
      </PlaceProvider>
    </QueryClientProvider>
  );
}
