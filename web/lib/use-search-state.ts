import { useCallback } from 'react';
import { useSearchParams } from 'react-router-dom';

/**
 * One search parameter of the address as state, so that a colleague who opens the link sees the same.
 * Setting it replaces the history entry; null or '' takes it out.
 */
export function useSearchState(name: string): [string | null, (value: string | null) => void] {
  const [parameters, setParameters] = useSearchParams();
  const set = useCallback(
    (value: string | null) => {
      setParameters(
        () => {
          // The address bar, not the last render: another control may have written meanwhile.
          const current = new URLSearchParams(window.location.search);
          if (value === null || value === '') current.delete(name);
          else current.set(name, value);
          return current;
        },
        { replace: true, preventScrollReset: true },
      );
    },
    [name, setParameters],
  );
  return [parameters.get(name), set];
}
