import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import type { ReactNode } from 'react';
import { MemoryRouter } from 'react-router-dom';
import type { Municipality } from '../../../shared/contracts/base-data.ts';
import { ToastProvider } from '../../../web/components/toast.tsx';
import { createFormats } from '../../../web/lib/formats.ts';
import { PlaceContext } from '../../../web/lib/place-context.ts';

export const larkhaven: Municipality = {
  name: 'City of Larkhaven',
  shortName: 'Larkhaven',
  timeZone: 'America/Chicago',
  locale: 'en-US',
  longitude: -91.3,
  latitude: 46.75,
  elevationM: 186,
  extent: [-91.31, 46.74, -91.29, 46.76],
  studyYear: 2026,
};

export const larkhavenFormats = createFormats(larkhaven);

/** Renders as a page of Larkhaven's server would: place, server state, address, short messages. */
export function renderInPlace(children: ReactNode, path = '/') {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  return render(
    <QueryClientProvider client={client}>
      <PlaceContext value={{ municipality: larkhaven, formats: larkhavenFormats }}>
        <ToastProvider>
          <MemoryRouter initialEntries={[path]}>{children}</MemoryRouter>
        </ToastProvider>
      </PlaceContext>
    </QueryClientProvider>,
  );
}

/** Figures stand with no-break spaces; a reader sees plain ones. */
export function withPlainSpaces(text: string | null): string {
  return (text ?? '').replaceAll('\u00a0', ' ');
}
