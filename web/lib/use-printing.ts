import { useSyncExternalStore } from 'react';

function subscribe(onChange: () => void): () => void {
  const media = window.matchMedia('print');
  media.addEventListener('change', onChange);
  return () => media.removeEventListener('change', onChange);
}

/** Whether the page is being laid out for paper. */
export function usePrinting(): boolean {
  return useSyncExternalStore(subscribe, () => window.matchMedia('print').matches);
}
