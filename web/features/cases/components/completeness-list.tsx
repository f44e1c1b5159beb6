import type { CompletenessItem } from '../completeness.ts';

/** What is there and what is missing; the planner decides what follows from it. */
export function CompletenessList({ items }: { items: readonly CompletenessItem[] }) {
  return (
    <ul className="measure border-t border-hairline">
      {items.map(({ what, isThere, note }) => (
        <li
          key={what}
          className="grid grid-cols-[1.5rem_1fr] sm:grid-cols-[1.5rem_8rem_1fr] gap-x-2 border-b border-hairline py-1.5"
        >
          <span className={isThere ? '' : 'font-strong text-madder'}>
            <span aria-hidden="true">{isThere ? '✓' : '✕'}</span>
            <span className="sr-only">{isThere ? 'There:' : 'Missing:'}</span>
          </span>
          <span>{what}</span>
          <span className={`col-start-2 sm:col-start-3 ${isThere ? 'text-ink-soft' : ''}`}>
            {note}
          </span>
        </li>
      ))}
    </ul>
  );
}
