import type {
  RuleTrial,
  TrialChange,
  TrialFinding,
  TrialRow,
} from '../../../../shared/contracts/rule-trials.ts';
import type { TableColumn } from '../../../components/data-table.tsx';
import { FindingMark } from '../../../components/finding-mark.tsx';
import type { Formats } from '../../../lib/formats.ts';

const changeWords = {
  worse: 'turns to not met',
  better: 'ceases to be not met',
  finding: 'another finding',
  figures: 'other figures',
  'one-sided': 'judged by one of the two alone',
  same: 'stays',
} as const satisfies Record<TrialChange, string>;

/** One receptor under one clause, as the two versions judge it. */
export function trialColumns(
  formats: Formats,
  { inForce, draft }: RuleTrial,
): TableColumn<TrialRow>[] {
  return [
    {
      id: 'receptor',
      header: 'Receptor and clause',
      isRowHeader: true,
      className: 'min-w-44',
      cell: (row) => (
        <>
          {row.label}
          <span className="block text-label text-ink-soft">{row.clauseTitle}</span>
        </>
      ),
    },
    {
      id: 'change',
      header: 'Change',
      className: 'min-w-32',
      cell: ({ change }) => (
        <span className={change === 'worse' ? 'font-strong' : ''}>{changeWords[change]}</span>
      ),
    },
    {
      id: 'in-force',
      header: `Version ${inForce.version}, in force`,
      className: 'min-w-52',
      cell: (row) => <Side finding={row.inForce} formats={formats} />,
    },
    {
      id: 'draft',
      header: `Version ${draft.version}, tried`,
      className: 'min-w-52',
      cell: (row) => <Side finding={row.draft} formats={formats} />,
    },
  ];
}

function Side({ finding, formats }: { finding: TrialFinding | null; formats: Formats }) {
  if (finding === null) return <span className="text-ink-soft">not judged</span>;
  const figure = (value: number) => formats.inUnit(value, finding.unit);
  return (
    <>
      <FindingMark finding={finding.finding} close={finding.close} />
      <span className="block">
        {figure(finding.before)} before, {figure(finding.after)} after; limit{' '}
        {figure(finding.limit)}
      </span>
      <details className="text-label">
        <summary className="min-h-6 cursor-pointer">In a sentence</summary>
        {finding.sentence}
      </details>
    </>
  );
}
