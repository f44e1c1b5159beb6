import type { ClauseSummary, StudyDetail } from '../../../../shared/contracts/studies.ts';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';
import { FindingMark } from '../../../components/finding-mark.tsx';
import type { Formats } from '../../../lib/formats.ts';
import { useFormats } from '../../../lib/place-context.ts';

export interface ClauseSummaryTableProps {
  study: StudyDetail;
  clauses: readonly ClauseSummary[];
  /** Shows the findings of a clause alone. */
  onChoose: (clause: string) => void;
}

/** The study's outcome: the whole, and clause by clause how many receptors have which finding. */
export function ClauseSummaryTable({ study, clauses, onChoose }: ClauseSummaryTableProps) {
  const formats = useFormats();
  const { findings, rule } = study;
  if (findings === null) return null;
  return (
    <section className="grid gap-3" aria-label="Outcome">
      <p className="text-lead">
        {rule.title}, version {rule.version}:{' '}
        <FindingMark finding={findings.met ? 'met' : 'not-met'} />. Loss index{' '}
        {formats.number(findings.lossIndex, 1)} of 100.
      </p>
      <DataTable
        caption="Clause by clause"
        hideCaption
        columns={summaryColumns(formats, onChoose)}
        rows={clauses}
        rowKey={({ clause }) => clause}
        stacksWhenNarrow
      />
    </section>
  );
}

function summaryColumns(
  formats: Formats,
  onChoose: (clause: string) => void,
): TableColumn<ClauseSummary>[] {
  const count = (
    id: 'notMet' | 'met' | 'disregarded' | 'notAffected' | 'close',
    header: string,
  ) => ({
    id,
    header,
    align: 'end' as const,
    cell: (row: ClauseSummary) => formats.number(row[id]),
  });
  return [
    {
      id: 'clause',
      header: 'Clause',
      isRowHeader: true,
      className: 'min-w-52',
      cell: ({ clause, title, judged }) =>
        judged === 0 ? (
          title
        ) : (
          <button
            type="button"
            className="link min-h-6 text-start"
            onClick={() => onChoose(clause)}
          >
            {title}
          </button>
        ),
    },
    {
      id: 'finding',
      header: 'Finding',
      className: 'min-w-28',
      cell: ({ finding }) => (
        <>
          <FindingMark finding={finding} />
          {finding === 'no-receptor' ? (
            <span className="block text-ink-soft">No such place lies within reach.</span>
          ) : null}
        </>
      ),
    },
    count('notMet', 'Not met'),
    count('met', 'Met'),
    count('close', 'Of these close'),
    count('disregarded', 'Too little to count'),
    count('notAffected', 'Not affected'),
    {
      id: 'worst',
      header: 'Worst margin',
      className: 'min-w-40',
      cell: ({ worst }) =>
        worst === null ? '–' : `${formats.inUnit(worst.margin, worst.unit)} at ${worst.label}`,
    },
  ];
}
