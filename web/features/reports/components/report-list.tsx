import type { Report } from '../../../../shared/contracts/reports.ts';
import { useFormats } from '../../../lib/place-context.ts';

export interface ReportListProps {
  reports: readonly Report[];
}

/** Issued staff reports with what proves that a file is the one issued. */
export function ReportList({ reports }: ReportListProps) {
  const formats = useFormats();
  return (
    <ul className="border-t border-hairline">
      {reports.map((report) => (
        <li
          key={report.number}
          className="grid gap-0.5 border-b border-hairline py-3 last:border-b-0"
        >
          <p>
            <a href={`/api/reports/${report.number}.pdf`} className="link font-strong">
              Staff report {report.number}
            </a>{' '}
            (PDF, {report.pages} {report.pages === 1 ? 'page' : 'pages'},{' '}
            {formats.fileSize(report.sizeBytes)})
            {report.superseded ? <strong> · superseded by a later one</strong> : null}
          </p>
          <p className="text-small">
            Issued {formats.dateOfInstant(report.issuedAt)} by {report.issuedByName} on revision{' '}
            {report.revision}
          </p>
          <p className="font-mono text-[0.75rem] break-all text-ink-soft">
            file SHA-256 {report.sha256}
          </p>
        </li>
      ))}
    </ul>
  );
}
