import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Loading } from './loading.tsx';
import { ProblemNotice } from './problem-notice.tsx';

export interface QueryViewProps<Data> {
  query: UseQueryResult<Data>;
  /** What is being loaded: "the case". */
  what?: string;
  children: (data: Data) => ReactNode;
}

/** The loading and error states of one query; the children get its data. */
export function QueryView<Data>({ query, what, children }: QueryViewProps<Data>) {
  if (query.data !== undefined) return children(query.data);
  if (query.isError) {
    return <ProblemNotice error={query.error} onRetry={() => void query.refetch()} />;
  }
  return <Loading {...(what === undefined ? {} : { what })} />;
}
