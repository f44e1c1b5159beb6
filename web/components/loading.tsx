import { useEffect, useState } from 'react';

export interface LoadingProps {
  /** What is being loaded: "the case". */
  what?: string;
}

const silentForMs = 300;

/** Says what is being loaded; keeps silent for a moment so that fast answers do not flicker. */
export function Loading({ what }: LoadingProps) {
  const [isShown, setIsShown] = useState(false);
  useEffect(() => {
    const timer = window.setTimeout(() => setIsShown(true), silentForMs);
    return () => window.clearTimeout(timer);
  }, []);
  return (
    <p role="status" className="min-h-12 py-3 text-ink-soft">
      {isShown ? (what === undefined ? 'Loading …' : `Loading ${what} …`) : ''}
    </p>
  );
}
