import type { MassingIssue } from '../../../../shared/massing/massing-issue.ts';
import { DataTable, type TableColumn } from '../../../components/data-table.tsx';

export interface IssueTableProps {
  issues: readonly MassingIssue[];
}

const severityWords = {
  error: { sign: '✕', word: 'must be corrected', isDanger: true },
  warning: { sign: '!', word: 'please check', isDanger: false },
  repaired: { sign: '✓', word: 'put right', isDanger: false },
} as const satisfies Record<MassingIssue['severity'], unknown>;

const severityOrder = { error: 0, warning: 1, repaired: 2 } as const;

/** What was found in a massing file: where, what, and the way out; the worst first. */
export function IssueTable({ issues }: IssueTableProps) {
  if (issues.length === 0) {
    return (
      <p>
        <span aria-hidden="true">✓ </span>The file was read without a remark.
      </p>
    );
  }
  const rows = issues
    .map((issue, index) => ({ issue, key: `${index} ${issue.code}` }))
    .toSorted((a, b) => severityOrder[a.issue.severity] - severityOrder[b.issue.severity]);
  return (
    <DataTable
      caption={describeCount(issues)}
      columns={columns}
      rows={rows}
      stacksWhenNarrow
      rowKey={({ key }) => key}
    />
  );
}

type Row = { issue: MassingIssue; key: string };

const columns: TableColumn<Row>[] = [
  {
    id: 'severity',
    header: 'Remark',
    className: 'whitespace-nowrap',
    cell: ({ issue }) => {
      const { sign, word, isDanger } = severityWords[issue.severity];
      return (
        <span className={isDanger ? 'font-strong text-madder' : ''}>
          <span aria-hidden="true">{sign} </span>
          {word}
        </span>
      );
    },
  },
  {
    id: 'place',
    header: 'Where',
    className: 'min-w-28',
    cell: ({ issue }) => <IssuePlace issue={issue} />,
  },
  {
    id: 'message',
    header: 'What, and what to do',
    className: 'min-w-56',
    cell: ({ issue }) => (
      <>
        {issue.message}
        {issue.suggestion === '' ? null : (
          <span className="block text-ink-soft">{issue.suggestion}</span>
        )}
      </>
    ),
  },
];

function IssuePlace({ issue }: { issue: MassingIssue }) {
  return (
    <>
      {issue.feature ?? 'the whole file'}
      {issue.lngLat === null ? null : (
        <span className="block whitespace-nowrap text-ink-soft">
          {issue.lngLat.map((degrees) => degrees.toFixed(5)).join(', ')}
        </span>
      )}
    </>
  );
}

/** `2 to correct, 1 to check, 3 put right` */
export function describeCount(issues: readonly MassingIssue[]): string {
  const count = (severity: MassingIssue['severity']) =>
    issues.filter((issue) => issue.severity === severity).length;
  const parts = [
    [count('error'), 'to correct'],
    [count('warning'), 'to check'],
    [count('repaired'), 'put right'],
  ] as const;
  return parts
    .filter(([number]) => number > 0)
    .map(([number, words]) => `${number} ${words}`)
    .join(', ');
}
