import type { ReactNode } from 'react';

export interface EmptyStateProps {
  /** What is not there yet, as a sentence. */
  title: string;
  /** What to do first. */
  children?: ReactNode;
}

export function EmptyState({ title, children }: EmptyStateProps) {
  return (
    <div className="measure grid gap-2 border-y border-hairline py-5">
      <p className="font-strong">{title}</p>
      {children === undefined ? null : (
        <div className="grid justify-items-start gap-3">{children}</div>
      )}
    </div>
  );
}
