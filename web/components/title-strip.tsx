import type { ReactNode } from 'react';

export interface TitleStripProps {
  entries: readonly { label: string; value: ReactNode }[];
  className?: string;
}

/** Facts side by side under small labels, as in a drawing's title block. */
export function TitleStrip({ entries, className = '' }: TitleStripProps) {
  return (
    <dl className={`flex flex-wrap gap-x-9 gap-y-3 border-b border-hairline py-3 ${className}`}>
      {entries.map(({ label, value }) => (
        <div key={label}>
          <dt className="label-caps">{label}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
