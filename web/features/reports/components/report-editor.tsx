import { useState } from 'react';
import {
  issueReportInputSchema,
  type Report,
  type IssueReportInput,
} from '../../../../shared/contracts/reports.ts';
import { Button } from '../../../components/button.tsx';
import { ConfirmDialog } from '../../../components/confirm-dialog.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { TextField } from '../../../components/text-field.tsx';
import { useIssueReport } from '../api/issue-report.ts';
import { useReportDraft } from '../stored-draft.ts';

export interface ReportEditorProps {
  reference: string;
  /** The revision that the report will judge. */
  revision: number;
  onIssued: (report: Report) => void;
}

/** The planner's own words beside what the report says by itself, and the button that issues it. */
export function ReportEditor({ reference, revision, onIssued }: ReportEditorProps) {
  const { draft, change, clear } = useReportDraft(reference);
  const issueReport = useIssueReport(reference);
  // One key for one report, however often the network repeats it.
  const [asked, setAsked] = useState<{ input: IssueReportInput; key: string } | null>(null);
  const checked = issueReportInputSchema.safeParse(draft);
  const problemOf = (field: 'narrative' | 'recommendation') =>
    checked.error?.issues.find((issue) => issue.path[0] === field)?.message;
  return (
    <form
      className="measure grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        if (checked.success) setAsked({ input: checked.data, key: crypto.randomUUID() });
      }}
    >
      <TextField
        label="Narrative"
        optional
        rows={10}
        description="Plain paragraphs, separated by empty lines. Findings, maps and the list of receptors that do not meet the rule come by themselves and cannot be edited away."
        value={draft.narrative}
        onChange={(narrative) => change({ ...draft, narrative })}
        problem={problemOf('narrative')}
      />
      <TextField
        label="Recommendation"
        optional
        rows={3}
        value={draft.recommendation}
        onChange={(recommendation) => change({ ...draft, recommendation })}
        problem={problemOf('recommendation')}
      />
      <p className="text-small text-ink-soft">
        What you write is kept in this browser until the report is issued.
      </p>
      <Button type="submit" kind="primary" className="justify-self-start">
        Issue the staff report
      </Button>
      {asked === null ? null : (
        <ConfirmDialog
          title="Issue the staff report?"
          confirmLabel="Issue the report"
          isOpen
          isPending={issueReport.isPending}
          onConfirm={() =>
            issueReport.mutate(asked, {
              onSuccess: (report) => {
                setAsked(null);
                clear();
                onIssued(report);
              },
            })
          }
          onCancel={() => setAsked(null)}
        >
          <p>
            It judges revision {revision}. The PDF gets the next number, today’s date and the
            study’s digest, and never changes after that. A later report supersedes it visibly.
          </p>
          {issueReport.isPending ? <p role="status">The report is being drawn …</p> : null}
          {issueReport.isError ? <ProblemNotice error={issueReport.error} /> : null}
        </ConfirmDialog>
      )}
    </form>
  );
}
