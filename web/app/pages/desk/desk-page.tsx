import { useState } from 'react';
import {
  caseStates,
  caseStateWords,
  type CaseState,
} from '../../../../shared/contracts/case-life.ts';
import { EmptyState } from '../../../components/empty-state.tsx';
import { PageHeading } from '../../../components/page-heading.tsx';
import { Pager } from '../../../components/pager.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { SearchForm } from '../../../components/search-form.tsx';
import { SelectField } from '../../../components/select-field.tsx';
import { useCases } from '../../../features/cases/api/list-cases.ts';
import { CaseQueue } from '../../../features/cases/components/case-queue.tsx';
import { useSearchState } from '../../../lib/use-search-state.ts';

type StateFilter = CaseState | 'all';

const stateOptions: { id: StateFilter; label: string }[] = [
  { id: 'all', label: 'Every state' },
  // Drafts are the applicants' own; the desk never lists them.
  ...caseStates
    .filter((state) => state !== 'draft')
    .map((state) => ({ id: state, label: caseStateWords[state] })),
];

/** The longest in its state first: those cases wait most. */
const defaultSort = 'stateSince';
const pageSize = 100;

/** The planner's queue. */
export function DeskPage() {
  const [stateText, setState] = useSearchState('state');
  const [sortText, setSort] = useSearchState('sort');
  const [query, setQuery] = useSearchState('q');
  const [pageText, setPage] = useSearchState('page');
  const [nowMs] = useState(() => Date.now());
  const state = caseStates.find((one) => one === stateText) ?? null;
  const sort = sortText ?? defaultSort;
  const cases = useCases({
    view: 'desk',
    sort,
    page: Math.max(1, Number(pageText) || 1),
    pageSize,
    ...(state === null ? {} : { state }),
    ...(query === null ? {} : { q: query }),
  });
  return (
    <div className="sheet-width grid gap-6 py-8">
      <PageHeading>Desk</PageHeading>
      <div className="flex flex-wrap items-end gap-x-6 gap-y-3">
        <div className="grow">
          <SearchForm
            label="Find a case"
            value={query ?? ''}
            placeholder="Number, title, address or parcel"
            onSearch={setQuery}
          />
        </div>
        <SelectField<StateFilter>
          label="State"
          options={stateOptions}
          value={state ?? 'all'}
          onChange={(next) => setState(next === 'all' ? null : next)}
          className="w-64"
        />
      </div>
      <QueryView query={cases} what="the cases">
        {({ rows, page, total }) =>
          rows.length === 0 ? (
            <EmptyState title="No case here.">
              <p>
                {state === null && query === null
                  ? 'A case comes to the desk when its applicant submits it.'
                  : 'Choose another state or search for other words.'}
              </p>
            </EmptyState>
          ) : (
            <>
              <CaseQueue
                cases={rows}
                nowMs={nowMs}
                sort={sort}
                onSort={(next) => setSort(next === defaultSort ? null : next)}
              />
              <Pager
                page={page}
                pageSize={pageSize}
                total={total}
                onPage={(next) => setPage(next === 1 ? null : String(next))}
              />
            </>
          )
        }
      </QueryView>
    </div>
  );
}
