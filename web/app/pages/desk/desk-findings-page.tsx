import type { StudyDetail } from '../../../../shared/contracts/studies.ts';
import { findingSchema, type Finding } from '../../../../shared/study/evidence-schema.ts';
import { EmptyState } from '../../../components/empty-state.tsx';
import { Pager } from '../../../components/pager.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { SearchForm } from '../../../components/search-form.tsx';
import { SelectField } from '../../../components/select-field.tsx';
import { useFindings } from '../../../features/studies/api/list-findings.ts';
import { useStudies } from '../../../features/studies/api/list-studies.ts';
import { ClauseFindings } from '../../../features/studies/components/clause-findings.tsx';
import { FindingsTable } from '../../../features/studies/components/findings-table.tsx';
import { StudyDownloads } from '../../../features/studies/components/study-downloads.tsx';
import { chooseStudy, finishedStudies } from '../../../features/studies/shown-study.ts';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { paths } from '../../paths.ts';
import { useDeskCase } from './desk-case-page.tsx';

const pageSize = 50;

/** The findings of a study as a table to sort, to filter and to take away. */
export function DeskFindingsPage() {
  const reviewCase = useDeskCase();
  const studies = useStudies(reviewCase.reference);
  const [revision] = useSearchState('revision');
  return (
    <QueryView query={studies} what="the studies">
      {({ rows }) => {
        const study = chooseStudy(finishedStudies(rows), revision);
        return study === null ? (
          <EmptyState title="There are no findings yet.">
            <p>They come with the first finished study, which is run in the part “Study”.</p>
          </EmptyState>
        ) : (
          <StudyFindings key={study.id} reference={reviewCase.reference} study={study} />
        );
      }}
    </QueryView>
  );
}

const everyFinding = 'all';
const findingOptions: { id: Finding | typeof everyFinding; label: string }[] = [
  { id: everyFinding, label: 'Every finding' },
  { id: 'not-met', label: 'Not met' },
  { id: 'met', label: 'Met' },
  { id: 'disregarded', label: 'Too little to count' },
  { id: 'not-affected', label: 'Not affected' },
];

function StudyFindings({ reference, study }: { reference: string; study: StudyDetail }) {
  const [query, setQuery] = useSearchState('q');
  const [sort, setSort] = useSearchState('sort');
  const [findingText, setFinding] = useSearchState('finding');
  const [clauseText, setClause] = useSearchState('clause');
  const [pageText, setPage] = useSearchState('page');
  const finding = findingSchema.safeParse(findingText).data;
  const clause = study.rule.clauses.find(({ id }) => id === clauseText)?.id;
  const filter = {
    ...(query === null ? {} : { q: query }),
    ...(sort === null ? {} : { sort }),
    ...(finding === undefined ? {} : { finding }),
    ...(clause === undefined ? {} : { clause }),
  };
  const findings = useFindings(study.id, {
    ...filter,
    page: Math.max(1, Number(pageText) || 1),
    pageSize,
  });
  return (
    <div className="grid gap-5">
      {study.isCurrent ? null : (
        <p className="say">
          This study judges revision {study.revision}; the case has a newer massing.
        </p>
      )}
      <ClauseFindings study={study} />
      <div className="flex flex-wrap items-end gap-x-6 gap-y-3">
        <div className="grow">
          <SearchForm
            label="Find a receptor"
            value={query ?? ''}
            placeholder="Address or parcel"
            onSearch={setQuery}
          />
        </div>
        <SelectField
          label="Finding"
          options={findingOptions}
          value={finding ?? everyFinding}
          onChange={(next) => setFinding(next === everyFinding ? null : next)}
          className="w-52"
        />
        {study.rule.clauses.length < 2 ? null : (
          <SelectField
            label="Clause"
            options={[
              { id: everyFinding, label: 'Every clause' },
              ...study.rule.clauses.map(({ id, title }) => ({ id, label: title })),
            ]}
            value={clause ?? everyFinding}
            onChange={(next) => setClause(next === everyFinding ? null : next)}
            className="w-72"
          />
        )}
      </div>
      <QueryView query={findings} what="the findings">
        {({ rows, page, total }) => (
          <div className="grid gap-3">
            <p className="text-small">
              {total} {total === 1 ? 'row' : 'rows'}
              {Object.keys(filter).some((name) => name !== 'sort') ? ' that fit' : ''}
            </p>
            {rows.length === 0 ? (
              <EmptyState title="No finding fits.">
                <p>Choose other words or another finding.</p>
              </EmptyState>
            ) : (
              <FindingsTable
                rows={rows}
                sort={sort ?? undefined}
                onSort={setSort}
                hrefOf={(row) => hrefOnMap(reference, study, row)}
              />
            )}
            <Pager
              page={page}
              pageSize={pageSize}
              total={total}
              onPage={(next) => setPage(next === 1 ? null : String(next))}
            />
          </div>
        )}
      </QueryView>
      <StudyDownloads studyId={study.id} filter={filter} />
    </div>
  );
}

function hrefOnMap(
  reference: string,
  study: StudyDetail,
  row: { receptor: string; day: string | null },
): string {
  const search = new URLSearchParams({ receptor: row.receptor });
  if (row.day !== null) search.set('date', row.day);
  if (!study.isCurrent) search.set('revision', String(study.revision));
  return `${paths.deskCase.href(reference, 'study')}?${search.toString()}`;
}
