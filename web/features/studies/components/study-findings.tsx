import type { FindingsSummary, StudyDetail } from '../../../../shared/contracts/studies.ts';
import { EmptyState } from '../../../components/empty-state.tsx';
import { Pager } from '../../../components/pager.tsx';
import { QueryView } from '../../../components/query-view.tsx';
import { useSearchState } from '../../../lib/use-search-state.ts';
import { useFindingsSummary } from '../api/get-findings-summary.ts';
import { useFindings } from '../api/list-findings.ts';
import { ClauseSummaryTable } from './clause-summary-table.tsx';
import { FindingsFilter, useFindingsFilter } from './findings-filter.tsx';
import { FindingsTable } from './findings-table.tsx';
import { LedgerOfReceptor } from './ledger-of-receptor.tsx';
import { StudyDownloads } from './study-downloads.tsx';

const pageSize = 50;

export interface StudyFindingsProps {
  study: StudyDetail;
  /** Where a receptor is shown on the map on its judged day. */
  hrefOnMap: (row: { receptor: string; day: string | null }) => string;
}

/** The findings of a study: summed up by clause, then as a table to sort, to narrow and to take away. */
export function StudyFindings({ study, hrefOnMap }: StudyFindingsProps) {
  const summary = useFindingsSummary(study.id);
  return (
    <div className="grid gap-6">
      {study.isCurrent ? null : (
        <p className="say">
          This study judges revision {study.revision}; the case has a newer massing.
        </p>
      )}
      <QueryView query={summary} what="the findings">
        {(loaded) => <Findings study={study} hrefOnMap={hrefOnMap} summary={loaded} />}
      </QueryView>
    </div>
  );
}

function Findings({
  study,
  hrefOnMap,
  summary,
}: StudyFindingsProps & { summary: FindingsSummary }) {
  const filter = useFindingsFilter();
  const [sort, setSort] = useSearchState('sort');
  const [pageText, setPage] = useSearchState('page');
  const [ledger, setLedger] = useSearchState('ledger');
  const wanted = { ...filter.values, ...(sort === null ? {} : { sort }) };
  const isNarrowed = Object.keys(filter.values).length > 0;
  const findings = useFindings(study.id, {
    ...wanted,
    page: Math.max(1, Number(pageText) || 1),
    pageSize,
  });
  return (
    <>
      <ClauseSummaryTable study={study} clauses={summary.clauses} onChoose={filter.setClause} />
      {ledger === null ? null : (
        <LedgerOfReceptor study={study} receptor={ledger} onClose={() => setLedger(null)} />
      )}
      <section className="grid gap-4" aria-labelledby="every-finding">
        <h2 id="every-finding">Every receptor under every clause</h2>
        <FindingsFilter filter={filter} summary={summary} />
        <QueryView query={findings} what="the findings">
          {({ rows, page, total }) => (
            <div className="grid gap-3">
              <p className="text-small" role="status">
                {total} {total === 1 ? 'row' : 'rows'}
                {isNarrowed ? ' that fit' : ''}
              </p>
              {rows.length === 0 ? (
                <EmptyState title="No finding fits.">
                  <p>Choose other words or another finding.</p>
                </EmptyState>
              ) : (
                <FindingsTable
                  rows={rows}
                  sort={sort ?? undefined}
                  onSort={(next) => {
                    setSort(next);
                    setPage(null);
                  }}
                  hrefOf={hrefOnMap}
                  onLedger={setLedger}
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
      </section>
      <StudyDownloads studyId={study.id} filter={wanted} />
    </>
  );
}
