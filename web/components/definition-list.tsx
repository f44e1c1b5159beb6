import type { ReactNode } from 'react';

export interface DefinitionListProps {
  entries: readonly { label: string; value: ReactNode }[];
  className?: string;
}

/** Facts one under the other, label at the left, with hairlines between. */
export function DefinitionList({ entries, className = '' }: DefinitionListProps) {
  return (
    <dl className={`border-t border-hairline ${className}`}>
      {entries.map(({ label, value }) => (
        <div
          key={label}
          className="grid grid-cols-[minmax(7rem,2fr)_5fr] gap-x-4 border-b border-hairline py-1.5"
        >
          <dt className="text-ink-soft">{label}</dt>
          <dd className="min-w-0">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
