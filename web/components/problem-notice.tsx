import type { ReactNode } from 'react';
import { isApiError } from '../lib/api-error.ts';
import { Button } from './button.tsx';

export interface ProblemNoticeProps {
  error: unknown;
  /** Offers to try again. */
  onRetry?: () => void;
  children?: ReactNode;
}

/** What went wrong and what to do, as the API's problem details say it. */
export function ProblemNotice({ error, onRetry, children }: ProblemNoticeProps) {
  const problem = isApiError(error) ? error.problem : null;
  return (
    <div role="alert" className="border-s-3 border-madder py-1 ps-3.5">
      <p>
        <span className="font-strong text-madder" aria-hidden="true">
          ✕{' '}
        </span>
        <span className="font-strong">
          {problem?.title ?? 'Something on this page went wrong. Reload it and try again.'}
        </span>
      </p>
      {problem?.detail === undefined ? null : <p className="text-small">{problem.detail}</p>}
      {problem?.errors === undefined ? null : (
        <ul className="list-disc ps-5 text-small">
          {problem.errors.map(({ path, message }) => (
            <li key={`${path} ${message}`}>{message}</li>
          ))}
        </ul>
      )}
      {children}
      {problem?.requestId === undefined || problem.status < 500 ? null : (
        <p className="text-small text-ink-soft">
          If it stays like this, tell the planning department this number: {problem.requestId}
        </p>
      )}
      {onRetry === undefined ? null : (
        <Button kind="plain" className="mt-1" onPress={onRetry}>
          Try again
        </Button>
      )}
    </div>
  );
}
